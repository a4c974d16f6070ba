package org.hullsum.casefile;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.expression.DimensionCheck;
import org.hullsum.expression.Expression;
import org.hullsum.expression.ExpressionParser;
import org.hullsum.expression.ParsedExpression;
import org.hullsum.expression.Symbols;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.hullsum.units.Dimension;
import org.hullsum.units.Unit;

/** Reads numbers, quantities and formulas, and checks their dimensions against what is needed. */
final class FormulaReader {
  private final CaseScope scope;
  private final ValueReader values;

  FormulaReader(CaseScope scope) {
    this.scope = scope;
    this.values = new ValueReader(scope.problems());
  }

  ValueReader values() {
    return values;
  }

  CaseScope scope() {
    return scope;
  }

  /** A formula of parameters and the variables of its place, in working units. */
  Optional<Formula> formula(YamlValue value, Need need) {
    Optional<YamlText> text = values.text(value, need.what());
    return text.flatMap(t -> parse(t, need)).flatMap(p -> checked(text.get(), p, need));
  }

  Optional<Expression> expression(YamlValue value, Need need) {
    return formula(value, need).map(Formula::expression);
  }

  /** The formula of a text, its dimensions not yet looked at. */
  Optional<ParsedExpression> parse(YamlText text, Need need) {
    if (scope.problems().full()) {
      return Optional.empty();
    }
    try {
      ParsedExpression parsed =
          ExpressionParser.parse(text.text(), symbols(need).keySet(), scope.working());
      parsed.notes().forEach(scope::note);
      Symbols.in(parsed.root()).forEach(scope::uses);
      if (need.variables().containsKey("t") && Symbols.in(parsed.root()).contains("t")) {
        scope.usesTime(text.place());
      }
      return Optional.of(parsed);
    } catch (TextFault fault) {
      scope
          .problems()
          .add(fault.kind(), text.place(fault.start()), fault.getMessage() + YamlTraps.hint(text));
      return Optional.empty();
    }
  }

  /** A formula with its dimension, which must be the one that is needed. */
  Optional<Formula> checked(YamlText text, ParsedExpression parsed, Need need) {
    if (scope.working().none()) {
      return Optional.of(new Formula(parsed.root(), Optional.empty()));
    }
    try {
      Optional<Dimension> found = DimensionCheck.of(parsed, symbols(need));
      if (need.dimension().isPresent()
          && found.isPresent()
          && !found.get().equals(need.dimension().get())) {
        throw parsed.faultAt(parsed.root(), ProblemKind.DIMENSION, mismatch(need, found.get()));
      }
      Expression root = parsed.root();
      if (need.stated().isPresent() && found.isEmpty()) {
        root = inStatedUnit(root, need.stated().get());
      } else if (need.stated().isPresent()) {
        refuseMixture(parsed, need.stated().get());
      }
      return Optional.of(new Formula(root, found));
    } catch (TextFault fault) {
      scope.problems().add(text, fault);
      return Optional.empty();
    }
  }

  private Map<String, Optional<Dimension>> symbols(Need need) {
    return need.variables().isEmpty()
        ? scope.dimensions()
        : new LayeredMap<>(need.variables(), scope.dimensions());
  }

  private static String mismatch(Need need, Dimension found) {
    Dimension wanted = need.dimension().orElseThrow();
    if (wanted.isNone()) {
      return need.what() + " is a plain number or an angle; this is in " + found;
    }
    return need.what()
        + " must be in "
        + need.stated().map(u -> "`" + u.code() + "` (" + wanted + ")").orElse(wanted.toString())
        + "; this is "
        + (found.isNone() ? "a plain number" : "in " + found);
  }

  /** A bare number alone is in the unit that the case states beside it. */
  private Expression inStatedUnit(Expression root, Unit unit) {
    double factor = unit.scale() / scope.working().scale(unit.dimension());
    Optional<Double> number = BareNumbers.value(root);
    return number.isPresent() ? Expression.number(number.get() * factor) : root;
  }

  /** A bare number in a sum can be meant in the working or in the stated unit: asked for. */
  private void refuseMixture(ParsedExpression parsed, Unit unit) throws TextFault {
    double factor = unit.scale() / scope.working().scale(unit.dimension());
    if (BareNumbers.sameScale(factor)) {
      return;
    }
    Optional<Expression> bare = BareNumbers.inSum(parsed.root());
    if (bare.isPresent()) {
      double number = BareNumbers.value(bare.get()).orElseThrow();
      throw parsed.faultAt(
          bare.get(),
          ProblemKind.DIMENSION,
          "the bare number "
              + number
              + " stands in a sum: is it "
              + number
              + " in working units (that is "
              + number / factor
              + " "
              + unit.code()
              + "), or "
              + number
              + " "
              + unit.code()
              + "? Write its unit after it");
    }
  }

  /** A finite number of parameters; empty where it was refused or depends on what was. */
  OptionalDouble number(YamlValue value, Need need) {
    Optional<Double> number = expression(value, need).flatMap(scope::value);
    if (number.isPresent() && !Double.isFinite(number.get())) {
      scope
          .problems()
          .add(
              ProblemKind.WRONG_VALUE,
              value.place(),
              need.what() + " is not a finite number: it is " + number.get());
      return OptionalDouble.empty();
    }
    return number.isPresent() ? OptionalDouble.of(number.get()) : OptionalDouble.empty();
  }

  /** Three formulas. */
  Optional<VectorExpression> vector(YamlValue value, Need need) {
    Optional<List<YamlValue>> items = values.items(value, 3, need.what(), "of three components");
    if (items.isEmpty()) {
      return Optional.empty();
    }
    Optional<Expression> x = expression(items.get().get(0), need);
    Optional<Expression> y = expression(items.get().get(1), need);
    Optional<Expression> z = expression(items.get().get(2), need);
    return x.isPresent() && y.isPresent() && z.isPresent()
        ? Optional.of(new VectorExpression(x.get(), y.get(), z.get()))
        : Optional.empty();
  }

  Optional<VectorExpression> point(YamlValue value, String what) {
    return vector(value, Need.length(what));
  }

  /** A direction of any length but zero; its components may be of any one dimension. */
  Optional<Vector3> direction(YamlValue value, String what) {
    Optional<VectorExpression> vector = vector(value, Need.any(what));
    if (vector.isEmpty()) {
      return Optional.empty();
    }
    Optional<Vector3> direction = value(vector.get());
    if (direction.isPresent() && (!direction.get().isFinite() || direction.get().norm() == 0)) {
      scope
          .problems()
          .add(
              ProblemKind.WRONG_VALUE,
              value.place(),
              what + " is a direction and needs a finite length other than zero");
      return Optional.empty();
    }
    return direction;
  }

  /** The value of a vector of formulas of parameters; empty where one of them was refused. */
  Optional<Vector3> value(VectorExpression vector) {
    Optional<Double> x = scope.value(vector.x());
    Optional<Double> y = scope.value(vector.y());
    Optional<Double> z = scope.value(vector.z());
    return x.isPresent() && y.isPresent() && z.isPresent()
        ? Optional.of(new Vector3(x.get(), y.get(), z.get()))
        : Optional.empty();
  }
}
