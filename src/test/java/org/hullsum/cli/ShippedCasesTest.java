package org.hullsum.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.TimeZone;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The whole program, from the command line to its documents, on cases that it ships. */
class ShippedCasesTest {
  private static ProgramRun run(String... arguments) {
    return ProgramRun.of(new ReadAndAudit(), arguments);
  }

  @ParameterizedTest
  @EnumSource(value = StarterCase.class, names = "MESH_FILE", mode = EnumSource.Mode.EXCLUDE)
  void aCaseToBeginFromIsBalancedAndHasNoProblem(StarterCase starter, @TempDir Path folder)
      throws IOException {
    Path file = folder.resolve("begin.yaml");
    Files.writeString(file, run("start", starter.word()).out());
    Files.writeString(folder.resolve("sump.obj"), run("start", "mesh-file").out());
    ProgramRun run = run("audit", file.toString());
    assertEquals(0, run.status(), run.out() + run.err());
    assertEquals("", run.err());
    assertTrue(run.out().contains("\nVerdict: BALANCED\n"), run.out());
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "cases/vessel-reversed-patch.yaml",
        "cases/brine-tank-metered.yaml",
        "cases/basin-and-sump.yaml"
      })
  void theDocumentIsTheSameBytesOnOtherThreadsInOtherLocalesAndTimeZones(String file) {
    ProgramRun here = run("audit", file, "--json", "-", "--threads", "1");
    Locale locale = Locale.getDefault();
    TimeZone zone = TimeZone.getDefault();
    Locale.setDefault(Locale.forLanguageTag("ar-EG-u-nu-arab"));
    TimeZone.setDefault(TimeZone.getTimeZone("Pacific/Kiritimati"));
    try {
      assertEquals(here, run("audit", file, "--json", "-", "--threads", "2"));
    } finally {
      Locale.setDefault(locale);
      TimeZone.setDefault(zone);
    }
  }

  @Test
  void theDocumentNamesEveryFileThatWasRead() {
    String json =
        run("audit", "cases/elbow.yaml", "cases/conduction-block.yaml", "--json", "-").out();
    assertTrue(json.contains("\"file\" : \"cases/elbow.yaml\""), json);
    assertTrue(json.contains("\"file\" : \"cases/conduction-block.yaml\""), json);
  }

  @Test
  void aParameterGivenOnTheCommandLineReplacesThatOfTheCase() {
    ProgramRun asDrawn = run("audit", "cases/mass-from-nothing.yaml", "--quiet");
    ProgramRun without =
        run("audit", "cases/mass-from-nothing.yaml", "--quiet", "--set", "drift=0 m/s");
    assertEquals(10, asDrawn.status());
    assertEquals(0, without.status(), without.out() + without.err());
  }

  @Test
  void aParameterThatTheCaseDoesNotHaveIsWrongInput() {
    ProgramRun run = run("audit", "cases/elbow.yaml", "--set", "no_such=3 m");
    assertEquals(65, run.status());
    assertTrue(run.err().contains("no_such"), run.err());
  }

  @Test
  void theSchemaIsJsonThatNamesTheFormat() {
    ProgramRun run = run("schema");
    assertEquals(0, run.status());
    assertTrue(run.out().startsWith("{"), run.out());
    assertTrue(run.out().contains("hullsum-case/1"), run.out());
  }

  @ParameterizedTest
  @ValueSource(strings = {"no-such-file.yaml", "cases", "", "a\u0000b"})
  void whatIsNoCaseFileIsWrongInputWithAMessage(String file) {
    ProgramRun run = run("audit", file);
    assertEquals(65, run.status());
    assertEquals(1, run.err().lines().count(), run.err());
  }

  @Test
  void everyLineOfOutputInTheReadmeIsWhatTheProgramPrints() throws IOException {
    String readme = Files.readString(Path.of("README.md"), StandardCharsets.UTF_8);
    String printed = run("audit", "cases/vessel-reversed-patch.yaml").out();
    String file = Files.readString(Path.of("cases", "vessel-reversed-patch.yaml"));
    assertEquals(3, blocks(readme, "text").length);
    for (String block : blocks(readme, "text")) {
      assertTrue(printed.contains(block), "not printed any more:\n" + block + printed);
    }
    for (String block : blocks(readme, "yaml")) {
      assertTrue(file.contains(block), "not in the case any more:\n" + block);
    }
  }

  @Test
  void withoutTheReversedFacingTheCaseOfTheReadmeBalances(@TempDir Path folder) throws IOException {
    String file = Files.readString(Path.of("cases", "vessel-reversed-patch.yaml"));
    Path mended = folder.resolve("mended.yaml");
    Files.writeString(mended, file.replace("    facing: reversed\n", ""));
    ProgramRun run = run("audit", mended.toString());
    assertEquals(0, run.status(), run.out());
  }

  private static String[] blocks(String page, String language) {
    String[] parts = page.split("```" + language + "\n", -1);
    String[] blocks = new String[parts.length - 1];
    for (int i = 0; i < blocks.length; i++) {
      blocks[i] = parts[i + 1].substring(0, parts[i + 1].indexOf("```"));
    }
    return blocks;
  }
}
