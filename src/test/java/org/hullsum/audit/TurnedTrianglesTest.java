package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Optional;
import java.util.Random;
import org.hullsum.casefile.CaseReader;
import org.hullsum.casefile.ReadOptions;
import org.hullsum.mesh.Meshes;
import org.hullsum.model.Case;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Triangles turned inside a mesh change the outward sum and nothing of the region. */
class TurnedTrianglesTest {
  @TempDir Path folder;

  private CaseResult audit(Vector3[][] triangles) throws IOException {
    return Audits.audit(read(triangles));
  }

  private Case read(Vector3[][] triangles) throws IOException {
    StringBuilder obj = new StringBuilder();
    int n = 0;
    for (Vector3[] t : triangles) {
      for (Vector3 p : t) {
        obj.append("v " + p.x() + " " + p.y() + " " + p.z() + "\n");
      }
      n += 3;
      obj.append("f " + (n - 2) + " " + (n - 1) + " " + n + "\n");
    }
    Files.writeString(folder.resolve("ball.obj"), obj);
    Path file =
        Files.writeString(
            folder.resolve("case.yaml"),
            """
            format: hullsum-case/1
            units: none
            fields:
              flow: {vector: ["x/3 + 1", "y/3", "z/3"]}
            volumes:
              ball: {interior: {divergence-of: flow}}
            patches:
              skin: {leaves: ball, surface: {mesh: {file: ball.obj}}, flux: {field: flow}}
            """);
    return CaseReader.read(file, ReadOptions.named("case.yaml")).found().orElseThrow();
  }

  @ParameterizedTest
  @ValueSource(doubles = {0.02, 0.2, 0.45, 0.6, 0.9})
  void regionIsTheSameAndEachTurnedTriangleCountsTwice(double share) throws IOException {
    Vector3[][] sound = Meshes.icosphere(3);
    BalanceResult whole = Audits.only(audit(sound));
    Random random = new Random(0x9E3779B97F4A7C15L);
    boolean[] turn = new boolean[sound.length];
    int turned = 0;
    double change = 0;
    for (int k = 0; k < turn.length; k++) {
      turn[k] = random.nextDouble() < share;
      turned += turn[k] ? 1 : 0;
      Vector3 middle = sound[k][0].plus(sound[k][1]).plus(sound[k][2]).times(1.0 / 3);
      Vector3 area =
          sound[k][1].minus(sound[k][0]).cross(sound[k][2].minus(sound[k][0])).times(0.5);
      change -= turn[k] ? 2 * middle.times(1.0 / 3).plus(Vector3.X).dot(area) : 0;
    }
    CaseResult result = audit(Meshes.turned(sound, turn));
    BalanceResult balance = Audits.only(result);
    assertEquals(whole.interior().orElseThrow(), balance.interior().orElseThrow(), 1e-12);
    assertEquals(whole.outward().orElseThrow() + change, balance.outward().orElseThrow(), 1e-12);
    assertEquals(Verdict.IMBALANCED, balance.verdict());
    SurfaceResult surface = result.surfaces().get(0);
    assertEquals(Optional.of(true), surface.closed());
    assertEquals(whole.interior().orElseThrow(), surface.enclosedVolume().orElseThrow(), 1e-12);
    Finding finding =
        result.findings().stream()
            .filter(f -> f.code() == FindingCode.ORIENTATION_REVERSED)
            .filter(f -> f.evidence().containsKey("triangles"))
            .findFirst()
            .orElseThrow();
    assertEquals(
        (long) Math.min(turned, sound.length - turned), finding.evidence().get("triangles"));
  }

  @Test
  void trianglesThatPassThroughOneAnotherAreToldWhereASecondOpinionIsAsked() throws IOException {
    Vector3[][] ball = Meshes.icosphere(2);
    Vector3[][] two = Arrays.copyOf(ball, 2 * ball.length);
    for (int t = 0; t < ball.length; t++) {
      two[ball.length + t] = new Vector3[3];
      for (int k = 0; k < 3; k++) {
        two[ball.length + t][k] = ball[t][k].plus(new Vector3(1.0123, 0.021, 0.013));
      }
    }
    Case crossing = read(two);
    AuditOptions usual = AuditOptions.usual(Audits.TODAY);
    AuditOptions asked = new AuditOptions(usual.digits(), 2, usual.today(), usual.progress(), true);
    CaseResult unasked = Audits.audit(crossing);
    assertTrue(Audits.finding(unasked, FindingCode.MESH_SELF_INTERSECTING, "skin").isEmpty());
    Finding finding =
        Audits.finding(Auditor.audit(crossing, asked), FindingCode.MESH_SELF_INTERSECTING, "skin")
            .orElseThrow();
    assertTrue((int) finding.evidence().get("pairs") > 30, finding.message());
    assertTrue(
        Audits.finding(Auditor.audit(read(ball), asked), FindingCode.MESH_SELF_INTERSECTING, "skin")
            .isEmpty());
  }
}
