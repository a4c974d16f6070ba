package org.hullsum.flux;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Accuracy;
import org.hullsum.quadrature.Integral;
import org.hullsum.quadrature.ParameterPoint;
import org.hullsum.quadrature.SquareIntegrand;
import org.hullsum.quadrature.SquareIntegrator;
import org.hullsum.quadrature.SquareProblem;

/**
 * The columns that hang from one chart of the boundary, as an integrand over the unit square: (∫ of
 * g along the line from r down to the next crossing) times the part of the area element that faces
 * up.
 *
 * <p>Components as those of {@link ConeIntegrand}. Not thread-safe.
 */
final class ColumnIntegrand implements SquareIntegrand {
  private static final int NORMAL = 3;

  /** Below this cosine with the axis a patch counts as standing upright. */
  private static final double UPRIGHT = 1e-12;

  private final PulledBackChart chart;
  private final int outward;
  private final Vector3 up;
  private final Columns columns;
  private final RayIntegrals rays;
  private final int components;
  private final FormulaIntegrand surface;
  private final FormulaIntegrand switches;
  private final double[][] frame = new double[6][BLOCK];
  private final double[][] starts = new double[3][Columns.MOST_STRETCHES * BLOCK];
  private final double[][] ends = new double[3][Columns.MOST_STRETCHES * BLOCK];
  private final double[] weights = new double[Columns.MOST_STRETCHES * BLOCK];
  private final int[] owners = new int[Columns.MOST_STRETCHES * BLOCK];
  private final boolean[] wanted = new boolean[Columns.MOST_STRETCHES * BLOCK];
  private final double[][] results;

  /** What all charts of a boundary have in common. */
  record Setting(
      Vector3 up,
      Columns columns,
      RayIntegrals rays,
      List<Expression> densities,
      Map<String, Double> constants,
      OptionalDouble instant) {}

  ColumnIntegrand(PulledBackChart chart, int outward, Setting setting) {
    this.chart = chart;
    this.outward = outward;
    this.up = setting.up;
    this.columns = setting.columns;
    this.rays = setting.rays;
    this.components = RayIntegrals.rows(setting.densities.size());
    VectorExpression r = chart.chart().position();
    VectorExpression n = chart.areaVector();
    this.surface =
        new FormulaIntegrand(
                List.of(
                    r.x(),
                    r.y(),
                    r.z(),
                    chart.trimmed(n.x()),
                    chart.trimmed(n.y()),
                    chart.trimmed(n.z())),
                setting.constants)
            .at(setting.instant);
    List<Expression> functions =
        new ArrayList<>(chart.switches(setting.densities.stream().map(chart::pullBack).toList()));
    functions.add(n.dot(VectorExpression.of(up)));
    this.switches = new FormulaIntegrand(functions, setting.constants).at(setting.instant);
    this.results = new double[components][Columns.MOST_STRETCHES * BLOCK];
    java.util.Arrays.fill(wanted, true);
  }

  @Override
  public int components() {
    return components;
  }

  @Override
  public void evaluate(int count, double[] u, double[] v, double[][] values) {
    surface.evaluate(count, u, v, frame);
    int stretches = 0;
    for (int i = 0; i < count; i++) {
      for (double[] row : values) {
        row[i] = 0;
      }
      Vector3 normal = new Vector3(frame[NORMAL][i], frame[NORMAL + 1][i], frame[NORMAL + 2][i]);
      double facing = outward * normal.dot(up);
      if (facing > UPRIGHT * normal.norm()) {
        Vector3 top = new Vector3(frame[0][i], frame[1][i], frame[2][i]);
        Optional<List<Columns.Stretch>> below = columns.below(top);
        if (below.isEmpty()) {
          values[0][i] = Double.NaN;
          continue;
        }
        for (Columns.Stretch stretch : below.get()) {
          enter(stretches, stretch);
          weights[stretches] = facing * stretch.length() / below.get().size();
          owners[stretches++] = i;
        }
      } else if (Double.isNaN(facing)) {
        values[0][i] = Double.NaN;
      }
    }
    rays.integrate(stretches, starts, ends, wanted, results);
    for (int k = 0; k < stretches; k++) {
      for (int c = 0; c < components; c++) {
        values[c][owners[k]] += weights[k] * results[c][k];
      }
    }
    spread(stretches, values[components - 1]);
  }

  /** Lines that stand in for one in doubt are as wrong as they are at odds with one another. */
  private void spread(int stretches, double[] innerError) {
    int begin = 0;
    while (begin < stretches) {
      double least = Double.POSITIVE_INFINITY;
      double most = Double.NEGATIVE_INFINITY;
      int end = begin;
      while (end < stretches && owners[end] == owners[begin]) {
        double share = weights[end] * results[0][end];
        least = Math.min(least, share);
        most = Math.max(most, share);
        end++;
      }
      innerError[owners[begin]] += (end - begin) * (most - least);
      begin = end;
    }
  }

  private void enter(int at, Columns.Stretch stretch) {
    for (int axis = 0; axis < 3; axis++) {
      starts[axis][at] = stretch.top().component(axis);
      ends[axis][at] = stretch.bottom().component(axis);
    }
  }

  /** The point of space at a point of the square. */
  Vector3 position(ParameterPoint point) {
    double[][] row = new double[6][1];
    surface.evaluate(1, new double[] {point.u()}, new double[] {point.v()}, row);
    return new Vector3(row[0][0], row[1][0], row[2][0]);
  }

  Integral[] integrate(Accuracy accuracy) {
    return SquareIntegrator.integrate(
        new SquareProblem(
            this, switches, chart.chart().periodicU(), chart.chart().periodicV(), accuracy, 1));
  }
}
