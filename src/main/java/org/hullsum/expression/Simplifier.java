package org.hullsum.expression;

import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Negation;

/**
 * Simplifies expressions without changing their value where it is finite (but for rounding).
 *
 * <p>Plain numbers are folded and the rules for 0 and 1 applied; named constants and numbers with a
 * unit stay as they were written.
 */
public final class Simplifier {
  private Simplifier() {}

  public static Expression simplify(Expression e) {
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
