package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.hullsum.expression.IntervalEvaluator;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;

/** A chart compiled for enclosures, with its tree of cells. Thread-safe. */
final class ChartCells {
  private final ChartEvaluator points;
  private final IntervalEvaluator intervals;
  private final TrimPoint.Compiled trim;
  private final ChartCell root;

  private ChartCells(ChartEvaluator points, IntervalEvaluator intervals, TrimPoint.Compiled trim) {
    this.points = points;
    this.intervals = intervals;
    this.trim = trim;
    this.root = new ChartCell(0, Interval.UNIT, Interval.UNIT, enclosure());
  }

  static ChartCells of(Surface surface, Chart chart, Map<String, Double> parameters) {
    return new ChartCells(
        ChartEvaluator.of(chart, parameters),
        ChartEnclosure.compile(chart, parameters),
        TrimPoint.compile(surface, chart, parameters));
  }

  ChartCell root() {
    return root;
  }

  ChartEnclosure enclosure() {
    return new ChartEnclosure(points, intervals);
  }

  TrimPoint trimPoint() {
    return new TrimPoint(trim);
  }

  List<Vector3> positions(double[][] at) {
    double[][] r = new double[3][at[0].length];
    points.positions(at, at[0].length, r, points.workspace());
    List<Vector3> positions = new ArrayList<>();
    for (int i = 0; i < at[0].length; i++) {
      positions.add(new Vector3(r[0][i], r[1][i], r[2][i]));
    }
    return positions;
  }
}
