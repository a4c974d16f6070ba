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

  /** ∬ r dS / ∬ dS of the fan from the centre over the rim, by its parts along the vector area. */
  public Vector3 fanCentre() {
    Vector3 sum = Vector3.ZERO;
    double weight = 0;
    for (int k = 0; k < outline.size(); k++) {
      Vector3 a = outline.get(k).minus(centre);
      Vector3 b = outline.get((k + 1) % outline.size()).minus(centre);
      double part = a.cross(b).dot(vectorArea);
      sum = sum.plus(a.plus(b).times(part / 3));
      weight += part;
    }
    return weight == 0 ? centre : centre.plus(sum.times(1 / weight));
  }
}
