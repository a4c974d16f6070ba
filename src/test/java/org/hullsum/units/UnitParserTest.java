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
import org.junit.jupiter.params.provider.ValueSource;

class UnitParserTest {
  private static final double ROUNDING = 1e-15;

  private static void assertScale(double expected, String code) throws TextFault {
    assertEquals(expected, UnitParser.parse(code).scale(), ROUNDING * expected, code);
  }

  private static TextFault fault(String code) {
    return assertThrows(TextFault.class, () -> UnitParser.parse(code), code);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "m3/h",
        "m³/h",
        "m^3/h",
        "m3/hr",
        "m3.h-1",
        "m³·h⁻¹",
        "m3*h^-1",
        "/h.m3",
        "(m3)/h",
        "m3{feed}/h",
        "kL/h",
        "m3/(60.min)",
        "m^3/hour",
        "(m/h).m2",
        "(m)^3/h",
        "(m)³/h",
        "1/(h.m-3)"
      })
  void spellingsOfCubicMetresPerHourAreTheSameUnit(String code) throws TextFault {
    Unit unit = UnitParser.parse(code);
    assertEquals(1.0 / 3600, unit.scale(), code);
    assertEquals("m3.s-1", unit.dimension().toString(), code);
    assertTrue(unit.sameScale(UnitParser.parse("m3/h")), code);
    assertEquals(code, unit.code());
  }

  @ParameterizedTest
  @CsvSource({
    "1, 1, 1",
    "m, 1, m",
    "km, 1000, m",
    "mm2, 1e-6, m2",
    "mm3/h, 2.7777777777777777e-13, m3.s-1",
    "um, 1e-6, m",
    "µm, 1e-6, m",
    "g, 1e-3, kg",
    "t/d, 0.011574074074074073, kg.s-1",
    "L/min, 1.6666666666666667e-5, m3.s-1",
    "kWh, 3.6e6, m2.kg.s-2",
    "W/(m.K), 1, m.kg.s-3.K-1",
    "W/m2/K, 1, kg.s-3.K-1",
    "kg/(m2.s), 1, m-2.kg.s-1",
    "1/(m.s), 1, m-1.s-1",
    "Ohm, 1, m2.kg.s-3.A-2",
    "Ω, 1, m2.kg.s-3.A-2",
    "C/s, 1, A",
    "kmol/h, 0.2777777777777778, s-1.mol",
    "bar, 1e5, m-1.kg.s-2",
    "mm[Hg], 133.322, m-1.kg.s-2",
    "mmHg, 133.322, m-1.kg.s-2",
    "mmH2O, 9.80665, m-1.kg.s-2",
    "psi, 6894.757293168361, m-1.kg.s-2",
    "in, 0.0254, m",
    "ft3/min, 4.719474432e-4, m3.s-1",
    "cfm, 4.719474432e-4, m3.s-1",
    "[gal_br], 4.54609e-3, m3",
    "gal/min, 6.30901964e-5, m3.s-1",
    "gpm, 6.30901964e-5, m3.s-1",
    "[ston_av]/h, 0.25199576111111111, kg.s-1",
    "[lton_av], 1016.0469088, kg",
    "[HP], 745.69987158227022, m2.kg.s-3",
    "%, 0.01, 1",
    "ppm, 1e-6, 1",
    "ppb, 1e-9, 1",
    "deg, 0.017453292519943295, 1",
    "rpm, 0.10471975511965977, s-1",
    "10*-3.m, 1e-3, m",
    "10^3.m, 1e3, m",
    "10*3, 1000, 1",
    "10*m, 10, m",
    "m2.10*3, 1000, m2",
    "60.s, 60, s",
    "2/min, 0.033333333333333333, s-1",
    "{tank}, 1, 1",
    "{parts}/min, 0.016666666666666666, s-1",
    "m+2, 1, m2"
  })
  void codeHasSizeAndDimension(String code, double scale, String dimension) throws TextFault {
    assertScale(scale, code);
    assertEquals(dimension, UnitParser.parse(code).dimension().toString(), code);
  }

  @Test
  void temperatureAloneHasAnOffsetAndInACompoundHasNone() throws TextFault {
    for (String code : new String[] {"degC", "Cel", "°C", "℃", "Cel{wall}"}) {
      assertEquals(293.15, UnitParser.parse(code).toSi(20), 1e-12, code);
    }
    assertEquals(273.15, UnitParser.parse("degF").toSi(32), 1e-12);
    assertEquals(373.15, UnitParser.parse("[degF]").toSi(212), 1e-12);
    assertEquals(0, UnitParser.parse("W/(m2.degC)").offset());
    assertEquals(5.0 / 9, UnitParser.parse("degF/h").scale() * 3600, 1e-15);
    assertEquals(0, UnitParser.parse("1/degC").offset());
    assertEquals(0, UnitParser.parse("degC2").offset());
    assertEquals(0, UnitParser.parse("degC").difference().offset());
    assertFalse(UnitParser.parse("degC").sameScale(UnitParser.parse("K")));
    assertTrue(UnitParser.parse("degC").difference().sameScale(UnitParser.parse("K")));
  }

  @ParameterizedTest
  @CsvSource({
    "gal/min, US gallons",
    "gpm, US gallons",
    "Mm3/a, cubic megametres",
    "rpm, 2 pi rad",
    "kg/m.s, left to right",
    "W/m.K, left to right",
    "J/kg.[degF], left to right",
    "m3/H, henry",
    "m/S, siemens",
    "W/(m2.C), coulomb",
    "bbl/d, 42 US gallons",
    "Btu/h, International Table"
  })
  void codeWithAChoiceCarriesANote(String code, String words) throws TextFault {
    String notes = String.join("; ", UnitParser.parseWithNotes(code).notes());
    assertTrue(notes.contains(words), notes);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"m3/h", "W/(m.K)", "kg.m/s2", "J/kg.K-1", "hm3/a", "V.A/C", "Mm2", "2/h.m3"})
  void codeWithoutAChoiceCarriesNoNote(String code) throws TextFault {
    boolean coulombDivides = code.equals("V.A/C");
    assertEquals(
        coulombDivides || code.equals("2/h.m3") ? 1 : 0,
        UnitParser.parseWithNotes(code).notes().size(),
        code);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "Kg/s | 0 | 2 | did you mean kg?",
        "M3/h | 0 | 1 | did you mean m",
        "lpm | 0 | 3 | write L/min",
        "kg//s | 3 | 4 | side by side",
        "kg..s | 3 | 4 | side by side",
        "ton/h | 0 | 3 | [ston_av] (2000 lb)",
        "Nm3/h | 0 | 2 | reference state",
        "barg | 0 | 4 | gauge",
        "m3/hh | 3 | 5 | did you mean",
        "m3/ | 2 | 3 | expected a unit after",
        "m3/h) | 4 | 5 | closes nothing",
        "(m3/h | 0 | 1 | never closed",
        "m{abc | 1 | 2 | never closed",
        "[gal_us | 0 | 1 | never closed",
        "m3 / h | 2 | 3 | no blanks",
        "m**3 | 2 | 3 | m^3",
        "m^x | 1 | 2 | whole exponent",
        "m^0.5 | 0 | 5 | whole",
        "m2.5 | 0 | 4 | whole",
        "1.5.m | 0 | 3 | whole",
        "0.m | 0 | 1 | zero",
        "m99 | 1 | 3 | exponent",
        "m12345 | 1 | 5 | exponent",
        "(m/s)2 | 5 | 6 | '^'",
        "m3/€ | 3 | 4 | unexpected",
        "dB | 0 | 2 | logarithmic",
        "KWH | 0 | 3 | kWh",
        "mgal | 0 | 4 | did you mean gal"
      })
  void badCodeIsRefusedWithPlaceAndAdvice(String code, int start, int end, String words) {
    TextFault fault = fault(code);
    assertEquals(ProblemKind.UNIT, fault.kind());
    assertTrue(fault.getMessage().contains(words), fault.getMessage());
    assertEquals(start + ".." + end, fault.start() + ".." + fault.end(), fault.getMessage());
  }

  @Test
  void endlessCodeIsRefused() {
    assertEquals(ProblemKind.LIMIT_EXCEEDED, fault("m.".repeat(500) + "m").kind());
    assertEquals(ProblemKind.LIMIT_EXCEEDED, fault("(".repeat(30) + "m" + ")".repeat(30)).kind());
    assertEquals(ProblemKind.UNIT, fault("").kind());
    assertEquals(ProblemKind.UNIT, fault("Ym30.Ym30").kind());
    assertEquals(ProblemKind.UNIT, fault("((((m30)^30)^30)^30)^30").kind());
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "293.15 K)*2 | 7 | K",
        "5 m/s*x | 2 | m/s",
        "5 m/x | 2 | m",
        "5 m/(s.x) | 2 | m",
        "5 W/(m.K)+1 | 2 | W/(m.K)",
        "5 m - 3 m | 2 | m",
        "5 m/2^2 | 2 | m",
        "5 m^x | 2 | m",
        "5 m^2/x | 2 | m^2",
        "5 m^2^3 | 2 | m^2",
        "1.5e-3 1/(m.s) | 7 | 1/(m.s)",
        "5 m/s, 3 | 2 | m/s",
        "5 m<3 | 2 | m"
      })
  void unitInALongerTextEndsWhereItEnds(String text, int start, String code) throws TextFault {
    UnitPrefix prefix = UnitParser.parsePrefix(text, start);
    assertEquals(code, prefix.unit().code());
    assertEquals(start + code.length(), prefix.end());
  }

  @Test
  void textThatBeginsWithNoUnitIsAFaultAtItsPlace() {
    TextFault fault = assertThrows(TextFault.class, () -> UnitParser.parsePrefix("3 kgg", 2));
    assertEquals(2, fault.start());
    assertEquals(5, fault.end());
  }
}
