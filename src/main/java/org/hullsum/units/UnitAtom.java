package org.hullsum.units;

import java.util.Objects;
import java.util.Optional;

/**
 * A unit with a symbol of its own.
 *
 * @param symbol as written, case counts
 * @param metric whether it takes a metric prefix
 * @param note what a report must say about how the symbol was read, if anything
 */
record UnitAtom(String symbol, UnitTerm term, boolean metric, Optional<String> note) {
  UnitAtom {
    Objects.requireNonNull(symbol, "symbol");
    Objects.requireNonNull(term, "term");
    Objects.requireNonNull(note, "note");
  }
}
