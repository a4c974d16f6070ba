package org.hullsum.field;

import java.util.List;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Simplifier;
import org.hullsum.expression.VectorExpression;

/**
 * Makes fields of what a case states: components, a gradient, a sum, a carrier with a content.
 *
 * <p>All formulas are in working units; native formulas are in the coordinates' own names and
 * {@code t}. The divergence is symbolic, in the native coordinates where all parts share them, else
 * in {@code x y z}. Piecewise formulas are derived piecewise: a jump leaves no trace in the
 * divergence.
 */
public final class VectorFields {
  private VectorFields() {}

  /** A field by its components along the local unit vectors. */
  public static VectorField ofComponents(
      String name, Coordinates coordinates, VectorExpression components) {
    return of(name, coordinates, components.simplified(), false);
  }

  /** The field times · grad(of). */
  public static VectorField gradient(
      String name, Coordinates coordinates, Expression of, Expression times) {
    VectorExpression gradient = new NativeForm(coordinates).gradient(of);
    return of(name, coordinates, gradient.times(times).simplified(), true);
  }

  /** The sum of one or more fields. */
  public static VectorField sum(String name, List<VectorField> parts) {
    VectorField first = parts.get(0);
    if (parts.stream().allMatch(p -> p.coordinates().equals(first.coordinates()))) {
      VectorExpression sum =
          parts.stream().map(VectorField::components).reduce(VectorExpression::plus).orElseThrow();
      return of(name, first.coordinates(), sum.simplified(), true);
    }
    VectorExpression sum =
        parts.stream().map(VectorField::cartesian).reduce(VectorExpression::plus).orElseThrow();
    Expression divergence =
        parts.stream().map(VectorField::divergence).reduce(Expression::plus).orElseThrow();
    return inCartesian(name, sum.simplified(), Simplifier.simplify(divergence));
  }

  /**
   * A carrier times a content per volume.
   *
   * @param content a density or concentration as a formula in {@code coordinates}
   */
  public static VectorField carried(
      String name, VectorField carrier, Coordinates coordinates, Expression content) {
    if (coordinates.equals(carrier.coordinates())) {
      return of(name, coordinates, carrier.components().times(content).simplified(), true);
    }
    Expression c = new NativeForm(coordinates).toCartesian(content);
    VectorExpression gradient = new NativeForm(CoordinateSystems.cartesian()).gradient(c);
    Expression divergence = c.times(carrier.divergence()).plus(carrier.cartesian().dot(gradient));
    return inCartesian(
        name, carrier.cartesian().times(c).simplified(), Simplifier.simplify(divergence));
  }

  private static VectorField of(
      String name, Coordinates coordinates, VectorExpression components, boolean guarded) {
    NativeForm form = new NativeForm(coordinates);
    Expression divergence = form.divergence(components);
    return new VectorField(
        name,
        form.toCartesian(components, guarded),
        form.toCartesian(divergence),
        coordinates,
        components,
        divergence);
  }

  private static VectorField inCartesian(
      String name, VectorExpression components, Expression divergence) {
    return new VectorField(
        name, components, divergence, CoordinateSystems.cartesian(), components, divergence);
  }
}
