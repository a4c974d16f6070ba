package org.hullsum.quadrature;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;

/**
 * The rules by which the mean velocity over a duct's section is taken from readings at a few
 * points: where they stand, and with which weights.
 *
 * <ul>
 *   <li>log-linear, round sections: each ring of equal area has the law u = a + b ln y + c y of the
 *       distance y from the wall; the positions are those that ISO 3966 and ISO 3354 print (from
 *       memory; in diameters from the wall also ISO 5802:2001, tables 2 and 3)
 *   <li>log-Tchebycheff: the ring, or strip, of equal area at a wall has the law u = a + b ln y,
 *       whose mean it takes at one point; the rest has a polynomial, by Tchebycheff's rule of equal
 *       weights. Computed; to the printed digits these are the positions of ISO 3966 (from memory)
 *       and of EN 12599 for rectangles
 *   <li>equal-area: the middles, by area, of rings or strips of equal area (the tangential method);
 *       40 CFR 60, appendix A-1, method 1
 *   <li>gauss: the Gauss–Legendre rule in area
 * </ul>
 *
 * <p>With y the distance from the wall and a ring that ends at y = b, the log law's mean is taken
 * where ln y = [2 (b ln b − b) − b² ln b + b²/2] / (1 − (1 − b)²), all in radii; in a strip of
 * width b where y = b/e.
 */
public enum TraverseRule {
  LOG_LINEAR(3, 5, 0, 0),
  LOG_TCHEBYCHEFF(3, 5, 5, 7),
  EQUAL_AREA(1, 32, 1, 32),
  GAUSS(1, 16, 1, 16);

  private final int fewestOnRadius;
  private final int mostOnRadius;
  private final int fewestOnSide;
  private final int mostOnSide;

  TraverseRule(int fewestOnRadius, int mostOnRadius, int fewestOnSide, int mostOnSide) {
    this.fewestOnRadius = fewestOnRadius;
    this.mostOnRadius = mostOnRadius;
    this.fewestOnSide = fewestOnSide;
    this.mostOnSide = mostOnSide;
  }

  /** The rule of a word of the case format. */
  public static Optional<TraverseRule> of(String word) {
    return Arrays.stream(values()).filter(r -> r.word().equals(word)).findFirst();
  }

  /** The word of the case format, such as {@code log-linear}. */
  public String word() {
    return name().toLowerCase(Locale.ROOT).replace('_', '-');
  }

  /** Whether there is a set of so many points on a radius. */
  public boolean onRadius(int count) {
    return count >= fewestOnRadius && count <= mostOnRadius;
  }

  /** Whether there is a set of so many points along a side. */
  public boolean onSide(int count) {
    return count >= Math.max(1, fewestOnSide) && count <= mostOnSide;
  }

  /** Whether it is defined for rectangles. */
  public boolean forRectangles() {
    return mostOnSide > 0;
  }

  /** How many points it has on a radius, such as {@code 3 to 5}. */
  public String countsOnRadius() {
    return fewestOnRadius + " to " + mostOnRadius;
  }

  /** How many points it has along a side, such as {@code 5 to 7}. */
  public String countsOnSide() {
    return fewestOnSide + " to " + mostOnSide;
  }

  /** The standard that the positions are from. */
  public String source() {
    return switch (this) {
      case LOG_LINEAR -> "ISO 3966, ISO 3354";
      case LOG_TCHEBYCHEFF -> "ISO 3966";
      case EQUAL_AREA -> "40 CFR 60 appendix A-1, method 1";
      case GAUSS -> "Gauss-Legendre in area";
    };
  }

  /**
   * The points on a radius, as shares of it from the centre.
   *
   * @throws IllegalArgumentException unless {@link #onRadius}
   */
  public TraverseLine radius(int count) {
    if (!onRadius(count)) {
      throw new IllegalArgumentException(word() + " has no set of " + count + " on a radius");
    }
    return switch (this) {
      case LOG_LINEAR -> TraverseLine.equal(logLinear(count));
      case LOG_TCHEBYCHEFF -> TraverseLine.equal(logTchebycheffOnRadius(count));
      case EQUAL_AREA -> TraverseLine.equal(roots(middles(count)));
      case GAUSS -> gauss(count, true);
    };
  }

  /**
   * The points along a side, as shares of it.
   *
   * @throws IllegalArgumentException unless {@link #onSide}
   */
  public TraverseLine side(int count) {
    if (!onSide(count)) {
      throw new IllegalArgumentException(word() + " has no set of " + count + " along a side");
    }
    return switch (this) {
      case LOG_TCHEBYCHEFF -> TraverseLine.equal(logTchebycheffOnSide(count));
      case GAUSS -> gauss(count, false);
      default -> TraverseLine.equal(middles(count));
    };
  }

  private static double[] logLinear(int count) {
    return switch (count) {
      case 3 -> new double[] {0.3586, 0.7302, 0.9358};
      case 4 -> new double[] {0.3102, 0.6332, 0.7670, 0.9584};
      default -> new double[] {0.2776, 0.5658, 0.6950, 0.8470, 0.9622};
    };
  }

  private static double[] logTchebycheffOnRadius(int count) {
    double[] nodes = tchebycheff(count - 1);
    double inner = (count - 1.0) / count;
    double[] positions = new double[count];
    for (int i = 0; i < nodes.length; i++) {
      positions[i] = Math.sqrt(inner * 0.5 * (1 + nodes[i]));
    }
    double b = 1 - Math.sqrt(inner);
    double logarithm = Math.log(b);
    double sum = 2 * (b * logarithm - b) - b * b * logarithm + 0.5 * b * b;
    positions[count - 1] = 1 - Math.exp(count * sum);
    return positions;
  }

  private static double[] logTchebycheffOnSide(int count) {
    double[] nodes = tchebycheff(count - 2);
    double strip = 1.0 / count;
    double[] positions = new double[count];
    positions[0] = strip / Math.E;
    positions[count - 1] = 1 - positions[0];
    for (int i = 0; i < nodes.length; i++) {
      positions[i + 1] = 0.5 + (0.5 - strip) * nodes[i];
    }
    return positions;
  }

  /**
   * The nodes on [−1, 1] of the rule of equal weights that is exact up to degree {@code count}, 2
   * to 5 of them (P. L. Tchebycheff, 1874; Abramowitz and Stegun, 25.4.28).
   */
  private static double[] tchebycheff(int count) {
    return switch (count) {
      case 2 -> symmetric(Math.sqrt(1 / 3.0));
      case 3 -> symmetric(Math.sqrt(0.5), 0);
      case 4 ->
          symmetric(Math.sqrt((1 + 2 / Math.sqrt(5)) / 3), Math.sqrt((1 - 2 / Math.sqrt(5)) / 3));
      default ->
          symmetric(Math.sqrt((5 + Math.sqrt(11)) / 12), Math.sqrt((5 - Math.sqrt(11)) / 12), 0);
    };
  }

  private static double[] symmetric(double... falling) {
    boolean middle = falling[falling.length - 1] == 0;
    double[] nodes = new double[2 * falling.length - (middle ? 1 : 0)];
    for (int i = 0; i < falling.length; i++) {
      nodes[nodes.length - 1 - i] = falling[i];
      nodes[i] = middle && i == falling.length - 1 ? 0 : -falling[i];
    }
    return nodes;
  }

  private static double[] middles(int count) {
    double[] middles = new double[count];
    for (int i = 0; i < count; i++) {
      middles[i] = (i + 0.5) / count;
    }
    return middles;
  }

  private static double[] roots(double[] areas) {
    return Arrays.stream(areas).map(Math::sqrt).toArray();
  }

  private static TraverseLine gauss(int count, boolean inArea) {
    GaussRule rule = GaussRule.of(count);
    double[] nodes = rule.nodes();
    return new TraverseLine(
        Arrays.stream(inArea ? roots(nodes) : nodes).boxed().toList(),
        Arrays.stream(rule.weights()).boxed().toList());
  }
}
