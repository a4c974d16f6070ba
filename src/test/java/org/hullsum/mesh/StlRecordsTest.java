package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.Channels;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.BitSet;
import java.util.Collections;
import java.util.Random;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The fast way through binary STL against the plain one, point by point. */
class StlRecordsTest {
  private static final long SEED = 0x5EED_57A1L;

  @TempDir private Path folder;

  private Path file(byte[] bytes) throws IOException {
    return Files.write(folder.resolve("surface.stl"), bytes);
  }

  private TriangleMesh fast(byte[] bytes, int threads) throws IOException, MeshFault {
    return MeshFile.read(file(bytes), threads).build(1);
  }

  /** Triangle by triangle through the table, as the format is written. */
  private static TriangleMesh plain(byte[] bytes) throws IOException, MeshFault {
    TriangleMeshBuilder builder = new TriangleMeshBuilder();
    StlReader.read(Channels.newChannel(new ByteArrayInputStream(bytes)), builder);
    return builder.build(1);
  }

  private static byte[] shuffled(Vector3[][] triangles) {
    Vector3[][] copy = triangles.clone();
    Collections.shuffle(Arrays.asList(copy), new Random(SEED));
    return StlReaderTest.binary(copy, "shuffled");
  }

  private static void assertSame(TriangleMesh expected, TriangleMesh actual) {
    assertEquals(expected.triangleCount(), actual.triangleCount());
    assertEquals(expected.vertexCount(), actual.vertexCount());
    for (int h = 0; h < 3 * expected.triangleCount(); h++) {
      assertEquals(expected.from(h), actual.from(h), "half-edge " + h);
    }
    for (int v = 0; v < expected.vertexCount(); v++) {
      assertEquals(expected.vertex(v), actual.vertex(v));
    }
  }

  @Test
  void meshIsTheSameAsReadTriangleByTriangleOnAnyNumberOfThreads() throws IOException, MeshFault {
    Vector3[][] torus = Meshes.torus(2, 0.5, 200, 90);
    for (byte[] bytes : new byte[][] {StlReaderTest.binary(torus, "rows"), shuffled(torus)}) {
      TriangleMesh expected = plain(bytes);
      assertEquals(18000, expected.vertexCount());
      assertSame(expected, fast(bytes, 1));
      assertSame(expected, fast(bytes, 2));
      assertSame(expected, fast(bytes, 5));
    }
  }

  @Test
  void moreVerticesThanAClosedSurfaceHasAreGivenRoom() throws IOException, MeshFault {
    Random random = new Random(SEED);
    Vector3[][] loose = new Vector3[30_000][3];
    for (Vector3[] t : loose) {
      for (int k = 0; k < 3; k++) {
        t[k] = new Vector3(random.nextFloat(), random.nextFloat(), random.nextFloat());
      }
    }
    byte[] bytes = StlReaderTest.binary(loose, "loose");
    TriangleMesh expected = plain(bytes);
    assertTrue(expected.vertexCount() > 89_000);
    assertSame(expected, fast(bytes, 2));
  }

  @Test
  void zeroOfEitherSignIsOnePoint() throws IOException, MeshFault {
    Vector3[][] two = {
      {new Vector3(0.0, 0.0, 0.0), new Vector3(1, 0, 0), new Vector3(0, 1, 0)},
      {new Vector3(-0.0, 0.0, -0.0), new Vector3(0, 1, 0), new Vector3(-1, 0, 0)}
    };
    TriangleMesh mesh = fast(StlReaderTest.binary(two, "zeros"), 1);
    assertEquals(4, mesh.vertexCount());
  }

  @Test
  void pointThatIsNotFiniteIsToldWithItsByteWhereverItStands() throws IOException {
    byte[] good = StlReaderTest.binary(Meshes.torus(2, 0.5, 200, 90), "rows");
    for (int triangle : new int[] {0, 20_000, 35_999}) {
      for (float bad : new float[] {Float.NaN, Float.POSITIVE_INFINITY}) {
        byte[] bytes = good.clone();
        int at = 84 + 50 * triangle + 12 + 2 * 12;
        ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN).putFloat(at + 4, bad);
        MeshFault fault = assertThrows(MeshFault.class, () -> fast(bytes, 2));
        assertEquals(at, fault.offset().orElseThrow());
        assertTrue(fault.getMessage().contains("is not finite"), fault.getMessage());
      }
    }
  }

  @Test
  void pairsAreTheSameOnAnyNumberOfThreads() throws IOException, MeshFault {
    Vector3[][] torus = Meshes.torus(2, 0.5, 700, 300);
    // One triangle once more, and one away: three edges crowded, three open.
    torus[7] = torus[100_000];
    TriangleMesh mesh = fast(shuffled(torus), 2);
    EdgePairing one = EdgePairing.of(mesh, new BitSet(), 1);
    EdgePairing two = EdgePairing.of(mesh, new BitSet(), 2);
    assertEquals(3, one.crowdedEdges());
    assertEquals(3, two.crowdedEdges());
    int[] counts = new int[2];
    int[] first = new int[3 * mesh.triangleCount()];
    int[] second = new int[first.length];
    for (int h = 0; h < first.length; h++) {
      first[h] = one.mate(h);
      second[h] = two.mate(h);
      counts[0] += first[h] == EdgePairing.BOUNDARY ? 1 : 0;
      counts[1] += first[h] == EdgePairing.CROWDED ? 1 : 0;
      if (first[h] >= 0) {
        assertEquals(h, one.mate(first[h]));
      }
    }
    assertArrayEquals(new int[] {3, 9}, counts);
    assertArrayEquals(first, second);
  }
}
