package org.hullsum.geometry;

import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.Expression;
import org.hullsum.expression.IntervalEvaluator;
import org.hullsum.numeric.Interval;

/** The part of a chart's unit square that a trim keeps. For one thread. */
final class KeptRegion {
  /**
   * How far inside the square its sides are looked at: on a side that lies in a face of a body
   * rounding would decide.
   */
  static final double INSET = 1e-9;

  /** Bisections until a point is as near as rounding lets it. */
  private static final int BISECTIONS = 52;

  private final Optional<Compiled> compiled;

  private record Compiled(
      BatchEvaluator points,
      BatchEvaluator.Workspace workspace,
      IntervalEvaluator intervals,
      IntervalEvaluator.Workspace intervalWorkspace) {}

  /** What is known of a condition over a box. */
  enum Knowledge {
    KEPT,
    CUT_AWAY,
    UNDECIDED
  }

  KeptRegion(Optional<Expression> condition, Map<String, Double> parameters) {
    List<String> variables = List.of(Chart.U, Chart.V);
    this.compiled =
        condition.map(
            c -> {
              BatchEvaluator points = BatchEvaluator.compile(variables, parameters, List.of(c));
              IntervalEvaluator intervals =
                  IntervalEvaluator.compile(variables, parameters, List.of(c));
              return new Compiled(points, points.workspace(), intervals, intervals.workspace());
            });
  }

  boolean isTrimmed() {
    return compiled.isPresent();
  }

  static double inset(double coordinate) {
    return Math.max(INSET, Math.min(1 - INSET, coordinate));
  }

  /** A coordinate on the inset border put back on the side of the square. */
  static double onSide(double coordinate) {
    if (coordinate <= INSET) {
      return 0;
    }
    return coordinate >= 1 - INSET ? 1 : coordinate;
  }

  /** Whether each point is kept, coordinates on the sides being looked at a little inside. */
  boolean[] kept(double[] u, double[] v) {
    boolean[] kept = new boolean[u.length];
    if (compiled.isEmpty()) {
      Arrays.fill(kept, true);
      return kept;
    }
    double[][] at = new double[2][u.length];
    for (int i = 0; i < u.length; i++) {
      at[0][i] = inset(u[i]);
      at[1][i] = inset(v[i]);
    }
    double[][] values = new double[1][u.length];
    Compiled c = compiled.get();
    c.points().evaluate(at, u.length, values, c.workspace());
    for (int i = 0; i < u.length; i++) {
      kept[i] = values[0][i] != 0 && !Double.isNaN(values[0][i]);
    }
    return kept;
  }

  Knowledge over(Interval u, Interval v) {
    if (compiled.isEmpty()) {
      return Knowledge.KEPT;
    }
    Compiled c = compiled.get();
    double[] low = {u.low(), v.low()};
    double[] high = {u.high(), v.high()};
    c.intervals().evaluate(low, high, c.intervalWorkspace());
    if (c.intervalWorkspace().low(0) > 0) {
      return Knowledge.KEPT;
    }
    return c.intervalWorkspace().high(0) <= 0 ? Knowledge.CUT_AWAY : Knowledge.UNDECIDED;
  }

  /**
   * Moves each first point, which is kept, and each second, which is not, together along their line
   * until they meet; both arrays of points then hold the place of the change.
   *
   * @param inside rows u and v of the kept points, changed
   * @param outside rows u and v of the others, changed
   */
  void bisect(double[][] inside, double[][] outside) {
    int count = inside[0].length;
    double[] u = new double[count];
    double[] v = new double[count];
    for (int step = 0; step < BISECTIONS; step++) {
      for (int i = 0; i < count; i++) {
        u[i] = 0.5 * (inside[0][i] + outside[0][i]);
        v[i] = 0.5 * (inside[1][i] + outside[1][i]);
      }
      boolean[] kept = kept(u, v);
      for (int i = 0; i < count; i++) {
        double[][] moved = kept[i] ? inside : outside;
        moved[0][i] = u[i];
        moved[1][i] = v[i];
      }
    }
  }
}
