package org.hullsum.quadrature;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The positions of the traverse rules against those that standards print. */
class TraverseRuleTest {
  private static double[] numbers(String text) {
    return Arrays.stream(text.split(" ")).mapToDouble(Double::parseDouble).toArray();
  }

  private static double[] positions(TraverseLine line) {
    return line.positions().stream().mapToDouble(Double::doubleValue).toArray();
  }

  /** 40 CFR 60 appendix A-1, method 1, table 1-2: per cent of the diameter from the wall. */
  @ParameterizedTest
  @CsvSource({
    "2, 14.6",
    "4, 6.7 25.0",
    "6, 4.4 14.6 29.6",
    "8, 3.2 10.5 19.4 32.3",
    "10, 2.6 8.2 14.6 22.6 34.2",
    "12, 2.1 6.7 11.8 17.7 25.0 35.6",
    "14, 1.8 5.7 9.9 14.6 20.1 26.9 36.6",
    "16, 1.6 4.9 8.5 12.5 16.9 22.0 28.3 37.5",
    "18, 1.4 4.4 7.5 10.9 14.6 18.8 23.6 29.6 38.2",
    "20, 1.3 3.9 6.7 9.7 12.9 16.5 20.4 25.0 30.6 38.8",
    "22, 1.1 3.5 6.0 8.7 11.6 14.6 18.0 21.8 26.2 31.5 39.3",
    "24, 1.1 3.2 5.5 7.9 10.5 13.2 16.1 19.4 23.0 27.2 32.3 39.8"
  })
  void equalAreaPositionsAreThoseOfTheFederalTable(int onDiameter, String printed) {
    double[] radii = positions(TraverseRule.EQUAL_AREA.radius(onDiameter / 2));
    double[] fromWall = Arrays.stream(radii).map(r -> 50 * (1 - r)).sorted().toArray();

    assertArrayEquals(numbers(printed), fromWall, 0.05);
  }

  /**
   * ISO 5802:2001, tables 2 and 3, in diameters from the wall; the row of five from memory. For the
   * third of four points it prints 0.184, one in the last digit beside the 0.1834 that follows from
   * the four digits of ISO 3966, which are kept here.
   */
  @ParameterizedTest
  @CsvSource({
    "3, 0.032 0.135 0.321",
    "4, 0.021 0.117 0.1834 0.345",
    "5, 0.019 0.077 0.153 0.217 0.361"
  })
  void logLinearPositionsAreThoseOfTheStandard(int onRadius, String printed) {
    double[] radii = positions(TraverseRule.LOG_LINEAR.radius(onRadius));
    double[] fromWall = Arrays.stream(radii).map(r -> 0.5 * (1 - r)).sorted().toArray();

    assertArrayEquals(numbers(printed), fromWall, 0.00051);
  }

  /** The mean of ln(1 − r) over a disk is −3/2; the printed digits give it to a few thousandths. */
  @ParameterizedTest
  @CsvSource({"3, -1.49998", "4, -1.50267", "5, -1.49993"})
  void logLinearPositionsIntegrateTheLogLaw(int onRadius, double computed) {
    double mean = TraverseRule.LOG_LINEAR.radius(onRadius).mean(r -> Math.log(1 - r));

    assertEquals(computed, mean, 0.000005);
    assertEquals(-1.5, mean, 0.003);
  }

  /** ISO 3966, round sections, in radii from the centre; from memory. */
  @ParameterizedTest
  @CsvSource({
    "3, 0.3754 0.7252 0.9358",
    "4, 0.3314 0.6124 0.8000 0.9524",
    "5, 0.2866 0.5700 0.6892 0.8472 0.9622"
  })
  void logTchebycheffPositionsOnARadiusAreThoseOfTheStandard(int onRadius, String printed) {
    assertArrayEquals(
        numbers(printed), positions(TraverseRule.LOG_TCHEBYCHEFF.radius(onRadius)), 0.0002);
  }

  /** EN 12599 and ISO 3966, rectangular sections, as shares of a side. */
  @ParameterizedTest
  @CsvSource({
    "5, 0.074 0.288 0.500 0.712 0.926",
    "6, 0.061 0.235 0.437 0.563 0.765 0.939",
    "7, 0.053 0.203 0.366 0.500 0.634 0.797 0.947"
  })
  void logTchebycheffPositionsAlongASideAreThoseOfTheStandard(int onSide, String printed) {
    assertArrayEquals(
        numbers(printed), positions(TraverseRule.LOG_TCHEBYCHEFF.side(onSide)), 0.00051);
  }

  /** Computed beforehand with another program, from the printed positions. */
  @ParameterizedTest
  @CsvSource({
    "5, -0.004742, -0.002287, -0.002520, 0.010432, 0.004865, 0.002225",
    "7, -0.002702, -0.001458, -0.001478, 0.009204, 0.004425, 0.002089",
    "10, -0.001438, -0.000871, -0.000803, 0.007464, 0.003673, 0.001777"
  })
  void errorsOverPowerLawsInADiskAreThoseComputedBeforehand(
      int n, double three, double four, double five, double six, double twelve, double all) {
    assertEquals(three, TraverseError.onRadius(TraverseRule.LOG_LINEAR.radius(3), n), 6e-7);
    assertEquals(four, TraverseError.onRadius(TraverseRule.LOG_LINEAR.radius(4), n), 6e-7);
    assertEquals(five, TraverseError.onRadius(TraverseRule.LOG_LINEAR.radius(5), n), 6e-7);
    assertEquals(six, TraverseError.onRadius(TraverseRule.EQUAL_AREA.radius(3), n), 6e-7);
    assertEquals(twelve, TraverseError.onRadius(TraverseRule.EQUAL_AREA.radius(6), n), 6e-7);
    assertEquals(all, TraverseError.onRadius(TraverseRule.EQUAL_AREA.radius(12), n), 6e-7);
  }

  /** Computed beforehand from positions of three digits, which shift the mean by up to 1e-3. */
  @ParameterizedTest
  @CsvSource({"5, 5, -0.001955", "5, 6, -0.003215", "6, 6, -0.004474", "7, 7, -0.000792"})
  void errorsOverThePowerLawInARectangleAreThoseComputedBeforehand(
      int across, int up, double computed) {
    assertEquals(
        computed,
        TraverseError.onSides(
            TraverseRule.LOG_TCHEBYCHEFF.side(across), TraverseRule.LOG_TCHEBYCHEFF.side(up), 7),
        1e-3);
  }

  @Test
  void middlesOfEqualAreasAndGaussPointsIntegrateTheLaminarProfileExactly() {
    for (int n = 1; n <= 16; n++) {
      assertEquals(0.5, TraverseRule.EQUAL_AREA.radius(n).mean(r -> 1 - r * r), 1e-14);
      assertEquals(0.5, TraverseRule.GAUSS.radius(n).mean(r -> 1 - r * r), 1e-14);
    }
  }

  /** Computed beforehand. */
  @ParameterizedTest
  @CsvSource({"3, 0.487497", "4, 0.499004", "5, 0.495309"})
  void logLinearPositionsIntegrateTheLaminarProfileNearly(int onRadius, double computed) {
    assertEquals(
        computed, TraverseRule.LOG_LINEAR.radius(onRadius).mean(r -> 1 - r * r), 0.0000005);
  }

  @Test
  void gaussPointsAreExactInAreaUpToTheirDegree() {
    for (int n = 1; n <= 6; n++) {
      for (int degree = 0; degree < 2 * n; degree++) {
        int power = degree;
        double inArea = TraverseRule.GAUSS.radius(n).mean(r -> Math.pow(r * r, power));
        double alongASide = TraverseRule.GAUSS.side(n).mean(a -> Math.pow(a, power));
        assertEquals(1.0 / (degree + 1), inArea, 1e-14);
        assertEquals(1.0 / (degree + 1), alongASide, 1e-14);
      }
    }
  }

  @Test
  void everyLineAscendsInsideItsSectionAndItsWeightsAddToOne() {
    for (TraverseRule rule : TraverseRule.values()) {
      IntStream.rangeClosed(1, 40).filter(rule::onRadius).forEach(n -> check(rule.radius(n), n));
      IntStream.rangeClosed(1, 40).filter(rule::onSide).forEach(n -> check(rule.side(n), n));
    }
  }

  private static void check(TraverseLine line, int count) {
    assertEquals(count, line.size());
    double before = 0;
    for (double position : line.positions()) {
      assertTrue(position > before && position < 1, line.toString());
      before = position;
    }
    assertEquals(1, line.weights().stream().mapToDouble(Double::doubleValue).sum(), 1e-14);
  }

  @Test
  void setThatARuleDoesNotHaveIsRefused() {
    assertFalse(TraverseRule.LOG_LINEAR.onRadius(6));
    assertFalse(TraverseRule.LOG_LINEAR.onSide(5));
    assertFalse(TraverseRule.LOG_TCHEBYCHEFF.onSide(4));
    assertThrows(IllegalArgumentException.class, () -> TraverseRule.LOG_LINEAR.radius(6));
    assertThrows(IllegalArgumentException.class, () -> TraverseRule.LOG_TCHEBYCHEFF.side(4));
  }

  private static void assertArrayEquals(double[] expected, double[] found, double tolerance) {
    org.junit.jupiter.api.Assertions.assertArrayEquals(expected, found, tolerance);
  }
}
