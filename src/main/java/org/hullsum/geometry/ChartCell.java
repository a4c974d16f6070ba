package org.hullsum.geometry;

import org.hullsum.numeric.Box3;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;

/**
 * A cell of a chart's unit square with what is proved of the chart over it and a little beyond it.
 *
 * <p>Two neighbouring cells overlap by {@link #OVERLAP} of their width, so that a crossing on their
 * common border lies well within one of them. Nothing reaches beyond the unit square.
 *
 * <p>Immutable but for the children, which are made when first asked for and are the same whoever
 * makes them.
 */
final class ChartCell {
  /** How far the enclosures reach beyond the cell, as a part of its half width. */
  static final double OVERLAP = 0.1;

  private final int depth;
  private final Interval u;
  private final Interval v;

  /** Middle of the region of the enclosures, and its half widths. */
  private final double middleU;

  private final double middleV;
  private final double halfU;
  private final double halfV;

  private final ChartPoint middle;
  private final Ball position;
  private final Ball tangentU;
  private final Ball tangentV;
  private final boolean smooth;

  private volatile Halves children;

  /** The two parts of a cell. */
  record Halves(ChartCell first, ChartCell second) {}

  /**
   * An axis-parallel box as its centre and half widths.
   *
   * @param centre its middle
   * @param radius its half widths, infinite where nothing is known
   */
  record Ball(Vector3 centre, Vector3 radius) {
    static Ball of(Box3 box) {
      return new Ball(
          new Vector3(middle(box.x()), middle(box.y()), middle(box.z())),
          new Vector3(radius(box.x()), radius(box.y()), radius(box.z())));
    }

    private static double middle(Interval i) {
      double middle = i.middle();
      return Double.isFinite(middle) ? middle : 0;
    }

    private static double radius(Interval i) {
      double middle = middle(i);
      return Math.nextUp(Math.max(i.high() - middle, middle - i.low()));
    }

    /** Radius of the product with a fixed vector. */
    double radiusAlong(Vector3 w) {
      return Math.abs(w.x()) * radius.x()
          + Math.abs(w.y()) * radius.y()
          + Math.abs(w.z()) * radius.z();
    }

    /** An upper bound of the length of a member. */
    double magnitude() {
      return centre.norm() + radius.norm();
    }
  }

  ChartCell(int depth, Interval u, Interval v, ChartEnclosure enclosure) {
    this.depth = depth;
    this.u = u;
    this.v = v;
    Interval wideU = widened(u);
    Interval wideV = widened(v);
    this.middleU = wideU.middle();
    this.middleV = wideV.middle();
    this.halfU = Math.max(wideU.high() - middleU, middleU - wideU.low());
    this.halfV = Math.max(wideV.high() - middleV, middleV - wideV.low());
    this.middle = enclosure.at(middleU, middleV);
    ChartEnclosure.Result result = enclosure.over(wideU, wideV);
    this.tangentU = Ball.of(result.tangentU());
    this.tangentV = Ball.of(result.tangentV());
    this.smooth =
        result.smooth()
            && Double.isFinite(tangentU.magnitude())
            && Double.isFinite(tangentV.magnitude())
            && middle.position().isFinite();
    this.position = Ball.of(result.position());
  }

  private static Interval widened(Interval i) {
    double more = OVERLAP * 0.5 * i.width();
    return new Interval(Math.max(0, i.low() - more), Math.min(1, i.high() + more));
  }

  int depth() {
    return depth;
  }

  Interval u() {
    return u;
  }

  Interval v() {
    return v;
  }

  double middleU() {
    return middleU;
  }

  double middleV() {
    return middleV;
  }

  double halfU() {
    return halfU;
  }

  double halfV() {
    return halfV;
  }

  ChartPoint middle() {
    return middle;
  }

  Ball tangentU() {
    return tangentU;
  }

  Ball tangentV() {
    return tangentV;
  }

  /** Whether the tangents are enclosed, so that the mean value theorem holds over the cell. */
  boolean smooth() {
    return smooth;
  }

  /** An upper bound of the size of the piece of surface. */
  double size() {
    double box = 2 * position.radius().norm();
    return smooth
        ? Math.min(box, 2 * (halfU * tangentU.magnitude() + halfV * tangentV.magnitude()))
        : box;
  }

  /** Whether the cell reaches a side of the unit square. */
  boolean touchesSide() {
    return u.low() == 0 || u.high() == 1 || v.low() == 0 || v.high() == 1;
  }

  /** False only if it is proved that the line stays farther than its reach from the cell. */
  boolean mayTouch(Line line) {
    Vector3 offset = position.centre().minus(line.origin());
    if (Math.abs(line.a().dot(offset)) > position.radiusAlong(line.a()) + line.reach()
        || Math.abs(line.b().dot(offset)) > position.radiusAlong(line.b()) + line.reach()) {
      return false;
    }
    return !smooth || mayTouchLinearly(line);
  }

  /**
   * Projects along the line and separates the origin from the parallelogram that the tangents span,
   * along the two normals of its sides.
   */
  private boolean mayTouchLinearly(Line line) {
    Vector3 along = line.a();
    Vector3 across = line.b();
    Vector3 offset = middle.position().minus(line.origin());
    double fa = along.dot(offset);
    double fb = across.dot(offset);
    double ua = along.dot(middle.tangentU());
    double ub = across.dot(middle.tangentU());
    double va = along.dot(middle.tangentV());
    double vb = across.dot(middle.tangentV());
    return withinStrip(vb, -va, fa, fb, line) && withinStrip(ub, -ua, fa, fb, line);
  }

  private boolean withinStrip(double wa, double wb, double fa, double fb, Line line) {
    double value = Math.abs(wa * fa + wb * fb);
    double bound =
        halfU * extent(tangentU, wa, wb, line)
            + halfV * extent(tangentV, wa, wb, line)
            + (Math.abs(wa) + Math.abs(wb)) * line.reach();
    return !(value > bound);
  }

  /** Largest absolute product of a tangent's projection with (wa, wb). */
  private static double extent(Ball tangent, double wa, double wb, Line line) {
    Vector3 w = line.a().times(wa).plus(line.b().times(wb));
    return Math.abs(w.dot(tangent.centre())) + tangent.radiusAlong(w);
  }

  /** The two halves across the longer direction; kept for later if asked to. */
  Halves halves(ChartEnclosure enclosure, boolean keep) {
    Halves known = children;
    if (known == null) {
      known = split(enclosure);
      if (keep) {
        children = known;
      }
    }
    return known;
  }

  private Halves split(ChartEnclosure enclosure) {
    double lengthU = tangentU.magnitude() * u.width();
    double lengthV = tangentV.magnitude() * v.width();
    boolean alongU = lengthU == lengthV ? u.width() >= v.width() : lengthU > lengthV;
    if (alongU) {
      double at = u.middle();
      return new Halves(
          new ChartCell(depth + 1, new Interval(u.low(), at), v, enclosure),
          new ChartCell(depth + 1, new Interval(at, u.high()), v, enclosure));
    }
    double at = v.middle();
    return new Halves(
        new ChartCell(depth + 1, u, new Interval(v.low(), at), enclosure),
        new ChartCell(depth + 1, u, new Interval(at, v.high()), enclosure));
  }
}
