package org.hullsum.units;

import java.util.Objects;
import org.hullsum.problem.TextFault;

/**
 * Reads unit codes: those of the Unified Code for Units of Measure (case-sensitive), and the
 * friendly spellings of the case format, such as {@code m³/h}, {@code degC}, {@code gal/min}.
 *
 * <p>A temperature scale with a zero of its own ({@code degC}, {@code degF}, {@code Cel}) keeps its
 * offset only where it stands alone; in a compound it is a difference. Products and quotients are
 * read from left to right, so {@code kg/m.s} is kilogram seconds per metre, and a note says so. A
 * plane angle has no dimension, a turn is 2 pi. Thread-safe; a fault is of kind {@code UNIT}, or
 * {@code LIMIT_EXCEEDED} where a unit is longer or deeper than any real one.
 *
 * <p>Reference: G. Schadow, C. J. McDonald, The Unified Code for Units of Measure, version 2.1.
 */
public final class UnitParser {
  private UnitParser() {}

  /** The unit that a code stands for; without the notes of {@link #parseWithNotes}. */
  public static Unit parse(String code) throws TextFault {
    return parseWithNotes(code).value();
  }

  /** The unit that a code stands for, with what a report must say of how it was read. */
  public static Noted<Unit> parseWithNotes(String code) throws TextFault {
    return UnitReader.readWhole(Objects.requireNonNull(code, "code"));
  }

  /**
   * The longest unit that begins in a text at {@code start}, for a number in an expression. A unit
   * holds no blank; {@code *} is not a part of it, and neither are {@code .} and {@code /} unless
   * they are followed at once by another unit. A name of a unit wins over a name of a parameter:
   * {@code 5 m/s} is a speed whatever {@code s} is.
   *
   * @throws TextFault if no unit begins there; its span is in the whole text
   */
  public static UnitPrefix parsePrefix(String text, int start) throws TextFault {
    Objects.requireNonNull(text, "text");
    Objects.checkFromToIndex(start, text.length(), text.length());
    return UnitReader.readPrefix(text, start);
  }
}
