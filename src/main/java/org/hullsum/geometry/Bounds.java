package org.hullsum.geometry;

import java.util.Map;
import org.hullsum.numeric.Box3;
import org.hullsum.numeric.Interval;

/**
 * Boxes proved to contain a surface or a part of it, by interval evaluation of the charts, trims
 * not considered.
 *
 * <p>For one thread.
 */
public final class Bounds {
  /** Parts along each direction over which a whole chart is enclosed. */
  private static final int PARTS = 8;

  private final Chart chart;
  private final ChartEnclosure enclosure;

  private Bounds(Chart chart, ChartEnclosure enclosure) {
    this.chart = chart;
    this.enclosure = enclosure;
  }

  /**
   * Prepares a chart.
   *
   * @param parameters the value of every parameter
   */
  public static Bounds of(Chart chart, Map<String, Double> parameters) {
    return new Bounds(
        chart,
        new ChartEnclosure(
            ChartEvaluator.of(chart, parameters), ChartEnclosure.compile(chart, parameters)));
  }

  /** A box that contains the whole surface; its sides may be infinite where nothing is proved. */
  public static Box3 of(Surface surface, Map<String, Double> parameters) {
    return surface.charts().stream()
        .map(chart -> of(chart, parameters).whole())
        .reduce(Box3::hullWith)
        .orElseThrow();
  }

  public Chart chart() {
    return chart;
  }

  /** A box that contains the chart's positions for u and v in these intervals. */
  public Box3 over(Interval u, Interval v) {
    return enclosure.over(u, v).position();
  }

  /** A box that contains the chart, put together from parts of its square. */
  public Box3 whole() {
    Box3 hull = over(part(0), part(0));
    for (int i = 0; i < PARTS; i++) {
      for (int j = 0; j < PARTS; j++) {
        hull = hull.hullWith(over(part(i), part(j)));
      }
    }
    return hull;
  }

  private static Interval part(int i) {
    return new Interval((double) i / PARTS, (double) (i + 1) / PARTS);
  }
}
