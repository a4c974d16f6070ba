package org.hullsum.audit;

import java.time.LocalDate;
import java.util.Objects;

/**
 * How a case is audited; none of it but {@code digits}, {@code today} and {@code secondOpinion} can
 * change a result.
 *
 * @param digits integrals are asked for to 10^−digits of ∬|F·n| dS of the patch, or of ∭|g|, 1 to
 *     {@value #MOST_DIGITS}
 * @param threads at least 1
 * @param today the day on which waivers are valid or expired
 * @param progress told of every finished piece of work
 * @param secondOpinion whether winding numbers are asked of every facing, not only where nothing
 *     else tells
 */
public record AuditOptions(
    int digits, int threads, LocalDate today, ProgressListener progress, boolean secondOpinion) {
  /** The accuracy unless asked for. */
  public static final int USUAL_DIGITS = 8;

  /** Beyond this, rounding rules. */
  public static final int MOST_DIGITS = 14;

  public AuditOptions {
    Objects.requireNonNull(today, "today");
    Objects.requireNonNull(progress, "progress");
    if (digits < 1 || digits > MOST_DIGITS) {
      throw new IllegalArgumentException("digits " + digits + ", not 1 to " + MOST_DIGITS);
    }
    if (threads < 1) {
      throw new IllegalArgumentException("threads " + threads);
    }
  }

  /** The usual accuracy on one thread, silently. */
  public static AuditOptions usual(LocalDate today) {
    return new AuditOptions(USUAL_DIGITS, 1, today, ProgressListener.SILENT, false);
  }
}
