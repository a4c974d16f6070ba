package org.hullsum.field;

import java.util.Objects;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;

/**
 * A flux density: an amount per area and time, a vector at each point and instant.
 *
 * <p>The Cartesian form serves evaluation; the native form, in the coordinates in which the field
 * was stated, serves printing and the search for singularities, since the denominators that
 * cylindrical and spherical coordinates bring in are absent from the native components.
 *
 * @param name the name in the case
 * @param cartesian components along x, y, z as formulas in {@code x y z t}, in working units
 * @param divergence ∇·F as a formula in {@code x y z t}, in working units
 * @param coordinates the coordinates of the native form
 * @param components the components along the local unit vectors, formulas in the native coordinates
 *     and {@code t}
 * @param printedDivergence ∇·F in the native coordinates, simplified for reading
 */
public record VectorField(
    String name,
    VectorExpression cartesian,
    Expression divergence,
    Coordinates coordinates,
    VectorExpression components,
    Expression printedDivergence) {
  public VectorField {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(cartesian, "cartesian");
    Objects.requireNonNull(divergence, "divergence");
    Objects.requireNonNull(coordinates, "coordinates");
    Objects.requireNonNull(components, "components");
    Objects.requireNonNull(printedDivergence, "printedDivergence");
  }
}
