package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.hullsum.numeric.Vector3;

/**
 * Halves segments of a chart's unit square until their images stay within a tolerance of the curve.
 * For one thread.
 */
final class CurveRefiner {
  private static final int MOST_ROUNDS = 24;

  /** Where across a segment the curve is sought, to its left, relative to its length. */
  private static final double[] ACROSS = {
    -1, -0.7, -0.45, -0.25, -0.1, -0.03, 0.03, 0.1, 0.25, 0.45, 0.7, 1
  };

  private final int chart;
  private final ChartPositions positions;
  private final KeptRegion region;

  private final List<Node> nodes = new ArrayList<>();

  /** A point of a chain. */
  private static final class Node {
    private final double u;
    private final double v;
    private final Vector3 position;
    private int next;

    Node(double u, double v, Vector3 position, int next) {
      this.u = u;
      this.v = v;
      this.position = position;
      this.next = next;
    }
  }

  CurveRefiner(int chart, ChartPositions positions, KeptRegion region) {
    this.chart = chart;
    this.positions = positions;
    this.region = region;
  }

  /**
   * The images of the segments, refined.
   *
   * @param onTrim whether the segments are chords of the trim's curves; else they are exact
   */
  List<BoundaryPiece> refined(List<SquareSegment> segments, boolean onTrim, double tolerance) {
    nodes.clear();
    List<Integer> starts = new ArrayList<>();
    for (SquareSegment s : segments) {
      int end = add(s.endU(), s.endV(), -1);
      starts.add(add(s.startU(), s.startV(), end));
    }
    List<Integer> open = new ArrayList<>(starts);
    for (int round = 0; round < MOST_ROUNDS && !open.isEmpty(); round++) {
      open = halved(open, onTrim, tolerance);
    }
    List<BoundaryPiece> pieces = new ArrayList<>();
    for (int start : starts) {
      List<Vector3> points = new ArrayList<>();
      for (int at = start; at >= 0; at = nodes.get(at).next) {
        points.add(nodes.get(at).position);
      }
      pieces.add(new BoundaryPiece(points, chart));
    }
    return pieces;
  }

  private int add(double u, double v, int next) {
    double sideU = KeptRegion.onSide(u);
    double sideV = KeptRegion.onSide(v);
    nodes.add(new Node(sideU, sideV, position(sideU, sideV), next));
    return nodes.size() - 1;
  }

  /** The position; a little inside the square where the formula is undefined on a side. */
  private Vector3 position(double u, double v) {
    Vector3 position = positions.at(u, v);
    return position.isFinite() ? position : inset(u, v);
  }

  private Vector3 inset(double u, double v) {
    return positions.at(KeptRegion.inset(u), KeptRegion.inset(v));
  }

  /** Inserts the middles of segments that are too coarse; their halves. */
  private List<Integer> halved(List<Integer> open, boolean onTrim, double tolerance) {
    double[][] middle = new double[2][open.size()];
    for (int i = 0; i < open.size(); i++) {
      Node start = nodes.get(open.get(i));
      Node end = nodes.get(start.next);
      middle[0][i] = 0.5 * (start.u + end.u);
      middle[1][i] = 0.5 * (start.v + end.v);
    }
    boolean[] found = onTrim ? onCurve(open, middle) : all(open.size());
    Vector3[] there = positions.at(middle, open.size());
    List<Integer> coarse = new ArrayList<>();
    for (int i = 0; i < open.size(); i++) {
      if (!found[i]) {
        continue;
      }
      Node start = nodes.get(open.get(i));
      Node end = nodes.get(start.next);
      Vector3 position = there[i].isFinite() ? there[i] : inset(middle[0][i], middle[1][i]);
      if (distance(position, start.position, end.position) > tolerance) {
        nodes.add(new Node(middle[0][i], middle[1][i], position, start.next));
        start.next = nodes.size() - 1;
        coarse.add(open.get(i));
        coarse.add(start.next);
      }
    }
    return coarse;
  }

  private static boolean[] all(int count) {
    boolean[] all = new boolean[count];
    Arrays.fill(all, true);
    return all;
  }

  /** Distance of a point from a segment of a straight line. */
  private static double distance(Vector3 point, Vector3 start, Vector3 end) {
    Vector3 chord = end.minus(start);
    Vector3 offset = point.minus(start);
    double length = chord.dot(chord);
    double along = length > 0 ? Math.max(0, Math.min(1, offset.dot(chord) / length)) : 0;
    return offset.minus(chord.times(along)).norm();
  }

  /** Moves the middles across their segments onto the curve; tells which could be moved. */
  private boolean[] onCurve(List<Integer> open, double[][] middle) {
    int n = open.size();
    boolean[] found = new boolean[n];
    double[] nearest = new double[n];
    Arrays.fill(nearest, Double.POSITIVE_INFINITY);
    double[][] inside = new double[2][n];
    double[][] outside = new double[2][n];
    double[][] right = aside(open, middle, ACROSS[0]);
    boolean[] rightKept = region.kept(right[0], right[1]);
    for (int k = 1; k < ACROSS.length; k++) {
      double[][] left = aside(open, middle, ACROSS[k]);
      boolean[] leftKept = region.kept(left[0], left[1]);
      double away = Math.abs(ACROSS[k - 1] + ACROSS[k]);
      for (int i = 0; i < n; i++) {
        if (leftKept[i] && !rightKept[i] && away < nearest[i]) {
          found[i] = true;
          nearest[i] = away;
          for (int row = 0; row < 2; row++) {
            inside[row][i] = left[row][i];
            outside[row][i] = right[row][i];
          }
        }
      }
      right = left;
      rightKept = leftKept;
    }
    region.bisect(inside, outside);
    for (int i = 0; i < n; i++) {
      middle[0][i] = inside[0][i];
      middle[1][i] = inside[1][i];
    }
    return found;
  }

  /** Points to the left of the middles, by a part of each segment's length, within the square. */
  private double[][] aside(List<Integer> open, double[][] middle, double part) {
    double[][] moved = new double[2][open.size()];
    for (int i = 0; i < open.size(); i++) {
      Node start = nodes.get(open.get(i));
      Node end = nodes.get(start.next);
      moved[0][i] = KeptRegion.inset(middle[0][i] - part * (end.v - start.v));
      moved[1][i] = KeptRegion.inset(middle[1][i] + part * (end.u - start.u));
    }
    return moved;
  }
}
