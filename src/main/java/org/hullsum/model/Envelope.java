package org.hullsum.model;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.problem.Place;

/**
 * A union of volumes whose balance is drawn as well.
 *
 * @param name unique among volumes and envelopes
 * @param label a name for people
 * @param volumes names of the volumes, each once
 * @param tolerances of its balance
 * @param place where it is stated
 */
public record Envelope(
    String name, Optional<String> label, List<String> volumes, Tolerances tolerances, Place place) {
  public Envelope {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(label, "label");
    Objects.requireNonNull(tolerances, "tolerances");
    Objects.requireNonNull(place, "place");
    volumes = List.copyOf(volumes);
  }
}
