package org.hullsum.expression;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.units.Dimension;

/**
 * A formula as an immutable tree. Numbers in it are in working units; conditions are expressions
 * with value 1 (true) or 0 (false). Equality is by structure.
 *
 * <p>Equality is written out, though it is what records have by themselves: theirs is linked at
 * first use, which costs a short run a good part of its time.
 */
public sealed interface Expression
    permits Expression.Constant,
        Expression.Symbol,
        Expression.Negation,
        Expression.Binary,
        Expression.Call,
        Expression.Comparison,
        Expression.Logical,
        Expression.Conditional {

  /** One method per alternative. */
  interface Visitor<R> {
    R constant(Constant constant);

    R symbol(Symbol symbol);

    R negation(Negation negation);

    R binary(Binary binary);

    R call(Call call);

    R comparison(Comparison comparison);

    R logical(Logical logical);

    R conditional(Conditional conditional);
  }

  <R> R accept(Visitor<R> visitor);

  /** The operands, in the order in which they are written. */
  List<Expression> children();

  /**
   * A number.
   *
   * @param value in working units
   * @param dimension empty for a bare number
   * @param text how it was written where it had a unit ({@code 293.15 K}) or a name ({@code pi});
   *     empty where the value prints itself
   */
  record Constant(double value, Optional<Dimension> dimension, Optional<String> text)
      implements Expression {
    public Constant {
      Objects.requireNonNull(dimension, "dimension");
      Objects.requireNonNull(text, "text");
    }

    @Override
    public boolean equals(Object other) {
      return other instanceof Constant that
          && Double.compare(value, that.value) == 0
          && dimension.equals(that.dimension)
          && text.equals(that.text);
    }

    @Override
    public int hashCode() {
      return 31 * Double.hashCode(value) + text.hashCode();
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.constant(this);
    }

    @Override
    public List<Expression> children() {
      return List.of();
    }
  }

  /** A variable or a parameter. */
  record Symbol(String name) implements Expression {
    public Symbol {
      Objects.requireNonNull(name, "name");
    }

    @Override
    public boolean equals(Object other) {
      return other instanceof Symbol that && name.equals(that.name);
    }

    @Override
    public int hashCode() {
      return name.hashCode();
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.symbol(this);
    }

    @Override
    public List<Expression> children() {
      return List.of();
    }
  }

  record Negation(Expression operand) implements Expression {
    public Negation {
      Objects.requireNonNull(operand, "operand");
    }

    @Override
    public boolean equals(Object other) {
      return this == other || other instanceof Negation that && operand.equals(that.operand);
    }

    @Override
    public int hashCode() {
      return 31 * operand.hashCode() + 1;
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.negation(this);
    }

    @Override
    public List<Expression> children() {
      return List.of(operand);
    }
  }

  enum Operator {
    ADD,
    SUBTRACT,
    MULTIPLY,
    DIVIDE,
    POWER
  }

  record Binary(Operator operator, Expression left, Expression right) implements Expression {
    public Binary {
      Objects.requireNonNull(operator, "operator");
      Objects.requireNonNull(left, "left");
      Objects.requireNonNull(right, "right");
    }

    @Override
    public boolean equals(Object other) {
      return this == other
          || other instanceof Binary that
              && operator == that.operator
              && left.equals(that.left)
              && right.equals(that.right);
    }

    @Override
    public int hashCode() {
      return 31 * (31 * left.hashCode() + right.hashCode()) + operator.name().hashCode();
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.binary(this);
    }

    @Override
    public List<Expression> children() {
      return List.of(left, right);
    }
  }

  /** A named function of one or more arguments. */
  record Call(Function function, List<Expression> arguments) implements Expression {
    public Call {
      Objects.requireNonNull(function, "function");
      arguments = List.copyOf(arguments);
      function.requireArguments(arguments.size());
    }

    @Override
    public boolean equals(Object other) {
      return this == other
          || other instanceof Call that
              && function == that.function
              && arguments.equals(that.arguments);
    }

    @Override
    public int hashCode() {
      return 31 * arguments.hashCode() + function.name().hashCode();
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.call(this);
    }

    @Override
    public List<Expression> children() {
      return arguments;
    }
  }

  enum Relation {
    LESS,
    LESS_OR_EQUAL,
    GREATER,
    GREATER_OR_EQUAL,
    EQUAL,
    NOT_EQUAL
  }

  record Comparison(Relation relation, Expression left, Expression right) implements Expression {
    public Comparison {
      Objects.requireNonNull(relation, "relation");
      Objects.requireNonNull(left, "left");
      Objects.requireNonNull(right, "right");
    }

    @Override
    public boolean equals(Object other) {
      return this == other
          || other instanceof Comparison that
              && relation == that.relation
              && left.equals(that.left)
              && right.equals(that.right);
    }

    @Override
    public int hashCode() {
      return 31 * (31 * left.hashCode() + right.hashCode()) + relation.name().hashCode();
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.comparison(this);
    }

    @Override
    public List<Expression> children() {
      return List.of(left, right);
    }
  }

  enum Connective {
    AND,
    OR,
    NOT
  }

  /** {@code and}, {@code or} of two or more conditions; {@code not} of one. */
  record Logical(Connective connective, List<Expression> conditions) implements Expression {
    public Logical {
      Objects.requireNonNull(connective, "connective");
      conditions = List.copyOf(conditions);
    }

    @Override
    public boolean equals(Object other) {
      return this == other
          || other instanceof Logical that
              && connective == that.connective
              && conditions.equals(that.conditions);
    }

    @Override
    public int hashCode() {
      return 31 * conditions.hashCode() + connective.name().hashCode();
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.logical(this);
    }

    @Override
    public List<Expression> children() {
      return conditions;
    }
  }

  /** {@code if(condition, then, otherwise)}. */
  record Conditional(Expression condition, Expression then, Expression otherwise)
      implements Expression {
    public Conditional {
      Objects.requireNonNull(condition, "condition");
      Objects.requireNonNull(then, "then");
      Objects.requireNonNull(otherwise, "otherwise");
    }

    @Override
    public boolean equals(Object other) {
      return this == other
          || other instanceof Conditional that
              && condition.equals(that.condition)
              && then.equals(that.then)
              && otherwise.equals(that.otherwise);
    }

    @Override
    public int hashCode() {
      return 31 * (31 * condition.hashCode() + then.hashCode()) + otherwise.hashCode();
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.conditional(this);
    }

    @Override
    public List<Expression> children() {
      return List.of(condition, then, otherwise);
    }
  }

  static Constant number(double value) {
    return new Constant(value, Optional.empty(), Optional.empty());
  }

  static Symbol symbol(String name) {
    return new Symbol(name);
  }

  default Expression plus(Expression other) {
    return new Binary(Operator.ADD, this, other);
  }

  default Expression minus(Expression other) {
    return new Binary(Operator.SUBTRACT, this, other);
  }

  default Expression times(Expression other) {
    return new Binary(Operator.MULTIPLY, this, other);
  }

  default Expression over(Expression other) {
    return new Binary(Operator.DIVIDE, this, other);
  }

  default Expression power(double exponent) {
    return new Binary(Operator.POWER, this, number(exponent));
  }

  default Expression negated() {
    return new Negation(this);
  }

  static Call call(Function function, Expression... arguments) {
    return new Call(function, List.of(arguments));
  }
}
