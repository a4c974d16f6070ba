package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

class TriangleTreeTest {
  private static final double REACH = 1e-9;

  private static Vector3 random(Random random, double size) {
    return new Vector3(
        size * random.nextGaussian(), size * random.nextGaussian(), size * random.nextGaussian());
  }

  @Test
  void linesCrossATorusAsOftenAsTheFormulaSays() {
    Random random = new Random(5);
    TriangleTree tree = TriangleTree.of(Meshes.of(Meshes.torus(2, 0.5, 120, 60)));
    int inside = 0;
    for (int k = 0; k < 2000; k++) {
      Vector3 p = random(random, 1.5);
      double radius = Math.hypot(Math.hypot(p.x(), p.y()) - 2, p.z());
      if (Math.abs(radius - 0.5) < 0.01) {
        continue;
      }
      TriangleTree.LineHits hits = tree.along(p, random(random, 1).unit(), REACH);
      long ahead = hits.places().stream().filter(t -> t > 0).count();
      assertTrue(!hits.doubtful());
      assertEquals(0, hits.places().size() % 2);
      assertEquals(radius < 0.5, ahead % 2 == 1, "" + p);
      inside += radius < 0.5 ? 1 : 0;
    }
    assertTrue(inside > 100);
  }

  @Test
  void placesAreThoseOfThePlaneAndEdgesAreDoubtful() {
    TriangleTree tree = TriangleTree.of(Meshes.of(Meshes.box(Vector3.ZERO, new Vector3(1, 1, 1))));
    TriangleTree.LineHits hits = tree.along(new Vector3(0.3, 0.6, -2), Vector3.Z, REACH);
    assertEquals(java.util.List.of(2.0, 3.0), hits.places());
    assertTrue(tree.along(new Vector3(0.5, 0.5, -2), Vector3.Z, REACH).doubtful());
    assertTrue(tree.along(new Vector3(0, 0.5, -2), Vector3.Z, REACH).doubtful());
    assertEquals(0, tree.along(new Vector3(3, 0.5, -2), Vector3.Z, REACH).places().size());
  }
}
