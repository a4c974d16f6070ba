package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Expression.Connective;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Simplifier;

/**
 * What is kept of a surface: the part inside every one of some bodies and outside every one of
 * others.
 *
 * @param inside bodies that the surface must be inside of
 * @param outside bodies that it must be outside of
 */
public record Trim(List<Body> inside, List<Body> outside) {
  public Trim {
    inside = List.copyOf(inside);
    outside = List.copyOf(outside);
  }

  /**
   * The surface, trimmed by this in addition to any trim that it has.
   *
   * @throws SurfaceFault where a body is none
   */
  public Surface trimmed(Surface surface, Map<String, Double> parameters) throws SurfaceFault {
    List<Expression> conditions = new ArrayList<>();
    surface.trim().ifPresent(conditions::add);
    for (Body body : inside) {
      conditions.add(Simplifier.simplify(body.condition(parameters)));
    }
    for (Body body : outside) {
      Expression within = Simplifier.simplify(body.condition(parameters));
      conditions.add(new Logical(Connective.NOT, List.of(within)));
    }
    Optional<Expression> trim =
        conditions.isEmpty()
            ? Optional.empty()
            : Optional.of(
                conditions.size() == 1
                    ? conditions.get(0)
                    : new Logical(Connective.AND, conditions));
    return new Surface(surface.kind(), surface.charts(), trim);
  }
}
