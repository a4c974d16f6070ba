package org.hullsum.report;

import java.io.IOException;
import java.io.OutputStream;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import javax.xml.stream.XMLOutputFactory;
import javax.xml.stream.XMLStreamException;
import javax.xml.stream.XMLStreamWriter;
import org.hullsum.audit.AuditResult;
import org.hullsum.audit.BalanceResult;
import org.hullsum.audit.CaseResult;
import org.hullsum.audit.Verdict;
import org.hullsum.problem.Finding;
import org.hullsum.problem.Place;
import org.hullsum.problem.Problem;
import org.hullsum.problem.Severity;

/**
 * Verdicts in the XML that build servers read as test results: one suite per case, one test case
 * per balance and per error, nothing skipped.
 *
 * <p>Imbalanced and undecided are failures of that type, a finding that is an error and not waived
 * is one of the type of its code, and a case that could not be read is an error. Characters that
 * XML 1.0 does not allow are replaced. UTF-8; thread-safe; O(size of the document).
 */
public final class JunitReport {
  /** The test case of a case that could not be read, or that has nothing to judge. */
  private static final String READABLE = "case can be read";

  private static final int REPLACEMENT = 0xFFFD;

  /** How one test case ended: the element's name, its type, and a message. */
  private record Outcome(String element, String type, String message) {}

  private record TestCase(String name, Optional<Outcome> outcome) {}

  private JunitReport() {}

  /**
   * Writes the document.
   *
   * @param out receives UTF-8; is flushed, not closed
   * @throws IOException if {@code out} can't be written
   */
  public static void write(AuditResult result, OutputStream out) throws IOException {
    try {
      XMLStreamWriter xml =
          XMLOutputFactory.newDefaultFactory().createXMLStreamWriter(out, "UTF-8");
      xml.writeStartDocument("UTF-8", "1.0");
      xml.writeCharacters("\n");
      xml.writeStartElement("testsuites");
      for (CaseResult c : result.cases()) {
        writeSuite(xml, c);
      }
      xml.writeCharacters("\n");
      xml.writeEndElement();
      xml.writeCharacters("\n");
      xml.writeEndDocument();
      xml.flush();
    } catch (XMLStreamException e) {
      throw new IOException(e.getMessage(), e);
    }
    out.flush();
  }

  private static void writeSuite(XMLStreamWriter xml, CaseResult c) throws XMLStreamException {
    List<TestCase> tests = tests(c);
    xml.writeCharacters("\n  ");
    xml.writeStartElement("testsuite");
    attribute(xml, "name", c.file());
    attribute(xml, "tests", Integer.toString(tests.size()));
    attribute(xml, "failures", Long.toString(count(tests, "failure")));
    attribute(xml, "errors", Long.toString(count(tests, "error")));
    attribute(xml, "skipped", "0");
    for (TestCase test : tests) {
      writeTest(xml, c, test);
    }
    xml.writeCharacters("\n  ");
    xml.writeEndElement();
  }

  private static void writeTest(XMLStreamWriter xml, CaseResult c, TestCase test)
      throws XMLStreamException {
    xml.writeCharacters("\n    ");
    xml.writeStartElement("testcase");
    attribute(xml, "classname", c.file());
    attribute(xml, "name", test.name());
    attribute(xml, "time", "0");
    if (test.outcome().isPresent()) {
      Outcome outcome = test.outcome().get();
      xml.writeCharacters("\n      ");
      xml.writeStartElement(outcome.element());
      attribute(xml, "type", outcome.type());
      attribute(xml, "message", outcome.message().lines().findFirst().orElse(""));
      xml.writeCharacters(allowed(outcome.message()));
      xml.writeEndElement();
      xml.writeCharacters("\n    ");
    }
    xml.writeEndElement();
  }

  private static void attribute(XMLStreamWriter xml, String name, String value)
      throws XMLStreamException {
    xml.writeAttribute(name, allowed(value));
  }

  private static long count(List<TestCase> tests, String element) {
    return tests.stream()
        .flatMap(t -> t.outcome().stream())
        .filter(o -> o.element().equals(element))
        .count();
  }

  private static List<TestCase> tests(CaseResult c) {
    if (c.isUnreadable()) {
      List<Problem> fatal = c.problems().stream().filter(p -> p.kind().fatal()).toList();
      String all = fatal.stream().map(Problem::toString).collect(Collectors.joining("\n"));
      return List.of(
          new TestCase(
              READABLE, Optional.of(new Outcome("error", fatal.get(0).kind().code(), all))));
    }
    List<TestCase> tests = new ArrayList<>();
    c.balances().forEach(b -> tests.add(new TestCase(name(b), outcome(b))));
    c.findings().stream()
        .filter(f -> f.severity() == Severity.ERROR && f.waived().isEmpty())
        .forEach(f -> tests.add(new TestCase(name(f), Optional.of(outcome(f)))));
    return tests.isEmpty() ? List.of(new TestCase(READABLE, Optional.empty())) : tests;
  }

  private static String name(BalanceResult balance) {
    return (balance.envelope() ? "envelope " : "volume ")
        + balance.volume()
        + " conserves "
        + balance.quantity()
        + BalanceText.when(balance);
  }

  private static Optional<Outcome> outcome(BalanceResult balance) {
    return balance.verdict() == Verdict.BALANCED
        ? Optional.empty()
        : Optional.of(
            new Outcome(
                "failure",
                balance.verdict().word(),
                balance
                        .residual()
                        .map(r -> "residual " + Figures.quoted(r, balance.unit()) + ": ")
                        .orElse("no residual: ")
                    + balance.reason()));
  }

  private static String name(Finding finding) {
    return "no " + finding.code().code() + finding.on().map(o -> " on " + o).orElse("");
  }

  private static Outcome outcome(Finding finding) {
    return new Outcome(
        "failure",
        finding.code().code(),
        finding.place().map(Place::toString).map(p -> p + ": ").orElse("") + finding.message());
  }

  /** The text with what XML 1.0 does not allow (section 2.2, production 2) replaced. */
  private static String allowed(String text) {
    StringBuilder out = new StringBuilder(text.length());
    text.codePoints().forEach(c -> out.appendCodePoint(isAllowed(c) ? c : REPLACEMENT));
    return out.toString();
  }

  private static boolean isAllowed(int c) {
    return c == '\t'
        || c == '\n'
        || c == '\r'
        || (c >= 0x20 && c <= 0xD7FF)
        || (c >= 0xE000 && c <= 0xFFFD)
        || c >= 0x10000;
  }
}
