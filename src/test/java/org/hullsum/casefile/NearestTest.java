package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class NearestTest {
  @ParameterizedTest
  @CsvSource({
    "flux, flux, 0",
    "flx, flux, 1",
    "fluxx, flux, 1",
    "flax, flux, 1",
    "fulx, flux, 1",
    "kitten, sitting, 3",
    "ca, abc, 3",
    "'', abc, 3"
  })
  void distanceCountsLettersPutInLeftOutChangedAndSwapped(String a, String b, int expected) {
    assertEquals(expected, Nearest.distance(a, b));
    assertEquals(expected, Nearest.distance(b, a));
  }

  @Test
  void nearestIsNamedOnlyWhereItIsNear() {
    List<String> known = List.of("leaves", "enters", "surface", "facing", "flux");

    assertEquals(Optional.of("surface"), Nearest.to("Surfaec", known));
    assertEquals(Optional.of("enters"), Nearest.to("enter", known));
    assertEquals(Optional.empty(), Nearest.to("quantity", known));
    assertEquals(Optional.empty(), Nearest.to("x".repeat(1000), known));
  }
}
