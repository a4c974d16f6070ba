package org.hullsum.geometry;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.Chart.Side;
import org.hullsum.numeric.Vector3;

/**
 * A torus or a part of one (an elbow, a knuckle), normal away from the tube's centre line.
 *
 * <p>The chart's u runs along the azimuth, its v around the tube.
 *
 * @param centre of the torus
 * @param axis of the ring
 * @param ringRadius of the tube's centre line, greater than zero
 * @param tubeRadius greater than zero; the part that is drawn must not reach beyond the axis
 * @param azimuth range of the angle about the axis; a full turn if empty
 * @param tube range of the angle from the outer equator towards the axis direction; a full turn if
 *     empty
 * @param zero where azimuths start; the default of the case format if empty
 */
public record TorusShape(
    VectorExpression centre,
    Vector3 axis,
    Expression ringRadius,
    Expression tubeRadius,
    Optional<Span> azimuth,
    Optional<Span> tube,
    Optional<Vector3> zero)
    implements Shape {
  public TorusShape {
    Objects.requireNonNull(centre, "centre");
    Objects.requireNonNull(axis, "axis");
    Objects.requireNonNull(ringRadius, "ringRadius");
    Objects.requireNonNull(tubeRadius, "tubeRadius");
    Objects.requireNonNull(azimuth, "azimuth");
    Objects.requireNonNull(tube, "tube");
    Objects.requireNonNull(zero, "zero");
  }

  @Override
  public Surface surface(Map<String, Double> parameters) throws SurfaceFault {
    Figures figures = new Figures(parameters);
    figures.value("centre", centre);
    double ring = figures.positive("ring-radius", ringRadius);
    double radius = figures.positive("tube-radius", tubeRadius);
    Figures.Turn around = figures.turn("azimuth", azimuth.orElseGet(Span::fullTurn));
    Figures.Turn section = figures.turn("tube", tube.orElseGet(Span::fullTurn));
    double start = figures.value("tube", section.span().from());
    double end = figures.value("tube", section.span().to());
    double slack = Tolerance.ROUNDING * (ring + radius);
    if (ring + radius * leastCosine(start, end) < -slack) {
      throw new SurfaceFault(
          "tube-radius",
          "the tube of radius "
              + radius
              + " reaches through the axis of a ring of radius "
              + ring
              + ", so that the surface crosses itself; make the ring larger or limit tube");
    }
    Frame frame = Frame.about("axis", axis, zero);
    Expression psi = section.span().at(Chart.v());
    Expression fromAxis = ringRadius.plus(tubeRadius.times(Expression.call(Function.COS, psi)));
    VectorExpression position =
        centre
            .plus(frame.radial(around.span().at(Chart.u())).times(fromAxis))
            .plus(frame.axis().times(tubeRadius.times(Expression.call(Function.SIN, psi))));
    ChartSides sides =
        new ChartSides()
            .turn(around.full(), Side.U_START, Side.U_END)
            .add(Side.V_START, !section.full() && ring + radius * Math.cos(start) > slack)
            .add(Side.V_END, !section.full() && ring + radius * Math.cos(end) > slack);
    Chart chart = new Chart(position.simplified(), around.full(), section.full(), sides.rim());
    return new Surface("torus", List.of(chart), Optional.empty());
  }

  /** The least value of cos between two angles. */
  private static double leastCosine(double from, double to) {
    double halfTurns = Math.ceil((from / Math.PI - 1) / 2) * 2 + 1;
    return halfTurns * Math.PI <= to ? -1 : Math.min(Math.cos(from), Math.cos(to));
  }
}
