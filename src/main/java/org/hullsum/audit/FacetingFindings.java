package org.hullsum.audit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.closure.Seam;
import org.hullsum.model.PatchSurface;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;

/**
 * What the flat triangles of a mesh leave uncovered, or cover twice, along its seams with patches
 * given by formulas: the area between chords and curve.
 */
final class FacetingFindings {
  /** Of the length of a seam; nearer than this the rims are the same but for rounding. */
  private static final double ROUNDING = 1e-9;

  private final SurfaceAudit surface;
  private final Scales scales;

  private FacetingFindings(SurfaceAudit surface, Scales scales) {
    this.surface = surface;
    this.scales = scales;
  }

  static List<Finding> of(SurfaceAudit surface, Scales scales) {
    FacetingFindings findings = new FacetingFindings(surface, scales);
    List<Finding> all = new ArrayList<>();
    for (int k = 0; k < surface.patches().size(); k++) {
      if (findings.isMesh(k)) {
        findings.along(k).ifPresent(all::add);
      }
    }
    return all;
  }

  private boolean isMesh(int patch) {
    return surface.patches().get(patch).patch().surface().orElseThrow()
        instanceof PatchSurface.Triangles;
  }

  private Optional<Finding> along(int mesh) {
    Set<String> others = new LinkedHashSet<>();
    double farthest = 0;
    double area = 0;
    for (Seam seam : surface.sewn().seams().seams()) {
      List<Integer> met = seam.patches();
      boolean curved = seam.slack() > ROUNDING * seam.length();
      if (curved && met.contains(mesh) && met.stream().anyMatch(k -> !isMesh(k))) {
        met.stream()
            .filter(k -> !isMesh(k))
            .forEach(k -> others.add(surface.patches().get(k).name()));
        farthest = Math.max(farthest, seam.slack());
        area += seam.slack() * seam.length();
      }
    }
    return others.isEmpty()
        ? Optional.empty()
        : Optional.of(finding(surface.patches().get(mesh), others, farthest, area));
  }

  private Finding finding(PatchAudit mesh, Set<String> others, double farthest, double area) {
    double length = scales.length() * farthest;
    double square = scales.length() * scales.length() * area;
    Map<String, Object> evidence = new LinkedHashMap<>();
    evidence.put("with", List.copyOf(others));
    evidence.put("chordError", length);
    evidence.put("area", square);
    return Finding.of(
        FindingCode.FACETING_LOSS,
        "the triangles of `"
            + mesh.name()
            + "` are flat: along the seams with `"
            + String.join("`, `", others)
            + "` they are up to "
            + Figures.text(length, scales.lengthUnit())
            + " off, and leave up to "
            + Figures.text(square, scales.areaUnit())
            + " open or covered twice; what may pass there is in the error bounds",
        mesh.name(),
        Optional.of(mesh.patch().place()),
        evidence);
  }
}
