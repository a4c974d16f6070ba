package org.hullsum.flux;

import java.util.ArrayList;
import java.util.Collections;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Operator;
import org.hullsum.expression.Expression.Symbol;
import org.hullsum.expression.Function;
import org.hullsum.expression.Symbols;
import org.hullsum.numeric.Interval;

/** Collects the {@link Hazard}s of formulas, each under the conditions that guard it. */
final class Hazards implements Expression.Visitor<Void> {
  private final Map<String, Double> constants;
  private final List<Hazard> found = new ArrayList<>();
  private List<Hazard.Guard> guards = List.of();
  private Set<Expression> seen = Collections.newSetFromMap(new IdentityHashMap<>());

  private Hazards(Map<String, Double> constants) {
    this.constants = constants;
  }

  /**
   * The hazards of the formulas.
   *
   * @param constants the value of every symbol that is no variable
   */
  static List<Hazard> in(List<Expression> formulas, Map<String, Double> constants) {
    Hazards hazards = new Hazards(constants);
    formulas.forEach(hazards::visit);
    return hazards.found;
  }

  private void visit(Expression e) {
    if (seen.add(e)) {
      e.accept(this);
    }
  }

  private void visitChildren(Expression e) {
    e.children().forEach(this::visit);
  }

  private void add(Expression argument, Hazard.Kind kind, Expression part) {
    if (isFixed(argument)) {
      double value = InputSensitivity.number(argument, constants);
      if (Double.isFinite(value) && !kind.possible(Interval.point(value))) {
        return;
      }
    }
    found.add(new Hazard(argument, kind, part, guards));
  }

  @Override
  public Void constant(Constant constant) {
    return null;
  }

  @Override
  public Void symbol(Symbol symbol) {
    return null;
  }

  @Override
  public Void negation(Negation negation) {
    visitChildren(negation);
    return null;
  }

  @Override
  public Void binary(Binary binary) {
    visitChildren(binary);
    if (binary.operator() == Operator.DIVIDE) {
      add(binary.right(), Hazard.Kind.ZERO, binary);
    } else if (binary.operator() == Operator.POWER) {
      power(binary);
    }
    return null;
  }

  private boolean isFixed(Expression e) {
    return constants.keySet().containsAll(Symbols.in(e));
  }

  private void power(Binary power) {
    if (!isFixed(power.right())) {
      add(power.left(), Hazard.Kind.NOT_POSITIVE, power);
      return;
    }
    double exponent = InputSensitivity.number(power.right(), constants);
    boolean whole = exponent == Math.rint(exponent);
    if (whole && exponent < 0) {
      add(power.left(), Hazard.Kind.ZERO, power);
    } else if (!whole) {
      add(power.left(), exponent < 0 ? Hazard.Kind.NOT_POSITIVE : Hazard.Kind.NEGATIVE, power);
    }
  }

  @Override
  public Void call(Call call) {
    visitChildren(call);
    Expression argument = call.arguments().get(0);
    switch (call.function()) {
      case LN, LOG10 -> add(argument, Hazard.Kind.NOT_POSITIVE, call);
      case SQRT -> add(argument, Hazard.Kind.NEGATIVE, call);
      case ASIN, ACOS -> add(argument, Hazard.Kind.BEYOND_ONE, call);
      case TAN -> add(Expression.call(Function.COS, argument), Hazard.Kind.ZERO, call);
      default -> {}
    }
    return null;
  }

  @Override
  public Void comparison(Comparison comparison) {
    visitChildren(comparison);
    return null;
  }

  @Override
  public Void logical(Logical logical) {
    visitChildren(logical);
    return null;
  }

  @Override
  public Void conditional(Conditional conditional) {
    visit(conditional.condition());
    guarded(conditional.condition(), true, conditional.then());
    guarded(conditional.condition(), false, conditional.otherwise());
    return null;
  }

  /** A part seen under one guard may still have to be seen under another. */
  private void guarded(Expression condition, boolean holds, Expression part) {
    List<Hazard.Guard> outer = guards;
    Set<Expression> outerSeen = seen;
    guards = new ArrayList<>(outer);
    guards.add(new Hazard.Guard(condition, holds));
    seen = Collections.newSetFromMap(new IdentityHashMap<>());
    visit(part);
    guards = outer;
    seen = outerSeen;
  }
}
