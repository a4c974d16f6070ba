package org.hullsum.flux;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.function.Function;
import org.apache.commons.numbers.core.Sum;
import org.hullsum.expression.Derivative;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Switches;
import org.hullsum.expression.Symbols;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Accuracy;
import org.hullsum.quadrature.Integral;

/**
 * The integral of one formula per chart over a surface, Φ = Σ ∬ f(u, v, t; inputs) du dv.
 *
 * <p>The accuracy is relative to ∬|f| over all charts. The derivative by an input is the integral
 * of the symbolic derivative, geometry included, since the charts are formulas; where the input
 * moves a trim curve or a jump of the formula, that misses what the curve sweeps, and the whole
 * integral is differenced over ± one standard uncertainty instead (JCGM 100:2008, 5.1.3, note 2).
 */
final class SurfaceFlux {
  /** Part of the allowed error that is taken from the coarse look instead of chart by chart. */
  private static final double COARSE_SHARE = 0.1;

  /** Rounding of F·N relative to |F||N|: nothing below it can be asked for. */
  private static final double ROUNDING = 1e-14;

  /** Relative accuracy of the derivatives by the inputs. */
  private static final double SENSITIVITY_ACCURACY = 1e-6;

  /** Relative accuracy of the integrals that are differenced. */
  private static final double DIFFERENCE_ACCURACY = 1e-10;

  /** The steps tried for a difference, in standard uncertainties. */
  private static final double[] STEPS = {1, 1.0 / 16, 1.0 / 256};

  private final List<PulledBackChart> charts;
  private final List<Expression> integrands;
  private final List<Expression> roundingSizes;
  private final InputSensitivity inputs;
  private final double relative;
  private final List<ChartIntegral> integrals;
  private final Set<String> varying;
  private final Set<String> moving;
  private final List<ChartIntegral> derivatives;

  /**
   * @param integrand f of each chart, in u, v and t
   * @param roundingSize a bound on the size of the terms that f sums up
   * @param relative accuracy relative to ∬|f|
   */
  SurfaceFlux(
      List<PulledBackChart> charts,
      Function<PulledBackChart, Expression> integrand,
      Function<PulledBackChart, Expression> roundingSize,
      InputSensitivity inputs,
      double relative) {
    this.charts = charts;
    this.integrands = charts.stream().map(integrand).toList();
    this.roundingSizes = charts.stream().map(roundingSize).toList();
    this.inputs = inputs;
    this.relative = relative;
    this.integrals = compiled(inputs.values());
    List<Expression> formulas = new ArrayList<>(integrands);
    charts.forEach(chart -> chart.trim().ifPresent(formulas::add));
    this.varying = inputs.varyingIn(formulas);
    this.moving = movingCurves();
    this.derivatives = derivatives();
  }

  private List<ChartIntegral> compiled(Map<String, Double> values) {
    List<ChartIntegral> compiled = new ArrayList<>();
    for (int i = 0; i < charts.size(); i++) {
      compiled.add(
          new ChartIntegral(
              charts.get(i),
              List.of(integrands.get(i)),
              List.of(integrands.get(i), roundingSizes.get(i)),
              values));
    }
    return compiled;
  }

  /** The bases that move a curve on which an integrand jumps. */
  private Set<String> movingCurves() {
    if (varying.isEmpty()) {
      return Set.of();
    }
    List<Expression> curves = new ArrayList<>();
    for (int i = 0; i < charts.size(); i++) {
      charts.get(i).trim().ifPresent(trim -> curves.addAll(Switches.of(trim)));
      curves.addAll(Switches.jumps(integrands.get(i)));
    }
    return inputs.basesOf(inputs.varyingIn(curves));
  }

  private List<ChartIntegral> derivatives() {
    List<ChartIntegral> compiled = new ArrayList<>();
    if (varying.isEmpty() || moving.containsAll(inputs.basesOf(varying))) {
      return compiled;
    }
    for (int i = 0; i < charts.size(); i++) {
      Expression integrand = integrands.get(i);
      List<Expression> partials =
          varying.stream().map(name -> Derivative.of(integrand, name)).toList();
      List<Expression> sizes = List.of(integrand, roundingSizes.get(i));
      compiled.add(new ChartIntegral(charts.get(i), partials, sizes, inputs.values()));
    }
    return compiled;
  }

  boolean dependsOnTime() {
    return integrands.stream().anyMatch(f -> Symbols.in(f).contains(InputSensitivity.TIME));
  }

  /** Value, error bound and sensitivities at an instant. */
  PatchFlux at(OptionalDouble instant, FluxBasis basis) {
    Total total = total(integrals, instant, relative);
    Map<String, Double> sensitivities =
        total.nonFiniteAt.isPresent() ? Map.of() : sensitivities(instant);
    return new PatchFlux(
        total.nonFiniteAt.isPresent() ? Optional.empty() : Optional.of(total.value),
        total.errorBound,
        total.magnitude,
        sensitivities,
        total.evaluations,
        total.status,
        basis,
        total.nonFiniteAt);
  }

  private record Total(
      double value,
      double errorBound,
      double magnitude,
      long evaluations,
      Integral.Status status,
      Optional<Vector3> nonFiniteAt) {}

  private static Total total(
      List<ChartIntegral> integrals, OptionalDouble instant, double relative) {
    double absolute = absolute(integrals, instant, relative);
    Accuracy accuracy =
        new Accuracy(relative, absolute, Accuracy.USUAL_MAGNITUDE, Accuracy.USUAL_LIMIT);
    Sum value = Sum.create();
    Sum bound = Sum.create();
    Sum magnitude = Sum.create();
    long evaluations = 0;
    Integral.Status status = Integral.Status.REACHED;
    for (ChartIntegral chart : integrals) {
      Integral integral = chart.integrate(instant, accuracy)[0];
      evaluations += integral.evaluations();
      if (integral.nonFiniteAt().isPresent()) {
        return new Total(
            Double.NaN,
            Double.POSITIVE_INFINITY,
            0,
            evaluations,
            integral.status(),
            Optional.of(chart.position(integral.nonFiniteAt().get())));
      }
      value.add(integral.value());
      bound.add(integral.errorBound());
      magnitude.add(integral.magnitude());
      status = integral.reached() ? status : integral.status();
    }
    return new Total(
        value.getAsDouble(),
        bound.getAsDouble(),
        magnitude.getAsDouble(),
        evaluations,
        status,
        Optional.empty());
  }

  /** What a chart may err by, however little of the flux passes through it. */
  private static double absolute(
      List<ChartIntegral> integrals, OptionalDouble instant, double relative) {
    double size = 0;
    double rounding = 0;
    for (ChartIntegral integral : integrals) {
      double[] means = integral.coarseMeans(instant);
      size += means[0];
      rounding = Math.max(rounding, means[1]);
    }
    double shared = integrals.size() == 1 ? 0 : COARSE_SHARE * relative * size / integrals.size();
    double least = Math.max(shared, ROUNDING * rounding);
    return least > 0 ? least : Double.MIN_NORMAL;
  }

  private Map<String, Double> sensitivities(OptionalDouble instant) {
    Map<String, Double> result = new LinkedHashMap<>();
    if (!derivatives.isEmpty()) {
      Map<String, Double> partials = new LinkedHashMap<>();
      Accuracy accuracy =
          new Accuracy(
              SENSITIVITY_ACCURACY,
              Math.max(
                  Double.MIN_NORMAL,
                  ROUNDING * absolute(derivatives, instant, SENSITIVITY_ACCURACY)),
              1,
              Accuracy.USUAL_LIMIT);
      for (ChartIntegral chart : derivatives) {
        Integral[] parts = chart.integrate(instant, accuracy);
        int k = 0;
        for (String name : varying) {
          partials.merge(name, parts[k++].value(), Double::sum);
        }
      }
      result.putAll(inputs.toBases(partials));
    }
    Set<String> differenced = new HashSet<>(moving);
    result.keySet().removeAll(differenced);
    moving.forEach(base -> result.put(base, difference(base, instant)));
    return result;
  }

  private double difference(String base, OptionalDouble instant) {
    double centre = inputs.values().get(base);
    for (double fraction : STEPS) {
      double step = fraction * inputs.standardUncertainty(base);
      double above = valueWith(base, centre + step, instant);
      double below = valueWith(base, centre - step, instant);
      double slope = (above - below) / (2 * step);
      if (Double.isFinite(slope)) {
        return slope;
      }
    }
    return Double.NaN;
  }

  private double valueWith(String base, double value, OptionalDouble instant) {
    List<ChartIntegral> changed = compiled(inputs.valuesWith(base, value));
    return total(changed, instant, DIFFERENCE_ACCURACY).value;
  }
}
