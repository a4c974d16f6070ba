package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.function.ToDoubleFunction;
import org.apache.commons.statistics.distribution.BinomialDistribution;
import org.hullsum.model.Volume;
import org.junit.jupiter.api.Test;

/** Balances without a fault are called imbalanced as often as the coverage says. */
class FalseAlarmTest {
  private static final int BALANCES = 10_000;
  private static final double COVERAGE = 0.95;

  private static int alarms(ToDoubleFunction<Random> deviate) {
    Random random = new Random(0xFA15E_A1A2L);
    int alarms = 0;
    for (int k = 0; k < BALANCES; k++) {
      int count = 3 + random.nextInt(10);
      Map<String, Double> uncertainties = new LinkedHashMap<>();
      List<PatchRate> rates = new ArrayList<>();
      double rest = 0;
      for (int n = 0; n < count; n++) {
        boolean last = n == count - 1;
        double truth =
            last ? -rest : (random.nextBoolean() ? 1 : -1) * (1 + 99 * random.nextDouble());
        rest += truth;
        double u = Math.abs(truth) * (0.002 + 0.028 * random.nextDouble());
        String name = "n" + n;
        uncertainties.put(name, u);
        double read = truth + u * deviate.applyAsDouble(random);
        rates.add(BalanceFixture.uncertain(name, "tank", Volume.SURROUNDINGS, read, name));
      }
      Balance balance =
          new BalanceBuilder(
                  BalanceFixture.volume("tank"),
                  rates,
                  BalanceFixture.inputs(uncertainties),
                  BalanceFixture.NAMES)
              .draw();
      assertEquals(BalanceResult.Rule.UNCERTAINTY, balance.result().rule());
      alarms += balance.result().verdict() == Verdict.IMBALANCED ? 1 : 0;
    }
    return alarms;
  }

  private static double triangular(Random random) {
    double first = random.nextDouble();
    return Math.sqrt(6) * (first - random.nextDouble());
  }

  private static int atLeast(double probability) {
    return BinomialDistribution.of(BALANCES, 1 - COVERAGE)
        .inverseCumulativeProbability(probability);
  }

  @Test
  void normalMetersAlarmAtTheStatedRate() {
    int alarms = alarms(Random::nextGaussian);
    System.out.println("false alarms, normal meters: " + alarms + " of " + BALANCES);
    assertTrue(alarms >= atLeast(0.005) && alarms <= atLeast(0.995), alarms + " alarms");
  }

  @Test
  void metersWithLimitsDoNotAlarmMoreOften() {
    int rectangular = alarms(r -> Math.sqrt(3) * (2 * r.nextDouble() - 1));
    int triangular = alarms(FalseAlarmTest::triangular);
    System.out.printf("false alarms, rectangular %d, triangular %d%n", rectangular, triangular);
    assertTrue(rectangular <= atLeast(0.995), rectangular + " alarms");
    assertTrue(triangular <= atLeast(0.995), triangular + " alarms");
  }
}
