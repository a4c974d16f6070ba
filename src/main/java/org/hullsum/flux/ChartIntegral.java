package org.hullsum.flux;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.expression.Expression;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Accuracy;
import org.hullsum.quadrature.Integral;
import org.hullsum.quadrature.ParameterPoint;
import org.hullsum.quadrature.SquareIntegrator;
import org.hullsum.quadrature.SquareProblem;
import org.hullsum.quadrature.SwitchFunctions;

/**
 * The integrals of several formulas over one chart, compiled for one set of input values.
 *
 * <p>The formulas are in u, v, t and the inputs, already multiplied by the area element; here they
 * are set to zero where the trim cut the surface away. Not thread-safe.
 */
final class ChartIntegral {
  /** For integrals of which no magnitude is wanted. */
  static final double ANY_MAGNITUDE = 1e9;

  /** Points of the coarse look in each direction. */
  private static final int LOOKS = 9;

  private final PulledBackChart chart;
  private final Map<String, Double> constants;
  private final FormulaIntegrand integrand;
  private final Optional<FormulaIntegrand> switches;
  private final FormulaIntegrand coarse;

  /**
   * @param integrands what to integrate
   * @param sizes formulas of which a coarse mean is wanted beforehand
   */
  ChartIntegral(
      PulledBackChart chart,
      List<Expression> integrands,
      List<Expression> sizes,
      Map<String, Double> constants) {
    this.chart = chart;
    this.constants = constants;
    this.integrand =
        new FormulaIntegrand(integrands.stream().map(chart::trimmed).toList(), constants);
    List<Expression> functions = chart.switches(integrands);
    this.switches =
        functions.isEmpty()
            ? Optional.empty()
            : Optional.of(new FormulaIntegrand(functions, constants));
    this.coarse = new FormulaIntegrand(sizes.stream().map(chart::trimmed).toList(), constants);
  }

  /**
   * The mean of the absolute values of the {@code sizes} over a coarse lattice, where they are
   * finite.
   */
  double[] coarseMeans(OptionalDouble instant) {
    int n = LOOKS * LOOKS;
    double[][] at = lattice(LOOKS);
    double[][] values = new double[coarse.components()][n];
    coarse.at(instant).evaluate(n, at[0], at[1], values);
    double[] means = new double[values.length];
    for (int k = 0; k < means.length; k++) {
      for (double value : values[k]) {
        means[k] += Double.isFinite(value) ? Math.abs(value) / n : 0;
      }
    }
    return means;
  }

  /** n × n points of the unit square: rows of u and of v. */
  static double[][] lattice(int n) {
    double[][] at = new double[2][n * n];
    for (int i = 0; i < n * n; i++) {
      int row = i / n;
      int column = i % n;
      at[0][i] = (row + 0.5) / n;
      // Sheared, so that no column of the lattice runs along a line of symmetry.
      at[1][i] = (column + (at[0][i] + 0.25) % 1) / n;
    }
    return at;
  }

  /** Integrates every formula to the accuracy. */
  Integral[] integrate(OptionalDouble instant, Accuracy accuracy) {
    switches.ifPresent(functions -> functions.at(instant));
    SwitchFunctions functions =
        switches.<SwitchFunctions>map(f -> f).orElseGet(SwitchFunctions::none);
    return SquareIntegrator.integrate(
        new SquareProblem(
            integrand.at(instant),
            functions,
            chart.chart().periodicU(),
            chart.chart().periodicV(),
            accuracy,
            integrand.components()));
  }

  /** The point of space at a point of the square. */
  Vector3 position(ParameterPoint point) {
    FormulaIntegrand formulas =
        new FormulaIntegrand(
            List.of(
                chart.chart().position().x(),
                chart.chart().position().y(),
                chart.chart().position().z()),
            constants);
    double[][] values = new double[3][1];
    formulas.evaluate(1, new double[] {point.u()}, new double[] {point.v()}, values);
    return new Vector3(values[0][0], values[1][0], values[2][0]);
  }
}
