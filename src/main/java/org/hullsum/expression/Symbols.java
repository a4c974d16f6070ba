package org.hullsum.expression;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Collections;
import java.util.Deque;
import java.util.IdentityHashMap;
import java.util.List;
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

  /** Every distinct node of the expression, itself first, the others as they are written. */
  static Collection<Expression> parts(Expression e) {
    Set<Expression> seen = Collections.newSetFromMap(new IdentityHashMap<>());
    List<Expression> parts = new ArrayList<>();
    Deque<Expression> open = new ArrayDeque<>();
    open.push(e);
    while (!open.isEmpty()) {
      Expression next = open.pop();
      if (seen.add(next)) {
        parts.add(next);
        List<Expression> children = next.children();
        for (int i = children.size() - 1; i >= 0; i--) {
          open.push(children.get(i));
        }
      }
    }
    return parts;
  }
}
