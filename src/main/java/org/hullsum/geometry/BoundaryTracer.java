package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.geometry.Chart.Side;

/** Traces what one chart contributes to the boundary. For one thread. */
final class BoundaryTracer {
  /** Fixed stretches into which every side is divided first. */
  private static final int STRETCHES = 16;

  private final Chart chart;
  private final KeptRegion region;
  private final CurveRefiner refiner;
  private final List<SquareSegment> curves;
  private final int nodes;

  BoundaryTracer(
      int index, Chart chart, Optional<Expression> condition, Map<String, Double> parameters) {
    this.chart = chart;
    this.region = new KeptRegion(condition, parameters);
    this.refiner = new CurveRefiner(index, ChartPositions.of(chart, parameters), region);
    if (region.isTrimmed()) {
      TrimContour contour = new TrimContour(region);
      this.curves = contour.segments();
      this.nodes = Math.max(STRETCHES, contour.cellsPerSide());
    } else {
      this.curves = List.of();
      this.nodes = STRETCHES;
    }
  }

  /** The kept parts of the sides that are rims. */
  List<BoundaryPiece> rim(double tolerance) {
    return sides(true, tolerance);
  }

  /** The kept parts of the other sides, each boundary only if its partner is not kept. */
  List<BoundaryPiece> gluedSides(double tolerance) {
    return sides(false, tolerance);
  }

  /** The curves along which the trim cuts. */
  List<BoundaryPiece> trimCurves(double tolerance) {
    return refiner.refined(curves, true, tolerance);
  }

  private List<BoundaryPiece> sides(boolean rim, double tolerance) {
    List<SquareSegment> segments = new ArrayList<>();
    for (Side side : Side.values()) {
      if (chart.rim().contains(side) == rim) {
        addKept(side, segments);
      }
    }
    return refiner.refined(segments, false, tolerance);
  }

  /** Point of a side, which is run through with the square on its left. */
  private static double[] at(Side side, double along) {
    return switch (side) {
      case V_START -> new double[] {along, 0};
      case U_END -> new double[] {1, along};
      case V_END -> new double[] {1 - along, 1};
      case U_START -> new double[] {0, 1 - along};
    };
  }

  private void addKept(Side side, List<SquareSegment> segments) {
    double[] u = new double[nodes + 1];
    double[] v = new double[nodes + 1];
    for (int k = 0; k <= nodes; k++) {
      double[] point = at(side, (double) k / nodes);
      u[k] = point[0];
      v[k] = point[1];
    }
    boolean[] kept = region.kept(u, v);
    int stretch = nodes / STRETCHES;
    Optional<double[]> start = kept[0] ? Optional.of(at(side, 0)) : Optional.empty();
    for (int k = 1; k <= nodes; k++) {
      if (kept[k - 1] != kept[k]) {
        double[] change = change(u, v, k, kept[k]);
        start.ifPresent(from -> segments.add(segment(from, change)));
        start = kept[k] ? Optional.of(change) : Optional.empty();
      }
      if (kept[k] && k % stretch == 0) {
        double[] node = {u[k], v[k]};
        start.ifPresent(from -> segments.add(segment(from, node)));
        start = Optional.of(node);
      }
    }
  }

  private static SquareSegment segment(double[] from, double[] to) {
    return new SquareSegment(from[0], from[1], to[0], to[1]);
  }

  /** Where on a side the condition changes between two nodes. */
  private double[] change(double[] u, double[] v, int k, boolean later) {
    double[][] first = {{u[k - 1]}, {v[k - 1]}};
    double[][] second = {{u[k]}, {v[k]}};
    region.bisect(later ? second : first, later ? first : second);
    return new double[] {first[0][0], first[1][0]};
  }
}
