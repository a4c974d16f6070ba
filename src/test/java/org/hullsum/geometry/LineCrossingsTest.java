package org.hullsum.geometry;

import static org.hullsum.geometry.Formulas.cos;
import static org.hullsum.geometry.Formulas.number;
import static org.hullsum.geometry.Formulas.point;
import static org.hullsum.geometry.Formulas.sin;
import static org.hullsum.geometry.Formulas.sqrt;
import static org.hullsum.geometry.Formulas.symbol;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SplittableRandom;
import org.apache.commons.math3.analysis.solvers.LaguerreSolver;
import org.apache.commons.math3.complex.Complex;
import org.hullsum.expression.Expression;
import org.hullsum.geometry.Crossings.Doubt;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

/** Crossings of random lines against the roots of the surfaces' own equations. */
class LineCrossingsTest {
  private static final Map<String, Double> NONE = Map.of();
  private static final int LINES = 2000;
  private static final double ACCURACY = 1e-11;

  /** Roots nearer to one another than this are left out: the line is nearly tangent there. */
  private static final double SEPARATION = 1e-3;

  private static Surface sphere(double radius) throws SurfaceFault {
    return new SphereShape(
            point(0.1, 0.2, -0.3),
            number(radius),
            new Vector3(1, 2, 3),
            Optional.empty(),
            Optional.empty(),
            Optional.empty())
        .surface(NONE);
  }

  private static Surface torus(double ring, double tube) throws SurfaceFault {
    return new TorusShape(
            point(0, 0, 0),
            Vector3.Z,
            number(ring),
            number(tube),
            Optional.empty(),
            Optional.empty(),
            Optional.empty())
        .surface(NONE);
  }

  private static Surface cylinder() throws SurfaceFault {
    return new CylinderShape(
            point(0, 0, -1), point(0, 0, 1), number(0.5), Optional.empty(), Optional.empty())
        .surface(NONE);
  }

  private static Vector3 inCube(SplittableRandom random, double half) {
    return new Vector3(
        random.nextDouble(-half, half),
        random.nextDouble(-half, half),
        random.nextDouble(-half, half));
  }

  private interface Roots {
    List<Double> of(Vector3 origin, Vector3 direction);
  }

  private static void check(Surface surface, Roots roots, long seed) {
    LineCrossings lines = LineCrossings.of(surface, NONE);
    LineCrossings.Workspace workspace = lines.workspace();
    SplittableRandom random = new SplittableRandom(seed);
    int crossed = 0;
    int doubtful = 0;
    for (int i = 0; i < LINES; i++) {
      Vector3 origin = inCube(random, 1.5);
      Vector3 direction = inCube(random, 1);
      List<Double> expected = new ArrayList<>(roots.of(origin, direction));
      expected.sort(Comparator.naturalOrder());
      Crossings found = lines.along(origin, direction, workspace);
      if (!found.reliable()) {
        doubtful++;
        continue;
      }
      assertEquals(expected.size(), found.crossings().size(), "line " + i + " of seed " + seed);
      for (int k = 0; k < expected.size(); k++) {
        double t = found.crossings().get(k).t();
        assertEquals(expected.get(k), t, ACCURACY / direction.norm() / spread(expected, k));
        crossed++;
      }
    }
    assertTrue(crossed > LINES / 4, "only " + crossed + " crossings");
    assertTrue(doubtful <= LINES / 500, doubtful + " lines in doubt");
  }

  /** Distance to the nearest other root, at most 1: the condition of a root. */
  private static double spread(List<Double> roots, int k) {
    double spread = 1;
    for (int i = 0; i < roots.size(); i++) {
      if (i != k) {
        spread = Math.min(spread, Math.abs(roots.get(i) - roots.get(k)));
      }
    }
    return Math.max(spread, SEPARATION);
  }

  private static List<Double> quadratic(double a, double b, double c) {
    double discriminant = b * b - a * c;
    if (discriminant <= 0) {
      return List.of();
    }
    double root = Math.sqrt(discriminant);
    return List.of((-b - root) / a, (-b + root) / a);
  }

  @Test
  void sphereIsCrossedWhereItsEquationHolds() throws SurfaceFault {
    Vector3 centre = new Vector3(0.1, 0.2, -0.3);
    check(
        sphere(1.2),
        (origin, d) -> {
          Vector3 o = origin.minus(centre);
          return quadratic(d.dot(d), o.dot(d), o.dot(o) - 1.44);
        },
        11);
  }

  @Test
  void cylinderIsCrossedBetweenItsRimsOnly() throws SurfaceFault {
    check(
        cylinder(),
        (o, d) ->
            quadratic(
                    d.x() * d.x() + d.y() * d.y(),
                    o.x() * d.x() + o.y() * d.y(),
                    o.x() * o.x() + o.y() * o.y() - 0.25)
                .stream()
                .filter(t -> Math.abs(o.z() + t * d.z()) <= 1)
                .toList(),
        12);
  }

  @Test
  void torusIsCrossedWhereItsQuarticHasRealRoots() throws SurfaceFault {
    double ring = 1.0;
    double tube = 0.4;
    check(
        torus(ring, tube),
        (o, direction) -> {
          Vector3 d = direction.unit();
          double m = o.dot(o) + ring * ring - tube * tube;
          double b = o.dot(d);
          double axial = 4 * ring * ring;
          double[] coefficients = {
            m * m - axial * (o.x() * o.x() + o.y() * o.y()),
            4 * b * m - 2 * axial * (o.x() * d.x() + o.y() * d.y()),
            4 * b * b + 2 * m - axial * (d.x() * d.x() + d.y() * d.y()),
            4 * b,
            1
          };
          List<Double> real = new ArrayList<>();
          for (Complex root : new LaguerreSolver(1e-13).solveAllComplex(coefficients, 0.3)) {
            if (Math.abs(root.getImaginary()) < 1e-7) {
              real.add(root.getReal() / direction.norm());
            }
          }
          return real;
        },
        13);
  }

  @Test
  void cosineIsThatWithTheConstructionNormal() throws SurfaceFault {
    LineCrossings lines = LineCrossings.of(sphere(2), NONE);
    Vector3 direction = new Vector3(0.3, -0.7, 0.2);
    List<Crossing> crossings =
        lines.along(new Vector3(0.1, 0.2, -0.3), direction, lines.workspace()).crossings();
    assertEquals(2, crossings.size());
    assertEquals(-1, crossings.get(0).cosine(), 1e-12);
    assertEquals(1, crossings.get(1).cosine(), 1e-12);
    assertEquals(2 / direction.norm(), crossings.get(1).t(), 1e-12);
  }

  @Test
  void lineThroughPoleOrSeamOrRimIsInDoubt() throws SurfaceFault {
    LineCrossings ball =
        LineCrossings.of(
            new SphereShape(
                    point(0, 0, 0),
                    number(1),
                    Vector3.Z,
                    Optional.empty(),
                    Optional.empty(),
                    Optional.empty())
                .surface(NONE),
            NONE);
    Crossings pole = ball.along(Vector3.ZERO, Vector3.Z, ball.workspace());
    assertEquals(Optional.of(Doubt.NEAR_SIDE), pole.doubt());
    Crossings seam = ball.along(new Vector3(0, 0, 0.3), Vector3.X, ball.workspace());
    assertEquals(Optional.of(Doubt.NEAR_SIDE), seam.doubt());
    LineCrossings tube = LineCrossings.of(cylinder(), NONE);
    double inside = 1 - 1e-8;
    double outside = 1 + 1e-8;
    for (double z : new double[] {inside, 1, outside}) {
      Crossings rim = tube.along(new Vector3(0, 0, z), new Vector3(1, 2, 0), tube.workspace());
      assertEquals(Optional.of(Doubt.NEAR_SIDE), rim.doubt(), "at height " + z);
    }
    Crossings clear = tube.along(new Vector3(0, 0, 1.001), new Vector3(1, 2, 0), tube.workspace());
    assertTrue(clear.reliable() && clear.crossings().isEmpty());
  }

  @Test
  void tangentLineIsInDoubt() throws SurfaceFault {
    LineCrossings ball = LineCrossings.of(sphere(1), NONE);
    Vector3 centre = new Vector3(0.1, 0.2, -0.3);
    Crossings tangent =
        ball.along(centre.plus(new Vector3(0, 0.6, 0.8)), new Vector3(1, 0, 0), ball.workspace());
    assertFalse(tangent.reliable());
    LineCrossings tube = LineCrossings.of(cylinder(), NONE);
    Crossings within = tube.along(new Vector3(0.3, 0.4, 0), new Vector3(0, 0, 1), tube.workspace());
    assertFalse(within.reliable());
  }

  @Test
  void trimmedAwayCrossingsAreNoneAndNearTheCutInDoubt() throws SurfaceFault {
    Surface half =
        new Trim(
                List.of(new Body.HalfSpace(point(0, 0, 0), Vector3.Z)),
                List.of(new Body.Sphere(point(0, 0.5, -0.5), number(0.1))))
            .trimmed(cylinder(), NONE);
    LineCrossings lines = LineCrossings.of(half, NONE);
    Vector3 across = new Vector3(0.6, 0.8, 0);
    assertEquals(
        2, lines.along(new Vector3(0, 0, -0.2), across, lines.workspace()).crossings().size());
    Crossings above = lines.along(new Vector3(0, 0, 0.2), across, lines.workspace());
    assertTrue(above.reliable() && above.crossings().isEmpty());
    Crossings through = lines.along(new Vector3(0.01, 0, -0.5), Vector3.Y, lines.workspace());
    assertEquals(1, through.crossings().size());
    assertTrue(through.reliable());
    Crossings cut = lines.along(new Vector3(0, 0, 1e-9), across, lines.workspace());
    assertEquals(Optional.of(Doubt.NEAR_TRIM), cut.doubt());
  }

  @Test
  void surfaceInTheFaceOfItsTrimIsNotInDoubt() throws SurfaceFault {
    Surface plate =
        new Trim(List.of(), List.of(new Body.Cylinder(point(0, 0, 0), point(0, 0, 1), number(0.2))))
            .trimmed(
                new RectangleShape(point(-1, -1, 0), point(2, 0, 0), point(0, 2, 0)).surface(NONE),
                NONE);
    LineCrossings lines = LineCrossings.of(plate, NONE);
    Vector3 direction = new Vector3(0.1, 0.2, 1);
    Crossings hole = lines.along(new Vector3(0.1, 0.05, 0), direction, lines.workspace());
    assertTrue(hole.reliable() && hole.crossings().isEmpty());
    Crossings rest = lines.along(new Vector3(0.5, 0.05, 0), direction, lines.workspace());
    assertTrue(rest.reliable() && rest.crossings().size() == 1);
  }

  @Test
  void closedSurfacesAreCrossedAnEvenNumberOfTimes() throws SurfaceFault {
    Expression s = symbol("s");
    Surface bean =
        new RevolutionShape(
                new Profile.Curve(
                    sin(s).times(number(1).plus(number(0.4).times(cos(s.times(number(4)))))),
                    cos(s),
                    Span.poleToPole()),
                point(0, 0, 0),
                new Vector3(1, 1, 0),
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    Surface ellipsoid =
        new EllipsoidShape(point(0, 0, 0), point(0.2, 1, 0.6), Optional.empty(), Optional.empty())
            .surface(NONE);
    for (Surface surface : List.of(bean, ellipsoid, torus(1, 0.9))) {
      LineCrossings lines = LineCrossings.of(surface, NONE);
      LineCrossings.Workspace workspace = lines.workspace();
      SplittableRandom random = new SplittableRandom(5);
      int doubtful = 0;
      for (int i = 0; i < LINES; i++) {
        Crossings found = lines.along(inCube(random, 1), inCube(random, 1), workspace);
        if (found.reliable()) {
          assertEquals(0, found.crossings().size() % 2, surface.kind() + ", line " + i);
        } else {
          doubtful++;
        }
      }
      assertTrue(doubtful <= LINES / 200, surface.kind() + ": " + doubtful + " in doubt");
    }
  }

  @Test
  void domeAndFloorOverCollapsingLimitsAreClosedTogether() throws SurfaceFault {
    Expression root = sqrt(number(1).minus(symbol("x").power(2)).minus(symbol("y").power(2)));
    Expression limit = sqrt(number(1).minus(symbol("x").power(2)));
    PlaneRegion disk = new PlaneRegion.Box(Span.of(-1, 1), new Span(limit.negated(), limit));
    Surface dome =
        new GraphShape(GraphShape.Subject.Z, number(0.5).times(root), disk).surface(NONE);
    Surface floor = new GraphShape(GraphShape.Subject.Z, number(0), disk).surface(NONE);
    LineCrossings upper = LineCrossings.of(dome, NONE);
    LineCrossings lower = LineCrossings.of(floor, NONE);
    SplittableRandom random = new SplittableRandom(6);
    int sure = 0;
    for (int i = 0; i < 300; i++) {
      Vector3 origin = inCube(random, 0.6);
      Vector3 direction = inCube(random, 1);
      Crossings a = upper.along(origin, direction, upper.workspace());
      Crossings b = lower.along(origin, direction, lower.workspace());
      if (a.reliable() && b.reliable()) {
        sure++;
        assertEquals(0, (a.crossings().size() + b.crossings().size()) % 2, "line " + i);
      }
    }
    assertTrue(sure > 280, "only " + sure + " lines without doubt");
  }

  @Test
  void answersDoNotDependOnLinesAskedBefore() throws SurfaceFault {
    LineCrossings fresh = LineCrossings.of(torus(1, 0.4), NONE);
    LineCrossings used = LineCrossings.of(torus(1, 0.4), NONE);
    SplittableRandom random = new SplittableRandom(7);
    for (int i = 0; i < 200; i++) {
      used.along(inCube(random, 1), inCube(random, 1), used.workspace());
    }
    Vector3 origin = new Vector3(0.1, 0.2, 0.05);
    Vector3 direction = new Vector3(1, 0.3, 0.1);
    assertEquals(
        fresh.along(origin, direction, fresh.workspace()),
        used.along(origin, direction, used.workspace()));
  }
}
