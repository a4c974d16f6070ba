package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.stream.Collectors;
import org.hullsum.expression.Expression;
import org.hullsum.model.Case;
import org.hullsum.model.Envelope;
import org.hullsum.model.Facing;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.Input;
import org.hullsum.model.Inputs;
import org.hullsum.model.InteriorTerm;
import org.hullsum.model.Patch;
import org.hullsum.model.Volume;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Problem;
import org.hullsum.problem.ProblemKind;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What the parts of a case become. */
class CaseReaderTest {
  private static final double ROUNDING = 1e-14;

  private static Case of(String parts) {
    return CaseTexts.good(CaseTexts.completed(parts));
  }

  private static Problem problem(String parts) {
    ReadOutcome outcome = CaseTexts.read(CaseTexts.completed(parts));
    assertEquals(1, outcome.problems().size(), () -> CaseTexts.problems(outcome));
    return outcome.problems().get(0);
  }

  private static double value(Case found, String input) {
    return found.inputs().all().get(input).value();
  }

  private static Patch patch(Case found, String name) {
    return found.patches().stream().filter(p -> p.name().equals(name)).findFirst().orElseThrow();
  }

  private static Map<String, Volume> volumes(Case found) {
    return found.volumes().stream().collect(Collectors.toMap(Volume::name, v -> v));
  }

  @Test
  void digestIsThatOfTheBytesOfTheFile() throws NoSuchAlgorithmException {
    String text = CaseTexts.goodCase();
    byte[] digest =
        MessageDigest.getInstance("SHA-256").digest(text.getBytes(StandardCharsets.UTF_8));

    assertEquals(
        List.of(new Case.SourceFile(CaseTexts.NAME, HexFormat.of().formatHex(digest))),
        CaseTexts.good(text).sources());
  }

  @Test
  void parametersAreDefinedByOneAnotherInAnyOrder() {
    Case found =
        of(
            """
            parameters:
              c: a + b
              b: 2*a
              a: 3 mm ± 1 mm (k=2)
              d: 5
            """);

    assertEquals(0.009, value(found, "c"), ROUNDING);
    assertEquals(0.0005, found.inputs().all().get("a").standardUncertainty(), ROUNDING);
    assertTrue(found.inputs().all().get("c").definition().isPresent());
    assertTrue(found.inputs().all().get("d").definition().isEmpty());
    assertEquals(0, found.inputs().all().get("b").standardUncertainty());
  }

  @Test
  void workingUnitsHoldForEveryNumber() {
    Case found =
        of(
            """
            units: {length: mm, time: h}
            parameters: {a: 2, b: 3 m, q: 1 m3/h, T: 20 degC}
            tolerances: {absolute: 1 m3/h}
            """);

    assertEquals(2, value(found, "a"));
    assertEquals(3000, value(found, "b"), 1e-9);
    assertEquals(1e9, value(found, "q"), 1e-3);
    assertEquals(293.15, value(found, "T"), 1e-12);
    assertEquals(1e9, found.volumes().get(0).tolerances().absolute().getAsDouble(), 1e-3);
  }

  @Test
  void overrideStandsInThePlaceOfAParameter() {
    String text = CaseTexts.completed("parameters: {a: 1 m, b: 2*a}\n");
    ReadOptions options =
        new ReadOptions(CaseTexts.NAME, Map.of("a", "5 m ± 1 cm (k=1)"), List.of(), 1);
    Case found = CaseTexts.read(text, options).found().orElseThrow();

    assertEquals(5, value(found, "a"));
    assertEquals(10, value(found, "b"));
    assertEquals(0.01, found.inputs().all().get("a").standardUncertainty(), ROUNDING);
  }

  @Test
  void overrideOfNoParameterIsReportedWithTheNearest() {
    ReadOptions options = new ReadOptions(CaseTexts.NAME, Map.of("radus", "5 m"), List.of(), 1);
    List<Problem> problems = CaseTexts.read(CaseTexts.goodCase(), options).problems();

    assertEquals(1, problems.size());
    assertEquals(ProblemKind.UNKNOWN_NAME, problems.get(0).kind());
    assertEquals("--set radus", problems.get(0).place().file());
    assertTrue(problems.get(0).message().contains("did you mean `radius`"));
  }

  @Test
  void overrideThatIsNoQuantityIsReportedAtItsOwnPlace() {
    ReadOptions options = new ReadOptions(CaseTexts.NAME, Map.of("radius", "5 mtr"), List.of(), 1);
    List<Problem> problems = CaseTexts.read(CaseTexts.goodCase(), options).problems();

    assertEquals("--set radius:1:3", problems.get(0).place().toString());
  }

  @Test
  void bareNumberAloneIsInTheStatedUnit() {
    Case found =
        of(
            """
            fields:
              f: {vector: [3.6, -7.2, 0], unit: km/h}
            """);

    assertEquals(Expression.number(1.0), found.fields().get("f").cartesian().x());
    assertEquals(Expression.number(-2.0), found.fields().get("f").cartesian().y());
  }

  @Test
  void bareNumberInASumIsAskedForWhereTheUnitsDiffer() {
    String parts =
        """
            parameters: {w: 1 m/s}
            fields:
              f: {vector: [w + 36, 0, 0], unit: km/h}
            """;
    Problem problem = problem(parts);

    assertEquals(ProblemKind.DIMENSION, problem.kind());
    assertTrue(problem.message().contains("129.6 km/h"), problem::message);
    assertTrue(problem.message().contains("36.0 km/h"), problem::message);
    assertEquals("case.yaml:7:20", problem.place().toString());
    of(parts.replace("km/h", "m/s"));
    of(parts.replace("36", "0"));
    of(parts.replace("w + 36", "w*36"));
  }

  @Test
  void inlineFiguresAreInputsOfTheirOwnNames() {
    Case found =
        of(
            """
            patches:
              feed: {flux: {metered: 36 m3/h ± 3.6 m3/h (k=2), times: 1.01 ± 1 % (k=1)}}
              drain: {flux: {metered: 7.2 m3/h}, claim: 1 L/s ± 10 % (95 %)}
            """);

    Input feed = found.inputs().all().get("feed metered");
    assertEquals(0.01, feed.value(), ROUNDING);
    assertEquals(0.0005, feed.standardUncertainty(), ROUNDING);
    assertTrue(feed.inline());
    assertEquals("case.yaml:4:26", feed.place().toString());
    assertEquals(0.0101, found.inputs().all().get("feed times").standardUncertainty(), ROUNDING);
    assertEquals(
        new FluxStatement.Metered(Expression.symbol("feed metered"), false),
        patch(found, "feed").fluxes().get(0).statement());
    assertEquals(0.001, value(found, "drain claim"), ROUNDING);
    assertTrue(
        found.notes().stream().anyMatch(n -> n.contains("`drain`") && n.contains("exact")),
        found.notes()::toString);
    assertTrue(found.notes().stream().noneMatch(n -> n.contains("`feed`")));
  }

  @Test
  void meteredFigureMayBeAFormulaOfParameters() {
    Case found =
        of(
            """
            parameters: {q: 3 L/s ± 1 % (k=1)}
            patches:
              a: {flux: {metered: q}}
              b: {flux: {metered: 2*q}}
            """);

    assertEquals(
        new FluxStatement.Metered(Expression.symbol("q"), false),
        patch(found, "a").fluxes().get(0).statement());
    assertEquals(1, found.inputs().all().size());
    assertEquals(List.of(), found.notes());
  }

  @Test
  void correlationsAreBetweenTheInputsAndOnce() {
    Case found =
        of(
            """
            uncertainties: k=1
            patches:
              a: {flux: {metered: 1 L/s ± 1 %, correlated-with: {b: 0.5}}}
              b: {flux: {metered: 1 L/s ± 1 %}}
            """);

    assertEquals(
        List.of(new Inputs.Correlation("a metered", "b metered", 0.5)),
        found.inputs().correlations());
  }

  @Test
  void correlationStatedFromBothSidesIsRefused() {
    Problem problem =
        problem(
            """
            uncertainties: k=1
            patches:
              a: {flux: {metered: 1 L/s ± 1 %, correlated-with: {b: 0.5}}}
              b: {flux: {metered: 1 L/s ± 1 %, correlated-with: {a: 0.5}}}
            """);

    assertTrue(problem.message().contains("stated already"), problem::message);
  }

  @Test
  void correlationsThatContradictOneAnotherAreRefused() {
    Problem problem =
        problem(
            """
            uncertainties: k=1
            patches:
              a: {flux: {metered: 1 L/s ± 1 %, correlated-with: {b: 0.9, c: 0.9}}}
              b: {flux: {metered: 1 L/s ± 1 %, correlated-with: {c: -0.9}}}
              c: {flux: {metered: 1 L/s ± 1 %}}
            """);

    assertTrue(problem.message().contains("negative variance"), problem::message);
  }

  @Test
  void withoutVolumesThereIsOneAndPatchesLeaveIt() {
    Case found =
        of(
            """
            patches:
              a: {flux: none}
              b: {enters: volume, flux: unknown}
            """);

    assertEquals(List.of("volume"), found.volumes().stream().map(Volume::name).toList());
    assertEquals("volume", patch(found, "a").leaves());
    assertEquals(Volume.SURROUNDINGS, patch(found, "a").enters());
    assertEquals(Volume.SURROUNDINGS, patch(found, "b").leaves());
    assertEquals("volume", patch(found, "b").enters());
    assertEquals(new FluxStatement.Unknown(), patch(found, "b").fluxes().get(0).statement());
  }

  @Test
  void patchesMayBoundNothing() {
    Case found =
        of(
            """
            volumes: none
            patches:
              a: {flux: none}
            """);

    assertEquals(List.of(), found.volumes());
    assertEquals(Volume.SURROUNDINGS, patch(found, "a").leaves());
  }

  @Test
  void facingsAreReadInAllTheirForms() {
    String disk = "surface: {disk: {centre: [0, 0, 0], normal: [0, 0, 1], radius: 1}}, flux: none";
    Case found =
        of(
            """
            patches:
              a: {%1$s}
              b: {%1$s, facing: reversed}
              c: {%1$s, facing: upward}
              d: {%1$s, facing: downward}
              e: {%1$s, facing: {along: [0, 2, 0]}}
              f: {%1$s, facing: {away-from: [1 m, 0, 2]}}
            """
                .replace("%1$s", disk));

    assertEquals(
        List.of(
            new Facing.AsDrawn(),
            new Facing.Reversed(),
            new Facing.Along(Vector3.Z, "upward"),
            new Facing.Along(Vector3.Z.negated(), "downward"),
            new Facing.Along(new Vector3(0, 2, 0), "along [0.0, 2.0, 0.0]"),
            new Facing.AwayFrom(new Vector3(1, 0, 2), "away-from [1.0, 0.0, 2.0]")),
        found.patches().stream().map(Patch::facing).toList());
  }

  @Test
  void interiorsAreReadInAllTheirForms() {
    Case found =
        of(
            """
            uncertainties: k=1
            fields:
              f: {vector: [1, 0, 0], unit: m/s}
            time: 2 s
            volumes:
              a: {interior: {divergence-of: f}}
              b: {interior: [{generation: 1 L/s ± 1 %}, {accumulation: 2 L/s}]}
              c: {interior: {accumulation: {per-volume: "0.1*t", unit: '1'}}}
              d:
            patches:
              p: {leaves: a, enters: b, flux: none}
            """);
    Map<String, Volume> volumes = volumes(found);

    assertTrue(volumes.get("a").interior().get(0) instanceof InteriorTerm.DivergenceOf);
    assertEquals(
        List.of(Expression.symbol("b generation"), Expression.symbol("b accumulation")),
        List.of(
            ((InteriorTerm.Generation) volumes.get("b").interior().get(0)).rate(),
            ((InteriorTerm.Accumulation) volumes.get("b").interior().get(1)).rate()));
    assertTrue(volumes.get("c").interior().get(0) instanceof InteriorTerm.AccumulationPerVolume);
    assertEquals(List.of(), volumes.get("d").interior());
    assertEquals(List.of(2.0), found.schedule().instants());
  }

  @Test
  void tolerancesOfAVolumeReplaceThoseOfTheCaseButForItsCoverage() {
    Case found =
        of(
            """
            tolerances: {absolute: 1 L/s, relative: 0.5 %, coverage: 99 %}
            volumes:
              a: {tolerances: {relative: 1 %}}
              b: {}
            envelopes:
              both: [a, b]
              one: {of: [a], tolerances: {coverage: 90 %}, label: One}
            patches:
              p: {leaves: a, enters: b, flux: none}
            """);
    Map<String, Volume> volumes = volumes(found);

    assertEquals(OptionalDouble.empty(), volumes.get("a").tolerances().absolute());
    assertEquals(0.01, volumes.get("a").tolerances().relative().getAsDouble(), ROUNDING);
    assertEquals(0.99, volumes.get("a").tolerances().coverage(), ROUNDING);
    assertEquals(0.001, volumes.get("b").tolerances().absolute().getAsDouble(), ROUNDING);
    Envelope both = found.envelopes().get(0);
    assertEquals(List.of("a", "b"), both.volumes());
    assertEquals(0.005, both.tolerances().relative().getAsDouble(), ROUNDING);
    assertEquals(0.9, found.envelopes().get(1).tolerances().coverage(), ROUNDING);
  }

  @Test
  void intervalOfTimeHasOneInstantMoreThanSteps() {
    Case found = of("time: {from: 0 s, to: 1 min, steps: 120}\n");

    assertTrue(found.schedule().span());
    assertEquals(121, found.schedule().instants().size());
    assertEquals(0.5, found.schedule().instants().get(1), ROUNDING);
    assertEquals(60, found.schedule().instants().get(120));
  }

  @Test
  void formulaOfTimeNeedsATime() {
    String parts =
        """
            fields:
              f: {vector: ["(1 m/s2)*t", 0, 0], unit: m/s}
            """;
    Problem problem = problem(parts);

    assertEquals(ProblemKind.MISSING_KEY, problem.kind());
    assertTrue(problem.message().contains("`time`"));
    of(parts + "time: 1 s\n");
  }

  @Test
  void withoutUnitsEveryNumberIsPlain() {
    Case found =
        of(
            """
            units: none
            parameters: {a: 2, b: 90 deg}
            fields:
              f: {vector: ["a*x + sin(y)", t, 0]}
            time: 3
            volumes:
              v: {interior: {generation: {per-volume: x}}}
            patches:
              p: {surface: {disk: {centre: [0, 0, 0], normal: [0, 0, 1], radius: a, sector: [0, b]}}, flux: {flux-density: x}}
            """);

    assertTrue(found.working().none());
    assertEquals("1", found.quantity().rateUnit().code());
    assertEquals(Math.PI / 2, value(found, "b"), ROUNDING);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = ';',
      value = {
        "units: none; quantity: volume; WRONG_VALUE",
        "units: none; fields: {f: {vector: [1, 0, 0], unit: m/s}}; UNIT",
        "units: none; parameters: {a: 3 m}; UNIT",
        "units: {length: degC}; title: t; DIMENSION",
        "units: {temperature: degC}; title: t; UNIT",
        "units: SI; title: t; WRONG_VALUE"
      })
  void unitsThatDoNotFitAreRefused(String units, String other, ProblemKind kind) {
    assertEquals(kind, problem(units + "\n" + other + "\n").kind());
  }

  @Test
  void ownQuantityIsReportedInItsOwnUnit() {
    Case found = of("quantity: {name: salt, unit: t/h}\n");

    assertEquals("salt", found.quantity().name());
    assertEquals(3.6, found.quantity().reportedPerWorking(found.working()), ROUNDING);
  }

  @Test
  void gallonsAreNotedOnce() {
    Case found =
        of(
            """
            patches:
              a: {flux: {metered: 5 gal/min ± 1 % (k=2)}}
              b: {flux: {metered: 6 gal/min ± 1 % (k=2)}}
            """);

    assertEquals(1, found.notes().size(), found.notes()::toString);
    assertTrue(found.notes().get(0).contains("US"), found.notes()::toString);
  }

  @Test
  void boundsOfAFlowAreInWorkingUnits() {
    Case found =
        of(
            """
            patches:
              a: {flux: {unknown: true, within: [-1 L/s, 36 m3/h]}}
            """);

    assertEquals(
        new Interval(-0.001, 0.01), patch(found, "a").fluxes().get(0).within().orElseThrow());
  }

  @Test
  void commentThatCutsATitleIsWarnedOf() {
    Case found = of("title: Tank #3\n");

    assertEquals("Tank", found.title().orElseThrow());
    assertEquals(ProblemKind.SUSPICIOUS, found.warnings().get(0).kind());
    assertEquals("case.yaml:5:13", found.warnings().get(0).place().toString());
    assertEquals(List.of(), of("title: Tank   # a remark of its own\n").warnings());
  }

  @Test
  void keyThatBecameTextIsWarnedOf() {
    Case found =
        of(
            """
            about: The tank
              quantity:mass
            """);

    assertEquals(ProblemKind.SUSPICIOUS, found.warnings().get(0).kind());
    assertTrue(found.warnings().get(0).message().contains("`quantity:`"));
    assertEquals("case.yaml:6:3", found.warnings().get(0).place().toString());
  }

  @Test
  void dimensionlessFactorLeavesTheStatementItsDimension() {
    assertEquals(
        ProblemKind.DIMENSION,
        problem(
                """
            patches:
              a: {flux: {metered: 1 kg/s ± 1 % (k=2), times: 98 %}}
            """)
            .kind());
    of(
        """
            patches:
              a: {flux: {metered: 1 kg/s ± 1 % (k=2), times: 1e-3 m3/kg}}
            """);
  }
}
