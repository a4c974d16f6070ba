package org.hullsum.mesh;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Gathers the triangles of a file; points with equal coordinates become one vertex.
 *
 * <p>The vertices stand in a hash table of open addresses, with no object for any of them. Arrays
 * grow with what is read, never by a count in a file.
 */
public final class TriangleMeshBuilder implements TriangleSink {
  private static final int FIRST_ROOM = 1 << 10;

  /** Some virtual machines refuse arrays closer to the largest int. */
  private static final int LARGEST_ROOM = Integer.MAX_VALUE - 8;

  private static final int EMPTY = -1;

  private double[] coordinates = new double[3 * FIRST_ROOM];
  private int[] corners = new int[3 * FIRST_ROOM];
  private int[] table = emptyTable(4 * FIRST_ROOM);
  private int vertices;
  private int triangles;
  private long points;
  private int degenerate;
  private final Map<String, Integer> parts = new LinkedHashMap<>();
  private final List<Integer> runStarts = new ArrayList<>();
  private final List<Integer> runParts = new ArrayList<>();

  private static int[] emptyTable(int size) {
    int[] table = new int[size];
    Arrays.fill(table, EMPTY);
    return table;
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
    points++;
    // Adding zero makes −0 into 0.
    double px = x + 0.0;
    double py = y + 0.0;
    double pz = z + 0.0;
    int mask = table.length - 1;
    int slot = hash(px, py, pz) & mask;
    for (int found = table[slot]; found != EMPTY; found = table[slot]) {
      int at = 3 * found;
      if (coordinates[at] == px && coordinates[at + 1] == py && coordinates[at + 2] == pz) {
        return found;
      }
      slot = (slot + 1) & mask;
    }
    if (3 * vertices == coordinates.length) {
      coordinates = Arrays.copyOf(coordinates, moreRoom(coordinates.length));
    }
    int at = 3 * vertices;
    coordinates[at] = px;
    coordinates[at + 1] = py;
    coordinates[at + 2] = pz;
    table[slot] = vertices;
    vertices++;
    if (vertices > table.length / 2 && table.length < 1 << 30) {
      widen();
    }
    return vertices - 1;
  }

  private static int hash(double x, double y, double z) {
    long bits =
        Double.doubleToRawLongBits(x)
            + 0x9E3779B97F4A7C15L * Double.doubleToRawLongBits(y)
            + 0xC2B2AE3D27D4EB4FL * Double.doubleToRawLongBits(z);
    bits = (bits ^ bits >>> 32) * 0xD6E8FEB86659FD93L;
    return (int) (bits ^ bits >>> 32);
  }

  private void widen() {
    table = emptyTable(2 * table.length);
    int mask = table.length - 1;
    for (int v = 0; v < vertices; v++) {
      int at = 3 * v;
      int slot = hash(coordinates[at], coordinates[at + 1], coordinates[at + 2]) & mask;
      while (table[slot] != EMPTY) {
        slot = (slot + 1) & mask;
      }
      table[slot] = v;
    }
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
    degenerate += a == b || b == c || c == a ? 1 : 0;
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

  /** Points that were told, welded or not. */
  public long pointCount() {
    return points;
  }

  /** Triangles of which two corners are one vertex. */
  public int degenerateCount() {
    return degenerate;
  }

  /**
   * The mesh. Afterwards nothing more can be told.
   *
   * @param scale by which every coordinate is multiplied
   */
  public TriangleMesh build(double scale) {
    table = new int[0];
    double[] scaled = Arrays.copyOf(coordinates, 3 * vertices);
    coordinates = new double[0];
    for (int k = 0; k < scaled.length && scale != 1; k++) {
      scaled[k] *= scale;
    }
    int[] trimmed = Arrays.copyOf(corners, 3 * triangles);
    corners = new int[0];
    return new TriangleMesh(
        scaled,
        trimmed,
        runStarts.stream().mapToInt(k -> k).toArray(),
        runParts.stream().mapToInt(k -> k).toArray(),
        List.copyOf(parts.keySet()));
  }
}
