package org.hullsum.expression;

import java.util.Objects;

/**
 * A place in a formula where its value may be undefined.
 *
 * @param kind what would make it so
 * @param expression the divisor, the argument or the base concerned
 */
public record Hazard(Kind kind, Expression expression) {
  public Hazard {
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(expression, "expression");
  }

  /** What makes a value undefined. */
  public enum Kind {
    /** A divisor that is zero. */
    DIVISOR("zero"),
    /** An argument of a logarithm that is not positive. */
    LOGARITHM("not positive"),
    /** An argument of a square root that is negative. */
    ROOT("negative"),
    /**
     * A base of a power with a broken or varying exponent that is negative, or zero to a negative
     * exponent.
     */
    POWER("negative"),
    /** An argument of asin or acos outside −1 to 1. */
    ARC("outside -1 to 1"),
    /** An argument of tan at an odd multiple of π/2. */
    TANGENT("an odd multiple of pi/2");

    private final String where;

    Kind(String where) {
      this.where = where;
    }

    /** What the expression is where the value is undefined, such as {@code zero}. */
    public String where() {
      return where;
    }
  }

  /** Such as {@code x^2 + y^2 is zero}. */
  @Override
  public String toString() {
    return Printer.print(expression) + " is " + kind.where();
  }
}
