package org.hullsum.mesh;

/**
 * Takes the points and faces of a file that numbers its points, divides the faces into triangles
 * and tells them to the sink. A face is given corner by corner, then told what it is.
 */
final class FaceAccumulator {
  private final TriangleSink sink;
  private final PolygonDivider divider;

  /** x, y, z of each point in turn. */
  private double[] coordinates = new double[96];

  /** The sink's vertex for each point. */
  private final IntList vertices = new IntList();

  private final IntList corners = new IntList();
  private long triangles;

  FaceAccumulator(TriangleSink sink) {
    this.sink = sink;
    this.divider = new PolygonDivider(this::triangle);
  }

  void point(double x, double y, double z, FaultPlace place) throws MeshFault {
    if (!Double.isFinite(x) || !Double.isFinite(y) || !Double.isFinite(z)) {
      throw place.fault("a point must be finite, not (" + x + ", " + y + ", " + z + ")");
    }
    int at = 3 * vertices.size();
    if (at + 3 > coordinates.length) {
      coordinates = Growth.grown(coordinates, place);
    }
    coordinates[at] = x;
    coordinates[at + 1] = y;
    coordinates[at + 2] = z;
    vertices.add(sink.vertex(x, y, z), place);
  }

  int points() {
    return vertices.size();
  }

  /** Numbers the points that follow from 0 again. */
  void forgetPoints() {
    vertices.clear();
  }

  /** How many triangles the sink has been told. */
  long triangles() {
    return triangles;
  }

  /** Begins a face. */
  void begin() {
    corners.clear();
  }

  /** The corners of the face so far. */
  int corners() {
    return corners.size();
  }

  /** The next corner of the face, a point from 0. */
  void corner(long point, FaultPlace place) throws MeshFault {
    if (point < 0 || point >= vertices.size()) {
      throw place.fault("point " + point + " is not among the " + vertices.size() + " points");
    }
    corners.add((int) point, place);
  }

  /** The corners run around a polygon. */
  void polygon(FaultPlace place) throws MeshFault {
    requireThree("a polygon", place);
    dropRepeated();
    divider.divide(coordinates, corners.array(), corners.size(), place);
  }

  /**
   * Each corner from the third makes a triangle with the two before it, every second one turned.
   */
  void strip(FaultPlace place) throws MeshFault {
    requireThree("a triangle strip", place);
    for (int k = 2; k < corners.size(); k++) {
      int turn = k & 1;
      triangle(corners.get(k - 2 + turn), corners.get(k - 1 - turn), corners.get(k));
    }
  }

  /** A rectangle whose corners are given row by row. */
  void pixel(FaultPlace place) throws MeshFault {
    requireCorners(4, place);
    int last = corners.get(3);
    corners.set(3, corners.get(2));
    corners.set(2, last);
    polygon(place);
  }

  void requireCorners(int count, FaultPlace place) throws MeshFault {
    if (corners.size() != count) {
      throw place.fault("the cell has " + corners.size() + " corners where it must have " + count);
    }
  }

  /** Takes corners away that repeat the one before them, as long as three are left. */
  private void dropRepeated() {
    int kept = 1;
    int size = corners.size();
    for (int k = 1; k < size; k++) {
      boolean repeated = sameVertex(k, kept - 1) || (k == size - 1 && sameVertex(k, 0));
      if (!repeated || kept + (size - k) <= 3) {
        corners.set(kept++, corners.get(k));
      }
    }
    corners.shorten(kept);
  }

  private boolean sameVertex(int k, int other) {
    return vertices.get(corners.get(k)) == vertices.get(corners.get(other));
  }

  private void requireThree(String what, FaultPlace place) throws MeshFault {
    if (corners.size() < 3) {
      throw place.fault(what + " of " + corners.size() + " corners has no area");
    }
  }

  private void triangle(int a, int b, int c) {
    sink.triangle(vertices.get(a), vertices.get(b), vertices.get(c));
    triangles++;
  }
}
