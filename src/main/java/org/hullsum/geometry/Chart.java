package org.hullsum.geometry;

import java.util.Objects;
import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;

/**
 * A piece of a surface: a map of the unit square to space, r(u, v) with 0 ≤ u, v ≤ 1, by three
 * formulas in {@code u}, {@code v} and the parameters of the case.
 *
 * <p>The construction normal points along r_u × r_v, also where a side of the square is drawn
 * together to one point (a pole, an apex) and the product vanishes there.
 *
 * @param position r(u, v)
 * @param periodicU whether u runs a full turn, so that the sides u = 0 and u = 1 coincide
 * @param periodicV the same for v
 * @param rim the sides that belong to the boundary of the untrimmed surface; sides glued to a
 *     neighbouring chart, to one another, or drawn to a point are not among them
 */
public record Chart(
    VectorExpression position, boolean periodicU, boolean periodicV, Set<Side> rim) {
  /** A side of the unit square. */
  public enum Side {
    /** u = 0. */
    U_START,
    /** u = 1. */
    U_END,
    /** v = 0. */
    V_START,
    /** v = 1. */
    V_END
  }

  /** The first coordinate of the unit square in the formulas of a chart. */
  public static final String U = "u";

  /** The second. */
  public static final String V = "v";

  public Chart {
    Objects.requireNonNull(position, "position");
    rim = Set.copyOf(rim);
  }

  /** r_u. */
  public VectorExpression tangentU() {
    return position.derivative(U);
  }

  /** r_v. */
  public VectorExpression tangentV() {
    return position.derivative(V);
  }

  /** r_u × r_v: the construction normal times the area per unit of u and v. */
  public VectorExpression areaVector() {
    return tangentU().cross(tangentV()).simplified();
  }

  public static Expression u() {
    return Expression.symbol(U);
  }

  public static Expression v() {
    return Expression.symbol(V);
  }
}
