package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Optional;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

class SelfIntersectionsTest {
  private static Vector3[][] joined(Vector3[][] one, Vector3[][] other) {
    Vector3[][] all = Arrays.copyOf(one, one.length + other.length);
    System.arraycopy(other, 0, all, one.length, other.length);
    return all;
  }

  private static SelfIntersections.Found find(Vector3[][] triangles) {
    TriangleTree tree = TriangleTree.of(Meshes.of(triangles));
    SelfIntersections.Found one = SelfIntersections.find(tree, 1);
    assertEquals(one, SelfIntersections.find(tree, 2));
    return one;
  }

  @Test
  void soundMeshesHaveNone() {
    for (Vector3[][] sound :
        new Vector3[][][] {
          Meshes.box(Vector3.ZERO, new Vector3(1, 2, 3)),
          Meshes.torus(2, 0.5, 60, 40),
          Meshes.icosphere(4)
        }) {
      assertEquals(new SelfIntersections.Found(0, Optional.empty()), find(sound));
    }
  }

  @Test
  void twoTrianglesThroughOneAnotherAreAPairWithItsPlace() {
    Vector3[][] two = {
      {new Vector3(-1, -1, 0), new Vector3(1, -1, 0), new Vector3(0, 2, 0)},
      {new Vector3(0, 0, -1), new Vector3(0, 0, 1), new Vector3(5, 5, 0)}
    };
    SelfIntersections.Found found = find(two);
    assertEquals(1, found.pairs());
    assertEquals(new SelfIntersections.Pair(0, 1, Vector3.ZERO), found.first().orElseThrow());
  }

  @Test
  void trianglesThatMeetInACornerMayCrossElsewhere() {
    Vector3 apex = Vector3.ZERO;
    Vector3[][] two = {
      {apex, new Vector3(4, -1, 0), new Vector3(4, 1, 0)},
      {apex, new Vector3(3, 0, -1), new Vector3(3, 0, 1)}
    };
    assertEquals(1, find(two).pairs());
    Vector3[][] apart = {two[0], {apex, new Vector3(-3, 0, -1), new Vector3(-3, 0, 1)}};
    assertEquals(0, find(apart).pairs());
  }

  @Test
  void whatTouchesDoesNotCross() {
    Vector3[][] floor = {{new Vector3(-1, -1, 0), new Vector3(1, -1, 0), new Vector3(0, 2, 0)}};
    Vector3[][] standing = {{new Vector3(0, 0, 0), new Vector3(0, 0, 1), new Vector3(1, 0, 1)}};
    assertEquals(0, find(joined(floor, standing)).pairs());
  }

  @Test
  void crossingBallsAreFoundAlongTheWholeCircle() {
    Vector3[][] ball = Meshes.icosphere(4);
    Vector3[][] beside = new Vector3[ball.length][3];
    for (int t = 0; t < ball.length; t++) {
      for (int k = 0; k < 3; k++) {
        beside[t][k] = ball[t][k].plus(new Vector3(1.0123, 0.021, 0.013));
      }
    }
    SelfIntersections.Found found = find(joined(ball, beside));
    // A circle of length 5.4 over edges of about 0.07.
    assertTrue(found.pairs() > 150 && found.pairs() < 600, found.toString());
    Vector3 place = found.first().orElseThrow().place();
    assertEquals(0.506, place.x(), 0.1);
  }
}
