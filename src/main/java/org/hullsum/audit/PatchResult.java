package org.hullsum.audit;

import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.model.TraverseReadings;
import org.hullsum.numeric.Vector3;

/**
 * What was found of one patch.
 *
 * @param name its name
 * @param label a name for people
 * @param leaves the volume behind its normal
 * @param enters the volume ahead
 * @param area in SI; empty without a surface
 * @param vectorArea ∬ n dS with the declared facing, in SI
 * @param fluxes at each instant
 * @param traverses the readings of each traverse over it, along the declared normal
 * @param declaredFacing as the case has it
 * @param foundFacing empty without a surface or without a volume
 * @param facingReason why the facing is undetermined, or that it rests on winding numbers alone
 */
public record PatchResult(
    String name,
    Optional<String> label,
    String leaves,
    String enters,
    Optional<Double> area,
    Optional<Vector3> vectorArea,
    List<Flux> fluxes,
    List<TraverseReadings> traverses,
    String declaredFacing,
    Optional<FoundFacing> foundFacing,
    Optional<String> facingReason) {

  /** Whether the normal as declared points out of the volume that the patch leaves. */
  public enum FoundFacing {
    OUTWARD,
    INWARD,
    UNDETERMINED;

    /** The word of the result document. */
    public String word() {
      return name().toLowerCase(Locale.ROOT);
    }
  }

  /**
   * The flux through the patch, from leaves to enters.
   *
   * @param quantity what flows
   * @param unit the rate unit
   * @param at the instant in seconds
   * @param value empty where unknown
   * @param numericalError a bound
   * @param standardUncertainty from the measured figures
   * @param evaluations points at which the integrand was evaluated
   * @param basis how it is known: {@code field}, {@code flux-density}, {@code metered}, {@code
   *     profile}, {@code traverse}, {@code none}, {@code unknown}
   */
  public record Flux(
      String quantity,
      String unit,
      Optional<Double> at,
      Optional<Double> value,
      double numericalError,
      double standardUncertainty,
      long evaluations,
      String basis) {}

  public PatchResult {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(declaredFacing, "declaredFacing");
    fluxes = List.copyOf(fluxes);
    traverses = List.copyOf(traverses);
  }
}
