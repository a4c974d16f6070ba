package org.hullsum.flux;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.numeric.Vector3;

/**
 * Lines along one axis: the stretch inside the region that hangs from a point of its boundary.
 *
 * <p>Where a line passes an edge, a pole or a seam, or is nearly tangent, four lines close to it on
 * all sides take its place. A line that has an odd number of crossings above the point, or none
 * below, contradicts the facings. Not thread-safe.
 */
final class Columns {
  /** The most stretches that a point may be given. */
  static final int MOST_STRETCHES = 4;

  /**
   * Distance of lines close by, relative to the size of the region: their mean errs by its square.
   */
  private static final double ASIDE = 4e-6;

  /** How far along a line its own crossing may be from the point, relative to the size. */
  private static final double HERE = 1e-6;

  /** The same on a line that was moved aside. */
  private static final double HERE_ASIDE = 1e-3;

  private final BoundaryLines lines;
  private final double size;
  private final Vector3 down;
  private final Vector3 first;
  private final Vector3 second;
  private boolean contradicted;

  /**
   * A piece of a line that is inside.
   *
   * @param top where it begins
   * @param bottom where it ends
   * @param bottomPatch index of the patch on which it ends
   */
  record Stretch(Vector3 top, Vector3 bottom, int bottomPatch) {
    double length() {
      return top.minus(bottom).norm();
    }
  }

  Columns(BoundaryLines lines, Vector3 up, double size) {
    this.lines = lines;
    this.size = size;
    this.down = up.unit().negated();
    Vector3 other = Math.abs(down.x()) < 0.6 ? Vector3.X : Vector3.Y;
    Vector3 aside = down.cross(other).unit();
    // Turned by an angle of no meaning, away from the planes of symmetry.
    this.first = aside.times(0.82).plus(down.cross(aside).times(0.57)).unit();
    this.second = down.cross(first);
  }

  /** Whether a line has shown that the facings can't be right. */
  boolean contradicted() {
    return contradicted;
  }

  /**
   * The stretches, of equal weight, that hang from a point; none where it has no length; empty
   * where no line near it is free of doubt.
   */
  Optional<List<Stretch>> below(Vector3 top) {
    Optional<List<BoundaryLines.Hit>> hits = lines.along(top, down);
    if (hits.isPresent()) {
      Optional<Stretch> stretch = stretch(top, hits.get(), HERE * size, true);
      if (stretch.isPresent()) {
        return Optional.of(List.of(stretch.get()));
      }
    }
    List<Stretch> all = new ArrayList<>();
    int followed = 0;
    for (Vector3 side : List.of(first, second, first.negated(), second.negated())) {
      Vector3 aside = top.plus(side.times(ASIDE * size));
      Optional<List<BoundaryLines.Hit>> found = lines.along(aside, down);
      if (found.isPresent()) {
        followed++;
        // A line that misses the region has a stretch without length.
        all.add(
            stretch(aside, found.get(), HERE_ASIDE * size, false)
                .orElse(new Stretch(aside, aside, -1)));
      }
    }
    return followed == 0 ? Optional.empty() : Optional.of(all);
  }

  private Optional<Stretch> stretch(
      Vector3 origin, List<BoundaryLines.Hit> hits, double near, boolean strict) {
    int own = -1;
    for (int k = 0; k < hits.size(); k++) {
      double distance = Math.abs(hits.get(k).t());
      if (distance <= near && (own < 0 || distance < Math.abs(hits.get(own).t()))) {
        own = k;
      }
    }
    if (own < 0) {
      return Optional.empty();
    }
    boolean inside = own % 2 == 0 && own + 1 < hits.size();
    if (!inside) {
      contradicted |= strict;
      return Optional.empty();
    }
    BoundaryLines.Hit bottom = hits.get(own + 1);
    return Optional.of(
        new Stretch(
            origin.plus(down.times(hits.get(own).t())),
            origin.plus(down.times(bottom.t())),
            bottom.patch()));
  }
}
