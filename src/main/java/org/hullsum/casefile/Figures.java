package org.hullsum.casefile;

import org.hullsum.expression.Expression;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Symbol;

/** Tells a figure, a number perhaps with a sign and a unit, and a bare name from a formula. */
final class Figures {
  private Figures() {}

  static boolean isFigure(Expression e) {
    return e instanceof Constant || e instanceof Negation n && n.operand() instanceof Constant;
  }

  static boolean isBareName(Expression e) {
    return e instanceof Symbol;
  }

  /** The name that a bare name is. */
  static String name(Expression e) {
    return ((Symbol) e).name();
  }
}
