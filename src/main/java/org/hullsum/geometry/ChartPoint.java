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
public record ChartPoint(
    Vector3 position, Vector3 tangentU, Vector3 tangentV, Vector3 areaVector) {}
