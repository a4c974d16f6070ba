package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.function.BiFunction;
import java.util.function.ToDoubleFunction;

/**
 * The rounding of rates that change with the time.
 *
 * <p>Where a rate passes through zero, its formula still rounds as it does at its peak: the cosine
 * of a phase near a quarter turn is known to the phase's own rounding, not to its own size. So the
 * error bound at every instant takes in a rounding of the peak.
 */
final class InstantRounding {
  /** A few roundings in the phase of a rate, relative to its peak. */
  private static final double ROUNDING = 16 * Math.ulp(1.0);

  private InstantRounding() {}

  /** The rates of every patch, by the instant. */
  static List<List<PatchRate>> ofPatches(List<List<PatchRate>> rates) {
    return widened(rates, PatchRate::magnitude, PatchRate::widened);
  }

  static InteriorAudit of(InteriorAudit audit) {
    List<List<InteriorRate>> divergence =
        widened(
            audit.divergence().stream().map(List::of).toList(),
            InteriorRate::magnitude,
            InteriorRate::widened);
    return new InteriorAudit(
        audit.volume(),
        widened(audit.terms(), InteriorRate::magnitude, InteriorRate::widened),
        divergence.stream().map(d -> d.get(0)).toList(),
        audit.fields(),
        audit.faults());
  }

  private static <T> List<List<T>> widened(
      List<List<T>> byInstant, ToDoubleFunction<T> magnitude, BiFunction<T, Double, T> widen) {
    if (byInstant.size() < 2) {
      return byInstant;
    }
    double[] peaks = new double[byInstant.get(0).size()];
    for (List<T> now : byInstant) {
      for (int k = 0; k < peaks.length; k++) {
        peaks[k] = Math.max(peaks[k], magnitude.applyAsDouble(now.get(k)));
      }
    }
    List<List<T>> result = new ArrayList<>();
    for (List<T> now : byInstant) {
      List<T> wider = new ArrayList<>();
      for (int k = 0; k < peaks.length; k++) {
        wider.add(widen.apply(now.get(k), ROUNDING * peaks[k]));
      }
      result.add(List.copyOf(wider));
    }
    return result;
  }
}
