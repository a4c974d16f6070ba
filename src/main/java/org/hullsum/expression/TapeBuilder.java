package org.hullsum.expression;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
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
import org.hullsum.expression.Expression.Symbol;
import org.hullsum.expression.Tape.Instruction;

/**
 * Turns expressions into a {@link Tape}: equal sub-expressions become one instruction, constant
 * ones are computed at once, whole and half powers become products and roots.
 */
final class TapeBuilder implements Expression.Visitor<Integer> {
  /** What the tape is to be run over. */
  enum Purpose {
    /** Points: powers are multiplied out, constant parts computed at once. */
    POINTS,
    /**
     * Intervals: a whole power is one instruction, constants are joined only where that is exact,
     * and quotients that stay finite where their divisor vanishes are seen as such.
     */
    ENCLOSURES
  }

  /** Beyond this exponent the library's power is as fast and more accurate. */
  private static final int MOST_MULTIPLIED = 32;

  private static final double HALF = 0.5;

  private final List<String> variables;
  private final Map<String, Double> constants;
  private final Purpose purpose;
  private final List<Instruction> instructions = new ArrayList<>();
  private final List<Expression> sources = new ArrayList<>();
  private final Map<Instruction, Integer> known = new HashMap<>();
  private final Map<Expression, Integer> done = new IdentityHashMap<>();
  private Expression current = Algebra.ZERO;

  /**
   * @param variables names of the inputs, in their order
   * @param constants values of the other symbols
   */
  TapeBuilder(List<String> variables, Map<String, Double> constants, Purpose purpose) {
    this.variables = List.copyOf(variables);
    this.constants = Map.copyOf(constants);
    this.purpose = purpose;
  }

  /**
   * The tape of the given outputs.
   *
   * @throws IllegalArgumentException where a symbol is neither a variable nor a constant
   */
  Tape build(List<Expression> outputs) {
    List<Integer> places = new ArrayList<>();
    for (Expression output : outputs) {
      places.add(of(output));
    }
    return pruned(places);
  }

  /** The value of an expression without symbols; empty where it has some. */
  static Optional<Double> constant(Expression e) {
    if (!Symbols.in(e).isEmpty()) {
      return Optional.empty();
    }
    Tape tape = new TapeBuilder(List.of(), Map.of(), Purpose.POINTS).build(List.of(e));
    return Optional.of(tape.instructions().get(tape.outputs().get(0)).value());
  }

  private int of(Expression e) {
    Integer place = done.get(e);
    if (place == null) {
      Expression outer = current;
      current = e;
      place = e.accept(this);
      current = outer;
      done.put(e, place);
    }
    return place;
  }

  private int emit(Instruction instruction) {
    Integer place = known.get(instruction);
    if (place == null) {
      place = instructions.size();
      instructions.add(instruction);
      sources.add(current);
      known.put(instruction, place);
    }
    return place;
  }

  private int number(double value) {
    return emit(Instruction.constant(value));
  }

  private boolean constant(int place) {
    return place < 0 || instructions.get(place).operation() == Operation.CONSTANT;
  }

  private boolean constant(int place, double value) {
    return constant(place) && value(place) == value;
  }

  private double value(int place) {
    return place < 0 ? 0 : instructions.get(place).value();
  }

  private int emit(Operation operation, int a, int b, int c) {
    if (constant(a) && constant(b) && constant(c)) {
      double value = operation.apply(value(a), value(b), value(c));
      if (purpose == Purpose.POINTS || operation.isExact(value(a), value(b), value)) {
        return number(value);
      }
    }
    boolean swap = operation.commutes() && a > b;
    return emit(new Instruction(operation, swap ? b : a, swap ? a : b, c, 0));
  }

  private int emit(Operation operation, int a, int b) {
    return emit(operation, a, b, -1);
  }

  private int emit(Operation operation, int a) {
    return emit(operation, a, -1, -1);
  }

  @Override
  public Integer constant(Constant constant) {
    return number(constant.value());
  }

  @Override
  public Integer symbol(Symbol symbol) {
    int variable = variables.indexOf(symbol.name());
    if (variable >= 0) {
      return emit(Instruction.input(variable));
    }
    Double value = constants.get(symbol.name());
    if (value == null) {
      throw new IllegalArgumentException(
          "symbol " + symbol.name() + " is neither a variable " + variables + " nor a constant");
    }
    return number(value);
  }

  @Override
  public Integer negation(Negation negation) {
    return emit(Operation.NEGATE, of(negation.operand()));
  }

  @Override
  public Integer binary(Binary b) {
    if (purpose == Purpose.ENCLOSURES && b.operator() == Operator.DIVIDE) {
      Optional<RemovableQuotient> removable = RemovableQuotient.of(b, variables);
      if (removable.isPresent()) {
        return removable(removable.get());
      }
    }
    int left = of(b.left());
    int right = of(b.right());
    if (b.operator() == Operator.POWER && constant(right)) {
      return power(left, value(right));
    }
    if (unchanged(b.operator(), right)) {
      return left;
    }
    if (b.operator() == Operator.MULTIPLY && constant(left, 1)
        || b.operator() == Operator.ADD && constant(left, 0)) {
      return right;
    }
    return emit(Operation.of(b.operator()), left, right);
  }

  private int removable(RemovableQuotient q) {
    int divisor = enclosedPower(of(q.variable()), q.order());
    int quotient = emit(Operation.REMOVABLE_DIVIDE, of(q.numerator()), divisor, of(q.meanValue()));
    return q.rest().isEmpty() ? quotient : emit(Operation.DIVIDE, quotient, of(q.rest().get()));
  }

  /** Adding or subtracting 0, multiplying or dividing by 1. */
  private boolean unchanged(Operator operator, int right) {
    return switch (operator) {
      case ADD, SUBTRACT -> constant(right, 0);
      case MULTIPLY, DIVIDE -> constant(right, 1);
      case POWER -> false;
    };
  }

  private int power(int base, double exponent) {
    if (exponent == 0) {
      return number(1);
    }
    if (constant(base) && purpose == Purpose.POINTS) {
      return number(Math.pow(value(base), exponent));
    }
    return purpose == Purpose.POINTS
        ? multipliedPower(base, exponent)
        : enclosedPower(base, exponent);
  }

  private int reciprocal(int place) {
    return emit(Operation.DIVIDE, number(1), place);
  }

  private int enclosedPower(int base, double exponent) {
    double size = Math.abs(exponent);
    int positive;
    if (size == 1) {
      positive = base;
    } else if (size == Math.rint(size) && size <= Integer.MAX_VALUE) {
      positive = emit(new Instruction(Operation.INTEGER_POWER, base, -1, -1, size));
    } else {
      positive =
          size == HALF ? emit(Operation.SQRT, base) : emit(Operation.POWER, base, number(size));
    }
    return exponent > 0 ? positive : reciprocal(positive);
  }

  private int multipliedPower(int base, double exponent) {
    double size = Math.abs(exponent);
    if (size > MOST_MULTIPLIED || 2 * size != Math.rint(2 * size)) {
      return emit(Operation.POWER, base, number(exponent));
    }
    int whole = (int) size;
    int positive = whole == 0 ? -1 : wholePower(base, whole);
    if (size != whole) {
      int root = emit(Operation.SQRT, base);
      positive = whole == 0 ? root : emit(Operation.MULTIPLY, positive, root);
    }
    return exponent > 0 ? positive : reciprocal(positive);
  }

  private int wholePower(int base, int exponent) {
    if (exponent == 1) {
      return base;
    }
    int half = wholePower(base, exponent / 2);
    int square = emit(Operation.MULTIPLY, half, half);
    return exponent % 2 == 0 ? square : emit(Operation.MULTIPLY, square, base);
  }

  @Override
  public Integer call(Call call) {
    List<Expression> arguments = call.arguments();
    Operation operation = Operation.of(call.function());
    int result = of(arguments.get(0));
    if (operation.arity() == 1) {
      return emit(operation, result);
    }
    for (Expression next : arguments.subList(1, arguments.size())) {
      result = emit(operation, result, of(next));
    }
    return result;
  }

  @Override
  public Integer comparison(Comparison comparison) {
    return emit(Operation.of(comparison.relation()), of(comparison.left()), of(comparison.right()));
  }

  @Override
  public Integer logical(Logical logical) {
    List<Expression> conditions = logical.conditions();
    int result = of(conditions.get(0));
    if (logical.connective() == Connective.NOT) {
      return emit(Operation.NOT, result);
    }
    Operation operation = logical.connective() == Connective.AND ? Operation.AND : Operation.OR;
    for (Expression next : conditions.subList(1, conditions.size())) {
      result = emit(operation, result, of(next));
    }
    return result;
  }

  @Override
  public Integer conditional(Conditional conditional) {
    int condition = of(conditional.condition());
    if (constant(condition)) {
      return of(value(condition) != 0 ? conditional.then() : conditional.otherwise());
    }
    int then = of(conditional.then());
    int otherwise = of(conditional.otherwise());
    return then == otherwise ? then : emit(Operation.SELECT, condition, then, otherwise);
  }

  /** Only what the outputs need, renumbered. */
  private Tape pruned(List<Integer> outputs) {
    boolean[] needed = new boolean[instructions.size()];
    outputs.forEach(place -> needed[place] = true);
    for (int i = needed.length - 1; i >= 0; i--) {
      Instruction instruction = instructions.get(i);
      for (int k = 0; needed[i] && k < 3; k++) {
        if (instruction.uses(k)) {
          needed[instruction.operand(k)] = true;
        }
      }
    }
    int[] renumbered = new int[needed.length];
    Arrays.fill(renumbered, -1);
    List<Instruction> kept = new ArrayList<>();
    List<Expression> keptSources = new ArrayList<>();
    for (int i = 0; i < needed.length; i++) {
      if (needed[i]) {
        Instruction old = instructions.get(i);
        renumbered[i] = kept.size();
        kept.add(
            new Instruction(
                old.operation(),
                old.uses(0) ? renumbered[old.a()] : old.a(),
                old.uses(1) ? renumbered[old.b()] : old.b(),
                old.uses(2) ? renumbered[old.c()] : old.c(),
                old.value()));
        keptSources.add(sources.get(i));
      }
    }
    return new Tape(kept, outputs.stream().map(place -> renumbered[place]).toList(), keptSources);
  }
}
