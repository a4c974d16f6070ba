package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Map;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FacingRewriterTest {
  private static FacingRewriter.Turned turn(String text, String... patches) {
    return FacingRewriter.turn(text, "case.yaml", Set.of(patches));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "facing: reversed     # as exported | facing: as-drawn     # as exported",
        "facing: as-drawn | facing: reversed",
        "facing: \"upward\" | facing: downward",
        "facing: downward | facing: upward",
        "facing: {along: [0, -1, 2.5]} | facing: {along: [0, 1, -2.5]}",
        "facing: {along: ['a + b', -c, 0.0]} | facing: {along: ['-(a + b)', c, 0.0]}"
      })
  void writtenFacingIsTurnedAndNothingElse(String before, String after) {
    String text =
        "# facing: reversed\npatches:\n  lid:\n    surface: {}\n    "
            + before
            + "\n  bed: {facing: reversed, surface: {}}\n";
    FacingRewriter.Turned turned = turn(text, "lid");
    assertEquals(text.replace(before, after), turned.text());
    assertEquals(Map.of(), turned.refused());
  }

  @Test
  void missingFacingIsWrittenBeforeTheSurfaceInTheStyleOfThePatch() {
    String text =
        "\uFEFFpatches:\r\n  lid:\r\n    leaves: tank\r\n    surface:  # ü\r\n      disk: {}\r\n"
            + "  bed: {leaves: tank, surface: {disk: {}}}";
    assertEquals(
        text.replace("    surface:  # ü", "    facing: reversed\r\n    surface:  # ü")
            .replace("tank, surface", "tank, facing: reversed, surface"),
        turn(text, "lid", "bed").text());
  }

  @Test
  void whatCantBeTurnedIsRefusedWithItsReasonAndLeft() {
    String text =
        """
        patches:
          a: &p {surface: {}}
          b: *p
          c:
            surface: {}
            facing: {away-from: [0, 0, 0]}
        """;
    FacingRewriter.Turned turned = turn(text, "a", "b", "c");
    assertEquals(text, turned.text());
    assertTrue(turned.refused().get("a").contains("`b` is the same text by an alias"));
    assertTrue(turned.refused().get("c").contains("`away-from` has no opposite"));
  }
}
