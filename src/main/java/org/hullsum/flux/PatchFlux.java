package org.hullsum.flux;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Integral;

/**
 * The flux by one statement through one patch, for the construction normal where it follows the
 * normal ({@link FluxBasis#followsNormal}), else from leaves to enters.
 *
 * @param value in working units; empty where it is unknown or the integrand is not finite
 * @param errorBound of the numerical integration; the true value lies within it
 * @param magnitude ∬|F·n| dS to 1 %, |rate| of a stated rate: what counts for the throughput
 * @param sensitivities derivative of the value by each uncertain input on which it depends, by the
 *     input's name
 * @param evaluations number of points at which the integrand was evaluated
 * @param status whether the accuracy asked for was reached
 * @param basis how it is known
 * @param nonFiniteAt where the integrand is not finite
 */
public record PatchFlux(
    Optional<Double> value,
    double errorBound,
    double magnitude,
    Map<String, Double> sensitivities,
    long evaluations,
    Integral.Status status,
    FluxBasis basis,
    Optional<Vector3> nonFiniteAt) {
  public PatchFlux {
    Objects.requireNonNull(value, "value");
    Objects.requireNonNull(status, "status");
    Objects.requireNonNull(basis, "basis");
    Objects.requireNonNull(nonFiniteAt, "nonFiniteAt");
    sensitivities = Collections.unmodifiableMap(new LinkedHashMap<>(sensitivities));
  }

  /** A rate that was stated, not integrated. */
  static PatchFlux stated(InputSensitivity.Evaluated rate, FluxBasis basis) {
    return new PatchFlux(
        Optional.of(rate.value()),
        0,
        Math.abs(rate.value()),
        rate.sensitivities(),
        0,
        Integral.Status.REACHED,
        basis,
        Optional.empty());
  }

  /** The same with an error bound of its own. */
  PatchFlux within(double bound) {
    return new PatchFlux(
        value, bound, magnitude, sensitivities, evaluations, status, basis, nonFiniteAt);
  }

  /** A flux that nobody knows. */
  static PatchFlux unknown() {
    return new PatchFlux(
        Optional.empty(),
        0,
        0,
        Map.of(),
        0,
        Integral.Status.REACHED,
        FluxBasis.UNKNOWN,
        Optional.empty());
  }

  /** This flux times a factor. */
  PatchFlux times(InputSensitivity.Evaluated factor) {
    double k = factor.value();
    Map<String, Double> derivatives = new LinkedHashMap<>();
    sensitivities.forEach((base, rate) -> derivatives.put(base, k * rate));
    value.ifPresent(
        flux ->
            factor
                .sensitivities()
                .forEach((base, rate) -> derivatives.merge(base, flux * rate, Double::sum)));
    return new PatchFlux(
        value.map(flux -> k * flux),
        Math.abs(k) * errorBound,
        Math.abs(k) * magnitude,
        derivatives,
        evaluations,
        status,
        basis,
        nonFiniteAt);
  }
}
