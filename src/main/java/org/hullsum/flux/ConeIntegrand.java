package org.hullsum.flux;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.expression.Expression;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Accuracy;
import org.hullsum.quadrature.Integral;
import org.hullsum.quadrature.ParameterPoint;
import org.hullsum.quadrature.SquareIntegrand;
import org.hullsum.quadrature.SquareIntegrator;
import org.hullsum.quadrature.SquareProblem;
import org.hullsum.quadrature.SwitchFunctions;

/**
 * The cones from one chart of the boundary to a point p, as an integrand over the unit square:
 * (∫_0^1 g(p + s(r − p)) s² ds) (r − p)·(r_u × r_v).
 *
 * <p>Components: one per density, then the same with |g| of the first density, then a bound on what
 * the inner integral of the first density may err by. Not thread-safe.
 */
final class ConeIntegrand implements SquareIntegrand, Cone {
  private static final int NORMAL = 3;

  private final PulledBackChart chart;
  private final int outward;
  private final FormulaIntegrand surface;
  private final Optional<FormulaIntegrand> switches;
  private final double[][] frame = new double[6][BLOCK];
  private final double[][] apexes = new double[3][BLOCK];
  private final double[] height = new double[BLOCK];
  private final boolean[] wanted = new boolean[BLOCK];
  private Vector3 apex = Vector3.ZERO;
  private int components = 1;
  private Optional<RayIntegrals> rays = Optional.empty();

  /** The chart of a patch with the densities to be integrated. */
  ConeIntegrand(
      PulledBackChart chart,
      int outward,
      List<Expression> densities,
      Map<String, Double> constants,
      OptionalDouble instant) {
    this.chart = chart;
    this.outward = outward;
    List<Expression> formulas = new ArrayList<>();
    formulas.add(chart.chart().position().x());
    formulas.add(chart.chart().position().y());
    formulas.add(chart.chart().position().z());
    formulas.add(chart.trimmed(chart.areaVector().x()));
    formulas.add(chart.trimmed(chart.areaVector().y()));
    formulas.add(chart.trimmed(chart.areaVector().z()));
    this.surface = new FormulaIntegrand(formulas, constants).at(instant);
    List<Expression> functions = chart.switches(densities.stream().map(chart::pullBack).toList());
    this.switches =
        functions.isEmpty()
            ? Optional.empty()
            : Optional.of(new FormulaIntegrand(functions, constants).at(instant));
  }

  @Override
  public void aim(Vector3 newApex, RayIntegrals newRays, int densities) {
    apex = newApex;
    for (int axis = 0; axis < 3; axis++) {
      Arrays.fill(apexes[axis], apex.component(axis));
    }
    rays = Optional.of(newRays);
    components = RayIntegrals.rows(densities);
  }

  @Override
  public int components() {
    return components;
  }

  @Override
  public void evaluate(int count, double[] u, double[] v, double[][] values) {
    look(count, u, v);
    rays.orElseThrow().integrate(count, apexes, frame, wanted, values);
    int last = values.length - 1;
    for (int i = 0; i < count; i++) {
      for (int k = 0; k < last; k++) {
        values[k][i] *= outward * height[i];
      }
      values[last][i] *= Math.abs(height[i]);
    }
  }

  private void look(int count, double[] u, double[] v) {
    surface.evaluate(count, u, v, frame);
    for (int i = 0; i < count; i++) {
      height[i] =
          (frame[0][i] - apex.x()) * frame[NORMAL][i]
              + (frame[1][i] - apex.y()) * frame[NORMAL + 1][i]
              + (frame[2][i] - apex.z()) * frame[NORMAL + 2][i];
      wanted[i] = height[i] != 0;
    }
  }

  @Override
  public double[][] lattice(Vector3 from, int n) {
    apex = from;
    double[][] rows = new double[4][n * n];
    double[][] at = ChartIntegral.lattice(n);
    look(n * n, at[0], at[1]);
    for (int i = 0; i < n * n; i++) {
      rows[0][i] = frame[0][i];
      rows[1][i] = frame[1][i];
      rows[2][i] = frame[2][i];
      rows[3][i] = outward * height[i] / (n * n);
    }
    return rows;
  }

  @Override
  public Vector3 position(ParameterPoint point) {
    double[][] row = new double[6][1];
    surface.evaluate(1, new double[] {point.u()}, new double[] {point.v()}, row);
    return new Vector3(row[0][0], row[1][0], row[2][0]);
  }

  @Override
  public Integral[] integrate(Accuracy accuracy) {
    return integrate(this, accuracy);
  }

  @Override
  public Integral integrateMagnitude(Accuracy accuracy) {
    int row = components - 2;
    double[][] all = new double[components][BLOCK];
    SquareIntegrand magnitude =
        new SquareIntegrand() {
          @Override
          public int components() {
            return 1;
          }

          @Override
          public void evaluate(int count, double[] u, double[] v, double[][] values) {
            ConeIntegrand.this.evaluate(count, u, v, all);
            System.arraycopy(all[row], 0, values[0], 0, count);
          }
        };
    return integrate(magnitude, accuracy)[0];
  }

  private Integral[] integrate(SquareIntegrand integrand, Accuracy accuracy) {
    SwitchFunctions functions =
        switches.<SwitchFunctions>map(f -> f).orElseGet(SwitchFunctions::none);
    return SquareIntegrator.integrate(
        new SquareProblem(
            integrand,
            functions,
            chart.chart().periodicU(),
            chart.chart().periodicV(),
            accuracy,
            1));
  }
}
