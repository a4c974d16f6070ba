package org.hullsum.expression;

import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Symbol;

/**
 * Rewrites an expression from the leaves up, each shared sub-expression once; by itself it changes
 * nothing and returns the same nodes.
 */
abstract class Rewriting implements Expression.Visitor<Expression> {
  private final Map<Expression, Expression> done = new IdentityHashMap<>();

  final Expression rewrite(Expression e) {
    Expression known = done.get(e);
    if (known == null) {
      known = e.accept(this);
      done.put(e, known);
    }
    return known;
  }

  /** The same list where nothing in it changes. */
  final List<Expression> rewriteAll(List<Expression> list) {
    List<Expression> rewritten = new ArrayList<>(list.size());
    boolean changed = false;
    for (Expression e : list) {
      Expression other = rewrite(e);
      rewritten.add(other);
      changed |= other != e;
    }
    return changed ? rewritten : list;
  }

  @Override
  public Expression constant(Constant constant) {
    return constant;
  }

  @Override
  public Expression symbol(Symbol symbol) {
    return symbol;
  }

  @Override
  public Expression negation(Negation negation) {
    Expression operand = rewrite(negation.operand());
    return operand == negation.operand() ? negation : new Negation(operand);
  }

  @Override
  public Expression binary(Binary binary) {
    Expression left = rewrite(binary.left());
    Expression right = rewrite(binary.right());
    return left == binary.left() && right == binary.right()
        ? binary
        : new Binary(binary.operator(), left, right);
  }

  @Override
  public Expression call(Call call) {
    List<Expression> arguments = rewriteAll(call.arguments());
    return arguments == call.arguments() ? call : new Call(call.function(), arguments);
  }

  @Override
  public Expression comparison(Comparison comparison) {
    Expression left = rewrite(comparison.left());
    Expression right = rewrite(comparison.right());
    return left == comparison.left() && right == comparison.right()
        ? comparison
        : new Comparison(comparison.relation(), left, right);
  }

  @Override
  public Expression logical(Logical logical) {
    List<Expression> conditions = rewriteAll(logical.conditions());
    return conditions == logical.conditions()
        ? logical
        : new Logical(logical.connective(), conditions);
  }

  @Override
  public Expression conditional(Conditional conditional) {
    Expression condition = rewrite(conditional.condition());
    Expression then = rewrite(conditional.then());
    Expression otherwise = rewrite(conditional.otherwise());
    return condition == conditional.condition()
            && then == conditional.then()
            && otherwise == conditional.otherwise()
        ? conditional
        : new Conditional(condition, then, otherwise);
  }
}
