package org.hullsum.geometry;

import java.util.Objects;
import org.hullsum.expression.Expression;

/**
 * The range of a coordinate.
 *
 * @param from where it begins
 * @param to where it ends
 */
public record Span(Expression from, Expression to) {
  public Span {
    Objects.requireNonNull(from, "from");
    Objects.requireNonNull(to, "to");
  }

  public static Span of(double from, double to) {
    return new Span(Expression.number(from), Expression.number(to));
  }

  /** An angle from 0 to 2π. */
  public static Span fullTurn() {
    return of(0, 2 * Math.PI);
  }

  /** From pole to pole: 0 to π. */
  public static Span poleToPole() {
    return of(0, Math.PI);
  }

  /** The linear map that takes 0 to {@code from} and 1 to {@code to}. */
  Expression at(Expression fraction) {
    return from.plus(fraction.times(to.minus(from)));
  }
}
