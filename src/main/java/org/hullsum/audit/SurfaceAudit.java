package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.closure.FoundFacing;
import org.hullsum.closure.MomentClosure;
import org.hullsum.closure.VolumeFacings;
import org.hullsum.flux.BoundaryPatch;
import org.hullsum.flux.PatchFlux;
import org.hullsum.model.Volume;
import org.hullsum.numeric.Vector3;

/**
 * The surface of one volume, inspected.
 *
 * @param volume whose surface
 * @param patches that leave or enter it and have a surface with an area, baffles not among them, in
 *     the order of the case
 * @param bare the name of a patch without surface, where there is one
 * @param bounded whether any patch leaves or enters it
 * @param facings of the patches, in their order; empty where there are none
 * @param signs of the construction normals, +1 outward, as found; else, for explanations only, as
 *     leaned to or declared; empty where one has none
 * @param closure with those signs
 * @param open whether the necessary conditions fail: with the facings found, or with any
 */
record SurfaceAudit(
    Volume volume,
    List<PatchAudit> patches,
    Optional<String> bare,
    boolean bounded,
    Optional<VolumeFacings> facings,
    Optional<List<Integer>> signs,
    Optional<MomentClosure> closure,
    boolean open) {
  SurfaceAudit {
    Objects.requireNonNull(volume, "volume");
    Objects.requireNonNull(bare, "bare");
    Objects.requireNonNull(facings, "facings");
    signs = signs.map(List::copyOf);
    Objects.requireNonNull(closure, "closure");
    patches = List.copyOf(patches);
  }

  boolean determined() {
    return facings.filter(VolumeFacings::determined).isPresent();
  }

  /** What was found of a patch, by its name. */
  Optional<FoundFacing> facingOf(String patch) {
    for (int i = 0; facings.isPresent() && i < patches.size(); i++) {
      if (patches.get(i).name().equals(patch)) {
        return Optional.of(facings.get().facings().get(i));
      }
    }
    return Optional.empty();
  }

  /** Why the surface is open, where that was proved. */
  Optional<String> openReason() {
    if (!open || bare.isPresent()) {
      return Optional.empty();
    }
    return Optional.of(
        "the surface of `"
            + volume.name()
            + (overlaps() ? "` does not close once: patches lie on one another" : "` is open"));
  }

  /** Why no region is enclosed, so that no volume integral can be taken. */
  Optional<String> noRegion() {
    if (!bounded) {
      return Optional.of("no patch bounds `" + volume.name() + "`");
    }
    if (patches.isEmpty()) {
      return Optional.of("no patch of `" + volume.name() + "` has a surface");
    }
    if (open) {
      return bare.map(
              b -> "the surfaces of `" + volume.name() + "` do not close, and `" + b + "` has none")
          .or(this::openReason);
    }
    return undeterminedReason();
  }

  /** Why a facing is undetermined, of the first such patch. */
  Optional<String> undeterminedReason() {
    return facings.flatMap(
        f ->
            f.facings().stream()
                .filter(found -> found.reason().isPresent())
                .findFirst()
                .map(
                    found ->
                        "which way `"
                            + patches.get(found.patch()).name()
                            + "` faces is undetermined: "
                            + found.reason().get().words()));
  }

  /** The boundary with those signs. */
  List<BoundaryPatch> boundary() {
    List<BoundaryPatch> boundary = new ArrayList<>();
    for (int i = 0; i < patches.size(); i++) {
      PatchAudit patch = patches.get(i);
      boundary.add(
          new BoundaryPatch(
              patch.surface().orElseThrow(),
              patch.geometry().orElseThrow(),
              signs.orElseThrow().get(i)));
    }
    return boundary;
  }

  /**
   * An error of an interior that no balance would notice: 10^−digits of half of what flows through
   * the surface, in working units.
   */
  double enough(int instant, int digits) {
    double flowing = 0;
    for (PatchAudit patch : patches) {
      for (PatchFlux flux : patch.fluxes().get(instant)) {
        flowing += 0.5 * flux.magnitude();
      }
    }
    return Double.isFinite(flowing) ? Math.pow(10, -digits) * flowing : 0;
  }

  /** For the reports; the flux through a gap where it is known. */
  SurfaceResult result(Scales scales, Optional<Double> gapFlux) {
    Optional<MomentClosure> found = determined() ? closure : Optional.empty();
    Optional<Vector3> vector = found.map(c -> scales.vectorArea(c.closureVector()));
    Optional<List<Double>> moments =
        found.map(c -> c.moments().stream().map(scales::volume).toList());
    List<SurfaceResult.Gap> gaps =
        gap().stream()
            .map(
                g ->
                    new SurfaceResult.Gap(
                        List.of(),
                        Optional.empty(),
                        scales.point(g.centre()),
                        scales.area(g.vectorArea().norm()),
                        gapFlux))
            .toList();
    return new SurfaceResult(
        volume.name(),
        open && bare.isEmpty() ? Optional.of(false) : Optional.empty(),
        Optional.of(reason()),
        Optional.empty(),
        vector,
        open ? Optional.empty() : found.flatMap(c -> c.enclosedVolume()).map(scales::volume),
        moments,
        gaps);
  }

  /** Whether patches of it were seen to lie on one another. */
  boolean overlaps() {
    return facings.filter(f -> !f.overlaps().isEmpty()).isPresent();
  }

  /** The plane gap that the moments give, where no patch is missing, or there twice, anyway. */
  Optional<MomentClosure.PlaneGap> gap() {
    return open && bare.isEmpty() && !overlaps()
        ? closure.flatMap(MomentClosure::gap)
        : Optional.empty();
  }

  private String reason() {
    if (!bounded) {
      return "not applicable: no patch bounds it";
    }
    if (bare.isPresent()) {
      return "not applicable: `" + bare.get() + "` has no surface";
    }
    if (open) {
      return "∬ n dS and ∬ r⊗n dS do not have the values that every closed surface has";
    }
    return undeterminedReason()
        .orElse("∬ n dS and ∬ r⊗n dS are those of a closed surface, as some open ones have too");
  }
}
