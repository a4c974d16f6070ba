package org.hullsum.expression;

import java.util.List;
import java.util.Optional;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Connective;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Operator;
import org.hullsum.expression.Expression.Relation;
import org.hullsum.expression.Expression.Symbol;

/**
 * Writes expressions as a person would, such as {@code lift*(radius^2 - x^2 - y^2)}: no parentheses
 * that are not needed, no {@code 1*x}, no {@code + -3}. What is printed reads back to an expression
 * of the same value.
 */
public final class Printer implements Expression.Visitor<Printer.Piece> {
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

  public static String print(Expression e) {
    return e.accept(new Printer()).text();
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
    return new Piece("-" + within(negation.operand(), POWER), NEGATION);
  }

  @Override
  public Piece binary(Binary b) {
    return switch (b.operator()) {
      case ADD -> sum(b, " + ", " - ");
      case SUBTRACT -> sum(b, " - ", " + ");
      case MULTIPLY -> product(b);
      case DIVIDE -> new Piece(within(b.left(), PRODUCT) + "/" + within(b.right(), POWER), PRODUCT);
      case POWER -> new Piece(within(b.left(), ATOM) + "^" + exponent(b.right()), POWER);
    };
  }

  private Piece sum(Binary b, String sign, String opposite) {
    String left = within(b.left(), SUM);
    Optional<Expression> turned = opposite(b.right());
    return new Piece(
        turned.isPresent()
            ? left + opposite + within(turned.get(), QUANTITY)
            : left + sign + within(b.right(), QUANTITY),
        SUM);
  }

  private String exponent(Expression e) {
    return Algebra.plain(e).isPresent() ? print(e) : within(e, POWER);
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

  /** The expression without its leading minus, where it has one. */
  private static Optional<Expression> opposite(Expression e) {
    if (e instanceof Negation n) {
      return Optional.of(n.operand());
    }
    Optional<Double> value = Algebra.plain(e);
    if (value.isPresent()) {
      return value.filter(v -> v < 0).map(v -> Expression.number(-v));
    }
    if (e instanceof Binary b
        && (b.operator() == Operator.MULTIPLY || b.operator() == Operator.DIVIDE)) {
      return opposite(b.left()).map(left -> new Binary(b.operator(), left, b.right()));
    }
    return Optional.empty();
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
