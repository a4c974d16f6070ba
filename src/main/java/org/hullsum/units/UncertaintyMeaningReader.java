package org.hullsum.units;

import java.util.Optional;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;

/** Reads what stands in the parentheses after an uncertainty: {@code 95 %, 9 dof}. */
final class UncertaintyMeaningReader {
  static final String SPELLINGS =
      "expected one of (k=1), (k=2), (95 %), (95 %, 9 dof), (limits), (triangular)";

  private static final double LEAST_PERCENT = 50;
  private static final double ALL_PERCENT = 100;

  private final QuantityCursor cursor;
  private Optional<UncertaintyMeaning> meaning = Optional.empty();
  private double degreesOfFreedom = Double.POSITIVE_INFINITY;

  private UncertaintyMeaningReader(QuantityCursor cursor) {
    this.cursor = cursor;
  }

  /**
   * What was read.
   *
   * @param meaning empty where only degrees of freedom stand there
   * @param degreesOfFreedom infinite where none stand there
   */
  record Stated(Optional<UncertaintyMeaning> meaning, double degreesOfFreedom) {
    static final Stated NOTHING = new Stated(Optional.empty(), Double.POSITIVE_INFINITY);
  }

  static UncertaintyMeaning meaningAlone(String text) throws TextFault {
    QuantityCursor cursor = new QuantityCursor(text);
    UncertaintyMeaningReader reader = new UncertaintyMeaningReader(cursor);
    cursor.skipBlanks();
    reader.part();
    if (reader.meaning.isEmpty() || !cursor.atEnd()) {
      throw fault(
          0,
          text.length(),
          "'"
              + text
              + "' is no meaning of an uncertainty; expected k=2,"
              + " k=1, 95 %, limits or triangular");
    }
    return reader.meaning.get();
  }

  /** Reads a parenthesis if one stands here. */
  static Stated parenthesis(QuantityCursor cursor) throws TextFault {
    int open = cursor.position();
    if (!cursor.skip("(")) {
      return Stated.NOTHING;
    }
    UncertaintyMeaningReader reader = new UncertaintyMeaningReader(cursor);
    boolean more = true;
    while (more) {
      cursor.skipBlanks();
      reader.part();
      cursor.skipBlanks();
      more = cursor.skip(",");
    }
    if (!cursor.skip(")")) {
      throw cursor.isDone()
          ? fault(open, open + 1, "this '(' is never closed")
          : fault(cursor.position(), cursor.position() + 1, SPELLINGS);
    }
    return new Stated(reader.meaning, reader.degreesOfFreedom);
  }

  private void part() throws TextFault {
    int start = cursor.position();
    if (cursor.skip("k")) {
      cursor.skipBlanks();
      if (!cursor.skip("=")) {
        throw fault(start, cursor.position(), SPELLINGS);
      }
      cursor.skipBlanks();
      setMeaning(start, new UncertaintyMeaning.CoverageFactor(positive()));
    } else if (cursor.skip("limits") || cursor.skip("rectangular")) {
      setMeaning(start, new UncertaintyMeaning.Rectangular());
    } else if (cursor.skip("triangular")) {
      setMeaning(start, new UncertaintyMeaning.Triangular());
    } else if (UnitCursor.isDigit(cursor.peek())) {
      numbered(start);
    } else {
      throw fault(start, Math.min(start + 1, cursor.text().length()), SPELLINGS);
    }
  }

  private void numbered(int start) throws TextFault {
    double number = positive();
    cursor.skipBlanks();
    if (cursor.skip("%")) {
      if (!(number >= LEAST_PERCENT && number < ALL_PERCENT)) {
        throw fault(
            start,
            cursor.position(),
            "a coverage probability lies between 50 % and 100 %; expected one such as 95 %");
      }
      setMeaning(start, new UncertaintyMeaning.CoverageProbability(number / ALL_PERCENT));
    } else if (cursor.skip("dof")) {
      if (!(number >= 1) || !Double.isInfinite(degreesOfFreedom)) {
        throw fault(
            start, cursor.position(), "expected degrees of freedom once, 1 or more, as in 9 dof");
      }
      degreesOfFreedom = number;
    } else {
      throw fault(start, cursor.position(), SPELLINGS);
    }
  }

  private double positive() throws TextFault {
    int start = cursor.position();
    double number = cursor.number();
    if (!(number > 0)) {
      throw fault(start, cursor.position(), "expected a number above zero here; " + SPELLINGS);
    }
    return number;
  }

  private void setMeaning(int start, UncertaintyMeaning found) throws TextFault {
    if (meaning.isPresent()) {
      throw fault(start, cursor.position(), "one uncertainty has one meaning; here is a second");
    }
    meaning = Optional.of(found);
  }

  private static TextFault fault(int start, int end, String message) {
    return new TextFault(ProblemKind.UNCERTAINTY, start, end, message);
  }
}
