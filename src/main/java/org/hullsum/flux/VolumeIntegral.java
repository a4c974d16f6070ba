package org.hullsum.flux;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Integral;

/**
 * The integral of a density over the region that a boundary encloses.
 *
 * @param value in working units; empty where the density is not finite
 * @param errorBound the true value lies within it
 * @param magnitude ∭|g| dV to 1 %: what counts for the throughput
 * @param sensitivities derivative of the value by each uncertain input on which it depends
 * @param evaluations number of points of the boundary, or of lines, that were evaluated
 * @param status whether the accuracy asked for was reached
 * @param route how it was computed
 * @param apex the common apex of the cones
 * @param nonFiniteAt a place where the density is not finite on every route
 */
public record VolumeIntegral(
    Optional<Double> value,
    double errorBound,
    double magnitude,
    Map<String, Double> sensitivities,
    long evaluations,
    Integral.Status status,
    Route route,
    Optional<Vector3> apex,
    Optional<Vector3> nonFiniteAt) {
  /** The routes from a boundary to a volume integral. */
  public enum Route {
    /** Signed cones from one point to the boundary. */
    CONES,
    /** Lines along an axis, integrated where they are inside. */
    COLUMNS;

    /** The word of the result document. */
    public String word() {
      return name().toLowerCase(Locale.ROOT);
    }
  }

  public VolumeIntegral {
    Objects.requireNonNull(value, "value");
    Objects.requireNonNull(status, "status");
    Objects.requireNonNull(route, "route");
    Objects.requireNonNull(apex, "apex");
    Objects.requireNonNull(nonFiniteAt, "nonFiniteAt");
    sensitivities = Collections.unmodifiableMap(new LinkedHashMap<>(sensitivities));
  }
}
