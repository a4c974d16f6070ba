package org.hullsum.mesh;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntConsumer;
import org.hullsum.numeric.Box3;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;

/**
 * A tree of boxes around the triangles of a mesh, for lines through it: halves of halves in {@link
 * MortonOrder}, in flat arrays; about 20 bytes a triangle. Immutable and thread-safe.
 */
public final class TriangleTree {
  private static final int LEAF = 8;

  /** Smallest sine of the angle between a line and a triangle's plane that is not a graze. */
  private static final double STEEP = 1e-6;

  private final TriangleMesh mesh;
  private final int[] order;
  private final double[] boxes;
  private final int depth;

  /** What a line meets: the places, and whether one of them is doubtful. */
  public record LineHits(List<Double> places, boolean doubtful) {
    public LineHits {
      places = List.copyOf(places);
    }
  }

  /** What a line meets: where, and in which triangle. */
  record Hit(double place, int triangle) {}

  private TriangleTree(TriangleMesh mesh, int[] order, double[] boxes, int depth) {
    this.mesh = mesh;
    this.order = order;
    this.boxes = boxes;
    this.depth = depth;
  }

  private TriangleTree(TriangleMesh mesh) {
    this.mesh = mesh;
    int count = mesh.triangleCount();
    this.order = MortonOrder.of(mesh);
    int levels = 0;
    while (count >> levels > LEAF) {
      levels++;
    }
    this.depth = levels;
    this.boxes = new double[6 << (levels + 1)];
    build(1, 0, count, 0);
  }

  /** Builds the tree; linear in the number of triangles. */
  public static TriangleTree of(TriangleMesh mesh) {
    return new TriangleTree(mesh);
  }

  /** The tree of the same triangles, those turned that face against the others. */
  public TriangleTree agreed(MeshTopology topology) {
    return topology.againstCount() == 0
        ? this
        : new TriangleTree(mesh.turned(topology::isAgainst), order, boxes, depth);
  }

  private void build(int node, int from, int to, int level) {
    int at = 6 * node;
    if (level < depth) {
      int middle = middle(from, to);
      build(2 * node, from, middle, level + 1);
      build(2 * node + 1, middle, to, level + 1);
      for (int k = 0; k < 3; k++) {
        boxes[at + k] = Math.min(boxes[2 * at + k], boxes[2 * at + 6 + k]);
        boxes[at + 3 + k] = Math.max(boxes[2 * at + 3 + k], boxes[2 * at + 9 + k]);
      }
      return;
    }
    for (int k = 0; k < 3; k++) {
      boxes[at + k] = Double.POSITIVE_INFINITY;
      boxes[at + 3 + k] = Double.NEGATIVE_INFINITY;
    }
    for (int i = from; i < to; i++) {
      for (int k = 0; k < 3; k++) {
        int v = mesh.corner(order[i], k);
        widen(at, 0, mesh.x(v));
        widen(at, 1, mesh.y(v));
        widen(at, 2, mesh.z(v));
      }
    }
  }

  private void widen(int at, int k, double value) {
    boxes[at + k] = Math.min(boxes[at + k], value);
    boxes[at + 3 + k] = Math.max(boxes[at + 3 + k], value);
  }

  public TriangleMesh mesh() {
    return mesh;
  }

  /** The triangles in the order of the tree: each node's follow one another. Not to be changed. */
  int[] order() {
    return order;
  }

  /** The level of the lowest nodes, that of the root being 0. */
  int depth() {
    return depth;
  }

  /** Where the triangles of a node are halved, the first half going to the node 2 · node. */
  static int middle(int from, int to) {
    return (from + to) >>> 1;
  }

  /** Distance of a point from the nearest triangle; infinite where there is none. */
  public double distance(Vector3 point) {
    return distance(1, 0, order.length, 0, point, Double.POSITIVE_INFINITY);
  }

  /** The smaller of the nearest distance below a node and the one known. */
  private double distance(int node, int from, int to, int level, Vector3 point, double known) {
    if (distanceToBox(6 * node, point) >= known) {
      return known;
    }
    double nearest = known;
    if (level == depth) {
      for (int i = from; i < to; i++) {
        nearest = Math.min(nearest, TriangleDistance.of(mesh, order[i], point));
      }
      return nearest;
    }
    int middle = middle(from, to);
    boolean first = distanceToBox(12 * node, point) <= distanceToBox(12 * node + 6, point);
    for (int half = 0; half < 2; half++) {
      boolean before = (half == 0) == first;
      nearest =
          before
              ? distance(2 * node, from, middle, level + 1, point, nearest)
              : distance(2 * node + 1, middle, to, level + 1, point, nearest);
    }
    return nearest;
  }

  private double distanceToBox(int at, Vector3 point) {
    double sum = 0;
    for (int k = 0; k < 3; k++) {
      double p = point.component(k);
      double out = Math.max(0, Math.max(boxes[at + k] - p, p - boxes[at + 3 + k]));
      sum += out * out;
    }
    return Math.sqrt(sum);
  }

  /** The diagonal of the box around all. */
  public double extent() {
    double sum = 0;
    for (int k = 0; k < 3; k++) {
      double side = boxes[9 + k] - boxes[6 + k];
      sum += side * side;
    }
    return Math.sqrt(sum);
  }

  /** Whether a triangle may have a point in a box: whether the box around a few of them has. */
  public boolean touches(Box3 box) {
    return touches(1, 0, box);
  }

  private boolean touches(int node, int level, Box3 box) {
    int at = 6 * node;
    Interval[] sides = {box.x(), box.y(), box.z()};
    for (int k = 0; k < 3; k++) {
      if (boxes[at + k] > sides[k].high() || boxes[at + 3 + k] < sides[k].low()) {
        return false;
      }
    }
    return level == depth
        || touches(2 * node, level + 1, box)
        || touches(2 * node + 1, level + 1, box);
  }

  /**
   * All places t at which the line origin + t · direction crosses a triangle, ascending. One that
   * passes an edge within the reach, or a triangle nearly along its plane, is doubtful.
   *
   * @param direction of length one
   */
  public LineHits along(Vector3 origin, Vector3 direction, double reach) {
    LineSearch search = search(origin, direction, reach);
    return new LineHits(search.hits.stream().map(Hit::place).sorted().toList(), search.doubtful);
  }

  /** Tells the triangles whose boxes have a point in common with that of a triangle. */
  void near(int triangle, IntConsumer visitor) {
    double[] box = boxOf(triangle);
    near(1, 0, order.length, 0, box, visitor);
  }

  private double[] boxOf(int triangle) {
    double[] box = new double[6];
    for (int k = 0; k < 3; k++) {
      box[k] = Double.POSITIVE_INFINITY;
      box[3 + k] = Double.NEGATIVE_INFINITY;
      for (int corner = 0; corner < 3; corner++) {
        double c = mesh.vertex(mesh.corner(triangle, corner)).component(k);
        box[k] = Math.min(box[k], c);
        box[3 + k] = Math.max(box[3 + k], c);
      }
    }
    return box;
  }

  private void near(int node, int from, int to, int level, double[] box, IntConsumer visitor) {
    for (int k = 0; k < 3; k++) {
      if (boxes[6 * node + k] > box[3 + k] || boxes[6 * node + 3 + k] < box[k]) {
        return;
      }
    }
    if (level < depth) {
      int middle = (from + to) >>> 1;
      near(2 * node, from, middle, level + 1, box, visitor);
      near(2 * node + 1, middle, to, level + 1, box, visitor);
      return;
    }
    for (int i = from; i < to; i++) {
      visitor.accept(order[i]);
    }
  }

  /** The triangles that such a line crosses, in no order; empty where one of them is doubtful. */
  Optional<List<Hit>> hits(Vector3 origin, Vector3 direction, double reach) {
    LineSearch search = search(origin, direction, reach);
    return search.doubtful ? Optional.empty() : Optional.of(search.hits);
  }

  private LineSearch search(Vector3 origin, Vector3 direction, double reach) {
    LineSearch search = new LineSearch(origin, direction, reach);
    search.visit(1, 0, order.length, 0);
    return search;
  }

  /** One line. */
  private final class LineSearch {
    private final Vector3 origin;
    private final Vector3 direction;
    private final double reach;
    private final List<Hit> hits = new ArrayList<>();
    private boolean doubtful;

    LineSearch(Vector3 origin, Vector3 direction, double reach) {
      this.origin = origin;
      this.direction = direction;
      this.reach = reach;
    }

    void visit(int node, int from, int to, int level) {
      if (!meets(6 * node)) {
        return;
      }
      if (level < depth) {
        int middle = middle(from, to);
        visit(2 * node, from, middle, level + 1);
        visit(2 * node + 1, middle, to, level + 1);
        return;
      }
      for (int i = from; i < to; i++) {
        test(order[i]);
      }
    }

    /** Whether the line passes a box within the reach. */
    private boolean meets(int at) {
      double first = Double.NEGATIVE_INFINITY;
      double last = Double.POSITIVE_INFINITY;
      for (int k = 0; k < 3; k++) {
        double low = boxes[at + k] - reach - origin.component(k);
        double high = boxes[at + 3 + k] + reach - origin.component(k);
        double d = direction.component(k);
        if (d == 0) {
          if (low > 0 || high < 0) {
            return false;
          }
        } else {
          first = Math.max(first, Math.min(low / d, high / d));
          last = Math.min(last, Math.max(low / d, high / d));
        }
      }
      return first <= last;
    }

    /** By the distances of the line from the three edges, with signs. */
    private void test(int t) {
      Vector3 a = mesh.vertex(mesh.corner(t, 0)).minus(origin);
      Vector3 b = mesh.vertex(mesh.corner(t, 1)).minus(origin);
      Vector3 c = mesh.vertex(mesh.corner(t, 2)).minus(origin);
      Vector3 normal = b.minus(a).cross(c.minus(a));
      double through = direction.dot(normal);
      int side = through < 0 ? -1 : 1;
      double inside = Math.min(past(a, b, side), Math.min(past(b, c, side), past(c, a, side)));
      if (inside < -reach) {
        return;
      }
      if (inside <= reach || Math.abs(through) <= STEEP * normal.norm()) {
        doubtful = true;
        return;
      }
      hits.add(new Hit(a.dot(normal) / through, t));
    }

    /**
     * The distance of the line from that of an edge, positive on the triangle's side.
     *
     * @param side +1 where the line runs along the triangle's normal, else −1
     */
    private double past(Vector3 a, Vector3 b, int side) {
      Vector3 square = b.minus(a).cross(direction);
      double length = square.norm();
      // Seen along an edge the line is as far from it as from its end.
      return length > 0
          ? side * a.dot(square) / length
          : -a.minus(direction.times(a.dot(direction))).norm();
    }
  }
}
