package org.hullsum.expression;

import java.util.List;
import java.util.Map;
import org.hullsum.expression.Tape.Instruction;
import org.hullsum.numeric.Interval;

/**
 * Evaluates several formulas together over a box: each result contains every value that the formula
 * takes in the box where it is defined, rounding included. Where a formula jumps, the result
 * contains the values on both sides.
 *
 * <p>Immutable and thread-safe: what changes is in a {@link Workspace}, one per thread.
 */
public final class IntervalEvaluator {
  private static final Interval UNUSED = Interval.point(0);

  private final int variableCount;
  private final List<Instruction> instructions;
  private final int[] outputs;

  /** Scratch memory of one thread. */
  public static final class Workspace {
    private final IntervalEvaluator owner;
    private final Interval[] values;

    private Workspace(IntervalEvaluator owner) {
      this.owner = owner;
      this.values = new Interval[owner.instructions.size()];
    }
  }

  private IntervalEvaluator(int variableCount, Tape tape) {
    this.variableCount = variableCount;
    this.instructions = tape.instructions();
    this.outputs = tape.outputs().stream().mapToInt(Integer::intValue).toArray();
  }

  /**
   * Compiles formulas.
   *
   * @param variables names of the inputs, in their order
   * @param constants values of all other symbols
   * @param outputs the formulas
   * @throws IllegalArgumentException where a symbol is neither
   */
  public static IntervalEvaluator compile(
      List<String> variables, Map<String, Double> constants, List<Expression> outputs) {
    return new IntervalEvaluator(
        variables.size(),
        new TapeBuilder(variables, constants, TapeBuilder.Powers.WHOLE).build(outputs));
  }

  public int variableCount() {
    return variableCount;
  }

  public int outputCount() {
    return outputs.length;
  }

  /** Scratch memory, for one thread at a time. */
  public Workspace workspace() {
    return new Workspace(this);
  }

  /**
   * Evaluates all formulas over a box.
   *
   * @param inputs the range of each variable
   * @param results written: an interval per formula
   * @param workspace from this evaluator's {@link #workspace}
   */
  public void evaluate(Interval[] inputs, Interval[] results, Workspace workspace) {
    if (workspace.owner != this) {
      throw new IllegalArgumentException("the workspace belongs to another evaluator");
    }
    Interval[] values = workspace.values;
    for (int place = 0; place < values.length; place++) {
      Instruction step = instructions.get(place);
      values[place] =
          switch (step.operation()) {
            case INPUT -> inputs[step.a()];
            case CONSTANT -> constant(step.value());
            default ->
                IntervalOperations.apply(
                    step.operation(),
                    operand(values, step, 0),
                    operand(values, step, 1),
                    operand(values, step, 2),
                    step.value());
          };
    }
    for (int k = 0; k < outputs.length; k++) {
      results[k] = values[outputs[k]];
    }
  }

  private static Interval operand(Interval[] values, Instruction step, int k) {
    return step.uses(k) ? values[step.operand(k)] : UNUSED;
  }

  /** A constant that was computed at compile time may be undefined. */
  private static Interval constant(double value) {
    return Double.isNaN(value) ? Interval.ALL : Interval.point(value);
  }
}
