package org.hullsum.audit;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.mesh.SelfIntersections;
import org.hullsum.model.Patch;
import org.hullsum.model.PatchSurface;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;

/** Whether the triangles of a patch pass through one another; looked for only where asked. */
final class SelfIntersectionFindings implements PatchSurface.Visitor<List<Finding>> {
  private final Patch patch;
  private final Scales scales;
  private final int threads;

  private SelfIntersectionFindings(Patch patch, Scales scales, int threads) {
    this.patch = patch;
    this.scales = scales;
    this.threads = threads;
  }

  static List<Finding> of(Patch patch, Scales scales, int threads) {
    return patch
        .surface()
        .map(surface -> surface.accept(new SelfIntersectionFindings(patch, scales, threads)))
        .orElse(List.of());
  }

  @Override
  public List<Finding> formulas(PatchSurface.Formulas surface) {
    return List.of();
  }

  @Override
  public List<Finding> triangles(PatchSurface.Triangles surface) {
    SelfIntersections.Found found = SelfIntersections.find(surface.tree(), threads);
    return found.first().stream().map(first -> finding(found.pairs(), first)).toList();
  }

  private Finding finding(int pairs, SelfIntersections.Pair first) {
    Map<String, Object> evidence = new LinkedHashMap<>();
    evidence.put("pairs", pairs);
    evidence.put("triangles", List.of(first.one() + 1, first.other() + 1));
    evidence.put("at", CaseFindings.coordinates(scales.point(first.place())));
    return Finding.of(
        FindingCode.MESH_SELF_INTERSECTING,
        pairs
            + (pairs == 1 ? " pair of triangles of `" : " pairs of triangles of `")
            + patch.name()
            + "` pass through one another, the first being numbers "
            + (first.one() + 1)
            + " and "
            + (first.other() + 1)
            + " around "
            + scales.place(first.place())
            + "; what such a surface encloses is not what its volume says",
        patch.name(),
        Optional.of(patch.place()),
        evidence);
  }
}
