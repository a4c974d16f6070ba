package org.hullsum.field;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;

/**
 * The three systems of coordinates, with their definitions in {@code x y z}.
 *
 * <p>The unit vectors are sines and cosines of the native angles, and the angles come from {@code
 * atan2}: no denominator vanishes anywhere, on the axis an angle is what {@code atan2} makes of
 * zeros. So a field whose native components have no singularity has none in its Cartesian form.
 */
public final class CoordinateSystems {
  private CoordinateSystems() {}

  /** {@code x y z} themselves. */
  public static Coordinates cartesian() {
    Map<String, Expression> definitions = new LinkedHashMap<>();
    for (String name : List.of("x", "y", "z")) {
      definitions.put(name, Expression.symbol(name));
    }
    return new Coordinates(
        Coordinates.Kind.CARTESIAN,
        definitions,
        List.of(
            VectorExpression.of(Vector3.X),
            VectorExpression.of(Vector3.Y),
            VectorExpression.of(Vector3.Z)));
  }

  /** {@code r theta z}: distance from the axis, angle about it, distance along it. */
  public static Coordinates cylindrical(AxisFrame frame) {
    Expression first = frame.along(frame.zero());
    Expression second = frame.along(frame.quarter());
    Expression theta = Expression.call(Function.ATAN2, second, first);
    Map<String, Expression> definitions = new LinkedHashMap<>();
    definitions.put("r", Expression.call(Function.HYPOT, first, second));
    definitions.put("theta", theta);
    definitions.put("z", frame.along(frame.axis()));
    Expression cosine = Expression.call(Function.COS, theta);
    Expression sine = Expression.call(Function.SIN, theta);
    return new Coordinates(
        Coordinates.Kind.CYLINDRICAL,
        definitions,
        List.of(
            frame.vector(cosine, sine, Expression.number(0)),
            frame.vector(sine.negated(), cosine, Expression.number(0)),
            VectorExpression.of(frame.axis())));
  }

  /** {@code r polar azimuth}: distance from the centre, angle from the axis, angle about it. */
  public static Coordinates spherical(AxisFrame frame) {
    Expression first = frame.along(frame.zero());
    Expression second = frame.along(frame.quarter());
    Expression third = frame.along(frame.axis());
    Expression fromAxis = Expression.call(Function.HYPOT, first, second);
    Expression polar = Expression.call(Function.ATAN2, fromAxis, third);
    Expression azimuth = Expression.call(Function.ATAN2, second, first);
    Map<String, Expression> definitions = new LinkedHashMap<>();
    definitions.put("r", Expression.call(Function.HYPOT, fromAxis, third));
    definitions.put("polar", polar);
    definitions.put("azimuth", azimuth);
    Expression sinePolar = Expression.call(Function.SIN, polar);
    Expression cosinePolar = Expression.call(Function.COS, polar);
    Expression sine = Expression.call(Function.SIN, azimuth);
    Expression cosine = Expression.call(Function.COS, azimuth);
    return new Coordinates(
        Coordinates.Kind.SPHERICAL,
        definitions,
        List.of(
            frame.vector(sinePolar.times(cosine), sinePolar.times(sine), cosinePolar),
            frame.vector(cosinePolar.times(cosine), cosinePolar.times(sine), sinePolar.negated()),
            frame.vector(sine.negated(), cosine, Expression.number(0))));
  }
}
