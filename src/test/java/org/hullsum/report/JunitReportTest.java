package org.hullsum.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import javax.xml.parsers.DocumentBuilderFactory;
import org.hullsum.audit.AuditResult;
import org.hullsum.audit.CaseResult;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;

class JunitReportTest {
  private static Document parse(AuditResult result) throws Exception {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    JunitReport.write(result, out);
    return DocumentBuilderFactory.newInstance()
        .newDocumentBuilder()
        .parse(new ByteArrayInputStream(out.toByteArray()));
  }

  private static List<Element> elements(Document document, String name) {
    NodeList nodes = document.getElementsByTagName(name);
    List<Element> elements = new ArrayList<>();
    for (int i = 0; i < nodes.getLength(); i++) {
      elements.add((Element) nodes.item(i));
    }
    return elements;
  }

  @Test
  void everyBalanceAndEveryErrorIsATestCaseOfItsCase() throws Exception {
    Document document =
        parse(ExampleResults.of(ExampleResults.everything(), ExampleResults.unreadable()));
    List<Element> suites = elements(document, "testsuite");
    assertEquals(2, suites.size());
    Element suite = suites.get(0);
    assertEquals("basin.yaml", suite.getAttribute("name"));
    assertEquals("4", suite.getAttribute("tests"));
    assertEquals("3", suite.getAttribute("failures"));
    assertEquals("0", suite.getAttribute("errors"));
    assertEquals("0", suite.getAttribute("skipped"));
    assertEquals(4, suite.getElementsByTagName("testcase").getLength());
  }

  @Test
  void imbalancedUndecidedAndErrorsAreFailuresOfTheirTypeAndAWaivedOneIsNone() throws Exception {
    Document document = parse(ExampleResults.of(ExampleResults.everything()));
    assertEquals(
        List.of("imbalanced", "undecided", "orientation-reversed"),
        elements(document, "failure").stream().map(e -> e.getAttribute("type")).toList());
    assertTrue(
        elements(document, "failure").get(2).getTextContent().startsWith("basin.yaml:21:3: "));
  }

  @Test
  void anUnreadableCaseIsAnErrorWithAllItsProblems() throws Exception {
    Document document = parse(ExampleResults.of(ExampleResults.unreadable()));
    Element error = elements(document, "error").get(0);
    assertEquals("unknown-key", error.getAttribute("type"));
    assertTrue(error.getTextContent().contains("bad.yaml:9:12: 'm3/hh' is not a unit"));
    assertEquals("1", elements(document, "testsuite").get(0).getAttribute("errors"));
  }

  @Test
  void aCaseWithNothingToJudgeIsOneTestCaseThatPasses() throws Exception {
    Document document = parse(ExampleResults.of(bare("only <fluxes> & more", List.of())));
    assertEquals(1, elements(document, "testcase").size());
    assertEquals(
        "only <fluxes> & more", elements(document, "testsuite").get(0).getAttribute("name"));
    assertEquals(0, elements(document, "failure").size());
  }

  @Test
  void charactersThatXmlForbidsAreReplaced() throws Exception {
    Finding finding =
        Finding.of(
            FindingCode.FIELD_SINGULAR,
            "bell \u0007, escape \u001B, lone \uD800, fine \uD83D\uDE00",
            "a\u0000b",
            Optional.empty(),
            Map.of());
    Document document = parse(ExampleResults.of(bare("case", List.of(finding))));
    assertEquals(
        "bell \uFFFD, escape \uFFFD, lone \uFFFD, fine \uD83D\uDE00",
        elements(document, "failure").get(0).getTextContent());
  }

  private static CaseResult bare(String file, List<Finding> findings) {
    return new CaseResult(
        file,
        Optional.empty(),
        Optional.empty(),
        "m",
        List.of(),
        List.of(),
        List.of(),
        List.of(),
        List.of(),
        findings,
        List.of(),
        Optional.empty(),
        Optional.empty());
  }
}
