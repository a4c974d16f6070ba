package org.hullsum.casefile;

import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.units.Dimension;

/**
 * A formula that was read.
 *
 * @param expression in working units
 * @param dimension empty for one of bare numbers, which is what its place needs it to be
 */
record Formula(Expression expression, Optional<Dimension> dimension) {
  static Formula bare(double value) {
    return new Formula(Expression.number(value), Optional.empty());
  }
}
