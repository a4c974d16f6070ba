package org.hullsum.expression;

import java.util.ArrayDeque;
import java.util.Arrays;
import java.util.Deque;
import java.util.List;
import java.util.Map;
import org.hullsum.expression.Tape.Instruction;

/**
 * Evaluates several formulas together over arrays of points.
 *
 * <p>All outputs are compiled into one straight list of instructions in which equal sub-expressions
 * occur once; each instruction runs over a block of points before the next begins. Both branches of
 * an {@code if} are evaluated and one selected, so that what is not finite in the other leaves no
 * trace. A formula undefined at a point gives NaN or an infinity there, as {@link Math} does.
 *
 * <p>Immutable and thread-safe: what changes is in a {@link Workspace}, one per thread. An
 * evaluation allocates nothing. Cost: instructions × points.
 */
public final class BatchEvaluator {
  private static final int BLOCK = 256;

  private final int variableCount;
  private final int cost;
  private final int registerCount;

  /** Registers that hold a constant all the time, and the constants. */
  private final int[] constantRegisters;

  private final double[] constants;

  /** Register in which a variable's values stand, or −1 where it is not used. */
  private final int[] inputRegisters;

  private final int[] outputRegisters;
  private final Operation[] operations;
  private final int[] targets;
  private final int[] a;
  private final int[] b;
  private final int[] c;

  /** Scratch memory of one thread. */
  public static final class Workspace {
    private final BatchEvaluator owner;
    private final double[][] registers;

    private Workspace(BatchEvaluator owner) {
      this.owner = owner;
      this.registers = new double[owner.registerCount][BLOCK];
      for (int i = 0; i < owner.constants.length; i++) {
        Arrays.fill(registers[owner.constantRegisters[i]], owner.constants[i]);
      }
    }
  }

  private BatchEvaluator(int variableCount, Tape tape) {
    Allocation allocation = new Allocation(variableCount, tape);
    List<Instruction> steps = tape.instructions().stream().filter(Allocation::computes).toList();
    this.variableCount = variableCount;
    this.cost = tape.cost();
    this.registerCount = allocation.registerCount;
    this.inputRegisters = allocation.inputRegisters;
    this.operations = steps.stream().map(Instruction::operation).toArray(Operation[]::new);
    this.targets = new int[steps.size()];
    this.a = new int[steps.size()];
    this.b = new int[steps.size()];
    this.c = new int[steps.size()];
    this.outputRegisters =
        tape.outputs().stream().mapToInt(place -> allocation.registers[place]).toArray();
    int[] constantPlaces = allocation.constantPlaces(tape);
    this.constantRegisters =
        Arrays.stream(constantPlaces).map(place -> allocation.registers[place]).toArray();
    this.constants =
        Arrays.stream(constantPlaces)
            .mapToDouble(place -> tape.instructions().get(place).value())
            .toArray();
    int step = 0;
    for (int place = 0; place < tape.instructions().size(); place++) {
      Instruction instruction = tape.instructions().get(place);
      if (Allocation.computes(instruction)) {
        targets[step] = allocation.registers[place];
        a[step] = allocation.operandRegister(instruction, 0);
        b[step] = allocation.operandRegister(instruction, 1);
        c[step] = allocation.operandRegister(instruction, 2);
        step++;
      }
    }
  }

  /**
   * Compiles formulas.
   *
   * @param variables names of the inputs, in the order of the rows of {@code inputs}
   * @param constants values of all other symbols
   * @param outputs the formulas
   * @throws IllegalArgumentException where a symbol is neither
   */
  public static BatchEvaluator compile(
      List<String> variables, Map<String, Double> constants, List<Expression> outputs) {
    return new BatchEvaluator(
        variables.size(),
        new TapeBuilder(variables, constants, TapeBuilder.Purpose.POINTS).build(outputs));
  }

  public int variableCount() {
    return variableCount;
  }

  public int outputCount() {
    return outputRegisters.length;
  }

  /** Number of operations carried out at each point. */
  public int instructionCount() {
    return operations.length;
  }

  /** A rough cost of one point, a multiplication being 1. */
  public int cost() {
    return cost;
  }

  /** Scratch memory, for one thread at a time. */
  public Workspace workspace() {
    return new Workspace(this);
  }

  /**
   * Evaluates all formulas at a number of points.
   *
   * @param inputs {@code inputs[k][i]}: variable k at point i; a row may be longer than {@code
   *     count}; the row of a variable that no formula uses is not read
   * @param count number of points
   * @param outputs {@code outputs[k][i]}: formula k at point i, written for i below {@code count}
   * @param workspace from this evaluator's {@link #workspace}
   */
  public void evaluate(double[][] inputs, int count, double[][] outputs, Workspace workspace) {
    if (workspace.owner != this) {
      throw new IllegalArgumentException("the workspace belongs to another evaluator");
    }
    double[][] registers = workspace.registers;
    for (int from = 0; from < count; from += BLOCK) {
      int n = Math.min(BLOCK, count - from);
      for (int k = 0; k < inputRegisters.length; k++) {
        if (inputRegisters[k] >= 0) {
          System.arraycopy(inputs[k], from, registers[inputRegisters[k]], 0, n);
        }
      }
      for (int step = 0; step < operations.length; step++) {
        Kernels.run(
            operations[step],
            registers[targets[step]],
            registers[a[step]],
            registers[b[step]],
            registers[c[step]],
            n);
      }
      for (int k = 0; k < outputRegisters.length; k++) {
        System.arraycopy(registers[outputRegisters[k]], 0, outputs[k], from, n);
      }
    }
  }

  /** Gives every instruction a register; one that is not read again is used again. */
  private static final class Allocation {
    private final int[] registers;
    private final int[] inputRegisters;
    private int registerCount;

    Allocation(int variableCount, Tape tape) {
      List<Instruction> instructions = tape.instructions();
      registers = new int[instructions.size()];
      inputRegisters = new int[variableCount];
      Arrays.fill(inputRegisters, -1);
      int[] lastUse = lastUses(tape);
      Deque<Integer> free = new ArrayDeque<>();
      for (int place = 0; place < registers.length; place++) {
        Instruction instruction = instructions.get(place);
        if (computes(instruction)) {
          release(instruction, place, instructions, lastUse, free);
          registers[place] = free.isEmpty() ? registerCount++ : free.pop();
        } else {
          registers[place] = registerCount++;
          if (instruction.operation() == Operation.INPUT) {
            inputRegisters[instruction.a()] = registers[place];
          }
        }
      }
    }

    static boolean computes(Instruction instruction) {
      return instruction.operation() != Operation.INPUT
          && instruction.operation() != Operation.CONSTANT;
    }

    /** Frees the registers of operands used for the last time; a loop may write where it reads. */
    private void release(
        Instruction instruction,
        int place,
        List<Instruction> instructions,
        int[] lastUse,
        Deque<Integer> free) {
      for (int k = 0; k < 3; k++) {
        if (instruction.uses(k)) {
          int operand = instruction.operand(k);
          if (lastUse[operand] == place && computes(instructions.get(operand))) {
            free.push(registers[operand]);
            lastUse[operand] = -1;
          }
        }
      }
    }

    private static int[] lastUses(Tape tape) {
      List<Instruction> instructions = tape.instructions();
      int[] lastUse = new int[instructions.size()];
      for (int place = 0; place < lastUse.length; place++) {
        Instruction instruction = instructions.get(place);
        for (int k = 0; k < 3; k++) {
          if (instruction.uses(k)) {
            lastUse[instruction.operand(k)] = place;
          }
        }
      }
      tape.outputs().forEach(place -> lastUse[place] = Integer.MAX_VALUE);
      return lastUse;
    }

    /** Register of operand k; of an operand that is not used, that of the first. */
    int operandRegister(Instruction instruction, int k) {
      return registers[instruction.uses(k) ? instruction.operand(k) : instruction.a()];
    }

    int[] constantPlaces(Tape tape) {
      List<Instruction> instructions = tape.instructions();
      return java.util.stream.IntStream.range(0, instructions.size())
          .filter(place -> instructions.get(place).operation() == Operation.CONSTANT)
          .toArray();
    }
  }
}
