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
 * A flat disk, perhaps with a concentric hole, perhaps a sector of it.
 *
 * <p>The chart's u runs outward along the radius, its v along the angle.
 *
 * @param centre of the disk
 * @param normal the construction normal, of any length
 * @param radius of the outer circle, greater than zero
 * @param hole radius of the hole, if any
 * @param sector range of the angle about the normal; a full turn if empty
 * @param zero where angles start; the default of the case format if empty
 */
public record DiskShape(
    VectorExpression centre,
    Vector3 normal,
    Expression radius,
    Optional<Expression> hole,
    Optional<Span> sector,
    Optional<Vector3> zero)
    implements Shape {
  public DiskShape {
    Objects.requireNonNull(centre, "centre");
    Objects.requireNonNull(normal, "normal");
    Objects.requireNonNull(radius, "radius");
    Objects.requireNonNull(hole, "hole");
    Objects.requireNonNull(sector, "sector");
    Objects.requireNonNull(zero, "zero");
  }

  @Override
  public Surface surface(Map<String, Double> parameters) throws SurfaceFault {
    Figures figures = new Figures(parameters);
    figures.value("centre", centre);
    double outer = figures.positive("radius", radius);
    double inner = hole.isPresent() ? figures.notNegative("hole", hole.get()) : 0;
    if (inner >= outer) {
      throw new SurfaceFault(
          "hole", "the hole's radius " + inner + " leaves nothing of the disk of radius " + outer);
    }
    Figures.Turn turn = figures.turn("sector", sector.orElseGet(Span::fullTurn));
    Frame frame = Frame.about("normal", normal, zero);
    Span radii = new Span(hole.orElse(Expression.number(0)), radius);
    VectorExpression position =
        centre.plus(frame.radial(turn.span().at(Chart.v())).times(radii.at(Chart.u())));
    ChartSides sides =
        new ChartSides()
            .turn(turn.full(), Side.V_START, Side.V_END)
            .add(Side.U_START, inner > 0)
            .add(Side.U_END, true);
    Chart chart = new Chart(position.simplified(), false, turn.full(), sides.rim());
    return new Surface("disk", List.of(chart), Optional.empty());
  }
}
