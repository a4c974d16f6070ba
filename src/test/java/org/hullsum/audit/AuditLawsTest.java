package org.hullsum.audit;

import static org.hullsum.audit.Audits.audit;
import static org.hullsum.audit.Audits.finding;
import static org.hullsum.audit.Audits.only;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.hullsum.audit.Explanation.Kind;
import org.hullsum.model.Case;
import org.hullsum.problem.FindingCode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class AuditLawsTest {
  private static final List<String> FACES =
      List.of("left", "right", "front", "back", "floor", "lid");

  private static String random(Random random) {
    return String.format(
        Locale.ROOT,
        "%.3f + %.3f*x + %.3f*y*z + %.3f*sin(x + %.3f*y) + %.3f*z^2",
        random.nextGaussian(),
        random.nextGaussian(),
        random.nextGaussian(),
        random.nextGaussian(),
        random.nextGaussian(),
        random.nextGaussian());
  }

  private static BoxCase randomBox(Random random) {
    return new BoxCase().field(random(random), random(random), random(random));
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void turningOnePatchUnderARandomFieldIsTheFirstExplanation(long seed) {
    Random random = new Random(seed);
    for (String interior : List.of("{divergence-of: flow}", "")) {
      Case sound = Audits.text(randomBox(random).interior(interior).yaml());
      String patch = FACES.get(random.nextInt(FACES.size()));
      assertTurnedIsFoundAndFirst(sound, patch);
    }
  }

  /** r/3 about the centroid, which is the apex of the cones: both sides are the same integral. */
  @ParameterizedTest
  @ValueSource(strings = {"left", "right", "front", "back", "floor", "lid"})
  void turningOnePatchUnderTheRadialFieldAboutTheConesApexIsFound(String patch) {
    assertTurnedIsFoundAndFirst(
        Audits.text(new BoxCase().field("(x-1)/3", "(y-1.5)/3", "(z-0.5)/3").yaml()), patch);
  }

  private static void assertTurnedIsFoundAndFirst(Case sound, String patch) {
    CaseResult before = audit(sound);
    CaseResult after = audit(Audits.turned(sound, patch));
    assertTrue(finding(after, FindingCode.ORIENTATION_REVERSED, patch).isPresent(), patch);
    double flux =
        only(before).lines().stream()
            .filter(l -> l.patch().equals(patch))
            .findFirst()
            .flatMap(BalanceResult.Line::outward)
            .orElseThrow();
    double slack =
        only(before).numericalError().orElseThrow() + only(after).numericalError().orElseThrow();
    assertEquals(
        only(before).residual().orElseThrow() - 2 * flux,
        only(after).residual().orElseThrow(),
        slack);
    Explanation first = after.explanations().get(0);
    assertEquals(Kind.REVERSED, first.kind());
    assertEquals(List.of(patch), first.on());
    assertEquals(only(before).residual().orElseThrow(), first.residualThen(), slack);
  }

  @ParameterizedTest
  @ValueSource(longs = {11, 12, 13, 14, 15, 16})
  void fieldThatMakesMassFromNothingIsNeverCalledConserved(long seed) {
    Random random = new Random(seed);
    CaseResult result = randomBox(random).interior("").audit();
    BalanceResult balance = only(result);
    double makes = balance.divergence().flatMap(BalanceResult.Term::value).orElseThrow();
    assertNotEquals(Verdict.BALANCED, balance.verdict(), "" + makes);
    assertEquals(makes, balance.residual().orElseThrow(), 1e-7);
    assertEquals(Kind.FIELD_MAKES_SOURCE, result.explanations().get(0).kind());
  }

  /** Sources and sinks that cancel over the volume: closed as a sum, and still not free of them. */
  @Test
  void fieldWhoseSourcesCancelIsToldWhatItMakesAndDestroys() {
    BalanceResult balance = only(new BoxCase().field("(x-1)^2", "0", "0.1").interior("").audit());
    assertEquals(Verdict.BALANCED, balance.verdict());
    assertTrue(balance.reason().contains("makes and destroys"), balance.reason());
  }

  @ParameterizedTest
  @ValueSource(strings = {"left", "front", "lid"})
  void balanceWithAnUnknownFluxIsUndecidedAndSaysWhatWouldClose(String patch) {
    BoxCase box = new BoxCase().field("1", "0.2*y", "-0.2*z");
    double sound =
        only(box.audit()).lines().stream()
            .filter(l -> l.patch().equals(patch))
            .findFirst()
            .flatMap(BalanceResult.Line::outward)
            .orElseThrow();
    CaseResult result = box.patch(patch, "    flux: unknown\n").audit();
    BalanceResult balance = only(result);
    assertEquals(Verdict.UNDECIDED, balance.verdict());
    assertTrue(balance.residual().isEmpty());
    assertEquals(patch, balance.closedBy().orElseThrow().patch());
    assertEquals(sound, balance.closedBy().orElseThrow().value(), 1e-8);
    assertTrue(finding(result, FindingCode.FLUX_UNKNOWN, patch).isPresent());
  }

  @ParameterizedTest
  @CsvSource({"m, m3/s, 1", "mm, L/min, 60000", "cm, m3/h, 3600"})
  void sameCaseInOtherUnitsHasTheSameVerdict(String length, String unit, double factor) {
    String yaml =
        """
        format: hullsum-case/1
        quantity: {name: volume, unit: UNIT}
        units: {length: LENGTH}
        parameters:
          side: 2 m
          speed: 0.3 m/s ± 1 % (k=2)
        fields:
          flow:
            vector: ["speed*x/side", "0", "0"]
            unit: m/s
        volumes:
          cube: {}
        patches:
          in:
            leaves: cube
            surface:
              rectangle: {corner: [0 m, 0 m, 0 m], edges: [[0 m, 0 m, side], [0 m, side, 0 m]]}
            flux: {field: flow}
          out:
            leaves: cube
            surface:
              rectangle: {corner: [side, 0 m, 0 m], edges: [[0 m, side, 0 m], [0 m, 0 m, side]]}
            flux: {field: flow}
          sides:
            leaves: cube
            surface: {cylinder: {from: [0 m, 0 m, 0 m], to: [1 m, 0 m, 0 m], radius: 1 m}}
            flux: none
          supply:
            leaves: surroundings
            enters: cube
            flux: {metered: 4000 m3/h ± 60 m3/h (k=2)}
        """
            .replace("LENGTH", length)
            .replace("UNIT", unit);
    BalanceResult balance = only(audit(yaml));
    double residual = 0.3 * 4 - 4000.0 / 3600;
    double u = Math.hypot(0.3 * 0.005 * 4, 30.0 / 3600);
    assertEquals(residual * factor, balance.residual().orElseThrow(), 1e-9 * factor);
    assertEquals(u * factor, balance.standardUncertainty(), 1e-7 * factor);
    assertEquals(Verdict.IMBALANCED, balance.verdict());
    assertEquals(2, balance.budget().size());
  }

  @Test
  void splittingAPatchChangesNothing() {
    BoxCase whole = new BoxCase().field("x*x", "sin(y)", "x*z");
    BoxCase split =
        new BoxCase()
            .field("x*x", "sin(y)", "x*z")
            .surface("lid", "{rectangle: {corner: [0, 0, 1], edges: [[0.7, 0, 0], [0, 3, 0]]}}")
            .surface("rest", "{rectangle: {corner: [0.7, 0, 1], edges: [[1.3, 0, 0], [0, 3, 0]]}}");
    BalanceResult one = only(whole.audit());
    BalanceResult two = only(split.audit());
    assertEquals(one.outward().orElseThrow(), two.outward().orElseThrow(), 1e-8);
    assertEquals(one.throughput(), two.throughput(), 0.01 * one.throughput());
    assertEquals(one.verdict(), two.verdict());
  }

  @Test
  void everyPatchTurnedIsExplainedByAllTogether() {
    BoxCase box = new BoxCase();
    FACES.forEach(face -> box.patch(face, "    facing: reversed\n"));
    CaseResult result = box.audit();
    assertEquals(FACES, result.explanations().get(0).on());
    assertEquals(0, result.explanations().get(0).residualThen(), 1e-9);
    assertEquals(
        6,
        result.findings().stream()
            .filter(f -> f.code() == FindingCode.ORIENTATION_REVERSED)
            .count());
  }
}
