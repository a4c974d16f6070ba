package org.hullsum.audit;

import java.util.Comparator;
import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * One supposed cause, before it is ranked.
 *
 * @param kind what would be wrong
 * @param rank the class: 1 shown by geometry or computation, 2 without a free number
 * @param on names
 * @param factor supposed, where there is one
 * @param then the residual if it were true
 * @param slack numerical error of {@code then} beyond that of the residual
 * @param message one or two sentences
 */
record Hypothesis(
    Explanation.Kind kind,
    int rank,
    List<String> on,
    Optional<Double> factor,
    double then,
    double slack,
    String message) {
  /** Shown by geometry or computation. */
  static final int SHOWN = 1;

  /** Without a free number. */
  static final int FREE_OF_NUMBERS = 2;

  Hypothesis {
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(message, "message");
    on = List.copyOf(on);
  }

  boolean fits(double halfWidth) {
    return Math.abs(then) <= halfWidth + slack;
  }

  /**
   * By class; inside it first those that fit, in the order of the kinds; then patches shown to face
   * the wrong way, all together before one, where turning them matters; then by what is left of the
   * residual. Equal ones stay in the order of the case.
   *
   * @param now the residual as it stands
   * @param halfWidth w of the balance
   */
  static Comparator<Hypothesis> ranking(double now, double halfWidth) {
    return Comparator.comparingInt(Hypothesis::rank)
        .thenComparing(h -> !h.fits(halfWidth))
        .thenComparingInt(h -> h.fits(halfWidth) ? h.kind.ordinal() : 0)
        .thenComparingInt(h -> h.isShownReversal(now, halfWidth) ? -h.on.size() : 0)
        .thenComparingDouble(h -> Math.abs(h.then));
  }

  private boolean isShownReversal(double now, double halfWidth) {
    return kind == Explanation.Kind.REVERSED && rank == SHOWN && Math.abs(then - now) > halfWidth;
  }
}
