package org.hullsum.geometry;

import java.util.List;
import java.util.Map;
import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Substitution;
import org.hullsum.expression.Symbols;

/**
 * A region of two coordinates in which the range of the inner one may depend on the outer one,
 * mapped from the unit square.
 *
 * <p>Where the inner range shrinks to nothing at an end of the outer one, as in y from −√(1 − x²)
 * to √(1 − x²), the outer coordinate is eased there (quadratically), so that a square root becomes
 * smooth on the unit square.
 *
 * @param outer the outer coordinate on the square, in {@code outerFraction}
 * @param inner the inner one, in both fractions
 * @param startCollapsed whether the inner range is a point where the outer one begins
 * @param endCollapsed whether it is where it ends
 */
record ParameterBox(
    Expression outer, Expression inner, boolean startCollapsed, boolean endCollapsed) {
  private static final int SAMPLES = 65;

  /**
   * A coordinate of the region.
   *
   * @param name the symbol in the formulas, also the key at fault
   * @param span its range
   * @param fraction the symbol on the unit square that it runs along
   */
  record Coordinate(String name, Span span, Expression fraction) {}

  static ParameterBox of(Coordinate outer, Coordinate inner, Figures figures) throws SurfaceFault {
    refuseSymbol(outer, inner.name());
    refuseSymbol(outer, outer.name());
    refuseSymbol(inner, inner.name());
    figures.increasing(outer.name(), outer.span());
    double from = figures.value(outer.name(), outer.span().from());
    double to = figures.value(outer.name(), outer.span().to());
    double[] at = new double[SAMPLES];
    for (int i = 0; i < SAMPLES; i++) {
      double fraction = i / (SAMPLES - 1.0);
      at[i] = from * (1 - fraction) + to * fraction;
    }
    double[] width = widths(outer, inner, at, figures);
    double widest = 0;
    for (double w : width) {
      widest = Math.max(widest, w);
    }
    double least = Tolerance.ROUNDING * widest;
    for (int i = 0; i < SAMPLES; i++) {
      boolean atEnd = i == 0 || i == SAMPLES - 1;
      if (!(width[i] > least || (atEnd && width[i] >= -least))) {
        throw new SurfaceFault(
            inner.name(),
            "the range of "
                + inner.name()
                + " does not increase at "
                + outer.name()
                + " = "
                + at[i]
                + " (its width is "
                + width[i]
                + "); state the smaller limit first");
      }
    }
    boolean startCollapsed = width[0] <= least;
    boolean endCollapsed = width[SAMPLES - 1] <= least;
    Expression eased = eased(outer.fraction(), startCollapsed, endCollapsed);
    Expression along =
        from + (to - from) == to
            ? outer.span().at(eased)
            : outer
                .span()
                .from()
                .times(Expression.number(1).minus(eased))
                .plus(outer.span().to().times(eased));
    Map<String, Expression> place = Map.of(outer.name(), along);
    Span limits =
        new Span(
            Substitution.replace(inner.span().from(), place),
            Substitution.replace(inner.span().to(), place));
    return new ParameterBox(along, limits.at(inner.fraction()), startCollapsed, endCollapsed);
  }

  private static void refuseSymbol(Coordinate coordinate, String symbol) throws SurfaceFault {
    Span span = coordinate.span();
    for (Set<String> names : List.of(Symbols.in(span.from()), Symbols.in(span.to()))) {
      if (names.contains(symbol)) {
        throw new SurfaceFault(
            coordinate.name(),
            "the limits of "
                + coordinate.name()
                + " contain "
                + symbol
                + "; only one of the two ranges may depend on the other coordinate");
      }
    }
  }

  private static double[] widths(Coordinate outer, Coordinate inner, double[] at, Figures figures) {
    return figures
        .values(
            List.of(inner.span().to().minus(inner.span().from())),
            List.of(outer.name()),
            new double[][] {at})[0];
  }

  /** The outer coordinate's fraction, flat where the inner range collapses. */
  private static Expression eased(Expression p, boolean start, boolean end) {
    if (start && end) {
      return p.times(p).times(Expression.number(3).minus(Expression.number(2).times(p)));
    }
    if (start) {
      return p.times(p);
    }
    return end ? p.times(Expression.number(2).minus(p)) : p;
  }
}
