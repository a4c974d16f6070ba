package org.hullsum.geometry;

import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;

/** Short spellings of formulas in the tests. */
final class Formulas {
  private Formulas() {}

  static Expression number(double value) {
    return Expression.number(value);
  }

  static Expression symbol(String name) {
    return Expression.symbol(name);
  }

  static VectorExpression point(double x, double y, double z) {
    return VectorExpression.of(new Vector3(x, y, z));
  }

  static VectorExpression point(Expression x, Expression y, Expression z) {
    return new VectorExpression(x, y, z);
  }

  static Expression sin(Expression e) {
    return Expression.call(Function.SIN, e);
  }

  static Expression cos(Expression e) {
    return Expression.call(Function.COS, e);
  }

  static Expression sqrt(Expression e) {
    return Expression.call(Function.SQRT, e);
  }
}
