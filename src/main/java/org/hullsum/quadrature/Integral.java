package org.hullsum.quadrature;

import java.util.Optional;

/**
 * One component of an integral: what was found and how far it can be trusted.
 *
 * @param value the integral; NaN where {@code status} is {@link Status#NOT_FINITE}
 * @param errorBound the true integral lies within {@code value} ± {@code errorBound}; infinite
 *     where {@code status} is {@link Status#NOT_FINITE}
 * @param magnitude ∬|f|, to the magnitude accuracy that was asked for
 * @param evaluations number of points at which the integrand was evaluated, all components together
 * @param status whether the accuracy was reached
 * @param nonFiniteAt one place where a component was not finite, present exactly where {@code
 *     status} is {@link Status#NOT_FINITE}
 */
public record Integral(
    double value,
    double errorBound,
    double magnitude,
    long evaluations,
    Status status,
    Optional<ParameterPoint> nonFiniteAt) {
  /** Whether the accuracy that was asked for was reached. */
  public enum Status {
    /** The error bound and the magnitude are within the request. */
    REACHED,
    /** The work limit or the limit of rounding came first; the error bound still holds. */
    NOT_REACHED,
    /** The integrand was infinite or NaN at a point. */
    NOT_FINITE
  }

  /** An integral without any place where the integrand is not finite. */
  Integral(double value, double errorBound, double magnitude, long evaluations, Status status) {
    this(value, errorBound, magnitude, evaluations, status, Optional.empty());
  }

  /** The answer where the integrand was not finite at {@code place}. */
  static Integral notFinite(ParameterPoint place, long evaluations) {
    return new Integral(
        Double.NaN,
        Double.POSITIVE_INFINITY,
        Double.NaN,
        evaluations,
        Status.NOT_FINITE,
        Optional.of(place));
  }

  /** Whether the accuracy that was asked for was reached. */
  public boolean reached() {
    return status == Status.REACHED;
  }
}
