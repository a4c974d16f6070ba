package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.hullsum.expression.Expression;
import org.hullsum.expression.IntervalEvaluator;
import org.hullsum.expression.Switches;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Box3;
import org.hullsum.numeric.Interval;

/** One thread's evaluator of a chart at points and over boxes of its unit square. */
final class ChartEnclosure {
  private static final int BOUNDS = 9;

  private final ChartEvaluator points;
  private final ChartEvaluator.Workspace pointWorkspace;
  private final IntervalEvaluator intervals;
  private final IntervalEvaluator.Workspace intervalWorkspace;
  private final Interval[] inputs = new Interval[2];
  private final Interval[] outputs;

  /**
   * What holds over a box of the unit square.
   *
   * @param position contains r
   * @param tangentU contains r_u, and its limits from both sides of a kink
   * @param tangentV the same of r_v
   * @param smooth whether it is proved that r does not jump there
   */
  record Result(Box3 position, Box3 tangentU, Box3 tangentV, boolean smooth) {}

  ChartEnclosure(ChartEvaluator points, IntervalEvaluator intervals) {
    this.points = points;
    this.pointWorkspace = points.workspace();
    this.intervals = intervals;
    this.intervalWorkspace = intervals.workspace();
    this.outputs = new Interval[intervals.outputCount()];
  }

  /** Positions, tangents, and the functions at whose zeros the positions may jump. */
  static IntervalEvaluator compile(Chart chart, Map<String, Double> parameters) {
    VectorExpression r = chart.position();
    VectorExpression ru = chart.tangentU();
    VectorExpression rv = chart.tangentV();
    List<Expression> formulas =
        new ArrayList<>(
            List.of(r.x(), r.y(), r.z(), ru.x(), ru.y(), ru.z(), rv.x(), rv.y(), rv.z()));
    for (Expression component : List.of(r.x(), r.y(), r.z())) {
      formulas.addAll(Switches.jumps(component));
    }
    return IntervalEvaluator.compile(List.of(Chart.U, Chart.V), parameters, formulas);
  }

  ChartPoint at(double u, double v) {
    return points.at(u, v, pointWorkspace);
  }

  Result over(Interval u, Interval v) {
    inputs[0] = u;
    inputs[1] = v;
    intervals.evaluate(inputs, outputs, intervalWorkspace);
    boolean smooth = true;
    for (int k = BOUNDS; k < outputs.length; k++) {
      smooth &= !outputs[k].contains(0);
    }
    return new Result(box(0), box(3), box(6), smooth);
  }

  private Box3 box(int first) {
    return new Box3(outputs[first], outputs[first + 1], outputs[first + 2]);
  }
}
