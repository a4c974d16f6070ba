package org.hullsum.mesh;

import java.util.Arrays;
import java.util.BitSet;

/**
 * Which half-edges of a mesh lie on the same edge. Half-edge 3t + k runs from corner k of triangle
 * t to its next corner.
 *
 * <p>Half-edges are sorted into buckets by the smaller of their two vertices, and compared within
 * them: linear for meshes of bounded valence.
 */
final class EdgePairing {
  /** No other half-edge lies on the edge. */
  static final int BOUNDARY = -1;

  /** More than two lie on it. */
  static final int CROWDED = -2;

  /** An edge of a triangle whose two ends are one vertex, or of one that is left out. */
  static final int NONE = -3;

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

  /**
   * Pairs them.
   *
   * @param leftOut triangles that do not count
   */
  static EdgePairing of(TriangleMesh mesh, BitSet leftOut) {
    int halves = 3 * mesh.triangleCount();
    int[] starts = new int[mesh.vertexCount() + 2];
    for (int h = 0; h < halves; h++) {
      starts[Math.min(from(mesh, h), to(mesh, h)) + 2]++;
    }
    for (int v = 2; v < starts.length; v++) {
      starts[v] += starts[v - 1];
    }
    int[] sorted = new int[halves];
    for (int h = 0; h < halves; h++) {
      sorted[starts[Math.min(from(mesh, h), to(mesh, h)) + 1]++] = h;
    }
    int[] mates = new int[halves];
    Arrays.fill(mates, NONE);
    int crowded = 0;
    for (int v = 0; v < mesh.vertexCount(); v++) {
      for (int i = starts[v]; i < starts[v + 1]; i++) {
        crowded += pair(mesh, sorted, i, starts[v + 1], leftOut, mates) ? 1 : 0;
      }
    }
    return new EdgePairing(mates, crowded);
  }

  /** Finds all that lie on the edge of one half-edge, unless that was done; whether crowded. */
  private static boolean pair(
      TriangleMesh mesh, int[] sorted, int i, int end, BitSet leftOut, int[] mates) {
    int h = sorted[i];
    int a = from(mesh, h);
    int b = to(mesh, h);
    if (a == b || mates[h] != NONE || leftOut.get(h / 3)) {
      return false;
    }
    int other = Math.max(a, b);
    int found = 0;
    int last = BOUNDARY;
    for (int j = i + 1; j < end; j++) {
      int g = sorted[j];
      if (Math.max(from(mesh, g), to(mesh, g)) == other && !leftOut.get(g / 3)) {
        found++;
        last = g;
      }
    }
    mates[h] = found == 0 ? BOUNDARY : found == 1 ? last : CROWDED;
    for (int j = i + 1; j < end && found > 0; j++) {
      int g = sorted[j];
      if (Math.max(from(mesh, g), to(mesh, g)) == other && !leftOut.get(g / 3)) {
        mates[g] = found == 1 ? h : CROWDED;
      }
    }
    return found > 1;
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
