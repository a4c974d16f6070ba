package org.hullsum.expression;

/**
 * What the simplifier takes as a whole: a symbol, a constant with a name or a unit, a function of
 * simplified arguments, a sum under a power, a condition.
 *
 * @param number its place in the order of first appearance
 * @param kind how powers of it are treated
 * @param expression what it is written as
 * @param inner the base of a {@code SUM}, the argument of {@code ABSOLUTE}, {@code CUBE_ROOT},
 *     {@code EXPONENTIAL} and other functions of one argument, the square of a {@code HYPOTENUSE};
 *     zero elsewhere
 * @param notNegative whether it has no negative value
 */
record Atom(int number, Kind kind, Expression expression, Polynomial inner, boolean notNegative) {
  enum Kind {
    PLAIN,
    /** A sum, or a product of unknown sign, as the base of powers. */
    SUM,
    /** A positive number as the base of broken powers. */
    NUMBER,
    ABSOLUTE,
    CUBE_ROOT,
    HYPOTENUSE,
    EXPONENTIAL,
    SINE,
    COSINE,
    HYPERBOLIC_SINE,
    HYPERBOLIC_COSINE
  }
}
