package org.hullsum.units;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/** Gathers what a report must say of how a unit was read, each note once. */
final class UnitNoteAccumulator {
  /** Where it divides, the capital letter is seldom meant. */
  private static final Map<String, String> CAPITALS =
      Map.of(
          "H", "'H' was read as the henry; the hour is h",
          "S", "'S' was read as the siemens; the second is s",
          "C", "'C' was read as the coulomb; the degree Celsius is degC",
          "F", "'F' was read as the farad; the degree Fahrenheit is degF",
          "D", "'D' was read as the dalton; the day is d");

  private final List<String> notes = new ArrayList<>();

  List<String> notes() {
    return List.copyOf(notes);
  }

  int size() {
    return notes.size();
  }

  /** Forgets the notes after the first {@code size}. */
  void cutTo(int size) {
    notes.subList(size, notes.size()).clear();
  }

  /**
   * A unit was read.
   *
   * @param symbol as written
   * @param inverted whether it divides
   */
  void unit(UnitAtom atom, String symbol, int exponent, boolean inverted) {
    if (atom.note().isPresent()) {
      add(atom.note().get());
    }
    if (symbol.equals("Mm") && exponent == 3) {
      add("'Mm3' was read as cubic megametres (10*18 m3); a million cubic metres is hm3");
    }
    if (inverted && CAPITALS.containsKey(symbol)) {
      add(CAPITALS.get(symbol));
    }
  }

  /** A factor was multiplied in after a division: {@code kg/m.s}. */
  void factorAfterDivision(String factor, String sofar) {
    boolean named = Character.isLetter(factor.charAt(0)) || factor.charAt(0) == '[';
    if (named && factor.indexOf('-') < 0) {
      add(
          "'"
              + factor
              + "' after a division in '"
              + sofar
              + "' multiplies, since units are read from left to right; to divide by it as well,"
              + " use parentheses or a second '/'");
    }
  }

  private void add(String note) {
    if (!notes.contains(note)) {
      notes.add(note);
    }
  }
}
