package org.hullsum.geometry;

import static org.hullsum.geometry.Formulas.number;
import static org.hullsum.geometry.Formulas.point;
import static org.hullsum.geometry.Formulas.sqrt;
import static org.hullsum.geometry.Formulas.symbol;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.GraphShape.Subject;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** What is no surface is refused, with the key that is at fault. */
class SurfaceFaultTest {
  private static final VectorExpression ORIGIN = point(0, 0, 0);
  private static final Map<String, Double> PARAMETERS = Map.of("zero", 0.0, "minus", -1.0);
  private static final Optional<Vector3> DEFAULT = Optional.empty();
  private static final Optional<Span> WHOLE = Optional.empty();

  private static Optional<Span> span(double from, double to) {
    return Optional.of(Span.of(from, to));
  }

  private static Shape disk(Vector3 normal, Expression radius, double hole, Optional<Span> sector) {
    return new DiskShape(ORIGIN, normal, radius, Optional.of(number(hole)), sector, DEFAULT);
  }

  private static Shape cylinder(VectorExpression to, double radius, Optional<Vector3> zero) {
    return new CylinderShape(ORIGIN, to, number(radius), WHOLE, zero);
  }

  private static Shape cone(double first, double second) {
    return new ConeShape(ORIGIN, point(0, 0, 1), number(first), number(second), WHOLE, DEFAULT);
  }

  private static Shape sphere(double radius, Optional<Span> polar, Optional<Span> azimuth) {
    return new SphereShape(ORIGIN, number(radius), Vector3.Z, polar, azimuth, DEFAULT);
  }

  private static Shape torus(double ring, double tube, Optional<Span> section) {
    return new TorusShape(ORIGIN, Vector3.Z, number(ring), number(tube), WHOLE, section, DEFAULT);
  }

  private static Shape polygon(double... coordinates) {
    VectorExpression[] points = new VectorExpression[coordinates.length / 3];
    for (int i = 0; i < points.length; i++) {
      points[i] = point(coordinates[3 * i], coordinates[3 * i + 1], coordinates[3 * i + 2]);
    }
    return new PolygonShape(List.of(points));
  }

  private static Shape revolution(double... radiiAndHeights) {
    Profile.Point[] points = new Profile.Point[radiiAndHeights.length / 2];
    for (int i = 0; i < points.length; i++) {
      points[i] =
          new Profile.Point(number(radiiAndHeights[2 * i]), number(radiiAndHeights[2 * i + 1]));
    }
    return new RevolutionShape(
        new Profile.Polyline(List.of(points)), ORIGIN, Vector3.Z, WHOLE, DEFAULT);
  }

  private static Shape graph(Expression height, Span x, Span y) {
    return new GraphShape(Subject.Z, height, new PlaneRegion.Box(x, y));
  }

  private static Shape parametric(VectorExpression point, Span u, Span v) {
    return new ParametricShape(point, u, v);
  }

  static Stream<Arguments> faults() {
    Expression x = symbol("x");
    Expression y = symbol("y");
    Span unit = Span.of(0, 1);
    return Stream.of(
        Arguments.of("radius", disk(Vector3.Z, number(0), 0, WHOLE)),
        Arguments.of("radius", disk(Vector3.Z, symbol("minus"), 0, WHOLE)),
        Arguments.of("radius", disk(Vector3.Z, number(1).over(symbol("zero")), 0, WHOLE)),
        Arguments.of("normal", disk(Vector3.ZERO, number(1), 0, WHOLE)),
        Arguments.of("hole", disk(Vector3.Z, number(1), 1, WHOLE)),
        Arguments.of("hole", disk(Vector3.Z, number(1), -0.1, WHOLE)),
        Arguments.of("sector", disk(Vector3.Z, number(1), 0, span(1, 1))),
        Arguments.of("sector", disk(Vector3.Z, number(1), 0, span(2, 1))),
        Arguments.of("sector", disk(Vector3.Z, number(1), 0, span(0, 6.3))),
        Arguments.of("to", cylinder(ORIGIN, 1, DEFAULT)),
        Arguments.of("radius", cylinder(point(0, 0, 1), 0, DEFAULT)),
        Arguments.of("zero", cylinder(point(0, 0, 1), 1, Optional.of(Vector3.Z.times(-3)))),
        Arguments.of("zero", cylinder(point(0, 0, 1), 1, Optional.of(Vector3.ZERO))),
        Arguments.of("radii", cone(0, 0)),
        Arguments.of("radii", cone(-1, 1)),
        Arguments.of("radius", sphere(-1, WHOLE, WHOLE)),
        Arguments.of("polar", sphere(1, span(-0.1, 1), WHOLE)),
        Arguments.of("polar", sphere(1, span(0, 3.2), WHOLE)),
        Arguments.of("polar", sphere(1, span(1, 0), WHOLE)),
        Arguments.of("azimuth", sphere(1, WHOLE, span(0, 7))),
        Arguments.of("semi-axes", new EllipsoidShape(ORIGIN, point(1, 0, 1), WHOLE, WHOLE)),
        Arguments.of("ring-radius", torus(0, 1, WHOLE)),
        Arguments.of("tube-radius", torus(1, 0, WHOLE)),
        Arguments.of("tube-radius", torus(1, 1.5, WHOLE)),
        Arguments.of("tube", torus(1, 0.5, span(1, 0))),
        Arguments.of("edges", new RectangleShape(ORIGIN, point(1, 0, 0), point(-2, 0, 0))),
        Arguments.of("edges", new RectangleShape(ORIGIN, point(1, 0, 0), ORIGIN)),
        Arguments.of("points", polygon(0, 0, 0, 1, 0, 0)),
        Arguments.of("points", polygon(0, 0, 0, 1, 0, 0, 2, 0, 0)),
        Arguments.of("points", polygon(0, 0, 0, 1, 0, 0, 1, 0, 0, 0, 1, 0)),
        Arguments.of("points", polygon(0, 0, 0, 1, 0, 0, 0, 1, 0, 0, 0, 0)),
        Arguments.of("points", polygon(0, 0, 0, 1, 0, 0, 1, 1, 0, 0, 1, 0.1)),
        Arguments.of("points", polygon(0, 0, 0, 2, 2, 0, 2, 0, 0, 0, 1, 0)),
        Arguments.of("points", polygon(0, 0, 0, 4, 0, 0, 4, 4, 0, 2, 0, 0, 0, 4, 0)),
        Arguments.of("points", polygon(0, 0, 0, 2, 0, 0, 1, 0, 0, 1, 1, 0)),
        Arguments.of("profile", revolution(1, 0)),
        Arguments.of("profile", revolution(1, 0, 1, 0)),
        Arguments.of("profile", revolution(1, 0, -0.5, 1)),
        Arguments.of("profile", revolution(0, 0, 0, 1)),
        Arguments.of("x", graph(number(0), Span.of(1, 0), unit)),
        Arguments.of("y", graph(number(0), unit, new Span(number(0), x.minus(number(0.5))))),
        Arguments.of("y", graph(number(0), new Span(number(0), y), new Span(number(0), x))),
        Arguments.of("z", graph(sqrt(x.minus(number(0.5))), unit, unit)),
        Arguments.of(
            "u", parametric(point(symbol("u"), symbol("v"), number(0)), Span.of(2, 1), unit)),
        Arguments.of("point", parametric(point(symbol("u"), symbol("u"), number(0)), unit, unit)),
        Arguments.of(
            "point",
            parametric(point(symbol("u"), symbol("v"), sqrt(symbol("minus"))), unit, unit)));
  }

  @ParameterizedTest
  @MethodSource("faults")
  void whatIsNoSurfaceIsRefusedWithItsKey(String key, Shape shape) {
    SurfaceFault fault = assertThrows(SurfaceFault.class, () -> shape.surface(PARAMETERS));
    assertEquals(key, fault.key(), fault.getMessage());
    assertTrue(fault.getMessage().length() > 20);
  }

  @Test
  void bodiesWithoutVolumeAreRefused() {
    Map<String, Body> bodies =
        Map.of(
            "radius", new Body.Sphere(ORIGIN, number(0)),
            "radii", new Body.Cone(ORIGIN, point(0, 0, 1), number(0), number(0)),
            "to", new Body.Cylinder(ORIGIN, ORIGIN, number(1)),
            "semi-axes", new Body.Ellipsoid(ORIGIN, point(1, 1, -1)),
            "normal", new Body.HalfSpace(ORIGIN, Vector3.ZERO),
            "edges", new Body.Box(ORIGIN, point(1, 0, 0), point(0, 1, 0), point(1, 1, 0)));
    bodies.forEach(
        (key, body) -> {
          SurfaceFault fault = assertThrows(SurfaceFault.class, () -> body.condition(PARAMETERS));
          assertEquals(key, fault.key());
        });
  }

  @Test
  void placementAboutNoDirectionIsRefused() throws SurfaceFault {
    Surface square = new RectangleShape(ORIGIN, point(1, 0, 0), point(0, 1, 0)).surface(PARAMETERS);
    Placement turned =
        new Placement(Optional.of(new Placement.Turn(Vector3.ZERO, number(1))), Optional.empty());
    SurfaceFault fault = assertThrows(SurfaceFault.class, () -> turned.placed(square, PARAMETERS));
    assertEquals("about", fault.key());
  }
}
