package org.hullsum.closure;

import java.util.List;
import java.util.Objects;
import org.hullsum.numeric.Vector3;

/**
 * A hole in the surface of a volume, told by its rim.
 *
 * @param patches on the rim, in ascending order
 * @param length of the rim
 * @param centre centroid of the rim as a curve
 * @param vectorArea ½ ∮ r × dr, pointing out of the volume where the sides of the patches were
 *     known; else to either side
 * @param outline points of the rim in order, in the same sense; the first is not repeated
 * @param whole whether the stretches join to a loop
 * @param lying the patch on whose inside the rim lies, or −1
 */
public record Gap(
    List<Integer> patches,
    double length,
    Vector3 centre,
    Vector3 vectorArea,
    List<Vector3> outline,
    boolean whole,
    int lying) {
  /** No patch. */
  public static final int NONE = -1;

  public Gap {
    Objects.requireNonNull(centre, "centre");
    Objects.requireNonNull(vectorArea, "vectorArea");
    patches = List.copyOf(patches);
    outline = List.copyOf(outline);
  }

  /** The same, with the patch on whose inside the rim lies. */
  public Gap lyingOn(int patch) {
    return new Gap(patches, length, centre, vectorArea, outline, whole, patch);
  }
}
