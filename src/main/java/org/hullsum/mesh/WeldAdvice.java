package org.hullsum.mesh;

import java.math.BigDecimal;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * A length within which welding would close cracks of an open mesh.
 *
 * <p>Lengths of 1, 2 and 5 times a power of ten are tried on the vertices of the boundary alone,
 * from {@link #LARGEST} of the mesh's size downward. An edge is closed where exactly two come to
 * lie on one another; those that shrink to a point count against the length, for a small hole would
 * do so. Cost: O(b log b) for each length, in the number b of boundary edges.
 *
 * @param length the smallest that closes the most
 * @param open edges that have one triangle
 * @param closed how many of them are closed then
 */
public record WeldAdvice(double length, int open, int closed) {
  /** Of the diagonal of the box around the mesh. */
  private static final double LARGEST = 1e-4;

  /** Lengths that are tried: five decades of them. */
  private static final int TRIALS = 16;

  /** A mesh with more boundary edges is given no advice. */
  private static final int MOST_EDGES = 300_000;

  private static final int[] STEPS = {5, 2, 1};

  /**
   * Advice for a mesh.
   *
   * @param unit what the mesh's unit of length is in the one in which the length is to be round
   */
  public static Optional<WeldAdvice> of(MeshTopology topology, double unit) {
    TriangleMesh mesh = topology.mesh();
    int[] halves = topology.boundary().limit(MOST_EDGES + 1L).toArray();
    if (halves.length == 0 || halves.length > MOST_EDGES) {
      return Optional.empty();
    }
    int[] ends = new int[2 * halves.length];
    TriangleMesh rim = rim(mesh, halves, ends);
    double limit = LARGEST * unit * mesh.high().minus(mesh.low()).norm();
    int exponent = (int) Math.ceil(Math.log10(limit));
    int best = 0;
    Optional<WeldAdvice> advice = Optional.empty();
    for (int k = 0; k < TRIALS; k++) {
      int tenths = 1 - exponent + k / STEPS.length;
      double length = BigDecimal.valueOf(STEPS[k % STEPS.length], tenths).doubleValue() / unit;
      if (length * unit > limit) {
        continue;
      }
      int[] stays = VertexMerger.stays(rim, length);
      if (IntStream.range(0, stays.length).allMatch(v -> stays[v] == v)) {
        break;
      }
      int[] tally = tally(stays, ends);
      int gain = tally[1] - tally[0];
      if (gain > 0 && gain >= best) {
        best = gain;
        advice = Optional.of(new WeldAdvice(length, halves.length, tally[1]));
      }
    }
    return advice;
  }

  /** The vertices of the boundary without triangles; their numbers there are put into the ends. */
  private static TriangleMesh rim(TriangleMesh mesh, int[] halves, int[] ends) {
    int[] vertices = new int[ends.length];
    for (int k = 0; k < halves.length; k++) {
      vertices[2 * k] = EdgePairing.from(mesh, halves[k]);
      vertices[2 * k + 1] = EdgePairing.to(mesh, halves[k]);
    }
    int[] each = Arrays.stream(vertices).sorted().distinct().toArray();
    double[] coordinates = new double[3 * each.length];
    for (int v = 0; v < each.length; v++) {
      coordinates[3 * v] = mesh.x(each[v]);
      coordinates[3 * v + 1] = mesh.y(each[v]);
      coordinates[3 * v + 2] = mesh.z(each[v]);
    }
    Arrays.setAll(ends, e -> Arrays.binarySearch(each, vertices[e]));
    return new TriangleMesh(
        coordinates, each.length, new int[0], new int[0], new int[0], List.of());
  }

  /** How many edges shrink to a point, and how many find exactly one other. */
  private static int[] tally(int[] stays, int[] ends) {
    long[] edges = new long[ends.length / 2];
    int[] tally = new int[2];
    int size = 0;
    for (int e = 0; e < ends.length; e += 2) {
      long a = stays[ends[e]];
      long b = stays[ends[e + 1]];
      if (a == b) {
        tally[0]++;
      } else {
        edges[size++] = Math.min(a, b) << Integer.SIZE | Math.max(a, b);
      }
    }
    Arrays.sort(edges, 0, size);
    for (int from = 0; from < size; ) {
      int to = from;
      while (to < size && edges[to] == edges[from]) {
        to++;
      }
      tally[1] += to - from == 2 ? 2 : 0;
      from = to;
    }
    return tally;
  }
}
