package org.hullsum.closure;

import java.util.List;
import java.util.Objects;
import org.hullsum.numeric.Vector3;

/**
 * The facings of all patches of one volume.
 *
 * @param facings in the order in which the patches were given
 * @param overlaps pairs of patches that coincide in part
 */
public record VolumeFacings(List<FoundFacing> facings, List<Overlap> overlaps) {
  /**
   * Two patches with a point in common that is away from the rim of the first, and at which they do
   * not merely cross.
   *
   * @param first index of a patch
   * @param second index of another, larger
   * @param place a common point
   */
  public record Overlap(int first, int second, Vector3 place) {
    public Overlap {
      Objects.requireNonNull(place, "place");
      if (first >= second) {
        throw new IllegalArgumentException("patches " + first + ", " + second + " out of order");
      }
    }
  }

  public VolumeFacings {
    facings = List.copyOf(facings);
    overlaps = List.copyOf(overlaps);
  }

  /** Whether every patch has a side. */
  public boolean determined() {
    return facings.stream().noneMatch(f -> f.side() == FoundFacing.Side.UNDETERMINED);
  }
}
