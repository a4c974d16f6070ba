package org.hullsum.mesh;

import java.util.Arrays;
import java.util.BitSet;

/**
 * Which half-edges of a mesh lie on the same edge. Half-edge 3t + k runs from corner k of triangle
 * t to its next corner.
 *
 * <p>Half-edges are sorted into buckets by the smaller of their two vertices, and each bucket by
 * the larger: O(n log n) whatever the valence.
 */
final class EdgePairing {
  /** No other half-edge lies on the edge. */
  static final int BOUNDARY = -1;

  /** More than two lie on it. */
  static final int CROWDED = -2;

  /** An edge of a triangle whose two ends are one vertex, or of one that is left out. */
  static final int NONE = -3;

  /** A bucket up to this size is sorted by insertion. */
  private static final int SMALL = 32;

  private final int[] mates;
  private final int crowdedEdges;

  private EdgePairing(int[] mates, int crowdedEdges) {
    this.mates = mates;
    this.crowdedEdges = crowdedEdges;
  }

  static int next(int half) {
    return half % 3 == 2 ? half - 2 : half + 1;
  }

  static int from(TriangleMesh mesh, int half) {
    return mesh.corner(half / 3, half % 3);
  }

  static int to(TriangleMesh mesh, int half) {
    int after = next(half);
    return mesh.corner(after / 3, after % 3);
  }

  private static int larger(TriangleMesh mesh, int half) {
    return Math.max(from(mesh, half), to(mesh, half));
  }

  private static int smaller(TriangleMesh mesh, int half) {
    return Math.min(from(mesh, half), to(mesh, half));
  }

  /**
   * Pairs them.
   *
   * @param leftOut triangles that do not count
   */
  static EdgePairing of(TriangleMesh mesh, BitSet leftOut) {
    int halves = 3 * mesh.triangleCount();
    int[] starts = new int[mesh.vertexCount() + 2];
    for (int h = 0; h < halves; h++) {
      starts[smaller(mesh, h) + 2]++;
    }
    for (int v = 2; v < starts.length; v++) {
      starts[v] += starts[v - 1];
    }
    int[] sorted = new int[halves];
    for (int h = 0; h < halves; h++) {
      sorted[starts[smaller(mesh, h) + 1]++] = h;
    }
    int[] mates = new int[halves];
    Arrays.fill(mates, NONE);
    int crowded = 0;
    for (int v = 0; v < mesh.vertexCount(); v++) {
      crowded += pair(mesh, sorted, starts[v], starts[v + 1], leftOut, mates);
    }
    return new EdgePairing(mates, crowded);
  }

  /** Pairs the half-edges of one bucket; how many edges are crowded. */
  private static int pair(
      TriangleMesh mesh, int[] sorted, int start, int end, BitSet leftOut, int[] mates) {
    sort(mesh, sorted, start, end);
    int crowded = 0;
    int i = start;
    while (i < end) {
      int other = larger(mesh, sorted[i]);
      int count = 0;
      int j = i;
      for (; j < end && larger(mesh, sorted[j]) == other; j++) {
        int h = sorted[j];
        if (from(mesh, h) != to(mesh, h) && !leftOut.get(h / 3)) {
          // Those that count are brought to the front of their run.
          sorted[j] = sorted[i + count];
          sorted[i + count++] = h;
        }
      }
      for (int k = i; k < i + count; k++) {
        mates[sorted[k]] = count == 1 ? BOUNDARY : count == 2 ? sorted[2 * i + 1 - k] : CROWDED;
      }
      crowded += count > 2 ? 1 : 0;
      i = j;
    }
    return crowded;
  }

  /** By the larger vertex, then by the half-edge. */
  private static void sort(TriangleMesh mesh, int[] sorted, int start, int end) {
    if (end - start > SMALL) {
      long[] keys = new long[end - start];
      for (int i = start; i < end; i++) {
        keys[i - start] = (long) larger(mesh, sorted[i]) << 32 | sorted[i];
      }
      Arrays.sort(keys);
      for (int i = start; i < end; i++) {
        sorted[i] = (int) keys[i - start];
      }
      return;
    }
    for (int i = start + 1; i < end; i++) {
      int h = sorted[i];
      int key = larger(mesh, h);
      int j = i - 1;
      for (; j >= start && larger(mesh, sorted[j]) > key; j--) {
        sorted[j + 1] = sorted[j];
      }
      sorted[j + 1] = h;
    }
  }

  /** The other half-edge on the edge, or {@link #BOUNDARY}, {@link #CROWDED}, {@link #NONE}. */
  int mate(int half) {
    return mates[half];
  }

  /** Edges with more than two triangles. */
  int crowdedEdges() {
    return crowdedEdges;
  }
}
