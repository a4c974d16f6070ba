package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * The boundary of a surface, trimmed or not, as polylines.
 *
 * <p>An untrimmed surface is bounded by the rim sides of its charts. Of a trimmed one the parts of
 * the rim sides that are kept remain, and the curves on which the trim's condition changes are
 * added: followed on a grid that interval enclosures of the condition prove to be fine enough, or
 * that is as fine as the limit allows, and then refined by bisection. Sides that are glued to other
 * sides are boundary where only one of the two is kept.
 *
 * <p>Every point is on the boundary to rounding; the distance of the curve from the polyline stays
 * within the tolerance, as far as it can be judged at the middle of each piece.
 */
public final class BoundaryCurves {
  /** Distance within which ends of curves are one point, relative to the surface's extent. */
  private static final double JOINT = 1e-7;

  private BoundaryCurves() {}

  /**
   * The boundary.
   *
   * @param parameters the value of every parameter
   * @param tolerance largest distance of the curve from the polyline, a length greater than zero
   */
  public static List<BoundaryCurve> of(
      Surface surface, Map<String, Double> parameters, double tolerance) {
    if (!(tolerance > 0)) {
      throw new IllegalArgumentException("tolerance " + tolerance);
    }
    double joint = JOINT * Extent.of(surface, parameters);
    List<BoundaryPiece> pieces = new ArrayList<>();
    GluedSides glued = new GluedSides(joint);
    for (int i = 0; i < surface.charts().size(); i++) {
      Chart chart = surface.charts().get(i);
      BoundaryTracer tracer = new BoundaryTracer(i, chart, surface.trimOn(chart), parameters);
      pieces.addAll(tracer.rim(tolerance));
      pieces.addAll(tracer.trimCurves(tolerance));
      if (surface.trim().isPresent()) {
        tracer.gluedSides(tolerance).forEach(glued::add);
      }
    }
    pieces.addAll(glued.unmatched());
    return new PieceChain(pieces, joint).curves();
  }
}
