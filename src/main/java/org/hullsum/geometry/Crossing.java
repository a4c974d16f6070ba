package org.hullsum.geometry;

/**
 * A point at which a line passes through a surface.
 *
 * @param t where on the line: at origin + t · direction
 * @param chart index of the chart
 * @param u its first coordinate there
 * @param v its second
 * @param cosine of the angle between the direction of the line and the construction normal
 * @param nearEdge whether it is within tolerance of a side of the chart or a curve of the trim
 */
public record Crossing(double t, int chart, double u, double v, double cosine, boolean nearEdge) {}
