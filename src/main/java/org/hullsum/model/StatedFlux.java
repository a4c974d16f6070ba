package org.hullsum.model;

import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.numeric.Interval;
import org.hullsum.problem.Place;

/**
 * One item of a patch's {@code flux}; several items of one patch add up.
 *
 * @param statement how it is known
 * @param times a factor multiplied in, a formula of inputs
 * @param within bounds on the flux, in working units
 * @param place where it is stated
 */
public record StatedFlux(
    FluxStatement statement, Optional<Expression> times, Optional<Interval> within, Place place) {
  public StatedFlux {
    Objects.requireNonNull(statement, "statement");
    Objects.requireNonNull(times, "times");
    Objects.requireNonNull(within, "within");
    Objects.requireNonNull(place, "place");
  }
}
