package org.hullsum.mesh;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Gathers the triangles of a file; points with equal coordinates become one vertex.
 *
 * <p>Arrays grow with what is read, never by a count that only a file states.
 */
public final class TriangleMeshBuilder implements TriangleSink {
  private static final int FIRST_ROOM = 1 << 10;

  /** Some virtual machines refuse arrays closer to the largest int. */
  private static final int LARGEST_ROOM = Integer.MAX_VALUE - 8;

  /** An array of coordinates up to this much too long is not copied into a shorter one. */
  private static final double MOST_SLACK = 1.05;

  private final VertexTable vertices;
  private int[] corners;
  private int triangles;
  private final Map<String, Integer> parts = new LinkedHashMap<>();
  private final List<Integer> runStarts = new ArrayList<>();
  private final List<Integer> runParts = new ArrayList<>();

  public TriangleMeshBuilder() {
    this(new VertexTable(), new int[3 * FIRST_ROOM]);
  }

  private TriangleMeshBuilder(VertexTable vertices, int[] corners) {
    this.vertices = vertices;
    this.corners = corners;
  }

  /** A builder of one part that has been told all; it takes over what it is given. */
  static TriangleMeshBuilder holding(VertexTable vertices, int[] corners) {
    TriangleMeshBuilder builder = new TriangleMeshBuilder(vertices, corners);
    builder.part("");
    builder.triangles = corners.length / 3;
    return builder;
  }

  @Override
  public void part(String name) {
    int part = parts.computeIfAbsent(name, n -> parts.size());
    int last = runStarts.size() - 1;
    if (last >= 0 && runStarts.get(last) == triangles) {
      runParts.set(last, part);
    } else if (last < 0 || runParts.get(last) != part) {
      runStarts.add(triangles);
      runParts.add(part);
    }
  }

  @Override
  public int vertex(double x, double y, double z) {
    return vertices.vertex(x, y, z);
  }

  /** Half as much room again, a whole number of triples. */
  private static int moreRoom(int room) {
    long more = room + room / 6 * 3L + 3 * FIRST_ROOM;
    int limit = LARGEST_ROOM / 3 * 3;
    if (room >= limit) {
      throw new IllegalStateException("more than " + limit / 3 + " triangles or vertices");
    }
    return (int) Math.min(limit, more);
  }

  @Override
  public void triangle(int a, int b, int c) {
    if (runStarts.isEmpty()) {
      part("");
    }
    if (3 * triangles == corners.length) {
      corners = Arrays.copyOf(corners, moreRoom(corners.length));
    }
    int at = 3 * triangles;
    corners[at] = a;
    corners[at + 1] = b;
    corners[at + 2] = c;
    triangles++;
  }

  /**
   * The mesh. Afterwards nothing more can be told.
   *
   * @param scale by which every coordinate is multiplied
   */
  public TriangleMesh build(double scale) {
    int count = vertices.size();
    double[] scaled = vertices.takeCoordinates();
    if (scaled.length > 3 * count * MOST_SLACK) {
      scaled = Arrays.copyOf(scaled, 3 * count);
    }
    for (int k = 0; k < 3 * count && scale != 1; k++) {
      scaled[k] *= scale;
    }
    int[] trimmed =
        corners.length == 3 * triangles ? corners : Arrays.copyOf(corners, 3 * triangles);
    corners = new int[0];
    return new TriangleMesh(
        scaled,
        count,
        trimmed,
        runStarts.stream().mapToInt(k -> k).toArray(),
        runParts.stream().mapToInt(k -> k).toArray(),
        List.copyOf(parts.keySet()));
  }
}
