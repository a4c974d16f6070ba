package org.hullsum.flux;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.apache.commons.numbers.core.Sum;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Integral;

/** The sums over all charts: per density, of |g| of the first, and of the inner error. */
final class DensityTotals {
  private final int densities;
  private final Sum[] sums;
  private final double[] bounds;
  private double magnitude;
  private long evaluations;
  private Integral.Status status = Integral.Status.REACHED;
  private Optional<Vector3> nonFiniteAt = Optional.empty();

  DensityTotals(int densities) {
    this.densities = densities;
    sums = new Sum[RayIntegrals.rows(densities)];
    bounds = new double[sums.length];
    for (int k = 0; k < sums.length; k++) {
      sums[k] = Sum.create();
    }
  }

  /** Adds the integrals of one chart, in the order of the rows of {@link RayIntegrals}. */
  void add(Integral[] parts) {
    for (int k = 0; k < sums.length; k++) {
      sums[k].add(parts[k].value());
      bounds[k] += parts[k].errorBound();
    }
    magnitude = Math.abs(sums[densities].getAsDouble());
    evaluations += parts[0].evaluations();
    status = parts[0].reached() ? status : parts[0].status();
  }

  DensityTotals notFinite(Vector3 place) {
    nonFiniteAt = Optional.of(place);
    return this;
  }

  DensityTotals spent(long more) {
    evaluations += more;
    return this;
  }

  void replaceMagnitude(double measured) {
    magnitude = Math.abs(measured);
  }

  boolean isFinite() {
    return nonFiniteAt.isEmpty();
  }

  /** The bound of the outer integral and, for the first density, that of the inner ones. */
  double errorBound(int density) {
    double inner = Math.abs(sums[densities + 1].getAsDouble()) + bounds[densities + 1];
    return bounds[density] + (density == 0 ? inner : 0);
  }

  double magnitude() {
    return magnitude;
  }

  double magnitudeError() {
    return bounds[densities];
  }

  long evaluations() {
    return evaluations;
  }

  DensityOutcome outcome() {
    List<Double> values = new ArrayList<>();
    List<Double> errors = new ArrayList<>();
    for (int k = 0; k < densities; k++) {
      values.add(sums[k].getAsDouble());
      errors.add(errorBound(k));
    }
    Integral.Status reached = isFinite() ? status : Integral.Status.NOT_FINITE;
    return new DensityOutcome(values, errors, magnitude, evaluations, reached, nonFiniteAt);
  }
}
