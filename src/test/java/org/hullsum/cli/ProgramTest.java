package org.hullsum.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.TimeZone;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class ProgramTest {
  private static ProgramRun run(String... arguments) {
    return ProgramRun.of(HandmadeCases::run, arguments);
  }

  @ParameterizedTest
  @CsvSource({
    "balanced.yaml, 0",
    "waived.yaml, 0",
    "warned.yaml, 0",
    "undecided.yaml, 20",
    "imbalanced.yaml, 10",
    "error.yaml, 10",
    "bad.yaml, 65",
    "fault.yaml, 70",
    "overflow.yaml, 70",
    "memory.yaml, 70",
    "undecided.yaml imbalanced.yaml balanced.yaml, 10",
    "imbalanced.yaml bad.yaml undecided.yaml, 65",
    "bad.yaml fault.yaml imbalanced.yaml, 70",
    "balanced.yaml undecided.yaml, 20"
  })
  void theWorstCaseDecidesTheExitCode(String cases, int status) {
    String[] arguments =
        Stream.concat(Stream.of("audit"), Stream.of(cases.split(" ", -1))).toArray(String[]::new);
    assertEquals(status, run(arguments).status());
  }

  @Test
  void oneUnreadableCaseDoesNotKeepTheOthersFromBeingAudited() {
    ProgramRun run = run("audit", "bad.yaml", "balanced.yaml", "imbalanced.yaml");
    assertTrue(run.out().contains("balanced.yaml\nVerdict: BALANCED"), run.out());
    assertTrue(run.out().contains("imbalanced.yaml\nVerdict: IMBALANCED"), run.out());
  }

  @Test
  void outputStandsInTheOrderOfTheCommandLineOnAnyNumberOfThreads() {
    String[] cases = {
      "undecided.yaml", "balanced.yaml", "bad.yaml", "imbalanced.yaml", "waived.yaml"
    };
    List<String> one = new ArrayList<>(List.of("audit", "--quiet", "--threads", "1"));
    Collections.addAll(one, cases);
    List<String> four = new ArrayList<>(List.of("audit", "--quiet", "--threads", "4"));
    Collections.addAll(four, cases);
    ProgramRun first = run(one.toArray(String[]::new));
    assertEquals(first, run(four.toArray(String[]::new)));
    assertEquals(
        List.of(cases), first.out().lines().map(l -> l.substring(13).split("[: ]", 2)[0]).toList());
  }

  @Test
  void problemsGoToStandardErrorWithPlaceAndCaret() {
    ProgramRun run = run("audit", "bad.yaml");
    assertEquals(
        "bad.yaml:4:3: unknown key 'raduis'\nbad.yaml:4:3: no operand\n  3 * \n      ^\n",
        run.err());
  }

  @Test
  void aWarningIsMarkedAndItsControlCharactersAreReplaced() {
    assertEquals("warned.yaml:4:3: warning: a \uFFFD[31mtrap\n", run("audit", "warned.yaml").err());
  }

  @Test
  void aFaultIsOneLineWithoutAStackTrace() {
    ProgramRun run = run("audit", "fault.yaml", "balanced.yaml");
    assertEquals(1, run.err().lines().count(), run.err());
    assertTrue(run.err().startsWith("fault.yaml: a fault of the program itself"), run.err());
    assertTrue(run.err().contains("IllegalStateException (rule broken) at cli."), run.err());
    assertTrue(run.out().contains("balanced.yaml\nVerdict: BALANCED"), run.out());
  }

  @Test
  void runningOutOfMemorySaysWhatToDo() {
    assertTrue(run("audit", "memory.yaml").err().contains("ran out of memory; give it more"));
  }

  @Test
  void afterAFaultNoDocumentIsWritten(@TempDir Path folder) {
    Path json = folder.resolve("out.json");
    ProgramRun run = run("audit", "fault.yaml", "balanced.yaml", "--json", json.toString());
    assertEquals(70, run.status());
    assertFalse(Files.exists(json));
    assertTrue(run.err().contains("no document was written"), run.err());
  }

  @Test
  void aDocumentOnStandardOutputStandsAloneThereAndProblemsStillGoToStandardError() {
    ProgramRun run = run("audit", "bad.yaml", "balanced.yaml", "--json", "-");
    assertTrue(run.out().startsWith("{\n  \"format\" : \"hullsum-result/1\""), run.out());
    assertTrue(run.out().endsWith("}\n"), run.out());
    assertTrue(run.err().startsWith("bad.yaml:4:3: unknown key"), run.err());
    assertTrue(run("audit", "balanced.yaml", "--junit", "-").out().startsWith("<?xml"));
  }

  @Test
  void documentsAreWrittenBesideTheText(@TempDir Path folder) throws IOException {
    Path json = folder.resolve("out.json");
    Path junit = folder.resolve("out.xml");
    ProgramRun run =
        run("audit", "imbalanced.yaml", "--json", json.toString(), "--junit", junit.toString());
    assertEquals(10, run.status());
    assertTrue(run.out().contains("Verdict: IMBALANCED"), run.out());
    assertTrue(Files.readString(json).contains("\"at\" : \"2026-03-01T23:30:00Z\""));
    assertTrue(Files.readString(json).contains("\"sha256\" : \"00imbalanced.yaml\""));
    assertTrue(Files.readString(junit).contains("type=\"imbalanced\""));
    try (Stream<Path> left = Files.list(folder)) {
      assertEquals(2, left.count());
    }
  }

  @Test
  void documentsAreTheSameBytesInOtherLocalesAndTimeZonesAndOnOtherThreads() {
    ProgramRun here = run("audit", "balanced.yaml", "undecided.yaml", "--json", "-");
    Locale locale = Locale.getDefault();
    TimeZone zone = TimeZone.getDefault();
    Locale.setDefault(Locale.forLanguageTag("ar-EG-u-nu-arab"));
    TimeZone.setDefault(TimeZone.getTimeZone("Pacific/Kiritimati"));
    try {
      assertEquals(
          here, run("audit", "balanced.yaml", "undecided.yaml", "--json", "-", "--threads", "2"));
    } finally {
      Locale.setDefault(locale);
      TimeZone.setDefault(zone);
    }
  }

  @Test
  void anOutputThatCannotBeWrittenIsToldAndOutweighsTheVerdict(@TempDir Path folder) {
    String nowhere = folder.resolve("no").resolve("out.json").toString();
    ProgramRun run = run("audit", "imbalanced.yaml", "bad.yaml", "--json", nowhere);
    assertEquals(74, run.status());
    assertTrue(run.err().contains("can't be written: its folder does not exist"), run.err());
    assertEquals(74, run("audit", "balanced.yaml", "--json", folder.toString()).status());
  }

  @Test
  void aBrokenStandardOutputIsTold() {
    OutputStream broken =
        new OutputStream() {
          @Override
          public void write(int b) throws IOException {
            throw new IOException("Broken pipe");
          }
        };
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    ExitCode code =
        new Program(broken, err, Clock.systemUTC(), HandmadeCases::run, Terminal.NONE)
            .run(List.of("audit", "imbalanced.yaml"));
    assertEquals(ExitCode.CANNOT_WRITE, code);
    assertEquals("standard output can't be written\n", err.toString(StandardCharsets.UTF_8));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "",
        "audit",
        "orient",
        "orient x.yaml y.yaml",
        "orient x.yaml --quiet",
        "reconcile x.yaml",
        "desk x.yaml",
        "audit x.yaml --html f",
        "audit x.yaml --digits 0",
        "audit x.yaml --digits 15",
        "audit x.yaml --digits many",
        "audit x.yaml --threads 0",
        "audit x.yaml --threads -1",
        "audit x.yaml --set radius",
        "audit x.yaml --set =4",
        "audit x.yaml --set radius=",
        "audit x.yaml --set a=1 --set a=2",
        "audit x.yaml --allow-outside nowhere-at-all",
        "audit x.yaml --json - --junit -",
        "audit x.yaml --json a --json b",
        "audit x.yaml --json",
        "start",
        "start network",
        "start traverse",
        "start nothing",
        "start field metered",
        "schema more"
      })
  void aWrongCommandLineEndsWith64AndDoesNothing(String line) {
    ProgramRun run = run(line.isEmpty() ? new String[0] : line.split(" ", -1));
    assertEquals(64, run.status(), run.err());
    assertEquals("", run.out());
    assertEquals(2, run.err().lines().count(), run.err());
    assertTrue(run.err().contains(" -h' shows what can be asked."), run.err());
  }

  @Test
  void aMisspeltOptionOrCommandIsAnsweredWithTheNearest() {
    assertTrue(run("audit", "x.yaml", "--jsn", "f").err().contains("did you mean --json?"));
    assertTrue(run("audt", "x.yaml").err().contains("did you mean audit?"));
  }

  @Test
  void kindsThatAreNotSupportedYetAreSaidToBe() {
    assertTrue(run("start", "network").err().contains("not supported"));
    assertFalse(run("start", "nothing").err().contains("not supported"));
  }

  @Test
  void settingsReachThePipeline(@TempDir Path folder) {
    List<CasePipeline.Settings> seen = new ArrayList<>();
    CasePipeline spy =
        (file, settings) -> {
          seen.add(settings);
          return HandmadeCases.run(file, settings);
        };
    ProgramRun.of(
        spy,
        "audit",
        "balanced.yaml",
        "--set",
        "radius=4 m",
        "--set",
        "lift= a=b ",
        "--digits",
        "11",
        "--threads",
        "3",
        "--allow-outside",
        folder.toString());
    CasePipeline.Settings settings = seen.get(0);
    assertEquals("4 m", settings.parameters().get("radius"));
    assertEquals("a=b", settings.parameters().get("lift"));
    assertEquals(11, settings.digits());
    assertEquals(3, settings.threads());
    assertEquals(List.of(folder), settings.allowedFolders());
    assertEquals("2026-03-01", settings.today().toString());
  }

  @ParameterizedTest
  @ValueSource(strings = {"-h", "--help", "audit -h", "start -h", "schema --help"})
  void helpIsPrintedAndFine(String line) {
    ProgramRun run = run(line.split(" ", -1));
    assertEquals(0, run.status());
    assertTrue(run.out().startsWith("Usage: hullsum"), run.out());
    assertEquals("", run.err());
  }

  @ParameterizedTest
  @ValueSource(strings = {"--version", "audit --version", "start --version"})
  void theVersionIsTheOneOfTheBuild(String line) throws IOException {
    String version = run(line.split(" ", -1)).out();
    assertTrue(version.matches("hullsum \\d+\\.\\d+\\.\\d+\\n"), version);
    assertTrue(
        Files.readString(Path.of("pom.xml"))
            .contains("<version>" + version.strip().substring(8) + "</version>"));
  }

  @Test
  void aFileThatLooksLikeAnArgumentFileIsACase() {
    ProgramRun run = run("audit", "@balanced.yaml");
    assertEquals(70, run.status());
    assertTrue(run.err().startsWith("@balanced.yaml: "), run.err());
  }

  @Test
  void aDocumentIsNotWrittenOverACaseOfTheAudit(@TempDir Path folder) throws IOException {
    Path file = Files.writeString(folder.resolve("case.yaml"), "format: hullsum-case/1\n");
    ProgramRun run = run("audit", "--json", folder + "/./case.yaml", file.toString());
    assertEquals(64, run.status());
    assertTrue(run.err().contains("is a case of this audit"), run.err());
    assertEquals("format: hullsum-case/1\n", Files.readString(file));
  }
}
