package org.hullsum.geometry;

import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.Chart.Side;
import org.hullsum.numeric.Vector3;

/**
 * A corner and two edges that start there, normal along the first edge × the second; the edges need
 * not be square to one another.
 *
 * @param corner where both edges start
 * @param firstEdge A
 * @param secondEdge B, not along A
 */
public record RectangleShape(
    VectorExpression corner, VectorExpression firstEdge, VectorExpression secondEdge)
    implements Shape {
  public RectangleShape {
    Objects.requireNonNull(corner, "corner");
    Objects.requireNonNull(firstEdge, "firstEdge");
    Objects.requireNonNull(secondEdge, "secondEdge");
  }

  @Override
  public Surface surface(Map<String, Double> parameters) throws SurfaceFault {
    Figures figures = new Figures(parameters);
    figures.value("corner", corner);
    Vector3 first = figures.value("edges", firstEdge);
    Vector3 second = figures.value("edges", secondEdge);
    if (first.norm() == 0 || second.norm() == 0) {
      throw new SurfaceFault("edges", "an edge has length zero; state two edges with a length");
    }
    if (first.unit().cross(second.unit()).norm() <= Tolerance.ROUNDING) {
      throw new SurfaceFault(
          "edges", "the edges run along one another and span no area; turn one of them");
    }
    VectorExpression position =
        corner.plus(firstEdge.times(Chart.u())).plus(secondEdge.times(Chart.v()));
    Chart chart = new Chart(position.simplified(), false, false, EnumSet.allOf(Side.class));
    return new Surface("rectangle", List.of(chart), Optional.empty());
  }
}
