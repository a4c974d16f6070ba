package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import java.util.stream.IntStream;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class MeshTopologyTest {
  private static final long SPREAD = 0x9E3779B97F4A7C15L;

  static IntStream seeds() {
    return IntStream.rangeClosed(1, 250);
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void turnedTrianglesOfAClosedMeshAreAllFoundAndNoOthers(int seed) {
    Random random = new Random(seed * SPREAD);
    Vector3[][] outward = Meshes.closed(random);
    boolean[] turn = new boolean[outward.length];
    double share = random.nextInt(4) == 0 ? 1 : random.nextDouble();
    int count = 0;
    for (int k = 0; k < turn.length; k++) {
      turn[k] = random.nextDouble() < share;
      count += turn[k] ? 1 : 0;
    }
    MeshTopology topology = MeshTopology.of(Meshes.of(Meshes.turned(outward, turn)));
    assertTrue(topology.isClosed());
    assertEquals(1, topology.shells().size());
    assertTrue(topology.shells().get(0).orientable());
    assertEquals(count, topology.shells().get(0).toTurn());
    for (int k = 0; k < turn.length; k++) {
      assertEquals(turn[k], topology.isToTurn(k), "triangle " + k);
    }
  }

  @Test
  void publishedVolumesOfTheDividedIcosahedronAreReached() {
    // icosphere 1.0.0 (npm), levels 0 to 4, as computed from its files.
    double[] published = {2.5361507101, 3.6587122085, 4.0470053674, 4.1526845875, 4.1797214693};
    for (int level = 0; level < published.length; level++) {
      MeshTopology topology = MeshTopology.of(Meshes.of(Meshes.icosphere(level)));
      assertEquals(20 << (2 * level), topology.mesh().triangleCount());
      assertEquals(published[level], topology.shells().get(0).volume(), 6e-11);
    }
  }

  @Test
  void removedTrianglesLeaveALoopRoundTheHole() {
    Vector3[][] box = Meshes.box(Vector3.ZERO, new Vector3(1, 2, 3));
    Vector3[][] open = Arrays.copyOfRange(box, 2, box.length);
    MeshTopology topology = MeshTopology.of(Meshes.of(open));
    assertFalse(topology.isClosed());
    assertEquals(1, topology.loops().size());
    MeshLoop loop = topology.loops().get(0);
    assertTrue(loop.closed());
    assertEquals(4, loop.vertices().size());
    Vector3 area = Vector3.ZERO;
    for (int k = 0; k < 4; k++) {
      Vector3 a = topology.mesh().vertex(loop.vertices().get(k));
      area =
          area.plus(a.cross(topology.mesh().vertex(loop.vertices().get((k + 1) % 4))).times(0.5));
    }
    // The surface has its rim on the right hand of the missing bottom's outward normal.
    assertEquals(new Vector3(0, 0, 2), area);
  }

  @Test
  void twoBoxesAreTwoShellsAndASharedEdgeIsCrowded() {
    Vector3[][] one = Meshes.box(Vector3.ZERO, new Vector3(1, 1, 1));
    Vector3[][] apart = Meshes.box(new Vector3(2, 0, 0), new Vector3(3, 1, 1));
    Vector3[][] touching = Meshes.box(new Vector3(1, 1, 0), new Vector3(2, 2, 1));
    assertEquals(2, MeshTopology.of(Meshes.of(joined(one, apart))).shells().size());
    MeshTopology crowded = MeshTopology.of(Meshes.of(joined(one, touching)));
    assertEquals(1, crowded.crowdedEdgeCount());
    assertFalse(crowded.isClosed());
  }

  @Test
  void repeatedAndDegenerateTrianglesAreCountedAndDoNotOpenTheMesh() {
    Vector3[][] box = Meshes.box(Vector3.ZERO, new Vector3(1, 1, 1));
    Vector3[] flat = {box[0][0], box[0][1], box[0][1]};
    Vector3[][] more = joined(box, new Vector3[][] {box[3], flat});
    MeshTopology topology = MeshTopology.of(Meshes.of(more));
    assertEquals(1, topology.duplicateCount());
    assertEquals(1, topology.degenerateCount());
    assertTrue(topology.isClosed());
  }

  @Test
  void aBandWithATwistIsNotOrientable() {
    int n = 12;
    Vector3[][] band = new Vector3[2 * n][];
    for (int k = 0; k < n; k++) {
      Vector3 a = edge(k, n, -0.3);
      Vector3 b = edge(k, n, 0.3);
      Vector3 c = k + 1 < n ? edge(k + 1, n, -0.3) : edge(0, n, 0.3);
      Vector3 d = k + 1 < n ? edge(k + 1, n, 0.3) : edge(0, n, -0.3);
      band[2 * k] = new Vector3[] {a, c, d};
      band[2 * k + 1] = new Vector3[] {a, d, b};
    }
    MeshTopology topology = MeshTopology.of(Meshes.of(band));
    assertFalse(topology.shells().get(0).orientable());
    assertEquals(1, topology.loops().stream().filter(MeshLoop::closed).count());
  }

  private static Vector3 edge(int k, int n, double across) {
    double p = 2 * Math.PI * k / n;
    double radius = 1 + across * Math.cos(p / 2);
    return new Vector3(radius * Math.cos(p), radius * Math.sin(p), across * Math.sin(p / 2));
  }

  private static Vector3[][] joined(Vector3[][] one, Vector3[][] other) {
    Vector3[][] all = Arrays.copyOf(one, one.length + other.length);
    System.arraycopy(other, 0, all, one.length, other.length);
    return all;
  }

  @Test
  void shellWithinAnOddNumberOfOthersIsACavityHoweverTheTrianglesFace() {
    for (int inward = 0; inward < 16; inward++) {
      Vector3[][] all = new Vector3[0][];
      for (int k = 0; k < 4; k++) {
        // Three one within another, and one beside them.
        double half = k == 3 ? 0.5 : 3 - k;
        Vector3 middle = k == 3 ? new Vector3(9, 0, 0) : new Vector3(0.01 * k, 0.02, 0.03);
        Vector3 corner = new Vector3(half, half, half);
        Vector3[][] box = Meshes.box(middle.minus(corner), middle.plus(corner));
        boolean[] turn = new boolean[box.length];
        Arrays.fill(turn, (inward >> k & 1) == 1);
        all = joined(all, Meshes.turned(box, turn));
      }
      MeshTopology topology = MeshTopology.of(Meshes.of(all));
      assertTrue(topology.isClosed());
      int wrong = 0;
      for (int k = 0; k < 4; k++) {
        MeshShell shell = topology.shells().get(k);
        assertEquals(k == 1, shell.cavity());
        boolean turned = (inward >> k & 1) == (k == 1 ? 0 : 1);
        wrong += turned ? 12 : 0;
        assertEquals(turned ? 12 : 0, shell.toTurn());
        for (int t = 12 * k; t < 12 * k + 12; t++) {
          assertEquals(turned, topology.isToTurn(t));
        }
      }
      assertEquals(Math.min(wrong, 48 - wrong), topology.againstCount());
      long counted = IntStream.range(0, 48).filter(topology::isAgainst).count();
      assertEquals(topology.againstCount(), counted);
    }
  }

  @Test
  void spheresWithinSpheresFaceOutOfWhatTheyEncloseInEveryCombination() {
    double[] radii = {3, 2, 1};
    for (int inward = 0; inward < 8; inward++) {
      Vector3[][] all = new Vector3[0][];
      for (int k = 0; k < 3; k++) {
        Vector3[][] sphere = scaled(Meshes.icosphere(2), radii[k], new Vector3(0.05 * k, 0, 0));
        boolean[] turn = new boolean[sphere.length];
        Arrays.fill(turn, (inward >> k & 1) == 1);
        all = joined(all, Meshes.turned(sphere, turn));
      }
      MeshTopology topology = MeshTopology.of(Meshes.of(all));
      for (int t = 0; t < all.length; t++) {
        int k = t / 320;
        assertEquals((inward >> k & 1) == (k == 1 ? 0 : 1), topology.isToTurn(t), "sphere " + k);
      }
    }
  }

  @Test
  void tenThousandShellsInAShellAreCavitiesAndTheirKernelsAreNot() {
    int n = 17;
    Vector3[][] all = Meshes.box(new Vector3(-1, -1, -1), new Vector3(n, n, n));
    Vector3 corner = new Vector3(0.4, 0.4, 0.4);
    for (int cell = 0; cell < 2 * n * n * n; cell++) {
      // Every cavity and then, in it, a kernel that is every fourth one turned.
      int k = cell / 2;
      Vector3 middle = new Vector3(k % n, k / n % n, Math.floorDiv(k, n * n));
      Vector3 half = cell % 2 == 0 ? corner : corner.times(0.5);
      Vector3[][] box = Meshes.box(middle.minus(half), middle.plus(half));
      boolean[] turn = new boolean[12];
      Arrays.fill(turn, cell % 2 == 0 || k % 4 == 0);
      all = cell == 0 ? Arrays.copyOf(all, 12 + 24 * n * n * n) : all;
      System.arraycopy(Meshes.turned(box, turn), 0, all, 12 + 12 * cell, 12);
    }
    MeshTopology topology = MeshTopology.of(Meshes.of(all));
    assertEquals(1 + 2 * n * n * n, topology.shells().size());
    assertEquals((long) n * n * n, topology.shells().stream().filter(MeshShell::cavity).count());
    for (int t = 0; t < all.length; t++) {
      int cell = (t - 12) / 12;
      assertEquals(t >= 12 && cell % 2 == 1 && cell / 2 % 4 == 0, topology.isToTurn(t));
    }
  }

  private static Vector3[][] scaled(Vector3[][] triangles, double by, Vector3 middle) {
    return Arrays.stream(triangles)
        .map(t -> Arrays.stream(t).map(p -> p.times(by).plus(middle)).toArray(Vector3[]::new))
        .toArray(Vector3[][]::new);
  }
}
