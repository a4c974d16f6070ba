package org.hullsum.expression;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Operator;
import org.hullsum.expression.Expression.Symbol;

/**
 * A quotient N/(v^n · rest) whose numerator vanishes with the variable v to order n, such as {@code
 * sin(r)/r}: its singularity at v = 0 is removable.
 *
 * <p>By Taylor's theorem with the remainder of Lagrange, N/v^n = N⁽ⁿ⁾(ξ)/n! for a ξ between 0 and
 * v, so over an interval of v that contains 0 the n-th derivative encloses it. All lower ones must
 * be continuous; the n-th may jump, since its enclosure has the values on both sides.
 *
 * @param meanValue the n-th derivative of N by v, divided by n!
 * @param rest the other factors of the divisor, if any
 */
record RemovableQuotient(
    Expression numerator,
    Symbol variable,
    int order,
    Expression meanValue,
    Optional<Expression> rest) {
  private static final int HIGHEST_ORDER = 4;

  /** The quotient as a removable one in one of the variables, where it is. */
  static Optional<RemovableQuotient> of(Binary quotient, List<String> variables) {
    for (String name : Symbols.in(quotient.right())) {
      if (variables.contains(name)) {
        Divisor divisor = Divisor.of(quotient.right(), name);
        if (divisor.order() >= 1 && divisor.order() <= HIGHEST_ORDER) {
          Optional<RemovableQuotient> found = in(quotient.left(), name, divisor);
          if (found.isPresent()) {
            return found;
          }
        }
      }
    }
    return Optional.empty();
  }

  private static Optional<RemovableQuotient> in(
      Expression numerator, String name, Divisor divisor) {
    Expression derivative = numerator;
    double factorial = 1;
    for (int k = 1; k <= divisor.order(); k++) {
      Expression atZero =
          Simplifier.simplify(Substitution.replace(derivative, Map.of(name, Algebra.ZERO)));
      if (!Algebra.isZero(atZero) || !Switches.jumps(derivative).isEmpty()) {
        return Optional.empty();
      }
      derivative = Derivative.of(derivative, name);
      factorial *= k;
    }
    return Optional.of(
        new RemovableQuotient(
            numerator,
            new Symbol(name),
            divisor.order(),
            Algebra.quotient(derivative, Expression.number(factorial)),
            divisor.rest()));
  }

  /** A divisor as v^order times what does not vanish with v as a factor. */
  private record Divisor(int order, Optional<Expression> rest) {
    private boolean isVariable() {
      return order == 1 && rest.isEmpty();
    }

    static Divisor of(Expression e, String name) {
      if (e instanceof Symbol symbol && symbol.name().equals(name)) {
        return new Divisor(1, Optional.empty());
      }
      if (e instanceof Binary b && b.operator() == Operator.POWER) {
        Optional<Double> exponent = Algebra.plain(b.right()).filter(v -> v == Math.rint(v));
        if (exponent.isPresent()
            && exponent.get() >= 1
            && exponent.get() <= HIGHEST_ORDER
            && of(b.left(), name).isVariable()) {
          return new Divisor(exponent.get().intValue(), Optional.empty());
        }
      }
      if (e instanceof Binary b && b.operator() == Operator.MULTIPLY) {
        Divisor left = of(b.left(), name);
        Divisor right = of(b.right(), name);
        return new Divisor(left.order + right.order, joined(left.rest, right.rest));
      }
      return new Divisor(0, Optional.of(e));
    }

    private static Optional<Expression> joined(Optional<Expression> a, Optional<Expression> b) {
      return a.isPresent() && b.isPresent() ? Optional.of(a.get().times(b.get())) : a.or(() -> b);
    }
  }
}
