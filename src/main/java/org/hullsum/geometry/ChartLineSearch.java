package org.hullsum.geometry;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import org.hullsum.geometry.Crossings.Doubt;
import org.hullsum.numeric.Vector3;

/** The search for the crossings of one line with one chart. */
final class ChartLineSearch {
  /** Most cells looked at. */
  private static final int MOST_CELLS = 2000;

  /** Cells down to this depth are kept for other lines. */
  private static final int KEPT_DEPTH = 14;

  /** Beyond this depth a cell's sides are rounding. */
  private static final int MOST_DEPTH = 90;

  private static final int MOST_STEPS = 20;

  /** ‖I − Y J‖ up to which a cell is taken as having at most one crossing. */
  private static final double CONTRACTION = 0.9;

  /** Half width of the box in which a crossing is proved, relative to the cell. */
  private static final double PROOF_BOX = 0.01;

  /** How far outside its cell a crossing may be and still be taken, relative to the cell. */
  private static final double BORDER = 0.001;

  /** Below this cosine with the normal a line is called nearly tangent. */
  private static final double TANGENT_COSINE = 1e-4;

  private final Line line;
  private final int chart;
  private final ChartEnclosure enclosure;
  private final TrimPoint trim;
  private final List<Crossing> crossings;
  private Optional<Doubt> doubt = Optional.empty();

  private enum Outcome {
    /** Nothing more to find in the cell. */
    SETTLED,
    /** The cell must be halved. */
    OPEN
  }

  ChartLineSearch(
      Line line, int chart, ChartEnclosure enclosure, TrimPoint trim, List<Crossing> crossings) {
    this.line = line;
    this.chart = chart;
    this.enclosure = enclosure;
    this.trim = trim;
    this.crossings = crossings;
  }

  /** Adds the crossings to the list; the first doubt, if there is one. */
  Optional<Doubt> run(ChartCell root) {
    Deque<ChartCell> open = new ArrayDeque<>();
    open.push(root);
    for (int visited = 0; !open.isEmpty(); visited++) {
      if (visited == MOST_CELLS) {
        raise(Doubt.WORK_LIMIT);
        break;
      }
      ChartCell cell = open.pop();
      if (!cell.mayTouch(line) || settle(cell) == Outcome.SETTLED) {
        continue;
      }
      if (cell.size() <= 2 * line.reach() || cell.depth() >= MOST_DEPTH) {
        raise(cell.touchesSide() ? Doubt.NEAR_SIDE : Doubt.NEARLY_TANGENT);
        continue;
      }
      ChartCell.Halves halves = cell.halves(enclosure, cell.depth() < KEPT_DEPTH);
      open.push(halves.second());
      open.push(halves.first());
    }
    return doubt;
  }

  private void raise(Doubt found) {
    if (doubt.isEmpty()) {
      doubt = Optional.of(found);
    }
  }

  private Outcome settle(ChartCell cell) {
    if (!cell.smooth()) {
      return Outcome.OPEN;
    }
    Optional<Projection> middle = Projection.of(cell.middle(), line);
    if (middle.isEmpty() || !(contraction(cell, middle.get()) <= CONTRACTION)) {
      return Outcome.OPEN;
    }
    return newton(cell, middle.get());
  }

  /** The largest ‖I − Y J‖ over the cell, in the norm of its half widths. */
  private double contraction(ChartCell cell, Projection y) {
    double ratio = cell.halfV() / cell.halfU();
    double uu = entry(cell.tangentU(), y.uByA(), y.uByB(), 1);
    double uv = entry(cell.tangentV(), y.uByA(), y.uByB(), 0);
    double vu = entry(cell.tangentU(), y.vByA(), y.vByB(), 0);
    double vv = entry(cell.tangentV(), y.vByA(), y.vByB(), 1);
    return Math.max(uu + uv * ratio, vu / ratio + vv);
  }

  private double entry(ChartCell.Ball tangent, double byA, double byB, double unit) {
    Vector3 w = line.a().times(byA).plus(line.b().times(byB));
    return Math.abs(unit - w.dot(tangent.centre())) + tangent.radiusAlong(w);
  }

  private Outcome newton(ChartCell cell, Projection inverse) {
    double u = cell.middleU();
    double v = cell.middleV();
    ChartPoint at = cell.middle();
    for (int step = 0; step < MOST_STEPS; step++) {
      Optional<Projection> here = Projection.of(at, line);
      if (here.isEmpty()) {
        return Outcome.OPEN;
      }
      double nextU = clamped(u + here.get().stepU(), cell.middleU(), cell.halfU());
      double nextV = clamped(v + here.get().stepV(), cell.middleV(), cell.halfV());
      boolean still = Math.abs(nextU - u) <= Math.ulp(1.0) && Math.abs(nextV - v) <= Math.ulp(1.0);
      u = nextU;
      v = nextV;
      if (still) {
        break;
      }
      at = enclosure.at(u, v);
    }
    return judge(cell, inverse, u, v, at);
  }

  private static double clamped(double value, double middle, double half) {
    return Math.max(middle - half, Math.min(middle + half, value));
  }

  /** What the point at which Newton's method stopped says of the cell. */
  private Outcome judge(ChartCell cell, Projection inverse, double u, double v, ChartPoint at) {
    Vector3 offset = at.position().minus(line.origin());
    double missA = line.a().dot(offset);
    double missB = line.b().dot(offset);
    if (!(Math.max(Math.abs(missA), Math.abs(missB)) <= line.reach())) {
      return Outcome.OPEN;
    }
    if (at.sideDistance(u, v) <= 4 * line.reach()) {
      raise(Doubt.NEAR_SIDE);
      take(u, v, at, true);
      return Outcome.SETTLED;
    }
    if (Math.abs(u - cell.u().middle()) > (1 + BORDER) * 0.5 * cell.u().width()
        || Math.abs(v - cell.v().middle()) > (1 + BORDER) * 0.5 * cell.v().width()) {
      return Outcome.SETTLED;
    }
    double box = (1 - CONTRACTION) * proofBox(cell, u, v);
    double offU = Math.abs(inverse.uByA() * missA + inverse.uByB() * missB);
    double offV = Math.abs(inverse.vByA() * missA + inverse.vByB() * missB);
    if (!(offU <= box * cell.halfU() && offV <= box * cell.halfV())) {
      return Outcome.OPEN;
    }
    take(u, v, at, false);
    return Outcome.SETTLED;
  }

  /** Half width, relative to the cell's, of a box about the point that stays in the square. */
  private static double proofBox(ChartCell cell, double u, double v) {
    double inU = Math.min(u, 1 - u) / cell.halfU();
    double inV = Math.min(v, 1 - v) / cell.halfV();
    return Math.min(PROOF_BOX, Math.min(inU, inV));
  }

  private void take(double u, double v, ChartPoint at, boolean nearSide) {
    TrimPoint.Standing standing = trim.at(u, v, at, 4 * line.reach());
    if (standing == TrimPoint.Standing.CUT_AWAY) {
      return;
    }
    double t = line.parameter(at.position());
    if (crossings.stream().anyMatch(other -> isSame(other, t, u, v))) {
      return;
    }
    boolean nearTrim = standing == TrimPoint.Standing.NEAR_CURVE;
    if (nearTrim) {
      raise(Doubt.NEAR_TRIM);
    }
    Vector3 n = at.areaVector();
    double cosine = line.direction().dot(n) / (line.direction().norm() * n.norm());
    if (!(Math.abs(cosine) >= TANGENT_COSINE)) {
      raise(Doubt.NEARLY_TANGENT);
    }
    crossings.add(
        new Crossing(t, chart, u, v, Double.isNaN(cosine) ? 0 : cosine, nearSide || nearTrim));
  }

  /** Whether a crossing was found already from a neighbouring cell. */
  private boolean isSame(Crossing other, double t, double u, double v) {
    return other.chart() == chart
        && Math.abs(other.t() - t) * line.direction().norm() <= line.reach()
        && Math.abs(other.u() - u) <= LineCrossings.REACH
        && Math.abs(other.v() - v) <= LineCrossings.REACH;
  }
}
