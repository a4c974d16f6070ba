package org.hullsum.mesh;

/**
 * The smallest and the largest vertex in each block of triangles: tells which triangles may touch a
 * range of vertices without looking at all of them.
 */
final class VertexSpans {
  private static final int BLOCK = 1 << 10;

  private final int triangles;
  private final int[] lowest;
  private final int[] highest;

  /** Does something with the triangles from one up to, not including, another. */
  interface Visitor {
    void visit(int from, int to);
  }

  private VertexSpans(int triangles) {
    this.triangles = triangles;
    int blocks = (triangles + BLOCK - 1) / BLOCK;
    this.lowest = new int[blocks];
    this.highest = new int[blocks];
  }

  static VertexSpans of(TriangleMesh mesh, int threads) {
    VertexSpans spans = new VertexSpans(mesh.triangleCount());
    int blocks = spans.lowest.length;
    Pieces.run(
        threads,
        threads,
        k -> {
          int end = (int) ((k + 1L) * blocks / threads);
          for (int b = (int) ((long) k * blocks / threads); b < end; b++) {
            spans.measure(mesh, b);
          }
        });
    return spans;
  }

  private void measure(TriangleMesh mesh, int block) {
    int low = Integer.MAX_VALUE;
    int high = -1;
    for (int h = 3 * BLOCK * block; h < 3 * end(block); h++) {
      int v = mesh.from(h);
      low = Math.min(low, v);
      high = Math.max(high, v);
    }
    lowest[block] = low;
    highest[block] = high;
  }

  private int end(int block) {
    return Math.min(triangles, BLOCK * (block + 1));
  }

  /** Visits, in ascending order, all triangles with a vertex from one up to another, and others. */
  void forEach(int from, int to, Visitor visitor) {
    for (int b = 0; b < lowest.length; b++) {
      if (lowest[b] < to && highest[b] >= from) {
        visitor.visit(BLOCK * b, end(b));
      }
    }
  }
}
