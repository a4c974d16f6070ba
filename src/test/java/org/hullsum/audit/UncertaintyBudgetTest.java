package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.model.Input;
import org.hullsum.model.Inputs;
import org.hullsum.problem.Place;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class UncertaintyBudgetTest {
  private static Input input(String name, double u, double dof) {
    return new Input(name, 1, u, dof, Optional.empty(), false, Place.wholeFile("case.yaml"));
  }

  private static Inputs inputs(List<Inputs.Correlation> correlations, Input... inputs) {
    Map<String, Input> all = new LinkedHashMap<>();
    for (Input input : inputs) {
      all.put(input.name(), input);
    }
    return new Inputs(all, correlations);
  }

  private static Estimate moved(Map<String, Double> sensitivities) {
    return new Estimate(1, 0, sensitivities);
  }

  @Test
  void independentSourcesAddInQuadratureLargestFirst() {
    Inputs inputs =
        inputs(
            List.of(),
            input("a", 3, Double.POSITIVE_INFINITY),
            input("b", 2, Double.POSITIVE_INFINITY));
    UncertaintyBudget budget =
        UncertaintyBudget.of(List.of(moved(Map.of("a", 1.0)), moved(Map.of("b", -2.0))), inputs);
    assertEquals(5, budget.standardUncertainty(), 1e-15);
    assertEquals("b", budget.contributions().get(0).source());
    assertEquals(4, budget.contributions().get(0).contribution(), 1e-15);
    assertEquals(0.64, budget.contributions().get(0).share(), 1e-15);
    assertEquals(0.36, budget.contributions().get(1).share(), 1e-15);
  }

  @Test
  void oneSourceInTwoPartsCancelsWithItsSigns() {
    Inputs inputs = inputs(List.of(), input("factor", 0.1, Double.POSITIVE_INFINITY));
    UncertaintyBudget budget =
        UncertaintyBudget.of(
            List.of(moved(Map.of("factor", 20.0)), moved(Map.of("factor", -20.0 * (1 + 1e-9)))),
            inputs);
    assertEquals(0, budget.standardUncertainty());
    assertTrue(budget.contributions().isEmpty());
  }

  @ParameterizedTest
  @CsvSource({"1, 7", "-1, 1", "0, 5", "0.5, 6.082762530298219"})
  void correlationIsAddedWithItsSign(double coefficient, double expected) {
    Inputs inputs =
        inputs(
            List.of(new Inputs.Correlation("a", "b", coefficient)),
            input("a", 3, Double.POSITIVE_INFINITY),
            input("b", 4, Double.POSITIVE_INFINITY));
    UncertaintyBudget budget =
        UncertaintyBudget.of(List.of(moved(Map.of("a", 1.0, "b", 1.0))), inputs);
    assertEquals(expected, budget.standardUncertainty(), 1e-14);
    assertEquals(1, budget.contributions().stream().mapToDouble(c -> c.share()).sum(), 1e-14);
  }

  /**
   * JCGM 100:2008, G.4.1 (from memory): relative standard uncertainties 0.25 %, 0.57 %, 0.82 % from
   * 10, 5 and 15 readings: u 1.03 %, 19.0 effective degrees of freedom, t95 = 2.09, U95 = 2.2 %.
   */
  @Test
  void welchSatterthwaiteGivesThePublishedDegreesOfFreedom() {
    Inputs inputs =
        inputs(List.of(), input("x", 0.25, 9), input("y", 0.57, 4), input("z", 0.82, 14));
    UncertaintyBudget budget =
        UncertaintyBudget.of(List.of(moved(Map.of("x", 1.0, "y", 1.0, "z", 1.0))), inputs);
    assertEquals(1.03, budget.standardUncertainty(), 0.005);
    double freedom = budget.degreesOfFreedom();
    assertEquals(19.0, freedom, 0.05);
    double k = new Coverage(0.95, freedom).factor();
    assertEquals(2.09, k, 0.005);
    assertEquals(2.2, k * budget.standardUncertainty(), 0.05);
  }

  @Test
  void finiteDegreesOfFreedomUnderCorrelationAreRefused() {
    Inputs inputs =
        inputs(
            List.of(new Inputs.Correlation("a", "b", 0.5)),
            input("a", 3, 9),
            input("b", 4, Double.POSITIVE_INFINITY));
    assertTrue(
        UncertaintyBudget.of(List.of(moved(Map.of("a", 1.0, "b", 1.0))), inputs)
            .refusal()
            .isPresent());
    UncertaintyBudget alone = UncertaintyBudget.of(List.of(moved(Map.of("a", 1.0))), inputs);
    assertTrue(alone.refusal().isEmpty());
    assertEquals(9, alone.degreesOfFreedom(), 1e-12);
  }

  @Test
  void correlationsThatContradictOneAnotherAreRefused() {
    Inputs inputs =
        inputs(
            List.of(
                new Inputs.Correlation("a", "b", -1),
                new Inputs.Correlation("b", "c", -1),
                new Inputs.Correlation("a", "c", -1)),
            input("a", 1, Double.POSITIVE_INFINITY),
            input("b", 1, Double.POSITIVE_INFINITY),
            input("c", 1, Double.POSITIVE_INFINITY));
    UncertaintyBudget budget =
        UncertaintyBudget.of(List.of(moved(Map.of("a", 1.0, "b", 1.0, "c", 1.0))), inputs);
    assertTrue(budget.refusal().isPresent());
    assertTrue(budget.standardUncertainty() > 0);
  }

  /** NIST Technical Note 1297 (1994), Table B.1; the last row is the normal distribution's. */
  @ParameterizedTest
  @CsvSource({
    "1, 0.95, 12.71",
    "2, 0.99, 9.92",
    "5, 0.9545, 2.65",
    "10, 0.95, 2.23",
    "20, 0.99, 2.85",
    "50, 0.95, 2.01",
    "Infinity, 0.95, 1.960",
    "Infinity, 0.90, 1.645",
    "Infinity, 0.99, 2.576"
  })
  void coverageFactorsAreThePublishedOnes(double freedom, double probability, double expected) {
    assertEquals(expected, new Coverage(probability, freedom).factor(), 0.006);
  }

  @Test
  void correctedCoverageOverManyBalancesKeepsTheStatedOne() {
    assertEquals(0.95, Math.pow(Coverage.corrected(0.95, 10), 10), 1e-14);
    assertEquals(0.994883803, Coverage.corrected(0.95, 10), 1e-9);
  }
}
