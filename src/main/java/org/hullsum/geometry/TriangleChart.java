package org.hullsum.geometry;

import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.geometry.Chart.Side;

/**
 * How a triangle a, b, c of a polygon is a chart: a + u ((b − a) + v (c − b)), so that u = 0 is
 * drawn to a, v = 0 is the edge ab, u = 1 is bc and v = 1 is ca.
 */
final class TriangleChart {
  private TriangleChart() {}

  /** The sides that are edges of the polygon of that many corners. */
  static Set<Side> rim(PlanePolygon.Triangle triangle, int corners) {
    return new ChartSides()
        .add(Side.V_START, follow(triangle.a(), triangle.b(), corners))
        .add(Side.U_END, follow(triangle.b(), triangle.c(), corners))
        .add(Side.V_END, follow(triangle.c(), triangle.a(), corners))
        .rim();
  }

  private static boolean follow(int from, int to, int corners) {
    return to == (from + 1) % corners;
  }

  /** One coordinate on the square, from its values at the corners. */
  static Expression at(Expression a, Expression b, Expression c) {
    return a.plus(Chart.u().times(b.minus(a).plus(Chart.v().times(c.minus(b)))));
  }
}
