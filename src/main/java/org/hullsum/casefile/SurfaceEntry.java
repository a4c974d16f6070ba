package org.hullsum.casefile;

import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.model.PatchSurface;

/**
 * A surface that was read.
 *
 * @param patchSurface empty where it can't be built because something was refused
 * @param kind the word of the format
 * @param disk what a velocity profile needs to know, for a disk in its place
 * @param section what a traverse needs to know, for a whole disk or a rectangle without trim
 */
record SurfaceEntry(
    Optional<PatchSurface> patchSurface,
    String kind,
    Optional<Disk> disk,
    Optional<DuctSection> section) {
  /**
   * A disk.
   *
   * @param centre in its place
   * @param radius of the outer circle
   * @param whole whether it has no hole
   */
  record Disk(VectorExpression centre, Expression radius, boolean whole) {}
}
