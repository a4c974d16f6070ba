package org.hullsum.geometry;

import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;

/**
 * The lateral surface of a straight circular cylinder, normal away from the axis.
 *
 * <p>The chart's u runs along the angle, its v from {@code from} to {@code to}.
 *
 * @param from centre of the first circle
 * @param to centre of the second
 * @param radius greater than zero
 * @param sector range of the angle about the direction of travel; a full turn if empty
 * @param zero where angles start; the default of the case format if empty
 */
public record CylinderShape(
    VectorExpression from,
    VectorExpression to,
    Expression radius,
    Optional<Span> sector,
    Optional<Vector3> zero)
    implements Shape {
  public CylinderShape {
    Objects.requireNonNull(from, "from");
    Objects.requireNonNull(to, "to");
    Objects.requireNonNull(radius, "radius");
    Objects.requireNonNull(sector, "sector");
    Objects.requireNonNull(zero, "zero");
  }

  @Override
  public Surface surface(Map<String, Double> parameters) throws SurfaceFault {
    Figures figures = new Figures(parameters);
    figures.positive("radius", radius);
    return new ConeShape(from, to, radius, radius, sector, zero)
        .lateral("cylinder", figures, true, true);
  }
}
