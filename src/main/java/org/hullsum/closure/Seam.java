package org.hullsum.closure;

import java.util.List;
import java.util.stream.Collectors;

/**
 * A stretch of curve at which patches of one volume meet.
 *
 * @param sides the stretches that coincide there, two or more
 * @param length of the stretch
 * @param slack largest distance found between them
 */
public record Seam(List<Side> sides, double length, double slack) {
  /**
   * One patch's stretch.
   *
   * @param patch index of the patch
   * @param forward whether its rim runs as the first side's does
   */
  public record Side(int patch, boolean forward) {}

  public Seam {
    sides = List.copyOf(sides);
    if (sides.size() < 2) {
      throw new IllegalArgumentException("a seam joins at least two stretches");
    }
  }

  /** Whether more than two stretches meet, so that it says nothing of orientation. */
  public boolean isCrowded() {
    return sides.size() > 2;
  }

  /**
   * Whether the construction normals of the two patches agree: their rims run in opposite senses.
   */
  public boolean agrees() {
    return sides.get(0).forward() != sides.get(1).forward();
  }

  /** Whether the patch is sewn to itself. */
  public boolean isSelfSeam() {
    return !isCrowded() && sides.get(0).patch() == sides.get(1).patch();
  }

  /** The patches, each once, in ascending order. */
  public List<Integer> patches() {
    return sides.stream().map(Side::patch).distinct().sorted().collect(Collectors.toList());
  }
}
