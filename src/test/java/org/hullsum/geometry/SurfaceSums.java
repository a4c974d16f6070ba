package org.hullsum.geometry;

import java.util.Map;
import java.util.function.Function;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.hullsum.numeric.Vector3;

/** Integrals over charts by a plain tensor rule of Gauss points, the oracle of these tests. */
public final class SurfaceSums {
  private static final int POINTS = 64;
  private static final GaussIntegrator RULE =
      new GaussIntegratorFactory().legendre(POINTS, 0.0, 1.0);

  private SurfaceSums() {}

  /** Σ over charts of ∬ f du dv. */
  static double integral(
      Surface surface, Map<String, Double> parameters, Function<ChartPoint, Double> f) {
    double sum = 0;
    for (Chart chart : surface.charts()) {
      ChartEvaluator evaluator = ChartEvaluator.of(chart, parameters);
      ChartEvaluator.Workspace workspace = evaluator.workspace();
      for (int i = 0; i < POINTS; i++) {
        for (int j = 0; j < POINTS; j++) {
          ChartPoint point = evaluator.at(RULE.getPoint(i), RULE.getPoint(j), workspace);
          sum += RULE.getWeight(i) * RULE.getWeight(j) * f.apply(point);
        }
      }
    }
    return sum;
  }

  static double area(Surface surface, Map<String, Double> parameters) {
    return integral(surface, parameters, point -> point.areaVector().norm());
  }

  /** ∬ n dS. */
  static Vector3 vectorArea(Surface surface, Map<String, Double> parameters) {
    return new Vector3(
        integral(surface, parameters, point -> point.areaVector().x()),
        integral(surface, parameters, point -> point.areaVector().y()),
        integral(surface, parameters, point -> point.areaVector().z()));
  }

  /** ∬ (r − p)·n dS / 3: the volume of the cones from p to the surface. */
  public static double volume(Surface surface, Map<String, Double> parameters, Vector3 p) {
    return integral(surface, parameters, point -> point.position().minus(p).dot(point.areaVector()))
        / 3;
  }
}
