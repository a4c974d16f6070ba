package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * One interior term of a volume at one instant, or on average, with the sign in which it enters the
 * interior, in the rate unit of the case.
 *
 * @param volume its volume
 * @param kind {@code divergence}, {@code generation} or {@code accumulation}
 * @param value empty where it could not be computed
 * @param magnitude ∭|g| for a density, the size of a stated rate, to 1 %
 * @param accurate whether the integral reached the accuracy asked for
 * @param route {@code cones}, {@code columns}, {@code stated}
 * @param formula what was integrated, for people
 * @param missing why there is no value
 */
record InteriorRate(
    String volume,
    String kind,
    Optional<Estimate> value,
    double magnitude,
    boolean accurate,
    String route,
    Optional<String> formula,
    Optional<String> missing) {
  InteriorRate {
    Objects.requireNonNull(volume, "volume");
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(route, "route");
    Objects.requireNonNull(formula, "formula");
    if (value.isPresent() == missing.isPresent()) {
      throw new IllegalArgumentException("an interior term has a value or a reason for none");
    }
  }

  /** The same with a larger error bound. */
  InteriorRate widened(double error) {
    return new InteriorRate(
        volume,
        kind,
        value.map(v -> v.widened(error)),
        magnitude,
        accurate,
        route,
        formula,
        missing);
  }

  /** The sum over the volumes of an envelope, each with a value. */
  static InteriorRate sum(String envelope, List<InteriorRate> rates) {
    InteriorRate first = rates.get(0);
    boolean alike = rates.stream().allMatch(r -> r.formula.equals(first.formula));
    return new InteriorRate(
        envelope,
        first.kind,
        Optional.of(Estimate.sum(rates.stream().map(r -> r.value.orElseThrow()).toList())),
        rates.stream().mapToDouble(InteriorRate::magnitude).sum(),
        rates.stream().allMatch(InteriorRate::accurate),
        first.route,
        alike ? first.formula : Optional.empty(),
        Optional.empty());
  }

  /** The mean of one term's rates at the instants of an interval. */
  static InteriorRate mean(List<InteriorRate> rates, TimeMean mean) {
    InteriorRate first = rates.get(0);
    List<Estimate> values = new ArrayList<>();
    rates.forEach(r -> r.value.ifPresent(values::add));
    Optional<String> missing = rates.stream().flatMap(r -> r.missing.stream()).findFirst();
    return new InteriorRate(
        first.volume,
        first.kind,
        missing.isPresent() ? Optional.empty() : Optional.of(mean.of(values)),
        mean.of(rates.stream().mapToDouble(InteriorRate::magnitude).toArray()),
        rates.stream().allMatch(InteriorRate::accurate),
        first.route,
        first.formula,
        missing);
  }
}
