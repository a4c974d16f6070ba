package org.hullsum.mesh;

import java.util.Optional;
import java.util.concurrent.atomic.AtomicInteger;
import org.hullsum.numeric.Vector3;

/**
 * Pairs of triangles of one mesh that pass through one another: an edge of one crosses the inside
 * of the other. Pairs with an edge in common are not looked at, nor those that lie in one plane,
 * and what merely touches within rounding is not counted.
 *
 * <p>Signs of volumes of tetrahedra tell, each with the bound on its rounding of J. R. Shewchuk,
 * "Adaptive precision floating-point arithmetic and fast robust geometric predicates", Discrete and
 * Computational Geometry 18 (1997), 305–363. Cost: a search in the tree for each triangle.
 */
public final class SelfIntersections {
  /** Of the volume's permanent: (7 + 56 ε) ε with ε half an ulp of one. */
  private static final double ROUNDING = 7.1 * 0.5 * Math.ulp(1.0);

  private static final int BLOCK = 1 << 10;

  private final TriangleTree tree;
  private final TriangleMesh mesh;

  /**
   * What was found.
   *
   * @param pairs how many
   * @param first the pair with the smallest number, and where its triangle lies
   */
  public record Found(int pairs, Optional<Pair> first) {}

  /**
   * A pair of triangles.
   *
   * @param one the smaller number
   * @param other the larger
   * @param place the middle of the first
   */
  public record Pair(int one, int other, Vector3 place) {}

  private SelfIntersections(TriangleTree tree) {
    this.tree = tree;
    this.mesh = tree.mesh();
  }

  /**
   * Finds them.
   *
   * @param threads that may be used; the result does not depend on it
   */
  public static Found find(TriangleTree tree, int threads) {
    SelfIntersections search = new SelfIntersections(tree);
    int count = tree.mesh().triangleCount();
    AtomicInteger pairs = new AtomicInteger();
    int[] firsts = new int[(count + BLOCK - 1) / BLOCK];
    Pieces.run(
        threads,
        firsts.length,
        block -> {
          firsts[block] = count;
          for (int t = BLOCK * block; t < Math.min(count, BLOCK * (block + 1)); t++) {
            int met = search.count(t);
            pairs.addAndGet(met);
            firsts[block] = met > 0 ? Math.min(firsts[block], t) : firsts[block];
          }
        });
    int first = count;
    for (int f : firsts) {
      first = Math.min(first, f);
    }
    return new Found(
        pairs.get(), first == count ? Optional.empty() : Optional.of(search.pair(first)));
  }

  /** How many triangles with larger numbers a triangle crosses. */
  private int count(int one) {
    int[] count = new int[1];
    tree.near(one, other -> count[0] += other > one && cross(one, other) ? 1 : 0);
    return count[0];
  }

  private Pair pair(int one) {
    int[] other = {mesh.triangleCount()};
    tree.near(one, t -> other[0] = t > one && cross(one, t) ? Math.min(other[0], t) : other[0]);
    Vector3 sum = corner(one, 0).plus(corner(one, 1)).plus(corner(one, 2));
    return new Pair(one, other[0], sum.times(1.0 / 3));
  }

  private Vector3 corner(int t, int k) {
    return mesh.vertex(mesh.corner(t, k));
  }

  private boolean cross(int one, int other) {
    int shared = 0;
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        shared += mesh.corner(one, i) == mesh.corner(other, j) ? 1 : 0;
      }
    }
    return shared < 2 && (pierces(one, other) || pierces(other, one));
  }

  /** Whether an edge of one passes through the inside of the other. */
  private boolean pierces(int one, int other) {
    Vector3 a = corner(other, 0);
    Vector3 b = corner(other, 1);
    Vector3 c = corner(other, 2);
    for (int k = 0; k < 3; k++) {
      Vector3 p = corner(one, k);
      Vector3 q = corner(one, (k + 1) % 3);
      if (side(a, b, c, p) * side(a, b, c, q) < 0) {
        int first = side(p, q, a, b);
        if (first != 0 && first == side(p, q, b, c) && first == side(p, q, c, a)) {
          return true;
        }
      }
    }
    return false;
  }

  /** The side of the plane through a, b, c on which d lies; 0 where rounding hides it. */
  private static int side(Vector3 a, Vector3 b, Vector3 c, Vector3 d) {
    double ax = a.x() - d.x();
    double ay = a.y() - d.y();
    double az = a.z() - d.z();
    double bx = b.x() - d.x();
    double by = b.y() - d.y();
    double bz = b.z() - d.z();
    double cx = c.x() - d.x();
    double cy = c.y() - d.y();
    double cz = c.z() - d.z();
    double volume = az * (bx * cy - cx * by) + bz * (cx * ay - ax * cy) + cz * (ax * by - bx * ay);
    double permanent =
        Math.abs(az) * (Math.abs(bx * cy) + Math.abs(cx * by))
            + Math.abs(bz) * (Math.abs(cx * ay) + Math.abs(ax * cy))
            + Math.abs(cz) * (Math.abs(ax * by) + Math.abs(bx * ay));
    return Math.abs(volume) <= ROUNDING * permanent ? 0 : volume > 0 ? 1 : -1;
  }
}
