package org.hullsum.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class QuantityParserTest {
  @ParameterizedTest
  @CsvSource({
    "4.0 m, 4, m",
    "12.5 m3/h, 12.5, m3/h",
    "-3e-2 kg/s, -0.03, kg/s",
    "45 deg, 45, deg",
    "5 %, 5, %",
    "+1E3 Pa, 1000, Pa",
    "−2 degC, -2, degC",
    "007 m, 7, m",
    "2  m, 2, m"
  })
  void quantityHasValueAndUnit(String text, double value, String code) throws TextFault {
    Quantity quantity = QuantityParser.parse(text);
    assertEquals(value, quantity.value());
    assertEquals(code, quantity.unit().code());
    assertFalse(quantity.bare());
  }

  @Test
  void numberAloneIsBare() throws TextFault {
    assertEquals(new Quantity(4, Unit.ONE, true), QuantityParser.parse(" 4.0 "));
    assertEquals(-0.0, QuantityParser.parse("-0").value());
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "1,5 m | WRONG_VALUE | decimal point",
        "1,500.0 m | WRONG_VALUE | decimal point",
        "1_000 m | WRONG_VALUE | separate",
        "0x10 | WRONG_VALUE | decimal",
        "inf | WRONG_VALUE | not a number",
        "nan m | WRONG_VALUE | not a number",
        ".5 m | WRONG_VALUE | 0.5",
        "5. m | WRONG_VALUE | 5.0",
        "1.2.3 m | WRONG_VALUE | second",
        "1e m | WRONG_VALUE | missing after",
        "1e400 m | WRONG_VALUE | too large",
        "1e-400 m | WRONG_VALUE | too small",
        "- 4 m | WRONG_VALUE | not a number",
        "4.0m | UNIT | write '4.0 m'",
        "5% | UNIT | write '5 %'",
        "4 m x | UNIT | left over",
        "4 m / s | UNIT | left over",
        "4 m ± 1 m | UNCERTAINTY | not expected",
        "4 Kg | UNIT | kg",
        "4 m3/hh | UNIT | did you mean"
      })
  void badQuantityIsRefusedWithAdvice(String text, ProblemKind kind, String words) {
    TextFault fault = assertThrows(TextFault.class, () -> QuantityParser.parse(text));
    assertEquals(kind, fault.kind(), fault.getMessage());
    assertTrue(fault.getMessage().contains(words), fault.getMessage());
  }

  @Test
  void emptyTextIsRefused() {
    assertThrows(TextFault.class, () -> QuantityParser.parse(""));
    assertThrows(TextFault.class, () -> QuantityParser.parse("   "));
  }

  @Test
  void faultOfAUnitPointsIntoTheQuantity() {
    TextFault fault = assertThrows(TextFault.class, () -> QuantityParser.parse("4.0 m3/hh"));
    assertEquals(7, fault.start());
    assertEquals(9, fault.end());
  }

  @Test
  void caseWithoutUnitsTakesAnglesOnly() throws TextFault {
    assertEquals(
        Math.PI / 4,
        QuantityParser.parse("45 deg", WorkingUnits.NONE).in(WorkingUnits.NONE),
        1e-16);
    assertTrue(QuantityParser.parse("4.5", WorkingUnits.NONE).bare());
    TextFault fault =
        assertThrows(TextFault.class, () -> QuantityParser.parse("4 m", WorkingUnits.NONE));
    assertEquals(2, fault.start());
    assertEquals(3, fault.end());
    assertEquals(ProblemKind.UNIT, fault.kind());
  }

  @Test
  void notesOfTheUnitAreKept() throws TextFault {
    assertEquals(1, QuantityParser.parseWithNotes("3 gal/min").notes().size());
  }
}
