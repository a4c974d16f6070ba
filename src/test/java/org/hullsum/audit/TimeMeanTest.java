package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class TimeMeanTest {
  private static List<Estimate> sampled(DoubleUnaryOperator rate, int intervals) {
    List<Estimate> rates = new ArrayList<>();
    for (int i = 0; i <= intervals; i++) {
      rates.add(Estimate.exact(rate.applyAsDouble((double) i / intervals)));
    }
    return rates;
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4, 5, 7, 8, 9, 120})
  void weightsAreAMeanAndSimpsonTakesCubicsExactly(int intervals) {
    TimeMean mean = TimeMean.over(intervals + 1);
    assertEquals(1, Arrays.stream(mean.weights()).sum(), 1e-14);
    assertEquals(0.5, mean.of(sampled(t -> t, intervals)).value(), 1e-14);
    if (intervals > 1) {
      assertEquals(0.25, mean.of(sampled(t -> t * t * t, intervals)).value(), 1e-14);
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {2, 3, 4, 5, 6, 8, 12, 25, 120})
  void trueErrorOfASmoothRateIsWithinTheEstimate(int intervals) {
    Estimate mean = TimeMean.over(intervals + 1).of(sampled(t -> Math.exp(2 * t), intervals));
    double exact = (Math.exp(2) - 1) / 2;
    assertTrue(
        Math.abs(mean.value() - exact) <= mean.error(),
        () -> mean.value() - exact + " beyond " + mean.error());
  }

  @Test
  void errorOfTheRuleFallsWithTheFourthPower() {
    double exact = (Math.exp(2) - 1) / 2;
    double coarse = TimeMean.over(9).of(sampled(t -> Math.exp(2 * t), 8)).value() - exact;
    double fine = TimeMean.over(17).of(sampled(t -> Math.exp(2 * t), 16)).value() - exact;
    assertEquals(16, coarse / fine, 0.5);
  }

  @Test
  void steadyRateKeepsItsValueErrorAndSensitivities() {
    Estimate rate = new Estimate(0.1, 1e-9, Map.of("a", 3.0));
    Estimate mean = TimeMean.over(4).of(List.of(rate, rate, rate, rate));
    assertEquals(0.1, mean.value());
    assertEquals(1e-9, mean.error(), 1e-24);
    assertEquals(3, mean.sensitivities().get("a"), 1e-14);
  }

  @Test
  void singleInstantSpansNothing() {
    assertThrows(IllegalArgumentException.class, () -> TimeMean.over(1));
  }
}
