package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Map;
import org.hullsum.casefile.CaseReader;
import org.hullsum.casefile.ReadOptions;
import org.hullsum.mesh.Meshes;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** One mesh of a ball with a cavity in which another ball floats. */
class NestedShellsTest {
  private static final double[] RADII = {3, 2, 1};

  @TempDir Path folder;

  @ParameterizedTest
  @ValueSource(ints = {0, 1, 2, 3, 4, 5, 6, 7})
  void regionIsTheOuterBallLessTheCavityAndShellsThatFaceWrongAreFound(int inward)
      throws IOException {
    StringBuilder obj = new StringBuilder();
    double volume = 0;
    int wrong = 0;
    for (int k = 0; k < RADII.length; k++) {
      Vector3[][] unit = Meshes.icosphere(2);
      boolean[] turn = new boolean[unit.length];
      Arrays.fill(turn, (inward >> k & 1) == 1);
      boolean cavity = k == 1;
      wrong += turn[0] == cavity ? 0 : unit.length;
      for (Vector3[] t : Meshes.turned(unit, turn)) {
        for (Vector3 p : t) {
          Vector3 q = p.times(RADII[k]);
          obj.append("v " + q.x() + " " + q.y() + " " + q.z() + "\n");
        }
        obj.append("f -3 -2 -1\n");
      }
      volume += (cavity ? -1 : 1) * Math.pow(RADII[k], 3) * volume(unit);
    }
    CaseResult result = audit(obj.toString());
    BalanceResult balance = Audits.only(result);
    // The divergence is 1.
    assertEquals(volume, balance.interior().orElseThrow(), 1e-10);
    assertEquals(volume, result.surfaces().get(0).enclosedVolume().orElseThrow(), 1e-10);
    boolean sound = wrong == 0;
    assertEquals(sound ? Verdict.BALANCED : Verdict.IMBALANCED, balance.verdict());
    Object against =
        result.findings().stream()
            .filter(f -> f.code() == FindingCode.ORIENTATION_REVERSED)
            .map(Finding::evidence)
            .filter(e -> e.containsKey("triangles"))
            .findFirst()
            .orElse(Map.of("triangles", 0L))
            .get("triangles");
    assertEquals((long) Math.min(wrong, 960 - wrong), against);
  }

  private static double volume(Vector3[][] triangles) {
    return Arrays.stream(triangles).mapToDouble(t -> t[0].dot(t[1].cross(t[2])) / 6).sum();
  }

  private CaseResult audit(String obj) throws IOException {
    Files.writeString(folder.resolve("balls.obj"), obj);
    Path file =
        Files.writeString(
            folder.resolve("case.yaml"),
            """
            format: hullsum-case/1
            units: none
            fields:
              flow: {vector: ["x/3 + 1", "y/3", "z/3"]}
            volumes:
              balls: {interior: {divergence-of: flow}}
            patches:
              skin: {leaves: balls, surface: {mesh: {file: balls.obj}}, flux: {field: flow}}
            """);
    return Audits.audit(
        CaseReader.read(file, ReadOptions.named("case.yaml")).found().orElseThrow());
  }
}
