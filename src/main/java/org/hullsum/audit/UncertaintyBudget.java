package org.hullsum.audit;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.apache.commons.numbers.core.Sum;
import org.hullsum.model.Input;
import org.hullsum.model.Inputs;

/**
 * The standard uncertainty of a sum of rates, and where it comes from (JCGM 100:2008, 5.1.2, 5.2.2
 * and G.4.1).
 *
 * <p>With c the sensitivity of the whole sum to input i, the sensitivities of its parts added with
 * their signs: u² = Σ (c_i u_i)² + 2 Σ r_ij c_i u_i c_j u_j. A source whose parts cancel to less
 * than {@value #CANCELLED} of their gross is taken to cancel: sensitivities are integrals too, and
 * what is left of them is their own error.
 *
 * <p>The effective degrees of freedom are those of Welch and Satterthwaite, which hold for
 * independent sources only; where a source with finite degrees of freedom is correlated with
 * another that matters no coverage factor follows, and {@link #refusal} says so; so it does where
 * the correlations contradict one another and u² would be negative.
 */
final class UncertaintyBudget {
  /** Of u² relative to the sum of the squares. */
  private static final double ROUNDING = 1e-12;

  private static final double CANCELLED = 1e-5;

  private final double standardUncertainty;
  private final double degreesOfFreedom;
  private final Optional<String> refusal;
  private final List<BalanceResult.Contribution> contributions;

  private UncertaintyBudget(
      double standardUncertainty,
      double degreesOfFreedom,
      Optional<String> refusal,
      List<BalanceResult.Contribution> contributions) {
    this.standardUncertainty = standardUncertainty;
    this.degreesOfFreedom = degreesOfFreedom;
    this.refusal = refusal;
    this.contributions = List.copyOf(contributions);
  }

  /** The budget of the sum of the parts. */
  static UncertaintyBudget of(List<Estimate> parts, Inputs inputs) {
    Map<String, Double> moved = new TreeMap<>();
    Map<String, Double> gross = new HashMap<>();
    for (Estimate part : parts) {
      part.sensitivities().forEach((name, c) -> gross.merge(name, Math.abs(c), Double::sum));
    }
    Estimate.sum(parts)
        .sensitivities()
        .forEach(
            (name, c) -> {
              double u = uncertaintyOf(inputs, name);
              if (u > 0 && Math.abs(c) > CANCELLED * gross.get(name)) {
                moved.put(name, c * u);
              }
            });
    return combine(moved, inputs);
  }

  private static double uncertaintyOf(Inputs inputs, String name) {
    Input input = inputs.all().get(name);
    if (input == null) {
      throw new IllegalArgumentException("sensitivity to " + name + ", which is no input");
    }
    return input.standardUncertainty();
  }

  private static UncertaintyBudget combine(Map<String, Double> moved, Inputs inputs) {
    Map<String, Double> variance = new TreeMap<>();
    moved.forEach((name, m) -> variance.put(name, m * m));
    boolean correlatedFinite = false;
    for (Inputs.Correlation pair : inputs.correlations()) {
      Double first = moved.get(pair.first());
      Double second = moved.get(pair.second());
      if (first != null && second != null && pair.coefficient() != 0) {
        double covariance = pair.coefficient() * first * second;
        variance.merge(pair.first(), covariance, Double::sum);
        variance.merge(pair.second(), covariance, Double::sum);
        correlatedFinite |= finite(inputs, pair.first()) || finite(inputs, pair.second());
      }
    }
    Sum total = Sum.create();
    variance.values().forEach(total::add);
    double gross = moved.values().stream().mapToDouble(m -> m * m).sum();
    boolean contradictory = total.getAsDouble() < -ROUNDING * gross;
    double square = contradictory ? gross : Math.max(0, total.getAsDouble());
    List<BalanceResult.Contribution> contributions = new ArrayList<>();
    moved.forEach(
        (name, m) ->
            contributions.add(
                new BalanceResult.Contribution(
                    name, Math.abs(m), square > 0 ? variance.get(name) / square : 0)));
    contributions.sort(
        Comparator.comparingDouble(BalanceResult.Contribution::contribution)
            .reversed()
            .thenComparing(BalanceResult.Contribution::source));
    double freedom =
        correlatedFinite ? Double.POSITIVE_INFINITY : welchSatterthwaite(moved, square, inputs);
    return new UncertaintyBudget(
        Math.sqrt(square), freedom, refusal(correlatedFinite, contradictory), contributions);
  }

  private static Optional<String> refusal(boolean correlatedFinite, boolean contradictory) {
    if (contradictory) {
      return Optional.of("the stated correlations contradict one another");
    }
    return correlatedFinite
        ? Optional.of(
            "figures with finite degrees of freedom are correlated, so no coverage factor follows")
        : Optional.empty();
  }

  private static boolean finite(Inputs inputs, String name) {
    return Double.isFinite(inputs.all().get(name).degreesOfFreedom());
  }

  private static double welchSatterthwaite(
      Map<String, Double> moved, double square, Inputs inputs) {
    if (square == 0) {
      return Double.POSITIVE_INFINITY;
    }
    Sum denominator = Sum.create();
    moved.forEach(
        (name, m) -> {
          double share = m * m / square;
          denominator.add(share * share / inputs.all().get(name).degreesOfFreedom());
        });
    double inverse = denominator.getAsDouble();
    return inverse == 0 ? Double.POSITIVE_INFINITY : 1 / inverse;
  }

  double standardUncertainty() {
    return standardUncertainty;
  }

  /** Effective degrees of freedom, perhaps infinite. */
  double degreesOfFreedom() {
    return degreesOfFreedom;
  }

  /** Why no coverage factor follows. */
  Optional<String> refusal() {
    return refusal;
  }

  /** Every source that matters, the largest first. */
  List<BalanceResult.Contribution> contributions() {
    return contributions;
  }
}
