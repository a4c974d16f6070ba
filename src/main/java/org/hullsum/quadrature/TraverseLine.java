package org.hullsum.quadrature;

import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.function.DoubleUnaryOperator;

/**
 * The points of a traverse along one line with the share of each in the mean.
 *
 * @param positions ascending, in (0, 1): of the radius from the centre, or of a side from its start
 * @param weights one for each position, positive; they add to 1
 */
public record TraverseLine(List<Double> positions, List<Double> weights) {
  public TraverseLine {
    positions = List.copyOf(positions);
    weights = List.copyOf(weights);
    if (positions.isEmpty() || positions.size() != weights.size()) {
      throw new IllegalArgumentException(
          positions.size() + " positions with " + weights.size() + " weights");
    }
  }

  static TraverseLine equal(double... positions) {
    List<Double> weights = Collections.nCopies(positions.length, 1.0 / positions.length);
    return new TraverseLine(Arrays.stream(positions).boxed().toList(), weights);
  }

  public int size() {
    return positions.size();
  }

  /** The mean that these points give of a profile along the line. */
  public double mean(DoubleUnaryOperator profile) {
    double sum = 0;
    for (int i = 0; i < size(); i++) {
      sum += weights.get(i) * profile.applyAsDouble(positions.get(i));
    }
    return sum;
  }
}
