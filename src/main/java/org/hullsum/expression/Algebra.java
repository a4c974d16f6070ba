package org.hullsum.expression;

import java.util.List;
import java.util.Optional;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Operator;

/**
 * Builds sums, products and powers with the rules for 0 and 1 applied at once and plain numbers
 * folded, so that derivatives don't grow terms that vanish.
 *
 * <p>Only bare numbers without a text are folded: {@code pi} and {@code 293.15 K} stay as they were
 * written. A fold whose value is not finite is not made.
 */
final class Algebra {
  static final Constant ZERO = Expression.number(0);
  static final Constant ONE = Expression.number(1);

  /** Larger whole values of functions are rather rounded ones. */
  private static final double LARGEST_FOLDED = 1e6;

  private Algebra() {}

  /** The value of a bare number without a text. */
  static Optional<Double> plain(Expression e) {
    return e instanceof Constant c && c.dimension().isEmpty() && c.text().isEmpty()
        ? Optional.of(c.value())
        : Optional.empty();
  }

  /** The value of any constant, named or with a unit. */
  static Optional<Double> valueOf(Expression e) {
    return e instanceof Constant c ? Optional.of(c.value()) : Optional.empty();
  }

  static boolean isZero(Expression e) {
    return e instanceof Constant c && c.value() == 0;
  }

  static boolean isOne(Expression e) {
    return is(e, 1);
  }

  /** Whether the expression is that plain number. */
  static boolean is(Expression e, double value) {
    return plain(e).filter(v -> v == value).isPresent();
  }

  static Expression sum(Expression a, Expression b) {
    if (isZero(a)) {
      return b;
    }
    if (isZero(b)) {
      return a;
    }
    if (b instanceof Negation n) {
      return difference(a, n.operand());
    }
    return folded(Operator.ADD, a, b);
  }

  static Expression difference(Expression a, Expression b) {
    if (isZero(b)) {
      return a;
    }
    if (isZero(a)) {
      return negation(b);
    }
    if (b instanceof Negation n) {
      return sum(a, n.operand());
    }
    return folded(Operator.SUBTRACT, a, b);
  }

  static Expression negation(Expression a) {
    if (a instanceof Negation n) {
      return n.operand();
    }
    Optional<Double> value = plain(a);
    if (value.isPresent()) {
      return Expression.number(0 - value.get());
    }
    return a.negated();
  }

  static Expression product(Expression a, Expression b) {
    if (isZero(a) || isZero(b)) {
      return ZERO;
    }
    if (isOne(a)) {
      return b;
    }
    if (isOne(b)) {
      return a;
    }
    if (is(a, -1)) {
      return negation(b);
    }
    if (is(b, -1)) {
      return negation(a);
    }
    if (a instanceof Negation n) {
      return negation(product(n.operand(), b));
    }
    if (b instanceof Negation n) {
      return negation(product(a, n.operand()));
    }
    return folded(Operator.MULTIPLY, a, b);
  }

  static Expression quotient(Expression a, Expression b) {
    if (isZero(a) && !isZero(b)) {
      return ZERO;
    }
    if (isOne(b)) {
      return a;
    }
    if (a instanceof Negation n) {
      return negation(quotient(n.operand(), b));
    }
    return folded(Operator.DIVIDE, a, b);
  }

  static Expression power(Expression base, Expression exponent) {
    if (is(exponent, 0)) {
      return ONE;
    }
    if (is(exponent, 1) || isOne(base)) {
      return base;
    }
    return folded(Operator.POWER, base, exponent);
  }

  static Expression power(Expression base, double exponent) {
    return power(base, Expression.number(exponent));
  }

  /** The natural logarithm, with ln(e) = 1. */
  static Expression logarithm(Expression a) {
    if (isEuler(a)) {
      return ONE;
    }
    return isOne(a) ? ZERO : Expression.call(Function.LN, a);
  }

  /** A function, folded where its arguments are plain numbers and its value is a whole number. */
  static Expression call(Function function, List<Expression> arguments) {
    Operation operation = Operation.of(function);
    double[] values = new double[arguments.size()];
    for (int i = 0; i < values.length; i++) {
      Optional<Double> value = plain(arguments.get(i));
      if (value.isEmpty()) {
        return new Call(function, arguments);
      }
      values[i] = value.get();
    }
    double result = values.length == 1 ? operation.apply(values[0], 0, 0) : values[0];
    for (int i = 1; i < values.length; i++) {
      result = operation.apply(result, values[i], 0);
    }
    return result == Math.rint(result) && Math.abs(result) < LARGEST_FOLDED
        ? Expression.number(result)
        : new Call(function, arguments);
  }

  private static boolean isEuler(Expression e) {
    return e instanceof Constant c && c.text().equals(Optional.of("e"));
  }

  /** Any of the five, by its operator. */
  static Expression binary(Operator operator, Expression a, Expression b) {
    return switch (operator) {
      case ADD -> sum(a, b);
      case SUBTRACT -> difference(a, b);
      case MULTIPLY -> product(a, b);
      case DIVIDE -> quotient(a, b);
      case POWER -> power(a, b);
    };
  }

  private static Expression folded(Operator operator, Expression a, Expression b) {
    Optional<Double> left = plain(a);
    Optional<Double> right = plain(b);
    if (left.isPresent() && right.isPresent()) {
      double value = Operation.of(operator).apply(left.get(), right.get(), 0);
      if (Double.isFinite(value)) {
        return Expression.number(value);
      }
    }
    return new Binary(operator, a, b);
  }
}
