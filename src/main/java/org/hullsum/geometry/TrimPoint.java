package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.Derivative;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Switches;
import org.hullsum.numeric.Vector3;

/** One thread's evaluator of the trim at points of a chart. */
final class TrimPoint {
  private final Compiled compiled;
  private final Optional<BatchEvaluator.Workspace> workspace;
  private final double[][] point = new double[2][1];
  private final double[][] values;

  /**
   * The condition, then each function at whose zeros it may change, with its derivatives by u and
   * v.
   *
   * @param evaluator empty where nothing is trimmed
   */
  record Compiled(Optional<BatchEvaluator> evaluator) {}

  /** How a point stands to the trim. */
  enum Standing {
    KEPT,
    CUT_AWAY,
    /** Within reach of a curve on which a condition changes. */
    NEAR_CURVE
  }

  TrimPoint(Compiled compiled) {
    this.compiled = compiled;
    this.workspace = compiled.evaluator().map(BatchEvaluator::workspace);
    this.values = new double[compiled.evaluator().map(BatchEvaluator::outputCount).orElse(0)][1];
  }

  static Compiled compile(Surface surface, Chart chart, Map<String, Double> parameters) {
    return new Compiled(
        surface
            .trimOn(chart)
            .map(
                condition ->
                    BatchEvaluator.compile(
                        List.of(Chart.U, Chart.V), parameters, formulas(condition))));
  }

  private static List<Expression> formulas(Expression condition) {
    List<Expression> formulas = new ArrayList<>();
    formulas.add(condition);
    for (Expression function : Switches.of(condition)) {
      formulas.add(function);
      formulas.add(Derivative.of(function, Chart.U));
      formulas.add(Derivative.of(function, Chart.V));
    }
    return formulas;
  }

  /**
   * The standing of a point.
   *
   * @param reach distance along the surface that counts as near
   */
  Standing at(double u, double v, ChartPoint at, double reach) {
    if (distance(u, v, at) <= reach) {
      return Standing.NEAR_CURVE;
    }
    return holds() ? Standing.KEPT : Standing.CUT_AWAY;
  }

  /** Whether the condition holds. */
  boolean keeps(double u, double v) {
    evaluate(u, v);
    return holds();
  }

  private boolean holds() {
    return values.length == 0 || values[0][0] != 0;
  }

  /**
   * Distance along the surface to the nearest curve on which a condition may change, to first
   * order; 0 where it can't be told.
   */
  double distance(double u, double v, ChartPoint at) {
    evaluate(u, v);
    double nearest = Double.POSITIVE_INFINITY;
    for (int k = 1; k < values.length; k += 3) {
      double slope = slope(values[k + 1][0], values[k + 2][0], at);
      double distance = slope == 0 ? nearest : Math.abs(values[k][0]) / slope;
      nearest = Double.isNaN(distance) ? 0 : Math.min(nearest, distance);
    }
    return nearest;
  }

  private void evaluate(double u, double v) {
    if (workspace.isPresent()) {
      point[0][0] = u;
      point[1][0] = v;
      compiled.evaluator().orElseThrow().evaluate(point, 1, values, workspace.get());
    }
  }

  /** Length of the gradient along the surface: |g_u (r_v × n) + g_v (n × r_u)| / |n|². */
  private static double slope(double byU, double byV, ChartPoint at) {
    Vector3 n = at.areaVector();
    Vector3 gradient = at.tangentV().cross(n).times(byU).plus(n.cross(at.tangentU()).times(byV));
    return gradient.norm() / n.dot(n);
  }
}
