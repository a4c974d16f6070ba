package org.hullsum.audit;

import static org.hullsum.problem.FindingCode.MESH_CRACKED;
import static org.hullsum.problem.FindingCode.SURFACE_OPEN;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.hullsum.casefile.CaseReader;
import org.hullsum.casefile.ReadOptions;
import org.hullsum.mesh.Meshes;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class WeldSuggestionTest {
  @TempDir Path folder;

  private CaseResult audit(Vector3[][] triangles, String weld) throws IOException {
    StringBuilder obj = new StringBuilder();
    for (Vector3[] t : triangles) {
      for (Vector3 p : t) {
        obj.append("v " + p.x() + " " + p.y() + " " + p.z() + "\n");
      }
      obj.append("f -3 -2 -1\n");
    }
    Files.writeString(folder.resolve("ring.obj"), obj);
    Path file =
        Files.writeString(
            folder.resolve("case.yaml"),
            """
            format: hullsum-case/1
            quantity: volume
            fields:
              flow: {vector: [x*(0.1 1/s), y*(0.2 1/s), "0.3 m/s"], unit: m/s}
            volumes:
              ring: {interior: {divergence-of: flow}}
            patches:
              skin:
                leaves: ring
                surface: {mesh: {file: ring.obj, unit: mm%s}}
                flux: {field: flow}
            """
                .formatted(weld));
    return Audits.audit(
        CaseReader.read(file, ReadOptions.named("case.yaml")).found().orElseThrow());
  }

  private static Optional<Finding> finding(FindingCode code, CaseResult result) {
    return result.findings().stream().filter(f -> f.code() == code).findFirst();
  }

  /** So many triangles stand a little off. */
  private static Vector3[][] cracked(double by, int count) {
    Vector3[][] ring = Meshes.torus(2000, 500, 60, 40);
    Vector3 shift = new Vector3(0, -by, 0);
    for (int t = 800; t < 800 + count; t++) {
      ring[t] = Arrays.stream(ring[t]).map(p -> p.plus(shift)).toArray(Vector3[]::new);
    }
    return ring;
  }

  private static String weld(Finding finding) {
    Matcher suggested = Pattern.compile("`(weld: [^`]+)` on the mesh").matcher(finding.message());
    assertTrue(suggested.find(), finding.message());
    return ", " + suggested.group(1);
  }

  private void assertWhole(CaseResult welded) {
    assertEquals(Optional.empty(), finding(SURFACE_OPEN, welded));
    assertEquals(Optional.empty(), finding(MESH_CRACKED, welded));
    assertEquals(Verdict.BALANCED, Audits.only(welded).verdict());
  }

  @Test
  void weldThatIsSuggestedForAnOpenMeshClosesItsCracks() throws IOException {
    Vector3[][] open = Arrays.copyOf(cracked(0.3, 80), 4700);
    Finding finding = finding(SURFACE_OPEN, audit(open, "")).orElseThrow();
    assertEquals(List.of("skin"), finding.evidence().get("weldOn"));
    assertEquals(List.of(5e-4), finding.evidence().get("weld"));
    assertTrue(finding.message().contains("would close 160 of the "), finding.message());
    Finding then = finding(SURFACE_OPEN, audit(open, weld(finding))).orElseThrow();
    assertTrue(!then.evidence().containsKey("weld"), then.message());
    assertWhole(audit(cracked(0.3, 80), weld(finding)));
  }

  @Test
  void trianglesThatAllStandByThemselvesAreWeldedAsSuggested() throws IOException {
    Random random = new Random(0x9E3779B97F4A7C15L);
    Vector3[][] loose = Meshes.torus(2000, 500, 50, 30);
    for (Vector3[] t : loose) {
      Vector3 shift = new Vector3(random.nextDouble() - 0.5, 0, random.nextDouble() - 0.5);
      for (int k = 0; k < 3; k++) {
        t[k] = t[k].plus(shift.times(0.2));
      }
    }
    CaseResult result = audit(loose, "");
    Finding finding =
        finding(SURFACE_OPEN, result).or(() -> finding(MESH_CRACKED, result)).orElseThrow();
    assertTrue(finding.message().endsWith("would close all 9000 open edges"), finding.message());
    assertWhole(audit(loose, weld(finding)));
  }

  @Test
  void cracksThatStandInTheErrorBoundsAreToldAndWeldingTakesThemOut() throws IOException {
    CaseResult loose = audit(cracked(0.3, 80), "");
    assertEquals(Optional.empty(), finding(SURFACE_OPEN, loose));
    Finding finding = finding(MESH_CRACKED, loose).orElseThrow();
    assertTrue(finding.message().endsWith("would close all 160 open edges"), finding.message());
    assertEquals(160, finding.evidence().get("edges"));
    CaseResult welded = audit(cracked(0.3, 80), weld(finding));
    assertWhole(welded);
    double before = Audits.only(loose).numericalError().orElseThrow();
    double after = Audits.only(welded).numericalError().orElseThrow();
    assertTrue(after < 1e-6 * before, before + " " + after);
  }

  @Test
  void meshWithAHoleGetsNoSuggestion() throws IOException {
    Finding finding =
        finding(SURFACE_OPEN, audit(Arrays.copyOf(cracked(0, 0), 4700), "")).orElseThrow();
    assertTrue(!finding.message().contains("weld"), finding.message());
    assertTrue(!finding.evidence().containsKey("weld"));
  }
}
