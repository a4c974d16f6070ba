package org.hullsum.geometry;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.expression.VectorExpression;

/**
 * An ellipsoid with axes along x, y and z, or a part of one, normal away from the centre: centre +
 * (a sin p cos q, b sin p sin q, c cos p).
 *
 * <p>The chart's u runs along p, its v along q.
 *
 * @param centre of the ellipsoid
 * @param semiAxes a, b and c, each greater than zero
 * @param polar range of p; 0 to π if empty
 * @param azimuth range of q; a full turn if empty
 */
public record EllipsoidShape(
    VectorExpression centre,
    VectorExpression semiAxes,
    Optional<Span> polar,
    Optional<Span> azimuth)
    implements Shape {
  public EllipsoidShape {
    Objects.requireNonNull(centre, "centre");
    Objects.requireNonNull(semiAxes, "semiAxes");
    Objects.requireNonNull(polar, "polar");
    Objects.requireNonNull(azimuth, "azimuth");
  }

  @Override
  public Surface surface(Map<String, Double> parameters) throws SurfaceFault {
    Figures figures = new Figures(parameters);
    figures.value("centre", centre);
    figures.positive("semi-axes", semiAxes.x());
    figures.positive("semi-axes", semiAxes.y());
    figures.positive("semi-axes", semiAxes.z());
    RoundRange range = RoundRange.of(polar, azimuth, figures);
    Expression p = range.polar().at(Chart.u());
    Expression q = range.azimuth().span().at(Chart.v());
    Expression sine = Expression.call(Function.SIN, p);
    VectorExpression offset =
        new VectorExpression(
            semiAxes.x().times(sine).times(Expression.call(Function.COS, q)),
            semiAxes.y().times(sine).times(Expression.call(Function.SIN, q)),
            semiAxes.z().times(Expression.call(Function.COS, p)));
    Chart chart =
        new Chart(
            centre.plus(offset).simplified(), false, range.azimuth().full(), range.sides().rim());
    return new Surface("ellipsoid", List.of(chart), Optional.empty());
  }
}
