package org.hullsum.expression;

import java.util.ArrayDeque;
import java.util.Collections;
import java.util.Deque;
import java.util.IdentityHashMap;
import java.util.Set;
import java.util.TreeSet;
import org.hullsum.expression.Expression.Symbol;

/** The names of the symbols of an expression. */
public final class Symbols {
  private Symbols() {}

  /** All symbols in the expression, in alphabetical order. */
  public static Set<String> in(Expression e) {
    Set<String> names = new TreeSet<>();
    for (Expression part : parts(e)) {
      if (part instanceof Symbol symbol) {
        names.add(symbol.name());
      }
    }
    return Collections.unmodifiableSet(names);
  }

  /** Every distinct node of the expression, itself included. */
  static Set<Expression> parts(Expression e) {
    Set<Expression> seen = Collections.newSetFromMap(new IdentityHashMap<>());
    Deque<Expression> open = new ArrayDeque<>();
    open.push(e);
    while (!open.isEmpty()) {
      Expression next = open.pop();
      if (seen.add(next)) {
        next.children().forEach(open::push);
      }
    }
    return seen;
  }
}
