package org.hullsum.geometry;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.VectorExpression;

/**
 * A surface by a formula in two parameters u and v of its own, normal along r_u × r_v.
 *
 * <p>Sides that coincide point by point, or shrink to a point, are found by looking, and are not
 * rims.
 *
 * @param point the position, in {@code u} and {@code v}
 * @param u range of u
 * @param v range of v; its limits may contain {@code u}
 */
public record ParametricShape(VectorExpression point, Span u, Span v) implements Shape {
  public ParametricShape {
    Objects.requireNonNull(point, "point");
    Objects.requireNonNull(u, "u");
    Objects.requireNonNull(v, "v");
  }

  @Override
  public Surface surface(Map<String, Double> parameters) throws SurfaceFault {
    Figures figures = new Figures(parameters);
    ParameterBox box =
        ParameterBox.of(
            new ParameterBox.Coordinate(Chart.U, u, Chart.u()),
            new ParameterBox.Coordinate(Chart.V, v, Chart.v()),
            figures);
    VectorExpression position =
        point.replace(Map.of(Chart.U, box.outer(), Chart.V, box.inner())).simplified();
    return new Surface(
        "parametric", List.of(SideGluing.chart(position, figures)), Optional.empty());
  }
}
