package org.hullsum.casefile;

import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.hullsum.expression.Expression;
import org.hullsum.model.Input;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.hullsum.units.Dimension;
import org.hullsum.units.MeasuredQuantity;
import org.hullsum.units.MeasuredQuantityParser;
import org.hullsum.units.Noted;
import org.hullsum.units.Quantity;
import org.hullsum.units.QuantityParser;
import org.hullsum.units.Unit;
import org.hullsum.units.WorkingUnits;

/**
 * Reads measured quantities: a figure, which becomes an input of its own name so that results can
 * be derived by it, or a formula of parameters.
 */
final class MeasuredReader {
  private final FormulaReader formulas;
  private final CaseScope scope;
  private final MeasuredQuantityParser parser;

  MeasuredReader(FormulaReader formulas) {
    this.formulas = formulas;
    this.scope = formulas.scope();
    this.parser = MeasuredQuantityParser.of(scope.usualMeaning(), scope.working());
  }

  /** A number alone. */
  private static final Pattern BARE =
      Pattern.compile("\\s*([-+]?(?:\\d+\\.?\\d*|\\.\\d+)(?:[eE][-+]?\\d+)?)\\s*");

  /** Whether a text is a value with an uncertainty. */
  static boolean hasUncertainty(String text) {
    return text.indexOf('±') >= 0 || text.contains("+/-") || text.contains("+-");
  }

  /** Reads a value with its uncertainty; empty where it was refused. */
  Optional<MeasuredQuantity> figure(YamlText text) {
    int wrong = text.text().indexOf("+-");
    if (wrong >= 0) {
      scope
          .problems()
          .add(
              ProblemKind.UNCERTAINTY,
              text.place(wrong),
              "`+-` is not read; write ± or +/- before an uncertainty");
      return Optional.empty();
    }
    try {
      Noted<MeasuredQuantity> figure = parser.parseWithNotes(text.text());
      figure.notes().forEach(scope::note);
      return Optional.of(figure.value());
    } catch (TextFault fault) {
      scope.problems().add(text, fault);
      return Optional.empty();
    }
  }

  /**
   * A measured quantity as a formula of inputs.
   *
   * @param name of the input that an inline figure becomes, such as {@code feed metered}
   */
  Optional<Formula> measured(YamlValue value, String name, Need need) {
    Optional<YamlText> text = formulas.values().text(value, need.what());
    if (text.isEmpty()) {
      return Optional.empty();
    }
    Matcher bare = BARE.matcher(text.get().text());
    if (bare.matches() && isAmbiguous(text.get(), bare.group(1), need)) {
      return Optional.empty();
    }
    if (hasUncertainty(text.get().text())) {
      return figure(text.get()).flatMap(figure -> input(text.get(), figure, name, need));
    }
    Optional<Formula> formula = formulas.formula(value, need).filter(f -> isFinite(f, text.get()));
    return formula.map(f -> Figures.isFigure(f.expression()) ? exact(text.get(), f, name) : f);
  }

  /**
   * Refuses a bare number where the unit that the case states for rates is not the working one: it
   * can be meant in either.
   */
  private boolean isAmbiguous(YamlText text, String number, Need need) {
    if (need.stated().isEmpty() || Double.parseDouble(number) == 0) {
      return false;
    }
    Unit unit = need.stated().get();
    double factor = unit.scale() / scope.working().scale(unit.dimension());
    if (BareNumbers.sameScale(factor)) {
      return false;
    }
    scope
        .problems()
        .add(
            ProblemKind.DIMENSION,
            text.place(),
            need.what()
                + " is "
                + number
                + " without a unit: is it "
                + number
                + " "
                + unit.code()
                + ", or "
                + number
                + " in working units (that is "
                + Double.parseDouble(number) / factor
                + " "
                + unit.code()
                + ")? Write its unit after it");
    return true;
  }

  /** Where the parameters are known; a formula of time has no one value. */
  private boolean isFinite(Formula formula, YamlText text) {
    Optional<Double> number = scope.value(formula.expression());
    if (number.isPresent() && !Double.isFinite(number.get())) {
      scope
          .problems()
          .add(
              ProblemKind.WRONG_VALUE,
              text.place(),
              text.shown() + " is not a finite number: it is " + number.get());
      return false;
    }
    return true;
  }

  private Formula exact(YamlText text, Formula formula, String name) {
    double number = scope.value(formula.expression()).orElseThrow();
    return define(
        text, name, number, 0, Double.POSITIVE_INFINITY, formula.dimension(), statedUnit(text));
  }

  /** The unit of an exact figure; its formula has none any more. */
  static Optional<Unit> statedUnit(YamlText text) {
    try {
      Quantity quantity = QuantityParser.parse(text.text());
      return quantity.bare() ? Optional.empty() : Optional.of(quantity.unit());
    } catch (TextFault noFigure) {
      return Optional.empty();
    }
  }

  private Optional<Formula> input(YamlText text, MeasuredQuantity figure, String name, Need need) {
    WorkingUnits working = scope.working();
    if (figure.quantity().bare()
        && isAmbiguous(text, Double.toString(figure.quantity().in(working)), need)) {
      return Optional.empty();
    }
    Optional<Dimension> dimension =
        figure.quantity().bare() || working.none()
            ? Optional.empty()
            : Optional.of(figure.quantity().unit().dimension());
    if (need.dimension().isPresent()
        && dimension.isPresent()
        && !dimension.equals(need.dimension())) {
      scope
          .problems()
          .add(
              ProblemKind.DIMENSION,
              text.place(),
              need.what()
                  + " must be in "
                  + need.dimension().get()
                  + "; this is in "
                  + dimension.get());
      return Optional.empty();
    }
    return Optional.of(
        define(
            text,
            name,
            figure.quantity().in(working),
            figure.standardUncertaintyIn(working),
            figure.degreesOfFreedom(),
            dimension,
            figure.quantity().bare() ? Optional.empty() : Optional.of(figure.quantity().unit())));
  }

  private Formula define(
      YamlText text,
      String wanted,
      double value,
      double standardUncertainty,
      double degreesOfFreedom,
      Optional<Dimension> dimension,
      Optional<Unit> unit) {
    String name = scope.freshName(wanted);
    scope.define(
        new Input(
            name,
            value,
            standardUncertainty,
            degreesOfFreedom,
            Optional.empty(),
            true,
            text.place(),
            unit),
        dimension);
    return new Formula(Expression.symbol(name), dimension);
  }
}
