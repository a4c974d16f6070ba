package org.hullsum.expression;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Map;
import java.util.Optional;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.hullsum.units.Dimension;
import org.hullsum.units.WorkingUnits;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class DimensionCheckTest {
  private static final Map<String, Optional<Dimension>> SYMBOLS =
      Map.of(
          "x", Optional.of(Dimension.LENGTH),
          "y", Optional.of(Dimension.LENGTH),
          "t", Optional.of(Dimension.TIME),
          "n", Optional.of(Dimension.NONE),
          "free", Optional.empty());

  private static Optional<Dimension> of(String text) throws TextFault {
    return DimensionCheck.of(
        ExpressionParser.parse(text, SYMBOLS.keySet(), WorkingUnits.SI), SYMBOLS);
  }

  @ParameterizedTest
  @CsvSource({
    "x + y, m",
    "x/t, m.s-1",
    "'hypot(x, y)', m",
    "sqrt(x*y), m",
    "x^2, m2",
    "x^(1/2), m^6/12",
    "cbrt(x^3), m",
    "(x^3)^(1/3), m",
    "x^-(3 - 1), m-2",
    "'if(x < y, x, 2)', m",
    "x + 3, m",
    "x*(4 1/s), m.s-1",
    "sin(x/y), 1",
    "n^n, 1",
    "'atan2(y, x)', 1",
    "'max(x, 0)', m",
    "-abs(x), m",
  })
  void dimensionFollowsFromTheTerms(String text, String dimension) throws TextFault {
    assertEquals(dimension, of(text).orElseThrow().toString());
  }

  @ParameterizedTest
  @CsvSource({"3*x", "free", "free*t + 2", "2 + 3", "x/2"})
  void bareNumbersLeaveTheDimensionFree(String text) throws TextFault {
    assertTrue(of(text).isEmpty());
  }

  @ParameterizedTest
  @CsvSource({
    "x + t, 4, 5",
    "y*(x - t), 7, 8",
    "2 + sin(x), 8, 9",
    "x^n, 2, 3",
    "x^t, 2, 3",
    "'min(x, t)', 7, 8",
    "x < t, 4, 5",
    "'if(x < y, x, t)', 13, 14",
    "exp(3 m), 4, 7",
  })
  void termsThatDoNotFitAreRefusedAtTheirPlace(String text, int start, int end) {
    TextFault fault = assertThrows(TextFault.class, () -> of(text));
    assertEquals(ProblemKind.DIMENSION, fault.kind());
    assertEquals(start, fault.start());
    assertEquals(end, fault.end());
  }
}
