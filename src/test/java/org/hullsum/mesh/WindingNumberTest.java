package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class WindingNumberTest {
  private static Vector3 random(Random random, double size) {
    return new Vector3(
        size * random.nextGaussian(), size * random.nextGaussian(), size * random.nextGaussian());
  }

  private static WindingNumber of(Vector3[][] triangles) {
    return WindingNumber.of(TriangleTree.of(Meshes.of(triangles)));
  }

  /** The value is what is expected, within its own bound, which is as small as asked. */
  private static WindingNumber.Value checked(
      WindingNumber winding, Vector3 point, double bound, double expected) {
    WindingNumber.Value value = winding.at(point, bound);
    assertTrue(value.error() <= bound, point + ": " + value);
    assertEquals(expected, value.number(), value.error(), point + ": " + value);
    return value;
  }

  @ParameterizedTest
  @ValueSource(doubles = {1e-1, 1e-3, 1e-6, 1e-9})
  void sphereIsWoundOnceInsideAndNotOutsideToTheBound(double bound) {
    Random random = new Random(1);
    WindingNumber sphere = of(Meshes.icosphere(4));
    for (int k = 0; k < 200; k++) {
      Vector3 direction = random(random, 1).unit();
      // The mesh's chords lie within 0.003 of the unit sphere.
      checked(sphere, direction.times(0.99 * random.nextDouble()), bound, 1);
      checked(sphere, direction.times(1.01 + 3 * random.nextDouble()), bound, 0);
    }
  }

  @Test
  void boxIsWoundOnceUpToItsFaces() {
    WindingNumber box = of(Meshes.box(new Vector3(-1, -2, -3), new Vector3(1, 2, 3)));
    checked(box, Vector3.ZERO, 1e-12, 1);
    checked(box, new Vector3(1 - 1e-9, 0.3, 0.4), 1e-6, 1);
    checked(box, new Vector3(1 + 1e-9, 0.3, 0.4), 1e-6, 0);
    checked(box, new Vector3(50, 0, 0), 1e-12, 0);
  }

  @Test
  void torusIsNotWoundInItsHole() {
    Random random = new Random(2);
    WindingNumber torus = of(Meshes.torus(2, 0.5, 120, 60));
    checked(torus, Vector3.ZERO, 1e-9, 0);
    int inside = 0;
    for (int k = 0; k < 500; k++) {
      Vector3 p = random(random, 1.5);
      double radius = Math.hypot(Math.hypot(p.x(), p.y()) - 2, p.z());
      if (Math.abs(radius - 0.5) > 0.01) {
        checked(torus, p, 1e-4, radius < 0.5 ? 1 : 0);
        inside += radius < 0.5 ? 1 : 0;
      }
    }
    assertTrue(inside > 30);
  }

  @Test
  void nestedShellsAddUpAndACavityTakesAway() {
    Vector3[][] outer = Meshes.box(new Vector3(-2, -2, -2), new Vector3(2, 2, 2));
    Vector3[][] inner = Meshes.icosphere(3);
    boolean[] all = new boolean[inner.length];
    Arrays.fill(all, true);
    WindingNumber twice = of(joined(outer, inner));
    WindingNumber cavity = of(joined(outer, Meshes.turned(inner, all)));
    Vector3 between = new Vector3(1.5, 1.2, -1);
    checked(twice, Vector3.ZERO, 1e-9, 2);
    checked(twice, between, 1e-9, 1);
    checked(cavity, Vector3.ZERO, 1e-9, 0);
    checked(cavity, between, 1e-9, 1);
    checked(cavity, new Vector3(3, 0, 0), 1e-9, 0);
  }

  private static Vector3[][] joined(Vector3[][] one, Vector3[][] other) {
    List<Vector3[]> all = new ArrayList<>(List.of(one));
    all.addAll(List.of(other));
    return all.toArray(new Vector3[0][]);
  }

  @Test
  void faceOfACubeIsSeenAsASixth() {
    Vector3[][] cube = Meshes.box(new Vector3(-1, -1, -1), new Vector3(1, 1, 1));
    WindingNumber face = of(Arrays.copyOf(cube, 2));
    checked(face, Vector3.ZERO, 1e-14, 1.0 / 6);
    // Seen from its other side it counts against.
    checked(face, new Vector3(0, 0, -2), 1e-14, -1.0 / 6);
  }

  @Test
  void openMeshesAgreeWithTheDirectSumWithinTheirBounds() {
    Random random = new Random(3);
    double worst = 0;
    for (int k = 0; k < 60; k++) {
      Vector3[][] closed = k % 2 == 0 ? Meshes.icosphere(4) : Meshes.torus(2, 0.7, 60, 40);
      Vector3[][] open =
          Arrays.stream(closed).filter(t -> random.nextDouble() < 0.8).toArray(Vector3[][]::new);
      WindingNumber winding = of(open);
      for (int q = 0; q < 20; q++) {
        Vector3 p = random(random, 1.5);
        WindingNumber.Value direct = WindingNumber.direct(winding.tree().mesh(), p);
        WindingNumber.Value value = winding.at(p, 1e-3);
        double error = Math.abs(value.number() - direct.number());
        assertTrue(value.error() <= 1e-3 && direct.error() < 1e-9);
        assertTrue(error <= value.error() + direct.error(), p + ": " + error + " " + value);
        worst = Math.max(worst, error / value.error());
      }
    }
    // A bound that is never used up to a thousandth would be of no use.
    assertTrue(worst > 1e-3, "" + worst);
  }

  @Test
  void soupWithGapsIsNearlyOneInsideAndNearlyNothingOutside() {
    Random random = new Random(4);
    Vector3[][] soup = Meshes.icosphere(4);
    for (Vector3[] t : soup) {
      Vector3 middle = t[0].plus(t[1]).plus(t[2]).times(1.0 / 3);
      Vector3 shift = random(random, 0.004);
      for (int k = 0; k < 3; k++) {
        // No triangle has a corner in common with another.
        t[k] = middle.plus(t[k].minus(middle).times(0.98)).plus(shift);
      }
    }
    WindingNumber winding = of(soup);
    assertEquals(3 * soup.length, winding.tree().mesh().vertexCount());
    for (int k = 0; k < 100; k++) {
      Vector3 direction = random(random, 1).unit();
      assertEquals(1, winding.at(direction.times(0.8 * random.nextDouble()), 1e-3).number(), 0.06);
      assertEquals(0, winding.at(direction.times(1.2 + random.nextDouble()), 1e-3).number(), 0.06);
    }
  }

  @Test
  void pointOnATriangleHasNoValue() {
    WindingNumber box = of(Meshes.box(new Vector3(-1, -1, -1), new Vector3(1, 1, 1)));
    for (Vector3 on :
        List.of(new Vector3(1, 0.2, 0.3), new Vector3(1, 1, 0.3), new Vector3(1, 1, 1))) {
      assertTrue(box.at(on, 1e-3).error() >= 1, on.toString());
      assertTrue(WindingNumber.direct(box.tree().mesh(), on).error() >= 1, on.toString());
    }
  }

  @Test
  void millionTrianglesAreLookedAtInAFewThousandNodes() {
    WindingNumber torus = of(Meshes.torus(2, 0.5, 1000, 500));
    assertEquals(1_000_000, torus.tree().mesh().triangleCount());
    Random random = new Random(5);
    int most = 0;
    long sum = 0;
    for (int k = 0; k < 300; k++) {
      Vector3 p = random(random, 1.5);
      double radius = Math.hypot(Math.hypot(p.x(), p.y()) - 2, p.z());
      if (Math.abs(radius - 0.5) > 0.01) {
        int visited = checked(torus, p, 1e-2, radius < 0.5 ? 1 : 0).visited();
        most = Math.max(most, visited);
        sum += visited;
      }
    }
    // Of 65,535 clusters. Near the tube's inner side much of it is near, and halves along a
    // Morton curve may lie in two places: medians take half as many.
    assertTrue(most < 13_107, most + " nodes");
    assertTrue(sum < 300 * 3_276, sum / 300 + " nodes on average");
  }

  @Test
  void distanceIsThatOfTheNearestTriangle() {
    Random random = new Random(6);
    TriangleTree tree = TriangleTree.of(Meshes.of(Meshes.torus(2, 0.5, 40, 20)));
    for (int k = 0; k < 300; k++) {
      Vector3 p = random(random, 1.5);
      double nearest = Double.POSITIVE_INFINITY;
      for (int t = 0; t < tree.mesh().triangleCount(); t++) {
        nearest = Math.min(nearest, TriangleDistance.of(tree.mesh(), t, p));
      }
      assertEquals(nearest, tree.distance(p), 0);
      double radius = Math.hypot(Math.hypot(p.x(), p.y()) - 2, p.z());
      assertEquals(Math.abs(radius - 0.5), tree.distance(p), 0.02);
    }
    TriangleTree box = TriangleTree.of(Meshes.of(Meshes.box(Vector3.ZERO, new Vector3(1, 1, 1))));
    assertEquals(3, box.distance(new Vector3(0.2, 0.3, 4)), 1e-15);
    assertEquals(5, box.distance(new Vector3(4, 0.3, 5)), 1e-15);
    assertEquals(Math.sqrt(3), box.distance(new Vector3(2, 2, 2)), 1e-15);
  }
}
