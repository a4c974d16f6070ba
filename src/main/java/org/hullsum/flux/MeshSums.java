package org.hullsum.flux;

import java.util.ArrayList;
import java.util.List;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.numeric.Box3;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Integral;

/** The geometric integrals of a mesh: exact for its triangles but for rounding. */
final class MeshSums {
  private static final int AREA = 0;
  private static final int VECTOR = 1;
  private static final int MOMENTS = 4;
  private static final int SQUARES = 13;
  private static final int COMPONENTS = 16;

  /** Triangles whose terms are added plainly; the sums of the blocks are compensated. */
  private static final int BLOCK = 16;

  /** Roundings of one triangle's terms and of a block's sums, relative to their size. */
  private static final double ROUNDING = (8 + BLOCK) * Math.ulp(1.0);

  private final TriangleMesh mesh;
  private final Vector3 reference;
  private final double[] sums = new double[COMPONENTS];
  private final double[] rests = new double[COMPONENTS];

  private MeshSums(TriangleMesh mesh, Vector3 reference) {
    this.mesh = mesh;
    this.reference = reference;
  }

  static PatchGeometry of(TriangleMesh mesh) {
    Box3 box = box(mesh);
    MeshSums sums = new MeshSums(mesh, box.centre());
    for (int t = 0; t < mesh.triangleCount(); t += BLOCK) {
      sums.add(t, Math.min(mesh.triangleCount(), t + BLOCK));
    }
    double area = sums.total(AREA);
    double size = box.diagonal();
    double far = 1 + box.centre().norm() / Math.max(size, Double.MIN_NORMAL);
    double error = ROUNDING * far * area;
    List<Double> moments = new ArrayList<>();
    for (int k = MOMENTS; k < SQUARES; k++) {
      moments.add(sums.total(k));
    }
    return new PatchGeometry(
        area,
        error,
        sums.vector(VECTOR),
        error,
        box.centre(),
        moments,
        error * size,
        sums.vector(SQUARES),
        box,
        mesh.triangleCount(),
        Integral.Status.REACHED);
  }

  /** The box around all vertices. */
  static Box3 box(TriangleMesh mesh) {
    Vector3 low = mesh.low();
    Vector3 high = mesh.high();
    return new Box3(
        new Interval(low.x(), high.x()),
        new Interval(low.y(), high.y()),
        new Interval(low.z(), high.z()));
  }

  private double total(int k) {
    return sums[k] + rests[k];
  }

  private Vector3 vector(int k) {
    return new Vector3(total(k), total(k + 1), total(k + 2));
  }

  /** Some triangles: r is linear on each, and the mean of |r|² is (Σ|r_k|² + |Σ r_k|²)/12. */
  private void add(int from, int to) {
    double area = 0;
    double vx = 0;
    double vy = 0;
    double vz = 0;
    double xx = 0;
    double xy = 0;
    double xz = 0;
    double yx = 0;
    double yy = 0;
    double yz = 0;
    double zx = 0;
    double zy = 0;
    double zz = 0;
    double qx = 0;
    double qy = 0;
    double qz = 0;
    for (int t = from; t < to; t++) {
      double ax = x(t, 0);
      double ay = y(t, 0);
      double az = z(t, 0);
      double bx = x(t, 1);
      double by = y(t, 1);
      double bz = z(t, 1);
      double cx = x(t, 2);
      double cy = y(t, 2);
      double cz = z(t, 2);
      double nx = 0.5 * ((by - ay) * (cz - az) - (bz - az) * (cy - ay));
      double ny = 0.5 * ((bz - az) * (cx - ax) - (bx - ax) * (cz - az));
      double nz = 0.5 * ((bx - ax) * (cy - ay) - (by - ay) * (cx - ax));
      double sx = ax + bx + cx;
      double sy = ay + by + cy;
      double sz = az + bz + cz;
      double squares =
          square(ax, ay, az) + square(bx, by, bz) + square(cx, cy, cz) + square(sx, sy, sz);
      area += Math.sqrt(square(nx, ny, nz));
      vx += nx;
      vy += ny;
      vz += nz;
      xx += sx * nx;
      xy += sx * ny;
      xz += sx * nz;
      yx += sy * nx;
      yy += sy * ny;
      yz += sy * nz;
      zx += sz * nx;
      zy += sz * ny;
      zz += sz * nz;
      qx += squares * nx;
      qy += squares * ny;
      qz += squares * nz;
    }
    add(AREA, area);
    add(VECTOR, vx, vy, vz, 1);
    add(MOMENTS, xx, xy, xz, 1.0 / 3);
    add(MOMENTS + 3, yx, yy, yz, 1.0 / 3);
    add(MOMENTS + 6, zx, zy, zz, 1.0 / 3);
    add(SQUARES, qx, qy, qz, 1.0 / 24);
  }

  private double x(int t, int k) {
    return mesh.x(mesh.corner(t, k)) - reference.x();
  }

  private double y(int t, int k) {
    return mesh.y(mesh.corner(t, k)) - reference.y();
  }

  private double z(int t, int k) {
    return mesh.z(mesh.corner(t, k)) - reference.z();
  }

  private static double square(double x, double y, double z) {
    return x * x + y * y + z * z;
  }

  private void add(int k, double x, double y, double z, double factor) {
    add(k, factor * x);
    add(k + 1, factor * y);
    add(k + 2, factor * z);
  }

  private void add(int k, double more) {
    double before = sums[k];
    double after = before + more;
    rests[k] += Math.abs(before) >= Math.abs(more) ? before - after + more : more - after + before;
    sums[k] = after;
  }
}
