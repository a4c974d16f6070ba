package org.hullsum.units;

import java.util.List;
import java.util.Objects;

/**
 * What a text was read as, with the choices made in reading it that a person should hear of.
 *
 * @param value what was read
 * @param notes whole sentences for a report, such as that {@code gal} was read as US gallons; empty
 *     where the text has only one meaning
 */
public record Noted<T>(T value, List<String> notes) {
  public Noted {
    Objects.requireNonNull(value, "value");
    notes = List.copyOf(notes);
  }
}
