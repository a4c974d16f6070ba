package org.hullsum.audit;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.hullsum.model.Input;
import org.hullsum.model.Inputs;

/**
 * The residual of one balance as it would be under a hypothesis, with its own uncertainty: what is
 * taken to be wrong changes the weights of the inputs too (JCGM 100:2008, 5.2.2).
 *
 * <p>A residual fits zero where it is within the tolerance, or within its numerical error and its
 * expanded uncertainty at 99 %: at 95 % the true cause would be passed over once in twenty. Cost of
 * a hypothesis: the inputs of what it changes, not those of the balance.
 */
final class ResidualModel {
  /** The coverage probability of what fits. */
  static final double PROBABILITY = 0.99;

  /** Below this share of the residual's own variance one that is left is rounding. */
  private static final double ROUNDING = 1e-12;

  private final double value;
  private final double error;
  private final double tolerance;
  private final double factor;
  private final double variance;
  private final Map<String, Double> uncertainties = new HashMap<>();

  /** Of each input, its part c·u of the residual. */
  private final Map<String, Double> moved = new HashMap<>();

  /** Of each input correlated with others, Σ r·c·u over those. */
  private final Map<String, Double> drawn = new HashMap<>();

  private final Map<String, Map<String, Double>> correlations = new HashMap<>();

  private ResidualModel(Balance balance, Estimate residual, Inputs inputs) {
    this.value = residual.value();
    this.error = residual.error();
    this.tolerance = balance.decision().flatMap(Decision::tolerance).orElse(0.0);
    UncertaintyBudget budget = UncertaintyBudget.of(List.of(residual), inputs);
    this.variance = budget.standardUncertainty() * budget.standardUncertainty();
    this.factor = new Coverage(PROBABILITY, budget.degreesOfFreedom()).factor();
    for (Input input : inputs.all().values()) {
      uncertainties.put(input.name(), input.standardUncertainty());
    }
    residual
        .sensitivities()
        .forEach((name, c) -> moved.put(name, c * uncertainties.getOrDefault(name, 0.0)));
    for (Inputs.Correlation pair : inputs.correlations()) {
      correlate(pair.first(), pair.second(), pair.coefficient());
      correlate(pair.second(), pair.first(), pair.coefficient());
    }
  }

  private void correlate(String one, String other, double coefficient) {
    correlations.computeIfAbsent(one, n -> new HashMap<>()).put(other, coefficient);
    drawn.merge(one, coefficient * moved.getOrDefault(other, 0.0), Double::sum);
  }

  /** Of a balance that has a residual. */
  static ResidualModel of(Balance balance, Inputs inputs) {
    return new ResidualModel(balance, balance.residual().orElseThrow(), inputs);
  }

  /**
   * A residual under a hypothesis.
   *
   * @param value what is left
   * @param uncertainty its standard uncertainty
   * @param fits whether it can't be told from zero
   * @param unlikelihood −2 ln of its likelihood were the truth zero, but for a constant of the
   *     balance: ever larger the less likely
   */
  record Outcome(double value, double uncertainty, boolean fits, double unlikelihood) {}

  /** As it stands. */
  Outcome now() {
    return after(Estimate.ZERO);
  }

  /** With something added to the residual. */
  Outcome after(Estimate change) {
    double changed = variance;
    Map<String, Double> more = new HashMap<>();
    change
        .sensitivities()
        .forEach((name, c) -> more.put(name, c * uncertainties.getOrDefault(name, 0.0)));
    for (Map.Entry<String, Double> entry : more.entrySet()) {
      String name = entry.getKey();
      double by = entry.getValue();
      double along = moved.getOrDefault(name, 0.0) + drawn.getOrDefault(name, 0.0);
      changed += 2 * by * along + by * by;
      for (Map.Entry<String, Double> other : correlations.getOrDefault(name, Map.of()).entrySet()) {
        changed += by * other.getValue() * more.getOrDefault(other.getKey(), 0.0);
      }
    }
    double u = changed > ROUNDING * variance ? Math.sqrt(changed) : 0;
    double left = value + change.value();
    double beyond = Math.max(0, Math.abs(left) - error - change.error());
    boolean fits = beyond <= factor * u || Math.abs(left) <= tolerance;
    double scale = Math.max(u, Double.MIN_NORMAL);
    double z = u > 0 ? beyond / u : 0;
    return new Outcome(left, u, fits, z * z + (u > 0 ? 2 * Math.log(scale) : 0));
  }
}
