package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FiguresTest {
  @ParameterizedTest
  @CsvSource({
    "0, 0",
    "-0.0, 0",
    "12.3456, 12.35",
    "-12.3456, -12.35",
    "123456.7, 123500",
    "1234567, 1.235e6",
    "0.00012345, 0.0001234",
    "0.000012345, 1.234e-5",
    "-1e-12, -1e-12",
    "99999, 100000",
    "NaN, not finite"
  })
  void fourDigitsAreWritten(double value, String expected) {
    assertEquals(expected, Figures.text(value));
  }
}
