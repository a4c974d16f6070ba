package org.hullsum.field;

import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Simplifier;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;

/**
 * The place and the directions of cylindrical or spherical coordinates: an axis through a point,
 * and the direction square to it from which the angle about the axis starts.
 *
 * @param through a point of the axis; the origin of the coordinates
 * @param axis of length one
 * @param zero of length one, square to the axis: the angle about the axis is 0 there
 * @param quarter axis × zero
 */
public record AxisFrame(VectorExpression through, Vector3 axis, Vector3 zero, Vector3 quarter) {
  /** The z axis, angles from the x axis. */
  public static final AxisFrame STANDARD =
      new AxisFrame(VectorExpression.of(Vector3.ZERO), Vector3.Z, Vector3.X, Vector3.Y);

  /** Sine of the angle to the x axis below which an axis counts as running along it. */
  private static final double PARALLEL = 1e-9;

  public AxisFrame {
    Objects.requireNonNull(through, "through");
    Objects.requireNonNull(axis, "axis");
    Objects.requireNonNull(zero, "zero");
    Objects.requireNonNull(quarter, "quarter");
  }

  /**
   * An axis through a point. Angles start at the x axis projected square to it, at the y axis where
   * it runs along the x axis.
   *
   * @param direction of any length; empty where it has none
   */
  public static Optional<AxisFrame> of(VectorExpression through, Vector3 direction) {
    if (!direction.isFinite() || direction.norm() == 0) {
      return Optional.empty();
    }
    Vector3 axis = direction.unit();
    Vector3 start = axis.cross(Vector3.X).norm() > PARALLEL ? Vector3.X : Vector3.Y;
    Vector3 zero = start.minus(axis.times(axis.dot(start))).unit();
    return Optional.of(new AxisFrame(through, axis, zero, axis.cross(zero)));
  }

  /** The distance from {@code through} along one of the three directions, in {@code x y z}. */
  Expression along(Vector3 direction) {
    VectorExpression from = VectorExpression.position().minus(through);
    return Simplifier.simplify(from.dot(VectorExpression.of(direction)));
  }

  /** The vector with the given components along zero, quarter and axis, in Cartesian components. */
  VectorExpression vector(Expression alongZero, Expression alongQuarter, Expression alongAxis) {
    return VectorExpression.of(zero)
        .times(alongZero)
        .plus(VectorExpression.of(quarter).times(alongQuarter))
        .plus(VectorExpression.of(axis).times(alongAxis))
        .simplified();
  }
}
