package org.hullsum.units;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;

/**
 * Reads values with their uncertainties: {@code 41.8 m3/h ± 0.6 m3/h (k=2)}, {@code 41.8 ± 0.6 m3/h
 * (95 %)}, {@code ± 1.5 % (k=1)} of the value, {@code ± 0.5 % of 60 m3/h (limits)} of a span,
 * several terms one after another.
 *
 * <p>Terms are independent and combine in quadrature, their degrees of freedom by Welch and
 * Satterthwaite. A unit that stands only after the uncertainty is the value's as well; an
 * uncertainty without unit is in the value's. A temperature after ± is a difference. Without any ±
 * the value is exact and {@link MeasuredQuantity#stated} false.
 *
 * <p>Faults are of kind {@code UNCERTAINTY} for the figure and its meaning, {@code DIMENSION} where
 * it does not measure what the value does, and those of {@link QuantityParser}. Thread-safe.
 *
 * <p>Reference: JCGM 100:2008, 4.3, 5.1.2, G.4.1.
 */
public final class MeasuredQuantityParser {
  private final Optional<UncertaintyMeaning> fallback;
  private final UnitRule valueRule;
  private final UnitRule uncertaintyRule;

  private MeasuredQuantityParser(Optional<UncertaintyMeaning> fallback, WorkingUnits working) {
    this.fallback = Objects.requireNonNull(fallback, "fallback");
    this.valueRule = UnitRule.ofValues(working);
    this.uncertaintyRule = UnitRule.ofUncertainties(working);
  }

  /**
   * A parser for one case.
   *
   * @param fallback the meaning of figures that state none; where it is empty they are refused
   * @param working says whether the case has units
   */
  public static MeasuredQuantityParser of(
      Optional<UncertaintyMeaning> fallback, WorkingUnits working) {
    return new MeasuredQuantityParser(fallback, working);
  }

  public MeasuredQuantity parse(String text) throws TextFault {
    return parseWithNotes(text).value();
  }

  /** As {@link #parse}, with what a report must say of how it was read. */
  public Noted<MeasuredQuantity> parseWithNotes(String text) throws TextFault {
    Objects.requireNonNull(text, "text");
    QuantityCursor cursor = new QuantityCursor(text);
    cursor.skipBlanks();
    if (cursor.peek() == '(') {
      throw new TextFault(
          ProblemKind.UNCERTAINTY,
          cursor.position(),
          cursor.position() + 1,
          "a value is not put in parentheses; write 41.8 ± 0.6 m3/h (k=2)");
    }
    double value = cursor.number();
    List<String> notes = new ArrayList<>();
    Optional<Unit> unit = Optional.empty();
    if (cursor.unitFollows()) {
      Noted<Unit> read = cursor.unit(valueRule);
      notes.addAll(read.notes());
      unit = Optional.of(read.value());
    }
    List<UncertaintyTerm> terms = UncertaintyReader.read(cursor, uncertaintyRule, fallback, notes);
    Optional<Unit> shared = unit.isPresent() ? unit : unitOf(terms);
    Quantity quantity = new Quantity(value, shared.orElse(Unit.ONE), shared.isEmpty());
    return new Noted<>(combine(quantity, terms), notes);
  }

  /**
   * A value with the uncertainty that another text states for it, such as a cell of a table with
   * {@code ± 1.5 % (k=1)}.
   *
   * @param uncertainty begins with ±; the faults' places are in it
   */
  public Noted<MeasuredQuantity> withUncertainty(Quantity value, String uncertainty)
      throws TextFault {
    Objects.requireNonNull(value, "value");
    List<String> notes = new ArrayList<>();
    QuantityCursor cursor = new QuantityCursor(uncertainty);
    List<UncertaintyTerm> terms = UncertaintyReader.read(cursor, uncertaintyRule, fallback, notes);
    if (terms.isEmpty()) {
      throw new TextFault(
          ProblemKind.UNCERTAINTY, 0, uncertainty.length(), "expected ± and an uncertainty");
    }
    return new Noted<>(combine(value, terms), notes);
  }

  /** The unit that the value takes from its uncertainties: the first that is not a part of it. */
  private static Optional<Unit> unitOf(List<UncertaintyTerm> terms) {
    for (UncertaintyTerm term : terms) {
      if (term.unit().isPresent() && !term.unit().get().isRatio()) {
        return term.unit();
      }
    }
    return Optional.empty();
  }

  private static MeasuredQuantity combine(Quantity value, List<UncertaintyTerm> terms)
      throws TextFault {
    if (terms.isEmpty()) {
      return MeasuredQuantity.exact(value);
    }
    UncertaintyAccumulator sum = new UncertaintyAccumulator();
    for (UncertaintyTerm term : terms) {
      sum.add(term.standardUncertainty(value), term.degreesOfFreedom());
    }
    if (Double.isInfinite(sum.standardUncertainty())) {
      UncertaintyTerm first = terms.get(0);
      throw new TextFault(
          ProblemKind.UNCERTAINTY,
          first.start(),
          first.end(),
          "the uncertainties together are too large to be held");
    }
    return new MeasuredQuantity(value, sum.standardUncertainty(), sum.degreesOfFreedom(), true);
  }
}
