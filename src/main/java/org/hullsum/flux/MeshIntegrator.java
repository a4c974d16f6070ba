package org.hullsum.flux;

import java.util.Arrays;
import java.util.Optional;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.numeric.Vector3;

/**
 * Integrals over the triangles of a mesh of functions of the point and the area vector, with a
 * bound on their error.
 *
 * <p>Where the integrand is a polynomial whose degree is known one rule is exact. Otherwise each
 * triangle is done by rules of degree 5 and 8; their difference is taken for the error, and
 * triangles that take more than their share of what is allowed are divided into four, level by
 * level. Triangles are taken in blocks and sums compensated block by block, so that the result does
 * not depend on anything else. Not thread-safe.
 */
final class MeshIntegrator {
  /** Triangles of one block. */
  static final int BLOCK = 256;

  /** Divisions of one triangle at most. */
  private static final int DEEPEST = 14;

  /** Rounding of a sum, relative to that of the magnitudes. */
  private static final double ROUNDING = 4 * Math.ulp(1.0);

  private final Integrand integrand;
  private final TriangleRule[] rules;
  private final int points;
  private final double[][] positions;
  private final double[][] areas;
  private final double[][] values;
  private final double[] sums;
  private final double[] rests;
  private double magnitude;
  private double error;
  private long evaluations;
  private Optional<Vector3> nonFiniteAt = Optional.empty();

  /** What is integrated. */
  interface Integrand {
    /** Number of components. */
    int components();

    /**
     * Evaluates at points.
     *
     * @param positions rows x, y, z
     * @param areas rows of the area vector of the triangle around each point
     * @param values a row per component; the first one decides on the accuracy
     */
    void evaluate(int count, double[][] positions, double[][] areas, double[][] values);
  }

  /**
   * Prepares an integrand.
   *
   * @param degree total degree in x, y, z where it is a polynomial, else negative
   */
  MeshIntegrator(Integrand integrand, int degree) {
    this.integrand = integrand;
    this.rules = rules(degree);
    this.points = Arrays.stream(rules).mapToInt(TriangleRule::size).sum();
    this.positions = new double[3][BLOCK * points];
    this.areas = new double[3][BLOCK * points];
    this.values = new double[integrand.components()][BLOCK * points];
    this.sums = new double[integrand.components()];
    this.rests = new double[integrand.components()];
  }

  private static TriangleRule[] rules(int degree) {
    for (TriangleRule rule :
        new TriangleRule[] {TriangleRule.CENTROID, TriangleRule.DEGREE_5, TriangleRule.DEGREE_8}) {
      if (degree >= 0 && degree <= rule.degree()) {
        return new TriangleRule[] {rule};
      }
    }
    return new TriangleRule[] {TriangleRule.DEGREE_5, TriangleRule.DEGREE_8};
  }

  /** Triangles to be done, by their corners: nine numbers each. */
  private static final class Pending {
    private double[] corners = new double[9 * BLOCK];
    private int size;

    void add(double[] nine) {
      if (9 * size == corners.length) {
        corners = Arrays.copyOf(corners, 2 * corners.length);
      }
      System.arraycopy(nine, 0, corners, 9 * size++, 9);
    }
  }

  /**
   * Integrates over all triangles.
   *
   * @param relative error relative to the magnitude of the first component
   * @param absolute error that is small enough whatever the magnitude
   * @param limit number of evaluations after which nothing more is divided
   */
  void integrate(TriangleMesh mesh, double relative, double absolute, long limit) {
    int count = mesh.triangleCount();
    Pending level = new Pending();
    double[] nine = new double[9];
    // The first pass tells the magnitude; what it leaves open is divided afterwards.
    Pending open = new Pending();
    double allowed = Math.max(absolute, relative * coarseMagnitude(mesh));
    double share = allowed / Math.max(1, count);
    for (int t = 0; t < count; t++) {
      for (int k = 0; k < 3; k++) {
        int v = mesh.corner(t, k);
        nine[3 * k] = mesh.x(v);
        nine[3 * k + 1] = mesh.y(v);
        nine[3 * k + 2] = mesh.z(v);
      }
      level.add(nine);
      if (level.size == BLOCK || t == count - 1) {
        pass(level, share, limit, open);
        level.size = 0;
      }
    }
    for (int depth = 1; depth <= DEEPEST && open.size > 0; depth++) {
      Pending next = new Pending();
      share /= 4;
      Pending children = new Pending();
      boolean last = depth == DEEPEST;
      for (int i = 0; i < open.size; i++) {
        divide(open.corners, 9 * i, children);
        if (children.size + 4 > BLOCK || i == open.size - 1) {
          pass(children, last ? Double.POSITIVE_INFINITY : share, limit, next);
          children.size = 0;
        }
      }
      open = next;
    }
  }

  /** ∬|f|, about, by the centroids of some of the triangles. */
  private double coarseMagnitude(TriangleMesh mesh) {
    int count = mesh.triangleCount();
    int step = Math.max(1, count / BLOCK);
    int n = 0;
    for (int t = 0; t < count && n < BLOCK; t += step) {
      Vector3 area = mesh.areaVector(t);
      Vector3 middle =
          mesh.vertex(mesh.corner(t, 0))
              .plus(mesh.vertex(mesh.corner(t, 1)))
              .plus(mesh.vertex(mesh.corner(t, 2)))
              .times(1.0 / 3);
      for (int axis = 0; axis < 3; axis++) {
        positions[axis][n] = middle.component(axis);
        areas[axis][n] = area.component(axis);
      }
      n++;
    }
    integrand.evaluate(n, positions, areas, values);
    double sum = 0;
    for (int i = 0; i < n; i++) {
      sum += Double.isFinite(values[0][i]) ? Math.abs(values[0][i]) : 0;
    }
    return sum * count / Math.max(1, n);
  }

  private static void divide(double[] from, int at, Pending into) {
    double[] m = new double[9];
    for (int k = 0; k < 3; k++) {
      for (int axis = 0; axis < 3; axis++) {
        m[3 * k + axis] = 0.5 * (from[at + 3 * k + axis] + from[at + 3 * ((k + 1) % 3) + axis]);
      }
    }
    double[] nine = new double[9];
    for (int k = 0; k < 3; k++) {
      System.arraycopy(from, at + 3 * k, nine, 0, 3);
      System.arraycopy(m, 3 * k, nine, 3, 3);
      System.arraycopy(m, 3 * ((k + 2) % 3), nine, 6, 3);
      into.add(nine);
    }
    into.add(m);
  }

  /** One block: what is within its share is summed, the rest goes to {@code open}. */
  private void pass(Pending block, double share, long limit, Pending open) {
    for (int i = 0; i < block.size; i++) {
      place(block.corners, 9 * i, i * points);
    }
    int total = block.size * points;
    integrand.evaluate(total, positions, areas, values);
    evaluations += total;
    double[] sum = new double[sums.length];
    for (int i = 0; i < block.size; i++) {
      int first = i * points;
      double[] fine = new double[sums.length];
      double[] absolute = new double[1];
      double difference = weigh(first, fine, absolute);
      if (Double.isNaN(difference) && nonFiniteAt.isEmpty()) {
        nonFiniteAt = badPoint(first);
      }
      if (difference > share && evaluations < limit) {
        open.add(Arrays.copyOfRange(block.corners, 9 * i, 9 * i + 9));
        continue;
      }
      for (int k = 0; k < sum.length; k++) {
        sum[k] += fine[k];
      }
      magnitude += absolute[0];
      error += difference + ROUNDING * absolute[0];
    }
    for (int k = 0; k < sum.length; k++) {
      double before = sums[k];
      double after = before + sum[k];
      rests[k] +=
          Math.abs(before) >= Math.abs(sum[k]) ? before - after + sum[k] : sum[k] - after + before;
      sums[k] = after;
    }
  }

  /** The integrals over one triangle by the finest rule; how the first differs by the others. */
  private double weigh(int first, double[] fine, double[] absolute) {
    int at = first;
    double coarse = Double.NaN;
    for (int r = 0; r < rules.length; r++) {
      TriangleRule rule = rules[r];
      if (r > 0) {
        coarse = fine[0];
      }
      Arrays.fill(fine, 0);
      absolute[0] = 0;
      for (int j = 0; j < rule.size(); j++) {
        for (int k = 0; k < fine.length; k++) {
          fine[k] += rule.weight(j) * values[k][at];
        }
        absolute[0] += rule.weight(j) * Math.abs(values[0][at]);
        at++;
      }
    }
    return rules.length > 1 ? Math.abs(fine[0] - coarse) : 0 * fine[0];
  }

  private Optional<Vector3> badPoint(int first) {
    for (int at = first; at < first + points; at++) {
      for (double[] row : values) {
        if (!Double.isFinite(row[at])) {
          return Optional.of(new Vector3(positions[0][at], positions[1][at], positions[2][at]));
        }
      }
    }
    return Optional.empty();
  }

  private void place(double[] c, int at, int first) {
    double bx = c[at + 3] - c[at];
    double by = c[at + 4] - c[at + 1];
    double bz = c[at + 5] - c[at + 2];
    double cx = c[at + 6] - c[at];
    double cy = c[at + 7] - c[at + 1];
    double cz = c[at + 8] - c[at + 2];
    double nx = 0.5 * (by * cz - bz * cy);
    double ny = 0.5 * (bz * cx - bx * cz);
    double nz = 0.5 * (bx * cy - by * cx);
    int to = first;
    for (TriangleRule rule : rules) {
      for (int j = 0; j < rule.size(); j++) {
        double s = rule.second(j);
        double t = rule.third(j);
        positions[0][to] = c[at] + s * bx + t * cx;
        positions[1][to] = c[at + 1] + s * by + t * cy;
        positions[2][to] = c[at + 2] + s * bz + t * cz;
        areas[0][to] = nx;
        areas[1][to] = ny;
        areas[2][to] = nz;
        to++;
      }
    }
  }

  /** The integral of a component. */
  double value(int component) {
    return sums[component] + rests[component];
  }

  /** A bound on the error of the first component. */
  double error() {
    return error;
  }

  /** ∬|f| of the first component. */
  double magnitude() {
    return magnitude;
  }

  long evaluations() {
    return evaluations;
  }

  /** A point at which a component is not finite. */
  Optional<Vector3> nonFiniteAt() {
    return nonFiniteAt;
  }
}
