package org.hullsum.report;

import java.io.IOException;
import java.io.OutputStream;
import java.util.Map;
import org.hullsum.audit.AuditResult;
import org.hullsum.audit.CaseResult;
import org.hullsum.audit.Verdict;
import org.hullsum.model.Case;
import org.hullsum.problem.Finding;
import org.hullsum.problem.Place;
import org.hullsum.problem.Problem;

/**
 * The result document {@code hullsum-result/1} of {@code docs/results.md}.
 *
 * <p>Keys stand in the order of that page. Numbers are written in the shortest form that reads back
 * to the same double; what does not exist, NaN and the infinities included, is {@code null}. The
 * same result gives the same bytes. UTF-8, lines end in a line feed. Thread-safe; O(size of the
 * document).
 */
public final class JsonReport {
  private JsonReport() {}

  /**
   * Writes the document.
   *
   * @param out receives UTF-8; is flushed, not closed
   * @throws IOException if {@code out} can't be written
   */
  public static void write(AuditResult result, OutputStream out) throws IOException {
    try (JsonDocument json = JsonDocument.to(out)) {
      json.beginObject();
      json.text("format", "hullsum-result/1");
      json.optionalText("verdict", result.verdict().map(Verdict::word));
      json.beginArray("cases");
      for (CaseResult c : result.cases()) {
        writeCase(json, c);
      }
      json.endArray();
      writeProvenance(json, result.provenance());
      json.endObject();
    }
  }

  private static void writeCase(JsonDocument json, CaseResult c) throws IOException {
    json.beginObject();
    json.text("case", c.file());
    json.optionalText("title", c.title());
    json.optionalText("verdict", c.verdict().map(Verdict::word));
    json.beginArray("problems");
    for (Problem problem : c.problems()) {
      writeProblem(json, problem);
    }
    json.endArray();
    json.texts("notes", c.notes());
    JsonFigures.writeBalances(json, c.balances());
    JsonFigures.writePatches(json, c.patches());
    JsonFigures.writeSurfaces(json, c.surfaces());
    json.absent("reconciliation");
    json.beginArray("findings");
    for (Finding finding : c.findings()) {
      writeFinding(json, finding);
    }
    json.endArray();
    json.optionalNumber("fitByChance", c.fitByChance());
    json.optionalNumber("correctedCoverage", c.correctedCoverage());
    JsonFigures.writeExplanations(json, c.explanations());
    json.endObject();
  }

  private static void writeProblem(JsonDocument json, Problem problem) throws IOException {
    json.beginObject();
    json.text("code", problem.kind().code());
    json.text("message", problem.message());
    writePlace(json, problem.place());
    json.endObject();
  }

  private static void writeFinding(JsonDocument json, Finding finding) throws IOException {
    json.beginObject();
    json.text("code", finding.code().code());
    json.text("severity", finding.severity().word());
    json.text("message", finding.message());
    json.optionalText("on", finding.on());
    if (finding.place().isPresent()) {
      writePlace(json, finding.place().get());
    } else {
      json.absent("file");
      json.absent("line");
      json.absent("column");
    }
    json.optionalText("waived", finding.waived());
    json.evidence("evidence", finding.evidence());
    json.endObject();
  }

  /** A place that is the whole file has neither line nor column. */
  private static void writePlace(JsonDocument json, Place place) throws IOException {
    json.text("file", place.file());
    if (place.line() == 0) {
      json.absent("line");
      json.absent("column");
    } else {
      json.count("line", place.line());
      json.count("column", place.column());
    }
  }

  private static void writeProvenance(JsonDocument json, AuditResult.Provenance provenance)
      throws IOException {
    json.beginObject("provenance");
    json.text("program", provenance.program());
    json.text("evaluator", provenance.evaluator());
    json.text("at", provenance.at());
    json.beginObject("settings");
    for (Map.Entry<String, String> setting : provenance.settings().entrySet()) {
      json.text(setting.getKey(), setting.getValue());
    }
    json.endObject();
    json.beginArray("inputs");
    for (Case.SourceFile input : provenance.inputs()) {
      json.beginObject();
      json.text("file", input.file());
      json.text("sha256", input.sha256());
      json.endObject();
    }
    json.endArray();
    json.endObject();
  }
}
