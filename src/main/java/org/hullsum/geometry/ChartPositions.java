package org.hullsum.geometry;

import java.util.List;
import java.util.Map;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;

/**
 * The positions of one chart at many points, for what needs no tangents: these take longer to
 * derive than the points of a small surface to evaluate. For one thread.
 */
final class ChartPositions {
  private final BatchEvaluator evaluator;
  private final BatchEvaluator.Workspace workspace;

  private ChartPositions(BatchEvaluator evaluator) {
    this.evaluator = evaluator;
    this.workspace = evaluator.workspace();
  }

  /**
   * Compiles a chart.
   *
   * @param parameters the value of every parameter in its formulas
   */
  static ChartPositions of(Chart chart, Map<String, Double> parameters) {
    VectorExpression r = chart.position();
    return new ChartPositions(
        BatchEvaluator.compile(
            List.of(Chart.U, Chart.V), parameters, List.of(r.x(), r.y(), r.z())));
  }

  /** The positions at points given as rows u and v; not finite where the formulas are not. */
  Vector3[] at(double[][] uv, int count) {
    double[][] rows = new double[3][count];
    evaluator.evaluate(uv, count, rows, workspace);
    Vector3[] positions = new Vector3[count];
    for (int i = 0; i < count; i++) {
      positions[i] = new Vector3(rows[0][i], rows[1][i], rows[2][i]);
    }
    return positions;
  }

  Vector3 at(double u, double v) {
    return at(new double[][] {{u}, {v}}, 1)[0];
  }
}
