package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.hullsum.audit.PatchResult.FoundFacing;
import org.hullsum.casefile.CaseReader;
import org.hullsum.casefile.ReadOptions;
import org.hullsum.mesh.Meshes;
import org.hullsum.model.Case;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Severity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
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

  /** A ball of triangles, those from number to number turned. */
  private static Case ball(Path folder, int from, int to) throws IOException {
    StringBuilder stl = new StringBuilder("solid ball\n");
    Vector3[][] triangles = Meshes.icosphere(3);
    for (int n = 0; n < triangles.length; n++) {
      Vector3[] t = triangles[n];
      boolean turn = n >= from && n < to;
      stl.append("facet normal 0 0 0\nouter loop\n");
      for (int k : turn ? new int[] {0, 2, 1} : new int[] {0, 1, 2}) {
        stl.append("vertex " + t[k].x() + " " + t[k].y() + " " + t[k].z() + "\n");
      }
      stl.append("endloop\nendfacet\n");
    }
    Files.writeString(folder.resolve("ball.stl"), stl + "endsolid ball\n");
    Path file = folder.resolve("case.yaml");
    Files.writeString(
        file,
        """
        format: hullsum-case/1
        quantity: volume
        fields: {flow: {vector: ["(1 1/s)*x", "0", "0"], unit: m/s}}
        volumes: {ball: {}}
        patches:
          skin:
            leaves: ball
            surface: {mesh: {file: ball.stl, unit: m}}
            flux: {field: flow}
        """);
    return CaseReader.read(file, ReadOptions.named("case.yaml")).found().orElseThrow();
  }

  @Test
  void turnedTrianglesThatLinesDoNotSeeAreAgainstTheWindingNumbers(@TempDir Path folder)
      throws IOException {
    CaseResult result = asked(ball(folder, 750, 1080), 1);
    Finding finding =
        Audits.finding(result, FindingCode.SECOND_OPINION_DIFFERS, "ball").orElseThrow();
    assertEquals(Severity.WARNING, finding.severity());
    assertEquals("skin", finding.evidence().get("worst"));
    assertTrue((double) finding.evidence().get("inside") < 0.75, finding.message());
    assertEquals(
        Optional.empty(),
        Audits.finding(asked(ball(folder, 0, 0), 1), FindingCode.SECOND_OPINION_DIFFERS, "ball"));
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
