package org.hullsum.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.hullsum.audit.AuditResult;
import org.hullsum.audit.CaseResult;
import org.junit.jupiter.api.Test;

class JsonReportTest {
  private static String text(AuditResult result) throws IOException {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    JsonReport.write(result, out);
    return out.toString(StandardCharsets.UTF_8);
  }

  private static JsonNode read(AuditResult result) throws IOException {
    return new ObjectMapper().readTree(text(result));
  }

  private static JsonNode everything() throws IOException {
    return read(ExampleResults.of(ExampleResults.everything()));
  }

  private static List<String> keys(JsonNode object) {
    List<String> keys = new ArrayList<>();
    object.fieldNames().forEachRemaining(keys::add);
    return keys;
  }

  @Test
  void keysOfTheDocumentAndOfACaseStandInTheOrderOfTheContract() throws IOException {
    JsonNode document = everything();
    assertEquals(List.of("format", "verdict", "cases", "provenance"), keys(document));
    assertEquals("hullsum-result/1", document.get("format").asText());
    assertEquals(
        List.of(
            "case",
            "title",
            "verdict",
            "problems",
            "notes",
            "balances",
            "patches",
            "surfaces",
            "reconciliation",
            "findings",
            "fitByChance",
            "correctedCoverage",
            "explanations"),
        keys(document.get("cases").get(0)));
    assertEquals(
        List.of("program", "evaluator", "at", "settings", "inputs"),
        keys(document.get("provenance")));
    assertEquals(List.of("file", "sha256"), keys(document.at("/provenance/inputs/0")));
  }

  @Test
  void keysOfABalanceStandInTheOrderOfTheContract() throws IOException {
    JsonNode balance = everything().at("/cases/0/balances/2");
    assertEquals(
        List.of(
            "volume",
            "envelope",
            "quantity",
            "unit",
            "at",
            "over",
            "check",
            "outward",
            "interior",
            "residual",
            "terms",
            "throughput",
            "rule",
            "tolerance",
            "numericalError",
            "standardUncertainty",
            "coverageFactor",
            "detectable",
            "probabilityWrong",
            "budget",
            "closedBy",
            "divergence",
            "verdict",
            "reason"),
        keys(balance));
    List<String> term =
        List.of("kind", "value", "numericalError", "standardUncertainty", "route", "formula");
    assertEquals(term, keys(balance.get("terms").get(0)));
    assertEquals(term, keys(balance.get("divergence")));
    assertEquals(List.of("patch", "value"), keys(balance.get("closedBy")));
    assertEquals(
        List.of("source", "contribution", "share"),
        keys(everything().at("/cases/0/balances/1/budget/0")));
  }

  @Test
  void keysOfPatchesSurfacesFindingsAndExplanationsStandInTheOrderOfTheContract()
      throws IOException {
    JsonNode c = everything().at("/cases/0");
    assertEquals(
        List.of("name", "leaves", "enters", "area", "vectorArea", "fluxes", "traverses", "facing"),
        keys(c.at("/patches/0")));
    assertEquals(
        List.of(
            "quantity",
            "unit",
            "at",
            "value",
            "numericalError",
            "standardUncertainty",
            "evaluations",
            "basis"),
        keys(c.at("/patches/0/fluxes/0")));
    assertEquals(List.of("declared", "found", "reason"), keys(c.at("/patches/0/facing")));
    assertEquals(
        List.of(
            "volume",
            "closed",
            "reason",
            "shells",
            "closureVector",
            "enclosedVolume",
            "moments",
            "gaps"),
        keys(c.at("/surfaces/0")));
    assertEquals(
        List.of("between", "length", "centre", "area", "fluxThrough"),
        keys(c.at("/surfaces/1/gaps/0")));
    assertEquals(
        List.of(
            "code", "severity", "message", "on", "file", "line", "column", "waived", "evidence"),
        keys(c.at("/findings/0")));
    assertEquals(
        List.of(
            "kind",
            "balance",
            "on",
            "factor",
            "residualNow",
            "residualThen",
            "explained",
            "fits",
            "tiedWith",
            "message"),
        keys(c.at("/explanations/0")));
    assertEquals(List.of("code", "message", "file", "line", "column"), keys(c.at("/problems/0")));
  }

  @Test
  void everyKeyThatIsWrittenStandsInTheContractPage() throws IOException {
    String page = Files.readString(Path.of("docs", "results.md"));
    String document = page.substring(page.indexOf("```") + 3, page.lastIndexOf("```"));
    List<String> missing = new ArrayList<>();
    Matcher key = Pattern.compile("\"(\\w+)\" :").matcher(withoutEvidence());
    while (key.find()) {
      if (!document.contains("\"" + key.group(1) + "\"")) {
        missing.add(key.group(1));
      }
    }
    assertEquals(List.of(), missing);
  }

  private static String withoutEvidence() throws IOException {
    return Pattern.compile("\"evidence\" : \\{.*?\\}", Pattern.DOTALL)
        .matcher(text(ExampleResults.of(ExampleResults.everything())))
        .replaceAll("\"evidence\" : 0");
  }

  @Test
  void valuesReadBackToTheSameDoubles() throws IOException {
    JsonNode c = everything().at("/cases/0");
    assertEquals(160.8495438637974, c.at("/surfaces/0/enclosedVolume").asDouble());
    assertEquals(-1.1e-16, c.at("/balances/0/residual").asDouble());
    assertEquals(0.9999999994, c.at("/explanations/0/explained").asDouble());
    assertEquals(1, c.at("/explanations/0/tiedWith/0").asInt());
    assertEquals(60.0, c.at("/balances/2/over/1").asDouble());
    assertTrue(c.at("/balances/2/envelope").asBoolean());
  }

  @Test
  void shortestDigitsAreWrittenWhereTheOldPrinterNeedsOneMore() throws IOException {
    assertTrue(
        text(ExampleResults.of(ExampleResults.explained(2e23)))
            .contains("\"residualThen\" : 2.0E23,"));
  }

  @Test
  void whatDoesNotExistIsNull() throws IOException {
    JsonNode c = everything().at("/cases/0");
    assertTrue(c.at("/balances/2/outward").isNull());
    assertTrue(c.at("/balances/2/residual").isNull());
    assertTrue(c.at("/balances/0/at").isNull());
    assertTrue(c.at("/balances/0/closedBy").isNull());
    assertTrue(c.at("/surfaces/0/closed").isNull());
    assertFalse(c.at("/surfaces/1/closed").asBoolean(true));
    assertTrue(c.at("/surfaces/1/closureVector").isNull());
    assertTrue(c.at("/findings/0/waived").isNull());
    assertTrue(c.at("/reconciliation").isNull());
  }

  @Test
  void notANumberAndTheInfinitiesAreNull() throws IOException {
    assertTrue(everything().at("/cases/0/findings/0/evidence/rays/2").isNull());
    for (double value : new double[] {Double.NaN, Double.POSITIVE_INFINITY}) {
      JsonNode c = read(ExampleResults.of(ExampleResults.explained(value))).at("/cases/0");
      assertTrue(c.at("/explanations/0/residualThen").isNull(), "for " + value);
    }
  }

  @Test
  void evidenceKeepsItsKindsAndItsOrder() throws IOException {
    JsonNode evidence = everything().at("/cases/0/findings/0/evidence");
    assertEquals(List.of("flux", "normal", "points", "agreed", "volume", "rays"), keys(evidence));
    assertEquals(-1.0, evidence.at("/normal/2").asDouble());
    assertTrue(evidence.get("points").isInt());
    assertTrue(evidence.get("agreed").isBoolean());
    assertEquals("two", evidence.at("/rays/1").asText());
  }

  @Test
  void textWithQuotesControlsAndOtherScriptsReadsBack() throws IOException {
    String title = "Behälter \"Süd\" \\ \u0001\n\u2028 漢字 \uD83D\uDE00";
    CaseResult c =
        new CaseResult(
            "a\tb.yaml",
            Optional.of(title),
            Optional.empty(),
            "m",
            List.of(),
            List.of(),
            List.of(),
            List.of(),
            List.of(),
            List.of(),
            List.of(),
            Optional.empty(),
            Optional.empty());
    JsonNode document = read(ExampleResults.of(c));
    assertEquals(title, document.at("/cases/0/title").asText());
    assertEquals("a\tb.yaml", document.at("/cases/0/case").asText());
    assertTrue(document.get("verdict").isNull());
  }

  @Test
  void anUnreadableCaseHasItsProblemsAndEmptyLists() throws IOException {
    JsonNode document = read(ExampleResults.of(ExampleResults.unreadable()));
    JsonNode c = document.at("/cases/0");
    assertEquals("unknown-key", c.at("/problems/0/code").asText());
    assertEquals(12, c.at("/problems/1/column").asInt());
    assertTrue(c.get("verdict").isNull());
    assertEquals(0, c.get("balances").size());
    assertEquals(0, c.get("explanations").size());
  }

  @Test
  void aProblemOfAWholeFileHasNoLine() throws IOException {
    JsonNode c = read(ExampleResults.of(ExampleResults.missing())).at("/cases/0");
    assertEquals("none.yaml", c.at("/problems/0/file").asText());
    assertTrue(c.at("/problems/0/line").isNull());
    assertTrue(c.at("/problems/0/column").isNull());
  }

  @Test
  void theSameResultGivesTheSameBytesInAnyLocaleWithLineFeedsOnly() throws IOException {
    AuditResult result = ExampleResults.of(ExampleResults.everything(), ExampleResults.series(4));
    String here = text(result);
    Locale before = Locale.getDefault();
    Locale.setDefault(Locale.forLanguageTag("ar-EG-u-nu-arab"));
    try {
      assertEquals(here, text(result));
    } finally {
      Locale.setDefault(before);
    }
    assertFalse(here.contains("\r"));
    assertTrue(here.endsWith("}\n"));
    assertNull(new ObjectMapper().readTree(here).get("label"));
  }
}
