package org.hullsum.geometry;

import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Simplifier;
import org.hullsum.expression.Substitution;
import org.hullsum.expression.Switches;
import org.hullsum.expression.VectorExpression;

/**
 * An oriented surface made of charts, perhaps trimmed.
 *
 * @param kind the word of the case format, such as {@code cylinder}
 * @param charts the pieces, all with construction normals to the same side
 * @param trim a condition in {@code x y z}: the surface is where it holds; empty for all of it
 */
public record Surface(String kind, List<Chart> charts, Optional<Expression> trim) {
  public Surface {
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(trim, "trim");
    charts = List.copyOf(charts);
    if (charts.isEmpty()) {
      throw new IllegalArgumentException("a surface has at least one chart");
    }
  }

  /** The trim as a condition in {@code u} and {@code v} of one of the charts. */
  public Optional<Expression> trimOn(Chart chart) {
    return trim.map(condition -> pulledBack(condition, chart));
  }

  /**
   * The functions in {@code u} and {@code v} of a chart whose zeros are where the trim cuts or
   * where the chart's own formula has a kink or a jump.
   */
  public List<Expression> switchesOn(Chart chart) {
    VectorExpression r = chart.position();
    Set<Expression> switches = new LinkedHashSet<>();
    trimOn(chart).ifPresent(condition -> switches.addAll(Switches.of(condition)));
    for (Expression component : List.of(r.x(), r.y(), r.z())) {
      switches.addAll(Switches.of(component));
    }
    return List.copyOf(switches);
  }

  /** A formula in {@code x y z} as one in {@code u} and {@code v} of a chart. */
  public static Expression pulledBack(Expression e, Chart chart) {
    VectorExpression r = chart.position();
    return Simplifier.simplify(Substitution.replace(e, Map.of("x", r.x(), "y", r.y(), "z", r.z())));
  }
}
