package org.hullsum.units;

import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * The units that are known by a symbol: those of the Unified Code for Units of Measure, version
 * 2.1, that a balance can meet, then the friendly spellings of the case format. Built once, at
 * first use; immutable.
 */
final class UnitTable {
  private static final String[] PREFIXES = {
    "Y", "Z", "E", "P", "T", "G", "M", "k", "h", "da", "d", "c", "m", "u", "n", "p", "f", "a", "z",
    "y"
  };
  private static final int[] PREFIX_TENS = {
    24, 21, 18, 15, 12, 9, 6, 3, 2, 1, -1, -2, -3, -6, -9, -12, -15, -18, -21, -24
  };

  private final Map<String, UnitAtom> atoms;

  private UnitTable() {
    Map<String, UnitAtom> collected = new LinkedHashMap<>();
    SystemUnits.addTo(collected);
    CustomaryUnits.addTo(collected);
    FriendlyUnits.addTo(collected);
    atoms = collected;
  }

  private static final class Holder {
    private static final UnitTable INSTANCE = new UnitTable();
  }

  static UnitTable instance() {
    return Holder.INSTANCE;
  }

  /** The unit of a symbol, with its metric prefix if it has one. */
  Optional<UnitAtom> find(String symbol) {
    UnitAtom whole = atoms.get(symbol);
    if (whole != null) {
      return Optional.of(whole);
    }
    String plain = plainMicro(symbol);
    for (int i = 0; i < PREFIXES.length; i++) {
      if (plain.startsWith(PREFIXES[i])) {
        UnitAtom stem = atoms.get(plain.substring(PREFIXES[i].length()));
        if (stem != null && stem.metric()) {
          return Optional.of(prefixed(symbol, stem, PREFIX_TENS[i]));
        }
      }
    }
    return Optional.empty();
  }

  /** With a leading micro sign, in either of its two characters, as a plain {@code u}. */
  private static String plainMicro(String symbol) {
    boolean micro = symbol.startsWith("\u00b5") || symbol.startsWith("\u03bc");
    return micro ? "u".concat(symbol.substring(1)) : symbol;
  }

  private static UnitAtom prefixed(String symbol, UnitAtom stem, int tens) {
    UnitTerm term = stem.term();
    Magnitude magnitude = term.magnitude().times(Magnitude.powerOfTen(tens));
    return new UnitAtom(symbol, new UnitTerm(magnitude, term.dimension(), 0), false, stem.note());
  }

  /** All units without prefix, in the order of the table. */
  Collection<UnitAtom> atoms() {
    return atoms.values();
  }
}
