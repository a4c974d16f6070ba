package org.hullsum.model;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.problem.Place;

/**
 * A control volume.
 *
 * @param name unique among volumes and envelopes
 * @param label a name for people
 * @param interior what it makes or keeps; empty for the conservation check with zero interior
 * @param tolerances of its balance
 * @param place where it is stated
 */
public record Volume(
    String name,
    Optional<String> label,
    List<InteriorTerm> interior,
    Tolerances tolerances,
    Place place) {
  /** The implicit volume outside everything, of which no balance is drawn. */
  public static final String SURROUNDINGS = "surroundings";

  public Volume {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(label, "label");
    Objects.requireNonNull(tolerances, "tolerances");
    Objects.requireNonNull(place, "place");
    interior = List.copyOf(interior);
  }
}
