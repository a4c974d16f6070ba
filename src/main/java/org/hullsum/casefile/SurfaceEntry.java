package org.hullsum.casefile;

import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.Surface;

/**
 * A surface that was read.
 *
 * @param surface empty where it can't be built because a parameter was refused
 * @param kind the word of the format
 * @param disk what a velocity profile needs to know, for a disk in its place
 */
record SurfaceEntry(Optional<Surface> surface, String kind, Optional<Disk> disk) {
  /**
   * A disk.
   *
   * @param centre in its place
   * @param radius of the outer circle
   * @param whole whether it has no hole
   */
  record Disk(VectorExpression centre, Expression radius, boolean whole) {}
}
