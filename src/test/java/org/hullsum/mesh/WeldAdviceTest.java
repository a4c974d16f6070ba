package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Optional;
import java.util.Random;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

class WeldAdviceTest {
  private static Vector3[][] torus() {
    return Meshes.torus(2, 0.5, 30, 20);
  }

  private static Optional<WeldAdvice> advice(Vector3[][] triangles, double unit) {
    return WeldAdvice.of(MeshTopology.of(Meshes.of(triangles)), unit);
  }

  /** Some triangles moved by themselves, each by so much in a random direction. */
  private static Vector3[][] moved(Vector3[][] triangles, double share, double by, long seed) {
    Random random = new Random(seed);
    return Arrays.stream(triangles)
        .map(
            t -> {
              Vector3 d =
                  new Vector3(random.nextGaussian(), random.nextGaussian(), random.nextGaussian());
              Vector3 shift = random.nextDouble() < share ? d.unit().times(by) : Vector3.ZERO;
              return Arrays.stream(t).map(p -> p.plus(shift)).toArray(Vector3[]::new);
            })
        .toArray(Vector3[][]::new);
  }

  @Test
  void lengthThatIsAdvisedClosesTheMeshAndTheNextSmallerOneDoesNot() {
    for (long seed = 1; seed <= 20; seed++) {
      double share = seed % 2 == 0 ? 1 : 0.1;
      Vector3[][] cracked = moved(torus(), share, 3e-6, seed);
      WeldAdvice advice = advice(cracked, 1).orElseThrow();
      assertEquals(advice.open(), advice.closed());
      // Two neighbours that moved apart are up to twice as far away as each has moved.
      assertTrue(advice.length() == 5e-6 || advice.length() == 1e-5, () -> "" + advice);
      TriangleMesh mesh = Meshes.of(cracked);
      TriangleMesh welded = VertexMerger.merge(mesh, advice.length()).mesh();
      assertTrue(MeshTopology.of(welded).isClosed());
      TriangleMesh less = VertexMerger.merge(mesh, advice.length() / 2).mesh();
      assertTrue(!MeshTopology.of(less).isClosed());
    }
  }

  @Test
  void lengthIsRoundInTheUnitThatIsAskedFor() {
    WeldAdvice advice = advice(moved(torus(), 0.1, 3e-6, 1), 25.4).orElseThrow();
    double length = 25.4 * advice.length();
    assertTrue(length == 1e-4 || length == 2e-4, () -> "" + length);
  }

  @Test
  void partOfABoundaryThatWouldCloseIsTold() {
    Vector3[][] holed = Arrays.copyOf(torus(), 1000);
    WeldAdvice advice = advice(moved(holed, 0.1, 3e-6, 1), 1).orElseThrow();
    int hole = (int) MeshTopology.of(Meshes.of(holed)).boundary().count();
    assertEquals(advice.open() - hole, advice.closed());
  }

  @Test
  void plainHolesWideCracksAndClosedMeshesGetNoAdvice() {
    assertEquals(Optional.empty(), advice(torus(), 1));
    assertEquals(Optional.empty(), advice(Arrays.copyOf(torus(), 1000), 1));
    assertEquals(Optional.empty(), advice(moved(torus(), 1, 0.01, 1), 1));
    Vector3[][] small = Meshes.torus(1e-5, 2e-6, 9, 9);
    Vector3[][] both = Arrays.copyOf(torus(), 1200 + 100);
    System.arraycopy(small, 0, both, 1200, 100);
    assertEquals(Optional.empty(), advice(both, 1));
  }
}
