package org.hullsum.expression;

import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Symbol;

/**
 * The total degree of an expression that is a polynomial in some of its symbols, as it is written:
 * terms that would cancel count, so the answer is an upper bound.
 */
public final class Degree implements Expression.Visitor<Integer> {
  private static final int NOT_POLYNOMIAL = -1;

  /** Powers beyond this are not called polynomials, so that degrees stay far from overflow. */
  private static final int HIGHEST = 10_000;

  private final Set<String> symbols;
  private final Map<Expression, Integer> done = new IdentityHashMap<>();

  private Degree(Set<String> symbols) {
    this.symbols = Set.copyOf(symbols);
  }

  /** The degree; empty where the expression is no polynomial in the symbols. */
  public static OptionalInt in(Expression e, Set<String> symbols) {
    int degree = new Degree(symbols).of(e);
    return degree == NOT_POLYNOMIAL ? OptionalInt.empty() : OptionalInt.of(degree);
  }

  private int of(Expression e) {
    Integer known = done.get(e);
    if (known == null) {
      known = e.accept(this);
      done.put(e, known);
    }
    return known;
  }

  @Override
  public Integer constant(Constant constant) {
    return 0;
  }

  @Override
  public Integer symbol(Symbol symbol) {
    return symbols.contains(symbol.name()) ? 1 : 0;
  }

  @Override
  public Integer negation(Negation negation) {
    return of(negation.operand());
  }

  @Override
  public Integer binary(Binary binary) {
    int left = of(binary.left());
    int right = of(binary.right());
    if (left == NOT_POLYNOMIAL || right == NOT_POLYNOMIAL) {
      return NOT_POLYNOMIAL;
    }
    return switch (binary.operator()) {
      case ADD, SUBTRACT -> Math.max(left, right);
      case MULTIPLY -> bounded((long) left + right);
      case DIVIDE -> right == 0 ? left : NOT_POLYNOMIAL;
      case POWER -> power(left, right, binary.right());
    };
  }

  private static int power(int base, int exponentDegree, Expression exponent) {
    if (base == 0 && exponentDegree == 0) {
      return 0;
    }
    Optional<Double> value = Algebra.valueOf(exponent);
    if (value.isEmpty() || value.get() < 0 || value.get() != Math.rint(value.get())) {
      return NOT_POLYNOMIAL;
    }
    return value.get() > HIGHEST ? NOT_POLYNOMIAL : bounded((long) base * value.get().intValue());
  }

  private static int bounded(long degree) {
    return degree > HIGHEST ? NOT_POLYNOMIAL : (int) degree;
  }

  @Override
  public Integer call(Call call) {
    return constantIn(call.arguments());
  }

  @Override
  public Integer comparison(Comparison comparison) {
    return constantIn(comparison.children());
  }

  @Override
  public Integer logical(Logical logical) {
    return constantIn(logical.conditions());
  }

  @Override
  public Integer conditional(Conditional conditional) {
    if (of(conditional.condition()) != 0) {
      return NOT_POLYNOMIAL;
    }
    int then = of(conditional.then());
    int otherwise = of(conditional.otherwise());
    return then == NOT_POLYNOMIAL || otherwise == NOT_POLYNOMIAL
        ? NOT_POLYNOMIAL
        : Math.max(then, otherwise);
  }

  private int constantIn(List<Expression> operands) {
    return operands.stream().allMatch(operand -> of(operand) == 0) ? 0 : NOT_POLYNOMIAL;
  }
}
