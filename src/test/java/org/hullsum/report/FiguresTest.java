package org.hullsum.report;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Optional;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FiguresTest {
  @ParameterizedTest
  @CsvSource({
    "0, 6, 0",
    "-0.0, 6, 0",
    "50.26548245743669, 6, 50.2655",
    "1234567.4, 6, 1234570",
    "9999999.6, 6, 1e7",
    "0.00012345, 2, 0.00012",
    "0.000099, 2, 9.9e-5",
    "-3.14159e-12, 3, -3.14e-12",
    "2.0, 4, 2",
    "NaN, 4, -",
    "Infinity, 4, unbounded"
  })
  void significantDigitsAreRoundedAndZerosLeftOut(double value, int digits, String text) {
    assertEquals(text, Figures.significant(value, digits));
  }

  @Test
  void aVectorIsRoundedByItsLargestComponent() {
    assertEquals("[0.3, 0, 1.1]", Figures.vector(new Vector3(0.3000001, -3.01547e-10, 1.1)));
    assertEquals("[0, 0, 0]", Figures.vector(new Vector3(0, -0.0, 0)));
  }

  @Test
  void aColumnIsAlignedAtThePointAndEachFigureStopsAtItsError() {
    List<String> cells =
        new FigureColumnBuilder()
            .add(Optional.of(-41.8), 0, 0.3)
            .add(Optional.of(31.25), 0, 0)
            .add(Optional.of(3.14159265358979), 1e-5, 0)
            .add(Optional.empty(), 0, 0)
            .cells();
    assertEquals(List.of("-41.80   ", " 31.25   ", "  3.14159", "  -      "), cells);
  }

  @Test
  void noFigureHasMoreThanEightDigitsFromTheLargest() {
    List<String> cells =
        new FigureColumnBuilder()
            .add(Optional.of(123.45678901234), 1e-13, 0)
            .add(Optional.of(1e-9), 1e-8, 0)
            .cells();
    assertEquals(List.of("123.45679", "  0.00000"), cells);
  }

  @Test
  void aFigureThatStandsOutOfItsErrorNeverPrintsAsZero() {
    List<String> cells =
        new FigureColumnBuilder()
            .add(Optional.of(100.0), 1e-12, 0)
            .add(Optional.of(-1.2345e-9), 1e-12, 0)
            .cells();
    assertEquals(List.of("100.00000", " -1.23e-9"), cells);
  }

  @Test
  void smallAndLargeColumnsAreWrittenWithPowersOfTen() {
    assertEquals(
        List.of(" 1.2346e-7", "-5e-12    ", " 0        "),
        new FigureColumnBuilder()
            .add(Optional.of(1.23456789e-7), 1e-11, 0)
            .add(Optional.of(-5e-12), 1e-11, 0)
            .add(Optional.of(0.0), 1e-11, 0)
            .cells());
    assertEquals(List.of("2.5e9"), new FigureColumnBuilder().add(Optional.of(2.5e9), 0, 0).cells());
  }

  @Test
  void aColumnOfZerosAndUnboundedErrorsIsWritten() {
    assertEquals(
        List.of("0", "0"),
        new FigureColumnBuilder()
            .add(Optional.of(0.0), 0, 0)
            .add(Optional.of(-0.0), Double.POSITIVE_INFINITY, 0)
            .cells());
  }
}
