package org.hullsum.audit;

import java.util.Comparator;
import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * One supposed cause, before it is ranked.
 *
 * @param kind what would be wrong
 * @param rank the class: 1 shown by geometry or computation, 2 without a free number, 3 with one
 *     fitted number
 * @param on names
 * @param factor supposed, where there is one
 * @param then the residual if it were true
 * @param fits whether that can't be told from zero, and no other balance speaks against it
 * @param unlikelihood orders those that fit: the larger the less likely
 * @param message one or two sentences
 */
record Hypothesis(
    Explanation.Kind kind,
    int rank,
    List<String> on,
    Optional<Double> factor,
    double then,
    boolean fits,
    double unlikelihood,
    String message) {
  /** Shown by geometry or computation. */
  static final int SHOWN = 1;

  /** Without a free number. */
  static final int FREE_OF_NUMBERS = 2;

  /** With one number that is fitted. */
  static final int FITTED = 3;

  Hypothesis {
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(message, "message");
    on = List.copyOf(on);
  }

  /**
   * By class; inside it first those that fit, what is shown in the order of the kinds, the others
   * the likeliest first; then patches shown to face the wrong way, all together before one, where
   * turning them matters; then by what is left of the residual. Equal ones stay in the order of the
   * case.
   *
   * @param now the residual as it stands
   * @param halfWidth w of the balance
   */
  static Comparator<Hypothesis> ranking(double now, double halfWidth) {
    return Comparator.comparingInt(Hypothesis::rank)
        .thenComparing(h -> !h.fits)
        .thenComparingInt(h -> h.fits && h.rank != FREE_OF_NUMBERS ? h.kind.ordinal() : 0)
        .thenComparingDouble(h -> h.fits && h.rank != SHOWN ? h.unlikelihood : 0)
        .thenComparingInt(h -> h.fits ? h.kind.ordinal() : 0)
        .thenComparingInt(h -> h.isShownReversal(now, halfWidth) ? -h.on.size() : 0)
        .thenComparingDouble(h -> Math.abs(h.then));
  }

  private boolean isShownReversal(double now, double halfWidth) {
    return kind == Explanation.Kind.REVERSED && rank == SHOWN && Math.abs(then - now) > halfWidth;
  }
}
