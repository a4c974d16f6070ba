package org.hullsum.quadrature;

import java.util.ArrayDeque;
import java.util.Arrays;
import java.util.Deque;
import java.util.Optional;

/**
 * Finds the places where a {@link Signature} changes, by sampling and bisection down to rounding.
 *
 * <p>Changes that undo each other between two neighbouring samples are not seen.
 */
final class Breakpoints {
  /** More changes than this are no structure but noise. */
  static final int MOST = 96;

  private static final int BISECTIONS = 70;

  private Breakpoints() {}

  /** The changes strictly within the positions sampled, given their signatures. */
  static Optional<double[]> between(Signature signature, double[] positions, long[] signatures) {
    double[] found = new double[MOST];
    int count = 0;
    Deque<double[]> ends = new ArrayDeque<>();
    Deque<long[]> marks = new ArrayDeque<>();
    for (int i = positions.length - 2; i >= 0; i--) {
      ends.push(new double[] {positions[i], positions[i + 1]});
      marks.push(new long[] {signatures[i], signatures[i + 1]});
    }
    while (!ends.isEmpty()) {
      double[] pair = ends.pop();
      long[] mark = marks.pop();
      if (mark[0] == mark[1]) {
        continue;
      }
      if (count == MOST) {
        return Optional.empty();
      }
      double low = pair[0];
      double high = pair[1];
      long beyond = mark[1];
      for (int step = 0; step < BISECTIONS; step++) {
        double middle = low + 0.5 * (high - low);
        if (middle <= low || middle >= high) {
          break;
        }
        long there = signature.at(middle);
        if (there == mark[0]) {
          low = middle;
        } else {
          high = middle;
          beyond = there;
        }
      }
      found[count++] = high;
      if (high < pair[1]) {
        ends.push(new double[] {high, pair[1]});
        marks.push(new long[] {beyond, mark[1]});
      }
    }
    return Optional.of(distinct(found, count));
  }

  private static double[] distinct(double[] found, int count) {
    double[] sorted = Arrays.copyOf(found, count);
    Arrays.sort(sorted);
    int kept = 0;
    for (int i = 0; i < count; i++) {
      if (kept == 0 || sorted[i] > sorted[kept - 1]) {
        sorted[kept++] = sorted[i];
      }
    }
    return Arrays.copyOf(sorted, kept);
  }
}
