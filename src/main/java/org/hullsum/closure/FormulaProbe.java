package org.hullsum.closure;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.hullsum.geometry.ChartEvaluator;
import org.hullsum.geometry.ChartPoint;
import org.hullsum.geometry.Crossings;
import org.hullsum.geometry.LineCrossings;
import org.hullsum.geometry.Surface;
import org.hullsum.geometry.SurfaceSample;
import org.hullsum.geometry.SurfaceSamples;
import org.hullsum.numeric.Vector3;

/**
 * One patch prepared for parity: its crossings with lines, and points on it from which lines are
 * run.
 *
 * <p>Not thread-safe.
 */
final class FormulaProbe implements PatchProbe {
  /** How much of each side of a chart the points keep away from. */
  private static final double MARGIN = 0.12;

  /** Points that are tried for each that is wanted. */
  private static final int TRIES = 40;

  /** The plastic number's reciprocals: a sequence that fills the square evenly (Roberts 2018). */
  private static final double STEP_U = 0.7548776662466927;

  private static final double STEP_V = 0.5698402909980532;

  private final LineCrossings crossings;
  private final LineCrossings.Workspace workspace;
  private final List<ChartEvaluator> charts;
  private final List<SamplePoint> points = new ArrayList<>();
  private final Surface surface;
  private final Map<String, Double> parameters;
  private int tried;
  private boolean searched;

  FormulaProbe(Surface surface, Map<String, Double> parameters) {
    this.surface = surface;
    this.parameters = parameters;
    this.crossings = LineCrossings.of(surface, parameters);
    this.workspace = crossings.workspace();
    this.charts =
        surface.charts().stream().map(chart -> ChartEvaluator.of(chart, parameters)).toList();
  }

  @Override
  public Crossings along(Vector3 origin, Vector3 direction) {
    return crossings.along(origin, direction, workspace);
  }

  @Override
  public double near() {
    return 2 * crossings.reach();
  }

  @Override
  public List<SamplePoint> points(int count) {
    while (points.size() < count && tried < TRIES * count) {
      tryPoint(tried++);
    }
    if (points.size() < count && !searched) {
      searched = true;
      // The trim leaves little of the charts: look for it with more care.
      for (SurfaceSample sample : SurfaceSamples.of(surface, parameters, count)) {
        Vector3 area = sample.at().areaVector();
        if (area.isFinite() && sample.at().position().isFinite()) {
          points.add(new SamplePoint(sample.at().position(), area.unit()));
        }
      }
    }
    return points.subList(0, Math.min(count, points.size()));
  }

  private void tryPoint(int k) {
    ChartEvaluator chart = charts.get(k % charts.size());
    double u = MARGIN + (1 - 2 * MARGIN) * ((0.31 + (k + 1) * STEP_U) % 1);
    double v = MARGIN + (1 - 2 * MARGIN) * ((0.57 + (k + 1) * STEP_V) % 1);
    ChartPoint at = chart.at(u, v, chart.workspace());
    double area = at.areaVector().norm();
    if (!(area > 0) || !at.position().isFinite() || !at.areaVector().isFinite()) {
      return;
    }
    Vector3 normal = at.areaVector().unit();
    Crossings own = along(at.position(), normal);
    if (own.reliable() && PatchProbe.count(own, near()) == 1) {
      points.add(new SamplePoint(at.position(), normal));
    }
  }
}
