package org.hullsum.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class UncertaintyMeaningTest {
  @Test
  void everySpellingHasItsMeaning() throws TextFault {
    assertEquals(new UncertaintyMeaning.CoverageFactor(2), UncertaintyMeaning.parse("k=2"));
    assertEquals(new UncertaintyMeaning.CoverageFactor(1), UncertaintyMeaning.parse(" k = 1 "));
    assertEquals(
        new UncertaintyMeaning.CoverageProbability(0.95), UncertaintyMeaning.parse("95 %"));
    assertEquals(new UncertaintyMeaning.Rectangular(), UncertaintyMeaning.parse("limits"));
    assertEquals(new UncertaintyMeaning.Rectangular(), UncertaintyMeaning.parse("rectangular"));
    assertEquals(new UncertaintyMeaning.Triangular(), UncertaintyMeaning.parse("triangular"));
  }

  @ParameterizedTest
  @ValueSource(strings = {"", "2", "k", "k=", "k=-2", "k=2 x", "9 dof", "(k=2)", "95 % , 9 dof"})
  void otherTextIsRefused(String text) {
    TextFault fault = assertThrows(TextFault.class, () -> UncertaintyMeaning.parse(text));
    boolean noNumber = text.equals("k=");
    assertEquals(noNumber ? ProblemKind.WRONG_VALUE : ProblemKind.UNCERTAINTY, fault.kind());
  }

  @Test
  void meaningsWithoutSenseCannotBeMade() {
    assertThrows(IllegalArgumentException.class, () -> new UncertaintyMeaning.CoverageFactor(0));
    assertThrows(
        IllegalArgumentException.class, () -> new UncertaintyMeaning.CoverageProbability(1));
  }
}
