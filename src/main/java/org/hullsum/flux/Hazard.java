package org.hullsum.flux;

import java.util.List;
import java.util.Objects;
import org.hullsum.expression.Expression;
import org.hullsum.numeric.Interval;

/**
 * A place in a formula where it may cease to be defined.
 *
 * @param argument what must stay out of the forbidden range
 * @param kind what is forbidden
 * @param part the part of the formula that is then undefined or unbounded
 * @param guards conditions under which the part counts at all
 */
record Hazard(Expression argument, Kind kind, Expression part, List<Guard> guards) {
  /** A rounding of functions that come near the end of a domain, such as acos(z/r) on the axis. */
  private static final double DOMAIN_SLACK = 1e-9;

  /** What an argument must not be. */
  enum Kind {
    /** A denominator. */
    ZERO {
      @Override
      boolean possible(Interval argument) {
        return argument.contains(0);
      }
    },
    /** The argument of a root. */
    NEGATIVE {
      @Override
      boolean possible(Interval argument) {
        return argument.low() < -Double.MIN_NORMAL;
      }
    },
    /** The argument of a logarithm, or the base of a negative fractional power. */
    NOT_POSITIVE {
      @Override
      boolean possible(Interval argument) {
        return argument.low() <= 0;
      }
    },
    /** The argument of asin or acos. */
    BEYOND_ONE {
      @Override
      boolean possible(Interval argument) {
        return argument.magnitude() > 1 + DOMAIN_SLACK;
      }
    };

    /** Whether some value of the interval is forbidden. */
    abstract boolean possible(Interval argument);
  }

  /**
   * A condition of an {@code if}.
   *
   * @param condition with value 1 or 0
   * @param holds the value under which the guarded part is used
   */
  record Guard(Expression condition, boolean holds) {
    /** Whether the part may be used where the condition's value is in the interval. */
    boolean possible(Interval value) {
      return value.contains(holds ? 1 : 0);
    }
  }

  Hazard {
    Objects.requireNonNull(argument, "argument");
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(part, "part");
    guards = List.copyOf(guards);
  }
}
