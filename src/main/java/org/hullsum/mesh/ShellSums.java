package org.hullsum.mesh;

/** The signed volume of triangles, about a point on one of them; compensated. */
final class ShellSums {
  private final TriangleMesh mesh;
  private final double x;
  private final double y;
  private final double z;
  private double sum;
  private double rest;

  ShellSums(TriangleMesh mesh, int triangle) {
    this.mesh = mesh;
    int v = mesh.corner(triangle, 0);
    this.x = mesh.x(v);
    this.y = mesh.y(v);
    this.z = mesh.z(v);
  }

  /** Adds a triangle, with the sign +1 as it is, −1 turned. */
  void add(int t, int sign) {
    int a = mesh.corner(t, 0);
    int b = mesh.corner(t, 1);
    int c = mesh.corner(t, 2);
    double ax = mesh.x(a) - x;
    double ay = mesh.y(a) - y;
    double az = mesh.z(a) - z;
    double bx = mesh.x(b) - x;
    double by = mesh.y(b) - y;
    double bz = mesh.z(b) - z;
    double cx = mesh.x(c) - x;
    double cy = mesh.y(c) - y;
    double cz = mesh.z(c) - z;
    double triple = ax * (by * cz - bz * cy) + ay * (bz * cx - bx * cz) + az * (bx * cy - by * cx);
    double term = sign * triple / 6;
    double total = sum + term;
    rest += Math.abs(sum) >= Math.abs(term) ? sum - total + term : term - total + sum;
    sum = total;
  }

  double volume() {
    return sum + rest;
  }
}
