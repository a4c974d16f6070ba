package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.hullsum.problem.Problem;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class BareRateTest {
  private static ReadOutcome read(String metered, String unit) {
    return CaseTexts.read(
        "format: hullsum-case/1\nquantity: {name: water, unit: "
            + unit
            + "}\nuncertainties: k=2\npatches:\n  feed: {flux: {metered: \""
            + metered
            + "\"}}\n");
  }

  @ParameterizedTest
  @ValueSource(strings = {"30.2", "30.2 ± 1 %", "30.2 ± 0.5"})
  void bareRateIsAskedForWhereTheStatedUnitIsNotTheWorkingOne(String metered) {
    ReadOutcome outcome = read(metered, "m3/h");
    assertEquals(1, outcome.problems().size(), outcome.problems()::toString);
    Problem problem = outcome.problems().get(0);
    assertTrue(problem.message().contains("is it 30.2 m3/h, or"), problem.message());
  }

  @ParameterizedTest
  @ValueSource(strings = {"30.2 m3/h", "30.2 m3/h ± 1 %", "30.2 ± 0.5 m3/h", "0", "0 ± 0.1 m3/h"})
  void rateWithItsUnitAnywhereIsRead(String metered) {
    ReadOutcome outcome = read(metered, "m3/h");
    assertEquals(0, outcome.problems().size(), outcome.problems()::toString);
  }

  @ParameterizedTest
  @ValueSource(strings = {"30.2", "30.2 ± 1 %"})
  void bareRateIsReadWhereTheUnitsAreTheSame(String metered) {
    assertTrue(read(metered, "m3/s").found().isPresent());
  }
}
