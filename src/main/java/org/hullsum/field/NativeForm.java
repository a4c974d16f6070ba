package org.hullsum.field;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.hullsum.expression.Derivative;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.expression.Simplifier;
import org.hullsum.expression.Substitution;
import org.hullsum.expression.VectorExpression;

/**
 * Differential operators in the coordinates in which a field is stated, and the way from there to
 * {@code x y z}.
 *
 * <p>With scale factors (1, r, 1) of cylindrical and (1, r, r sin polar) of spherical coordinates
 * (the usual formulas; E. Kreyszig, Advanced Engineering Mathematics, chapter 9 and appendix, from
 * memory):
 *
 * <pre>
 *   cylindrical  div F = ∂F_r/∂r + F_r/r + (1/r) ∂F_θ/∂θ + ∂F_z/∂z
 *   spherical    div F = ∂F_r/∂r + 2 F_r/r + (1/r) ∂F_p/∂p + cos p F_p/(r sin p) + (1/(r sin p)) ∂F_a/∂a
 * </pre>
 *
 * <p>On the axis the terms with a denominator are 0/0 where the field is smooth. There the
 * evaluated form takes the limit: it keeps the distance from the axis (and from the centre) at
 * least {@link #AXIS_GUARD}, by a hypotenuse, which changes no other value by a rounding and
 * switches nowhere.
 */
final class NativeForm {
  /**
   * The least distance from the axis in formulas with a denominator: so small that no length of any
   * case is near it, so large that quotients of two such numbers neither overflow nor vanish.
   */
  static final double AXIS_GUARD = 1e-150;

  private static final Expression ZERO = Expression.number(0);
  private static final Expression ONE = Expression.number(1);

  private final Coordinates coordinates;
  private final List<String> names;

  NativeForm(Coordinates coordinates) {
    this.coordinates = coordinates;
    this.names = List.copyOf(coordinates.definitions().keySet());
  }

  Expression divergence(VectorExpression f) {
    Expression r = Expression.symbol("r");
    List<Expression> terms = new ArrayList<>();
    Expression first = derivative(f.x(), 0);
    Expression second = derivative(f.y(), 1);
    Expression third = derivative(f.z(), 2);
    switch (coordinates.kind()) {
      case CARTESIAN -> terms.addAll(List.of(first, second, third));
      case CYLINDRICAL -> terms.addAll(List.of(first, f.x().over(r), second.over(r), third));
      case SPHERICAL -> {
        Expression polar = Expression.symbol("polar");
        Expression sine = Expression.call(Function.SIN, polar);
        Expression cosine = Expression.call(Function.COS, polar);
        terms.add(first);
        terms.add(Expression.number(2).times(f.x()).over(r));
        terms.add(second.over(r));
        terms.add(cosine.times(f.y()).over(r.times(sine)));
        terms.add(third.over(r.times(sine)));
      }
    }
    return Simplifier.simplify(
        terms.stream().map(Simplifier::simplify).reduce(Expression::plus).orElseThrow());
  }

  VectorExpression gradient(Expression f) {
    Expression r = Expression.symbol("r");
    Expression first = derivative(f, 0);
    Expression second = derivative(f, 1);
    Expression third = derivative(f, 2);
    return switch (coordinates.kind()) {
      case CARTESIAN -> new VectorExpression(first, second, third);
      case CYLINDRICAL -> new VectorExpression(first, second.over(r), third).simplified();
      case SPHERICAL ->
          new VectorExpression(
                  first,
                  second.over(r),
                  third.over(r.times(Expression.call(Function.SIN, Expression.symbol("polar")))))
              .simplified();
    };
  }

  private Expression derivative(Expression e, int coordinate) {
    return Derivative.of(e, names.get(coordinate));
  }

  /** A formula in native coordinates as one in {@code x y z}, with the limit taken on the axis. */
  Expression toCartesian(Expression e) {
    return coordinates.kind() == Coordinates.Kind.CARTESIAN
        ? e
        : Substitution.replace(e, guarded());
  }

  /** The Cartesian components, in {@code x y z}, of a vector with native components. */
  VectorExpression toCartesian(VectorExpression f, boolean guarded) {
    if (coordinates.kind() == Coordinates.Kind.CARTESIAN) {
      return f;
    }
    VectorExpression placed = f.replace(guarded ? guarded() : coordinates.definitions());
    List<VectorExpression> unit = coordinates.unitVectors();
    return new VectorExpression(
        combined(placed, unit, VectorExpression::x),
        combined(placed, unit, VectorExpression::y),
        combined(placed, unit, VectorExpression::z));
  }

  /** A way to take one component of a vector. */
  @FunctionalInterface
  private interface Component {
    Expression of(VectorExpression vector);
  }

  /**
   * One Cartesian component. Only terms that vanish are left out: what is evaluated needs no
   * further simplifying, which would cost more than it saves.
   */
  private static Expression combined(
      VectorExpression components, List<VectorExpression> unit, Component component) {
    List<Expression> stated = List.of(components.x(), components.y(), components.z());
    Expression sum = ZERO;
    for (int i = 0; i < stated.size(); i++) {
      Expression direction = component.of(unit.get(i));
      if (!ZERO.equals(stated.get(i)) && !ZERO.equals(direction)) {
        Expression term = ONE.equals(direction) ? stated.get(i) : stated.get(i).times(direction);
        sum = ZERO.equals(sum) ? term : sum.plus(term);
      }
    }
    return sum;
  }

  private Map<String, Expression> guarded() {
    Map<String, Expression> definitions = new LinkedHashMap<>(coordinates.definitions());
    definitions.computeIfPresent("r", (name, r) -> away(r));
    definitions.computeIfPresent("polar", (name, polar) -> offAxis(polar));
    return definitions;
  }

  private static Expression away(Expression distance) {
    return Expression.call(Function.HYPOT, distance, Expression.number(AXIS_GUARD));
  }

  /** The polar angle, by atan2 of the distance from the axis and the distance along it. */
  private static Expression offAxis(Expression polar) {
    List<Expression> arguments = polar.children();
    return Expression.call(Function.ATAN2, away(arguments.get(0)), arguments.get(1));
  }
}
