package org.hullsum.mesh;

import org.hullsum.numeric.Vector3;

/**
 * What is kept of the triangles below the nodes of a {@link TriangleTree}, to see them from afar as
 * a dipole and a quadrupole.
 *
 * <p>Of a cluster about its centre p, h = r − p: A = ∬ n dS, the symmetric part of M = ∬ n ⊗ h dS,
 * S = ∬ dS, S₂ = ∬ |h|² dS, ρ the largest |h|. From a point at the distance R of p, with x = p − q
 * and t = ρ/R below 1,
 *
 * <p>Ω = A·x/R³ + tr M/R³ − 3 xᵀMx/R⁵ + remainder, |remainder| ≤ S₂ (3 − 2t) / ((1 − t)² R⁴).
 *
 * <p>Ω is the integral of n · f(x + h) with f(x) = x/|x|³ = −∇(1/|x|). The term of order k of f in
 * h is a derivative of order k + 1 of 1/|x|, a harmonic function: along unit vectors it is at most
 * (k+1)!/R^(k+2), as along one of them it is that times a Legendre polynomial. So the terms from k
 * = 2 on sum to at most Σ (k+1) |h|^k / R^(k+2), which is the bound. (The expansion is that of G.
 * Barill, N. Dickson, R. Schmidt, D. Levin, A. Jacobson, "Fast winding numbers for soups and
 * clouds", ACM Trans. Graph. 37 (2018) 43; the bound on its remainder is derived here.)
 */
final class ClusterMoments {
  private static final int CENTRE = 0;
  private static final int AREA_VECTOR = 3;
  private static final int FIRST_MOMENT = 6;
  private static final int AREA = 12;
  private static final int SQUARE = 13;
  private static final int RADIUS = 14;
  private static final int FIGURES = 15;

  /** Rows and columns of the six different figures of a symmetric matrix. */
  private static final int[] ROW = {0, 1, 2, 0, 0, 1};

  private static final int[] COLUMN = {0, 1, 2, 1, 2, 2};

  /** Roundings of a cluster's figures, relative to S/R² at most this many. */
  private static final double ROUNDINGS = 64 * Math.ulp(1.0);

  private final double[] figures;

  ClusterMoments(int nodes) {
    this.figures = new double[FIGURES * nodes];
  }

  /** Enters the triangles of a lowest node. */
  void gather(int node, TriangleMesh mesh, int[] order, int from, int to) {
    double area = 0;
    Vector3 weighted = Vector3.ZERO;
    Vector3 anchor = to > from ? mesh.vertex(mesh.corner(order[from], 0)) : Vector3.ZERO;
    for (int i = from; i < to; i++) {
      double a = mesh.areaVector(order[i]).norm();
      area += a;
      weighted = weighted.plus(centroid(mesh, order[i]).minus(anchor).times(a));
    }
    Vector3 centre = area > 0 ? anchor.plus(weighted.times(1 / area)) : anchor;
    int at = FIGURES * node;
    put(at + CENTRE, centre);
    figures[at + AREA] = area;
    for (int i = from; i < to; i++) {
      Vector3 n = mesh.areaVector(order[i]);
      Vector3 h = centroid(mesh, order[i]).minus(centre);
      add(at, n, h);
      double sides = 0;
      for (int k = 0; k < 3; k++) {
        Vector3 corner = mesh.vertex(mesh.corner(order[i], k));
        Vector3 side = mesh.vertex(mesh.corner(order[i], (k + 1) % 3)).minus(corner);
        sides += side.dot(side);
        figures[at + RADIUS] = Math.max(figures[at + RADIUS], corner.minus(centre).norm());
      }
      figures[at + SQUARE] += n.norm() * (h.dot(h) + sides / 36);
    }
  }

  private static Vector3 centroid(TriangleMesh mesh, int triangle) {
    return mesh.vertex(mesh.corner(triangle, 0))
        .plus(mesh.vertex(mesh.corner(triangle, 1)))
        .plus(mesh.vertex(mesh.corner(triangle, 2)))
        .times(1.0 / 3);
  }

  /** Joins the two nodes below one, 2 · node and 2 · node + 1. */
  void join(int node) {
    int at = FIGURES * node;
    int one = FIGURES * 2 * node;
    int other = one + FIGURES;
    double area = figures[one + AREA] + figures[other + AREA];
    Vector3 between = vector(other + CENTRE).minus(vector(one + CENTRE));
    double share = area > 0 ? figures[other + AREA] / area : 0.5;
    put(at + CENTRE, vector(one + CENTRE).plus(between.times(share)));
    figures[at + AREA] = area;
    for (int child : new int[] {one, other}) {
      Vector3 h = vector(child + CENTRE).minus(vector(at + CENTRE));
      add(at, vector(child + AREA_VECTOR), h);
      for (int k = 0; k < ROW.length; k++) {
        figures[at + FIRST_MOMENT + k] += figures[child + FIRST_MOMENT + k];
      }
      figures[at + SQUARE] += figures[child + SQUARE] + h.dot(h) * figures[child + AREA];
      figures[at + RADIUS] = Math.max(figures[at + RADIUS], figures[child + RADIUS] + h.norm());
    }
  }

  /** Adds an area vector at a place to A and M. */
  private void add(int at, Vector3 n, Vector3 h) {
    for (int k = 0; k < 3; k++) {
      figures[at + AREA_VECTOR + k] += n.component(k);
    }
    for (int k = 0; k < ROW.length; k++) {
      figures[at + FIRST_MOMENT + k] +=
          0.5
              * (n.component(ROW[k]) * h.component(COLUMN[k])
                  + n.component(COLUMN[k]) * h.component(ROW[k]));
    }
  }

  private void put(int at, Vector3 v) {
    figures[at] = v.x();
    figures[at + 1] = v.y();
    figures[at + 2] = v.z();
  }

  private Vector3 vector(int at) {
    return new Vector3(figures[at], figures[at + 1], figures[at + 2]);
  }

  /** A bound on the error of {@link #angle}; infinite where the expansion does not hold. */
  double error(int node, Vector3 point) {
    int at = FIGURES * node;
    double distance = vector(at + CENTRE).minus(point).norm();
    // Rounding may make either length too small by a little.
    double t = figures[at + RADIUS] * (1 + ROUNDINGS) / distance;
    if (figures[at + AREA] == 0) {
      return 0;
    }
    if (!(t < 1)) {
      return Double.POSITIVE_INFINITY;
    }
    double square = distance * distance;
    double remainder = figures[at + SQUARE] * (3 - 2 * t) / ((1 - t) * (1 - t) * square * square);
    return remainder + ROUNDINGS * figures[at + AREA] / square;
  }

  /** The solid angle of a node's triangles by their dipole and quadrupole, in steradians. */
  double angle(int node, Vector3 point) {
    int at = FIGURES * node;
    if (figures[at + AREA] == 0) {
      return 0;
    }
    Vector3 x = vector(at + CENTRE).minus(point);
    double square = x.dot(x);
    double cube = square * Math.sqrt(square);
    double trace = 0;
    double form = 0;
    for (int k = 0; k < ROW.length; k++) {
      double m = figures[at + FIRST_MOMENT + k];
      boolean diagonal = ROW[k] == COLUMN[k];
      trace += diagonal ? m : 0;
      form += (diagonal ? 1 : 2) * m * x.component(ROW[k]) * x.component(COLUMN[k]);
    }
    return (vector(at + AREA_VECTOR).dot(x) + trace - 3 * form / square) / cube;
  }
}
