package org.hullsum.flux;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.quadrature.Accuracy;
import org.hullsum.quadrature.Integral;

/**
 * How a volume integral changes when an input moves the boundary: Σ ∬ g (∂r/∂q)·(r_u × r_v) du dv,
 * the boundary term of Reynolds' transport theorem.
 *
 * <p>What moves a trim curve along its surface sweeps no volume, so trims have no part in it.
 */
final class BoundaryMotion {
  private static final double RELATIVE = 1e-6;

  private BoundaryMotion() {}

  /** The term by each varying input that occurs in a chart. */
  static Map<String, Double> terms(
      List<BoundaryPatch> boundary,
      Expression density,
      InputSensitivity inputs,
      OptionalDouble instant) {
    Map<String, Double> terms = new LinkedHashMap<>();
    for (BoundaryPatch patch : boundary) {
      for (PulledBackChart chart : patch.surface().charts()) {
        VectorExpression r = chart.chart().position();
        Set<String> varying = inputs.varyingIn(List.of(r.x(), r.y(), r.z()));
        if (varying.isEmpty()) {
          continue;
        }
        Expression g = chart.pullBack(density);
        List<Expression> integrands = new ArrayList<>();
        for (String name : varying) {
          integrands.add(g.times(r.derivative(name).dot(chart.areaVector())));
        }
        ChartIntegral integral = new ChartIntegral(chart, integrands, integrands, inputs.values());
        Integral[] parts = integral.integrate(instant, accuracy(integral, instant));
        int k = 0;
        for (String name : varying) {
          terms.merge(name, patch.outward() * parts[k++].value(), Double::sum);
        }
      }
    }
    return terms;
  }

  private static Accuracy accuracy(ChartIntegral integral, OptionalDouble instant) {
    double size = 0;
    for (double mean : integral.coarseMeans(instant)) {
      size = Math.max(size, mean);
    }
    return new Accuracy(
        RELATIVE,
        Math.max(Double.MIN_NORMAL, RELATIVE * size),
        ChartIntegral.ANY_MAGNITUDE,
        Accuracy.USUAL_LIMIT);
  }
}
