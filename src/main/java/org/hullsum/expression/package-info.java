/**
 * Formulas: reading, checking their dimensions, deriving, simplifying, printing, and evaluating
 * them over arrays of points or over intervals.
 *
 * <p>An {@link org.hullsum.expression.Expression} is a tree whose numbers are in the working units
 * of its case. Derivatives are expressions again; {@code abs}, {@code min}, {@code max}, {@code
 * sign} and {@code if} are derived piecewise, and the curves on which they switch can be asked for.
 * Evaluation is always over arrays, never one point through the tree.
 *
 * <p>Imports {@code units}, {@code numeric} and {@code problem}. Start reading at {@link
 * org.hullsum.expression.Expression}.
 */
package org.hullsum.expression;
