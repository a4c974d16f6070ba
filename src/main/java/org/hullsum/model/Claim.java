package org.hullsum.model;

import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.field.VectorField;
import org.hullsum.problem.Place;

/**
 * A flux that someone states for a patch; exactly one of the two is present.
 *
 * @param rate a rate from leaves to enters, a formula of inputs
 * @param field a field whose flux through the patch is claimed (the field on the other side)
 * @param place where it is stated
 */
public record Claim(Optional<Expression> rate, Optional<VectorField> field, Place place) {
  public Claim {
    Objects.requireNonNull(place, "place");
    if (rate.isPresent() == field.isPresent()) {
      throw new IllegalArgumentException("a claim is a rate or a field");
    }
  }
}
