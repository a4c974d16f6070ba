package org.hullsum.mesh;

import java.util.Arrays;
import java.util.BitSet;
import java.util.concurrent.atomic.AtomicInteger;

/**
 * Which half-edges of a mesh lie on the same edge. Half-edge 3t + k runs from corner k of triangle
 * t to its next corner.
 *
 * <p>The vertices are divided into ranges, small enough for what is sorted at a time to stay in
 * near memory. In each range half-edges are sorted into buckets by the smaller of their two
 * vertices, and each bucket by the larger: O(n log n) whatever the valence.
 */
final class EdgePairing {
  /** No other half-edge lies on the edge. */
  static final int BOUNDARY = -1;

  /** More than two lie on it. */
  static final int CROWDED = -2;

  /** An edge of a triangle whose two ends are one vertex, or of one that is left out. */
  static final int NONE = -3;

  /** Half-edges of a range, about. */
  private static final int RANGE = 1 << 20;

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
    return mesh.from(half);
  }

  static int to(TriangleMesh mesh, int half) {
    return mesh.from(next(half));
  }

  /**
   * Pairs them.
   *
   * @param leftOut triangles that do not count
   * @param threads that may be used; the result does not depend on it
   */
  static EdgePairing of(TriangleMesh mesh, BitSet leftOut, int threads) {
    int[] mates = new int[3 * mesh.triangleCount()];
    int ranges = 1 + mates.length / RANGE;
    VertexSpans spans = VertexSpans.of(mesh, threads);
    AtomicInteger crowded = new AtomicInteger();
    AtomicInteger next = new AtomicInteger();
    Pieces.run(
        threads,
        threads,
        k -> {
          Range range = new Range(mesh, leftOut, mates);
          for (int r = next.getAndIncrement(); r < ranges; r = next.getAndIncrement()) {
            int first = (int) ((long) r * mesh.vertexCount() / ranges);
            int end = (int) ((r + 1L) * mesh.vertexCount() / ranges);
            crowded.addAndGet(range.pair(first, end, spans));
          }
        });
    return new EdgePairing(mates, crowded.get());
  }

  /** The half-edges whose smaller vertex lies in a range; used for one range after another. */
  private static final class Range {
    private final TriangleMesh mesh;
    private final BitSet leftOut;
    private final int[] mates;
    private int first;
    private int width;

    // What is gathered: half-edges with their two vertices, the smaller counted from the first.
    private int[] smallers = new int[0];
    private long[] others = new long[0];
    private int size;

    /** Where each bucket begins. */
    private int[] starts = new int[0];

    /** In buckets: the larger vertex, then the half-edge. */
    private long[] sorted = new long[0];

    Range(TriangleMesh mesh, BitSet leftOut, int[] mates) {
      this.mesh = mesh;
      this.leftOut = leftOut;
      this.mates = mates;
    }

    /** Writes the mates of a range; how many edges are crowded. */
    int pair(int from, int to, VertexSpans spans) {
      first = from;
      width = to - from;
      size = 0;
      spans.forEach(from, to, this::gather);
      if (starts.length < width + 2) {
        starts = new int[width + 2];
      }
      if (sorted.length < size) {
        sorted = new long[others.length];
      }
      Arrays.fill(starts, 0);
      for (int i = 0; i < size; i++) {
        starts[smallers[i] + 2]++;
      }
      for (int v = 2; v < width + 2; v++) {
        starts[v] += starts[v - 1];
      }
      for (int i = 0; i < size; i++) {
        sorted[starts[smallers[i] + 1]++] = others[i];
      }
      int crowded = 0;
      for (int v = 0; v < width; v++) {
        crowded += pair(first + v, starts[v], starts[v + 1]);
      }
      return crowded;
    }

    private void gather(int fromTriangle, int toTriangle) {
      int room = size + 3 * (toTriangle - fromTriangle) + 1;
      if (room > smallers.length) {
        int usual = Math.min(mates.length, RANGE + RANGE / 4) + 1;
        int more = Math.max(room, Math.max(usual, smallers.length + smallers.length / 2));
        smallers = Arrays.copyOf(smallers, more);
        others = Arrays.copyOf(others, more);
      }
      // Without a branch that could not be foretold: an edge is written in any case, and counts if
      // its smaller vertex lies in the range.
      int n = size;
      for (int h = 3 * fromTriangle; h < 3 * toTriangle; h += 3) {
        int a = mesh.from(h + 2);
        for (int k = 0; k < 3; k++) {
          int b = mesh.from(h + k);
          int v = Math.min(a, b) - first;
          smallers[n] = v;
          others[n] = (long) Math.max(a, b) << 32 | (k == 0 ? h + 2 : h + k - 1);
          n += (~v & v - width) >>> 31;
          a = b;
        }
      }
      size = n;
    }

    /** Pairs the half-edges of one bucket; how many edges are crowded. */
    private int pair(int smaller, int start, int bucketEnd) {
      int end = leaveOut(smaller, start, bucketEnd);
      if (end - start > SMALL) {
        Arrays.sort(sorted, start, end);
      } else {
        insert(start, end);
      }
      int crowded = 0;
      for (int i = start, j = start; i < end; i = j) {
        long larger = sorted[i] >>> 32;
        while (j < end && sorted[j] >>> 32 == larger) {
          j++;
        }
        for (int k = i; k < j; k++) {
          mates[(int) sorted[k]] =
              j - i == 1 ? BOUNDARY : j - i == 2 ? (int) sorted[i + j - 1 - k] : CROWDED;
        }
        crowded += j - i > 2 ? 1 : 0;
      }
      return crowded;
    }

    /** Brings those that count to the front of a bucket; where they end. */
    private int leaveOut(int smaller, int start, int bucketEnd) {
      int end = start;
      for (int i = start; i < bucketEnd; i++) {
        int half = (int) sorted[i];
        if (sorted[i] >>> 32 == smaller || (!leftOut.isEmpty() && leftOut.get(half / 3))) {
          mates[half] = NONE;
        } else {
          sorted[end++] = sorted[i];
        }
      }
      return end;
    }

    private void insert(int start, int end) {
      for (int i = start + 1; i < end; i++) {
        long key = sorted[i];
        int j = i - 1;
        for (; j >= start && sorted[j] > key; j--) {
          sorted[j + 1] = sorted[j];
        }
        sorted[j + 1] = key;
      }
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
