package org.hullsum.geometry;

import java.util.List;
import java.util.Map;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;

/**
 * A chart compiled: positions, tangents and area vectors over arrays of points of the unit square.
 *
 * <p>Immutable and thread-safe; what changes is in a {@link Workspace}, one per thread. At a pole
 * the area vector is zero; where a formula is undefined its rows hold NaN.
 */
public final class ChartEvaluator {
  /** Rows of the outputs of {@link #evaluate}: each quantity takes three, for x, y and z. */
  public static final int POSITION = 0;

  /** r_u. */
  public static final int TANGENT_U = 3;

  /** r_v. */
  public static final int TANGENT_V = 6;

  /** r_u × r_v. */
  public static final int AREA_VECTOR = 9;

  /** Number of rows. */
  public static final int ROWS = 12;

  private final BatchEvaluator all;

  /** Scratch memory of one thread. */
  public static final class Workspace {
    private final BatchEvaluator.Workspace all;
    private final double[][] point = new double[2][1];
    private final double[][] values = new double[ROWS][1];

    private Workspace(ChartEvaluator owner) {
      all = owner.all.workspace();
    }
  }

  private ChartEvaluator(BatchEvaluator all) {
    this.all = all;
  }

  /**
   * Compiles a chart.
   *
   * @param parameters the value of every parameter in its formulas
   * @throws IllegalArgumentException where one is missing
   */
  public static ChartEvaluator of(Chart chart, Map<String, Double> parameters) {
    List<String> variables = List.of(Chart.U, Chart.V);
    VectorExpression r = chart.position();
    VectorExpression ru = chart.tangentU();
    VectorExpression rv = chart.tangentV();
    VectorExpression area = ru.cross(rv).simplified();
    return new ChartEvaluator(
        BatchEvaluator.compile(
            variables,
            parameters,
            List.of(
                r.x(), r.y(), r.z(), ru.x(), ru.y(), ru.z(), rv.x(), rv.y(), rv.z(), area.x(),
                area.y(), area.z())));
  }

  public Workspace workspace() {
    return new Workspace(this);
  }

  /**
   * Positions, tangents and area vectors.
   *
   * @param inputs rows u and v
   * @param count number of points
   * @param outputs {@link #ROWS} rows, written for the first {@code count} points
   */
  public void evaluate(double[][] inputs, int count, double[][] outputs, Workspace workspace) {
    all.evaluate(inputs, count, outputs, workspace.all);
  }

  /** All of it at one point, for the few places that need no more. */
  public ChartPoint at(double u, double v, Workspace workspace) {
    workspace.point[0][0] = u;
    workspace.point[1][0] = v;
    all.evaluate(workspace.point, 1, workspace.values, workspace.all);
    double[][] r = workspace.values;
    return new ChartPoint(
        vector(r, POSITION), vector(r, TANGENT_U), vector(r, TANGENT_V), vector(r, AREA_VECTOR));
  }

  private static Vector3 vector(double[][] rows, int first) {
    return new Vector3(rows[first][0], rows[first + 1][0], rows[first + 2][0]);
  }
}
