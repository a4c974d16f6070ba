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

  /** Roundings of one triangle's terms, relative to their size; the sums are compensated. */
  private static final double ROUNDING = 8 * Math.ulp(1.0);

  private final TriangleMesh mesh;
  private final Vector3 reference;
  private final double[] sums = new double[COMPONENTS];
  private final double[] rests = new double[COMPONENTS];
  private final double[] terms = new double[COMPONENTS];

  private MeshSums(TriangleMesh mesh, Vector3 reference) {
    this.mesh = mesh;
    this.reference = reference;
  }

  static PatchGeometry of(TriangleMesh mesh) {
    Box3 box = box(mesh);
    MeshSums sums = new MeshSums(mesh, box.centre());
    for (int t = 0; t < mesh.triangleCount(); t++) {
      sums.add(t);
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

  /** One triangle: r is linear on it, and the mean of |r|² is (Σ|r_k|² + |Σ r_k|²)/12. */
  private void add(int t) {
    int a = mesh.corner(t, 0);
    int b = mesh.corner(t, 1);
    int c = mesh.corner(t, 2);
    double ax = mesh.x(a) - reference.x();
    double ay = mesh.y(a) - reference.y();
    double az = mesh.z(a) - reference.z();
    double bx = mesh.x(b) - reference.x();
    double by = mesh.y(b) - reference.y();
    double bz = mesh.z(b) - reference.z();
    double cx = mesh.x(c) - reference.x();
    double cy = mesh.y(c) - reference.y();
    double cz = mesh.z(c) - reference.z();
    double nx = 0.5 * ((by - ay) * (cz - az) - (bz - az) * (cy - ay));
    double ny = 0.5 * ((bz - az) * (cx - ax) - (bx - ax) * (cz - az));
    double nz = 0.5 * ((bx - ax) * (cy - ay) - (by - ay) * (cx - ax));
    double sx = ax + bx + cx;
    double sy = ay + by + cy;
    double sz = az + bz + cz;
    double squares = ax * ax + ay * ay + az * az + bx * bx + by * by + bz * bz;
    squares += cx * cx + cy * cy + cz * cz + sx * sx + sy * sy + sz * sz;
    terms[AREA] = Math.sqrt(nx * nx + ny * ny + nz * nz);
    set(VECTOR, nx, ny, nz, 1);
    set(MOMENTS, nx, ny, nz, sx / 3);
    set(MOMENTS + 3, nx, ny, nz, sy / 3);
    set(MOMENTS + 6, nx, ny, nz, sz / 3);
    set(SQUARES, nx, ny, nz, squares / 24);
    for (int k = 0; k < COMPONENTS; k++) {
      double before = sums[k];
      double after = before + terms[k];
      rests[k] +=
          Math.abs(before) >= Math.abs(terms[k])
              ? before - after + terms[k]
              : terms[k] - after + before;
      sums[k] = after;
    }
  }

  private void set(int k, double nx, double ny, double nz, double factor) {
    terms[k] = factor * nx;
    terms[k + 1] = factor * ny;
    terms[k + 2] = factor * nz;
  }
}
