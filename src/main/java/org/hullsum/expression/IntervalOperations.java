package org.hullsum.expression;

import java.util.function.DoubleUnaryOperator;
import org.hullsum.numeric.ErrorFunction;
import org.hullsum.numeric.Interval;

/**
 * The operations of a tape over intervals: each result contains every value of the operation on
 * members where it is defined. Where it is defined nowhere, nothing is known: all reals.
 */
final class IntervalOperations {
  private static final Interval FALSE = Interval.point(0);
  private static final Interval TRUE = Interval.point(1);
  private static final Interval SIGNS = new Interval(-1, 1);
  private static final Interval ANY_ANGLE = Interval.outward(-Math.PI, Math.PI);

  /** Beyond this the reduction of angles is not looked into. */
  private static final double LARGE_ANGLE = 1e9;

  /** Rounding of an angle over a turn. */
  private static final double TURN_ROUNDING = 1e-14;

  private static final int LIBRARY_ULPS = 2;
  private static final int ERROR_FUNCTION_ULPS = 64;

  private IntervalOperations() {}

  static Interval apply(Operation operation, Interval a, Interval b, Interval c, double value) {
    return switch (operation) {
      case INPUT, CONSTANT -> throw new IllegalStateException(operation + " has no operands");
      case ADD -> a.plus(b);
      case SUBTRACT -> a.minus(b);
      case MULTIPLY -> a.times(b);
      case DIVIDE, REMOVABLE_DIVIDE -> quotient(a, b);
      case POWER -> power(a, b);
      case INTEGER_POWER -> wholePower(a, (int) value);
      case NEGATE -> a.negated();
      case ATAN2 -> angle(a, b);
      case MIN -> new Interval(Math.min(a.low(), b.low()), Math.min(a.high(), b.high()));
      case MAX -> new Interval(Math.max(a.low(), b.low()), Math.max(a.high(), b.high()));
      case HYPOT -> hypotenuse(absolute(a), absolute(b));
      case LESS -> truth(a.high() < b.low(), a.low() >= b.high());
      case LESS_OR_EQUAL -> truth(a.high() <= b.low(), a.low() > b.high());
      case GREATER -> truth(a.low() > b.high(), a.high() <= b.low());
      case GREATER_OR_EQUAL -> truth(a.low() >= b.high(), a.high() < b.low());
      case EQUAL -> truth(samePoint(a, b), !a.intersects(b));
      case NOT_EQUAL -> truth(!a.intersects(b), samePoint(a, b));
      case AND -> truth(holds(a) && holds(b), fails(a) || fails(b));
      case OR -> truth(holds(a) || holds(b), fails(a) && fails(b));
      case NOT -> truth(fails(a), holds(a));
      case SELECT -> holds(a) ? b : fails(a) ? c : b.hullWith(c);
      default -> function(operation, a);
    };
  }

  private static Interval function(Operation operation, Interval a) {
    return switch (operation) {
      case SIN -> wave(a, Math::sin, Math.PI / 2);
      case COS -> wave(a, Math::cos, 0);
      case TAN -> tangent(a);
      case ASIN -> within(a, -1, 1, Math::asin);
      case ACOS -> {
        Interval opposite = within(a.negated(), -1, 1, Math::asin);
        yield opposite.plus(Interval.outward(Math.PI / 2, Math.PI / 2));
      }
      case ATAN -> increasing(a, Math::atan, LIBRARY_ULPS);
      case SINH -> increasing(a, Math::sinh, LIBRARY_ULPS + 1);
      case COSH -> increasing(absolute(a), Math::cosh, LIBRARY_ULPS + 1);
      case TANH -> increasing(a, Math::tanh, LIBRARY_ULPS + 1);
      case EXP -> notNegative(increasing(a, Math::exp, LIBRARY_ULPS));
      case LN -> within(a, 0, Double.POSITIVE_INFINITY, Math::log);
      case LOG10 -> within(a, 0, Double.POSITIVE_INFINITY, Math::log10);
      case SQRT -> {
        Interval root = within(a, 0, Double.POSITIVE_INFINITY, Math::sqrt);
        yield a.high() < 0 ? root : notNegative(root);
      }
      case CBRT -> increasing(a, Math::cbrt, LIBRARY_ULPS);
      case ABS -> absolute(a);
      case SIGN -> new Interval(Math.signum(a.low()), Math.signum(a.high()));
      case ERF -> increasing(a, ErrorFunction::erf, ERROR_FUNCTION_ULPS);
      case ERFC -> increasing(a.negated(), x -> ErrorFunction.erfc(-x), ERROR_FUNCTION_ULPS);
      default -> throw new IllegalStateException(operation + " is not a function");
    };
  }

  private static boolean holds(Interval condition) {
    return !condition.contains(0);
  }

  private static boolean fails(Interval condition) {
    return condition.low() == 0 && condition.high() == 0;
  }

  private static boolean samePoint(Interval a, Interval b) {
    return a.low() == a.high() && b.low() == b.high() && a.low() == b.low();
  }

  private static Interval truth(boolean always, boolean never) {
    return always ? TRUE : never ? FALSE : Interval.UNIT;
  }

  /** Widened by that many units in the last place. */
  private static Interval loosened(double low, double high, int ulps) {
    if (Double.isNaN(low) || Double.isNaN(high)) {
      return Interval.ALL;
    }
    return new Interval(low - ulps * Math.ulp(low), high + ulps * Math.ulp(high));
  }

  private static Interval increasing(Interval a, DoubleUnaryOperator f, int ulps) {
    double low = f.applyAsDouble(a.low());
    double high = f.applyAsDouble(a.high());
    return loosened(finiteUp(low), finiteDown(high), ulps);
  }

  /** An infinity's unit in the last place is infinite: kept apart so that no NaN comes of it. */
  private static double finiteUp(double low) {
    return low == Double.POSITIVE_INFINITY ? Double.MAX_VALUE : low;
  }

  private static double finiteDown(double high) {
    return high == Double.NEGATIVE_INFINITY ? -Double.MAX_VALUE : high;
  }

  /** An increasing function on the part of an interval in its domain. */
  private static Interval within(Interval a, double least, double most, DoubleUnaryOperator f) {
    if (a.high() < least || a.low() > most) {
      return Interval.ALL;
    }
    Interval part = new Interval(Math.max(a.low(), least), Math.min(a.high(), most));
    return increasing(part, f, LIBRARY_ULPS);
  }

  private static Interval notNegative(Interval a) {
    return a.low() >= 0 ? a : new Interval(0, Math.max(0, a.high()));
  }

  private static Interval absolute(Interval a) {
    if (a.low() >= 0) {
      return a;
    }
    return a.high() <= 0 ? a.negated() : new Interval(0, a.magnitude());
  }

  private static Interval hypotenuse(Interval a, Interval b) {
    return notNegative(
        loosened(Math.hypot(a.low(), b.low()), Math.hypot(a.high(), b.high()), LIBRARY_ULPS));
  }

  private static Interval quotient(Interval a, Interval b) {
    if (!b.contains(0)) {
      return a.dividedBy(b);
    }
    if (b.low() == 0 && b.high() > 0) {
      return a.times(new Interval(Math.nextDown(1 / b.high()), Double.POSITIVE_INFINITY));
    }
    if (b.high() == 0 && b.low() < 0) {
      return a.times(new Interval(Double.NEGATIVE_INFINITY, Math.nextUp(1 / b.low())));
    }
    return Interval.ALL;
  }

  private static Interval wholePower(Interval a, int exponent) {
    if (exponent < 0) {
      return quotient(Interval.point(1), wholePower(a, -exponent));
    }
    Interval base = exponent % 2 == 0 ? absolute(a) : a;
    int ulps = LIBRARY_ULPS;
    Interval result =
        loosened(
            finiteUp(Math.pow(base.low(), exponent)),
            finiteDown(Math.pow(base.high(), exponent)),
            ulps);
    return exponent % 2 == 0 ? notNegative(result) : result;
  }

  private static Interval power(Interval a, Interval b) {
    if (a.high() < 0) {
      return Interval.ALL;
    }
    double low = Math.max(0, a.low());
    double ll = Math.pow(low, b.low());
    double lh = Math.pow(low, b.high());
    double hl = Math.pow(a.high(), b.low());
    double hh = Math.pow(a.high(), b.high());
    return notNegative(
        loosened(
            Math.min(Math.min(ll, lh), Math.min(hl, hh)),
            Math.max(Math.max(ll, lh), Math.max(hl, hh)),
            LIBRARY_ULPS));
  }

  /** Sine or cosine, whose greatest value is at the crest and at whole turns from it. */
  private static Interval wave(Interval a, DoubleUnaryOperator f, double crest) {
    if (!(a.magnitude() < LARGE_ANGLE) || a.width() >= 2 * Math.PI) {
      return SIGNS;
    }
    double atLow = f.applyAsDouble(a.low());
    double atHigh = f.applyAsDouble(a.high());
    Interval ends = loosened(Math.min(atLow, atHigh), Math.max(atLow, atHigh), LIBRARY_ULPS);
    return new Interval(
        reaches(a, crest + Math.PI) ? -1 : Math.max(-1, ends.low()),
        reaches(a, crest) ? 1 : Math.min(1, ends.high()));
  }

  /** Whether an angle, or one whole turns from it, is or may be in the interval. */
  private static boolean reaches(Interval a, double angle) {
    double turn = 2 * Math.PI;
    double slack = TURN_ROUNDING * (1 + a.magnitude());
    double first = angle + turn * Math.ceil((a.low() - slack - angle) / turn);
    return first <= a.high() + slack || first - turn >= a.low() - slack;
  }

  private static Interval tangent(Interval a) {
    if (!(a.magnitude() < LARGE_ANGLE)
        || a.width() >= Math.PI
        || reaches(a, Math.PI / 2)
        || reaches(a, -Math.PI / 2)) {
      return Interval.ALL;
    }
    return increasing(a, Math::tan, LIBRARY_ULPS);
  }

  /** atan2; away from the cut along the negative x axis its extremes are at corners. */
  private static Interval angle(Interval y, Interval x) {
    if (x.low() <= 0 && y.contains(0)) {
      return ANY_ANGLE;
    }
    double ll = Math.atan2(y.low(), x.low());
    double lh = Math.atan2(y.low(), x.high());
    double hl = Math.atan2(y.high(), x.low());
    double hh = Math.atan2(y.high(), x.high());
    return loosened(
        Math.min(Math.min(ll, lh), Math.min(hl, hh)),
        Math.max(Math.max(ll, lh), Math.max(hl, hh)),
        LIBRARY_ULPS);
  }
}
