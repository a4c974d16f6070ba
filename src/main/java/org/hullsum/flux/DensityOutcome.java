package org.hullsum.flux;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Integral;

/**
 * The volume integrals of several densities by one route.
 *
 * @param values by density
 * @param errorBounds by density
 * @param magnitude ∭|g| of the first density
 * @param evaluations number of points of the boundary
 * @param status of the first density
 * @param nonFiniteAt a place of the boundary where the integrand is not finite
 */
record DensityOutcome(
    List<Double> values,
    List<Double> errorBounds,
    double magnitude,
    long evaluations,
    Integral.Status status,
    Optional<Vector3> nonFiniteAt) {
  DensityOutcome {
    values = List.copyOf(values);
    errorBounds = List.copyOf(errorBounds);
    Objects.requireNonNull(status, "status");
    Objects.requireNonNull(nonFiniteAt, "nonFiniteAt");
  }

  boolean reached() {
    return status == Integral.Status.REACHED;
  }

  boolean isFinite() {
    return nonFiniteAt.isEmpty() && Double.isFinite(values.get(0));
  }

  /** The same with a larger error bound of the first density, and not what was asked for. */
  DensityOutcome doubted(double errorBound) {
    List<Double> bounds = new java.util.ArrayList<>(errorBounds);
    bounds.set(0, Math.max(errorBound, bounds.get(0)));
    return new DensityOutcome(
        values, bounds, magnitude, evaluations, Integral.Status.NOT_REACHED, nonFiniteAt);
  }
}
