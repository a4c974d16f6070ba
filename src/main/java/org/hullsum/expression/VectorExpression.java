package org.hullsum.expression;

import java.util.Map;
import java.util.Objects;
import org.hullsum.numeric.Vector3;

/**
 * A vector whose Cartesian components are formulas.
 *
 * @param x first component
 * @param y second
 * @param z third
 */
public record VectorExpression(Expression x, Expression y, Expression z) {
  public VectorExpression {
    Objects.requireNonNull(x, "x");
    Objects.requireNonNull(y, "y");
    Objects.requireNonNull(z, "z");
  }

  public static VectorExpression of(Vector3 vector) {
    return new VectorExpression(
        Expression.number(vector.x()),
        Expression.number(vector.y()),
        Expression.number(vector.z()));
  }

  /** The position (x, y, z) itself. */
  public static VectorExpression position() {
    return new VectorExpression(
        Expression.symbol("x"), Expression.symbol("y"), Expression.symbol("z"));
  }

  public VectorExpression plus(VectorExpression other) {
    return new VectorExpression(x.plus(other.x), y.plus(other.y), z.plus(other.z));
  }

  public VectorExpression minus(VectorExpression other) {
    return new VectorExpression(x.minus(other.x), y.minus(other.y), z.minus(other.z));
  }

  public VectorExpression times(Expression factor) {
    return new VectorExpression(factor.times(x), factor.times(y), factor.times(z));
  }

  public Expression dot(VectorExpression other) {
    return x.times(other.x).plus(y.times(other.y)).plus(z.times(other.z));
  }

  /** Right-handed cross product. */
  public VectorExpression cross(VectorExpression other) {
    return new VectorExpression(
        y.times(other.z).minus(z.times(other.y)),
        z.times(other.x).minus(x.times(other.z)),
        x.times(other.y).minus(y.times(other.x)));
  }

  /** This vector over its length. */
  public VectorExpression unit() {
    Expression length = Expression.call(Function.SQRT, dot(this));
    return new VectorExpression(x.over(length), y.over(length), z.over(length));
  }

  public VectorExpression derivative(String symbol) {
    return new VectorExpression(
        Derivative.of(x, symbol), Derivative.of(y, symbol), Derivative.of(z, symbol));
  }

  public VectorExpression replace(Map<String, Expression> replacements) {
    return new VectorExpression(
        Substitution.replace(x, replacements),
        Substitution.replace(y, replacements),
        Substitution.replace(z, replacements));
  }

  public VectorExpression simplified() {
    return new VectorExpression(
        Simplifier.simplify(x), Simplifier.simplify(y), Simplifier.simplify(z));
  }
}
