package org.hullsum.expression;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
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
  /** How powers with a whole exponent are carried out. */
  enum Powers {
    /** By repeated multiplication: fastest at points. */
    MULTIPLIED,
    /** As one instruction: tight for intervals. */
    WHOLE
  }

  /** Beyond this exponent the library's power is as fast and more accurate. */
  private static final int MOST_MULTIPLIED = 32;

  private final List<String> variables;
  private final Map<String, Double> constants;
  private final Powers powers;
  private final List<Instruction> instructions = new ArrayList<>();
  private final List<Expression> sources = new ArrayList<>();
  private final Map<Instruction, Integer> known = new HashMap<>();
  private final Map<Expression, Integer> done = new IdentityHashMap<>();
  private Expression current = Algebra.ZERO;

  /**
   * @param variables names of the inputs, in their order
   * @param constants values of the other symbols
   */
  TapeBuilder(List<String> variables, Map<String, Double> constants, Powers powers) {
    this.variables = List.copyOf(variables);
    this.constants = Map.copyOf(constants);
    this.powers = powers;
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
      return number(operation.apply(value(a), value(b), value(c)));
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

  /** Adding or subtracting 0, multiplying or dividing by 1. */
  private boolean unchanged(Operator operator, int right) {
    return switch (operator) {
      case ADD, SUBTRACT -> constant(right, 0);
      case MULTIPLY, DIVIDE -> constant(right, 1);
      case POWER -> false;
    };
  }

  private int power(int base, double exponent) {
    if (constant(base)) {
      return number(Math.pow(value(base), exponent));
    }
    if (exponent == 0) {
      return number(1);
    }
    double size = Math.abs(exponent);
    boolean whole = size == Math.rint(size);
    if (size > MOST_MULTIPLIED || 2 * size != Math.rint(2 * size)) {
      return whole && powers == Powers.WHOLE && size <= Integer.MAX_VALUE
          ? emit(new Instruction(Operation.INTEGER_POWER, base, -1, -1, exponent))
          : emit(Operation.POWER, base, number(exponent));
    }
    int positive = whole ? wholePower(base, (int) size) : halfPower(base, size);
    return exponent > 0 ? positive : emit(Operation.DIVIDE, number(1), positive);
  }

  private int halfPower(int base, double exponent) {
    int root = emit(Operation.SQRT, base);
    int whole = (int) exponent;
    return whole == 0 ? root : emit(Operation.MULTIPLY, wholePower(base, whole), root);
  }

  private int wholePower(int base, int exponent) {
    if (exponent == 1) {
      return base;
    }
    if (powers == Powers.WHOLE) {
      return emit(new Instruction(Operation.INTEGER_POWER, base, -1, -1, exponent));
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
