package org.hullsum.expression;

import java.util.Optional;

/**
 * One word, number or sign of an expression.
 *
 * @param text as written; empty at the end
 * @param number the constant of a {@code NUMBER}
 */
record Token(Kind kind, int start, int end, String text, Optional<Expression.Constant> number) {
  enum Kind {
    NUMBER,
    NAME,
    SIGN,
    END
  }

  static Token of(Kind kind, String whole, int start, int end) {
    return new Token(kind, start, end, whole.substring(start, end), Optional.empty());
  }

  boolean is(String sign) {
    return kind != Kind.NUMBER && text.equals(sign);
  }

  /** Whether an operand may begin with it. */
  boolean beginsOperand() {
    return kind == Kind.NUMBER || kind == Kind.NAME && !joins() || is("(");
  }

  private boolean joins() {
    return text.equals("and") || text.equals("or");
  }
}
