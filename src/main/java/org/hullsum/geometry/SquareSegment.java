package org.hullsum.geometry;

/**
 * A directed segment in a chart's unit square, with the kept part on its left.
 *
 * @param startU where it starts
 * @param startV where it starts
 * @param endU where it ends
 * @param endV where it ends
 */
record SquareSegment(double startU, double startV, double endU, double endV) {}
