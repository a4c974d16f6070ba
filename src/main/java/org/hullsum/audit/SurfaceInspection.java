package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.closure.FoundFacing;
import org.hullsum.closure.FoundFacing.Side;
import org.hullsum.closure.MomentClosure;
import org.hullsum.closure.OrientationSystem;
import org.hullsum.closure.SeamFinder;
import org.hullsum.closure.Seams;
import org.hullsum.closure.ShellFinder;
import org.hullsum.closure.SurfaceMoments;
import org.hullsum.closure.VolumeFacings;
import org.hullsum.flux.PatchGeometry;
import org.hullsum.model.Patch;
import org.hullsum.numeric.Vector3;

/**
 * Inspects the surfaces of volumes: which way their patches face, twice over, by lines and by
 * seams, and whether they close.
 *
 * <p>Each volume is first sewn by itself, with {@link #sew}; the seams of all of them together then
 * tell sides too, {@link #judge}.
 */
final class SurfaceInspection {
  private final List<PatchAudit> all;
  private final Map<String, Double> parameters;

  SurfaceInspection(List<PatchAudit> all, Map<String, Double> parameters) {
    this.all = List.copyOf(all);
    this.parameters = parameters;
  }

  SewnSurface sew(LineInspection.Seen seenFirst) {
    LineInspection.Seen seen =
        seenFirst.without(
            all.stream().filter(p -> !p.hasArea()).map(PatchAudit::name).toList(), parameters);
    List<String> names = seen.patches().stream().map(Patch::name).toList();
    List<PatchAudit> surfaced = all.stream().filter(p -> names.contains(p.name())).toList();
    int[] signs = seen.facings().facings().stream().mapToInt(SurfaceInspection::sign).toArray();
    Seams seams =
        new SeamFinder(surfaced.stream().map(p -> p.rims().orElseThrow()).toList()).find(signs);
    return new SewnSurface(
        seen.volume(),
        surfaced,
        seen.bare(),
        seen.bounded(),
        seen.facings(),
        seen.finder().placed(seams),
        ShellFinder.shells(surfaced.size(), seams, volumes(surfaced), seen.finder()::encloses));
  }

  /** Of the construction normal as found or leaned to; 0 where there is neither. */
  private static int sign(FoundFacing facing) {
    Optional<Side> side =
        facing.side() == Side.UNDETERMINED ? facing.leaning() : Optional.of(facing.side());
    return side.map(Side::sign).orElse(0);
  }

  /**
   * ⅓ ∬ (r − q) · n dS of each patch by its construction normal, q in the middle of one of them.
   */
  private static double[] volumes(List<PatchAudit> patches) {
    double[] volumes = new double[patches.size()];
    for (int k = 0; k < volumes.length; k++) {
      PatchGeometry geometry = patches.get(k).geometry().orElseThrow();
      Vector3 q = patches.get(0).geometry().orElseThrow().reference();
      List<Double> moments = geometry.moments();
      double trace = moments.get(0) + moments.get(4) + moments.get(8);
      volumes[k] = (trace + geometry.reference().minus(q).dot(geometry.vectorArea())) / 3;
    }
    return volumes;
  }

  /** The volumes' surfaces, with the sides that the seams of all of them tell. */
  List<SurfaceAudit> judge(List<SewnSurface> sewn) {
    List<OrientationSystem.Part> parts = sewn.stream().map(s -> s.part(all)).toList();
    OrientationSystem orientation = OrientationSystem.solve(all.size(), parts);
    List<SurfaceAudit> judged = new ArrayList<>();
    for (int v = 0; v < sewn.size(); v++) {
      judged.add(judge(sewn.get(v), orientation, parts.get(v)));
    }
    return judged;
  }

  private SurfaceAudit judge(
      SewnSurface sewn, OrientationSystem orientation, OrientationSystem.Part part) {
    List<FoundFacing> facings = new ArrayList<>();
    for (int k = 0; k < sewn.patches().size(); k++) {
      int bySeams = orientation.side(part.patches().get(k)) * part.leaving().get(k);
      facings.add(sewn.byLines().facings().get(k).confirmedBy(bySeams));
    }
    VolumeFacings found = new VolumeFacings(facings, sewn.byLines().overlaps());
    Optional<List<Integer>> signs = signs(found, sewn);
    List<SurfaceMoments> moments = sewn.patches().stream().map(SurfaceInspection::moments).toList();
    double area = moments.stream().mapToDouble(SurfaceMoments::area).sum();
    double slack = area > 0 ? sewn.seams().slackArea() / area : 0;
    Optional<MomentClosure> closure =
        sewn.patches().isEmpty()
            ? Optional.empty()
            : signs.map(s -> MomentClosure.of(moments, s, MomentClosure.USUAL_SLACK + slack));
    List<String> offered =
        OrientationSystem.fewestToTurn(
                part, sewn.patches().stream().map(p -> p.facesAsFound() ? 0 : p.sign()).toList())
            .stream()
            .map(k -> all.get(k).name())
            .toList();
    return new SurfaceAudit(sewn, found, signs, closure, offered);
  }

  /**
   * The sides found; where a patch has none, the one leaned to or declared, which serves nothing
   * but explanations. Empty where a patch has not even that.
   */
  private static Optional<List<Integer>> signs(VolumeFacings facings, SewnSurface sewn) {
    List<Integer> signs = new ArrayList<>();
    for (int i = 0; i < sewn.patches().size(); i++) {
      PatchAudit patch = sewn.patches().get(i);
      int found = sign(facings.facings().get(i));
      int sign = found != 0 ? found : sewn.leaves(patch) ? patch.sign() : -patch.sign();
      if (sign == 0) {
        return Optional.empty();
      }
      signs.add(sign);
    }
    return Optional.of(signs);
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
