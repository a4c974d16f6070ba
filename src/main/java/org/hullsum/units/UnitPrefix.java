package org.hullsum.units;

import java.util.List;
import java.util.Objects;

/**
 * A unit at the beginning of a longer text.
 *
 * @param unit what was read
 * @param notes as in {@link Noted}
 * @param end index in the text after the unit's last character
 */
public record UnitPrefix(Unit unit, List<String> notes, int end) {
  public UnitPrefix {
    Objects.requireNonNull(unit, "unit");
    notes = List.copyOf(notes);
  }
}
