package org.hullsum.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The sheet to take to a duct, and the way back into a case. */
class TraverseSheetTest {
  private static ProgramRun run(String line) {
    return ProgramRun.of(new ReadAndAudit(), line.split(" ", -1));
  }

  @Test
  void sheetOfADiskHasThePointsFromWallToWall() {
    ProgramRun run =
        run("start traverse --section disk --diameter 0.4 --rule log-linear --points 10");
    assertEquals(0, run.status(), run.err());
    // 0.019 0.077 0.153 0.217 0.361 of the diameter: ISO 3966, from memory.
    for (String point : new String[] {"7.6", "30.6", "61.0", "86.8", "144.5", "255.5", "392.4"}) {
      assertTrue(run.out().contains(" " + point + " "), run.out());
    }
    assertTrue(run.out().contains("20 in all"), run.out());
    assertTrue(run.out().lines().allMatch(l -> l.length() <= 110), run.out());
  }

  @Test
  void sheetOfARectangleIsAGrid() {
    ProgramRun run = run("start traverse --section rectangle --width 0.6 --height 0.4");
    assertEquals(0, run.status(), run.err());
    assertTrue(run.out().contains("44.1     172.7     300.0     427.3     555.9"), run.out());
    assertEquals(5, run.out().lines().filter(l -> l.contains("________")).count());
  }

  @Test
  void pointsNearerToTheWallThanMethodOneAllowsAreSaidToBe() {
    String line = "start traverse --section disk --diameter 0.2 --rule equal-area --points ";
    assertTrue(run(line + 24).out().contains("2 mm from the wall"));
    assertTrue(!run(line + 2).out().contains("from the wall;"));
  }

  /** The table that is printed, filled in with one speed, gives that speed times the area. */
  @ParameterizedTest
  @CsvSource({
    "'--section disk --diameter 0.4', log-linear, 'disk: {centre: [0, 0, 0], normal: [1, 0, 0], radius: 0.2}', 'radius: radius, angle: angle', 0.12566370614359174",
    "'--section disk --diameter 400_mm --points 6 --diameters 3', log-tchebycheff, 'disk: {centre: [0, 0, 0], normal: [1, 0, 0], radius: 0.2}', 'radius: radius, angle: angle', 0.12566370614359174",
    "'--section rectangle --width 0.6 --height 0.4 --points 6x7', log-tchebycheff, 'rectangle: {corner: [0, 0, 0], edges: [[0, 0.6, 0], [0, 0, 0.4]]}', 'across: across, up: up', 0.24",
    "'--section rectangle --width 0.6 --height 0.4 --points 4', equal-area, 'rectangle: {corner: [0, 0, 0], edges: [[0, 0.6, 0], [0, 0, 0.4]]}', 'across: across, up: up', 0.24"
  })
  void tableThatIsPrintedIsTheReadingsOfACase(
      String section, String rule, String surface, String at, String area, @TempDir Path folder)
      throws IOException {
    String line = "start traverse --csv --rule " + rule + " " + section;
    String[] words = line.split(" ");
    for (int i = 0; i < words.length; i++) {
      words[i] = words[i].replace('_', ' ');
    }
    ProgramRun table = ProgramRun.of(new ReadAndAudit(), words);
    assertEquals(0, table.status(), table.err());
    String filled =
        table
            .out()
            .lines()
            .map(l -> l.endsWith(",") ? l + "2.5" : l)
            .collect(Collectors.joining("\n"));
    Files.writeString(folder.resolve("readings.csv"), filled);
    Path file = folder.resolve("case.yaml");
    Files.writeString(
        file,
        "format: hullsum-case/1\nquantity: volume\nvolumes: none\npatches:\n  duct:\n    surface: {"
            + surface
            + "}\n    flux: {traverse: {rule: "
            + rule
            + ", readings: readings.csv, speed: speed, at: {"
            + at
            + "}}}\n");
    ProgramRun run = run("audit " + file + " --json -");
    assertEquals("", run.err());
    double expected = 2.5 * Double.parseDouble(area);
    String value = run.out().replaceAll("(?s).*?\"value\" : ([-0-9.eE]+).*", "$1");
    assertEquals(expected, Double.parseDouble(value), 1e-12);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "start traverse --section disk",
        "start traverse --section ball --diameter 1",
        "start traverse --section disk --diameter 0",
        "start traverse --section disk --diameter 4kg",
        "start traverse --section disk --diameter 1 --points 7",
        "start traverse --section disk --diameter 1 --points 12",
        "start traverse --section disk --diameter 1 --points x",
        "start traverse --section disk --diameter 1 --diameters 1",
        "start traverse --section disk --diameter 1 --width 1",
        "start traverse --section disk --diameter 1 --rule guess",
        "start traverse --section rectangle --width 1 --height 1 --rule log-linear",
        "start traverse --section rectangle --width 1 --height 1 --points 4x5",
        "start traverse --section rectangle --width 1 --height 1 --points 5x5x5",
        "start field --csv"
      })
  void sheetThatCanNotBeMadeIsAWrongCommandLine(String line) {
    ProgramRun run = run(line);
    assertEquals(64, run.status(), run.out());
    assertEquals("", run.out());
    assertEquals(2, run.err().lines().count(), run.err());
  }
}
