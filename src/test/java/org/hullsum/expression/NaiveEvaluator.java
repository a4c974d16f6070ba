package org.hullsum.expression;

import java.util.Map;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Connective;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Symbol;
import org.hullsum.numeric.ErrorFunction;

/** One point through the tree: the oracle for everything that compiles or rewrites. */
final class NaiveEvaluator implements Expression.Visitor<Double> {
  private final Map<String, Double> values;

  private NaiveEvaluator(Map<String, Double> values) {
    this.values = values;
  }

  static double evaluate(Expression e, Map<String, Double> values) {
    return e.accept(new NaiveEvaluator(values));
  }

  private double of(Expression e) {
    return e.accept(this);
  }

  private boolean holds(Expression e) {
    return of(e) != 0;
  }

  @Override
  public Double constant(Constant constant) {
    return constant.value();
  }

  @Override
  public Double symbol(Symbol symbol) {
    return values.get(symbol.name());
  }

  @Override
  public Double negation(Negation negation) {
    return -of(negation.operand());
  }

  @Override
  public Double binary(Binary b) {
    double left = of(b.left());
    double right = of(b.right());
    return switch (b.operator()) {
      case ADD -> left + right;
      case SUBTRACT -> left - right;
      case MULTIPLY -> left * right;
      case DIVIDE -> left / right;
      case POWER -> power(left, right);
    };
  }

  /** As the library has it, but that no broken power of −∞ is defined. */
  private static double power(double base, double exponent) {
    return base == Double.NEGATIVE_INFINITY && exponent != Math.rint(exponent)
        ? Double.NaN
        : Math.pow(base, exponent);
  }

  @Override
  public Double call(Call call) {
    double[] v = call.arguments().stream().mapToDouble(this::of).toArray();
    return switch (call.function()) {
      case SIN -> Math.sin(v[0]);
      case COS -> Math.cos(v[0]);
      case TAN -> Math.tan(v[0]);
      case ASIN -> Math.asin(v[0]);
      case ACOS -> Math.acos(v[0]);
      case ATAN -> Math.atan(v[0]);
      case ATAN2 -> Math.atan2(v[0], v[1]);
      case SINH -> Math.sinh(v[0]);
      case COSH -> Math.cosh(v[0]);
      case TANH -> Math.tanh(v[0]);
      case EXP -> Math.exp(v[0]);
      case LN -> Math.log(v[0]);
      case LOG10 -> Math.log10(v[0]);
      case SQRT -> Math.sqrt(v[0]);
      case CBRT -> Math.cbrt(v[0]);
      case ABS -> Math.abs(v[0]);
      case MIN -> java.util.Arrays.stream(v).reduce(Math::min).orElseThrow();
      case MAX -> java.util.Arrays.stream(v).reduce(Math::max).orElseThrow();
      case SIGN -> Math.signum(v[0]);
      case HYPOT -> Math.hypot(v[0], v[1]);
      case ERF -> ErrorFunction.erf(v[0]);
      case ERFC -> ErrorFunction.erfc(v[0]);
    };
  }

  @Override
  public Double comparison(Comparison c) {
    double left = of(c.left());
    double right = of(c.right());
    boolean holds =
        switch (c.relation()) {
          case LESS -> left < right;
          case LESS_OR_EQUAL -> left <= right;
          case GREATER -> left > right;
          case GREATER_OR_EQUAL -> left >= right;
          case EQUAL -> left == right;
          case NOT_EQUAL -> left != right;
        };
    return holds ? 1.0 : 0.0;
  }

  @Override
  public Double logical(Logical logical) {
    boolean holds =
        logical.connective() == Connective.NOT
            ? !holds(logical.conditions().get(0))
            : logical.connective() == Connective.AND
                ? logical.conditions().stream().allMatch(this::holds)
                : logical.conditions().stream().anyMatch(this::holds);
    return holds ? 1.0 : 0.0;
  }

  @Override
  public Double conditional(Conditional c) {
    return holds(c.condition()) ? of(c.then()) : of(c.otherwise());
  }
}
