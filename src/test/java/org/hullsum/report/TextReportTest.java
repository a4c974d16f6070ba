package org.hullsum.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.hullsum.audit.CaseResult;
import org.hullsum.audit.Verdict;
import org.junit.jupiter.api.Test;

class TextReportTest {
  private static String golden(String name) throws IOException {
    try (InputStream in = TextReportTest.class.getResourceAsStream(name)) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    }
  }

  @Test
  void everyPartOfACaseReadsAsOnTheGoldenPage() throws IOException {
    assertEquals(
        golden("everything.txt"),
        TextReport.of(ExampleResults.of(ExampleResults.everything(), ExampleResults.unreadable())));
  }

  @Test
  void theShortFormIsALineForEachBalanceAndEachError() throws IOException {
    assertEquals(
        golden("everything-brief.txt"),
        TextReport.brief(ExampleResults.everything())
            + TextReport.brief(ExampleResults.unreadable()));
  }

  @Test
  void aLongSeriesShowsItsEndsAndWhatIsNotBalanced() {
    String text = TextReport.of(ExampleResults.series(121));
    assertTrue(text.contains("at 121 instants"), text);
    assertTrue(text.contains("110 instants left out here, 110 of them balanced"), text);
    assertEquals(1, text.lines().filter(l -> l.endsWith(" IMBALANCED")).count(), text);
    assertTrue(text.lines().anyMatch(l -> l.startsWith("     30 ")), text);
  }

  @Test
  void aFewInstantsStandInFull() {
    String text = TextReport.of(ExampleResults.series(3));
    assertEquals(3, text.lines().filter(l -> l.startsWith("Volume sump: ")).count());
    assertTrue(text.contains(", at 0.5 s\n"), text);
  }

  @Test
  void anUnreadableCaseSaysHowManyProblemsItHas() {
    String text = TextReport.of(ExampleResults.unreadable());
    assertTrue(text.contains("NOT AUDITED: 2 problems in the files"), text);
  }

  @Test
  void runningTextKeepsWithinAHundredColumns() {
    String text = TextReport.of(ExampleResults.of(ExampleResults.everything()));
    List<String> wide = text.lines().filter(l -> l.length() > PageBuilder.WIDTH).toList();
    assertEquals(List.of(), wide);
  }

  @Test
  void controlCharactersOfACaseNeverReachTheTerminal() {
    CaseResult c =
        new CaseResult(
            "evil\u001B[2J.yaml",
            Optional.of("title \u001B]0;owned\u0007 \u009B31m"),
            Optional.empty(),
            "m",
            List.of(),
            List.of(),
            List.of(ExampleResults.metered(Optional.empty(), 0, Verdict.BALANCED)),
            List.of(),
            List.of(),
            List.of(),
            List.of(),
            Optional.empty(),
            Optional.empty());
    String text = TextReport.of(ExampleResults.of(c)) + TextReport.brief(c);
    assertFalse(text.codePoints().anyMatch(p -> p != '\n' && Character.isISOControl(p)), text);
  }

  @Test
  void textIsTheSameInAnyLocale() {
    String here = TextReport.of(ExampleResults.of(ExampleResults.everything()));
    Locale before = Locale.getDefault();
    Locale.setDefault(Locale.forLanguageTag("tr-TR"));
    try {
      assertEquals(here, TextReport.of(ExampleResults.of(ExampleResults.everything())));
    } finally {
      Locale.setDefault(before);
    }
  }
}
