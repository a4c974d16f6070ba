package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.hullsum.audit.PatchResult.FoundFacing;
import org.hullsum.closure.FoundFacing.Side;
import org.hullsum.closure.WindingOpinion;
import org.hullsum.closure.WindingOpinion.Numbers;
import org.hullsum.closure.WindingOpinion.Vote;
import org.hullsum.flux.InputSensitivity;
import org.hullsum.model.Case;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Severity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class SecondOpinionAuditTest {
  private static CaseResult asked(Case audited, int threads) {
    return Auditor.audit(
        audited, new AuditOptions(8, threads, Audits.TODAY, ProgressListener.SILENT, true));
  }

  static List<String> shippedCases() throws IOException {
    try (Stream<Path> files = Files.list(Path.of("cases"))) {
      return files
          .map(f -> f.getFileName().toString())
          .filter(f -> f.endsWith(".yaml"))
          .map(f -> f.substring(0, f.length() - 5))
          .sorted()
          .toList();
    }
  }

  @ParameterizedTest
  @MethodSource("shippedCases")
  void shippedCasesHaveNothingThatWindingNumbersContradict(String name) {
    Case shipped = Audits.shipped(name);
    CaseResult without = Audits.audit(shipped);
    CaseResult with = asked(shipped, 2);
    assertEquals(
        without.findings().stream().map(Finding::message).toList(),
        with.findings().stream().map(Finding::message).toList());
    assertEquals(without.patches(), with.patches());
    assertEquals(without.balances(), with.balances());
  }

  /** A cube of side 2 of plates that meet nowhere, one of them declared the wrong way round. */
  private static String plates(double half, String reversed) {
    StringBuilder patches = new StringBuilder();
    String[] axes = {"x", "y", "z"};
    for (int axis = 0; axis < 3; axis++) {
      for (int side : new int[] {-1, 1}) {
        double[] corner = {-half, -half, -half};
        corner[axis] = side;
        double[] first = new double[3];
        double[] second = new double[3];
        first[(axis + (side > 0 ? 1 : 2)) % 3] = 2 * half;
        second[(axis + (side > 0 ? 2 : 1)) % 3] = 2 * half;
        String name = (side > 0 ? "high-" : "low-") + axes[axis];
        patches
            .append("  ")
            .append(name)
            .append(":\n    leaves: cube\n    surface: {rectangle: {corner: ")
            .append(text(corner))
            .append(", edges: [")
            .append(text(first))
            .append(", ")
            .append(text(second))
            .append("]}}\n")
            .append(name.equals(reversed) ? "    facing: reversed\n" : "")
            .append("    flux: {field: flow}\n");
      }
    }
    return """
        format: hullsum-case/1
        units: none
        fields: {flow: {vector: ["x", "y", "z"]}}
        volumes: {cube: {interior: {divergence-of: flow}}}
        patches:
        """
        + patches;
  }

  private static String text(double[] v) {
    return "[" + v[0] + ", " + v[1] + ", " + v[2] + "]";
  }

  @Test
  void facingsBesideGapsRestOnWindingNumbersAloneAndServeNoInterior() {
    CaseResult result = Audits.audit(plates(0.9, "high-y"));
    List<String> alone = new ArrayList<>();
    for (PatchResult patch : result.patches()) {
      boolean reversed = patch.name().equals("high-y");
      assertEquals(
          Optional.of(reversed ? FoundFacing.INWARD : FoundFacing.OUTWARD),
          patch.foundFacing(),
          patch.toString());
      patch
          .facingReason()
          .filter(r -> r.startsWith("rests on winding numbers alone"))
          .ifPresent(r -> alone.add(patch.name()));
    }
    assertTrue(alone.contains("high-y"), alone.toString());
    Finding finding =
        Audits.finding(result, FindingCode.ORIENTATION_REVERSED, "high-y").orElseThrow();
    assertEquals(Severity.WARNING, finding.severity());
    assertTrue(finding.message().contains("winding numbers alone"), finding.message());
    assertEquals("winding-numbers", finding.evidence().get("by"));
    assertEquals(
        1,
        result.findings().stream()
            .filter(f -> f.code() == FindingCode.ORIENTATION_REVERSED)
            .count());
    assertEquals(Optional.empty(), result.surfaces().get(0).enclosedVolume());
    assertEquals(Optional.empty(), Audits.only(result).interior());
  }

  @Test
  void numbersAndVotesAgainstTheFacingsAreToldWithTheirFigures() {
    Case audited = Audits.text(new BoxCase().yaml());
    InputSensitivity inputs = InputSensitivity.of(audited.inputs());
    PatchIntegration integration =
        new PatchIntegration(inputs, List.of(OptionalDouble.empty()), AuditOptions.USUAL_DIGITS);
    List<PatchAudit> patches = audited.patches().stream().map(integration::integrate).toList();
    SurfaceInspection inspection = new SurfaceInspection(patches, inputs.values());
    SurfaceAudit surface =
        inspection
            .judge(new LineInspection(audited).look().stream().map(inspection::sew).toList())
            .get(0);
    List<Vote> votes = new ArrayList<>();
    for (int k = 0; k < patches.size(); k++) {
      votes.add(new Vote(k == 2 ? Side.IN : Side.OUT, 0.1, 0.9));
    }
    WindingOpinion opinion =
        new WindingOpinion(
            Optional.of(
                List.of(
                    new Numbers(1, 0.7, 0, 1e-6),
                    new Numbers(2, 0.5, 0.1, 1e-6),
                    new Numbers(3, 1, 0, 1e-6))),
            votes);
    Finding finding = SecondOpinionFindings.of(surface, Map.of("box", opinion)).orElseThrow();
    assertEquals(FindingCode.SECOND_OPINION_DIFFERS, finding.code());
    assertEquals(Severity.WARNING, finding.severity());
    assertEquals(
        "winding numbers disagree with the facings that seams and lines found in `box`: beside"
            + " `front` the surface winds 0.50 times round a point inside and 0.10 times round one"
            + " outside, where 1 and 0 belong (and not as it should beside `right`); with `front`"
            + " the other way round they would fit",
        finding.message());
    assertEquals(0.5, finding.evidence().get("inside"));
    assertEquals(List.of("front"), finding.evidence().get("turned"));
    assertEquals(Optional.empty(), SecondOpinionFindings.of(surface, Map.of()));
  }

  @Test
  void theOpinionIsTheSameOnAnyNumberOfThreads() {
    Case audited = Audits.text(plates(0.9, "low-z"));
    CaseResult one = asked(audited, 1);
    CaseResult three = asked(audited, 3);
    assertEquals(one.patches(), three.patches());
    assertEquals(
        one.findings().stream().map(Finding::message).toList(),
        three.findings().stream().map(Finding::message).toList());
  }
}
