package org.hullsum.expression;

import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Connective;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Relation;
import org.hullsum.expression.Expression.Symbol;

/**
 * Writes expressions as a person would, such as {@code lift*(radius^2 - x^2 - y^2)}: no parentheses
 * that are not needed, no {@code 1*x}, no {@code + -3}. What is printed reads back to an expression
 * of the same value, unless it is too long to be read by anybody.
 */
public final class Printer implements Expression.Visitor<Printer.Piece> {
  /** Nobody reads a longer one. */
  private static final int MOST_NODES = 20_000;

  private static final int OR = 1;
  private static final int AND = 2;
  private static final int NOT = 3;
  private static final int COMPARISON = 4;
  private static final int SUM = 5;

  /** A number with a unit: it needs parentheses in products, where its unit could read on. */
  private static final int QUANTITY = 6;

  private static final int PRODUCT = 7;
  private static final int NEGATION = 8;
  private static final int POWER = 9;
  private static final int ATOM = 10;

  /** A text and how tightly it holds together. */
  record Piece(String text, int binding) {
    String within(int least) {
      return binding >= least ? text : "(" + text + ")";
    }
  }

  private Printer() {}

  /** The formula as text; one of more than {@value #MOST_NODES} parts is only described. */
  public static String print(Expression e) {
    long size = size(e, new IdentityHashMap<>());
    return size > MOST_NODES
        ? "(a formula of " + size + " parts, too long to write)"
        : e.accept(new Printer()).text();
  }

  /** Number of nodes when shared ones are written out each time. */
  private static long size(Expression e, Map<Expression, Long> known) {
    Long size = known.get(e);
    if (size == null) {
      long sum = 1;
      for (Expression child : e.children()) {
        sum = Math.min(Integer.MAX_VALUE, sum + size(child, known));
      }
      size = sum;
      known.put(e, size);
    }
    return size;
  }

  private String within(Expression e, int least) {
    return e.accept(this).within(least);
  }

  @Override
  public Piece constant(Constant constant) {
    if (constant.text().isPresent()) {
      String text = constant.text().get();
      return new Piece(text, text.indexOf(' ') >= 0 ? QUANTITY : ATOM);
    }
    return new Piece(NumberText.of(constant.value()), constant.value() < 0 ? NEGATION : ATOM);
  }

  @Override
  public Piece symbol(Symbol symbol) {
    return new Piece(symbol.name(), ATOM);
  }

  @Override
  public Piece negation(Negation negation) {
    Expression operand = negation.operand();
    if (operand instanceof Negation twice) {
      return twice.operand().accept(this);
    }
    return Algebra.plain(operand)
        .filter(value -> value < 0)
        .map(value -> constant(Expression.number(-value)))
        .orElseGet(() -> opposite(operand.accept(this)));
  }

  /** The minus of a product is that of its first factor. */
  private static Piece opposite(Piece operand) {
    if (operand.binding() != PRODUCT) {
      return new Piece("-" + operand.within(POWER), NEGATION);
    }
    String text = operand.text();
    return new Piece(text.startsWith("-") ? text.substring(1) : "-" + text, PRODUCT);
  }

  @Override
  public Piece binary(Binary b) {
    return switch (b.operator()) {
      case ADD -> sum(b, " + ", " - ");
      case SUBTRACT -> sum(b, " - ", " + ");
      case MULTIPLY -> product(b);
      case DIVIDE -> new Piece(within(b.left(), PRODUCT) + "/" + within(b.right(), POWER), PRODUCT);
      case POWER -> new Piece(within(b.left(), ATOM) + "^" + within(b.right(), NEGATION), POWER);
    };
  }

  /** A term that begins with a minus is taken off instead. */
  private Piece sum(Binary b, String sign, String opposite) {
    String right = within(b.right(), QUANTITY);
    return new Piece(
        within(b.left(), SUM)
            + (right.startsWith("-") ? opposite + right.substring(1) : sign + right),
        SUM);
  }

  private Piece product(Binary b) {
    if (Algebra.isOne(b.left())) {
      return b.right().accept(this);
    }
    if (Algebra.isOne(b.right())) {
      return b.left().accept(this);
    }
    if (Algebra.is(b.left(), -1)) {
      return negation(new Negation(b.right()));
    }
    return new Piece(within(b.left(), PRODUCT) + "*" + within(b.right(), POWER), PRODUCT);
  }

  @Override
  public Piece call(Call call) {
    return function(call.function().word(), call.arguments());
  }

  @Override
  public Piece conditional(Conditional conditional) {
    return function("if", conditional.children());
  }

  private Piece function(String name, List<Expression> arguments) {
    StringBuilder text = new StringBuilder(name).append('(');
    String separator = "";
    for (Expression argument : arguments) {
      text.append(separator).append(within(argument, OR));
      separator = ", ";
    }
    return new Piece(text.append(')').toString(), ATOM);
  }

  @Override
  public Piece comparison(Comparison comparison) {
    return new Piece(
        within(comparison.left(), SUM)
            + " "
            + sign(comparison.relation())
            + " "
            + within(comparison.right(), SUM),
        COMPARISON);
  }

  static String sign(Relation relation) {
    return switch (relation) {
      case LESS -> "<";
      case LESS_OR_EQUAL -> "<=";
      case GREATER -> ">";
      case GREATER_OR_EQUAL -> ">=";
      case EQUAL -> "==";
      case NOT_EQUAL -> "!=";
    };
  }

  @Override
  public Piece logical(Logical logical) {
    List<Expression> conditions = logical.conditions();
    if (logical.connective() == Connective.NOT) {
      return new Piece("not " + within(conditions.get(0), NOT), NOT);
    }
    boolean and = logical.connective() == Connective.AND;
    StringBuilder text = new StringBuilder();
    String separator = "";
    for (Expression condition : conditions) {
      text.append(separator).append(within(condition, and ? NOT : AND));
      separator = and ? " and " : " or ";
    }
    return new Piece(text.toString(), and ? AND : OR);
  }
}
