package org.hullsum.casefile;

import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.DiskShape;
import org.hullsum.geometry.Placement;
import org.hullsum.geometry.RectangleShape;
import org.hullsum.numeric.Vector3;

/**
 * The cross-section of a duct that a traverse stands over.
 *
 * @param round whether it is a disk, else a rectangle
 * @param area a formula of parameters
 * @param first the radius, or the length of the first edge, in working units
 * @param second the radius, or the length of the second edge
 * @param normal the construction normal, of length one
 */
record DuctSection(boolean round, Expression area, double first, double second, Vector3 normal) {

  static Expression roundArea(Expression radius) {
    return Expression.number(Math.PI).times(radius.power(2));
  }

  /** A whole disk; empty where a parameter was refused. */
  static Optional<DuctSection> of(
      DiskShape disk, Optional<Placement> placement, FormulaReader formulas) {
    VectorExpression tip = disk.centre().plus(VectorExpression.of(disk.normal().unit()));
    VectorExpression normal = placed(tip, placement).minus(placed(disk.centre(), placement));
    return Together.of(
        formulas.scope().value(disk.radius()),
        formulas.value(normal),
        (radius, n) -> new DuctSection(true, roundArea(disk.radius()), radius, radius, n));
  }

  /** A rectangle; empty where a parameter was refused. */
  static Optional<DuctSection> of(
      RectangleShape rectangle, Optional<Placement> placement, FormulaReader formulas) {
    VectorExpression cross = rectangle.firstEdge().cross(rectangle.secondEdge());
    VectorExpression turned =
        placed(rectangle.corner().plus(cross), placement)
            .minus(placed(rectangle.corner(), placement));
    Expression area = Expression.call(Function.SQRT, cross.dot(cross));
    return Together.of(
        formulas.value(rectangle.firstEdge()),
        formulas.value(rectangle.secondEdge()),
        formulas.value(turned),
        (a, b, n) -> new DuctSection(false, area, a.norm(), b.norm(), n.unit()));
  }

  private static VectorExpression placed(VectorExpression point, Optional<Placement> placement) {
    return placement.isPresent() ? placement.get().placed(point) : point;
  }
}
