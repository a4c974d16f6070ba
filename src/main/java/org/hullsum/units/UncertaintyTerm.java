package org.hullsum.units;

import java.util.Optional;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;

/**
 * One figure after a ±.
 *
 * @param figure above zero
 * @param unit as written, if any
 * @param reference what the figure is a part of, or that it is none
 * @param meaning what the figure means
 * @param degreesOfFreedom infinite unless stated
 * @param start index of the figure in the text
 * @param end index after the term
 */
record UncertaintyTerm(
    double figure,
    Optional<Unit> unit,
    Reference reference,
    UncertaintyMeaning meaning,
    double degreesOfFreedom,
    int start,
    int end) {

  /** What the words after the figure say. */
  sealed interface Reference {
    /** The half-width of the figure in the unit of the value. */
    double halfWidth(UncertaintyTerm term, Quantity value) throws TextFault;
  }

  /** Nothing is said: {@code ± 0.6 m3/h}, {@code ± 1.5 %}. */
  record Plain() implements Reference {
    @Override
    public double halfWidth(UncertaintyTerm term, Quantity value) throws TextFault {
      boolean percent = term.isRatio();
      if (value.unit().isRatio() && (percent || term.unit.isEmpty())) {
        throw term.ambiguous(value);
      }
      return percent ? term.partOfValue(value) : term.inUnitOf(value);
    }
  }

  /** {@code ± 3 % of value}. */
  record OfValue() implements Reference {
    @Override
    public double halfWidth(UncertaintyTerm term, Quantity value) throws TextFault {
      term.requireRatio();
      return term.partOfValue(value);
    }
  }

  /** {@code ± 0.1 % absolute}. */
  record Absolute() implements Reference {
    @Override
    public double halfWidth(UncertaintyTerm term, Quantity value) throws TextFault {
      if (value.bare() && term.isRatio()) {
        throw term.fault("'absolute' needs a value with a unit, such as 45 % ± 0.1 % absolute");
      }
      return term.inUnitOf(value);
    }
  }

  /** {@code ± 0.5 % of 60 m3/h}. */
  record OfSpan(Quantity span) implements Reference {
    @Override
    public double halfWidth(UncertaintyTerm term, Quantity value) throws TextFault {
      term.requireRatio();
      if (value.bare() && !span.bare()) {
        throw term.fault(
            "the span has a unit and the value has none; write it after the value as well");
      }
      double fraction = term.figure * term.unit.orElse(Unit.ONE).scale();
      return span.bare()
          ? fraction * span.value()
          : fraction * term.converted(span.value(), span.unit(), value.unit());
    }
  }

  /** The standard uncertainty in the unit of the value. */
  double standardUncertainty(Quantity value) throws TextFault {
    double standard = reference.halfWidth(this, value) / meaning.divisor(degreesOfFreedom);
    if (!Double.isFinite(standard)) {
      throw fault("this uncertainty is too large to be held");
    }
    return standard;
  }

  private boolean isRatio() {
    return unit.isPresent() && unit.get().isRatio();
  }

  private void requireRatio() throws TextFault {
    if (!isRatio()) {
      throw fault("a part of something is given in % or ppm, as in ± 0.5 % of 60 m3/h");
    }
  }

  private double partOfValue(Quantity value) throws TextFault {
    if (value.unit().offset() != 0) {
      throw fault(
          "a part of a temperature in "
              + value.unit().code()
              + " depends on where its zero lies; state it in K");
    }
    return figure * unit.orElse(Unit.ONE).scale() * Math.abs(value.value());
  }

  private double inUnitOf(Quantity value) throws TextFault {
    return unit.isEmpty() ? figure : converted(figure, unit.get(), value.unit());
  }

  private double converted(double width, Unit from, Unit to) throws TextFault {
    if (!from.dimension().equals(to.dimension())) {
      throw new TextFault(
          ProblemKind.DIMENSION,
          start,
          end,
          "the uncertainty is in "
              + from.code()
              + " ("
              + from.dimension()
              + "), the value in "
              + to.code()
              + " ("
              + to.dimension()
              + "); both must measure the same");
    }
    return width * (from.scale() / to.scale());
  }

  private TextFault ambiguous(Quantity value) {
    String code = unit.map(Unit::code).orElse(value.unit().code());
    String amount = "± " + figure + " " + code;
    return fault(
        "after a value in "
            + value.unit().code()
            + " this has two readings: write '"
            + amount
            + " of value' or '"
            + amount
            + " absolute'");
  }

  private TextFault fault(String message) {
    return new TextFault(ProblemKind.UNCERTAINTY, start, end, message);
  }
}
