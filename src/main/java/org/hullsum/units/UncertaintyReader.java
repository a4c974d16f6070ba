package org.hullsum.units;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;

/**
 * Reads what stands after a value:
 *
 * <pre>
 * terms     = { ("±" | "+/-") number [unit] [reference] [meaning] }
 * reference = "of value" | "of" number [unit] | "absolute"
 * meaning   = "(" part { "," part } ")"
 * </pre>
 */
final class UncertaintyReader {
  private static final int MAX_TERMS = 50;

  private final QuantityCursor cursor;
  private final UnitRule rule;
  private final Optional<UncertaintyMeaning> fallback;
  private final List<UncertaintyTerm> terms = new ArrayList<>();
  private final List<String> notes;

  private UncertaintyReader(
      QuantityCursor cursor,
      UnitRule rule,
      Optional<UncertaintyMeaning> fallback,
      List<String> notes) {
    this.cursor = cursor;
    this.rule = rule;
    this.fallback = fallback;
    this.notes = notes;
  }

  /**
   * Reads all terms up to the end of the text.
   *
   * @param fallback what a figure means that does not say it
   * @param notes takes the notes of the units
   */
  static List<UncertaintyTerm> read(
      QuantityCursor cursor,
      UnitRule rule,
      Optional<UncertaintyMeaning> fallback,
      List<String> notes)
      throws TextFault {
    UncertaintyReader reader = new UncertaintyReader(cursor, rule, fallback, notes);
    reader.readAll();
    return reader.terms;
  }

  private void readAll() throws TextFault {
    cursor.skipBlanks();
    while (!cursor.isDone()) {
      if (!cursor.skip("±") && !cursor.skip("+/-")) {
        throw fault(
            cursor.position(),
            cursor.text().length(),
            "expected ± (or +/-) and an uncertainty, as in 41.8 m3/h ± 0.6 m3/h (k=2); a unit holds"
                + " no blanks");
      }
      if (terms.size() == MAX_TERMS) {
        throw fault(cursor.position(), cursor.text().length(), "more than 50 uncertainties");
      }
      cursor.skipBlanks();
      term();
      cursor.skipBlanks();
    }
  }

  private void term() throws TextFault {
    int start = cursor.position();
    double figure = unsigned("an uncertainty");
    Optional<Unit> unit = unit();
    cursor.skipBlanks();
    UncertaintyTerm.Reference reference = reference();
    int end = start + cursor.text().substring(start, cursor.position()).stripTrailing().length();
    cursor.skipBlanks();
    UncertaintyMeaningReader.Stated stated = UncertaintyMeaningReader.parenthesis(cursor);
    Optional<UncertaintyMeaning> meaning =
        stated.meaning().isPresent() ? stated.meaning() : fallback;
    if (meaning.isEmpty()) {
      String term = cursor.text().substring(start, end);
      throw fault(
          start,
          end,
          "± "
              + term
              + " does not say what it means: write ± "
              + term
              + " (k=2), (k=1), (95 %), (95 %, 9 dof), (limits) or (triangular), or state it once"
              + " for the whole case, as in uncertainties: k=2");
    }
    terms.add(
        new UncertaintyTerm(
            figure, unit, reference, meaning.get(), stated.degreesOfFreedom(), start, end));
  }

  private UncertaintyTerm.Reference reference() throws TextFault {
    if (cursor.skipWord("absolute")) {
      return new UncertaintyTerm.Absolute();
    }
    if (!cursor.skipWord("of")) {
      if (Character.isLetter(cursor.peek())) {
        throw fault(
            cursor.position(),
            cursor.position() + 1,
            "expected 'of value', 'of' and a span (of 60 m3/h), 'absolute', or the meaning in"
                + " parentheses; "
                + UncertaintyMeaningReader.SPELLINGS);
      }
      return new UncertaintyTerm.Plain();
    }
    cursor.skipBlanks();
    if (cursor.skipWord("value")) {
      return new UncertaintyTerm.OfValue();
    }
    int start = cursor.position();
    if (!UnitCursor.isDigit(cursor.peek()) && cursor.peek() != '-' && cursor.peek() != '+') {
      throw fault(
          start,
          Math.min(start + 1, cursor.text().length()),
          "expected 'of value', or 'of' and a span with its unit, as in ± 0.5 % of 60 m3/h");
    }
    double span = unsigned("a span");
    Optional<Unit> unit = unit();
    return new UncertaintyTerm.OfSpan(
        new Quantity(span, unit.orElse(Unit.ONE).difference(), unit.isEmpty()));
  }

  private double unsigned(String what) throws TextFault {
    int start = cursor.position();
    boolean signed = cursor.peek() == '-' || cursor.peek() == '+' || cursor.peek() == '−';
    double figure = cursor.number();
    if (signed || figure == 0) {
      throw fault(
          start,
          cursor.position(),
          what + " is a number above zero without a sign; an exact value has no ± at all");
    }
    return figure;
  }

  private Optional<Unit> unit() throws TextFault {
    if (!cursor.unitFollows()) {
      return Optional.empty();
    }
    Noted<Unit> unit = cursor.unit(rule);
    for (String note : unit.notes()) {
      if (!notes.contains(note)) {
        notes.add(note);
      }
    }
    return Optional.of(unit.value());
  }

  private static TextFault fault(int start, int end, String message) {
    return new TextFault(ProblemKind.UNCERTAINTY, start, end, message);
  }
}
