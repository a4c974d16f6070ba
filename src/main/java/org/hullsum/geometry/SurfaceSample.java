package org.hullsum.geometry;

/**
 * A point in the interior of a surface.
 *
 * @param chart index of its chart
 * @param u its first coordinate
 * @param v its second
 * @param at the position with its tangents; the area vector is not zero
 * @param clearance a lower estimate of the distance along the surface to the nearest rim, chart
 *     side or curve of the trim
 */
public record SurfaceSample(int chart, double u, double v, ChartPoint at, double clearance) {}
