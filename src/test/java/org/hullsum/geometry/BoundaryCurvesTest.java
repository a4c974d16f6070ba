package org.hullsum.geometry;

import static org.hullsum.geometry.Formulas.number;
import static org.hullsum.geometry.Formulas.point;
import static org.hullsum.geometry.Formulas.sin;
import static org.hullsum.geometry.Formulas.symbol;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

/** Lengths of rims, and ½ ∮ r × dr against the vector area of the surface (Stokes' theorem). */
class BoundaryCurvesTest {
  private static final double TOLERANCE = 1e-6;
  private static final Map<String, Double> NONE = Map.of();

  private static Surface sphere() throws SurfaceFault {
    return new SphereShape(
            point(0, 0, 0),
            number(1),
            Vector3.Z,
            Optional.empty(),
            Optional.empty(),
            Optional.empty())
        .surface(NONE);
  }

  private static Surface cylinder(double radius, double from, double to) throws SurfaceFault {
    return new CylinderShape(
            point(0, 0, from), point(0, 0, to), number(radius), Optional.empty(), Optional.empty())
        .surface(NONE);
  }

  private static Surface inside(Surface surface, Body... bodies) throws SurfaceFault {
    return new Trim(List.of(bodies), List.of()).trimmed(surface, NONE);
  }

  private static Surface outside(Surface surface, Body... bodies) throws SurfaceFault {
    return new Trim(List.of(), List.of(bodies)).trimmed(surface, NONE);
  }

  private static List<BoundaryCurve> curves(Surface surface) {
    return BoundaryCurves.of(surface, NONE, TOLERANCE);
  }

  private static void check(
      List<BoundaryCurve> curves, int count, double length, Vector3 vectorArea) {
    assertEquals(count, curves.size(), "curves");
    assertTrue(curves.stream().allMatch(BoundaryCurve::closed), "closed");
    double total = curves.stream().mapToDouble(BoundaryCurve::length).sum();
    assertEquals(length, total, 10 * TOLERANCE * Math.max(1, length), "length");
    Vector3 area = vectorArea(curves);
    assertTrue(
        area.minus(vectorArea).norm() < TOLERANCE * Math.max(1, length),
        "vector area " + area + ", expected " + vectorArea);
  }

  private static Vector3 vectorArea(List<BoundaryCurve> curves) {
    return curves.stream()
        .map(BoundaryCurve::vectorArea)
        .reduce(Vector3::plus)
        .orElse(Vector3.ZERO);
  }

  @Test
  void diskIsBoundedByItsCircleAndAnnulusByTwo() throws SurfaceFault {
    Vector3 normal = new Vector3(2, -1, 2);
    Surface disk =
        new DiskShape(
                point(1, 2, 3),
                normal,
                number(1.5),
                Optional.empty(),
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    check(curves(disk), 1, 3 * Math.PI, normal.times(Math.PI * 2.25 / 3));
    Surface ring =
        new DiskShape(
                point(1, 2, 3),
                normal,
                number(1.5),
                Optional.of(number(0.5)),
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    check(curves(ring), 2, 4 * Math.PI, normal.times(Math.PI * 2 / 3));
  }

  @Test
  void sectorIsBoundedByOneCurveRoundItsFourSides() throws SurfaceFault {
    Surface sector =
        new DiskShape(
                point(0, 0, 0),
                Vector3.Z,
                number(2),
                Optional.of(number(1)),
                Optional.of(Span.of(0.5, 2)),
                Optional.empty())
            .surface(NONE);
    check(curves(sector), 1, 1.5 * 3 + 2, new Vector3(0, 0, 2.25));
  }

  @Test
  void closedSurfacesHaveNoBoundary() throws SurfaceFault {
    Surface torus =
        new TorusShape(
                point(0, 0, 0),
                Vector3.Y,
                number(2),
                number(0.5),
                Optional.empty(),
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    assertEquals(List.of(), curves(torus));
    assertEquals(List.of(), curves(sphere()));
    Body all = new Body.Sphere(point(0, 0, 0), number(5));
    assertEquals(List.of(), curves(inside(torus, all)));
    assertEquals(List.of(), curves(outside(sphere(), all)));
  }

  @Test
  void polygonIsBoundedByItsOwnEdgesInOneCurve() throws SurfaceFault {
    Surface arrow =
        new PolygonShape(
                List.of(
                    point(0, 0, 2), point(4, 0, 2), point(4, 4, 2), point(2, 1, 2), point(0, 4, 2)))
            .surface(NONE);
    check(curves(arrow), 1, 12 + 2 * Math.sqrt(13), new Vector3(0, 0, 10));
  }

  @Test
  void cylinderIsBoundedByItsTwoCircles() throws SurfaceFault {
    check(curves(cylinder(0.5, 0, 3)), 2, 2 * Math.PI, Vector3.ZERO);
  }

  @Test
  void sphereCutByTiltedPlaneIsBoundedByOneCircleAcrossTheSeam() throws SurfaceFault {
    Vector3 normal = new Vector3(1, 0.2, 0.4).unit();
    Vector3 through = normal.times(-0.3);
    Surface cap =
        inside(sphere(), new Body.HalfSpace(point(through.x(), through.y(), through.z()), normal));
    double radius = Math.sqrt(1 - 0.09);
    check(curves(cap), 1, 2 * Math.PI * radius, normal.times(-Math.PI * radius * radius));
  }

  @Test
  void capRoundThePoleIsBoundedByOneCircle() throws SurfaceFault {
    Vector3 normal = new Vector3(0.1, 0.05, 1).unit();
    Vector3 through = normal.times(0.8);
    Surface cap =
        outside(sphere(), new Body.HalfSpace(point(through.x(), through.y(), through.z()), normal));
    check(curves(cap), 1, 2 * Math.PI * 0.6, normal.times(Math.PI * 0.36));
  }

  @Test
  void branchOpeningAndBranchEndAreTheSameCurveInOppositeSenses() throws SurfaceFault {
    double header = 0.15;
    double branch = 0.05;
    Surface shell =
        new CylinderShape(
                point(0, -0.6, 0),
                point(0, 0.6, 0),
                number(header),
                Optional.empty(),
                Optional.empty())
            .surface(NONE);
    Surface wall =
        outside(
            cylinder(branch, 0, 0.4),
            new Body.Cylinder(point(0, -0.6, 0), point(0, 0.6, 0), number(header)));
    Surface opened =
        outside(shell, new Body.Cylinder(point(0, 0, 0), point(0, 0, 0.4), number(branch)));
    List<BoundaryCurve> ofShell = curves(opened);
    List<BoundaryCurve> ofWall = curves(wall);
    assertEquals(3, ofShell.size());
    assertEquals(2, ofWall.size());
    double circle = 2 * Math.PI * header;
    double hole = length(ofShell) - 2 * circle;
    double end = length(ofWall) - 2 * Math.PI * branch;
    assertEquals(hole, end, 20 * TOLERANCE);
    Vector3 opening = new Vector3(0, 0, -Math.PI * branch * branch);
    assertTrue(vectorArea(ofShell).minus(opening).norm() < TOLERANCE, "shell");
    assertTrue(vectorArea(ofWall).norm() < TOLERANCE, "wall");
    Surface plug =
        inside(shell, new Body.Cylinder(point(0, 0, 0), point(0, 0, 0.4), number(branch)));
    check(curves(plug), 1, hole, opening.negated());
  }

  private static double length(List<BoundaryCurve> curves) {
    return curves.stream().mapToDouble(BoundaryCurve::length).sum();
  }

  @Test
  void openingMuchSmallerThanTheShellIsFound() throws SurfaceFault {
    Surface shell = cylinder(2.5, 0, 10);
    Surface opened =
        outside(shell, new Body.Cylinder(point(0, 0, 3.3), point(3, 0.7, 3.3), number(0.02)));
    List<BoundaryCurve> curves = curves(opened);
    assertEquals(3, curves.size());
    Vector3 axis = new Vector3(3, 0.7, 0).unit();
    assertEquals(-Math.PI * 4e-4, vectorArea(curves).dot(axis), TOLERANCE);
  }

  @Test
  void pipeCutInTwoThroughItsSeamIsBoundedByOneCurve() throws SurfaceFault {
    Surface half =
        inside(cylinder(1, 0, 2), new Body.HalfSpace(point(0, 0, 0), new Vector3(0, -1, 0)));
    check(curves(half), 1, 2 * Math.PI + 4, new Vector3(0, 4, 0));
    Surface other =
        inside(cylinder(1, 0, 2), new Body.HalfSpace(point(0, 0, 0), new Vector3(0, 1, 0)));
    check(curves(other), 1, 2 * Math.PI + 4, new Vector3(0, -4, 0));
  }

  @Test
  void plateInsideABoxKeepsItsCorners() throws SurfaceFault {
    Surface plate =
        new RectangleShape(point(-1, -1, 0), point(2, 0, 0), point(0, 2, 0)).surface(NONE);
    Surface part =
        inside(
            plate,
            new Body.Box(
                point(-0.3, -0.2, -1), point(0.7, 0.1, 0), point(-0.1, 0.9, 0), point(0, 0, 2)));
    double length = 2 * (Math.hypot(0.7, 0.1) + Math.hypot(0.1, 0.9));
    check(curves(part), 1, length, new Vector3(0, 0, 0.7 * 0.9 + 0.1 * 0.1));
    Surface corner =
        inside(
            plate,
            new Body.Box(point(0.5, 0.5, -1), point(2, 0, 0), point(0, 2, 0), point(0, 0, 2)));
    check(curves(corner), 1, 2, new Vector3(0, 0, 0.25));
  }

  @Test
  void trimAlongInnerEdgeOfAPolygonLeavesTheEdgeAsBoundary() throws SurfaceFault {
    Surface square =
        new PolygonShape(List.of(point(0, 0, 0), point(1, 0, 0), point(1, 1, 0), point(0, 1, 0)))
            .surface(NONE);
    for (double sign : new double[] {1, -1}) {
      Surface half =
          inside(square, new Body.HalfSpace(point(0, 0, 0), new Vector3(sign, -sign, 0)));
      check(curves(half), 1, 2 + Math.sqrt(2), new Vector3(0, 0, 0.5));
      Surface otherHalf =
          inside(square, new Body.HalfSpace(point(1, 0, 0), new Vector3(sign, sign, 0)));
      check(curves(otherHalf), 1, 2 + Math.sqrt(2), new Vector3(0, 0, 0.5));
    }
  }

  @Test
  void wavyConditionLeavesSeveralCurves() throws SurfaceFault {
    Surface plate =
        new RectangleShape(point(0, 0, 0), point(4, 0, 0), point(0, 1, 0)).surface(NONE);
    Expression wave =
        sin(symbol("x").times(number(Math.PI))).times(sin(symbol("y").times(number(Math.PI))));
    Body spots =
        new Body.Where(new Expression.Comparison(Expression.Relation.GREATER, wave, number(0.5)));
    List<BoundaryCurve> curves = curves(inside(plate, spots));
    assertEquals(2, curves.size());
    assertEquals(
        curves.get(0).length(), curves.get(1).length(), TOLERANCE, "the spots are congruent");
    assertTrue(curves.get(0).vectorArea().z() > 0, "run left round");
  }

  @Test
  void toleranceIsKept() throws SurfaceFault {
    double coarse = 1e-3;
    List<BoundaryCurve> curves = BoundaryCurves.of(cylinder(1, 0, 1), NONE, coarse);
    double most = 0;
    for (BoundaryCurve curve : curves) {
      for (int i = 1; i < curve.points().size(); i++) {
        Vector3 middle = curve.points().get(i - 1).plus(curve.points().get(i)).times(0.5);
        most = Math.max(most, 1 - Math.hypot(middle.x(), middle.y()));
      }
    }
    assertTrue(most < coarse && most > 0, "off by " + most);
    assertTrue(curves.get(0).points().size() < 200, "few points");
  }
}
