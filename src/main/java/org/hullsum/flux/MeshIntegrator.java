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
 * triangle is done by seven points, which serve a rule of degree 5 and one of degree 2 within it;
 * their difference is taken for the error. Triangles that take more than their share of what is
 * allowed are done by rules of degree 5 and 8, and then divided into four, level by level.
 * Triangles are taken in blocks and sums compensated block by block, so that the result does not
 * depend on anything else. Not thread-safe.
 */
final class MeshIntegrator {
  /** Triangles of one block. */
  static final int BLOCK = 256;

  /** Divisions of one triangle at most. */
  private static final int DEEPEST = 14;

  /** Rounding of a sum, relative to that of the magnitudes. */
  private static final double ROUNDING = 4 * Math.ulp(1.0);

  private final Integrand integrand;
  private final Stage first;
  private final Stage later;
  private final double[][] positions;
  private final double[][] areas;
  private final double[][] values;
  private final double[] sums;
  private final double[] blockSums;
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
    this.first = first(degree);
    this.later = new Stage(TriangleRule.DEGREE_5, TriangleRule.DEGREE_8);
    int points = Math.max(first.size(), later.size());
    this.positions = new double[3][BLOCK * points];
    this.areas = new double[3][BLOCK * points];
    this.values = new double[integrand.components()][BLOCK * points];
    this.sums = new double[integrand.components()];
    this.blockSums = new double[integrand.components()];
    this.rests = new double[integrand.components()];
  }

  private static Stage first(int degree) {
    for (TriangleRule rule :
        new TriangleRule[] {
          TriangleRule.CENTROID, TriangleRule.DEGREE_2, TriangleRule.DEGREE_5, TriangleRule.DEGREE_8
        }) {
      if (degree >= 0 && degree <= rule.degree()) {
        return new Stage(rule, rule);
      }
    }
    return new Stage(TriangleRule.WITHIN_5, TriangleRule.DEGREE_5);
  }

  /** A rule and one that is trusted more; they may stand on the same points. */
  private record Stage(TriangleRule rough, TriangleRule fine) {
    boolean onOneSet() {
      return rough != fine && rough.size() == fine.size();
    }

    /** Whether the fine rule is exact. */
    boolean exact() {
      return rough == fine;
    }

    /** Where the fine rule's points begin. */
    int fineFrom() {
      return exact() || onOneSet() ? 0 : rough.size();
    }

    /** Points of each triangle. */
    int size() {
      return fineFrom() + fine.size();
    }
  }

  /** Triangles to be done, by their corners: nine numbers each. */
  private static final class Pending {
    private double[] corners = new double[9 * BLOCK];
    private int size;

    void add(double[] from, int at) {
      if (9 * size == corners.length) {
        corners = Arrays.copyOf(corners, 2 * corners.length);
      }
      System.arraycopy(from, at, corners, 9 * size++, 9);
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
    Pending block = new Pending();
    Pending doubtful = new Pending();
    Pending open = new Pending();
    double[] nine = new double[9];
    double allowed = Math.max(absolute, relative * coarseMagnitude(mesh));
    double share = allowed / Math.max(1, count);
    for (int t = 0; t < count; t++) {
      for (int k = 0; k < 3; k++) {
        int v = mesh.corner(t, k);
        nine[3 * k] = mesh.x(v);
        nine[3 * k + 1] = mesh.y(v);
        nine[3 * k + 2] = mesh.z(v);
      }
      block.add(nine, 0);
      if (block.size == BLOCK || t == count - 1) {
        pass(first, block, share, limit, doubtful);
        pass(later, doubtful, share, limit, open);
        block.size = 0;
        doubtful.size = 0;
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
          pass(later, children, last ? Double.POSITIVE_INFINITY : share, limit, next);
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
      into.add(nine, 0);
    }
    into.add(m, 0);
  }

  /** One block: what is within its share is summed, the rest goes to {@code open}. */
  private void pass(Stage stage, Pending block, double share, long limit, Pending open) {
    int points = stage.size();
    for (int i = 0; i < block.size; i++) {
      place(stage, block.corners, 9 * i, i * points);
    }
    int total = block.size * points;
    integrand.evaluate(total, positions, areas, values);
    evaluations += total;
    Arrays.fill(blockSums, 0);
    for (int i = 0; i < block.size; i++) {
      int at = i * points;
      double fine = weigh(stage.fine(), 0, at + stage.fineFrom());
      double difference = stage.exact() ? 0 * fine : Math.abs(fine - weigh(stage.rough(), 0, at));
      if (Double.isNaN(difference) && nonFiniteAt.isEmpty()) {
        nonFiniteAt = badPoint(at, points);
      }
      if (difference > share && evaluations < limit) {
        open.add(block.corners, 9 * i);
        continue;
      }
      blockSums[0] += fine;
      for (int k = 1; k < blockSums.length; k++) {
        blockSums[k] += weigh(stage.fine(), k, at + stage.fineFrom());
      }
      double absolute = weighMagnitude(stage.fine(), at + stage.fineFrom());
      magnitude += absolute;
      error += difference + ROUNDING * absolute;
    }
    for (int k = 0; k < blockSums.length; k++) {
      double before = sums[k];
      double more = blockSums[k];
      double after = before + more;
      rests[k] +=
          Math.abs(before) >= Math.abs(more) ? before - after + more : more - after + before;
      sums[k] = after;
    }
  }

  private double weigh(TriangleRule rule, int component, int at) {
    double[] row = values[component];
    double sum = 0;
    for (int j = 0; j < rule.size(); j++) {
      sum += rule.weight(j) * row[at + j];
    }
    return sum;
  }

  private double weighMagnitude(TriangleRule rule, int at) {
    double[] row = values[0];
    double sum = 0;
    for (int j = 0; j < rule.size(); j++) {
      sum += rule.weight(j) * Math.abs(row[at + j]);
    }
    return sum;
  }

  private Optional<Vector3> badPoint(int first, int points) {
    for (int at = first; at < first + points; at++) {
      for (double[] row : values) {
        if (!Double.isFinite(row[at])) {
          return Optional.of(new Vector3(positions[0][at], positions[1][at], positions[2][at]));
        }
      }
    }
    return Optional.empty();
  }

  private void place(Stage stage, double[] c, int at, int start) {
    double bx = c[at + 3] - c[at];
    double by = c[at + 4] - c[at + 1];
    double bz = c[at + 5] - c[at + 2];
    double cx = c[at + 6] - c[at];
    double cy = c[at + 7] - c[at + 1];
    double cz = c[at + 8] - c[at + 2];
    double nx = 0.5 * (by * cz - bz * cy);
    double ny = 0.5 * (bz * cx - bx * cz);
    double nz = 0.5 * (bx * cy - by * cx);
    for (int i = start; i < start + stage.size(); i++) {
      TriangleRule rule = i < start + stage.fineFrom() ? stage.rough() : stage.fine();
      int j = i < start + stage.fineFrom() ? i - start : i - start - stage.fineFrom();
      double s = rule.second(j);
      double t = rule.third(j);
      positions[0][i] = c[at] + s * bx + t * cx;
      positions[1][i] = c[at + 1] + s * by + t * cy;
      positions[2][i] = c[at + 2] + s * bz + t * cz;
      areas[0][i] = nx;
      areas[1][i] = ny;
      areas[2][i] = nz;
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
