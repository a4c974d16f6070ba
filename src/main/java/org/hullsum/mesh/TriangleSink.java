package org.hullsum.mesh;

/** What a reader of mesh files tells of a file as it comes upon it. */
interface TriangleSink {
  /** Begins a part; triangles before the first one belong to a part without a name. */
  void part(String name);

  /**
   * A point of the file.
   *
   * @return the vertex that stands for it: the same for points with equal coordinates
   */
  int vertex(double x, double y, double z);

  /** A triangle between vertices that {@link #vertex} has given. */
  void triangle(int a, int b, int c);
}
