package org.hullsum.geometry;

import java.util.Arrays;
import java.util.List;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.Chart.Side;

/**
 * Finds which sides of a formula's square are rims: not those that shrink to a point, nor opposite
 * sides that coincide point by point. Sides that coincide in opposite senses stay rims, so that
 * what is sewn to itself the wrong way round is seen.
 */
final class SideGluing {
  /** Points along a side, and along each direction of the square. */
  private static final int SAMPLES = 17;

  private final Figures figures;
  private final VectorExpression position;
  private final double size;

  private SideGluing(VectorExpression position, Figures figures) throws SurfaceFault {
    this.figures = figures;
    this.position = position;
    this.size = size();
  }

  static Chart chart(VectorExpression position, Figures figures) throws SurfaceFault {
    SideGluing gluing = new SideGluing(position, figures);
    boolean joinedU = gluing.joined(position, gluing.size, true);
    boolean joinedV = gluing.joined(position, gluing.size, false);
    ChartSides sides =
        new ChartSides()
            .add(Side.U_START, !joinedU && !gluing.drawnToPoint(true, 0))
            .add(Side.U_END, !joinedU && !gluing.drawnToPoint(true, 1))
            .add(Side.V_START, !joinedV && !gluing.drawnToPoint(false, 0))
            .add(Side.V_END, !joinedV && !gluing.drawnToPoint(false, 1));
    return new Chart(
        position,
        joinedU && gluing.smooth(Chart.U, true),
        joinedV && gluing.smooth(Chart.V, false),
        sides.rim());
  }

  /** Largest distance between sample points; also refuses what is not a surface. */
  private double size() throws SurfaceFault {
    double[][] at = ChartSamples.grid(SAMPLES);
    double[][] r = values(position, at);
    double[][] area =
        values(position.derivative(Chart.U).cross(position.derivative(Chart.V)).simplified(), at);
    double largest = 0;
    double largestArea = 0;
    for (int i = 0; i < at[0].length; i++) {
      double distance =
          Math.hypot(Math.hypot(r[0][i] - r[0][0], r[1][i] - r[1][0]), r[2][i] - r[2][0]);
      if (!Double.isFinite(distance)) {
        throw new SurfaceFault(
            "point", "the formula is not finite everywhere in the ranges of u and v");
      }
      largest = Math.max(largest, distance);
      largestArea =
          Math.max(largestArea, Math.hypot(Math.hypot(area[0][i], area[1][i]), area[2][i]));
    }
    if (!(largestArea > Tolerance.ROUNDING * largest * largest)) {
      throw new SurfaceFault(
          "point", "the formula gives a curve or a point, not a surface: r_u × r_v vanishes");
    }
    return largest;
  }

  private double[][] values(VectorExpression e, double[][] at) {
    return figures.values(List.of(e.x(), e.y(), e.z()), List.of(Chart.U, Chart.V), at);
  }

  /** The points of one side: of u (or of v) at its start or end. */
  private static double[][] side(boolean ofU, double at) {
    double[][] points = new double[2][SAMPLES];
    for (int i = 0; i < SAMPLES; i++) {
      double along = i / (SAMPLES - 1.0);
      points[0][i] = ofU ? at : along;
      points[1][i] = ofU ? along : at;
    }
    return points;
  }

  private boolean joined(VectorExpression e, double scale, boolean ofU) {
    double[][] start = values(e, side(ofU, 0));
    double[][] end = values(e, side(ofU, 1));
    return farthest(start, end) <= Tolerance.POSITION * scale;
  }

  private boolean smooth(String symbol, boolean ofU) {
    VectorExpression tangent = position.derivative(symbol);
    double[][] start = values(tangent, side(ofU, 0));
    double scale = farthest(start, new double[3][SAMPLES]);
    return joined(tangent, scale, ofU);
  }

  private boolean drawnToPoint(boolean ofU, double at) {
    double[][] points = values(position, side(ofU, at));
    double[][] first = new double[3][SAMPLES];
    for (int k = 0; k < 3; k++) {
      Arrays.fill(first[k], points[k][0]);
    }
    return farthest(points, first) <= Tolerance.POSITION * size;
  }

  /** Largest distance between corresponding points; infinite if one is not finite. */
  private static double farthest(double[][] a, double[][] b) {
    double largest = 0;
    for (int i = 0; i < SAMPLES; i++) {
      double distance =
          Math.hypot(Math.hypot(a[0][i] - b[0][i], a[1][i] - b[1][i]), a[2][i] - b[2][i]);
      largest = Math.max(largest, Double.isFinite(distance) ? distance : Double.POSITIVE_INFINITY);
    }
    return largest;
  }
}
