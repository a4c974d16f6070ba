package org.hullsum.quadrature;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;
import java.util.Random;
import java.util.function.DoubleBinaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The mean of scattered readings against profiles whose mean is known. */
class ScatteredMeanTest {
  private static final long SEED = 20261;

  /** A profile over the section with its mean. */
  private record Known(DoubleBinaryOperator speed, double mean) {}

  private static double[][] scattered(Random random, boolean round, int count) {
    double[][] at = new double[2][count];
    int cells = (int) Math.ceil(Math.sqrt(count));
    for (int i = 0; i < count; i++) {
      // One in each cell of a grid, so that no part of the section is left without a reading.
      double s = (i % cells + 0.1 + 0.8 * random.nextDouble()) / cells;
      double t = (Math.floorDiv(i, cells) + 0.1 + 0.8 * random.nextDouble()) / cells;
      at[0][i] = round ? Math.sqrt(s) * Math.cos(2 * Math.PI * t) : 2 * s - 1;
      at[1][i] = round ? Math.sqrt(s) * Math.sin(2 * Math.PI * t) : 2 * t - 1;
    }
    return at;
  }

  /** A power law, skewed: the skew is odd and adds nothing to the mean. */
  private static Known skewed(boolean round, double n, double skew, double direction) {
    double c = skew * Math.cos(direction);
    double s = skew * Math.sin(direction);
    return round
        ? new Known(
            (x, y) -> Math.pow(Math.max(0, 1 - Math.hypot(x, y)), 1 / n) * (1 + c * x + s * y),
            2 * n * n / ((n + 1) * (2 * n + 1)))
        : new Known(
            (x, y) -> Math.pow((1 - Math.abs(x)) * (1 - Math.abs(y)), 1 / n) * (1 + c * x + s * y),
            Math.pow(n / (n + 1), 2));
  }

  private static double[] values(Known known, double[][] at) {
    double[] values = new double[at[0].length];
    for (int i = 0; i < values.length; i++) {
      values[i] = known.speed().applyAsDouble(at[0][i], at[1][i]);
    }
    return values;
  }

  private static double mean(ScatteredMean rule, double[] values) {
    double[] weights = rule.weights();
    double sum = 0;
    for (int i = 0; i < values.length; i++) {
      sum += weights[i] * values[i];
    }
    return sum;
  }

  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void wallLawTimesAPlaneIsExact(boolean round) {
    double[][] at = scattered(new Random(SEED), round, 36);
    ScatteredMean rule = ScatteredMean.of(round, at[0], at[1]).mean().orElseThrow();
    Known known = skewed(round, 7, 0.4, 1);

    assertEquals(known.mean(), mean(rule, values(known, at)), 1e-9);
  }

  /** Power laws of n from 4 to 12, skewed by up to a half, and laminar and flat profiles. */
  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void trueMeanOfEveryProfileLiesWithinTheBound(boolean round) {
    Random random = new Random(SEED);
    int outside = 0;
    int count = 0;
    double worst = 0;
    double sumOfPowerLaws = 0;
    int powerLaws = 0;
    int trials = 400;
    for (int trial = 0; trial < trials; trial++) {
      int side = 4 + random.nextInt(5);
      double[][] at = scattered(random, round, side * side);
      Optional<ScatteredMean> found = ScatteredMean.of(round, at[0], at[1]).mean();
      if (found.isEmpty()) {
        continue;
      }
      Known known =
          switch (trial % 4) {
            case 0 ->
                round
                    ? new Known((x, y) -> 1 - x * x - y * y, 0.5)
                    : new Known((x, y) -> (1 - x * x) * (1 - y * y), 4 / 9.0);
            case 1 -> new Known((x, y) -> 1, 1);
            default ->
                skewed(
                    round,
                    4 + 8 * random.nextDouble(),
                    0.5 * random.nextDouble(),
                    2 * Math.PI * random.nextDouble());
          };
      double[] values = values(known, at);
      double error = Math.abs(mean(found.get(), values) - known.mean());
      double bound = found.get().bound(values);
      count++;
      powerLaws += trial % 4 > 1 ? 1 : 0;
      sumOfPowerLaws += trial % 4 > 1 ? bound / known.mean() : 0;
      worst = Math.max(worst, error / bound);
      outside += error > bound ? 1 : 0;
    }
    String measured =
        String.format(
            Locale.ROOT,
            "seed %d: %d of %d evaluated, %d outside, worst error %.3f of the bound, mean bound of"
                + " power laws %.4f",
            SEED,
            count,
            trials,
            outside,
            worst,
            sumOfPowerLaws / powerLaws);
    assertEquals(0, outside, measured);
    assertTrue(count > 0.95 * trials, measured);
    // A bound that is always kept because it is wide says nothing.
    assertTrue(sumOfPowerLaws / powerLaws < 0.02, measured);
  }

  @Test
  void readingsAreRefusedWithTheReason() {
    double[][] at = scattered(new Random(SEED), true, 25);
    assertFault(ScatteredMean.Fault.FEW, Arrays.copyOf(at[0], 5), Arrays.copyOf(at[1], 5));
    double[] x = at[0].clone();
    double[] y = at[1].clone();
    x[7] = x[3];
    y[7] = y[3];
    assertFault(ScatteredMean.Fault.SAME_PLACE, x, y);
    x[7] = 1;
    y[7] = 0;
    assertFault(ScatteredMean.Fault.AT_WALL, x, y);
    double[] half = Arrays.stream(at[0]).map(v -> 0.4 + 0.3 * v).toArray();
    double[] small = Arrays.stream(at[1]).map(v -> 0.3 * v).toArray();
    assertFault(ScatteredMean.Fault.HOLE, half, small);
    double[] line = {-0.99 + 0.2, -0.5, -0.2, 0, 0.2, 0.5, 0.79};
    assertFault(ScatteredMean.Fault.HOLE, line, new double[line.length]);
  }

  private static void assertFault(ScatteredMean.Fault fault, double[] x, double[] y) {
    ScatteredMean.Outcome outcome = ScatteredMean.of(true, x, y);
    assertTrue(outcome.mean().isEmpty());
    assertEquals(fault, outcome.refusal().orElseThrow().fault());
  }
}
