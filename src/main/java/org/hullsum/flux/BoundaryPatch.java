package org.hullsum.flux;

import java.util.Objects;

/**
 * A patch of the boundary of a volume.
 *
 * @param surface of the patch
 * @param geometry its geometric integrals
 * @param outward +1 where the construction normal was found to point out of the volume, else −1
 */
public record BoundaryPatch(PulledBackSurface surface, PatchGeometry geometry, int outward) {
  public BoundaryPatch {
    Objects.requireNonNull(surface, "surface");
    Objects.requireNonNull(geometry, "geometry");
    if (outward != 1 && outward != -1) {
      throw new IllegalArgumentException("outward is +1 or -1, not " + outward);
    }
  }
}
