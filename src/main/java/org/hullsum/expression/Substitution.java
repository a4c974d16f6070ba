package org.hullsum.expression;

import java.util.Map;
import org.hullsum.expression.Expression.Symbol;

/** Puts expressions in the place of symbols, all at once: what is put in is not searched again. */
public final class Substitution {
  private Substitution() {}

  /**
   * The expression with each symbol that has a replacement replaced. Nothing is simplified; parts
   * without such a symbol stay the same nodes.
   */
  public static Expression replace(Expression e, Map<String, Expression> replacements) {
    return new Rewriting() {
      @Override
      public Expression symbol(Symbol symbol) {
        return replacements.getOrDefault(symbol.name(), symbol);
      }
    }.rewrite(e);
  }
}
