package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import org.hullsum.casefile.CaseReader;
import org.hullsum.casefile.ReadOptions;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A shell of flat triangles between two discs given by formulas. */
class MixedSurfaceTest {
  @TempDir Path folder;

  private CaseResult audit(int sides) throws IOException {
    StringBuilder obj = new StringBuilder();
    for (int k = 0; k < sides; k++) {
      double angle = 2 * Math.PI * k / sides;
      for (int z = 0; z < 2; z++) {
        obj.append("v " + Math.cos(angle) + " " + Math.sin(angle) + " " + 2 * z + "\n");
      }
    }
    for (int k = 0; k < sides; k++) {
      int low = 2 * k + 1;
      int next = 2 * ((k + 1) % sides) + 1;
      obj.append("f " + low + " " + next + " " + (next + 1) + " " + (low + 1) + "\n");
    }
    Files.writeString(folder.resolve("shell.obj"), obj);
    Path file =
        Files.writeString(
            folder.resolve("case.yaml"),
            """
            format: hullsum-case/1
            quantity: volume
            tolerances: {relative: 20 %}
            fields:
              flow: {vector: ["0", "0", "0.5 m/s"], unit: m/s}
            patches:
              base: {surface: {disk: {centre: [0, 0, 0], normal: [0, 0, -1], radius: 1}}, flux: {field: flow}}
              lid: {surface: {disk: {centre: [0, 0, 2], normal: [0, 0, 1], radius: 1}}, flux: {field: flow}}
              shell: {surface: {mesh: {file: shell.obj, unit: m}}, flux: {field: flow}}
            """);
    return Audits.audit(
        CaseReader.read(file, ReadOptions.named("case.yaml")).found().orElseThrow());
  }

  @ParameterizedTest
  @ValueSource(ints = {40, 100, 200})
  void shellClosesWithinItsChordsAndTheLossIsSaid(int sides) throws IOException {
    CaseResult result = audit(sides);
    assertEquals(Optional.of(true), result.surfaces().get(0).closed());
    assertEquals(Optional.of(Verdict.BALANCED), result.verdict());
    Finding loss = Audits.finding(result, FindingCode.FACETING_LOSS, "shell").orElseThrow();
    double sagitta = 1 - Math.cos(Math.PI / sides);
    double chordError = (double) loss.evidence().get("chordError");
    assertEquals(sagitta, chordError, 0.5 * sagitta);
    // Two segments of circles, the area of the discs less that of the polygons.
    double missing = 2 * (Math.PI - 0.5 * sides * Math.sin(2 * Math.PI / sides));
    double area = (double) loss.evidence().get("area");
    assertTrue(area >= missing && area < 4 * missing, area + " for " + missing);
    assertTrue(loss.message().contains("`base`, `lid`"), loss.message());
  }
}
