package org.hullsum.mesh;

import java.util.Comparator;
import java.util.PriorityQueue;
import org.hullsum.numeric.Vector3;

/**
 * How often the triangles of a mesh wind round a point: their solid angle seen from it, by 4π.
 *
 * <p>Of a closed mesh that faces outward it is 1 inside and 0 outside; of any other, an open one or
 * a soup of triangles without connections, it is what is left of that (A. Jacobson, L. Kavan, O.
 * Sorkine-Hornung, "Robust inside-outside segmentation using generalized winding numbers", ACM
 * Trans. Graph. 32 (2013) 33). It changes its sign with the facing of the triangles.
 *
 * <p>Triangles far away are summed by clusters, as a dipole and a quadrupole with a bound on the
 * remainder; the cluster with the largest bound is opened until the sum of the bounds is as small
 * as asked, so each value carries its own. Lowest clusters are summed triangle by triangle.
 *
 * <p>Building is O(n); a query visits O(log n) nodes for a given bound, all n at worst. 8 to 15
 * bytes a triangle beside the tree. Immutable and thread-safe.
 */
public final class WindingNumber {
  /** How many levels of the tree are not worth clusters of their own. */
  private static final int UNCLUSTERED = 2;

  private static final double SPHERE = 4 * Math.PI;

  private final TriangleTree tree;
  private final ClusterMoments clusters;
  private final int depth;

  /**
   * A winding number.
   *
   * @param number Ω/4π
   * @param error a bound on its error, at most what was asked, unless the point is on the mesh or
   *     rounding alone is more
   * @param visited number of nodes looked at
   */
  public record Value(double number, double error, int visited) {}

  /** A cluster that stands for its triangles. */
  private record Open(int node, int level, int from, int to, double error) {}

  private WindingNumber(TriangleTree tree) {
    this.tree = tree;
    this.depth = Math.max(0, tree.depth() - UNCLUSTERED);
    this.clusters = new ClusterMoments(2 << depth);
    gather(1, 0, 0, tree.mesh().triangleCount());
  }

  /** Prepares the triangles of a tree. */
  public static WindingNumber of(TriangleTree tree) {
    return new WindingNumber(tree);
  }

  private void gather(int node, int level, int from, int to) {
    if (level == depth) {
      clusters.gather(node, tree.mesh(), tree.order(), from, to);
      return;
    }
    int middle = TriangleTree.middle(from, to);
    gather(2 * node, level + 1, from, middle);
    gather(2 * node + 1, level + 1, middle, to);
    clusters.join(node);
  }

  public TriangleTree tree() {
    return tree;
  }

  /** The sum over every triangle, which rounding alone makes inexact. */
  public static Value direct(TriangleMesh mesh, Vector3 point) {
    SolidAngleAccumulator angles = new SolidAngleAccumulator(point);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      angles.add(mesh, t);
    }
    return new Value(angles.sum() / SPHERE, angles.error() / SPHERE, mesh.triangleCount());
  }

  /**
   * The winding number at a point.
   *
   * @param bound largest error allowed; 0 sums every triangle
   */
  public Value at(Vector3 point, double bound) {
    PriorityQueue<Open> open =
        new PriorityQueue<>(
            Comparator.comparingDouble(Open::error).reversed().thenComparingInt(Open::node));
    SolidAngleAccumulator near = new SolidAngleAccumulator(point);
    open.add(open(1, 0, 0, tree.mesh().triangleCount(), point));
    int visited = 1;
    double pending = 0;
    int unbounded = Double.isFinite(open.peek().error()) ? 0 : 1;
    pending += unbounded == 0 ? open.peek().error() : 0;
    // Each round opens a node for good.
    while (!open.isEmpty() && (unbounded > 0 || pending + near.error() > bound * SPHERE)) {
      Open largest = open.poll();
      if (Double.isFinite(largest.error())) {
        pending -= largest.error();
      } else {
        unbounded--;
      }
      if (largest.level() == depth) {
        for (int i = largest.from(); i < largest.to(); i++) {
          near.add(tree.mesh(), tree.order()[i]);
        }
        continue;
      }
      int middle = TriangleTree.middle(largest.from(), largest.to());
      int below = largest.level() + 1;
      Open one = open(2 * largest.node(), below, largest.from(), middle, point);
      Open other = open(2 * largest.node() + 1, below, middle, largest.to(), point);
      visited += 2;
      for (Open child : new Open[] {one, other}) {
        boolean bounded = Double.isFinite(child.error());
        pending += bounded ? child.error() : 0;
        unbounded += bounded ? 0 : 1;
        open.add(child);
      }
    }
    return total(open, near, point, visited);
  }

  private Value total(
      PriorityQueue<Open> open, SolidAngleAccumulator near, Vector3 point, int visited) {
    double angle = near.sum();
    double error = near.error();
    for (Open cluster : open) {
      angle += clusters.angle(cluster.node(), point);
      error += cluster.error();
    }
    return new Value(angle / SPHERE, error / SPHERE, visited);
  }

  private Open open(int node, int level, int from, int to, Vector3 point) {
    return new Open(node, level, from, to, clusters.error(node, point));
  }
}
