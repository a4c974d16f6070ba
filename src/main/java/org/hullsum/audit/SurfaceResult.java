package org.hullsum.audit;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.numeric.Vector3;

/**
 * What was found of the surface of one volume, in SI.
 *
 * @param volume its name
 * @param closed by the seams; empty where nothing is proved
 * @param reason why it is not closed, why nothing is proved, or why the question does not arise
 * @param shells number of connected shells; empty where not known
 * @param closureVector ∬ n dS with the facings found
 * @param enclosedVolume empty where a facing is undetermined or the surface open
 * @param moments the nine ∬ r⊗n dS, row by row
 * @param gaps the holes that were located
 */
public record SurfaceResult(
    String volume,
    Optional<Boolean> closed,
    Optional<String> reason,
    Optional<Integer> shells,
    Optional<Vector3> closureVector,
    Optional<Double> enclosedVolume,
    Optional<List<Double>> moments,
    List<Gap> gaps) {
  /**
   * A hole.
   *
   * @param between the patches on its rim
   * @param length of the rim
   * @param centre of the rim
   * @param area magnitude of the vector area of the rim
   * @param fluxThrough outward flux that would pass through a plane over it, where a field is known
   */
  public record Gap(
      List<String> between,
      double length,
      Vector3 centre,
      double area,
      Optional<Double> fluxThrough) {
    public Gap {
      between = List.copyOf(between);
      Objects.requireNonNull(centre, "centre");
    }
  }

  public SurfaceResult {
    Objects.requireNonNull(volume, "volume");
    gaps = List.copyOf(gaps);
  }
}
