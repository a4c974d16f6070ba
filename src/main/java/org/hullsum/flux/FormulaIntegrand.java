package org.hullsum.flux;

import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.Expression;
import org.hullsum.geometry.Chart;
import org.hullsum.quadrature.SquareIntegrand;
import org.hullsum.quadrature.SwitchFunctions;

/**
 * Formulas in u, v and t as functions on the unit square at one instant.
 *
 * <p>A point at which a formula is not finite is replaced by the mean over four points close to it
 * in u and v, as long as all of these are finite. So a quotient that cylindrical or spherical
 * coordinates leave as 0/0 on their axis takes its limit, where it has one, while a formula that is
 * undefined on a piece of the surface stays so. A genuine singularity is found by {@link
 * SingularitySearch}, not here.
 *
 * <p>Not thread-safe: it keeps scratch space.
 */
final class FormulaIntegrand implements SquareIntegrand, SwitchFunctions {
  /** Distance of the four points in u and v: their mean errs by its square times f''. */
  private static final double NEARBY = 0x1p-20;

  private final BatchEvaluator evaluator;
  private final BatchEvaluator.Workspace workspace;
  private final double[] instants = new double[BLOCK];

  /**
   * Compiles formulas.
   *
   * @param formulas in u, v, t and inputs
   * @param constants the values of the inputs
   */
  FormulaIntegrand(List<Expression> formulas, Map<String, Double> constants) {
    this.evaluator =
        BatchEvaluator.compile(
            List.of(Chart.U, Chart.V, InputSensitivity.TIME), constants, formulas);
    this.workspace = evaluator.workspace();
  }

  /** The same formulas at another instant; 0 where there is none. */
  FormulaIntegrand at(OptionalDouble instant) {
    Arrays.fill(instants, instant.orElse(0));
    return this;
  }

  @Override
  public int components() {
    return evaluator.outputCount();
  }

  @Override
  public int count() {
    return evaluator.outputCount();
  }

  @Override
  public void evaluate(int count, double[] u, double[] v, double[][] values) {
    evaluator.evaluate(new double[][] {u, v, instants}, count, values, workspace);
    for (int i = 0; i < count; i++) {
      if (!finite(values, i)) {
        approach(u[i], v[i], i, values);
      }
    }
  }

  private static boolean finite(double[][] values, int i) {
    for (double[] component : values) {
      if (!Double.isFinite(component[i])) {
        return false;
      }
    }
    return true;
  }

  private void approach(double u, double v, int i, double[][] values) {
    double[] nearU = {inside(u - NEARBY), inside(u + NEARBY), u, u};
    double[] nearV = {v, v, inside(v - NEARBY), inside(v + NEARBY)};
    double[][] near = new double[components()][nearU.length];
    evaluator.evaluate(new double[][] {nearU, nearV, instants}, nearU.length, near, workspace);
    for (int k = 0; k < near.length; k++) {
      if (!Double.isFinite(values[k][i])) {
        double mean = Arrays.stream(near[k]).sum() / nearU.length;
        if (Double.isFinite(mean)) {
          values[k][i] = mean;
        }
      }
    }
  }

  private static double inside(double parameter) {
    return Math.min(1, Math.max(0, parameter));
  }
}
