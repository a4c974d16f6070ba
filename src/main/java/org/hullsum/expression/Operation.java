package org.hullsum.expression;

import org.hullsum.numeric.ErrorFunction;

/**
 * The operations of a compiled tape, with their value at one point and a rough cost, one being a
 * multiplication.
 *
 * <p>A condition holds where its value is not 0; a comparison with NaN does not hold, but {@code
 * NOT_EQUAL} does.
 */
enum Operation {
  INPUT(0, 0),
  CONSTANT(0, 0),
  ADD(2, 1),
  SUBTRACT(2, 1),
  MULTIPLY(2, 1),
  DIVIDE(2, 4),
  /** a / b where the numerator vanishes with b; c is the derivative of a by b. */
  REMOVABLE_DIVIDE(3, 4),
  POWER(2, 40),
  /** a to the whole number that the instruction carries. */
  INTEGER_POWER(1, 3),
  NEGATE(1, 1),
  SIN(1, 15),
  COS(1, 15),
  TAN(1, 25),
  ASIN(1, 25),
  ACOS(1, 25),
  ATAN(1, 25),
  ATAN2(2, 40),
  SINH(1, 40),
  COSH(1, 40),
  TANH(1, 40),
  EXP(1, 15),
  LN(1, 15),
  LOG10(1, 15),
  SQRT(1, 5),
  CBRT(1, 20),
  ABS(1, 1),
  MIN(2, 2),
  MAX(2, 2),
  SIGN(1, 2),
  HYPOT(2, 20),
  ERF(1, 40),
  ERFC(1, 40),
  LESS(2, 1),
  LESS_OR_EQUAL(2, 1),
  GREATER(2, 1),
  GREATER_OR_EQUAL(2, 1),
  EQUAL(2, 1),
  NOT_EQUAL(2, 1),
  AND(2, 1),
  OR(2, 1),
  NOT(1, 1),
  /** b where a holds, else c. */
  SELECT(3, 2);

  /** Above this the error of a product is itself a number. */
  private static final double NORMAL = 1e-250;

  private final int arity;
  private final int cost;

  Operation(int arity, int cost) {
    this.arity = arity;
    this.cost = cost;
  }

  int arity() {
    return arity;
  }

  int cost() {
    return cost;
  }

  boolean commutes() {
    return switch (this) {
      case ADD, MULTIPLY, MIN, MAX, EQUAL, NOT_EQUAL, AND, OR -> true;
      default -> false;
    };
  }

  static Operation of(Expression.Operator operator) {
    return valueOf(operator.name());
  }

  static Operation of(Expression.Relation relation) {
    return valueOf(relation.name());
  }

  static Operation of(Function function) {
    return valueOf(function.name());
  }

  static double truth(boolean holds) {
    return holds ? 1 : 0;
  }

  /** The value for operands a, b, c, of which the first {@link #arity} count. */
  double apply(double a, double b, double c) {
    return switch (this) {
      case INPUT, CONSTANT, INTEGER_POWER ->
          throw new IllegalStateException(this + " has no operands alone");
      case ADD -> a + b;
      case SUBTRACT -> a - b;
      case MULTIPLY -> a * b;
      case DIVIDE, REMOVABLE_DIVIDE -> a / b;
      case POWER -> Math.pow(a, b);
      case NEGATE -> -a;
      case ATAN2 -> Math.atan2(a, b);
      case MIN -> Math.min(a, b);
      case MAX -> Math.max(a, b);
      case HYPOT -> Math.hypot(a, b);
      case LESS -> truth(a < b);
      case LESS_OR_EQUAL -> truth(a <= b);
      case GREATER -> truth(a > b);
      case GREATER_OR_EQUAL -> truth(a >= b);
      case EQUAL -> truth(a == b);
      case NOT_EQUAL -> truth(a != b);
      case AND -> truth(a != 0 && b != 0);
      case OR -> truth(a != 0 || b != 0);
      case NOT -> truth(a == 0);
      case SELECT -> a != 0 ? b : c;
      default -> unary(a);
    };
  }

  /** Whether a value computed from constants a and b is surely free of rounding. */
  boolean isExact(double a, double b, double value) {
    return switch (this) {
      case ADD, SUBTRACT -> {
        double other = this == ADD ? b : -b;
        double back = value - a;
        yield (a - (value - back)) + (other - back) == 0;
      }
      case MULTIPLY -> a == 0 || b == 0 || NORMAL < Math.abs(value) && Math.fma(a, b, -value) == 0;
      case DIVIDE -> a == 0 && b != 0 || NORMAL < Math.abs(value) && Math.fma(value, b, -a) == 0;
      case NEGATE, ABS, MIN, MAX, SIGN, SELECT -> true;
      case LESS, LESS_OR_EQUAL, GREATER, GREATER_OR_EQUAL, EQUAL, NOT_EQUAL, AND, OR, NOT -> true;
      default -> false;
    };
  }

  private double unary(double a) {
    return switch (this) {
      case SIN -> Math.sin(a);
      case COS -> Math.cos(a);
      case TAN -> Math.tan(a);
      case ASIN -> Math.asin(a);
      case ACOS -> Math.acos(a);
      case ATAN -> Math.atan(a);
      case SINH -> Math.sinh(a);
      case COSH -> Math.cosh(a);
      case TANH -> Math.tanh(a);
      case EXP -> Math.exp(a);
      case LN -> Math.log(a);
      case LOG10 -> Math.log10(a);
      case SQRT -> Math.sqrt(a);
      case CBRT -> Math.cbrt(a);
      case ABS -> Math.abs(a);
      case SIGN -> Math.signum(a);
      case ERF -> ErrorFunction.erf(a);
      case ERFC -> ErrorFunction.erfc(a);
      default -> throw new IllegalStateException(this + " is not a function of one argument");
    };
  }
}
