package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * What flows through one patch at one instant, or on average, from {@code leaves} to {@code
 * enters}, in the rate unit of the case.
 *
 * @param patch its name
 * @param leaves the volume behind
 * @param enters the volume ahead
 * @param total the sum of its fluxes; empty where it is unknown or could not be computed
 * @param following the part of the total that follows the normal, and so turns with the facing
 * @param integrated whether a part of it is an integral over the surface
 * @param magnitude Σ of ∬|F·n| dS of integrated fluxes and of the sizes of metered ones, to 1 %
 * @param accurate whether the integrals reached the accuracy asked for
 * @param missing why there is no total; empty where it is merely not measured
 */
record PatchRate(
    String patch,
    String leaves,
    String enters,
    Optional<Estimate> total,
    Estimate following,
    boolean integrated,
    double magnitude,
    boolean accurate,
    Optional<String> missing) {
  PatchRate {
    Objects.requireNonNull(patch, "patch");
    Objects.requireNonNull(leaves, "leaves");
    Objects.requireNonNull(enters, "enters");
    Objects.requireNonNull(total, "total");
    Objects.requireNonNull(following, "following");
    Objects.requireNonNull(missing, "missing");
    if (total.isPresent() && missing.isPresent()) {
      throw new IllegalArgumentException(patch + " has a total and a reason for having none");
    }
  }

  boolean unknown() {
    return total.isEmpty() && missing.isEmpty();
  }

  /** The same with a larger error bound. */
  PatchRate widened(double error) {
    return new PatchRate(
        patch,
        leaves,
        enters,
        total.map(t -> t.widened(error)),
        following,
        integrated,
        magnitude,
        accurate,
        missing);
  }

  /** The mean of one patch's rates at the instants of an interval. */
  static PatchRate mean(List<PatchRate> rates, TimeMean mean) {
    PatchRate first = rates.get(0);
    List<Estimate> totals = new ArrayList<>();
    rates.forEach(r -> r.total.ifPresent(totals::add));
    boolean whole = totals.size() == rates.size();
    return new PatchRate(
        first.patch,
        first.leaves,
        first.enters,
        whole ? Optional.of(mean.of(totals)) : Optional.empty(),
        mean.of(rates.stream().map(PatchRate::following).toList()),
        first.integrated,
        mean.of(rates.stream().mapToDouble(PatchRate::magnitude).toArray()),
        rates.stream().allMatch(PatchRate::accurate),
        rates.stream().flatMap(r -> r.missing.stream()).findFirst());
  }
}
