package org.hullsum.quadrature;

/**
 * How well an integral is to be known and how much work may be spent on it.
 *
 * <p>The error of a component f is to be at most max({@code absolute}, {@code relative}·∬|f|). The
 * relative part refers to the magnitude ∬|f|, so cancellation within an integral asks for no more
 * digits than the integrand carries.
 *
 * @param relative error relative to ∬|f|, at least 0
 * @param absolute error in the integral's own unit, at least 0
 * @param magnitudeRelative relative error of ∬|f| itself, above 0
 * @param evaluationLimit largest number of points at which the integrand is evaluated
 */
public record Accuracy(
    double relative, double absolute, double magnitudeRelative, long evaluationLimit) {
  /** Half of the one per cent that a magnitude is quoted to. */
  public static final double USUAL_MAGNITUDE = 0.005;

  public static final long USUAL_LIMIT = 2_000_000;

  public Accuracy {
    if (!(relative >= 0) || !(absolute >= 0) || relative + absolute == 0) {
      throw new IllegalArgumentException(
          "accuracy must be positive: relative " + relative + ", absolute " + absolute);
    }
    if (!(magnitudeRelative > 0)) {
      throw new IllegalArgumentException("magnitude accuracy " + magnitudeRelative);
    }
    if (evaluationLimit < 1) {
      throw new IllegalArgumentException("evaluation limit " + evaluationLimit);
    }
  }

  /** The given accuracy relative to ∬|f|, with the usual magnitude accuracy and work limit. */
  public static Accuracy relative(double relative) {
    return new Accuracy(relative, 0, USUAL_MAGNITUDE, USUAL_LIMIT);
  }

  /** The error allowed for a component of the given magnitude ∬|f|. */
  double tolerance(double magnitude) {
    return Math.max(absolute, relative * magnitude);
  }

  /** The error allowed for the magnitude itself; what is negligible needs no magnitude. */
  double magnitudeTolerance(double magnitude) {
    return Math.max(absolute, magnitudeRelative * magnitude);
  }
}
