package org.hullsum.flux;

import static org.hullsum.flux.Assemblies.ball;
import static org.hullsum.flux.Assemblies.box;
import static org.hullsum.flux.Assemblies.build;
import static org.hullsum.flux.Assemblies.can;
import static org.hullsum.flux.Assemblies.cylinder;
import static org.hullsum.flux.Assemblies.disk;
import static org.hullsum.flux.Assemblies.ellipsoid;
import static org.hullsum.flux.Assemblies.frustum;
import static org.hullsum.flux.Assemblies.number;
import static org.hullsum.flux.Assemblies.point;
import static org.hullsum.flux.Assemblies.ring;
import static org.hullsum.flux.Assemblies.shell;
import static org.hullsum.flux.Assemblies.torus;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.hullsum.field.VectorField;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.flux.Assemblies.Piece;
import org.hullsum.geometry.ConeShape;
import org.hullsum.geometry.CylinderShape;
import org.hullsum.geometry.GraphShape;
import org.hullsum.geometry.PlaneRegion;
import org.hullsum.geometry.PolygonShape;
import org.hullsum.geometry.Span;
import org.hullsum.geometry.SphereShape;
import org.hullsum.geometry.Surface;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Worked flux examples from openly published textbooks, each derived again, and standard textbook
 * types.
 *
 * <p>Those called Strang are from G. Strang and E. Herman, <i>Calculus Volume 3</i>, OpenStax 2016,
 * section 6.8 (facts and figures only); the exercise there whose printed answer is 6.5759 equals 3e
 * − 2 + sin(1)/2 = 6.5755809781 and stands here with that value.
 */
class WorkedExamplesTest {
  private static final Vector3 ORIGIN = Vector3.ZERO;
  private static final Vector3 UP = Vector3.Z;
  private static final Vector3 DOWN = Vector3.Z.negated();
  private static final Vector3 ONES = new Vector3(1, 1, 1);
  private static final double PI = Math.PI;

  private static Arguments example(
      String source, Assembly surface, double flux, String p, String q, String r) {
    return Arguments.of(source, surface, flux, List.of(p, q, r));
  }

  private static Assembly of(Piece... pieces) {
    return new Assembly("assembly", List.of(pieces), Double.NaN);
  }

  private static Piece out(Surface surface) {
    return new Piece(surface, 1);
  }

  private static Piece in(Surface surface) {
    return new Piece(surface, -1);
  }

  private static Surface triangle(Vector3 a, Vector3 b, Vector3 c) {
    return build(
        new PolygonShape(
            List.of(
                point(a.x(), a.y(), a.z()),
                point(b.x(), b.y(), b.z()),
                point(c.x(), c.y(), c.z()))));
  }

  private static Surface polygon(Vector3... corners) {
    return build(
        new PolygonShape(Stream.of(corners).map(c -> point(c.x(), c.y(), c.z())).toList()));
  }

  private static Surface graph(GraphShape.Subject subject, String value, double radius) {
    return build(
        new GraphShape(
            subject,
            TestFields.parse(value),
            new PlaneRegion.Disk(new PlaneRegion.Corner(number(0), number(0)), number(radius))));
  }

  private static Surface graph(String value, Span x, Span y) {
    return build(
        new GraphShape(GraphShape.Subject.Z, TestFields.parse(value), new PlaneRegion.Box(x, y)));
  }

  private static Surface openCone() {
    return build(
        new ConeShape(
            point(0, 0, 0),
            point(0, 0, 1),
            number(0),
            number(1),
            Optional.empty(),
            Optional.empty()));
  }

  private static Surface dome(double radius, double to) {
    return build(
        new SphereShape(
            point(0, 0, 0),
            number(radius),
            Vector3.Z,
            Optional.of(Span.of(0, to)),
            Optional.empty(),
            Optional.empty()));
  }

  /** The corner of the first octant cut off by x + y + z = a. */
  private static Surface octant(double a) {
    return triangle(new Vector3(a, 0, 0), new Vector3(0, a, 0), new Vector3(0, 0, a));
  }

  private static Assembly tetrahedron() {
    return of(
        out(octant(1)),
        out(triangle(ORIGIN, Vector3.Y, Vector3.X)),
        out(triangle(ORIGIN, Vector3.X, Vector3.Z)),
        out(triangle(ORIGIN, Vector3.Z, Vector3.Y)));
  }

  private static Assembly slice() {
    Vector3 x2 = new Vector3(2, 0, 0);
    Vector3 x4 = new Vector3(4, 0, 0);
    Vector3 y2 = new Vector3(0, 2, 0);
    Vector3 y4 = new Vector3(0, 4, 0);
    Vector3 z2 = new Vector3(0, 0, 2);
    Vector3 z4 = new Vector3(0, 0, 4);
    return of(
        in(octant(2)),
        out(octant(4)),
        out(polygon(x2, y2, y4, x4)),
        out(polygon(y2, z2, z4, y4)),
        out(polygon(z2, x2, x4, z4)));
  }

  private static Assembly lyingCan() {
    return of(
        out(cylinder(ORIGIN, new Vector3(2, 0, 0), 3)),
        out(disk(ORIGIN, Vector3.X.negated(), 3)),
        out(disk(new Vector3(2, 0, 0), Vector3.X, 3)));
  }

  private static Assembly paraboloidAlongY() {
    return of(in(graph(GraphShape.Subject.Y, "x^2 + z^2", 1)), out(disk(Vector3.Y, Vector3.Y, 1)));
  }

  static Stream<Arguments> closedSurfaces() {
    double s6 = Math.sqrt(6);
    return Stream.of(
        example(
            "Strang, cone",
            of(out(openCone()), out(disk(UP, UP, 1))),
            2 * PI / 3,
            "x-y",
            "x+z",
            "z-y"),
        example("Strang, cylinder 0 to 3", can(1, 0, 3), 6 * PI, "x+y+z", "y", "2*x-y"),
        example(
            "Strang, cylinder 0 to 2",
            can(1, 0, 2),
            3 * PI,
            "x^3/3+y*z",
            "y^3/3-sin(x*z)",
            "z-x-y"),
        example(
            "Strang, box",
            box(new Vector3(-1, -2, -3), new Vector3(1, 2, 3)),
            0,
            "x^2*z^3",
            "2*x*y*z^3",
            "x*z^4"),
        example("Strang, sphere 2", ball(ORIGIN, 2), 384 * PI / 5, "x^3+y^3", "y^3+z^3", "z^3+x^3"),
        example("Strang, paraboloid", paraboloidAlongY(), 0, "0", "y", "-z"),
        example("Strang, sphere root 6", ball(ORIGIN, s6), 16 * s6 * PI, "x", "-2*y", "3*z"),
        example("Strang, inflow", ball(ORIGIN, 2), -128 * PI / 3, "y-2*x", "x^3-y", "y^2-z"),
        example("Strang, shell", shell(2, 4), -224 * PI, "z-x", "x-y", "2*y-z"),
        example("Strang, slice", slice(), 20, "x^2", "-y^2", "z^2"),
        example("Strang, tetrahedron", tetrahedron(), 1.0 / 8, "x^2", "x*y", "x^3*y^3"),
        example(
            "Strang, cube", box(new Vector3(-1, -1, -1), ONES), 8, "x^3-3*y", "2*y*z+1", "x*y*z"),
        example(
            "Strang, cylinder a b",
            can(1.5, 0, 2),
            PI * Math.pow(1.5, 4) * 4,
            "2*x*y^2",
            "2*x^2*y",
            "(x^2+y^2)*z^2"),
        example(
            "Strang, printed 6.5759",
            box(ORIGIN, ONES),
            3 * Math.E - 2 + Math.sin(1) / 2,
            "2*x*y",
            "3*y*exp(z)",
            "x*sin(z)"),
        example("unit cube 9/2", box(ORIGIN, ONES), 4.5, "3*x", "x*y", "2*x*z"),
        example("unit cube 3/2", box(ORIGIN, ONES), 1.5, "x*y", "y*z", "x*z"),
        example(
            "paraboloid to z = 9",
            of(in(graph(GraphShape.Subject.Z, "x^2+y^2", 3)), out(disk(UP.times(9), UP, 3))),
            2430 * PI,
            "y^2*z^3",
            "2*y*z",
            "4*z^2"),
        example("lying cylinder", lyingCan(), 36 * PI, "x^2", "-y", "z"),
        example("unit cube 1", box(ORIGIN, ONES), 1, "x", "z", "0"),
        example("ellipsoid, position", ellipsoid(1, 1.5, 2), 4 * PI * 3, "x", "y", "z"),
        example("ellipsoid, cubes", ellipsoid(1, 1.5, 2), 0.8 * PI * 3 * 7.25, "x^3", "y^3", "z^3"),
        example("torus, position", torus(2, 0.5), 3 * PI * PI, "x", "y", "z"),
        example("torus, x", torus(2, 0.5), PI * PI, "x", "0", "0"),
        example("torus, cubes", torus(2, 0.5), 3 * PI * PI * 4.25, "x^3", "y^3", "z^3"),
        example(
            "dome of a paraboloid",
            of(out(graph(GraphShape.Subject.Z, "4-x^2-y^2", 2)), out(disk(ORIGIN, DOWN, 2))),
            24 * PI,
            "x",
            "y",
            "z"),
        example(
            "dome of a paraboloid, second field",
            of(out(graph(GraphShape.Subject.Z, "4-x^2-y^2", 2)), out(disk(ORIGIN, DOWN, 2))),
            8 * PI,
            "x^2",
            "x*y",
            "z+1"),
        example(
            "cap of a paraboloid",
            of(out(graph(GraphShape.Subject.Z, "2-x^2-y^2", 1)), out(disk(UP, DOWN, 1))),
            PI / 2,
            "z*atan(y^2)",
            "z^3*ln(x^2+1)",
            "z"),
        example("unit sphere, cubes", ball(ORIGIN, 1), 12 * PI / 5, "x^3", "y^3", "z^3"),
        example(
            "hemisphere",
            of(out(dome(3, PI / 2)), out(disk(ORIGIN, DOWN, 3))),
            72 * PI,
            "2*x",
            "-3*y",
            "5*z"),
        example(
            "shell, unit radial field",
            shell(1, 2),
            12 * PI,
            "x/sqrt(x^2+y^2+z^2)",
            "y/sqrt(x^2+y^2+z^2)",
            "z/sqrt(x^2+y^2+z^2)"),
        example(
            "half shell",
            of(out(dome(2, PI / 2)), in(dome(1, PI / 2)), out(ring(ORIGIN, DOWN, 2, 1))),
            194 * PI / 5,
            "x^3+y*sin(z)",
            "y^3+z*sin(x)",
            "3*z"),
        example("rotation", frustum(1.2, 0.5, 0, 2), 0, "2*z-3*y", "3*x-1*z", "1*y-2*x"));
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("closedSurfaces")
  void outwardFluxAndVolumeIntegralHaveTheKnownValue(
      String source, Assembly surface, double exact, List<String> formulas) {
    VectorField field = TestFields.parse(formulas);
    double flux = 0;
    double bound = 0;
    double magnitude = 0;
    for (Piece piece : surface.pieces()) {
      PatchFlux part = FluxLawsTest.flux(piece.surface(), field);
      flux += piece.outward() * part.value().orElseThrow();
      bound += part.errorBound();
      magnitude += part.magnitude();
    }
    double rounding = 4 * Math.ulp(exact);
    assertEquals(exact, flux, bound + rounding, source);
    assertTrue(bound <= 2e-10 * magnitude, source + ": bound " + bound + " of " + magnitude);
    VolumeIntegral integral =
        new VolumeIntegrator(TestFields.noInputs(), 10)
            .integrate(
                VolumeIntegratorTest.boundary(surface),
                field.divergence(),
                OptionalDouble.empty(),
                0);
    assertEquals(exact, integral.value().orElseThrow(), integral.errorBound() + rounding, source);
    assertTrue(
        integral.errorBound() <= 2e-10 * (integral.magnitude() + magnitude),
        source + ": " + integral);
  }

  private static PatchFlux flux(Surface surface, String p, String q, String r) {
    return FluxLawsTest.flux(surface, TestFields.parse(List.of(p, q, r)));
  }

  @Test
  void coneOfTheFirstExampleAloneTakesThirdOfPiBack() {
    PatchFlux cone = flux(openCone(), "x-y", "x+z", "z-y");
    assertEquals(-PI / 3, cone.value().orElseThrow(), cone.errorBound());
    PatchFlux lid = flux(disk(UP, UP, 1), "x-y", "x+z", "z-y");
    assertEquals(PI, lid.value().orElseThrow(), lid.errorBound());
  }

  @Test
  void paraboloidAloneHasMinusPi() {
    PatchFlux flux = flux(graph(GraphShape.Subject.Y, "x^2 + z^2", 1), "0", "y", "-z");
    assertEquals(PI, flux.value().orElseThrow(), flux.errorBound());
  }

  /** y = x² over 0 ≤ x ≤ 2, 0 ≤ z ≤ 3 with the normal (2x, −1, 0): 72. */
  @Test
  void parabolicCylinderHasSeventyTwo() {
    Surface sheet =
        build(
            new GraphShape(
                GraphShape.Subject.Y,
                TestFields.parse("x^2"),
                new PlaneRegion.Box(Span.of(0, 2), Span.of(0, 3))));
    PatchFlux flux = flux(sheet, "3*z^2", "6", "6*x*z");
    assertEquals(-72, flux.value().orElseThrow(), flux.errorBound());
  }

  @Test
  void facesOfTheUnitCubeHaveThePrintedParts() {
    double[] expected = {0, 1, 0, 3, 0, 0.5};
    Assembly cube = box(ORIGIN, ONES);
    for (int k = 0; k < expected.length; k++) {
      PatchFlux flux = flux(cube.pieces().get(k).surface(), "3*x", "x*y", "2*x*z");
      assertEquals(expected[k], flux.value().orElseThrow(), flux.errorBound() + 1e-15);
    }
  }

  /** A quarter of the cylinder of radius 2 and height 3 under F = (x, y, 0): ¼·2π·2·2·3. */
  @Test
  void sectorOfACylinderHasItsShare() {
    Surface sector =
        build(
            new CylinderShape(
                point(0, 0, 0),
                point(0, 0, 3),
                number(2),
                Optional.of(Span.of(0.3, 0.3 + PI / 2)),
                Optional.empty()));
    PatchFlux flux = flux(sector, "x", "y", "0");
    assertEquals(6 * PI, flux.value().orElseThrow(), flux.errorBound());
  }

  /** ∬ (−P g_x − Q g_y + R) dA = 5/12 for F = (x, y, x*y), z = x² + y² over the unit square. */
  @Test
  void graphOverASquareEqualsItsProjectedIntegral() {
    PatchFlux flux = flux(graph("x^2+y^2", Span.of(0, 1), Span.of(0, 1)), "x", "y", "x*y");
    double exact = -2.0 / 3 - 2.0 / 3 + 0.25;
    assertEquals(exact, flux.value().orElseThrow(), flux.errorBound());
  }
}
