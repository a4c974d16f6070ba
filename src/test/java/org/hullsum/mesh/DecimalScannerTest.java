package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.charset.StandardCharsets;
import java.util.Locale;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class DecimalScannerTest {
  private final DecimalScanner scanner = new DecimalScanner();

  private double scan(String text) {
    byte[] bytes = ("  " + text).getBytes(StandardCharsets.ISO_8859_1);
    return scanner.scan(bytes, 2, bytes.length);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "0",
        "-0",
        "1",
        "+1.5",
        "1.",
        ".5",
        "-.5e3",
        "1e22",
        "1e23",
        "123456789012345678",
        "9007199254740993",
        "9007199254740992",
        "0.1",
        "1e-22",
        "1e-23",
        "4.9e-324",
        "2e-324",
        "1.7976931348623157e308",
        "1e400",
        "-1e400",
        "1e-99999999999999",
        "0e99999999999999",
        "2.2250738585072011e-308",
        "922337203685477580799",
        "0.00000000000000000000000000000001",
        "100000000000000000000000000000000000000e-38"
      })
  void numberIsTheNearestDouble(String text) {
    assertEquals(Double.parseDouble(text), scan(text));
    assertEquals(text.length() + 2, scanner.end());
  }

  @Test
  void randomNumbersAreTheNearestDouble() {
    SplittableRandom random = new SplittableRandom(17);
    for (int k = 0; k < 50_000; k++) {
      double value = Double.longBitsToDouble(random.nextLong());
      if (Double.isFinite(value)) {
        int digits = random.nextInt(20);
        for (String text :
            new String[] {
              Double.toString(value),
              String.format(Locale.ROOT, "%." + digits + "e", value),
              Float.toString((float) random.nextDouble(-1e3, 1e3))
            }) {
          assertEquals(Double.parseDouble(text), scan(text), text);
        }
      }
    }
  }

  @ParameterizedTest
  @CsvSource({"1e,1", "1e+,1", "1x,1", "1.5.2,3", "-,0", "'',0", ".,0", "e5,0", "nan,0", "--1,0"})
  void scanningEndsWhereTheNumberEnds(String text, int length) {
    scan(text);
    assertEquals(length + 2, scanner.end());
  }
}
