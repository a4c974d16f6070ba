package org.hullsum.mesh;

import java.util.Arrays;
import java.util.List;
import java.util.function.IntToDoubleFunction;

/**
 * Makes one vertex of vertices that lie within a length of one another.
 *
 * <p>In the order of their coordinates, whatever their order in the mesh, each vertex joins the
 * nearest earlier one within the length that has stayed itself, or else stays itself; so none moves
 * farther than the length, and chains don't run on. Those that stay are more than the length apart,
 * so that only a few lie in a cell of a grid as wide: beside the sorting, linear in the number of
 * vertices.
 */
public final class VertexMerger {
  private static final int NONE = -1;

  private final TriangleMesh mesh;
  private final double length;

  /** The vertex that stays, by vertex. */
  private final int[] stays;

  /** The last vertex of each bucket of cells, and the one before each in its bucket. */
  private final int[] lasts;

  private final int[] before;
  private int merged;
  private double farthest;

  /**
   * What came of it.
   *
   * @param mesh with fewer vertices, triangle by triangle the same; one that has lost a corner
   *     stands there with two corners in one vertex
   * @param weld what was welded
   */
  public record Merged(TriangleMesh mesh, MeshWeld weld) {}

  private VertexMerger(TriangleMesh mesh, double length) {
    this.mesh = mesh;
    this.length = length;
    this.stays = new int[mesh.vertexCount()];
    this.before = new int[mesh.vertexCount()];
    this.lasts = new int[Integer.highestOneBit(Math.max(1, mesh.vertexCount())) << 1];
    Arrays.fill(lasts, NONE);
  }

  /**
   * Welds.
   *
   * @param length in the unit of the mesh, positive
   */
  public static Merged merge(TriangleMesh mesh, double length) {
    if (!(length > 0)) {
      throw new IllegalArgumentException("vertices can't be welded within " + length);
    }
    VertexMerger merger = new VertexMerger(mesh, length);
    merger.placeAll();
    int lost = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      lost += merger.losesACorner(t) ? 1 : 0;
    }
    MeshWeld weld = new MeshWeld(length, merger.merged, merger.farthest, lost);
    return new Merged(mesh.withVertices(merger.stays), weld);
  }

  /** The vertex that stays for each, itself where it does. */
  static int[] stays(TriangleMesh mesh, double length) {
    VertexMerger merger = new VertexMerger(mesh, length);
    merger.placeAll();
    return merger.stays;
  }

  private void placeAll() {
    for (int v : sorted(mesh)) {
      place(v);
    }
  }

  /**
   * The vertices by x, then y, then z: sorted by z first, each time keeping the order of equals.
   */
  private static int[] sorted(TriangleMesh mesh) {
    int[] order = new int[mesh.vertexCount()];
    Arrays.setAll(order, v -> v);
    for (IntToDoubleFunction axis : List.<IntToDoubleFunction>of(mesh::z, mesh::y, mesh::x)) {
      double[] values = new double[order.length];
      Arrays.setAll(values, axis);
      Arrays.sort(values);
      long[] keys = new long[order.length];
      for (int i = 0; i < keys.length; i++) {
        long rank = firstOf(values, axis.applyAsDouble(order[i]));
        keys[i] = rank << Integer.SIZE | i;
      }
      Arrays.sort(keys);
      int[] before = order;
      order = new int[keys.length];
      for (int i = 0; i < keys.length; i++) {
        order[i] = before[(int) keys[i]];
      }
    }
    return order;
  }

  /** Where a value first stands among sorted ones. */
  private static int firstOf(double[] sorted, double value) {
    int low = 0;
    int high = sorted.length - 1;
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (sorted[middle] < value) {
        low = middle + 1;
      } else {
        high = middle;
      }
    }
    return low;
  }

  private void place(int v) {
    long i = cell(mesh.x(v));
    long j = cell(mesh.y(v));
    long k = cell(mesh.z(v));
    int nearest = NONE;
    double least = length * length;
    for (long di = -1; di <= 1; di++) {
      for (long dj = -1; dj <= 1; dj++) {
        for (long dk = -1; dk <= 1; dk++) {
          for (int w = lasts[bucket(i + di, j + dj, k + dk)]; w != NONE; w = before[w]) {
            double square = squareDistance(v, w);
            if (square < least || (square == least && nearest == NONE)) {
              least = square;
              nearest = w;
            }
          }
        }
      }
    }
    if (nearest == NONE) {
      stays[v] = v;
      int bucket = bucket(i, j, k);
      before[v] = lasts[bucket];
      lasts[bucket] = v;
    } else {
      stays[v] = nearest;
      merged++;
      farthest = Math.max(farthest, Math.sqrt(least));
    }
  }

  private long cell(double coordinate) {
    return (long) Math.floor(coordinate / length);
  }

  private int bucket(long i, long j, long k) {
    return (int) VertexTable.hash(i + 0.5, j + 0.5, k + 0.5) & (lasts.length - 1);
  }

  private double squareDistance(int v, int w) {
    double dx = mesh.x(v) - mesh.x(w);
    double dy = mesh.y(v) - mesh.y(w);
    double dz = mesh.z(v) - mesh.z(w);
    return dx * dx + dy * dy + dz * dz;
  }

  private boolean losesACorner(int t) {
    int a = mesh.corner(t, 0);
    int b = mesh.corner(t, 1);
    int c = mesh.corner(t, 2);
    boolean whole = a != b && b != c && c != a;
    return whole && (stays[a] == stays[b] || stays[b] == stays[c] || stays[c] == stays[a]);
  }
}
