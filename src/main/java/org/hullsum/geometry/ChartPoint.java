package org.hullsum.geometry;

import org.hullsum.numeric.Vector3;

/**
 * A point of a chart with what belongs to it.
 *
 * @param position r
 * @param tangentU r_u
 * @param tangentV r_v
 * @param areaVector r_u × r_v; zero at a pole
 */
public record ChartPoint(Vector3 position, Vector3 tangentU, Vector3 tangentV, Vector3 areaVector) {
  /**
   * Distance along the surface to the nearest side of the unit square, as the tangents here
   * estimate it; 0 where they don't span an area.
   */
  double sideDistance(double u, double v) {
    double area = areaVector.norm();
    double fromU = Math.min(u, 1 - u) * area / tangentV.norm();
    double fromV = Math.min(v, 1 - v) * area / tangentU.norm();
    double nearest = Math.min(fromU, fromV);
    return Double.isNaN(nearest) ? 0 : nearest;
  }
}
