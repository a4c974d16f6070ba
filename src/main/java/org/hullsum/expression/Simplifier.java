package org.hullsum.expression;

import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Negation;

/**
 * Simplifies expressions without changing their value where it is finite (but for rounding and the
 * sign of zero); where the value was not finite it may become so, as in x/x.
 *
 * <p>An expression is brought into a sum of products of powers of its atoms, like terms and factors
 * collected, and of the forms that are equal by multiplying out, by common denominators and by sin²
 * + cos² = 1 the shortest is written. Decimal numbers are fractions on the way; named constants and
 * numbers with a unit stay as they were written.
 *
 * <p>The work is bounded: where the bound is met only the rules for 0 and 1 are applied and plain
 * numbers folded. Thread-safe.
 */
public final class Simplifier {
  private static final long MOST_WORK = 100_000;

  private Simplifier() {}

  public static Expression simplify(Expression e) {
    if (e.children().isEmpty()) {
      return e;
    }
    Effort effort = new Effort(MOST_WORK);
    Expression simplified = new Reduction(effort).simplified(e);
    return effort.spent() ? folded(e) : simplified;
  }

  /** Only the rules for 0 and 1, and plain numbers folded. */
  static Expression folded(Expression e) {
    return new Rewriting() {
      @Override
      public Expression negation(Negation negation) {
        return Algebra.negation(rewrite(negation.operand()));
      }

      @Override
      public Expression call(Call call) {
        return Algebra.call(call.function(), rewriteAll(call.arguments()));
      }

      @Override
      public Expression binary(Binary binary) {
        return Algebra.binary(binary.operator(), rewrite(binary.left()), rewrite(binary.right()));
      }
    }.rewrite(e);
  }
}
