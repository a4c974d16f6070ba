package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.closure.FoundFacing;
import org.hullsum.closure.Gap;
import org.hullsum.closure.MomentClosure;
import org.hullsum.closure.Seam;
import org.hullsum.closure.VolumeFacings;
import org.hullsum.flux.BoundaryPatch;
import org.hullsum.flux.PatchFlux;
import org.hullsum.model.Volume;

/**
 * The surface of one volume, inspected.
 *
 * @param sewn its patches and seams
 * @param facings of the patches, in their order, by lines and seams together
 * @param signs of the construction normals, +1 outward, as found; else, for explanations only, as
 *     leaned to or declared; empty where one has none
 * @param closure with those signs; empty without patches
 * @param offered patches whose turning would make the normals of an open surface agree
 */
record SurfaceAudit(
    SewnSurface sewn,
    VolumeFacings facings,
    Optional<List<Integer>> signs,
    Optional<MomentClosure> closure,
    List<String> offered) {
  SurfaceAudit {
    Objects.requireNonNull(sewn, "sewn");
    Objects.requireNonNull(facings, "facings");
    signs = signs.map(List::copyOf);
    Objects.requireNonNull(closure, "closure");
    offered = List.copyOf(offered);
  }

  Volume volume() {
    return sewn.volume();
  }

  List<PatchAudit> patches() {
    return sewn.patches();
  }

  Optional<String> bare() {
    return sewn.bare();
  }

  boolean bounded() {
    return sewn.bounded();
  }

  /** Whether a rim meets no other, or more than one. */
  boolean open() {
    return !sewn.seams().close() || overlaps();
  }

  /** True where the seams close and nothing contradicts them, false where they do not. */
  Optional<Boolean> closed() {
    if (bare().isPresent() || patches().isEmpty()) {
      return Optional.empty();
    }
    if (open()) {
      return Optional.of(false);
    }
    return determined() && closure.filter(MomentClosure::holds).isPresent()
        ? Optional.of(true)
        : Optional.empty();
  }

  boolean determined() {
    return facings.determined() && !patches().isEmpty();
  }

  /** What was found of a patch, by its name. */
  Optional<FoundFacing> facingOf(String patch) {
    for (int i = 0; i < patches().size(); i++) {
      if (patches().get(i).name().equals(patch)) {
        return Optional.of(facings.facings().get(i));
      }
    }
    return Optional.empty();
  }

  /** Why the surface is open, where that was proved. */
  Optional<String> openReason() {
    if (!open() || bare().isPresent()) {
      return Optional.empty();
    }
    return Optional.of(
        "the surface of `"
            + volume().name()
            + (sewn.seams().gaps().isEmpty()
                ? "` does not close once: more than two patches meet along an edge"
                : "` is open"));
  }

  /** Why the surface is not known to be closed, where each of its patches has a surface. */
  Optional<String> unproved() {
    boolean told = bare().isPresent() || patches().isEmpty() || closed().orElse(false);
    return told ? Optional.empty() : reason();
  }

  /** Why no region is enclosed, so that no volume integral can be taken. */
  Optional<String> noRegion() {
    if (!bounded()) {
      return Optional.of("no patch bounds `" + volume().name() + "`");
    }
    if (patches().isEmpty()) {
      return Optional.of("no patch of `" + volume().name() + "` has a surface");
    }
    if (open()) {
      return bare()
          .map(
              b ->
                  "the surfaces of `"
                      + volume().name()
                      + "` do not close, and `"
                      + b
                      + "` has none")
          .or(this::openReason);
    }
    return undeterminedReason();
  }

  /** Why a facing is undetermined, of the first such patch. */
  Optional<String> undeterminedReason() {
    return facings.facings().stream()
        .filter(found -> found.reason().isPresent())
        .findFirst()
        .map(
            found ->
                "which way `"
                    + patches().get(found.patch()).name()
                    + "` faces is undetermined: "
                    + found.reason().get().words());
  }

  /** The boundary with those signs. */
  List<BoundaryPatch> boundary() {
    List<BoundaryPatch> boundary = new ArrayList<>();
    for (int i = 0; i < patches().size(); i++) {
      PatchAudit patch = patches().get(i);
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
    for (PatchAudit patch : patches()) {
      for (PatchFlux flux : patch.fluxes().get(instant)) {
        flowing += 0.5 * flux.magnitude();
      }
    }
    return Double.isFinite(flowing) ? Math.pow(10, -digits) * flowing : 0;
  }

  /**
   * For the reports.
   *
   * @param gapFluxes through the gaps, in their order; none where not known
   */
  SurfaceResult result(Scales scales, List<Double> gapFluxes) {
    Optional<MomentClosure> found = determined() ? closure : Optional.empty();
    List<SurfaceResult.Gap> gaps = new ArrayList<>();
    for (int k = 0; k < gaps().size(); k++) {
      Gap gap = gaps().get(k);
      gaps.add(
          new SurfaceResult.Gap(
              gap.patches().stream().map(p -> patches().get(p).name()).toList(),
              scales.length() * gap.length(),
              scales.point(gap.centre()),
              scales.area(gap.vectorArea().norm()),
              k < gapFluxes.size() ? Optional.of(gapFluxes.get(k)) : Optional.empty()));
    }
    return new SurfaceResult(
        volume().name(),
        closed(),
        reason(),
        patches().isEmpty() || bare().isPresent()
            ? Optional.empty()
            : Optional.of(sewn.shells().size()),
        found.map(c -> scales.vectorArea(c.closureVector())),
        open() ? Optional.empty() : found.flatMap(c -> c.enclosedVolume()).map(scales::volume),
        found.map(c -> c.moments().stream().map(scales::volume).toList()),
        gaps);
  }

  /** Whether patches of it were seen to lie on one another, or more than two to share an edge. */
  boolean overlaps() {
    return !facings.overlaps().isEmpty() || sewn.seams().seams().stream().anyMatch(Seam::isCrowded);
  }

  /** The holes, where no patch without surface may fill them. */
  List<Gap> gaps() {
    return bare().isEmpty() ? sewn.seams().gaps() : List.of();
  }

  private Optional<String> reason() {
    if (!bounded()) {
      return Optional.of("not applicable: no patch bounds it");
    }
    if (bare().isPresent()) {
      return Optional.of("not applicable: `" + bare().get() + "` has no surface");
    }
    return openReason()
        .or(this::undeterminedReason)
        .or(
            () ->
                closed().isPresent()
                    ? Optional.empty()
                    : Optional.of(
                        "its rims meet, yet ∬ n dS and ∬ r⊗n dS are not those of a closed"
                            + " surface"));
  }
}
