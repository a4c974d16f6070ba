package org.hullsum.geometry;

import java.util.Map;
import java.util.Optional;
import org.hullsum.numeric.Vector3;

/** How large a surface is, untrimmed: what tolerances are relative to. */
public final class Extent {
  /** Points along each direction of a chart. */
  private static final int SAMPLES = 9;

  private Extent() {}

  /** Twice the largest distance of sampled positions from the first of them. */
  public static double of(Surface surface, Map<String, Double> parameters) {
    double[][] at = ChartSamples.grid(SAMPLES);
    int count = at[0].length;
    Optional<Vector3> first = Optional.empty();
    double largest = 0;
    for (Chart chart : surface.charts()) {
      for (Vector3 position : ChartPositions.of(chart, parameters).at(at, count)) {
        if (position.isFinite()) {
          Vector3 origin = first.orElse(position);
          first = Optional.of(origin);
          largest = Math.max(largest, position.minus(origin).norm());
        }
      }
    }
    return 2 * largest;
  }
}
