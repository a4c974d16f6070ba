package org.hullsum.casefile;

import org.hullsum.expression.Expression;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Symbol;

/** Tells conditions from numbers. */
final class Conditions implements Expression.Visitor<Boolean> {
  private Conditions() {}

  /** Whether the formula is a comparison or made of comparisons by and, or, not, if. */
  static boolean isCondition(Expression e) {
    return e.accept(new Conditions());
  }

  @Override
  public Boolean constant(Constant constant) {
    return false;
  }

  @Override
  public Boolean symbol(Symbol symbol) {
    return false;
  }

  @Override
  public Boolean negation(Negation negation) {
    return false;
  }

  @Override
  public Boolean binary(Binary binary) {
    return false;
  }

  @Override
  public Boolean call(Call call) {
    return false;
  }

  @Override
  public Boolean comparison(Comparison comparison) {
    return true;
  }

  @Override
  public Boolean logical(Logical logical) {
    return true;
  }

  @Override
  public Boolean conditional(Conditional conditional) {
    return conditional.then().accept(this) && conditional.otherwise().accept(this);
  }
}
