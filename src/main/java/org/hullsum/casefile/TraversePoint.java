package org.hullsum.casefile;

import org.hullsum.problem.Place;

/**
 * Where a reading was taken.
 *
 * @param first share of the radius from the centre, or of the first edge from the corner
 * @param second angle in radians, or share of the second edge
 * @param read whether there is a reading, or its cell is empty
 * @param place of its line in the table
 */
record TraversePoint(double first, double second, boolean read, Place place) {}
