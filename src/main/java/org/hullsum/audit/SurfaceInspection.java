package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.closure.FoundFacing;
import org.hullsum.closure.FoundFacing.Side;
import org.hullsum.closure.MomentClosure;
import org.hullsum.closure.SurfaceMoments;
import org.hullsum.closure.VolumeFacings;
import org.hullsum.flux.PatchGeometry;
import org.hullsum.geometry.Surface;
import org.hullsum.model.Patch;
import org.hullsum.model.Volume;

/** Inspects the surfaces of volumes: facings by parity, necessary conditions of closedness. */
final class SurfaceInspection {
  /** Finds the facings of the surfaces of one volume; none of it looks at what is declared. */
  interface Finder {
    VolumeFacings find(List<Surface> surfaces);
  }

  private final List<PatchAudit> all;
  private final Finder finder;

  SurfaceInspection(List<PatchAudit> all, Finder finder) {
    this.all = List.copyOf(all);
    this.finder = finder;
  }

  SurfaceAudit inspect(Volume volume) {
    List<PatchAudit> surfaced = new ArrayList<>();
    Optional<String> bare = Optional.empty();
    boolean bounded = false;
    for (PatchAudit audit : all) {
      Patch patch = audit.patch();
      if (patch.isBaffle() || !touches(patch, volume.name())) {
        continue;
      }
      bounded = true;
      if (audit.surface().isEmpty()) {
        bare = bare.or(() -> Optional.of(patch.name()));
      } else if (audit.hasArea()) {
        surfaced.add(audit);
      }
    }
    if (surfaced.isEmpty()) {
      return new SurfaceAudit(
          volume,
          surfaced,
          bare,
          bounded,
          Optional.empty(),
          Optional.empty(),
          Optional.empty(),
          false);
    }
    VolumeFacings facings =
        finder.find(surfaced.stream().map(p -> p.patch().surface().orElseThrow()).toList());
    List<SurfaceMoments> moments = surfaced.stream().map(SurfaceInspection::moments).toList();
    Optional<List<Integer>> signs = signs(facings, surfaced, volume);
    Optional<MomentClosure> closure =
        signs.map(s -> MomentClosure.of(moments, s, MomentClosure.USUAL_SLACK));
    boolean open =
        facings.determined()
            ? closure.filter(c -> !c.holds()).isPresent()
            : failsWhateverTheRest(facings, moments);
    return new SurfaceAudit(
        volume, surfaced, bare, bounded, Optional.of(facings), signs, closure, open);
  }

  private static boolean touches(Patch patch, String volume) {
    return patch.leaves().equals(volume) || patch.enters().equals(volume);
  }

  /**
   * The sides found; where a patch has none, the one leaned to or declared, which serves nothing
   * but explanations. Empty where a patch has not even that.
   */
  private static Optional<List<Integer>> signs(
      VolumeFacings facings, List<PatchAudit> patches, Volume volume) {
    List<Integer> signs = new ArrayList<>();
    for (int i = 0; i < patches.size(); i++) {
      FoundFacing facing = facings.facings().get(i);
      Optional<Side> side =
          facing.side() == Side.UNDETERMINED ? facing.leaning() : Optional.of(facing.side());
      PatchAudit patch = patches.get(i);
      int declared = patch.patch().leaves().equals(volume.name()) ? patch.sign() : -patch.sign();
      int sign = side.map(Side::sign).orElse(declared);
      if (sign == 0) {
        return Optional.empty();
      }
      signs.add(sign);
    }
    return Optional.of(signs);
  }

  /**
   * Whether the conditions fail whichever way the undetermined patches face. On a closed surface
   * the sides found are right, so those that were found need not be tried both ways.
   */
  private static boolean failsWhateverTheRest(VolumeFacings facings, List<SurfaceMoments> moments) {
    List<SurfaceMoments> found = new ArrayList<>();
    List<Integer> signs = new ArrayList<>();
    List<SurfaceMoments> tried = new ArrayList<>();
    for (int i = 0; i < moments.size(); i++) {
      Side side = facings.facings().get(i).side();
      if (side == Side.UNDETERMINED) {
        tried.add(moments.get(i));
      } else {
        found.add(moments.get(i));
        signs.add(side.sign());
      }
    }
    if (!found.isEmpty()) {
      tried.add(SurfaceMoments.sum(found, signs));
    }
    return MomentClosure.failsForEverySign(tried, MomentClosure.USUAL_SLACK).orElse(false);
  }

  private static SurfaceMoments moments(PatchAudit patch) {
    PatchGeometry geometry = patch.geometry().orElseThrow();
    return new SurfaceMoments(
        geometry.area(),
        geometry.vectorArea(),
        geometry.vectorAreaError(),
        geometry.reference(),
        geometry.moments(),
        geometry.momentsError());
  }
}
