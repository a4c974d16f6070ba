package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.hullsum.geometry.ChartTrianglesBuilder.Node;
import org.hullsum.geometry.SurfaceTriangles.Border;
import org.hullsum.numeric.Vector3;

/**
 * Cuts the triangles of a chart along its trim: each side between a kept and a cut-away corner
 * where bisection finds the change. One use.
 */
final class TriangleCutBuilder {
  /** Largest distance of a border from its chord, over that at the chord's middle. */
  private static final double SAFETY = 2;

  private final ChartPositions positions;
  private final KeptRegion region;
  private final List<Fan> doubtful = new ArrayList<>();
  private final Map<Corner, Integer> places = new LinkedHashMap<>();
  private final List<int[]> triangles = new ArrayList<>();
  private final List<int[]> sides = new ArrayList<>();
  private final List<int[]> contours = new ArrayList<>();

  /** Cells that nothing shows to be kept or cut away as a whole: the opposite corners. */
  private final List<int[]> unproved = new ArrayList<>();

  /** A polygon divided about its middle, perhaps only partly kept. */
  private record Fan(Node middle, List<Node> round) {}

  /** A grid point where both are the same, else the change between a kept point and another. */
  private record Corner(Node kept, Node cut) {}

  TriangleCutBuilder(ChartPositions positions, KeptRegion region) {
    this.positions = positions;
    this.region = region;
  }

  /**
   * Adds the triangles between the middle and each side of a polygon.
   *
   * @param round in a left turn in u and v
   * @param kept whether all of it is known to be kept
   */
  void fan(Node middle, List<Node> round, boolean kept) {
    if (!kept) {
      doubtful.add(new Fan(middle, round));
      return;
    }
    for (int k = 0; k < round.size(); k++) {
      Node a = round.get(k);
      Node b = round.get((k + 1) % round.size());
      triangles.add(new int[] {place(middle), place(a), place(b)});
      if (a.isAlongSide(b)) {
        sides.add(new int[] {place(a), place(b)});
      }
    }
  }

  private int place(Node node) {
    return place(node, node);
  }

  private int place(Node kept, Node cut) {
    Corner corner = new Corner(kept, cut);
    Integer known = places.putIfAbsent(corner, places.size());
    return known == null ? places.size() - 1 : known;
  }

  SurfaceTriangles build(double deviation) {
    Map<Node, Boolean> kept = keptOfDoubtful();
    for (Fan fan : doubtful) {
      int size = fan.round().size();
      boolean first = kept.get(fan.middle());
      if (fan.round().stream().allMatch(n -> kept.get(n) == first)) {
        unproved.add(new int[] {place(fan.round().get(0)), place(fan.round().get(size / 2))});
      }
      for (int k = 0; k < size; k++) {
        Node[] triangle = {fan.middle(), fan.round().get(k), fan.round().get((k + 1) % size)};
        cut(triangle, kept);
      }
    }
    double[][] uv = located();
    Vector3[] r = positions.at(uv, uv[0].length);
    List<Vector3> corners = new ArrayList<>();
    for (int[] t : triangles) {
      if (r[t[0]].isFinite() && r[t[1]].isFinite() && r[t[2]].isFinite()) {
        corners.addAll(List.of(r[t[0]], r[t[1]], r[t[2]]));
      }
    }
    return new SurfaceTriangles(corners, borders(uv, r), deviation);
  }

  private Map<Node, Boolean> keptOfDoubtful() {
    Set<Node> looked = new LinkedHashSet<>();
    for (Fan fan : doubtful) {
      looked.add(fan.middle());
      looked.addAll(fan.round());
    }
    double[] u = looked.stream().mapToDouble(Node::u).toArray();
    double[] v = looked.stream().mapToDouble(Node::v).toArray();
    boolean[] is = region.kept(u, v);
    Map<Node, Boolean> kept = new HashMap<>();
    for (Node node : looked) {
      kept.put(node, is[kept.size()]);
    }
    return kept;
  }

  /** Adds what is kept of a triangle, a triangle or a quadrangle. */
  private void cut(Node[] t, Map<Node, Boolean> kept) {
    List<Integer> polygon = new ArrayList<>();
    List<Integer> changes = new ArrayList<>();
    for (int k = 0; k < t.length; k++) {
      Node a = t[k];
      Node b = t[(k + 1) % t.length];
      if (kept.get(a)) {
        polygon.add(place(a));
      }
      if (!kept.get(a).equals(kept.get(b))) {
        int change = kept.get(a) ? place(a, b) : place(b, a);
        polygon.add(change);
        changes.add(change);
      }
    }
    for (int k = 2; k < polygon.size(); k++) {
      triangles.add(new int[] {polygon.get(0), polygon.get(k - 1), polygon.get(k)});
    }
    if (changes.size() == 2) {
      contours.add(new int[] {changes.get(0), changes.get(1)});
    }
    boolean some = kept.get(t[1]) || kept.get(t[2]);
    if (some && t[1].isAlongSide(t[2])) {
      int from = kept.get(t[1]) ? place(t[1]) : place(t[2], t[1]);
      int to = kept.get(t[2]) ? place(t[2]) : place(t[1], t[2]);
      sides.add(new int[] {from, to});
    }
  }

  private double[][] located() {
    int count = places.size();
    double[][] inside = new double[2][count];
    double[][] outside = new double[2][count];
    places.forEach(
        (corner, k) -> {
          inside[0][k] = corner.kept().u();
          inside[1][k] = corner.kept().v();
          outside[0][k] = corner.cut().u();
          outside[1][k] = corner.cut().v();
        });
    if (region.isTrimmed()) {
      region.bisect(inside, outside);
    }
    return inside;
  }

  private List<Border> borders(double[][] uv, Vector3[] r) {
    List<Border> borders = new ArrayList<>();
    Vector3[] alongSides = middles(uv, sides);
    for (int k = 0; k < sides.size(); k++) {
      add(r[sides.get(k)[0]], r[sides.get(k)[1]], alongSides[k], borders);
    }
    Vector3[] onContours = onContours(uv);
    for (int k = 0; k < contours.size(); k++) {
      add(r[contours.get(k)[0]], r[contours.get(k)[1]], onContours[k], borders);
    }
    for (int[] cell : unproved) {
      Vector3 from = r[cell[0]];
      Vector3 to = r[cell[1]];
      if (from.isFinite() && to.isFinite()) {
        borders.add(new Border(from, to, to.minus(from).norm()));
      }
    }
    return borders;
  }

  /** Where the middle is not finite the border may be as far off as the piece is long. */
  private static void add(Vector3 from, Vector3 to, Vector3 middle, List<Border> borders) {
    if (from.isFinite() && to.isFinite()) {
      double measured = SAFETY * from.plus(to).times(0.5).minus(middle).norm();
      double length = to.minus(from).norm();
      borders.add(new Border(from, to, middle.isFinite() ? measured : length));
    }
  }

  private Vector3[] middles(double[][] uv, List<int[]> pairs) {
    double[][] at = new double[2][pairs.size()];
    for (int k = 0; k < pairs.size(); k++) {
      for (int row = 0; row < 2; row++) {
        at[row][k] = 0.5 * (uv[row][pairs.get(k)[0]] + uv[row][pairs.get(k)[1]]);
      }
    }
    return positions.at(at, pairs.size());
  }

  /**
   * The points of the trim's curves beside the middles of the pieces that follow them; not finite
   * where there is none within half a piece.
   */
  private Vector3[] onContours(double[][] uv) {
    int count = contours.size();
    double[][] inside = new double[2][count];
    double[][] outside = new double[2][count];
    for (int k = 0; k < count; k++) {
      int a = contours.get(k)[0];
      int b = contours.get(k)[1];
      double du = 0.5 * (uv[0][b] - uv[0][a]);
      double dv = 0.5 * (uv[1][b] - uv[1][a]);
      double u = uv[0][a] + du;
      double v = uv[1][a] + dv;
      inside[0][k] = u - dv;
      inside[1][k] = v + du;
      outside[0][k] = u + dv;
      outside[1][k] = v - du;
    }
    boolean[] first = region.kept(inside[0], inside[1]);
    boolean[] second = region.kept(outside[0], outside[1]);
    for (int k = 0; k < count; k++) {
      for (int row = 0; row < 2 && second[k]; row++) {
        double swapped = inside[row][k];
        inside[row][k] = outside[row][k];
        outside[row][k] = swapped;
      }
    }
    region.bisect(inside, outside);
    for (int k = 0; k < count; k++) {
      inside[0][k] = first[k] == second[k] ? Double.NaN : inside[0][k];
    }
    return positions.at(inside, count);
  }
}
