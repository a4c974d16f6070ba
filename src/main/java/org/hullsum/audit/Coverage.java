package org.hullsum.audit;

import org.apache.commons.statistics.distribution.ContinuousDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.TDistribution;

/**
 * The distribution by which standard uncertainties are expanded: normal where the degrees of
 * freedom are infinite, else Student's (JCGM 100:2008, G.3).
 *
 * <p>Fractional effective degrees of freedom are used as they are, not truncated.
 *
 * @param probability the coverage probability of a two-sided interval
 * @param degreesOfFreedom of the standard uncertainty, positive, perhaps infinite
 */
record Coverage(double probability, double degreesOfFreedom) {
  /** The share of true imbalances at the detectable size that are found. */
  private static final double POWER = 0.95;

  /** The standard normal quantile of 0.95, 1.645. */
  static final double POWER_QUANTILE =
      NormalDistribution.of(0, 1).inverseCumulativeProbability(POWER);

  Coverage {
    if (!(probability > 0 && probability < 1) || !(degreesOfFreedom > 0)) {
      throw new IllegalArgumentException(
          "coverage " + probability + " with " + degreesOfFreedom + " degrees of freedom");
    }
  }

  static Coverage normal(double probability) {
    return new Coverage(probability, Double.POSITIVE_INFINITY);
  }

  /** The coverage factor k. */
  double factor() {
    return distribution().inverseSurvivalProbability((1 - probability) / 2);
  }

  /** The probability that a standardized deviate exceeds z. */
  double above(double z) {
    return distribution().survivalProbability(z);
  }

  private ContinuousDistribution distribution() {
    return Double.isInfinite(degreesOfFreedom)
        ? NormalDistribution.of(0, 1)
        : TDistribution.of(degreesOfFreedom);
  }

  /**
   * The coverage per balance that keeps this one over a number of independent balances (Šidák, Z.,
   * "Rectangular confidence regions for the means of multivariate normal distributions", Journal of
   * the American Statistical Association 62 (1967) 626-633).
   */
  static double corrected(double probability, int balances) {
    return Math.pow(probability, 1.0 / balances);
  }
}
