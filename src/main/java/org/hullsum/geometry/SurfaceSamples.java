package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import org.hullsum.numeric.Vector3;

/**
 * Chooses a few points of a surface that are kept, far from its edges and from one another.
 *
 * <p>Candidates lie on a grid of each chart, refined where the trim leaves little; the first point
 * taken is the one farthest from all edges, each next one the candidate with the best product of
 * its clearance and its distance from those taken. Deterministic.
 */
public final class SurfaceSamples {
  /** Numbers of candidates along each direction, tried in turn until enough are kept. */
  private static final int[] GRIDS = {7, 19, 67, 211};

  private SurfaceSamples() {}

  /**
   * At most {@code count} points; fewer where less of the surface can be found, none where the trim
   * leaves nothing.
   *
   * @param parameters the value of every parameter
   */
  public static List<SurfaceSample> of(Surface surface, Map<String, Double> parameters, int count) {
    List<SurfaceSample> candidates = List.of();
    for (int k = 0; k < GRIDS.length && candidates.size() < 2 * count; k++) {
      candidates = candidates(surface, parameters, GRIDS[k]);
    }
    return spread(candidates, count);
  }

  private static List<SurfaceSample> candidates(
      Surface surface, Map<String, Double> parameters, int grid) {
    List<SurfaceSample> candidates = new ArrayList<>();
    double[][] at = ChartSamples.grid(grid);
    for (int i = 0; i < surface.charts().size(); i++) {
      Chart chart = surface.charts().get(i);
      ChartEvaluator evaluator = ChartEvaluator.of(chart, parameters);
      ChartEvaluator.Workspace workspace = evaluator.workspace();
      TrimPoint trim = new TrimPoint(TrimPoint.compile(surface, chart, parameters));
      for (int k = 0; k < at[0].length; k++) {
        double u = at[0][k];
        double v = at[1][k];
        ChartPoint point = evaluator.at(u, v, workspace);
        double clearance = Math.min(point.sideDistance(u, v), trim.distance(u, v, point));
        if (clearance > 0 && trim.keeps(u, v)) {
          candidates.add(new SurfaceSample(i, u, v, point, clearance));
        }
      }
    }
    return candidates;
  }

  private static List<SurfaceSample> spread(List<SurfaceSample> candidates, int count) {
    List<SurfaceSample> open = new ArrayList<>(candidates);
    List<SurfaceSample> taken = new ArrayList<>();
    while (taken.size() < count && !open.isEmpty()) {
      SurfaceSample best =
          open.stream()
              .max(Comparator.comparingDouble(candidate -> merit(candidate, taken)))
              .orElseThrow();
      open.remove(best);
      taken.add(best);
    }
    return taken;
  }

  private static double merit(SurfaceSample candidate, List<SurfaceSample> taken) {
    Vector3 position = candidate.at().position();
    double nearest =
        taken.stream()
            .mapToDouble(other -> other.at().position().minus(position).norm())
            .min()
            .orElse(1);
    return candidate.clearance() * nearest;
  }
}
