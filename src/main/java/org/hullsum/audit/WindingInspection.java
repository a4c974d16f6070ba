package org.hullsum.audit;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.hullsum.closure.FoundFacing;
import org.hullsum.closure.FoundFacing.Reason;
import org.hullsum.closure.FoundFacing.Side;
import org.hullsum.closure.PatchWinding;
import org.hullsum.closure.SecondOpinion;
import org.hullsum.closure.WindingOpinion;
import org.hullsum.mesh.MeshTopology;
import org.hullsum.model.PatchSurface;

/**
 * Asks winding numbers which way patches face: everywhere where that was asked for, else only in
 * volumes where seams and lines leave a facing undetermined, or where triangles are no surface by
 * themselves, since it takes longer than all else of a small audit.
 */
final class WindingInspection {
  private final boolean everywhere;
  private final Map<String, Double> parameters;
  private final Workers workers;

  WindingInspection(boolean everywhere, Map<String, Double> parameters, Workers workers) {
    this.everywhere = everywhere;
    this.parameters = parameters;
    this.workers = workers;
  }

  /** The opinions by the volume's name, of those volumes that were looked at. */
  Map<String, WindingOpinion> look(List<SurfaceAudit> surfaces) {
    List<SurfaceAudit> asked = surfaces.stream().filter(this::isAsked).toList();
    Map<String, WindingOpinion> opinions = new LinkedHashMap<>();
    if (asked.isEmpty()) {
      return opinions;
    }
    Set<PatchAudit> used = new LinkedHashSet<>();
    asked.forEach(surface -> used.addAll(surface.patches()));
    List<PatchAudit> patches = List.copyOf(used);
    List<PatchWinding> prepared =
        workers.map("windings", patches.size(), k -> prepared(patches.get(k)));
    Map<String, PatchWinding> windings = new HashMap<>();
    for (int k = 0; k < prepared.size(); k++) {
      windings.put(patches.get(k).name(), prepared.get(k));
    }
    List<WindingOpinion> found =
        workers.map("second opinions", asked.size(), k -> opinion(asked.get(k), windings));
    for (int k = 0; k < asked.size(); k++) {
      opinions.put(asked.get(k).volume().name(), found.get(k));
    }
    return opinions;
  }

  private boolean isAsked(SurfaceAudit surface) {
    boolean leftOpen =
        !surface.facings().determined()
            || surface.patches().stream().anyMatch(WindingInspection::isSoup);
    return !surface.patches().isEmpty() && (everywhere || leftOpen);
  }

  private static boolean isSoup(PatchAudit patch) {
    return patch.patch().surface().orElseThrow().accept(new Soup());
  }

  private PatchWinding prepared(PatchAudit patch) {
    return patch.patch().surface().orElseThrow().accept(new Windings(parameters));
  }

  private static WindingOpinion opinion(SurfaceAudit surface, Map<String, PatchWinding> windings) {
    List<FoundFacing> facings = surface.facings().facings();
    int[] found = new int[facings.size()];
    boolean trusted = !surface.determined();
    for (int k = 0; k < found.length; k++) {
      FoundFacing facing = facings.get(k);
      found[k] = facing.side() == Side.UNDETERMINED ? 0 : facing.side().sign();
      trusted &= facing.reason().filter(Reason.SEAMS_AT_ODDS::equals).isEmpty();
    }
    List<PatchWinding> patches = new ArrayList<>();
    surface.patches().forEach(p -> patches.add(windings.get(p.name())));
    SecondOpinion second = SecondOpinion.on(patches);
    // What is to be confirmed must not lend its seams; what is to be completed may.
    return trusted ? second.of(surface.sewn().shells(), found) : second.of(found);
  }

  /** Prepares a patch for winding numbers. */
  private static final class Windings implements PatchSurface.Visitor<PatchWinding> {
    private final Map<String, Double> parameters;

    Windings(Map<String, Double> parameters) {
      this.parameters = parameters;
    }

    @Override
    public PatchWinding formulas(PatchSurface.Formulas surface) {
      return PatchWinding.of(surface.surface(), parameters);
    }

    @Override
    public PatchWinding triangles(PatchSurface.Triangles surface) {
      return PatchWinding.of(surface.tree());
    }
  }

  /** Whether triangles are more or less than a surface with a rim. */
  private static final class Soup implements PatchSurface.Visitor<Boolean> {
    /** Rims of one mesh beyond which its triangles hardly hang together. */
    private static final int MOST_LOOPS = 32;

    @Override
    public Boolean formulas(PatchSurface.Formulas surface) {
      return false;
    }

    @Override
    public Boolean triangles(PatchSurface.Triangles surface) {
      MeshTopology topology = surface.topology();
      return topology.crowdedEdgeCount() > 0 || topology.loops().size() > MOST_LOOPS;
    }
  }
}
