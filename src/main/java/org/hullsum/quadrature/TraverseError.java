package org.hullsum.quadrature;

/**
 * How far a traverse's mean is from the true one over profiles that are known: the power laws
 * (distance from the wall)^(1/n) with n from 5 to 10, which cover turbulent flow in smooth and
 * rough ducts (J. Nikuradse, 1932; from memory), in a rectangle their product over both directions.
 *
 * <p>The largest deviation is a limit, and a type B evaluation of the rule's own uncertainty (JCGM
 * 100:2008, 4.3.7). It says nothing of a profile that is skewed, or swirls.
 */
public final class TraverseError {
  private static final int LOWEST_LAW = 5;
  private static final int HIGHEST_LAW = 10;

  private TraverseError() {}

  /** The largest relative deviation over the laws of the mean over a disk. */
  public static double onRadius(TraverseLine line) {
    double worst = 0;
    for (int n = LOWEST_LAW; n <= HIGHEST_LAW; n++) {
      worst = Math.max(worst, Math.abs(onRadius(line, n)));
    }
    return worst;
  }

  /** The same over a rectangle. */
  public static double onSides(TraverseLine across, TraverseLine up) {
    double worst = 0;
    for (int n = LOWEST_LAW; n <= HIGHEST_LAW; n++) {
      worst = Math.max(worst, Math.abs(onSides(across, up, n)));
    }
    return worst;
  }

  /** The relative deviation with one law, with its sign. */
  public static double onRadius(TraverseLine line, double n) {
    double truth = 2 * n * n / ((n + 1) * (2 * n + 1));
    return line.mean(r -> Math.pow(1 - r, 1 / n)) / truth - 1;
  }

  /** The same over a rectangle. */
  public static double onSides(TraverseLine across, TraverseLine up, double n) {
    double truth = n / (n + 1);
    double mean =
        across.mean(a -> Math.pow(2 * Math.min(a, 1 - a), 1 / n))
            * up.mean(a -> Math.pow(2 * Math.min(a, 1 - a), 1 / n));
    return mean / (truth * truth) - 1;
  }
}
