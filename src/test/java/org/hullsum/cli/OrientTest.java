package org.hullsum.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class OrientTest {
  private static final String[] BOX = {
    "corner: [0, 0, 0], edges: [[0, 2, 0], [1, 0, 0]]",
    "corner: [0, 0, 3], edges: [[1, 0, 0], [0, 2, 0]]",
    "corner: [0, 0, 0], edges: [[0, 0, 3], [0, 2, 0]]",
    "corner: [1, 0, 0], edges: [[0, 2, 0], [0, 0, 3]]",
    "corner: [0, 0, 0], edges: [[1, 0, 0], [0, 0, 3]]",
    "corner: [0, 2, 0], edges: [[0, 0, 3], [1, 0, 0]]"
  };

  @TempDir Path folder;

  private Path box(boolean[] reversed, boolean withStrangers) throws IOException {
    StringBuilder text = new StringBuilder("format: hullsum-case/1\nquantity: volume\n");
    text.append("fields:\n  flow: {vector: [\"0.3\", \"0.1\", \"0.2\"], unit: m/s}\npatches:\n");
    for (int k = 0; k < BOX.length; k++) {
      text.append("  face-").append(k).append(":\n    # number ").append(k).append('\n');
      if (reversed[k]) {
        text.append("    facing: reversed # why?\n");
      }
      text.append("    surface: {rectangle: {").append(BOX[k]).append("}}\n");
      text.append("    flux: {field: flow}\n");
    }
    if (withStrangers) {
      text.append("  flap:\n    surface: {rectangle: {").append(BOX[0]).append("}}\n");
      text.append("    flux: none\n");
    }
    return Files.writeString(folder.resolve("box.yaml"), text);
  }

  private static ProgramRun run(String... arguments) {
    return ProgramRun.of(new ReadAndAudit(), arguments);
  }

  @Test
  void facingBesideGapsIsTurnedWithALineThatSaysOnWhatItRests() throws IOException {
    StringBuilder text = new StringBuilder("format: hullsum-case/1\nunits: none\n");
    text.append("fields:\n  flow: {vector: [x, y, z]}\npatches:\n");
    for (int axis = 0; axis < 3; axis++) {
      for (int side : new int[] {-1, 1}) {
        // Plates of a cube of side 2, each 0.1 short of its edges.
        double[][] rows = {{-0.9, -0.9, -0.9}, new double[3], new double[3]};
        rows[0][axis] = side;
        rows[1][(axis + (side > 0 ? 1 : 2)) % 3] = 1.8;
        rows[2][(axis + (side > 0 ? 2 : 1)) % 3] = 1.8;
        text.append("  plate-").append(axis).append(side > 0 ? "-high" : "-low").append(":\n");
        text.append(side > 0 && axis == 1 ? "    facing: reversed\n" : "");
        text.append("    surface: {rectangle: {corner: ").append(Arrays.toString(rows[0]));
        text.append(", edges: [").append(Arrays.toString(rows[1])).append(", ");
        text.append(Arrays.toString(rows[2])).append("]}}\n    flux: {field: flow}\n");
      }
    }
    Path file = Files.writeString(folder.resolve("plates.yaml"), text);
    ProgramRun run = run("orient", file.toString());
    assertEquals(0, run.status(), run.out() + run.err());
    assertTrue(
        run.out().contains("plate-1-high rests on winding numbers alone"), run.out() + run.err());
    assertTrue(run.out().contains("turned plate-1-high"), run.out());
  }

  static IntStream seeds() {
    return IntStream.rangeClosed(1, 20);
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void anySetOfReversedPatchesIsTurnedAndOnlyFacingsDiffer(int seed) throws IOException {
    Random random = new Random(0x9E3779B97F4A7C15L * seed);
    boolean[] reversed = new boolean[BOX.length];
    for (int k = 0; k < reversed.length; k++) {
      reversed[k] = seed % 5 == 0 || random.nextBoolean();
    }
    Path file = box(reversed, false);
    List<String> before = Files.readAllLines(file);
    ProgramRun run = run("orient", "--in-place", file.toString());
    assertEquals(0, run.status(), run.err());
    List<String> changed = new ArrayList<>(Files.readAllLines(file));
    assertEquals(before.size(), changed.size());
    for (int i = 0; i < changed.size(); i++) {
      assertEquals(before.get(i).replace("facing: reversed", "facing: as-drawn"), changed.get(i));
    }
    assertEquals(0, run("audit", file.toString()).status());
    ProgramRun again = run("orient", "--in-place", file.toString());
    assertTrue(again.out().contains("nothing to turn"), again.out());
  }

  @Test
  void resultIsWrittenBesideTheOriginalAndNeverOverOneThatIsThere() throws IOException {
    boolean[] one = {false, true, false, false, false, false};
    Path file = box(one, false);
    String original = Files.readString(file);
    ProgramRun run = run("orient", file.toString());
    assertEquals(0, run.status(), run.err());
    assertTrue(run.out().contains("box-oriented.yaml: turned face-1"), run.out());
    assertEquals(original, Files.readString(file));
    assertEquals(
        original.replace("facing: reversed", "facing: as-drawn"),
        Files.readString(folder.resolve("box-oriented.yaml")));
    assertEquals(74, run("orient", file.toString()).status());
    try (var files = Files.list(folder)) {
      assertEquals(2, files.count());
    }
  }

  @Test
  void whatIsUndeterminedIsLeftAndSaid() throws IOException {
    Path file = box(new boolean[6], true);
    ProgramRun run = run("orient", file.toString());
    assertEquals(10, run.status(), run.out() + run.err());
    assertFalse(Files.exists(folder.resolve("box-oriented.yaml")));
    assertTrue(run.out().contains("is left as it is"), run.out());
  }

  @Test
  void caseThatCantBeReadIsWrongInput() {
    assertEquals(65, run("orient", folder.resolve("none.yaml").toString()).status());
    assertEquals(64, run("orient").status());
  }
}
