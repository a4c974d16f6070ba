package org.hullsum.geometry;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;

/**
 * A sphere or a part of one between circles of latitude and meridians, normal away from the centre.
 *
 * <p>The chart's u runs along the polar angle, its v along the azimuth.
 *
 * @param centre of the sphere
 * @param radius greater than zero
 * @param axis direction of polar angle 0
 * @param polar range of the angle from the axis; from pole to pole if empty
 * @param azimuth range of the angle about the axis; a full turn if empty
 * @param zero where azimuths start; the default of the case format if empty
 */
public record SphereShape(
    VectorExpression centre,
    Expression radius,
    Vector3 axis,
    Optional<Span> polar,
    Optional<Span> azimuth,
    Optional<Vector3> zero)
    implements Shape {
  public SphereShape {
    Objects.requireNonNull(centre, "centre");
    Objects.requireNonNull(radius, "radius");
    Objects.requireNonNull(axis, "axis");
    Objects.requireNonNull(polar, "polar");
    Objects.requireNonNull(azimuth, "azimuth");
    Objects.requireNonNull(zero, "zero");
  }

  @Override
  public Surface surface(Map<String, Double> parameters) throws SurfaceFault {
    Figures figures = new Figures(parameters);
    figures.value("centre", centre);
    figures.positive("radius", radius);
    RoundRange range = RoundRange.of(polar, azimuth, figures);
    Frame frame = Frame.about("axis", axis, zero);
    Expression fromAxis = range.polar().at(Chart.u());
    VectorExpression direction =
        frame
            .radial(range.azimuth().span().at(Chart.v()))
            .times(Expression.call(Function.SIN, fromAxis))
            .plus(frame.axis().times(Expression.call(Function.COS, fromAxis)));
    Chart chart =
        new Chart(
            centre.plus(direction.times(radius)).simplified(),
            false,
            range.azimuth().full(),
            range.sides().rim());
    return new Surface("sphere", List.of(chart), Optional.empty());
  }
}
