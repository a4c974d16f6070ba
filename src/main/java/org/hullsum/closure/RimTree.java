package org.hullsum.closure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.hullsum.numeric.Vector3;

/** Finds the places of many rims that are near a point: a tree of boxes around their pieces. */
final class RimTree {
  /** Neighbouring pieces of a rim that are one entry. */
  private static final int RUN = 16;

  /** Entries that a leaf holds at most. */
  private static final int LEAF = 2;

  /** How far a piece may leave its chord, relative to the chord: it turns little between points. */
  private static final double SAG = 0.3;

  private final List<Rim> rims;
  private final List<Entry> entries = new ArrayList<>();
  private final Node root;

  /** A place on a rim near a point that was asked for. */
  record Hit(int rim, double parameter, double distance) {}

  private record Entry(int rim, int from, int to, Vector3 middle, double reach) {}

  private static final class Node {
    private final double[] box;
    private final int from;
    private final int to;
    private final Node left;
    private final Node right;

    Node(double[] box, int from, int to, Node left, Node right) {
      this.box = box;
      this.from = from;
      this.to = to;
      this.left = left;
      this.right = right;
    }

    double distance(Vector3 p) {
      double sum = 0;
      for (int k = 0; k < 3; k++) {
        double x = p.component(k);
        double outside = Math.max(0, Math.max(box[k] - x, x - box[3 + k]));
        sum += outside * outside;
      }
      return Math.sqrt(sum);
    }
  }

  RimTree(List<Rim> rims) {
    this.rims = List.copyOf(rims);
    for (int r = 0; r < rims.size(); r++) {
      Rim rim = rims.get(r);
      for (int k = 0; k < rim.pieceCount(); k += RUN) {
        entries.add(entry(r, rim, k, Math.min(k + RUN, rim.pieceCount())));
      }
    }
    this.root = node(0, entries.size());
  }

  /** A ball around a run of pieces. */
  private static Entry entry(int index, Rim rim, int from, int to) {
    Vector3 middle = rim.point((from + to) / 2);
    double reach = 0;
    for (int k = from; k < to; k++) {
      Vector3 a = rim.point(k);
      double chord = rim.point(k + 1).minus(a).norm();
      reach = Math.max(reach, a.minus(middle).norm() + (1 + SAG) * chord);
    }
    return new Entry(index, from, to, middle, reach);
  }

  private Node node(int from, int to) {
    double[] box = new double[6];
    Arrays.fill(box, 0, 3, Double.POSITIVE_INFINITY);
    Arrays.fill(box, 3, 6, Double.NEGATIVE_INFINITY);
    for (Entry entry : entries.subList(from, to)) {
      for (int k = 0; k < 3; k++) {
        box[k] = Math.min(box[k], entry.middle().component(k) - entry.reach());
        box[3 + k] = Math.max(box[3 + k], entry.middle().component(k) + entry.reach());
      }
    }
    if (to - from <= LEAF) {
      return new Node(box, from, to, null, null);
    }
    int widest = 0;
    for (int k = 1; k < 3; k++) {
      widest = box[3 + k] - box[k] > box[3 + widest] - box[widest] ? k : widest;
    }
    int axis = widest;
    entries
        .subList(from, to)
        .sort((a, b) -> Double.compare(a.middle().component(axis), b.middle().component(axis)));
    int middle = (from + to) >>> 1;
    return new Node(box, from, to, node(from, middle), node(middle, to));
  }

  /**
   * The places within a distance of a point, each stretch of a rim once, with its nearest point.
   */
  List<Hit> near(Vector3 p, double distance) {
    List<Hit> hits = new ArrayList<>();
    if (!entries.isEmpty()) {
      collect(root, p, distance, hits);
    }
    hits.sort(
        (a, b) ->
            a.rim() == b.rim()
                ? Double.compare(a.parameter(), b.parameter())
                : Integer.compare(a.rim(), b.rim()));
    return merged(hits, distance);
  }

  private void collect(Node node, Vector3 p, double distance, List<Hit> hits) {
    if (node.distance(p) > distance) {
      return;
    }
    if (node.left != null) {
      collect(node.left, p, distance, hits);
      collect(node.right, p, distance, hits);
      return;
    }
    for (Entry entry : entries.subList(node.from, node.to)) {
      if (entry.middle().minus(p).norm() <= entry.reach() + distance) {
        for (int k = entry.from(); k < entry.to(); k++) {
          collect(entry.rim(), k, p, distance, hits);
        }
      }
    }
  }

  private void collect(int index, int piece, Vector3 p, double distance, List<Hit> hits) {
    Rim rim = rims.get(index);
    double chord = rim.point(piece + 1).minus(rim.point(piece)).norm();
    if (rim.point(piece).minus(p).norm() > (1 + SAG) * chord + distance) {
      return;
    }
    double s = rim.nearest(p, piece);
    double away = rim.distance(p, piece, s);
    if (away <= distance) {
      hits.add(new Hit(index, s, away));
    }
  }

  /** Neighbouring pieces that meet within the distance give one hit. */
  private List<Hit> merged(List<Hit> hits, double distance) {
    List<Hit> merged = new ArrayList<>();
    for (Hit hit : hits) {
      int same = -1;
      for (int i = 0; i < merged.size(); i++) {
        if (merged.get(i).rim() == hit.rim()
            && apart(rims.get(hit.rim()), merged.get(i).parameter(), hit.parameter())
                <= 4 * distance) {
          same = i;
        }
      }
      if (same < 0) {
        merged.add(hit);
      } else if (hit.distance() < merged.get(same).distance()) {
        merged.set(same, hit);
      }
    }
    return merged;
  }

  /** The way along a rim between two parameters. */
  static double apart(Rim rim, double a, double b) {
    double way = Math.abs(a - b);
    return rim.closed() ? Math.min(way, rim.length() - way) : way;
  }
}
