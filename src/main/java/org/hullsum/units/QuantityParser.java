package org.hullsum.units;

import java.util.List;
import java.util.Objects;
import org.hullsum.problem.TextFault;

/**
 * Reads quantities: a number, one blank, a unit ({@code 12.5 m3/h}), or a bare number. Faults are
 * of kind {@code WRONG_VALUE} for the number and {@code UNIT} for the unit. Thread-safe.
 */
public final class QuantityParser {
  private QuantityParser() {}

  public static Quantity parse(String text) throws TextFault {
    return parseWithNotes(text).value();
  }

  /**
   * As {@link #parse(String)}; where a case has no units, any unit but that of an angle is refused.
   */
  public static Quantity parse(String text, WorkingUnits working) throws TextFault {
    return parseWithNotes(text, working).value();
  }

  /** As {@link #parse(String, WorkingUnits)}, with the notes of the unit. */
  public static Noted<Quantity> parseWithNotes(String text, WorkingUnits working) throws TextFault {
    return parse(text, UnitRule.ofValues(working));
  }

  /** As {@link #parse(String)}, with the notes of the unit. */
  public static Noted<Quantity> parseWithNotes(String text) throws TextFault {
    return parse(text, UnitRule.ANY);
  }

  private static Noted<Quantity> parse(String text, UnitRule rule) throws TextFault {
    Objects.requireNonNull(text, "text");
    QuantityCursor cursor = new QuantityCursor(text);
    cursor.skipBlanks();
    double value = cursor.number();
    if (cursor.atEnd()) {
      return new Noted<>(new Quantity(value, Unit.ONE, true), List.of());
    }
    Noted<Unit> unit = cursor.unit(rule);
    if (!cursor.atEnd()) {
      throw cursor.trailing();
    }
    return new Noted<>(new Quantity(value, unit.value(), false), unit.notes());
  }
}
