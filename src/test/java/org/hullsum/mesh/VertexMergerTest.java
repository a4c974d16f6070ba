package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Collections;
import java.util.HashSet;
import java.util.List;
import java.util.Random;
import java.util.Set;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

class VertexMergerTest {
  private static final double JITTER = 1e-6;

  /** Each triangle's corners moved a little, by themselves. */
  private static Vector3[][] shaken(Vector3[][] triangles, long seed) {
    Random random = new Random(seed);
    Vector3[][] shaken = new Vector3[triangles.length][3];
    for (int t = 0; t < shaken.length; t++) {
      for (int k = 0; k < 3; k++) {
        Vector3 by =
            new Vector3(
                random.nextDouble() - 0.5, random.nextDouble() - 0.5, random.nextDouble() - 0.5);
        shaken[t][k] = triangles[t][k].plus(by.times(JITTER));
      }
    }
    return shaken;
  }

  @Test
  void shakenMeshCloses() {
    Vector3[][] torus = Meshes.torus(2, 0.5, 60, 40);
    MeshTopology sound = MeshTopology.of(Meshes.of(torus));
    for (long seed = 1; seed <= 20; seed++) {
      TriangleMesh loose = Meshes.of(shaken(torus, seed));
      assertFalse(MeshTopology.of(loose).isClosed());
      VertexMerger.Merged merged = VertexMerger.merge(loose, 2 * JITTER);
      MeshTopology topology = MeshTopology.of(merged.mesh());
      assertTrue(topology.isClosed());
      assertEquals(2400, merged.mesh().vertexCount());
      assertEquals(loose.vertexCount() - 2400, merged.weld().vertices());
      assertTrue(merged.weld().farthest() <= Math.sqrt(3) * JITTER);
      assertEquals(0, merged.weld().triangles());
      double volume = sound.shells().get(0).volume();
      assertEquals(volume, topology.shells().get(0).volume(), 60 * JITTER);
    }
  }

  @Test
  void verticesFartherApartStayThemselves() {
    Vector3[][] torus = Meshes.torus(2, 0.5, 20, 12);
    VertexMerger.Merged merged = VertexMerger.merge(Meshes.of(torus), 1e-3);
    assertEquals(240, merged.mesh().vertexCount());
    assertEquals(0, merged.weld().vertices());
    assertEquals(0, merged.weld().farthest());
  }

  @Test
  void triangleThatLosesACornerIsCountedAndStays() {
    Vector3 a = new Vector3(0, 0, 0);
    Vector3 b = new Vector3(1, 0, 0);
    Vector3 c = new Vector3(1, 1e-4, 0);
    Vector3 d = new Vector3(0, 1, 0);
    TriangleMesh mesh = Meshes.of(new Vector3[][] {{a, b, c}, {a, c, d}});
    VertexMerger.Merged merged = VertexMerger.merge(mesh, 1e-3);
    assertEquals(new MeshWeld(1e-3, 1, 1e-4, 1), merged.weld());
    assertEquals(2, merged.mesh().triangleCount());
    assertEquals(1, MeshTopology.of(merged.mesh()).degenerateCount());
  }

  @Test
  void chainDoesNotRunOn() {
    Vector3[][] fan = new Vector3[100][];
    for (int k = 0; k < fan.length; k++) {
      fan[k] =
          new Vector3[] {new Vector3(0.9 * k, 0, 0), new Vector3(0, 50, 0), new Vector3(0, 0, 50)};
    }
    VertexMerger.Merged merged = VertexMerger.merge(Meshes.of(fan), 1);
    assertTrue(merged.weld().farthest() <= 1);
    assertEquals(50 + 2, merged.mesh().vertexCount());
  }

  @Test
  void lengthMustBePositive() {
    TriangleMesh mesh = Meshes.of(Meshes.box(Vector3.ZERO, new Vector3(1, 1, 1)));
    assertThrows(IllegalArgumentException.class, () -> VertexMerger.merge(mesh, 0));
    assertThrows(IllegalArgumentException.class, () -> VertexMerger.merge(mesh, Double.NaN));
  }

  @Test
  void whatIsWeldedDoesNotDependOnTheOrderOfTheMesh() {
    Vector3[][] loose = shaken(Meshes.torus(2, 0.5, 30, 20), 7);
    Set<Vector3> expected = Set.of();
    for (long seed = 1; seed <= 10; seed++) {
      List<Vector3[]> list = new ArrayList<>(List.of(loose));
      Collections.shuffle(list, new Random(seed));
      // Less than the triangles were shaken by, so that it matters who joins whom.
      VertexMerger.Merged merged =
          VertexMerger.merge(Meshes.of(list.toArray(new Vector3[0][])), JITTER / 2);
      Set<Vector3> vertices = new HashSet<>();
      for (int v = 0; v < merged.mesh().vertexCount(); v++) {
        vertices.add(merged.mesh().vertex(v));
      }
      assertTrue(vertices.size() > 600 && vertices.size() < 3600, () -> "" + vertices.size());
      assertEquals(seed == 1 ? vertices : expected, vertices);
      expected = vertices;
    }
  }
}
