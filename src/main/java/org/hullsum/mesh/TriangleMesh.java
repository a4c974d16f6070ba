package org.hullsum.mesh;

import java.util.Arrays;
import java.util.List;
import java.util.function.IntPredicate;
import org.hullsum.numeric.Vector3;

/**
 * A triangle mesh with shared vertices. Immutable; made by {@link TriangleMeshBuilder}.
 *
 * <p>Vertices and triangles are numbered from 0. Each triangle's normal follows the right-hand rule
 * along its corners 0, 1, 2. Every triangle belongs to one part, numbered in the order in which the
 * file first names them.
 */
public final class TriangleMesh {
  private final double[] coordinates;
  private final int vertices;
  private final int[] corners;
  private final int[] runStarts;
  private final int[] runParts;
  private final List<String> parts;

  /**
   * Takes over the arrays, which the caller must not touch again.
   *
   * @param coordinates x, y, z of each vertex in turn; what stands behind the last counts for
   *     nothing
   * @param vertices how many
   * @param corners three vertices of each triangle in turn
   * @param runStarts first triangle of each run of triangles of one part, ascending, the first 0
   * @param runParts the part of each run
   * @param parts the names of the parts, each once
   */
  TriangleMesh(
      double[] coordinates,
      int vertices,
      int[] corners,
      int[] runStarts,
      int[] runParts,
      List<String> parts) {
    this.coordinates = coordinates;
    this.vertices = vertices;
    this.corners = corners;
    this.runStarts = runStarts;
    this.runParts = runParts;
    this.parts = List.copyOf(parts);
  }

  public int vertexCount() {
    return vertices;
  }

  public int triangleCount() {
    return corners.length / 3;
  }

  /** The vertex at corner 0, 1 or 2 of a triangle. */
  public int corner(int triangle, int k) {
    return corners[3 * triangle + k];
  }

  /** The vertex at which half-edge 3t + k begins: corner k of triangle t. */
  int from(int half) {
    return corners[half];
  }

  public double x(int vertex) {
    return coordinates[3 * vertex];
  }

  public double y(int vertex) {
    return coordinates[3 * vertex + 1];
  }

  public double z(int vertex) {
    return coordinates[3 * vertex + 2];
  }

  public Vector3 vertex(int vertex) {
    return new Vector3(x(vertex), y(vertex), z(vertex));
  }

  /** The smallest x, y and z of any vertex. */
  public Vector3 low() {
    return extreme(1);
  }

  /** The largest. */
  public Vector3 high() {
    return extreme(-1);
  }

  private Vector3 extreme(int sign) {
    double[] least = {Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY};
    for (int k = 0; k < 3 * vertices; k++) {
      least[k % 3] = Math.min(least[k % 3], sign * coordinates[k]);
    }
    return new Vector3(sign * least[0], sign * least[1], sign * least[2]);
  }

  /** ½ (b − a) × (c − a): the normal times the area. */
  public Vector3 areaVector(int triangle) {
    Vector3 a = vertex(corner(triangle, 0));
    Vector3 ab = vertex(corner(triangle, 1)).minus(a);
    return ab.cross(vertex(corner(triangle, 2)).minus(a)).times(0.5);
  }

  /** The names of the parts, in the order of the file. */
  public List<String> parts() {
    return parts;
  }

  /** The part to which a triangle belongs, an index into {@link #parts}. */
  public int part(int triangle) {
    int found = Arrays.binarySearch(runStarts, triangle);
    return runParts[found >= 0 ? found : -found - 2];
  }

  /**
   * The same triangles with other vertices for their corners, those that are left in their order.
   *
   * @param instead the vertex that takes the place of each, itself where it stays
   */
  TriangleMesh withVertices(int[] instead) {
    int[] numbers = new int[vertices];
    double[] kept = new double[3 * vertices];
    int count = 0;
    for (int v = 0; v < vertices; v++) {
      if (instead[v] == v) {
        System.arraycopy(coordinates, 3 * v, kept, 3 * count, 3);
        numbers[v] = count++;
      }
    }
    int[] renamed = new int[corners.length];
    for (int h = 0; h < corners.length; h++) {
      renamed[h] = numbers[instead[corners[h]]];
    }
    return new TriangleMesh(kept, count, renamed, runStarts, runParts, parts);
  }

  /** The same with the corners of some triangles the other way round. */
  TriangleMesh turned(IntPredicate triangles) {
    int[] changed = corners.clone();
    for (int t = 0; t < triangleCount(); t++) {
      if (triangles.test(t)) {
        changed[3 * t + 1] = corners[3 * t + 2];
        changed[3 * t + 2] = corners[3 * t + 1];
      }
    }
    return new TriangleMesh(coordinates, vertices, changed, runStarts, runParts, parts);
  }

  /** The triangles of one part as a mesh of its own, with the vertices that they use. */
  public TriangleMesh only(int part) {
    TriangleMeshBuilder builder = new TriangleMeshBuilder();
    builder.part(parts.get(part));
    for (int t = 0; t < triangleCount(); t++) {
      if (part(t) == part) {
        builder.triangle(copied(builder, t, 0), copied(builder, t, 1), copied(builder, t, 2));
      }
    }
    return builder.build(1);
  }

  private int copied(TriangleMeshBuilder builder, int triangle, int k) {
    int v = corner(triangle, k);
    return builder.vertex(x(v), y(v), z(v));
  }
}
