package org.hullsum.flux;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.geometry.Crossings;
import org.hullsum.geometry.LineCrossings;
import org.hullsum.geometry.Surface;
import org.hullsum.mesh.TriangleTree;
import org.hullsum.numeric.Vector3;

/**
 * Lines through the region that a boundary encloses: where they cross it, and, by parity, which
 * points are inside. Facings have no part in it. Not thread-safe.
 */
final class BoundaryLines {
  /** Directions in general position in which a point is tested, one after the other. */
  private static final List<Vector3> DIRECTIONS =
      List.of(
          new Vector3(0.4216, 0.7713, 0.4773),
          new Vector3(-0.6411, 0.2917, 0.7098),
          new Vector3(0.1934, -0.5471, 0.8144),
          new Vector3(0.8827, 0.1153, -0.4556));

  private final List<Cut> surfaces = new ArrayList<>();

  /** How one patch is cut by lines. */
  private interface Cut {
    /** Adds the hits; false where one is doubtful. */
    boolean along(Vector3 origin, Vector3 direction, int patch, List<Hit> hits);
  }

  /**
   * A line's crossing with the boundary.
   *
   * @param t where on the line
   * @param patch index of the patch
   * @param chart index of its chart
   */
  record Hit(double t, int patch, int chart) {}

  BoundaryLines(List<BoundaryPatch> boundary, Map<String, Double> values) {
    for (BoundaryPatch patch : boundary) {
      surfaces.add(
          patch
              .surface()
              .surface()
              .map(formulas -> cut(formulas, values))
              .orElseGet(() -> cut(patch.surface().tree().orElseThrow())));
    }
  }

  private static Cut cut(Surface surface, Map<String, Double> values) {
    LineCrossings crossings = LineCrossings.of(surface, values);
    LineCrossings.Workspace workspace = crossings.workspace();
    return (origin, direction, patch, hits) -> {
      Crossings found = crossings.along(origin, direction, workspace);
      found.crossings().forEach(c -> hits.add(new Hit(c.t(), patch, c.chart())));
      return found.reliable();
    };
  }

  private static Cut cut(TriangleTree tree) {
    double reach = LineCrossings.REACH * tree.extent();
    return (origin, direction, patch, hits) -> {
      TriangleTree.LineHits found = tree.along(origin, direction.unit(), reach);
      found.places().forEach(t -> hits.add(new Hit(t / direction.norm(), patch, 0)));
      return !found.doubtful();
    };
  }

  /** All crossings in the order of the line; empty where a surface gives a doubt. */
  Optional<List<Hit>> along(Vector3 origin, Vector3 direction) {
    List<Hit> hits = new ArrayList<>();
    for (int k = 0; k < surfaces.size(); k++) {
      if (!surfaces.get(k).along(origin, direction, k, hits)) {
        return Optional.empty();
      }
    }
    hits.sort(java.util.Comparator.comparingDouble(Hit::t));
    return Optional.of(hits);
  }

  /** Whether the point is inside; empty where no line through it is free of doubt. */
  Optional<Boolean> inside(Vector3 point) {
    for (Vector3 direction : DIRECTIONS) {
      Optional<List<Hit>> hits = along(point, direction);
      if (hits.isPresent()) {
        long ahead = hits.get().stream().filter(hit -> hit.t() > 0).count();
        return Optional.of(ahead % 2 == 1);
      }
    }
    return Optional.empty();
  }
}
