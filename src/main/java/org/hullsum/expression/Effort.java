package org.hullsum.expression;

/** A bound on work: when it is spent, what was being made is thrown away. */
final class Effort {
  private final long allowed;
  private long left;

  Effort(long allowed) {
    this.allowed = allowed;
    this.left = allowed;
  }

  /** Takes some; false where none is left. */
  boolean spend(long units) {
    left -= units;
    return left >= 0;
  }

  /** Ends the work. */
  void giveUp() {
    left = -1;
  }

  /** How much was taken in all. */
  long taken() {
    return allowed - left;
  }

  boolean spent() {
    return left < 0;
  }
}
