package org.hullsum.audit;

import java.util.Arrays;
import java.util.List;

/**
 * The mean over an interval of a rate that is known at equally spaced instants.
 *
 * <p>Composite Simpson rule where the number of intervals is even; with an odd number of three or
 * more the 3/8 rule takes the last three; with one interval the trapezoidal rule. The error is
 * estimated by the difference from a coarser result: the Simpson rule on every second instant where
 * the number of intervals is a multiple of four, else the trapezoidal rule. Both overestimate for a
 * rate that the instants resolve. Exact for a rate that does not change.
 *
 * <p>Reference: Davis, P. J. and Rabinowitz, P., Methods of Numerical Integration, 2nd edition,
 * Academic Press, 1984, sections 2.2 and 4.2.
 */
final class TimeMean {
  private final double[] weights;
  private final double[] coarse;

  private TimeMean(double[] weights, double[] coarse) {
    this.weights = weights;
    this.coarse = coarse;
  }

  /**
   * The rule over a number of instants.
   *
   * @throws IllegalArgumentException if there are fewer than two
   */
  static TimeMean over(int instants) {
    int intervals = instants - 1;
    if (intervals < 1) {
      throw new IllegalArgumentException(instants + " instants span no interval");
    }
    double[] trapezoid = trapezoid(intervals);
    if (intervals == 1) {
      return new TimeMean(trapezoid, new double[] {1, 0});
    }
    double[] simpson = simpson(intervals, 1);
    return new TimeMean(simpson, intervals % 4 == 0 ? simpson(intervals, 2) : trapezoid);
  }

  private static double[] trapezoid(int intervals) {
    double[] weights = new double[intervals + 1];
    for (int i = 0; i < intervals; i++) {
      weights[i] += 0.5 / intervals;
      weights[i + 1] += 0.5 / intervals;
    }
    return weights;
  }

  /** Simpson's rule on every {@code stride}-th instant. */
  private static double[] simpson(int intervals, int stride) {
    double[] weights = new double[intervals + 1];
    double step = (double) stride / intervals;
    int steps = intervals / stride;
    int even = steps % 2 == 0 ? steps : steps - 3;
    for (int i = 0; i < even; i += 2) {
      weights[i * stride] += step / 3;
      weights[(i + 1) * stride] += 4 * step / 3;
      weights[(i + 2) * stride] += step / 3;
    }
    if (even < steps) {
      double[] threeEighths = {3.0 / 8, 9.0 / 8, 9.0 / 8, 3.0 / 8};
      for (int j = 0; j < threeEighths.length; j++) {
        weights[(even + j) * stride] += threeEighths[j] * step;
      }
    }
    return weights;
  }

  /** The weights of the mean, one for each instant; their sum is 1. */
  double[] weights() {
    return weights.clone();
  }

  /** The mean of the rates, the estimated error of the rule added to their error bounds. */
  Estimate of(List<Estimate> rates) {
    Estimate fine = Estimate.weighted(rates, weights);
    double difference = Math.abs(fine.value() - Estimate.weighted(rates, coarse).value());
    boolean steady = rates.stream().allMatch(r -> r.value() == rates.get(0).value());
    double value = steady ? rates.get(0).value() : fine.value();
    return new Estimate(value, fine.error() + (steady ? 0 : difference), fine.sensitivities());
  }

  /** The mean of plain numbers. */
  double of(double[] values) {
    List<Estimate> rates = Arrays.stream(values).mapToObj(Estimate::exact).toList();
    return of(rates).value();
  }
}
