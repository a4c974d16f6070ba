package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

class PolygonDividerTest {
  private static final FaultPlace PLACE = message -> MeshFault.atByte(0, message);

  /** Corners in a plane that leans, given by two coordinates in it. */
  private static RecordedTriangles divide(double... plane) throws MeshFault {
    RecordedTriangles sink = new RecordedTriangles();
    FaceAccumulator faces = new FaceAccumulator(sink);
    faces.begin();
    for (int k = 0; k < plane.length / 2; k++) {
      Vector3 point =
          new Vector3(2, -1, 2)
              .times(plane[2 * k] / 3)
              .plus(new Vector3(2, 2, -1).times(plane[2 * k + 1] / 3))
              .plus(new Vector3(5, 6, 7));
      faces.point(point.x(), point.y(), point.z(), PLACE);
      faces.corner(k, PLACE);
    }
    faces.polygon(PLACE);
    return sink;
  }

  /** Both sums agree only where no triangle is turned and none overlaps another. */
  private static void coversOnce(RecordedTriangles told, int triangles, double area) {
    assertEquals(triangles, told.triangleCount());
    assertEquals(area, told.areaVector().norm(), 1e-12 * area);
    assertEquals(area, told.area(), 1e-12 * area);
    assertTrue(told.smallestArea() > 1e-9 * area, "a triangle has no area");
  }

  @Test
  void convexPolygonIsDividedByAFan() throws MeshFault {
    assertEquals("(0 1 2)(0 2 3)(0 3 4)", divide(0, 0, 2, 0, 3, 1, 1, 3, 0, 2).corners());
  }

  @Test
  void polygonWithStraightCornersIsDividedWithoutFlatTriangles() throws MeshFault {
    coversOnce(divide(0, 0, 1, 0, 2, 0, 2, 1, 2, 2, 1, 2, 0, 2, 0, 1), 6, 4);
    coversOnce(divide(1, 0, 2, 0, 3, 0, 4, 0, 2, 3, 0, 0), 4, 6);
  }

  @Test
  void polygonsThatTurnInAreDividedInBothSenses() throws MeshFault {
    double[] comb = {0, 0, 5, 0, 5, 3, 4, 3, 4, 1, 3, 1, 3, 3, 2, 3, 2, 1, 1, 1, 1, 3, 0, 3};
    coversOnce(divide(comb), 10, 11);
    double[] back = new double[comb.length];
    for (int k = 0; k < comb.length; k += 2) {
      back[k] = comb[comb.length - 2 - k];
      back[k + 1] = comb[comb.length - 1 - k];
    }
    coversOnce(divide(back), 10, 11);
    assertEquals(0, divide(comb).areaVector().plus(divide(back).areaVector()).norm(), 1e-12);
  }

  @Test
  void polygonWithAHoleJoinedByACutIsDivided() throws MeshFault {
    coversOnce(divide(0, 0, 3, 0, 3, 3, 0, 3, 0, 0, 1, 1, 1, 2, 2, 2, 2, 1, 1, 1), 8, 8);
  }

  @Test
  void randomStarShapedPolygonsAreCoveredOnce() throws MeshFault {
    SplittableRandom random = new SplittableRandom(20260301);
    for (int trial = 0; trial < 300; trial++) {
      int corners = 4 + random.nextInt(60);
      double[] plane = new double[2 * corners];
      double area = 0;
      double[] radius = random.doubles(corners, 0.2, 3).toArray();
      for (int k = 0; k < corners; k++) {
        double angle = 2 * Math.PI * k / corners;
        plane[2 * k] = radius[k] * Math.cos(angle);
        plane[2 * k + 1] = radius[k] * Math.sin(angle);
        area += radius[k] * radius[(k + 1) % corners] * Math.sin(2 * Math.PI / corners) / 2;
      }
      RecordedTriangles told = divide(plane);
      assertEquals(corners - 2, told.triangleCount());
      assertEquals(area, told.area(), 1e-9 * area, "trial " + trial);
      assertEquals(area, told.areaVector().norm(), 1e-9 * area, "trial " + trial);
    }
  }

  @Test
  void repeatedCornersAreTakenAway() throws MeshFault {
    assertEquals("(0 1 2)", divide(0, 0, 1, 0, 0, 1, 0, 1).corners());
    assertEquals("(0 1 2)", divide(0, 0, 1, 0, 1, 0, 0, 1, 0, 0).corners());
    assertEquals(1, divide(0, 0, 0, 0, 0, 0, 1, 0).triangleCount());
  }

  @Test
  void cornersOnOneLineGiveTrianglesWithoutArea() throws MeshFault {
    RecordedTriangles told = divide(0, 0, 1, 0, 2, 0, 3, 0);
    assertEquals(2, told.triangleCount());
    // The corners are rounded to about 1e-15 when they are laid into space.
    assertEquals(0, told.area(), 1e-14);
  }

  @Test
  void polygonsThatCrossThemselvesAreRefused() {
    refused("encloses no area", 0, 0, 1, 1, 1, 0, 0, 1);
    refused("crosses itself", 0, 0, 1, 2, 1, 0, 0, 1);
    double[] star = new double[10];
    for (int k = 0; k < 5; k++) {
      star[2 * k] = Math.cos(0.8 * Math.PI * k);
      star[2 * k + 1] = Math.sin(0.8 * Math.PI * k);
    }
    refused("crosses itself", star);
  }

  private static void refused(String message, double... plane) {
    MeshFault fault = assertThrows(MeshFault.class, () -> divide(plane));
    assertTrue(fault.getMessage().contains(message), fault.getMessage());
  }

  @Test
  void largePolygonIsDividedOnlyWhereItIsConvex() throws MeshFault {
    double[] round = round(3000);
    assertEquals(2998, divide(round).triangleCount());
    round[2 * 7] = 0;
    refused("is not convex", round);
    refused("70000 corners is not read", round(70_000));
  }

  private static double[] round(int corners) {
    double[] round = new double[2 * corners];
    for (int k = 0; k < corners; k++) {
      round[2 * k] = Math.cos(2 * Math.PI * k / corners);
      round[2 * k + 1] = Math.sin(2 * Math.PI * k / corners);
    }
    return round;
  }
}
