package org.hullsum.closure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

class MomentClosureTest {
  private static final double ROUNDING = 1e-13;
  private static final double SLACK = MomentClosure.USUAL_SLACK;

  /** A flat piece: its moments about its centroid vanish. */
  private static SurfaceMoments flat(Vector3 centroid, Vector3 vectorArea) {
    return new SurfaceMoments(
        vectorArea.norm(), vectorArea, ROUNDING, centroid, Collections.nCopies(9, 0.0), ROUNDING);
  }

  /** The six faces of a box, outward; face 2k is at the low end of axis k. */
  private static List<SurfaceMoments> box(Vector3 corner, Vector3 size) {
    List<SurfaceMoments> faces = new ArrayList<>();
    Vector3 centre = corner.plus(size.times(0.5));
    Vector3[] axes = {Vector3.X, Vector3.Y, Vector3.Z};
    double volume = size.x() * size.y() * size.z();
    for (int k = 0; k < 3; k++) {
      double area = volume / size.component(k);
      Vector3 offset = axes[k].times(0.5 * size.component(k));
      faces.add(flat(centre.minus(offset), axes[k].times(-area)));
      faces.add(flat(centre.plus(offset), axes[k].times(area)));
    }
    return faces;
  }

  private static List<Integer> outward(int count) {
    return Collections.nCopies(count, 1);
  }

  @Test
  void closedBoxHoldsTheConditionsAndGivesItsVolume() {
    List<SurfaceMoments> faces = box(new Vector3(-1, 2, 3), new Vector3(2, 3, 0.5));
    MomentClosure closure = MomentClosure.of(faces, outward(6), SLACK);
    assertTrue(closure.holds());
    assertEquals(3.0, closure.enclosedVolume().orElseThrow(), 1e-12);
    assertEquals(0, closure.closureVector().norm(), 1e-14);
    assertEquals(3.0, closure.moments().get(0), 1e-12);
    assertEquals(0.0, closure.moments().get(1), 1e-12);
  }

  @Test
  void boxFarFromTheOriginGivesItsVolumeToTheSameDigits() {
    List<SurfaceMoments> faces = box(new Vector3(4e6, -7e6, 9e6), new Vector3(2, 3, 0.5));
    MomentClosure closure = MomentClosure.of(faces, outward(6), SLACK);
    assertTrue(closure.holds());
    assertEquals(3.0, closure.enclosedVolume().orElseThrow(), 1e-8);
  }

  @Test
  void twoMissingFacesFailTheConditions() {
    List<SurfaceMoments> faces = box(Vector3.ZERO, new Vector3(2, 3, 0.5));
    faces.remove(5);
    faces.remove(0);
    MomentClosure closure = MomentClosure.of(faces, outward(4), SLACK);
    assertFalse(closure.holds());
  }

  @Test
  void reversedFaceFailsTheConditions() {
    List<SurfaceMoments> faces = box(Vector3.ZERO, new Vector3(1, 1, 1));
    MomentClosure closure = MomentClosure.of(faces, List.of(1, 1, -1, 1, 1, 1), SLACK);
    assertFalse(closure.holds());
  }

  /** The trap: six equal centred holes leave no trace in vector area and moments. */
  @Test
  void cubeWithSixCentredHolesPassesThoughItIsOpen() {
    List<SurfaceMoments> faces = new ArrayList<>();
    for (SurfaceMoments face : box(new Vector3(-1, -1, -1), new Vector3(2, 2, 2))) {
      faces.add(flat(face.reference(), face.vectorArea().times(1 - 0.16)));
    }
    MomentClosure closure = MomentClosure.of(faces, outward(6), SLACK);
    assertTrue(closure.holds());
  }

  @Test
  void mismatchWithinTheSlackIsPassedOver() {
    List<SurfaceMoments> faces = box(Vector3.ZERO, new Vector3(1, 1, 1));
    SurfaceMoments lid = faces.remove(5);
    faces.add(flat(lid.reference(), lid.vectorArea().times(1 + 1e-7)));
    assertFalse(MomentClosure.of(faces, outward(6), SLACK).holds());
    assertTrue(MomentClosure.of(faces, outward(6), 1e-6).holds());
  }
}
