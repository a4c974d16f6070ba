package org.hullsum.expression;

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
import org.hullsum.expression.Expression.Symbol;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.hullsum.units.Dimension;

/**
 * The gradual dimension check of a formula.
 *
 * <p>Quantities, coordinates and parameters carry their dimension; a bare number is free and takes
 * whatever dimension is needed. A sum, a comparison, {@code min}, {@code max}, {@code hypot},
 * {@code atan2} and the branches of {@code if} need terms of one dimension, a free term fitting
 * any; a product or quotient with a free factor is free; the other functions need plain numbers
 * (angles are plain), but {@code sqrt}, {@code cbrt}, {@code abs} and {@code sign}; a power of a
 * dimensioned base needs a number for its exponent. O(size).
 */
public final class DimensionCheck implements Expression.Visitor<Optional<Dimension>> {
  private final ParsedExpression parsed;
  private final Map<String, Optional<Dimension>> symbols;
  private final Map<Expression, Optional<Dimension>> done = new IdentityHashMap<>();
  private Optional<TextFault> fault = Optional.empty();

  private DimensionCheck(ParsedExpression parsed, Map<String, Optional<Dimension>> symbols) {
    this.parsed = parsed;
    this.symbols = symbols;
  }

  /**
   * The dimension of a formula.
   *
   * @param parsed the formula with its text
   * @param symbols the dimension of every symbol in it, empty for one that is free
   * @return the dimension; empty where bare numbers leave it free
   * @throws TextFault of kind {@code DIMENSION} at the first sub-expression whose terms do not fit
   */
  public static Optional<Dimension> of(
      ParsedExpression parsed, Map<String, Optional<Dimension>> symbols) throws TextFault {
    DimensionCheck check = new DimensionCheck(parsed, symbols);
    Optional<Dimension> found = check.dimension(parsed.root());
    if (check.fault.isPresent()) {
      throw check.fault.get();
    }
    return found;
  }

  private Optional<Dimension> dimension(Expression e) {
    if (fault.isPresent()) {
      return Optional.empty();
    }
    Optional<Dimension> known = done.get(e);
    if (known == null) {
      known = e.accept(this);
      done.put(e, known);
    }
    return known;
  }

  @Override
  public Optional<Dimension> constant(Constant constant) {
    return constant.dimension();
  }

  @Override
  public Optional<Dimension> symbol(Symbol symbol) {
    return symbols.getOrDefault(symbol.name(), Optional.empty());
  }

  @Override
  public Optional<Dimension> negation(Negation negation) {
    return dimension(negation.operand());
  }

  @Override
  public Optional<Dimension> binary(Binary binary) {
    return switch (binary.operator()) {
      case ADD -> alike("`+` adds", List.of(binary.left(), binary.right()));
      case SUBTRACT -> alike("`-` subtracts", List.of(binary.left(), binary.right()));
      case MULTIPLY -> product(binary, 1);
      case DIVIDE -> product(binary, -1);
      case POWER -> power(binary);
    };
  }

  private Optional<Dimension> product(Binary binary, int sign) {
    Optional<Dimension> left = dimension(binary.left());
    Optional<Dimension> right = dimension(binary.right());
    return left.isEmpty() || right.isEmpty()
        ? Optional.empty()
        : Optional.of(left.get().times(right.get().power(sign)));
  }

  private Optional<Dimension> power(Binary binary) {
    Optional<Dimension> base = dimension(binary.left());
    plain("an exponent is a plain number", binary.right());
    if (base.isEmpty() || base.get().isNone()) {
      return base;
    }
    Optional<Double> exponent = number(binary.right());
    if (exponent.isEmpty()) {
      return refuse(
          binary.right(),
          "the base is in "
              + base.get()
              + ", so its exponent must be a number, not a formula: divide the base by a scale first");
    }
    return scaled(binary, base.get(), exponent.get());
  }

  private static Optional<Double> number(Expression e) {
    return TapeBuilder.constant(e).filter(Double::isFinite);
  }

  private Optional<Dimension> scaled(Expression whole, Dimension base, double exponent) {
    try {
      return Optional.of(base.power(exponent));
    } catch (ArithmeticException notADimension) {
      return refuse(
          whole,
          "the power " + exponent + " of " + base + " is no dimension: use whole or half powers");
    }
  }

  @Override
  public Optional<Dimension> call(Call call) {
    List<Expression> arguments = call.arguments();
    String name = "`" + call.function().word() + "`";
    return switch (call.function()) {
      case ABS -> dimension(arguments.get(0));
      case SIGN -> {
        dimension(arguments.get(0));
        yield Optional.of(Dimension.NONE);
      }
      case MIN, MAX, HYPOT -> alike(name + " compares", arguments);
      case ATAN2 -> {
        alike(name + " compares", arguments);
        yield Optional.of(Dimension.NONE);
      }
      case SQRT -> root(call, 1.0 / 2);
      case CBRT -> root(call, 1.0 / 3);
      case SIN, COS, TAN, ASIN, ACOS, ATAN, SINH, COSH, TANH, EXP, LN, LOG10, ERF, ERFC -> {
        plain(name + " takes a plain number or an angle", arguments.get(0));
        yield Optional.of(Dimension.NONE);
      }
    };
  }

  private Optional<Dimension> root(Call call, double exponent) {
    Optional<Dimension> argument = dimension(call.arguments().get(0));
    return argument.isEmpty() ? argument : scaled(call, argument.get(), exponent);
  }

  @Override
  public Optional<Dimension> comparison(Comparison comparison) {
    alike("a comparison compares", List.of(comparison.left(), comparison.right()));
    return Optional.of(Dimension.NONE);
  }

  @Override
  public Optional<Dimension> logical(Logical logical) {
    logical.conditions().forEach(this::dimension);
    return Optional.of(Dimension.NONE);
  }

  @Override
  public Optional<Dimension> conditional(Conditional conditional) {
    dimension(conditional.condition());
    return alike("`if` chooses between", List.of(conditional.then(), conditional.otherwise()));
  }

  /** The one dimension of several terms; a free term takes the dimension of the others. */
  private Optional<Dimension> alike(String does, List<Expression> terms) {
    Optional<Dimension> common = Optional.empty();
    Optional<Expression> first = Optional.empty();
    for (Expression term : terms) {
      Optional<Dimension> found = dimension(term);
      if (found.isEmpty()) {
        continue;
      }
      if (common.isPresent() && !common.equals(found)) {
        return refuse(
            term, does + " " + told(first.get(), common.get()) + " and " + told(term, found.get()));
      }
      common = found;
      first = Optional.of(term);
    }
    return common;
  }

  private void plain(String rule, Expression e) {
    Optional<Dimension> found = dimension(e);
    if (found.isPresent() && !found.get().isNone()) {
      refuse(e, rule + "; " + told(e, found.get()) + ": divide it by a scale of that dimension");
    }
  }

  private String told(Expression e, Dimension dimension) {
    int[] span = parsed.spanOf(e);
    return "`"
        + parsed.text().substring(span[0], span[1])
        + "` "
        + (dimension.isNone() ? "(a plain number)" : "(in " + dimension + ")");
  }

  private Optional<Dimension> refuse(Expression at, String message) {
    if (fault.isEmpty()) {
      fault = Optional.of(parsed.faultAt(at, ProblemKind.DIMENSION, message));
    }
    return Optional.empty();
  }
}
