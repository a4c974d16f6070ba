/**
 * Formulas: reading, checking their dimensions, deriving, simplifying, printing, and evaluating
 * them over arrays of points or over intervals.
 *
 * <p>An {@link org.hullsum.expression.Expression} is a tree whose numbers are in the working units
 * of its case; shared parts are allowed, and every pass meets each of them once. Derivatives are
 * expressions again; {@code abs}, {@code min}, {@code max}, {@code sign} and {@code if} are derived
 * piecewise, and the curves on which they switch can be asked for. Evaluation is always over
 * arrays, never one point through the tree.
 *
 * <ul>
 *   <li>text to tree: {@link org.hullsum.expression.ExpressionParser}, with {@link
 *       org.hullsum.expression.Carets} for places and {@link
 *       org.hullsum.expression.DimensionCheck}; back: {@link org.hullsum.expression.Printer}
 *   <li>tree to tree: {@link org.hullsum.expression.Derivative}, {@link
 *       org.hullsum.expression.Simplifier}, {@link org.hullsum.expression.Substitution}
 *   <li>questions: {@link org.hullsum.expression.Symbols}, {@link org.hullsum.expression.Degree},
 *       {@link org.hullsum.expression.Switches}
 *   <li>tree to values: {@link org.hullsum.expression.BatchEvaluator} at points, {@link
 *       org.hullsum.expression.IntervalEvaluator} over boxes, with the {@link
 *       org.hullsum.expression.Hazard places} where a value may be undefined
 * </ul>
 *
 * <p>Invariants: no pass changes a value where it is finite (but for rounding); work is bounded for
 * every formula that the parser accepts; the same formula gives the same result in every run.
 *
 * <p>Imports {@code units}, {@code numeric} and {@code problem}. Start reading at {@link
 * org.hullsum.expression.Expression}.
 */
package org.hullsum.expression;
