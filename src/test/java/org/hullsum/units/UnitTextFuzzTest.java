package org.hullsum.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Optional;
import java.util.Random;
import org.hullsum.problem.TextFault;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Random texts, made of the pieces of real ones: read, or refused with a place in the text. */
class UnitTextFuzzTest {
  private static final int TEXTS = 8_000;
  private static final String[] PIECES = {
    "m",
    "3",
    "/",
    "h",
    ".",
    "*",
    "^",
    "-",
    "+",
    "(",
    ")",
    "{",
    "}",
    "[",
    "]",
    "10*",
    "10^",
    "kg",
    "degC",
    "[degF]",
    "gal_us",
    "%",
    "ppm",
    "²",
    "⁻",
    "¹",
    "·",
    " ",
    "\t",
    "\u00a0",
    "±",
    "+/-",
    "k=2",
    "95 %",
    "9 dof",
    "limits",
    ",",
    "of",
    "value",
    "absolute",
    "0",
    "1",
    "4.2",
    "1e",
    "E9",
    "e-400",
    "H2O",
    "µ",
    "Ω",
    "°",
    "'",
    "\"",
    "\0",
    "\uD83D\uDE00",
    "\uD83D",
    "é",
    "999999",
    "_",
    "x",
    "inf",
    "NaN",
    "rpm",
    "m3/h",
    "K",
    "60",
    "Ym30"
  };

  private interface Parser {
    void parse(String text) throws TextFault;
  }

  private static String randomText(Random random) {
    StringBuilder text = new StringBuilder();
    int count = 1 + random.nextInt(12);
    for (int i = 0; i < count; i++) {
      text.append(PIECES[random.nextInt(PIECES.length)]);
    }
    return text.toString();
  }

  /** Whether it was read; any exception but a fault with a place in the text fails the test. */
  private static boolean reads(Parser parser, String text) {
    try {
      parser.parse(text);
      return true;
    } catch (TextFault fault) {
      assertTrue(fault.end() <= text.length(), () -> fault.getMessage() + " in: " + text);
      assertFalse(fault.getMessage().isBlank());
      return false;
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3})
  void randomTextIsReadOrRefusedWithAPlaceInIt(long seed) {
    Random random = new Random(seed);
    MeasuredQuantityParser measured =
        MeasuredQuantityParser.of(
            Optional.of(new UncertaintyMeaning.CoverageFactor(2)), WorkingUnits.SI);
    int read = 0;
    for (int i = 0; i < TEXTS; i++) {
      String text = randomText(random);
      read += reads(UnitParser::parse, text) ? 1 : 0;
      reads(whole -> UnitParser.parsePrefix(whole, whole.length() / 2), text);
      reads(QuantityParser::parse, text);
      reads(UncertaintyMeaning::parse, text);
      reads(QuantityParser::parse, "4.2 " + text);
      reads(measured::parse, "4.2 m3/h " + text);
      reads(measured::parse, "4.2 m3/h ± 0.1 " + text);
      reads(measured::parse, "4.2 % ± 1 % (" + text);
    }
    assertTrue(read > TEXTS / 100, "only " + read + " random texts were units; seed " + seed);
  }

  @ParameterizedTest
  @ValueSource(longs = {4, 5})
  void unitReadWholeIsReadTheSameAtTheStartOfALongerText(long seed) throws TextFault {
    Random random = new Random(seed);
    int compared = 0;
    for (int i = 0; i < TEXTS; i++) {
      String text = randomText(random);
      boolean differs = text.startsWith("/") || text.contains("*") || text.matches(".*[./·]\\d.*");
      if (!differs && reads(UnitParser::parse, text)) {
        UnitPrefix prefix = UnitParser.parsePrefix("2 " + text + " + x", 2);
        assertEquals(UnitParser.parse(text), prefix.unit(), text);
        assertEquals(2 + text.length(), prefix.end(), text);
        compared++;
      }
    }
    assertTrue(compared > TEXTS / 100, "only " + compared + " compared; seed " + seed);
  }
}
