package org.hullsum.audit;

import java.util.Locale;

/** What an audit says of a balance, a case or a run; the later the graver. */
public enum Verdict {
  BALANCED,
  UNDECIDED,
  IMBALANCED;

  /** The word of the result document. */
  public String word() {
    return name().toLowerCase(Locale.ROOT);
  }

  /** The graver of two. */
  public Verdict and(Verdict other) {
    return compareTo(other) >= 0 ? this : other;
  }
}
