package org.hullsum.audit;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.audit.BalanceResult.Check;
import org.hullsum.model.Input;
import org.hullsum.model.Inputs;
import org.hullsum.model.Tolerances;
import org.hullsum.problem.Place;

/** Rates and subjects of small balances, by hand. */
final class BalanceFixture {
  static final BalanceBuilder.RateNames NAMES = new BalanceBuilder.RateNames("volume", "m3/h");
  static final Inputs EXACT = new Inputs(Map.of(), List.of());

  private BalanceFixture() {}

  static PatchRate metered(String patch, String leaves, String enters, double value) {
    return rate(patch, leaves, enters, Estimate.exact(value), false);
  }

  static PatchRate uncertain(
      String patch, String leaves, String enters, double value, String source) {
    return rate(patch, leaves, enters, new Estimate(value, 0, Map.of(source, 1.0)), false);
  }

  static PatchRate integrated(String patch, String leaves, String enters, double value) {
    return rate(patch, leaves, enters, Estimate.exact(value), true);
  }

  private static PatchRate rate(
      String patch, String leaves, String enters, Estimate total, boolean integrated) {
    return new PatchRate(
        patch,
        leaves,
        enters,
        Optional.of(total),
        integrated ? total : Estimate.ZERO,
        integrated,
        Math.abs(total.value()),
        true,
        Optional.empty());
  }

  static PatchRate unknown(String patch, String leaves, String enters) {
    return new PatchRate(
        patch, leaves, enters, Optional.empty(), Estimate.ZERO, false, 0, true, Optional.empty());
  }

  static InteriorRate generation(String volume, double value) {
    return new InteriorRate(
        volume,
        "generation",
        Optional.of(Estimate.exact(value)),
        Math.abs(value),
        true,
        "stated",
        Optional.empty(),
        Optional.empty());
  }

  static BalanceSubject volume(String name) {
    return subject(name, Set.of(name), Tolerances.NONE);
  }

  static BalanceSubject subject(String name, Set<String> members, Tolerances tolerances) {
    return new BalanceSubject(
        name,
        Optional.empty(),
        members.size() > 1,
        members,
        Check.CONSERVATION,
        tolerances,
        Optional.empty(),
        Optional.empty());
  }

  static BalanceSubject open(String name) {
    return new BalanceSubject(
        name,
        Optional.empty(),
        false,
        Set.of(name),
        Check.CONSERVATION,
        Tolerances.NONE,
        Optional.of("the surface of `" + name + "` is open"),
        Optional.empty());
  }

  static Inputs inputs(Map<String, Double> uncertainties) {
    Map<String, Input> all = new LinkedHashMap<>();
    uncertainties.forEach(
        (name, u) ->
            all.put(
                name,
                new Input(
                    name,
                    1,
                    u,
                    Double.POSITIVE_INFINITY,
                    Optional.empty(),
                    true,
                    Place.wholeFile("case.yaml"))));
    return new Inputs(all, List.of());
  }

  static Balance drawn(BalanceSubject subject, PatchRate... rates) {
    return new BalanceBuilder(subject, List.of(rates), EXACT, NAMES).draw();
  }
}
