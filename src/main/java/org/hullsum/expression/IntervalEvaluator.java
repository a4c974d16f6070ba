package org.hullsum.expression;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.hullsum.expression.Tape.Instruction;
import org.hullsum.numeric.Interval;

/**
 * Encloses the values of several formulas over boxes of their variables, rounding included, and
 * says where over a box they may be undefined.
 *
 * <p>The interval of a formula contains its value at every point of the box where it is defined; it
 * may be wider, the more so the larger the box. A condition on what is undefined counts as
 * undefined here, though at points it does not hold. Where the condition of an {@code if} is
 * decided over the box only the branch that holds counts, also for the hazards. A quotient such as
 * {@code sin(r)/r}, whose numerator vanishes with the variable that divides it, is enclosed by the
 * mean value of a derivative where the box reaches r = 0 and is no hazard.
 *
 * <p>Immutable and thread-safe: what changes is in a {@link Workspace}, one per thread. An
 * evaluation allocates nothing and costs some ten nanoseconds for each instruction.
 */
public final class IntervalEvaluator {
  private static final int UNUSED = 0;
  private static final int PERHAPS = 1;
  private static final int SURELY = 2;

  private final int variableCount;
  private final Instruction[] steps;
  private final boolean[] fixed;
  private final int[] outputs;
  private final List<Hazard> hazards;
  private final int[] hazardSteps;

  /** The intervals of one thread's last evaluation. */
  public static final class Workspace {
    private final IntervalEvaluator owner;
    private final double[] low;
    private final double[] high;
    private final Enclosures enclosures;
    private final double[] inputLow;
    private final double[] inputHigh;
    private final int[] use;
    private boolean useKnown;

    private Workspace(IntervalEvaluator owner) {
      this.owner = owner;
      int size = owner.steps.length;
      this.low = new double[size];
      this.high = new double[size];
      this.enclosures = new Enclosures(low, high);
      this.inputLow = new double[owner.variableCount];
      this.inputHigh = new double[owner.variableCount];
      this.use = new int[size];
      for (int t = 0; t < size; t++) {
        if (owner.fixed[t]) {
          owner.step(t, enclosures);
        }
      }
    }

    /** Lower end of an output's interval, −∞ where unbounded; never NaN. */
    public double low(int output) {
      return low[owner.outputs[output]];
    }

    /** Upper end of an output's interval, ∞ where unbounded; never NaN. */
    public double high(int output) {
      return high[owner.outputs[output]];
    }

    /** An output's interval. */
    public Interval interval(int output) {
      return new Interval(low(output), high(output));
    }
  }

  private IntervalEvaluator(int variableCount, Tape tape) {
    this.variableCount = variableCount;
    this.steps = tape.instructions().toArray(Instruction[]::new);
    this.outputs = tape.outputs().stream().mapToInt(Integer::intValue).toArray();
    this.fixed = new boolean[steps.length];
    List<Hazard> found = new ArrayList<>();
    List<Integer> places = new ArrayList<>();
    for (int t = 0; t < steps.length; t++) {
      fixed[t] = isFixed(steps[t]);
      if (mayFail(steps[t].operation())) {
        found.add(hazard(t, tape));
        places.add(t);
      }
    }
    this.hazards = List.copyOf(found);
    this.hazardSteps = places.stream().mapToInt(Integer::intValue).toArray();
  }

  /**
   * Compiles formulas.
   *
   * @param variables names of the variables, in the order of the boxes' sides
   * @param constants values of all other symbols, taken as exact
   * @throws IllegalArgumentException where a symbol is neither
   */
  public static IntervalEvaluator compile(
      List<String> variables, Map<String, Double> constants, List<Expression> outputs) {
    return new IntervalEvaluator(
        variables.size(),
        new TapeBuilder(variables, constants, TapeBuilder.Purpose.ENCLOSURES).build(outputs));
  }

  private boolean isFixed(Instruction instruction) {
    if (instruction.operation() == Operation.INPUT) {
      return false;
    }
    for (int k = 0; k < 3; k++) {
      if (instruction.uses(k) && !fixed[instruction.operand(k)]) {
        return false;
      }
    }
    return true;
  }

  private static boolean mayFail(Operation operation) {
    return switch (operation) {
      case DIVIDE, LN, LOG10, SQRT, POWER, ASIN, ACOS, TAN -> true;
      default -> false;
    };
  }

  private static Hazard hazard(int place, Tape tape) {
    Instruction instruction = tape.instructions().get(place);
    return switch (instruction.operation()) {
      case DIVIDE -> new Hazard(Hazard.Kind.DIVISOR, vanishing(instruction.b(), tape));
      case LN, LOG10 -> new Hazard(Hazard.Kind.LOGARITHM, tape.sources().get(instruction.a()));
      case SQRT -> new Hazard(Hazard.Kind.ROOT, tape.sources().get(instruction.a()));
      case POWER -> new Hazard(Hazard.Kind.POWER, tape.sources().get(instruction.a()));
      case ASIN, ACOS -> new Hazard(Hazard.Kind.ARC, tape.sources().get(instruction.a()));
      case TAN -> new Hazard(Hazard.Kind.TANGENT, tape.sources().get(instruction.a()));
      default -> throw new IllegalStateException(instruction.operation() + " is always defined");
    };
  }

  /** What vanishes when a divisor does: of a power or a root, its base. */
  private static Expression vanishing(int place, Tape tape) {
    Instruction divisor = tape.instructions().get(place);
    return switch (divisor.operation()) {
      case INTEGER_POWER, POWER, SQRT -> tape.sources().get(divisor.a());
      default -> tape.sources().get(place);
    };
  }

  public int variableCount() {
    return variableCount;
  }

  public int outputCount() {
    return outputs.length;
  }

  /** The places where the formulas may be undefined, in a fixed order. */
  public List<Hazard> hazards() {
    return hazards;
  }

  /** Memory for one thread at a time. */
  public Workspace workspace() {
    return new Workspace(this);
  }

  /** The intervals of all formulas over a box, one interval per variable. */
  public Interval[] evaluate(Interval[] box) {
    Interval[] results = new Interval[outputs.length];
    evaluate(box, results, workspace());
    return results;
  }

  /**
   * Encloses all formulas over a box.
   *
   * @param box one interval per variable
   * @param results written: an interval per formula
   * @param workspace from this evaluator's {@link #workspace}
   */
  public void evaluate(Interval[] box, Interval[] results, Workspace workspace) {
    double[] low = workspace.inputLow;
    double[] high = workspace.inputHigh;
    for (int k = 0; k < variableCount; k++) {
      low[k] = box[k].low();
      high[k] = box[k].high();
    }
    evaluate(low, high, workspace);
    for (int k = 0; k < outputs.length; k++) {
      results[k] = workspace.interval(k);
    }
  }

  /**
   * Encloses all formulas over a box; the intervals are then read from the workspace.
   *
   * @param low lower ends of the variables, not NaN
   * @param high upper ends of the variables, each at least the lower one
   */
  public void evaluate(double[] low, double[] high, Workspace workspace) {
    if (workspace.owner != this) {
      throw new IllegalArgumentException("the workspace belongs to another evaluator");
    }
    workspace.useKnown = false;
    for (int t = 0; t < steps.length; t++) {
      if (steps[t].operation() == Operation.INPUT) {
        int variable = steps[t].a();
        if (!(low[variable] <= high[variable])) {
          throw new IllegalArgumentException(
              "variable " + variable + " from " + low[variable] + " to " + high[variable]);
        }
        workspace.enclosures.set(t, low[variable], high[variable]);
      } else if (!fixed[t]) {
        step(t, workspace.enclosures);
      }
    }
  }

  private void step(int t, Enclosures e) {
    Instruction i = steps[t];
    int a = i.a();
    int b = i.b();
    switch (i.operation()) {
      case INPUT -> throw new IllegalStateException("an input is not computed");
      case CONSTANT -> e.set(t, i.value(), i.value());
      case ADD -> e.add(t, a, b);
      case SUBTRACT -> e.subtract(t, a, b);
      case MULTIPLY -> e.multiply(t, a, b);
      case DIVIDE -> e.divide(t, a, b);
      case REMOVABLE_DIVIDE -> e.removableDivide(t, a, b, i.c());
      case POWER -> e.power(t, a, b);
      case INTEGER_POWER -> e.integerPower(t, a, i.value());
      case NEGATE -> e.negate(t, a);
      case SIN -> e.sin(t, a);
      case COS -> e.cos(t, a);
      case TAN -> e.tan(t, a);
      case ASIN -> e.asin(t, a);
      case ACOS -> e.acos(t, a);
      case ATAN2 -> e.atan2(t, a, b);
      case COSH -> e.cosh(t, a);
      case LN, LOG10 -> e.logarithm(i.operation(), t, a);
      case SQRT -> e.sqrt(t, a);
      case ABS -> e.abs(t, a);
      case MIN -> e.min(t, a, b);
      case MAX -> e.max(t, a, b);
      case HYPOT -> e.hypot(t, a, b);
      case ATAN, SINH, TANH, EXP, CBRT, SIGN -> e.grow(i.operation(), t, a);
      case ERF -> e.erf(t, a);
      case ERFC -> e.erfc(t, a);
      case LESS, LESS_OR_EQUAL, GREATER, GREATER_OR_EQUAL, EQUAL, NOT_EQUAL, AND, OR, NOT ->
          e.condition(i.operation(), t, a, b);
      case SELECT -> e.select(t, a, b, i.c());
    }
  }

  /**
   * Whether over the box of the last evaluation a value may be undefined at this place; never where
   * it lies in a branch that is not taken anywhere on the box.
   */
  public boolean mayBeUndefined(int hazard, Workspace workspace) {
    int place = hazardSteps[hazard];
    return use(workspace)[place] != UNUSED && fails(place, workspace) != UNUSED;
  }

  /** Whether a value is surely undefined at this place, at every point of the box. */
  public boolean certainlyUndefined(int hazard, Workspace workspace) {
    int place = hazardSteps[hazard];
    return use(workspace)[place] == SURELY && fails(place, workspace) == SURELY;
  }

  private int fails(int place, Workspace w) {
    Instruction i = steps[place];
    int a = i.a();
    return switch (i.operation()) {
      case DIVIDE ->
          grade(w.low[i.b()] <= 0 && w.high[i.b()] >= 0, w.low[i.b()] == 0 && w.high[i.b()] == 0);
      case LN, LOG10 -> grade(w.low[a] <= 0, w.high[a] <= 0);
      case SQRT -> grade(w.low[a] < 0, w.high[a] < 0);
      case ASIN, ACOS -> grade(w.low[a] < -1 || w.high[a] > 1, w.low[a] > 1 || w.high[a] < -1);
      case POWER ->
          grade(
              w.low[a] < 0 || w.low[a] == 0 && w.low[i.b()] < 0,
              w.high[a] < 0 && Math.ceil(w.low[i.b()]) > w.high[i.b()]);
      case TAN -> grade(w.enclosures.mayHavePole(a), false);
      default -> UNUSED;
    };
  }

  private static int grade(boolean perhaps, boolean surely) {
    return surely ? SURELY : perhaps ? PERHAPS : UNUSED;
  }

  /** Which steps the outputs need, the conditions over the last box being what they are. */
  private int[] use(Workspace w) {
    if (w.useKnown) {
      return w.use;
    }
    java.util.Arrays.fill(w.use, UNUSED);
    for (int output : outputs) {
      w.use[output] = SURELY;
    }
    for (int t = steps.length - 1; t >= 0; t--) {
      Instruction i = steps[t];
      int use = w.use[t];
      switch (i.operation()) {
        case SELECT -> {
          int decided = w.enclosures.decided(i.a());
          mark(w, i.a(), use);
          mark(w, i.b(), decided > 0 ? use : decided < 0 ? UNUSED : Math.min(use, PERHAPS));
          mark(w, i.c(), decided < 0 ? use : decided > 0 ? UNUSED : Math.min(use, PERHAPS));
        }
        case REMOVABLE_DIVIDE -> {
          mark(w, i.a(), use);
          mark(w, i.b(), use);
          boolean vanishing = w.low[i.b()] <= 0 && w.high[i.b()] >= 0;
          mark(w, i.c(), vanishing ? Math.min(use, PERHAPS) : UNUSED);
        }
        default -> {
          for (int k = 0; k < 3; k++) {
            if (i.uses(k)) {
              mark(w, i.operand(k), use);
            }
          }
        }
      }
    }
    w.useKnown = true;
    return w.use;
  }

  private static void mark(Workspace w, int place, int use) {
    w.use[place] = Math.max(w.use[place], use);
  }
}
