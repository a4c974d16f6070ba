package org.hullsum.geometry;

import java.util.Map;
import org.hullsum.expression.IntervalEvaluator;
import org.hullsum.numeric.Interval;

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
}
