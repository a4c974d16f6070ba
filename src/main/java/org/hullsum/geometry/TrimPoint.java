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
    if (workspace.isEmpty()) {
      return Standing.KEPT;
    }
    point[0][0] = u;
    point[1][0] = v;
    compiled.evaluator().orElseThrow().evaluate(point, 1, values, workspace.get());
    for (int k = 1; k < values.length; k += 3) {
      double slope = slope(values[k + 1][0], values[k + 2][0], at);
      if (!(Math.abs(values[k][0]) > reach * slope) && slope != 0) {
        return Standing.NEAR_CURVE;
      }
    }
    return values[0][0] != 0 ? Standing.KEPT : Standing.CUT_AWAY;
  }

  /** Length of the gradient along the surface: |g_u (r_v × n) + g_v (n × r_u)| / |n|². */
  private static double slope(double byU, double byV, ChartPoint at) {
    Vector3 n = at.areaVector();
    Vector3 gradient = at.tangentV().cross(n).times(byU).plus(n.cross(at.tangentU()).times(byV));
    return gradient.norm() / n.dot(n);
  }
}
