package org.hullsum.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Optional;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class MeasuredQuantityParserTest {
  private static final double ROUNDING = 1e-14;

  /** The 0.975 quantile of the standard normal distribution, from any table of it. */
  private static final double NORMAL_95 = 1.959963984540054;

  private static final MeasuredQuantityParser PARSER =
      MeasuredQuantityParser.of(Optional.empty(), WorkingUnits.SI);

  private static TextFault fault(String text) {
    return assertThrows(TextFault.class, () -> PARSER.parse(text), text);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "41.8 m3/h ± 0.6 m3/h (k=2) | 0.3",
        "41.8 m3/h +/- 0.6 m3/h (k=2) | 0.3",
        "41.8 m3/h±0.6 m3/h (k = 2) | 0.3",
        "41.8 ± 0.6 m3/h (k=2) | 0.3",
        "41.8 m3/h ± 0.6 (k=1) | 0.6",
        "41.8 ± 0.6 m3/h (95 %) | 0.30612807",
        "41.8 ± 0.6 m3/h (95%) | 0.30612807",
        "41.8 m3/h ± 10 L/min (k=1) | 0.6",
        "41.8 m3/h ± 1.5 % (k=1) | 0.627",
        "-41.8 m3/h ± 1.5 % (k=1) | 0.627",
        "41.8 m3/h ± 1.5 % of value (k=1) | 0.627",
        "41.8 m3/h ± 500 ppm (k=1) | 0.0209",
        "41.8 m3/h ± 0.5 % of 60 m3/h (limits) | 0.17320508",
        "41.8 m3/h ± 0.5 % of 1000 L/min (rectangular) | 0.17320508",
        "41.8 m3/h ± 0.5 % of 60 (limits) | 0.17320508",
        "41.8 m3/h ± 0.6 m3/h (triangular) | 0.24494897",
        "41.8 m3/h ± 0.3 m3/h (k=1) ± 0.4 m3/h (k=1) | 0.5",
        "41.8 ± 0.6 m3/h (k=2) ± 0.8 m3/h (k=2) | 0.5",
        "41.8 m3/h ± 0.6 m3/h absolute (k=2) | 0.3"
      })
  void figureBecomesAStandardUncertaintyInTheUnitOfTheValue(String text, double standard)
      throws TextFault {
    MeasuredQuantity measured = PARSER.parse(text);
    assertEquals(41.8, Math.abs(measured.quantity().value()));
    assertEquals("m3/h", measured.quantity().unit().code());
    assertEquals(standard, measured.standardUncertainty(), 5e-9);
    assertTrue(measured.stated());
    assertEquals(Double.POSITIVE_INFINITY, measured.degreesOfFreedom());
  }

  @Test
  void coverageOfNormalDistributionIsItsQuantile() throws TextFault {
    assertEquals(1 / NORMAL_95, PARSER.parse("5 m ± 1 m (95 %)").standardUncertainty(), ROUNDING);
  }

  /** Factors of NIST TN 1297 (1994), table B.1, columns 95 % and 99 %: printed digits. */
  @ParameterizedTest
  @CsvSource({
    "1, 12.71, 63.66",
    "2, 4.30, 9.92",
    "5, 2.57, 4.03",
    "9, 2.26, 3.25",
    "10, 2.23, 3.17",
    "20, 2.09, 2.85",
    "50, 2.01, 2.68"
  })
  void coverageWithDegreesOfFreedomIsStudents(double dof, double k95, double k99) throws TextFault {
    MeasuredQuantity at95 = PARSER.parse("5 m ± 1 m (95 %, " + dof + " dof)");
    assertEquals(k95, 1 / at95.standardUncertainty(), 0.006);
    assertEquals(dof, at95.degreesOfFreedom(), ROUNDING * dof);
    assertEquals(
        k99, 1 / PARSER.parse("5 m ± 1 m (" + dof + " dof, 99 %)").standardUncertainty(), 0.006);
  }

  /** Closed form: with one degree of freedom Student's quantile is tan(pi (p − 1/2)). */
  @Test
  void coverageWithOneDegreeOfFreedomIsCauchys() throws TextFault {
    double quantile = Math.tan(Math.PI * 0.475);
    double standard = PARSER.parse("5 m ± 1 m (95 %, 1 dof)").standardUncertainty();
    assertEquals(1 / quantile, standard, 1e-12);
  }

  @Test
  void degreesOfFreedomCombineByWelchAndSatterthwaite() throws TextFault {
    MeasuredQuantity measured =
        PARSER.parse("10 m ± 3 m (k=1, 4 dof) ± 4 m (k=1, 10 dof) ± 12 m (k=1)");
    assertEquals(13, measured.standardUncertainty(), ROUNDING * 13);
    double expected = Math.pow(13, 4) / (Math.pow(3, 4) / 4 + Math.pow(4, 4) / 10);
    assertEquals(expected, measured.degreesOfFreedom(), 1e-12 * expected);
  }

  @Test
  void caseWideMeaningServesFiguresThatStateNone() throws TextFault {
    MeasuredQuantityParser parser =
        MeasuredQuantityParser.of(Optional.of(UncertaintyMeaning.parse("k=2")), WorkingUnits.SI);
    assertEquals(0.5, parser.parse("5 m ± 1 m").standardUncertainty());
    assertEquals(1, parser.parse("5 m ± 1 m (k=1)").standardUncertainty());
    MeasuredQuantity withDof = parser.parse("5 m ± 1 m (7 dof)");
    assertEquals(0.5, withDof.standardUncertainty());
    assertEquals(7, withDof.degreesOfFreedom(), ROUNDING * 7);
  }

  @Test
  void valueWithoutUncertaintyIsExactAndSaysSo() throws TextFault {
    MeasuredQuantity exact = PARSER.parse("41.8 m3/h");
    assertFalse(exact.stated());
    assertEquals(0, exact.standardUncertainty());
    assertTrue(PARSER.parse("41.8").quantity().bare());
  }

  @Test
  void bareValueKeepsABareUncertainty() throws TextFault {
    MeasuredQuantity measured = PARSER.parse("41.8 ± 0.6 (k=2) ± 1 % (k=1) ± 1 % of 50 (k=1)");
    assertTrue(measured.quantity().bare());
    assertEquals(Math.sqrt(0.09 + 0.418 * 0.418 + 0.25), measured.standardUncertainty(), ROUNDING);
  }

  @Test
  void temperatureAfterPlusMinusIsADifference() throws TextFault {
    for (String text :
        new String[] {
          "20 degC ± 0.5 degC (k=1)",
          "20 degC ± 0.5 K (k=1)",
          "20 ± 0.5 degC (k=1)",
          "20 degC ± 0.9 degF (k=1)",
          "20 degC ± 0.5 % of 100 degC (k=1)"
        }) {
      MeasuredQuantity measured = PARSER.parse(text);
      assertEquals(293.15, measured.quantity().in(WorkingUnits.SI), 1e-12, text);
      assertEquals(0.5, measured.standardUncertaintyIn(WorkingUnits.SI), ROUNDING, text);
    }
    assertTrue(fault("20 degC ± 1 % (k=1)").getMessage().contains("state it in K"));
    assertEquals(3, PARSER.parse("300 K ± 1 % (k=1)").standardUncertainty(), ROUNDING);
  }

  @Test
  void partOfAValueThatIsItselfAPartNeedsAWord() throws TextFault {
    assertEquals(1.35, PARSER.parse("45 % ± 3 % of value (k=1)").standardUncertainty(), ROUNDING);
    assertEquals(0.1, PARSER.parse("45 % ± 0.1 % absolute (k=1)").standardUncertainty());
    assertEquals(0.2, PARSER.parse("45 % ± 2000 ppm absolute (k=1)").standardUncertainty(), 1e-15);
    for (String text : new String[] {"45 % ± 3 % (k=1)", "45 % ± 3 (k=1)", "9 ppm ± 1 % (k=1)"}) {
      TextFault fault = fault(text);
      assertEquals(ProblemKind.UNCERTAINTY, fault.kind());
      assertTrue(fault.getMessage().contains("of value' or '"), fault.getMessage());
      assertTrue(fault.getMessage().contains("absolute'"), fault.getMessage());
    }
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "5 m ± 1 m | UNCERTAINTY | 6 | 9 | (95 %, 9 dof)",
        "5 m ± 1 m (k=2) ± 1 % | UNCERTAINTY | 18 | 21 | uncertainties: k=2",
        "5 m ± -1 m (k=2) | UNCERTAINTY | 6 | 8 | without a sign",
        "5 m ± +1 m (k=2) | UNCERTAINTY | 6 | 8 | without a sign",
        "5 m ± 0 m (k=2) | UNCERTAINTY | 6 | 7 | above zero",
        "5 m ± 1 s (k=2) | DIMENSION | 6 | 9 | the value in m",
        "5 m ± 1 % of 3 s (k=2) | DIMENSION | 6 | 16 | the value in m",
        "5 m ± 1 % of -3 m (k=2) | UNCERTAINTY | 13 | 15 | span",
        "5 m ± 1 % of reading (k=2) | UNCERTAINTY | 13 | 14 | of value",
        "5 m ± 1 m of value (k=2) | UNCERTAINTY | 6 | 18 | in % or ppm",
        "5 m ± 1 % absolute (k=2) | DIMENSION | 6 | 18 | measure the same",
        "5 ± 1 % absolute (k=2) | UNCERTAINTY | 4 | 16 | unit",
        "5 ± 1 % of 3 m (k=2) | UNCERTAINTY | 4 | 14 | after the value as well",
        "5 m ± 1 % FS (k=2) | UNCERTAINTY | 10 | 11 | span",
        "5 m ± 1 m (k=0) | UNCERTAINTY | 13 | 14 | above zero",
        "5 m ± 1 m (u) | UNCERTAINTY | 11 | 12 | (k=1)",
        "5 m ± 1 m (k) | UNCERTAINTY | 11 | 12 | (k=1)",
        "5 m ± 1 m (5 %) | UNCERTAINTY | 11 | 14 | between 50 %",
        "5 m ± 1 m (100 %) | UNCERTAINTY | 11 | 16 | between 50 %",
        "5 m ± 1 m (95 %, 0.5 dof) | UNCERTAINTY | 17 | 24 | 1 or more",
        "5 m ± 1 m (95 %, k=2) | UNCERTAINTY | 17 | 20 | second",
        "5 m ± 1 m (95) | UNCERTAINTY | 11 | 13 | (95 %)",
        "5 m ± 1 m (k=2 | UNCERTAINTY | 10 | 11 | never closed",
        "5 m ± 1 m (k=2) x | UNCERTAINTY | 16 | 17 | expected ±",
        "5 m (k=2) | UNCERTAINTY | 4 | 9 | expected ±",
        "5 m ± m (k=2) | WRONG_VALUE | 6 | 7 | not a number",
        "5 m ± | WRONG_VALUE | 5 | 5 | missing",
        "5 m ± 1,5 m (k=2) | WRONG_VALUE | 6 | 8 | decimal point",
        "5 m ± 1.5% (k=2) | UNIT | 6 | 10 | write '1.5 %'",
        "5 m ± 1 mm(k=2) | UNIT | 10 | 11 | blank",
        "5 kgg ± 1 m (k=2) | UNIT | 2 | 5 | did you mean",
        "(5 ± 1) m | UNCERTAINTY | 0 | 1 | parentheses",
        "5 m ± 1e300 m (k=1e-300) | UNCERTAINTY | 6 | 13 | too large"
      })
  void badUncertaintyIsRefusedWithPlaceAndAdvice(
      String text, ProblemKind kind, int start, int end, String words) {
    TextFault fault = fault(text);
    assertEquals(kind, fault.kind(), fault.getMessage());
    assertTrue(fault.getMessage().contains(words), fault.getMessage());
    assertEquals(start + ".." + end, fault.start() + ".." + fault.end(), fault.getMessage());
  }

  @Test
  void uncertaintyFromAnotherTextJoinsTheValue() throws TextFault {
    Quantity flow = QuantityParser.parse("60 m3/h");
    assertEquals(
        0.3, PARSER.withUncertainty(flow, "± 0.5 % (k=1)").value().standardUncertainty(), ROUNDING);
    assertThrows(TextFault.class, () -> PARSER.withUncertainty(flow, " "));
    assertThrows(TextFault.class, () -> PARSER.withUncertainty(flow, "0.5 %"));
  }

  @Test
  void relativeUncertaintyOfZeroIsZeroAndStated() throws TextFault {
    MeasuredQuantity idle = PARSER.parse("0 m3/h ± 1.5 % (k=1)");
    assertEquals(0, idle.standardUncertainty());
    assertTrue(idle.stated());
    assertEquals(Double.POSITIVE_INFINITY, idle.degreesOfFreedom());
  }

  @Test
  void caseWithoutUnitsTakesPartsAndAngles() throws TextFault {
    MeasuredQuantityParser parser = MeasuredQuantityParser.of(Optional.empty(), WorkingUnits.NONE);
    assertEquals(0.5, parser.parse("50 ± 1 % (k=1)").standardUncertainty());
    assertEquals(1, parser.parse("50 deg ± 1 deg (k=1)").standardUncertainty());
    assertThrows(TextFault.class, () -> parser.parse("50 m ± 1 % (k=1)"));
    assertThrows(TextFault.class, () -> parser.parse("50 ± 1 m (k=1)"));
  }

  @Test
  void notesOfAllUnitsAreKeptOnce() throws TextFault {
    assertEquals(1, PARSER.parseWithNotes("3 gal/min ± 1 gal/min (k=2)").notes().size());
    assertEquals(2, PARSER.parseWithNotes("3 gal/min ± 1 gpm (k=2)").notes().size());
  }
}
