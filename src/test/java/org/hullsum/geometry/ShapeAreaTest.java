package org.hullsum.geometry;

import static org.hullsum.geometry.Formulas.cos;
import static org.hullsum.geometry.Formulas.number;
import static org.hullsum.geometry.Formulas.point;
import static org.hullsum.geometry.Formulas.sin;
import static org.hullsum.geometry.Formulas.sqrt;
import static org.hullsum.geometry.Formulas.symbol;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.geometry.Chart.Side;
import org.hullsum.geometry.GraphShape.Subject;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

/** Areas, volumes of cones from the origin, vector areas and rims against exact formulas. */
class ShapeAreaTest {
  private static final double RELATIVE = 1e-11;
  private static final Map<String, Double> NONE = Map.of();
  private static final Set<Side> ALL = EnumSet.allOf(Side.class);

  private static void check(
      Surface surface,
      Map<String, Double> parameters,
      double area,
      double volume,
      Vector3 vectorArea) {
    assertEquals(area, SurfaceSums.area(surface, parameters), RELATIVE * area, "area");
    double length = Math.sqrt(area);
    assertEquals(
        volume,
        SurfaceSums.volume(surface, parameters, Vector3.ZERO),
        RELATIVE * area * length,
        "volume");
    Vector3 difference = SurfaceSums.vectorArea(surface, parameters).minus(vectorArea);
    assertTrue(difference.norm() < RELATIVE * area, "vector area off by " + difference);
  }

  private static Set<Side> rim(Surface surface, int chart) {
    return surface.charts().get(chart).rim();
  }

  @Test
  void sphereHasItsAreaAndVolumeAndNoRim() throws SurfaceFault {
    Surface sphere =
        new SphereShape(
                point(1, -2, 0.5),
                number(1.5),
                new Vector3(1, 1, 2),
                Optional.empty(),
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    double r = 1.5;
    check(sphere, NONE, 4 * Math.PI * r * r, 4 * Math.PI / 3 * r * r * r, Vector3.ZERO);
    assertEquals(Set.of(), rim(sphere, 0));
    assertTrue(sphere.charts().get(0).periodicV());
  }

  @Test
  void sphereCapHasOneRimAndTheAreaOfItsZone() throws SurfaceFault {
    double to = Math.PI / 3;
    Surface cap =
        new SphereShape(
                point(0, 0, 0),
                symbol("R"),
                Vector3.Z,
                Optional.of(Span.of(0, to)),
                Optional.empty(),
                Optional.empty())
            .surface(Map.of("R", 2.0));
    double area = 2 * Math.PI * 4 * (1 - Math.cos(to));
    check(
        cap,
        Map.of("R", 2.0),
        area,
        area * 2 / 3,
        new Vector3(0, 0, Math.PI * 4 * Math.pow(Math.sin(to), 2)));
    assertEquals(Set.of(Side.U_END), rim(cap, 0));
  }

  @Test
  void cylinderHasTwoRimsAndItsNormalAwayFromTheAxis() throws SurfaceFault {
    Surface cylinder =
        new CylinderShape(
                point(0, 0, 0), point(3, 4, 0), number(0.5), Optional.empty(), Optional.empty())
            .surface(NONE);
    double area = 2 * Math.PI * 0.5 * 5;
    check(cylinder, NONE, area, area * 0.5 / 3, Vector3.ZERO);
    assertEquals(Set.of(Side.V_START, Side.V_END), rim(cylinder, 0));
    assertTrue(cylinder.charts().get(0).periodicU());
  }

  @Test
  void cylinderSectorHasFourRimsAndStartsAtItsZero() throws SurfaceFault {
    Surface half =
        new CylinderShape(
                point(0, 0, 0),
                point(0, 0, 2),
                number(1),
                Optional.of(Span.of(0, Math.PI)),
                Optional.of(Vector3.Y))
            .surface(NONE);
    check(half, NONE, 2 * Math.PI, 2 * Math.PI / 3, new Vector3(-4, 0, 0));
    assertEquals(ALL, rim(half, 0));
  }

  @Test
  void coneToItsApexHasOneRim() throws SurfaceFault {
    Surface cone =
        new ConeShape(
                point(0, 0, 0),
                point(0, 0, 4),
                number(3),
                number(0),
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    check(cone, NONE, Math.PI * 3 * 5, Math.PI * 9 * 4 / 3, new Vector3(0, 0, Math.PI * 9));
    assertEquals(Set.of(Side.V_START), rim(cone, 0));
  }

  @Test
  void frustumHasTheAreaOfItsSlantHeight() throws SurfaceFault {
    Surface frustum =
        new ConeShape(
                point(0, 0, 0),
                point(0, 0, 4),
                number(4),
                number(1),
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    double lid = Math.PI * 4.0 / 3;
    double whole = Math.PI * 4.0 / 3 * (16 + 4 + 1);
    check(frustum, NONE, Math.PI * 5 * 5, whole - lid, new Vector3(0, 0, Math.PI * 15));
  }

  @Test
  void diskWithHoleAndSectorHasItsArea() throws SurfaceFault {
    Surface sector =
        new DiskShape(
                point(1, 2, 3),
                new Vector3(0, 0, -7),
                number(2),
                Optional.of(number(1)),
                Optional.of(Span.of(0.25, 1.75)),
                Optional.empty())
            .surface(NONE);
    double area = 0.5 * 1.5 * 3;
    check(sector, NONE, area, -area, new Vector3(0, 0, -area));
    assertEquals(ALL, rim(sector, 0));
  }

  @Test
  void fullDiskHasOneRim() throws SurfaceFault {
    Surface disk =
        new DiskShape(
                point(0, 0, 1),
                new Vector3(1, 2, 2),
                number(2),
                Optional.empty(),
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    double area = Math.PI * 4;
    check(disk, NONE, area, area * 2 / 9, new Vector3(1, 2, 2).times(area / 3));
    assertEquals(Set.of(Side.U_END), rim(disk, 0));
  }

  @Test
  void torusHasItsAreaAndVolumeAndNoRim() throws SurfaceFault {
    Surface torus =
        new TorusShape(
                point(0.3, 0, 0),
                new Vector3(0, 1, 1),
                number(2),
                number(0.75),
                Optional.empty(),
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    check(
        torus,
        NONE,
        4 * Math.PI * Math.PI * 2 * 0.75,
        2 * Math.PI * Math.PI * 2 * 0.75 * 0.75,
        Vector3.ZERO);
    assertEquals(Set.of(), rim(torus, 0));
  }

  @Test
  void elbowHasTwoRims() throws SurfaceFault {
    Surface elbow =
        new TorusShape(
                point(0, 0, 0),
                Vector3.Z,
                number(2),
                number(0.5),
                Optional.of(Span.of(0, Math.PI / 2)),
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    double cross = Math.PI * 0.25;
    check(elbow, NONE, Math.PI * Math.PI / 2 * 2, cross * Math.PI, new Vector3(cross, cross, 0));
    assertEquals(Set.of(Side.U_START, Side.U_END), rim(elbow, 0));
  }

  @Test
  void rectangleHasTheNormalOfItsEdges() throws SurfaceFault {
    Surface rectangle =
        new RectangleShape(point(0, 0, 1), point(2, 0, 0), point(0, 3, 0)).surface(NONE);
    check(rectangle, NONE, 6, 2, new Vector3(0, 0, 6));
    assertEquals(ALL, rim(rectangle, 0));
  }

  @Test
  void concavePolygonHasItsAreaAndOnlyItsOwnEdgesAsRim() throws SurfaceFault {
    Surface arrow =
        new PolygonShape(
                List.of(
                    point(0, 0, 2), point(4, 0, 2), point(4, 4, 2), point(2, 1, 2), point(0, 4, 2)))
            .surface(NONE);
    check(arrow, NONE, 10, 20.0 / 3, new Vector3(0, 0, 10));
    int sides = arrow.charts().stream().mapToInt(chart -> chart.rim().size()).sum();
    assertEquals(5, sides);
    assertEquals(3, arrow.charts().size());
  }

  @Test
  void polygonWithPointOnAnEdgeKeepsAllEdges() throws SurfaceFault {
    Surface square =
        new PolygonShape(
                List.of(
                    point(0, 0, 0), point(1, 0, 0), point(2, 0, 0), point(2, 2, 0), point(0, 2, 0)))
            .surface(NONE);
    check(square, NONE, 4, 0, new Vector3(0, 0, 4));
    assertEquals(5, square.charts().stream().mapToInt(chart -> chart.rim().size()).sum());
  }

  @Test
  void graphOverDiskHasTheAreaOfTheParaboloid() throws SurfaceFault {
    Surface bowl =
        new GraphShape(
                Subject.Z,
                symbol("x").power(2).plus(symbol("y").power(2)),
                new PlaneRegion.Disk(new PlaneRegion.Corner(number(0), number(0)), number(1)))
            .surface(NONE);
    double area = Math.PI / 6 * (5 * Math.sqrt(5) - 1);
    check(bowl, NONE, area, -Math.PI / 2 / 3, new Vector3(0, 0, Math.PI));
    assertEquals(Set.of(Side.U_END), rim(bowl, 0));
  }

  @Test
  void graphOverBoxWithCollapsingLimitsIsAsGoodAsOneOverADisk() throws SurfaceFault {
    for (boolean firstIsOuter : new boolean[] {true, false}) {
      String outer = firstIsOuter ? "x" : "y";
      Span wide = new Span(symbol("a").negated(), symbol("a"));
      var root = sqrt(symbol("a").power(2).minus(symbol(outer).power(2)));
      Span limits = new Span(root.negated(), root);
      Surface bowl =
          new GraphShape(
                  Subject.Z,
                  symbol("x").power(2).plus(symbol("y").power(2)),
                  new PlaneRegion.Box(firstIsOuter ? wide : limits, firstIsOuter ? limits : wide))
              .surface(Map.of("a", 1.0));
      double area = Math.PI / 6 * (5 * Math.sqrt(5) - 1);
      check(bowl, Map.of("a", 1.0), area, -Math.PI / 2 / 3, new Vector3(0, 0, Math.PI));
      assertEquals(
          firstIsOuter ? Set.of(Side.V_START, Side.V_END) : Set.of(Side.U_START, Side.U_END),
          rim(bowl, 0));
    }
  }

  @Test
  void graphsOfXAndYPointTowardsPlusOfTheirSubject() throws SurfaceFault {
    PlaneRegion box = new PlaneRegion.Box(Span.of(0, 2), Span.of(0, 3));
    Surface x = new GraphShape(Subject.X, symbol("y").times(number(0.5)), box).surface(NONE);
    check(x, NONE, 6 * Math.sqrt(1.25), 0, new Vector3(6, -3, 0));
    Surface y = new GraphShape(Subject.Y, symbol("z").times(number(0.5)), box).surface(NONE);
    check(y, NONE, 6 * Math.sqrt(1.25), 0, new Vector3(0, 6, -3));
  }

  @Test
  void graphOverClockwisePolygonStillPointsUp() throws SurfaceFault {
    PlaneRegion triangle =
        new PlaneRegion.Polygon(
            List.of(
                new PlaneRegion.Corner(number(0), number(0)),
                new PlaneRegion.Corner(number(0), number(1)),
                new PlaneRegion.Corner(number(1), number(0))));
    for (Subject subject : Subject.values()) {
      Surface graph = new GraphShape(subject, number(2), triangle).surface(NONE);
      Vector3 up =
          switch (subject) {
            case X -> Vector3.X;
            case Y -> Vector3.Y;
            case Z -> Vector3.Z;
          };
      check(graph, NONE, 0.5, 1.0 / 3, up.times(0.5));
      assertEquals(3, rim(graph, 0).size());
    }
  }

  @Test
  void parametricSphereIsFoundClosed() throws SurfaceFault {
    var u = symbol("u");
    var v = symbol("v");
    Surface sphere =
        new ParametricShape(
                point(sin(u).times(cos(v)), sin(u).times(sin(v)), cos(u)),
                Span.poleToPole(),
                Span.fullTurn())
            .surface(NONE);
    check(sphere, NONE, 4 * Math.PI, 4 * Math.PI / 3, Vector3.ZERO);
    assertEquals(Set.of(), rim(sphere, 0));
    assertTrue(sphere.charts().get(0).periodicV());
  }

  @Test
  void moebiusStripKeepsTheSidesThatMeetTheWrongWayRound() throws SurfaceFault {
    var u = symbol("u");
    var v = symbol("v");
    var half = u.over(number(2));
    var radius = number(2).plus(v.times(cos(half)));
    Surface strip =
        new ParametricShape(
                point(radius.times(cos(u)), radius.times(sin(u)), v.times(sin(half))),
                Span.fullTurn(),
                Span.of(-0.5, 0.5))
            .surface(NONE);
    assertEquals(ALL, rim(strip, 0));
  }

  @Test
  void revolutionOfAStraightProfileIsTheCone() throws SurfaceFault {
    Surface cone =
        new RevolutionShape(
                new Profile.Polyline(
                    List.of(
                        new Profile.Point(number(3), number(0)),
                        new Profile.Point(number(0), number(4)))),
                point(0, 0, 0),
                Vector3.Z,
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    check(cone, NONE, Math.PI * 15, Math.PI * 12, new Vector3(0, 0, Math.PI * 9));
    assertEquals(Set.of(Side.V_START), rim(cone, 0));
  }

  @Test
  void closedProfileWithAnEdgeOnTheAxisHasNoRim() throws SurfaceFault {
    List<Profile.Point> square =
        List.of(
            new Profile.Point(number(0), number(0)),
            new Profile.Point(number(2), number(0)),
            new Profile.Point(number(2), number(1)),
            new Profile.Point(number(0), number(1)),
            new Profile.Point(number(0), number(0)));
    Surface drum =
        new RevolutionShape(
                new Profile.Polyline(square),
                point(0, 0, 0),
                Vector3.X,
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    check(drum, NONE, Math.PI * 12, Math.PI * 4, Vector3.ZERO);
    drum.charts().forEach(chart -> assertEquals(Set.of(), chart.rim()));
  }

  @Test
  void revolutionOfACircleIsTheTorusWithPeriodicProfile() throws SurfaceFault {
    var s = symbol("s");
    Surface torus =
        new RevolutionShape(
                new Profile.Curve(number(2).plus(cos(s)), sin(s), Span.fullTurn()),
                point(0, 0, 0),
                Vector3.Z,
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    check(torus, NONE, 8 * Math.PI * Math.PI, 4 * Math.PI * Math.PI, Vector3.ZERO);
    assertTrue(torus.charts().get(0).periodicV());
    assertEquals(Set.of(), rim(torus, 0));
  }

  @Test
  void areaFollowsAParameterThatTurnsTheAxis() throws SurfaceFault {
    Map<String, Double> at = Map.of("a", 0.4);
    Surface cylinder =
        new CylinderShape(
                point(0, 0, 0),
                point(symbol("a"), number(0), number(1)),
                number(0.5),
                Optional.empty(),
                Optional.empty())
            .surface(at);
    double derivative =
        new Chart(cylinder.charts().get(0).position().derivative("a"), false, false, Set.of())
                .position()
                .equals(point(0, 0, 0))
            ? 0
            : 1;
    assertEquals(1, derivative, "the position depends on the parameter");
    Map<String, Double> turned = Map.of("a", 0.9);
    double length = Math.hypot(0.9, 1);
    check(cylinder, turned, Math.PI * length, Math.PI * length * 0.5 / 3, Vector3.ZERO);
  }
}
