package org.hullsum.units;

/**
 * Combines independent uncertainties in quadrature, with the effective degrees of freedom of Welch
 * and Satterthwaite (JCGM 100:2008, 5.1.2 and G.4.1): u⁴/ν = Σ uᵢ⁴/νᵢ.
 */
final class UncertaintyAccumulator {
  private double combined;
  private double fourthPowers;

  void add(double standardUncertainty, double degreesOfFreedom) {
    double before = combined;
    combined = Math.hypot(before, standardUncertainty);
    if (combined > 0) {
      double shrink = Math.pow(before / combined, 4);
      double share = Math.pow(standardUncertainty / combined, 4);
      fourthPowers = fourthPowers * shrink + share / degreesOfFreedom;
    }
  }

  double standardUncertainty() {
    return combined;
  }

  /** Infinite where no figure had finite ones. */
  double degreesOfFreedom() {
    return 1 / fourthPowers;
  }
}
