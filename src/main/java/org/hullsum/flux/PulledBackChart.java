package org.hullsum.flux;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Substitution;
import org.hullsum.expression.Switches;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.Chart;

/**
 * A chart with everything in terms of u and v: position, area vector N = r_u × r_v, trim.
 *
 * @param chart the chart
 * @param areaVector N, as formulas in u and v
 * @param trim the condition under which a point belongs to the surface, in u and v
 */
record PulledBackChart(Chart chart, VectorExpression areaVector, Optional<Expression> trim) {

  static PulledBackChart of(Chart chart, Optional<Expression> trim) {
    return new PulledBackChart(
        chart, chart.areaVector(), trim.map(condition -> pullBack(condition, chart.position())));
  }

  /** A formula in {@code x y z} at the points of the chart. */
  Expression pullBack(Expression spatial) {
    return pullBack(spatial, chart.position());
  }

  private static Expression pullBack(Expression spatial, VectorExpression position) {
    Map<String, Expression> replacements = new LinkedHashMap<>();
    replacements.put("x", position.x());
    replacements.put("y", position.y());
    replacements.put("z", position.z());
    return Substitution.replace(spatial, replacements);
  }

  VectorExpression pullBack(VectorExpression spatial) {
    return new VectorExpression(
        pullBack(spatial.x()), pullBack(spatial.y()), pullBack(spatial.z()));
  }

  /** The formula where the surface is, zero where the trim took it away. */
  Expression trimmed(Expression integrand) {
    return trim.<Expression>map(
            condition -> new Expression.Conditional(condition, integrand, Expression.number(0)))
        .orElse(integrand);
  }

  /** The functions of u and v on whose zero sets the trim or one of the formulas switches. */
  List<Expression> switches(List<Expression> integrands) {
    List<Expression> all = new ArrayList<>();
    trim.ifPresent(condition -> addNew(Switches.of(condition), all));
    integrands.forEach(integrand -> addNew(Switches.of(integrand), all));
    return all;
  }

  private static void addNew(List<Expression> switches, List<Expression> all) {
    for (Expression function : switches) {
      if (!all.contains(function)) {
        all.add(function);
      }
    }
  }
}
