package org.hullsum.geometry;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.expression.Symbols;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;

/**
 * An axis and the two directions square to it from which angles are counted: {@code zero} at angle
 * 0, {@code quarter} at π/2, right-handed about {@code axis}.
 *
 * @param axis of length one
 * @param zero of length one
 * @param quarter axis × zero
 */
record Frame(VectorExpression axis, VectorExpression zero, VectorExpression quarter) {
  /** Factors by which parameters are changed to see whether a direction follows them. */
  private static final double[] PERTURBATIONS = {1.37, 0.81};

  /** The frame about a fixed direction. */
  static Frame about(String key, Vector3 direction, Optional<Vector3> zero) throws SurfaceFault {
    Vector3 axis = Figures.direction(key, direction);
    Vector3 start = start(axis, zero);
    Vector3 square = start.minus(axis.times(axis.dot(start))).unit();
    return new Frame(
        VectorExpression.of(axis),
        VectorExpression.of(square),
        VectorExpression.of(axis.cross(square)));
  }

  /** The frame about the direction from one point to another, which parameters may turn. */
  static Frame along(VectorExpression path, Optional<Vector3> zero, Figures figures)
      throws SurfaceFault {
    Vector3 value = figures.value("to", path);
    if (value.norm() == 0) {
      throw new SurfaceFault("to", "from and to are the same point; state two different ones");
    }
    Vector3 axis = value.unit();
    Vector3 start = start(axis, zero);
    if (isFixed(path, axis, figures)) {
      return about("to", axis, Optional.of(start));
    }
    VectorExpression along = path.unit().simplified();
    VectorExpression from = VectorExpression.of(start);
    VectorExpression square = from.minus(along.times(along.dot(from))).unit().simplified();
    return new Frame(along, square, along.cross(square).simplified());
  }

  private static Vector3 start(Vector3 axis, Optional<Vector3> zero) throws SurfaceFault {
    if (zero.isEmpty()) {
      return axis.cross(Vector3.X).norm() > Tolerance.POSITION ? Vector3.X : Vector3.Y;
    }
    Vector3 start = Figures.direction("zero", zero.get());
    if (axis.cross(start).norm() <= Tolerance.POSITION) {
      throw new SurfaceFault(
          "zero", "zero runs along the axis, so that no angle starts there; state another one");
    }
    return start;
  }

  /** Whether the path keeps its direction when the parameters change; seen by changing them. */
  private static boolean isFixed(VectorExpression path, Vector3 axis, Figures figures) {
    Set<String> symbols = new TreeSet<>();
    List<Expression> components = List.of(path.x(), path.y(), path.z());
    components.forEach(component -> symbols.addAll(Symbols.in(component)));
    for (String symbol : symbols) {
      for (double factor : PERTURBATIONS) {
        Map<String, Double> changed = new HashMap<>(figures.parameters());
        changed.computeIfPresent(symbol, (name, value) -> value == 0 ? factor : value * factor);
        double[][] at = new Figures(changed).values(components, List.of(), new double[0][1]);
        Vector3 moved = new Vector3(at[0][0], at[1][0], at[2][0]);
        if (!(moved.cross(axis).norm() <= Tolerance.ROUNDING * moved.norm())) {
          return false;
        }
      }
    }
    return true;
  }

  /** The direction at an angle, square to the axis. */
  VectorExpression radial(Expression angle) {
    return zero.times(Expression.call(Function.COS, angle))
        .plus(quarter.times(Expression.call(Function.SIN, angle)));
  }
}
