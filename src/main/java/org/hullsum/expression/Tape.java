package org.hullsum.expression;

import java.util.List;

/**
 * Formulas as one straight list of instructions; each instruction's operands are the indices of
 * earlier ones.
 *
 * @param instructions in the order to be carried out; only those that an output needs
 * @param outputs the index of each output's instruction
 * @param sources the expression that each instruction stands for
 */
record Tape(List<Instruction> instructions, List<Integer> outputs, List<Expression> sources) {
  Tape {
    instructions = List.copyOf(instructions);
    outputs = List.copyOf(outputs);
    sources = List.copyOf(sources);
  }

  /**
   * One step.
   *
   * @param operation what to do
   * @param a first operand, or the number of the variable of an {@code INPUT}; −1 where unused
   * @param b second operand, or −1
   * @param c third operand, or −1
   * @param value of a {@code CONSTANT}, exponent of an {@code INTEGER_POWER}, else 0
   */
  record Instruction(Operation operation, int a, int b, int c, double value) {
    static Instruction constant(double value) {
      return new Instruction(Operation.CONSTANT, -1, -1, -1, value);
    }

    static Instruction input(int variable) {
      return new Instruction(Operation.INPUT, variable, -1, -1, 0);
    }

    /** Operand 0, 1 or 2. */
    int operand(int k) {
      return k == 0 ? a : k == 1 ? b : c;
    }

    boolean uses(int k) {
      return k < operation.arity();
    }

    /** Written out, like {@link #hashCode}: linking the generated ones costs every start dearly. */
    @Override
    public boolean equals(Object other) {
      return other instanceof Instruction that
          && operation == that.operation
          && a == that.a
          && b == that.b
          && c == that.c
          && Double.doubleToLongBits(value) == Double.doubleToLongBits(that.value);
    }

    @Override
    public int hashCode() {
      int operands = 31 * (31 * (31 * operation.ordinal() + a) + b) + c;
      return 31 * operands + Double.hashCode(value);
    }
  }

  /** Sum of the costs of all instructions, one being a multiplication. */
  int cost() {
    return instructions.stream().mapToInt(i -> i.operation().cost()).sum();
  }
}
