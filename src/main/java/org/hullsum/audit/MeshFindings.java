package org.hullsum.audit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.mesh.MeshShell;
import org.hullsum.mesh.MeshTopology;
import org.hullsum.mesh.MeshWeld;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.model.Patch;
import org.hullsum.model.PatchSurface;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;

/** What is wrong with a patch's triangles among themselves. */
final class MeshFindings implements PatchSurface.Visitor<List<Finding>> {
  private final Patch patch;
  private final Scales scales;
  private final List<Finding> findings = new ArrayList<>();

  private MeshFindings(Patch patch, Scales scales) {
    this.patch = patch;
    this.scales = scales;
  }

  static List<Finding> of(Patch patch, PatchSurface surface, Scales scales) {
    return surface.accept(new MeshFindings(patch, scales));
  }

  @Override
  public List<Finding> formulas(PatchSurface.Formulas surface) {
    return List.of();
  }

  @Override
  public List<Finding> triangles(PatchSurface.Triangles surface) {
    MeshTopology topology = surface.topology();
    for (MeshShell shell : topology.shells()) {
      if (!shell.orientable()) {
        add(
            FindingCode.ORIENTATION_CONFLICT,
            shell.triangles()
                + " triangles of `"
                + patch.name()
                + "`, from number "
                + (shell.first() + 1)
                + " on, can't be turned so that all agree: they form a one-sided surface",
            Map.of("triangles", shell.triangles()));
      }
    }
    if (topology.againstCount() > 0) {
      addTurned(topology, topology.againstCount());
    }
    if (topology.crowdedEdgeCount() > 0) {
      add(
          FindingCode.MESH_NOT_MANIFOLD,
          topology.crowdedEdgeCount()
              + (topology.crowdedEdgeCount() == 1 ? " edge of `" : " edges of `")
              + patch.name()
              + "` are shared by more than two triangles; a surface has two at each edge",
          Map.of("edges", topology.crowdedEdgeCount()));
    }
    int repeated = topology.duplicateCount();
    if (repeated > 0) {
      add(
          FindingCode.MESH_DUPLICATE_FACES,
          repeated
              + (repeated == 1 ? " triangle of `" : " triangles of `")
              + patch.name()
              + "` has the corners of an earlier one; its flux is counted twice",
          Map.of("triangles", repeated));
    }
    surface.weld().ifPresent(this::addWeld);
    if (topology.degenerateCount() > 0) {
      add(
          FindingCode.MESH_DEGENERATE_FACES,
          topology.degenerateCount()
              + (topology.degenerateCount() == 1 ? " triangle of `" : " triangles of `")
              + patch.name()
              + "` with two corners in one vertex: no area, and left out",
          Map.of("triangles", topology.degenerateCount()));
    }
    return findings;
  }

  private void addWeld(MeshWeld weld) {
    Map<String, Object> evidence = new LinkedHashMap<>();
    evidence.put("vertices", weld.vertices());
    evidence.put("farthest", scales.length() * weld.farthest());
    evidence.put("triangles", weld.triangles());
    String moved =
        weld.vertices() == 0
            ? ""
            : ", the farthest moved by "
                + Figures.text(scales.length() * weld.farthest(), scales.lengthUnit());
    add(
        FindingCode.MESH_WELDED,
        weld.vertices()
            + (weld.vertices() == 1 ? " vertex of `" : " vertices of `")
            + patch.name()
            + "` welded to others within "
            + Figures.text(scales.length() * weld.length(), scales.lengthUnit())
            + moved
            + (weld.triangles() == 0
                ? ""
                : "; triangles that lost their area by it: " + weld.triangles()),
        evidence);
  }

  private void addTurned(MeshTopology topology, long against) {
    TriangleMesh mesh = topology.mesh();
    int first = firstAgainst(topology);
    Vector3 centre =
        mesh.vertex(mesh.corner(first, 0))
            .plus(mesh.vertex(mesh.corner(first, 1)))
            .plus(mesh.vertex(mesh.corner(first, 2)))
            .times(1.0 / 3);
    Map<String, Object> evidence = new LinkedHashMap<>();
    evidence.put("triangles", against);
    evidence.put("first", first + 1);
    evidence.put("at", CaseFindings.coordinates(scales.point(centre)));
    add(
        FindingCode.ORIENTATION_REVERSED,
        against
            + " of the "
            + mesh.triangleCount()
            + " triangles of `"
            + patch.name()
            + (against == 1 ? "` faces" : "` face")
            + " against the others, the first being number "
            + (first + 1)
            + " around "
            + scales.place(centre)
            + "; their flux is counted with the wrong sign",
        evidence);
  }

  private static int firstAgainst(MeshTopology topology) {
    int first = 0;
    while (!topology.isAgainst(first)) {
      first++;
    }
    return first;
  }

  private void add(FindingCode code, String message, Map<String, Object> evidence) {
    findings.add(
        Finding.of(code, message, patch.name(), Optional.of(patch.facingPlace()), evidence));
  }
}
