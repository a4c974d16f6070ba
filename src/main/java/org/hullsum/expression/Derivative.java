package org.hullsum.expression;

import static org.hullsum.expression.Algebra.difference;
import static org.hullsum.expression.Algebra.isZero;
import static org.hullsum.expression.Algebra.logarithm;
import static org.hullsum.expression.Algebra.power;
import static org.hullsum.expression.Algebra.product;
import static org.hullsum.expression.Algebra.quotient;
import static org.hullsum.expression.Algebra.sum;

import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Relation;
import org.hullsum.expression.Expression.Symbol;

/**
 * The partial derivative of an expression by one symbol, as an expression.
 *
 * <p>{@code abs}, {@code min}, {@code max}, {@code sign} and {@code if} are derived piecewise: the
 * result holds off the curves where they switch (see {@link Switches}); a jump leaves no trace in
 * it. Conditions stay as they are. Every shared sub-expression is derived once, so the cost is
 * linear in the number of distinct nodes.
 */
public final class Derivative implements Expression.Visitor<Expression> {
  private static final Constant TWO = Expression.number(2);
  private static final Constant PI = new Constant(Math.PI, Optional.empty(), Optional.of("pi"));

  private final String symbol;
  private final Map<Expression, Expression> done = new IdentityHashMap<>();

  private Derivative(String symbol) {
    this.symbol = symbol;
  }

  /** The simplified derivative of {@code e} by the symbol; 0 where it does not occur. */
  public static Expression of(Expression e, String symbol) {
    return Simplifier.simplify(raw(e, symbol));
  }

  /** The derivative with only the rules for 0 and 1 applied. */
  static Expression raw(Expression e, String symbol) {
    return new Derivative(symbol).derive(e);
  }

  private Expression derive(Expression e) {
    Expression known = done.get(e);
    if (known == null) {
      known = e.accept(this);
      done.put(e, known);
    }
    return known;
  }

  @Override
  public Expression constant(Constant constant) {
    return Algebra.ZERO;
  }

  @Override
  public Expression symbol(Symbol s) {
    return s.name().equals(symbol) ? Algebra.ONE : Algebra.ZERO;
  }

  @Override
  public Expression negation(Negation n) {
    return Algebra.negation(derive(n.operand()));
  }

  @Override
  public Expression comparison(Comparison comparison) {
    return Algebra.ZERO;
  }

  @Override
  public Expression logical(Logical logical) {
    return Algebra.ZERO;
  }

  @Override
  public Expression conditional(Conditional c) {
    return choice(c.condition(), derive(c.then()), derive(c.otherwise()));
  }

  private static Expression choice(Expression condition, Expression then, Expression otherwise) {
    return then.equals(otherwise) ? then : new Conditional(condition, then, otherwise);
  }

  @Override
  public Expression binary(Binary b) {
    Expression u = b.left();
    Expression v = b.right();
    Expression du = derive(u);
    Expression dv = derive(v);
    return switch (b.operator()) {
      case ADD -> sum(du, dv);
      case SUBTRACT -> difference(du, dv);
      case MULTIPLY -> sum(product(du, v), product(u, dv));
      case DIVIDE ->
          isZero(dv)
              ? quotient(du, v)
              : quotient(difference(product(du, v), product(u, dv)), power(v, 2));
      case POWER -> powerRule(b, du, dv);
    };
  }

  private static Expression powerRule(Binary b, Expression du, Expression dv) {
    Expression u = b.left();
    Expression v = b.right();
    if (isZero(dv)) {
      return product(product(v, power(u, difference(v, Algebra.ONE))), du);
    }
    if (isZero(du)) {
      return product(product(b, logarithm(u)), dv);
    }
    return product(b, sum(product(dv, logarithm(u)), quotient(product(v, du), u)));
  }

  @Override
  public Expression call(Call call) {
    List<Expression> arguments = call.arguments();
    return switch (call.function()) {
      case MIN -> extreme(call, Relation.LESS_OR_EQUAL);
      case MAX -> extreme(call, Relation.GREATER_OR_EQUAL);
      case ATAN2 -> angle(arguments.get(0), arguments.get(1));
      case HYPOT -> {
        Expression a = arguments.get(0);
        Expression b = arguments.get(1);
        yield quotient(sum(product(a, derive(a)), product(b, derive(b))), call);
      }
      default -> {
        Expression inner = derive(arguments.get(0));
        yield isZero(inner) ? Algebra.ZERO : product(outer(call, arguments.get(0)), inner);
      }
    };
  }

  private Expression angle(Expression y, Expression x) {
    return quotient(
        difference(product(x, derive(y)), product(y, derive(x))), sum(power(x, 2), power(y, 2)));
  }

  /** Of the first argument where it is the extreme of all, else of the extreme of the others. */
  private Expression extreme(Call call, Relation relation) {
    List<Expression> arguments = call.arguments();
    int last = arguments.size() - 1;
    Expression rest = arguments.get(last);
    Expression derivative = derive(rest);
    for (int i = last - 1; i >= 0; i--) {
      Expression first = arguments.get(i);
      derivative = choice(new Comparison(relation, first, rest), derive(first), derivative);
      rest = Expression.call(call.function(), first, rest);
    }
    return derivative;
  }

  /** The derivative of a function of one argument u, by u. */
  private static Expression outer(Call call, Expression u) {
    return switch (call.function()) {
      case SIN -> Expression.call(Function.COS, u);
      case COS -> Algebra.negation(Expression.call(Function.SIN, u));
      case TAN -> sum(Algebra.ONE, power(call, 2));
      case ASIN -> quotient(Algebra.ONE, oneLessSquare(u));
      case ACOS -> Algebra.negation(quotient(Algebra.ONE, oneLessSquare(u)));
      case ATAN -> quotient(Algebra.ONE, sum(Algebra.ONE, power(u, 2)));
      case SINH -> Expression.call(Function.COSH, u);
      case COSH -> Expression.call(Function.SINH, u);
      case TANH -> difference(Algebra.ONE, power(call, 2));
      case EXP -> call;
      case LN -> quotient(Algebra.ONE, u);
      case LOG10 ->
          quotient(Algebra.ONE, product(u, Expression.call(Function.LN, Expression.number(10))));
      case SQRT -> quotient(Algebra.ONE, product(TWO, call));
      case CBRT -> quotient(Algebra.ONE, product(Expression.number(3), power(call, 2)));
      case ABS -> Expression.call(Function.SIGN, u);
      case SIGN -> Algebra.ZERO;
      case ERF -> bell(u);
      case ERFC -> Algebra.negation(bell(u));
      case MIN, MAX, ATAN2, HYPOT ->
          throw new IllegalStateException(call.function() + " has several arguments");
    };
  }

  private static Expression oneLessSquare(Expression u) {
    return Expression.call(Function.SQRT, difference(Algebra.ONE, power(u, 2)));
  }

  /** 2/√π exp(−u²). */
  private static Expression bell(Expression u) {
    return product(
        quotient(TWO, Expression.call(Function.SQRT, PI)),
        Expression.call(Function.EXP, Algebra.negation(power(u, 2))));
  }
}
