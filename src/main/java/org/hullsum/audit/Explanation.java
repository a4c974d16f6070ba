package org.hullsum.audit;

import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.Optional;

/**
 * A hypothesis of one cause that would make a residual vanish.
 *
 * @param kind what would be wrong
 * @param balance the volume or envelope whose residual it explains
 * @param on the patches; for a field that makes mass the field; empty for a flow that the case does
 *     not name
 * @param factor the factor supposed, where there is one
 * @param residualNow the residual as it stands
 * @param residualThen the residual if the hypothesis were true
 * @param explained max(0, 1 − |residualThen| / |residualNow|)
 * @param fits whether |residualThen| is within the balance's w
 * @param tiedWith indices of the explanations that fit equally well, within the same class
 * @param message one or two sentences
 */
public record Explanation(
    Kind kind,
    String balance,
    List<String> on,
    Optional<Double> factor,
    Optional<Double> residualNow,
    double residualThen,
    double explained,
    boolean fits,
    List<Integer> tiedWith,
    String message) {

  /** The kinds of hypotheses. */
  public enum Kind {
    REVERSED,
    GAP,
    FIELD_MAKES_SOURCE,
    COUNTED_TWICE,
    RADIUS_FOR_DIAMETER,
    UNIT_SLIP,
    DENSITY_LEFT_OUT,
    STALE_LEVEL,
    ONE_METER_BIAS,
    LEAK,
    LEFT_OUT;

    /** The word of the result document. */
    public String word() {
      return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }
  }

  public Explanation {
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(balance, "balance");
    Objects.requireNonNull(message, "message");
    on = List.copyOf(on);
    tiedWith = List.copyOf(tiedWith);
  }
}
