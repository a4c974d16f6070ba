package org.hullsum.model;

import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.problem.Place;
import org.hullsum.units.Unit;

/**
 * A named number of a case: a parameter, or a figure that stands inline.
 *
 * @param name the parameter's name, or a name made of the patch or volume and what the figure is;
 *     unique in the case; what formulas and budgets refer to
 * @param value in working units
 * @param standardUncertainty in working units, 0 for an exact one
 * @param degreesOfFreedom of the standard uncertainty, infinite unless stated
 * @param definition the formula of other inputs by which it is defined, empty for a figure
 * @param inline whether the figure stood inline, so that its name is ours
 * @param place where it is stated
 * @param unit in which a figure was stated; empty for a bare number and for a formula
 */
public record Input(
    String name,
    double value,
    double standardUncertainty,
    double degreesOfFreedom,
    Optional<Expression> definition,
    boolean inline,
    Place place,
    Optional<Unit> unit) {
  public Input {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(definition, "definition");
    Objects.requireNonNull(place, "place");
    Objects.requireNonNull(unit, "unit");
    if (definition.isPresent() && standardUncertainty != 0) {
      throw new IllegalArgumentException(name + " is derived and has no uncertainty of its own");
    }
  }

  /** One of which no unit is known. */
  public Input(
      String name,
      double value,
      double standardUncertainty,
      double degreesOfFreedom,
      Optional<Expression> definition,
      boolean inline,
      Place place) {
    this(
        name,
        value,
        standardUncertainty,
        degreesOfFreedom,
        definition,
        inline,
        place,
        Optional.empty());
  }
}
