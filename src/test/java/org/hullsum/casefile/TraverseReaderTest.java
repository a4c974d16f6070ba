package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.model.Case;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.Input;
import org.hullsum.problem.Problem;
import org.hullsum.problem.ProblemKind;
import org.hullsum.quadrature.TraverseError;
import org.hullsum.quadrature.TraverseLine;
import org.hullsum.quadrature.TraverseRule;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Good traverses, and siblings broken in one named way each. */
class TraverseReaderTest {
  private static final double RADIUS = 0.2;

  private static final String ROUND =
      """
      format: hullsum-case/1
      quantity: volume
      uncertainties: k=2
      patches:
        inlet:
          surface: {disk: {centre: [0, 0, 0], normal: [1, 0, 0], radius: 0.2 m}}
          flux:
            traverse:
              rule: log-linear
              readings: readings.csv
              at: {radius: r, angle: angle}
              speed: speed
              uncertainty: ± 2 %
      """;

  private static final String SQUARE =
      """
      format: hullsum-case/1
      quantity: volume
      uncertainties: k=2
      patches:
        inlet:
          surface: {rectangle: {corner: [0, 0, 0], edges: [[0, 600 mm, 0], [0, 0, 400 mm]]}}
          flux:
            traverse:
              rule: log-tchebycheff
              readings: readings.csv
              at: {across: across, up: up}
              speed: speed
              uncertainty: ± 2 %
      """;

  @TempDir private Path folder;

  private ReadOutcome read(String yaml, String csv) throws IOException {
    Files.writeString(folder.resolve("readings.csv"), csv);
    Path file = Files.writeString(folder.resolve("case.yaml"), yaml);
    return CaseReader.read(file, ReadOptions.named(CaseTexts.NAME));
  }

  private Case good(String yaml, String csv) throws IOException {
    ReadOutcome outcome = read(yaml, csv);
    assertEquals(List.of(), outcome.problems(), () -> CaseTexts.problems(outcome));
    return outcome.found().orElseThrow();
  }

  private static FluxStatement.Traverse traverse(Case read) {
    return (FluxStatement.Traverse) read.patches().get(0).fluxes().get(0).statement();
  }

  private static double rate(Case read) {
    BatchEvaluator evaluator =
        BatchEvaluator.compile(List.of(), read.inputs().values(), List.of(traverse(read).rate()));
    double[][] result = new double[1][1];
    evaluator.evaluate(new double[0][], 1, result, evaluator.workspace());
    return result[0][0];
  }

  /** A power-law profile of exponent 1/7 read at a rule's points on so many radii. */
  private static String round(TraverseRule rule, int onRadius, int radii) {
    StringBuilder csv = new StringBuilder("r (mm),angle (deg),speed (m/s)\n");
    for (int k = 0; k < radii; k++) {
      for (double r : rule.radius(onRadius).positions()) {
        csv.append(
            String.format(
                Locale.ROOT,
                "%.3f,%.3f,%.9f\n",
                1000 * RADIUS * r,
                360.0 * k / radii,
                10 * Math.pow(1 - r, 1 / 7.0)));
      }
    }
    return csv.toString();
  }

  private static String square(TraverseRule rule, int across, int up) {
    StringBuilder csv = new StringBuilder("across (mm),up (mm),speed (m/s)\n");
    for (double b : rule.side(up).positions()) {
      for (double a : rule.side(across).positions()) {
        double wall = 4 * Math.min(a, 1 - a) * Math.min(b, 1 - b);
        csv.append(
            String.format(
                Locale.ROOT, "%.3f,%.3f,%.9f\n", 600 * a, 400 * b, 10 * Math.pow(wall, 1 / 7.0)));
      }
    }
    return csv.toString();
  }

  @Test
  void everyRuleOnADiskGivesItsMeanTimesTheArea() throws IOException {
    for (TraverseRule rule : TraverseRule.values()) {
      for (int radii : new int[] {3, 4, 6}) {
        Case read = good(ROUND.replace("log-linear", rule.word()), round(rule, 4, radii));
        TraverseLine line = rule.radius(4);
        double mean = 10 * 49 / 60.0 * (1 + TraverseError.onRadius(line, 7));
        assertEquals(Math.PI * RADIUS * RADIUS * mean, rate(read), 1e-8);
        assertEquals(mean, traverse(read).readings().mean(), 1e-7);
        assertEquals(0, traverse(read).errorBound());
      }
    }
  }

  @Test
  void everyRuleOnARectangleGivesItsMeanTimesTheArea() throws IOException {
    for (TraverseRule rule : TraverseRule.values()) {
      if (rule.forRectangles()) {
        Case read = good(SQUARE.replace("log-tchebycheff", rule.word()), square(rule, 6, 5));
        double error = TraverseError.onSides(rule.side(6), rule.side(5), 7);
        double mean = 10 * 49 / 64.0 * (1 + error);
        assertEquals(0.24 * mean, rate(read), 1e-8);
      }
    }
  }

  @Test
  void readingsAndRuleAreInputsWithTheirUncertainties() throws IOException {
    Map<String, Input> inputs = good(ROUND, round(TraverseRule.LOG_LINEAR, 5, 4)).inputs().all();

    Input reading = inputs.get("inlet reading 1");
    assertEquals(0.01 * reading.value(), reading.standardUncertainty(), 1e-15);
    assertEquals("readings.csv:2:14", reading.place().toString());
    Input rule = inputs.get("inlet rule log-linear");
    assertEquals(
        TraverseError.onRadius(TraverseRule.LOG_LINEAR.radius(5)) / Math.sqrt(3),
        rule.standardUncertainty(),
        1e-15);
    assertEquals(21, inputs.size());
  }

  @Test
  void ruleUncertaintyThatIsStatedReplacesOurs() throws IOException {
    String yaml = ROUND.replace("± 2 %\n", "± 2 %\n        rule-uncertainty: ± 1 % (k=2)\n");
    Map<String, Input> inputs = good(yaml, round(TraverseRule.LOG_LINEAR, 5, 4)).inputs().all();

    assertEquals(0.005, inputs.get("inlet rule log-linear").standardUncertainty(), 1e-15);
  }

  @Test
  void uncertaintyMayStandInAColumnWithItsMeaning() throws IOException {
    String csv =
        round(TraverseRule.LOG_LINEAR, 3, 4)
            .lines()
            .map(l -> l.startsWith("r ") ? l + ",spread (m/s)\n" : l + ",0.3\n")
            .reduce("", String::concat);
    Case read = good(ROUND.replace("± 2 %", "spread (k=3)"), csv);

    assertEquals(0.1, read.inputs().all().get("inlet reading 7").standardUncertainty(), 1e-15);
  }

  @Test
  void onlyTheComponentAlongTheNormalCounts() throws IOException {
    String csv =
        round(TraverseRule.LOG_LINEAR, 3, 4)
            .lines()
            .map(l -> l.startsWith("r ") ? l + ",yaw (deg),pitch (deg)\n" : l + ",60,-45\n")
            .reduce("", String::concat);
    Case straight = good(ROUND, round(TraverseRule.LOG_LINEAR, 3, 4));
    ReadOutcome turned =
        read(
            ROUND.replace("speed: speed", "speed: speed\n        yaw: yaw\n        pitch: pitch"),
            csv);
    Case read = turned.found().orElseThrow();

    assertEquals(rate(straight) * 0.5 * Math.sqrt(0.5), rate(read), 1e-8);
    // 69.3 degrees off the normal: the flux is given, and the section called unfit.
    assertEquals(ProblemKind.SUSPICIOUS, read.warnings().get(0).kind());
    double swirl = traverse(read).readings().swirl().orElseThrow();
    assertEquals(Math.toDegrees(Math.acos(0.5 * Math.sqrt(0.5))), swirl, 1e-9);
  }

  @Test
  void componentsAreDottedWithTheNormalOfThePlacedSurface() throws IOException {
    String csv =
        round(TraverseRule.LOG_LINEAR, 3, 4)
            .lines()
            .map(l -> l.startsWith("r ") ? l + ",b (m/s),c (m/s)\n" : l + ",3,-4\n")
            .reduce("", String::concat);
    // The normal is the x axis, turned to z: what counts is c.
    String yaml =
        ROUND
            .replace(
                "radius: 0.2 m}}",
                "radius: 0.2 m}, placed: {turn: {about: [0, 1, 0], angle: -90 deg}}}")
            .replace("speed: speed", "components: [speed, b, c]");

    assertEquals(-4 * Math.PI * RADIUS * RADIUS, rate(read(yaml, csv).found().orElseThrow()), 1e-9);
  }

  @Test
  void differentialPressureGivesTheSpeed() throws IOException {
    String csv =
        round(TraverseRule.LOG_LINEAR, 3, 4)
            .lines()
            .map(l -> l.startsWith("r ") ? "r (mm),angle (deg),dp (Pa)\n" : cut(l) + ",60\n")
            .reduce("", String::concat);
    String yaml =
        ROUND.replace(
            "speed: speed",
            "pressure: {column: dp, density: 1.2 kg/m3 ± 1 %, coefficient: 0.84 ± 2 %}");
    Case read = good(yaml, csv);

    assertEquals(0.84 * 10 * Math.PI * RADIUS * RADIUS, rate(read), 1e-9);
    assertTrue(read.inputs().all().containsKey("inlet density"));
    assertTrue(read.inputs().all().containsKey("inlet coefficient"));
  }

  private static String cut(String line) {
    return line.substring(0, line.lastIndexOf(','));
  }

  @Test
  void semicolonsAndDecimalCommasAreRead() throws IOException {
    String csv = round(TraverseRule.LOG_LINEAR, 3, 4);

    assertEquals(
        rate(good(ROUND, csv)), rate(good(ROUND, csv.replace(",", ";").replace(".", ","))), 1e-15);
  }

  @Test
  void interpolationTakesReadingsWhereverTheyStandAndBoundsItsError() throws IOException {
    String csv = round(TraverseRule.GAUSS, 4, 5);
    Case read = good(ROUND.replace("log-linear", "interpolated"), csv);
    double truth = Math.PI * RADIUS * RADIUS * 10 * 49 / 60;

    assertEquals(truth, rate(read), 1e-4 * truth);
    assertTrue(traverse(read).errorBound() >= Math.abs(rate(read) - truth));
    assertTrue(traverse(read).errorBound() < 0.02 * truth);
    Case inARectangle =
        good(SQUARE.replace("log-tchebycheff", "interpolated"), square(TraverseRule.GAUSS, 4, 5));
    assertEquals(0.24 * 10 * 49 / 64, rate(inARectangle), 1e-4);
  }

  /** A regular polygon inscribed in the circle of the section, as an STL file in millimetres. */
  private void writePolygon(int sides) throws IOException {
    StringBuilder stl = new StringBuilder("solid inlet\n");
    for (int k = 0; k < sides; k++) {
      stl.append("facet normal 1 0 0\nouter loop\nvertex 0 0 0\n");
      for (int end = k; end <= k + 1; end++) {
        double angle = 2 * Math.PI * (end % sides) / sides;
        stl.append(
            String.format(
                Locale.ROOT,
                "vertex 0 %.9f %.9f\n",
                1000 * RADIUS * Math.cos(angle),
                1000 * RADIUS * Math.sin(angle)));
      }
      stl.append("endloop\nendfacet\n");
    }
    Files.writeString(folder.resolve("inlet.stl"), stl.append("endsolid inlet\n"));
  }

  private static final String OF_MESH = "        centre: [0, 0, 0]\n        radius: 0.2 m\n";

  private static String onAMesh(String keys) {
    return ROUND.replace(
            "{disk: {centre: [0, 0, 0], normal: [1, 0, 0], radius: 0.2 m}}",
            "{mesh: {file: inlet.stl, unit: mm}}")
        + keys;
  }

  @Test
  void meshWithCentreAndRadiusIsASectionOfThatDisk() throws IOException {
    writePolygon(24);
    String csv = round(TraverseRule.LOG_LINEAR, 3, 4);

    assertEquals(rate(good(ROUND, csv)), rate(good(onAMesh(OF_MESH), csv)), 1e-15);
    ReadOutcome without = read(onAMesh(""), csv);
    assertEquals(
        List.of(ProblemKind.MISSING_KEY, ProblemKind.MISSING_KEY),
        without.problems().stream().map(Problem::kind).toList());
    ReadOutcome other = read(onAMesh(OF_MESH.replace("0.2 m", "0.25 m")), csv);
    assertEquals("case.yaml:15:17", other.problems().get(0).place().toString());
    assertTrue(other.problems().get(0).message().contains("is not the disk of this centre"));
    ReadOutcome needless = read(ROUND + OF_MESH, csv);
    assertTrue(needless.problems().get(0).message().contains("is for a mesh"));
  }

  @Test
  void exampleOfThePageIsInTheShippedCase() throws IOException {
    String page = Files.readString(Path.of("docs", "case-format.md"));
    int start = page.indexOf("```yaml part\n") + "```yaml part\n".length();
    String example = page.substring(start, page.indexOf("```", start));
    String shipped = Files.readString(Path.of("cases", "duct-junction-traverses.yaml"));

    assertTrue(example.lines().count() > 10);
    assertTrue(shipped.contains(example), example);
  }

  /**
   * A way to break a good traverse: a text of the case or of the readings, and what stands there.
   */
  private record Fault(
      String name, String found, String replacement, ProblemKind kind, String at, String said) {
    @Override
    public String toString() {
      return name;
    }
  }

  private static Fault fault(
      String name, String found, String replacement, ProblemKind kind, String at, String said) {
    return new Fault(name, found, replacement, kind, at, said);
  }

  /** Of {@link #ROUND} with three readings on each of four radii. */
  static List<Fault> faultsOfARoundSection() {
    ProblemKind value = ProblemKind.WRONG_VALUE;
    return List.of(
        fault(
            "outside",
            "187.160,0.000",
            "207.160,0.000",
            value,
            "readings.csv:4:1",
            "outside the section of radius 0.2 m"),
        fault(
            "off its place",
            "146.040,90.000",
            "149.040,90.000",
            value,
            "readings.csv:6:16",
            "it is off by 0.003 m, and 0.002 m is allowed"),
        fault(
            "off near the wall",
            "187.160,90.000",
            "188.160,90.000",
            value,
            "readings.csv:7:16",
            "off by 0.001 m, and 0.000642 m is allowed"),
        fault(
            "one missing",
            "146.040,90.000,",
            "¤146.040,90.000,",
            value,
            "readings.csv:5:15",
            "no reading at 0.146 m from the centre (0.7302 of the radius) on the radius at 90 deg"),
        fault(
            "empty cell",
            "187.160,180.000,6.755",
            "187.160,180.000,¤",
            value,
            "readings.csv:10:17",
            "no reading here"),
        fault(
            "radius off its angle",
            ",90.000",
            ",100.000",
            value,
            "readings.csv:5:16",
            "this one stands at 90 deg"),
        fault(
            "unit that does not convert",
            "speed (m/s)",
            "speed (kg)",
            ProblemKind.DIMENSION,
            "readings.csv:1:20",
            "the column `speed` must be in"),
        fault(
            "unit left out",
            "speed (m/s)",
            "speed",
            ProblemKind.UNIT,
            "readings.csv:1:20",
            "write its unit in parentheses"),
        fault(
            "place in seconds",
            "r (mm)",
            "r (s)",
            ProblemKind.DIMENSION,
            "readings.csv:1:1",
            "the column `r` must be in"),
        fault(
            "no such column",
            "speed: speed",
            "speed: sped",
            ProblemKind.UNKNOWN_NAME,
            "case.yaml:12:16",
            "did you mean `speed`"),
        fault(
            "not a number",
            "71.720,90.000,",
            "71.720,90.000,x",
            value,
            "readings.csv:5:15",
            "is not a number"),
        fault(
            "decimal commas between commas",
            "146.040,90.000",
            "146,040,90.000",
            ProblemKind.SYNTAX,
            "readings.csv:6:16",
            "semicolons between its cells"),
        fault(
            "negative uncertainty",
            "± 2 %",
            "± -2 %",
            ProblemKind.UNCERTAINTY,
            "case.yaml:13:24",
            "above zero without a sign"),
        fault(
            "two speeds",
            "speed: speed",
            "speed: speed\n        components: [r, r, r]",
            value,
            "case.yaml:9:9",
            "speed and components"),
        fault(
            "none",
            "        speed: speed\n",
            "",
            ProblemKind.MISSING_KEY,
            "case.yaml:9:9",
            "here is none"),
        fault(
            "no such rule",
            "log-linear",
            "log-liner",
            value,
            "case.yaml:9:15",
            "did you mean `log-linear`"),
        fault(
            "places of a rectangle",
            "angle: angle",
            "up: angle",
            value,
            "case.yaml:11:14",
            "{across: COLUMN, up: COLUMN}"),
        fault(
            "no such file",
            "readings.csv",
            "reading.csv",
            ProblemKind.FILE_UNREADABLE,
            "case.yaml:10:19",
            "there is no file"),
        fault(
            "ring",
            "radius: 0.2 m",
            "radius: 0.2 m, hole: 0.1 m",
            value,
            "case.yaml:9:9",
            "a traverse stands over a whole disk"),
        fault(
            "mass without density",
            "quantity: volume",
            "quantity: mass",
            ProblemKind.DIMENSION,
            "readings.csv:1:20",
            "must be in"));
  }

  @ParameterizedTest
  @MethodSource("faultsOfARoundSection")
  void faultOfARoundTraverseIsToldOnceAtItsPlace(Fault fault) throws IOException {
    assertTold(ROUND, round(TraverseRule.LOG_LINEAR, 3, 4), fault);
  }

  /** Of {@link #SQUARE} with five by five readings. */
  static List<Fault> faultsOfARectangle() {
    ProblemKind value = ProblemKind.WRONG_VALUE;
    return List.of(
        fault(
            "outside",
            "44.146,29.430,",
            "44.146,429.430,",
            value,
            "readings.csv:2:1",
            "outside the section of 0.6 m by 0.4 m"),
        fault(
            "off its place",
            "172.721,29.430",
            "176.721,29.430",
            value,
            "readings.csv:3:16",
            "off by 0.004 m, and 0.003 m is allowed"),
        fault(
            "one missing",
            "300.000,200.000,",
            "¤300.000,200.000,",
            value,
            "readings.csv",
            "no reading at 0.3 m along the first edge and 0.2 m along the second"),
        fault(
            "empty cell",
            "300.000,200.000,10.000000000",
            "300.000,200.000,",
            value,
            "readings.csv:14:17",
            "no reading here"),
        fault(
            "places of a disk",
            "{across: across, up: up}",
            "{radius: across, angle: up}",
            value,
            "case.yaml:11:14",
            "{across: COLUMN, up: COLUMN}"),
        fault(
            "rule of disks",
            "log-tchebycheff",
            "log-linear",
            value,
            "readings.csv",
            "no set for rectangles"));
  }

  @ParameterizedTest
  @MethodSource("faultsOfARectangle")
  void faultOfARectangularTraverseIsToldOnceAtItsPlace(Fault fault) throws IOException {
    assertTold(SQUARE, square(TraverseRule.LOG_TCHEBYCHEFF, 5, 5), fault);
  }

  @Test
  void wrongCountIsRefusedWithThoseThatTheRuleHas() throws IOException {
    ReadOutcome six = read(ROUND, round(TraverseRule.EQUAL_AREA, 6, 4));
    assertEquals(1, six.problems().size(), () -> CaseTexts.problems(six));
    assertTrue(
        six.problems().get(0).message().contains("`log-linear` has 3 to 5 readings on a radius"));
    ReadOutcome four = read(SQUARE, square(TraverseRule.EQUAL_AREA, 4, 4));
    assertTrue(
        four.problems().get(0).message().contains("5 to 7 readings along each side; here are 16"));
    ReadOutcome one = read(ROUND, round(TraverseRule.LOG_LINEAR, 5, 1));
    assertTrue(one.problems().get(0).message().contains("here is one radius"));
  }

  private void assertTold(String yaml, String csv, Fault fault) throws IOException {
    boolean line = fault.replacement().startsWith("¤");
    String broken = csv;
    if (line) {
      int start = csv.indexOf(fault.found());
      broken = csv.substring(0, start) + csv.substring(csv.indexOf('\n', start) + 1);
    } else if (csv.contains(fault.found())) {
      int end = csv.indexOf(fault.found()) + fault.found().length();
      String rest = csv.substring(end);
      boolean empty = fault.replacement().endsWith("¤");
      broken =
          fault.name().equals("radius off its angle")
              ? csv.replace(fault.found(), fault.replacement())
              : csv.substring(0, end - fault.found().length())
                  + fault.replacement().replace("¤", "")
                  + (empty ? rest.substring(rest.indexOf('\n')) : rest);
    }
    boolean inCase = broken.equals(csv);
    assertTrue(!inCase || yaml.contains(fault.found()), "nothing was broken");
    ReadOutcome outcome =
        read(inCase ? yaml.replace(fault.found(), fault.replacement()) : yaml, broken);

    List<Problem> problems = outcome.problems();
    assertEquals(1, problems.size(), () -> CaseTexts.problems(outcome));
    assertEquals(fault.kind(), problems.get(0).kind(), problems.get(0).toString());
    assertTrue(problems.get(0).message().contains(fault.said()), problems.get(0).toString());
    assertEquals(fault.at(), problems.get(0).place().toString(), problems.get(0).toString());
    assertEquals(Optional.empty(), outcome.found());
  }
}
