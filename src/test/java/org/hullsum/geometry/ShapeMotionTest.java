package org.hullsum.geometry;

import static org.hullsum.geometry.Formulas.number;
import static org.hullsum.geometry.Formulas.point;
import static org.hullsum.geometry.Formulas.symbol;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SplittableRandom;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

/** Areas of ellipsoids by Carlson's integrals, zero directions, placement, parameters. */
class ShapeMotionTest {
  private static final Map<String, Double> NONE = Map.of();
  private static final double ACCURACY = 1e-10;

  /**
   * Carlson's R_F by duplication (B. C. Carlson, "Numerical computation of real or complex elliptic
   * integrals", Numerical Algorithms 10 (1995) 13–26).
   */
  private static double carlsonF(double x, double y, double z) {
    for (int i = 0; i < 40; i++) {
      double lambda = Math.sqrt(x * y) + Math.sqrt(y * z) + Math.sqrt(z * x);
      x = (x + lambda) / 4;
      y = (y + lambda) / 4;
      z = (z + lambda) / 4;
    }
    return 1 / Math.sqrt((x + y + z) / 3);
  }

  /** Carlson's R_D by duplication. */
  private static double carlsonD(double x, double y, double z) {
    double sum = 0;
    double factor = 1;
    for (int i = 0; i < 25; i++) {
      double lambda = Math.sqrt(x * y) + Math.sqrt(y * z) + Math.sqrt(z * x);
      sum += factor / (Math.sqrt(z) * (z + lambda));
      factor /= 4;
      x = (x + lambda) / 4;
      y = (y + lambda) / 4;
      z = (z + lambda) / 4;
    }
    return 3 * sum + factor * Math.pow((x + y + 3 * z) / 5, -1.5);
  }

  /**
   * Area of an ellipsoid with semi-axes a ≥ b ≥ c by elliptic integrals of amplitude φ, cos φ = c/a
   * (Legendre's formula; Digital Library of Mathematical Functions, 19.33.2, from memory).
   */
  private static double ellipsoidArea(double a, double b, double c) {
    double cosine = c / a;
    double sine = Math.sqrt(1 - cosine * cosine);
    double modulus = a * a * (b * b - c * c) / (b * b * (a * a - c * c));
    double y = 1 - modulus * sine * sine;
    double first = sine * carlsonF(cosine * cosine, y, 1);
    double second = first - modulus * sine * sine * sine / 3 * carlsonD(cosine * cosine, y, 1);
    return 2 * Math.PI * c * c
        + 2 * Math.PI * a * b / sine * (second * sine * sine + first * cosine * cosine);
  }

  @Test
  void ellipsoidsHaveTheAreaOfCarlsonsIntegrals() throws SurfaceFault {
    SplittableRandom random = new SplittableRandom(21);
    for (int i = 0; i < 20; i++) {
      double[] axes = random.doubles(3, 0.7, 1.4).sorted().toArray();
      Surface ellipsoid =
          new EllipsoidShape(
                  point(0.1, 0.2, 0.3),
                  point(axes[1], axes[2], axes[0]),
                  Optional.empty(),
                  Optional.empty())
              .surface(NONE);
      double area = ellipsoidArea(axes[2], axes[1], axes[0]);
      assertEquals(area, SurfaceSums.area(ellipsoid, NONE), ACCURACY * area);
      double volume = 4 * Math.PI / 3 * axes[0] * axes[1] * axes[2];
      assertEquals(volume, SurfaceSums.volume(ellipsoid, NONE, Vector3.ZERO), ACCURACY * volume);
    }
  }

  private static Vector3 at(Surface surface, double u, double v) {
    ChartEvaluator evaluator = ChartEvaluator.of(surface.charts().get(0), NONE);
    return evaluator.at(u, v, evaluator.workspace()).position();
  }

  private static void assertNear(Vector3 expected, Vector3 actual) {
    assertTrue(expected.minus(actual).norm() < 1e-14, actual + ", expected " + expected);
  }

  private static Surface cylinder(Vector3 to, Optional<Vector3> zero) throws SurfaceFault {
    return new CylinderShape(
            point(0, 0, 0), VectorExpression.of(to), number(1), Optional.empty(), zero)
        .surface(NONE);
  }

  @Test
  void anglesStartAtTheXAxisOrTheYAxisAndTurnRightHanded() throws SurfaceFault {
    assertNear(Vector3.X, at(cylinder(Vector3.Z, Optional.empty()), 0, 0));
    assertNear(Vector3.Y, at(cylinder(Vector3.Z, Optional.empty()), 0.25, 0));
    assertNear(Vector3.Y, at(cylinder(Vector3.X, Optional.empty()), 0, 0));
    assertNear(Vector3.Z, at(cylinder(Vector3.X, Optional.empty()), 0.25, 0));
    assertNear(Vector3.Y, at(cylinder(Vector3.X.negated(), Optional.empty()), 0, 0));
    assertNear(Vector3.X, at(cylinder(Vector3.Y, Optional.empty()), 0, 0));
    assertNear(Vector3.Z.negated(), at(cylinder(Vector3.Y, Optional.empty()), 0.25, 0));
    Vector3 slanted = new Vector3(1, 0, 1);
    assertNear(new Vector3(1, 0, -1).unit(), at(cylinder(slanted, Optional.empty()), 0, 0));
    assertNear(Vector3.Y, at(cylinder(Vector3.Z, Optional.of(new Vector3(0, 2, 5))), 0, 0));
  }

  @Test
  void placementTurnsFirstAndThenMoves() throws SurfaceFault {
    Surface placed =
        new Placement(
                Optional.of(new Placement.Turn(new Vector3(0, 0, 3), number(Math.PI / 2))),
                Optional.of(point(10, 0, 0)))
            .placed(cylinder(Vector3.Z, Optional.empty()), NONE);
    assertNear(new Vector3(10, 1, 0), at(placed, 0, 0));
    assertNear(new Vector3(9, 0, 0.5), at(placed, 0.25, 0.5));
  }

  @Test
  void placementIsRigid() throws SurfaceFault {
    SplittableRandom random = new SplittableRandom(31);
    Surface bowl =
        new GraphShape(
                GraphShape.Subject.Z,
                symbol("x").times(symbol("y")),
                new PlaneRegion.Box(Span.of(0, 2), Span.of(-1, 1)))
            .surface(NONE);
    double area = SurfaceSums.area(bowl, NONE);
    for (int i = 0; i < 10; i++) {
      Vector3 about =
          new Vector3(random.nextDouble(-1, 1), random.nextDouble(-1, 1), random.nextDouble(-1, 1));
      Vector3 move =
          new Vector3(random.nextDouble(-5, 5), random.nextDouble(-5, 5), random.nextDouble(-5, 5));
      Surface placed =
          new Placement(
                  Optional.of(new Placement.Turn(about, number(random.nextDouble(-7, 7)))),
                  Optional.of(VectorExpression.of(move)))
              .placed(bowl, NONE);
      assertEquals(area, SurfaceSums.area(placed, NONE), 1e-12 * area);
      assertEquals(
          at(bowl, 0.1, 0.2).minus(at(bowl, 0.9, 0.7)).norm(),
          at(placed, 0.1, 0.2).minus(at(placed, 0.9, 0.7)).norm(),
          1e-13);
      Vector3 axis = about.unit();
      assertEquals(
          SurfaceSums.vectorArea(bowl, NONE).dot(axis),
          SurfaceSums.vectorArea(placed, NONE).dot(axis),
          1e-12);
    }
  }

  @Test
  void derivativeByAParameterIsThatOfTheGeometry() throws SurfaceFault {
    double step = 1e-5;
    double slope = 0;
    for (double sign : new double[] {1, -1}) {
      Map<String, Double> changed = Map.of("a", 0.4 + sign * step);
      slope += sign * SurfaceSums.volume(leaning(), changed, Vector3.Z.times(-1)) / (2 * step);
    }
    Chart chart = leaning().charts().get(0);
    VectorExpression moved = chart.position().derivative("a");
    VectorExpression apex = chart.position().minus(point(0, 0, -1));
    VectorExpression swept = chart.areaVector();
    VectorExpression sweptSlope = swept.derivative("a");
    Map<String, Double> at = Map.of("a", 0.4);
    Expression integrand = moved.dot(swept).plus(apex.dot(sweptSlope));
    int n = 200;
    double[][] points = ChartSamples.grid(n);
    double[] values =
        new Figures(at).values(List.of(integrand), List.of(Chart.U, Chart.V), points)[0];
    double exact = Arrays.stream(values).sum() / 3 / n / n;
    assertTrue(Math.abs(exact) > 0.1, "the volume follows the parameter");
    assertEquals(slope, exact, 1e-4 * Math.abs(exact));
  }

  private static Surface leaning() throws SurfaceFault {
    return new ConeShape(
            point(0, 0, 0),
            point(symbol("a"), number(0), number(1)),
            number(1),
            symbol("a"),
            Optional.empty(),
            Optional.empty())
        .surface(Map.of("a", 0.4));
  }

  @Test
  void trimConditionsHoldInsideTheirBodies() throws SurfaceFault {
    record Body3(Body body, double volume) {}
    List<Body3> bodies =
        List.of(
            new Body3(
                new Body.Cylinder(point(-0.5, 0, 0), point(0.7, 0.2, 0), number(0.4)),
                Math.PI * 0.16 * Math.hypot(1.2, 0.2)),
            new Body3(
                new Body.Cone(point(0, 0, -0.9), point(0, 0, 0.9), number(0.8), number(0)),
                Math.PI * 0.64 * 1.8 / 3),
            new Body3(new Body.Sphere(point(0, 0.1, 0), number(0.8)), 4 * Math.PI / 3 * 0.512),
            new Body3(
                new Body.Ellipsoid(point(0, 0, 0), point(0.9, 0.5, 0.7)), 4 * Math.PI / 3 * 0.315),
            new Body3(
                new Body.Box(
                    point(-0.5, -0.5, -0.5),
                    point(1, 0.2, 0),
                    point(0, 1, 0.3),
                    point(0.1, 0, 0.9)),
                0.906),
            new Body3(new Body.HalfSpace(point(0.25, 0, 0), new Vector3(2, 0, 0)), 8 * 0.625));
    int n = 400_000;
    SplittableRandom random = new SplittableRandom(41);
    double[][] at = new double[3][];
    for (int k = 0; k < 3; k++) {
      at[k] = random.doubles(n, -1, 1).toArray();
    }
    for (Body3 item : bodies) {
      double[] inside =
          new Figures(NONE)
              .values(List.of(item.body().condition(NONE)), List.of("x", "y", "z"), at)[0];
      double share = Arrays.stream(inside).sum() / n;
      double deviation = 8 * Math.sqrt(share * (1 - share) / n);
      assertEquals(item.volume(), 8 * share, 4 * deviation, item.body().toString());
    }
  }
}
