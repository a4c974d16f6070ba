package org.hullsum.geometry;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.Chart.Side;
import org.hullsum.numeric.Vector3;

/**
 * The lateral surface of a straight circular cone or frustum, normal away from the axis.
 *
 * <p>The chart's u runs along the angle, its v from {@code from} to {@code to}.
 *
 * @param from centre of the first circle
 * @param to centre of the second
 * @param radiusFrom radius of the first circle; zero for an apex
 * @param radiusTo radius of the second; zero for an apex
 * @param sector range of the angle about the direction of travel; a full turn if empty
 * @param zero where angles start; the default of the case format if empty
 */
public record ConeShape(
    VectorExpression from,
    VectorExpression to,
    Expression radiusFrom,
    Expression radiusTo,
    Optional<Span> sector,
    Optional<Vector3> zero)
    implements Shape {
  public ConeShape {
    Objects.requireNonNull(from, "from");
    Objects.requireNonNull(to, "to");
    Objects.requireNonNull(radiusFrom, "radiusFrom");
    Objects.requireNonNull(radiusTo, "radiusTo");
    Objects.requireNonNull(sector, "sector");
    Objects.requireNonNull(zero, "zero");
  }

  @Override
  public Surface surface(Map<String, Double> parameters) throws SurfaceFault {
    Figures figures = new Figures(parameters);
    double first = figures.notNegative("radii", radiusFrom);
    double second = figures.notNegative("radii", radiusTo);
    double larger = Math.max(first, second);
    if (larger == 0) {
      throw new SurfaceFault("radii", "both radii are zero; only one end may be an apex");
    }
    return lateral(
        "cone", figures, first > Tolerance.ROUNDING * larger, second > Tolerance.ROUNDING * larger);
  }

  /** The surface, once its radii are checked. */
  Surface lateral(String kind, Figures figures, boolean firstIsRim, boolean secondIsRim)
      throws SurfaceFault {
    figures.value("from", from);
    VectorExpression path = to.minus(from);
    Frame frame = Frame.along(path, zero, figures);
    Figures.Turn turn = figures.turn("sector", sector.orElseGet(Span::fullTurn));
    VectorExpression position =
        from.plus(path.times(Chart.v()))
            .plus(
                frame
                    .radial(turn.span().at(Chart.u()))
                    .times(new Span(radiusFrom, radiusTo).at(Chart.v())));
    ChartSides sides =
        new ChartSides()
            .turn(turn.full(), Side.U_START, Side.U_END)
            .add(Side.V_START, firstIsRim)
            .add(Side.V_END, secondIsRim);
    Chart chart = new Chart(position.simplified(), turn.full(), false, sides.rim());
    return new Surface(kind, List.of(chart), Optional.empty());
  }
}
