package org.hullsum.flux;

import java.util.Arrays;
import java.util.Optional;
import java.util.OptionalInt;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Accuracy;
import org.hullsum.quadrature.Integral;
import org.hullsum.quadrature.ParameterPoint;

/** The cones from the triangles of a mesh, as {@link ConeIntegrand} for a chart. */
final class MeshCone implements Cone {
  private static final int POINTS =
      MeshIntegrator.BLOCK * (TriangleRule.DEGREE_5.size() + TriangleRule.DEGREE_8.size());

  /** Up to so many triangles ∬|g| takes more points than ∬g. */
  private static final int FEW = 4096;

  private static final int MAGNITUDE = 5;

  /** Stands for {@link #bad}. */
  private static final ParameterPoint SOMEWHERE = new ParameterPoint(0, 0);

  private final TriangleMesh mesh;
  private final int outward;
  private final int rows;
  private Vector3 apex = Vector3.ZERO;
  private Optional<RayIntegrals> rays = Optional.empty();
  private Vector3 bad = Vector3.ZERO;

  MeshCone(TriangleMesh mesh, int outward, int densities) {
    this.mesh = mesh;
    this.outward = outward;
    this.rows = RayIntegrals.rows(densities);
  }

  @Override
  public void aim(Vector3 newApex, RayIntegrals newRays, int densities) {
    apex = newApex;
    rays = Optional.of(newRays);
  }

  @Override
  public Integral[] integrate(Accuracy accuracy) {
    MeshIntegrator integrator = new MeshIntegrator(new Heights(), degree());
    integrator.integrate(
        mesh, accuracy.relative(), accuracy.absolute(), accuracy.evaluationLimit());
    Integral[] parts = new Integral[rows];
    boolean finite = integrator.nonFiniteAt().isEmpty();
    integrator.nonFiniteAt().ifPresent(place -> bad = place);
    double allowed = Math.max(accuracy.absolute(), accuracy.relative() * integrator.magnitude());
    for (int k = 0; k < rows; k++) {
      parts[k] =
          new Integral(
              finite ? integrator.value(k) : Double.NaN,
              finite ? integrator.error() : Double.POSITIVE_INFINITY,
              integrator.magnitude(),
              integrator.evaluations(),
              !finite
                  ? Integral.Status.NOT_FINITE
                  : integrator.error() <= allowed
                      ? Integral.Status.REACHED
                      : Integral.Status.NOT_REACHED,
              finite ? Optional.empty() : Optional.of(SOMEWHERE));
    }
    return parts;
  }

  /** The height is the same all over a triangle, so that the degree is that of the densities. */
  private int degree() {
    OptionalInt degree = rays.orElseThrow().degree();
    if (degree.isEmpty()) {
      return -1;
    }
    return mesh.triangleCount() < FEW ? Math.max(degree.getAsInt(), MAGNITUDE) : degree.getAsInt();
  }

  @Override
  public Integral integrateMagnitude(Accuracy accuracy) {
    return integrate(accuracy)[rows - 2];
  }

  @Override
  public double[][] lattice(Vector3 from, int n) {
    double[][] lattice = new double[4][n * n];
    for (int i = 0; i < n * n; i++) {
      int t = (int) ((long) i * mesh.triangleCount() / ((long) n * n));
      Vector3 middle =
          mesh.vertex(mesh.corner(t, 0))
              .plus(mesh.vertex(mesh.corner(t, 1)))
              .plus(mesh.vertex(mesh.corner(t, 2)))
              .times(1.0 / 3);
      for (int axis = 0; axis < 3; axis++) {
        lattice[axis][i] = middle.component(axis);
      }
      double share = (double) mesh.triangleCount() / (n * n);
      lattice[3][i] = outward * share * middle.minus(from).dot(mesh.areaVector(t));
    }
    return lattice;
  }

  @Override
  public Vector3 position(ParameterPoint point) {
    return bad;
  }

  /** The inner integrals times the heights (r − p)·N. */
  private final class Heights implements MeshIntegrator.Integrand {
    private final double[][] starts = new double[3][POINTS];
    private final boolean[] wanted = new boolean[POINTS];
    private final double[] height = new double[POINTS];

    Heights() {
      for (int axis = 0; axis < 3; axis++) {
        Arrays.fill(starts[axis], apex.component(axis));
      }
    }

    @Override
    public int components() {
      return rows;
    }

    @Override
    public void evaluate(int count, double[][] positions, double[][] areas, double[][] values) {
      for (int i = 0; i < count; i++) {
        height[i] =
            (positions[0][i] - apex.x()) * areas[0][i]
                + (positions[1][i] - apex.y()) * areas[1][i]
                + (positions[2][i] - apex.z()) * areas[2][i];
        wanted[i] = height[i] != 0;
      }
      rays.orElseThrow().integrate(count, starts, positions, wanted, values);
      for (int i = 0; i < count; i++) {
        for (int k = 0; k < rows - 1; k++) {
          values[k][i] *= outward * height[i];
        }
        values[rows - 1][i] *= Math.abs(height[i]);
      }
    }
  }
}
