package org.hullsum.model;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.problem.Place;

/**
 * An oriented piece of surface, the edge of the case's directed multigraph of volumes.
 *
 * @param name unique among the patches
 * @param label a name for people
 * @param about free text
 * @param leaves the volume behind the normal, or {@link Volume#SURROUNDINGS}
 * @param enters the volume ahead of the normal, or {@link Volume#SURROUNDINGS}
 * @param surface empty for a nozzle of which only a meter reading is known
 * @param facing the declared facing
 * @param fluxes how its flux is known; their sum
 * @param claims fluxes that someone states for it
 * @param place where the patch is stated
 * @param facingPlace where its facing is stated, else where the patch is
 */
public record Patch(
    String name,
    Optional<String> label,
    Optional<String> about,
    String leaves,
    String enters,
    Optional<PatchSurface> surface,
    Facing facing,
    List<StatedFlux> fluxes,
    List<Claim> claims,
    Place place,
    Place facingPlace) {
  public Patch {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(label, "label");
    Objects.requireNonNull(about, "about");
    Objects.requireNonNull(leaves, "leaves");
    Objects.requireNonNull(enters, "enters");
    Objects.requireNonNull(surface, "surface");
    Objects.requireNonNull(facing, "facing");
    Objects.requireNonNull(place, "place");
    Objects.requireNonNull(facingPlace, "facingPlace");
    fluxes = List.copyOf(fluxes);
    claims = List.copyOf(claims);
  }

  /** Whether it leaves and enters the same volume, so that its flux cancels. */
  public boolean isBaffle() {
    return leaves.equals(enters);
  }
}
