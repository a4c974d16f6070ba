package org.hullsum.audit;

import static org.hullsum.audit.BalanceFixture.EXACT;
import static org.hullsum.audit.BalanceFixture.NAMES;
import static org.hullsum.audit.BalanceFixture.drawn;
import static org.hullsum.audit.BalanceFixture.generation;
import static org.hullsum.audit.BalanceFixture.inputs;
import static org.hullsum.audit.BalanceFixture.integrated;
import static org.hullsum.audit.BalanceFixture.metered;
import static org.hullsum.audit.BalanceFixture.open;
import static org.hullsum.audit.BalanceFixture.subject;
import static org.hullsum.audit.BalanceFixture.uncertain;
import static org.hullsum.audit.BalanceFixture.unknown;
import static org.hullsum.audit.BalanceFixture.volume;
import static org.hullsum.model.Volume.SURROUNDINGS;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import org.hullsum.audit.BalanceResult.Rule;
import org.hullsum.model.Tolerances;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class BalanceBuilderTest {
  private static final PatchRate FEED = metered("feed", SURROUNDINGS, "tank", 10);
  private static final PatchRate DRAIN = metered("drain", "tank", SURROUNDINGS, 9.5);

  @Test
  void residualIsOutwardLessInterior() {
    BalanceResult result =
        new BalanceBuilder(volume("tank"), List.of(FEED, DRAIN), EXACT, NAMES)
            .interior(List.of(generation("tank", -0.3), generation("elsewhere", 7)))
            .draw()
            .result();
    assertEquals(-0.5, result.outward().orElseThrow(), 1e-15);
    assertEquals(-0.3, result.interior().orElseThrow(), 1e-15);
    assertEquals(-0.2, result.residual().orElseThrow(), 1e-15);
    assertEquals(Verdict.IMBALANCED, result.verdict());
    assertEquals(1, result.terms().size());
  }

  @Test
  void throughputIsHalfOfAllMagnitudes() {
    BalanceResult result =
        new BalanceBuilder(volume("tank"), List.of(FEED, DRAIN), EXACT, NAMES)
            .interior(List.of(generation("tank", -0.5)))
            .draw()
            .result();
    assertEquals(10, result.throughput(), 1e-15);
  }

  @Test
  void splittingAPatchChangesNeitherThroughputNorVerdict() {
    BalanceResult whole = drawn(volume("tank"), FEED, DRAIN).result();
    BalanceResult split =
        drawn(
                volume("tank"),
                metered("feed-a", SURROUNDINGS, "tank", 4),
                metered("feed-b", SURROUNDINGS, "tank", 6),
                DRAIN)
            .result();
    assertEquals(whole.throughput(), split.throughput(), 1e-14);
    assertEquals(whole.residual().orElseThrow(), split.residual().orElseThrow(), 1e-14);
    assertEquals(whole.verdict(), split.verdict());
  }

  @Test
  void bafflesAndInnerPatchesOfAnEnvelopeDoNotCount() {
    PatchRate baffle = metered("baffle", "tank", "tank", 100);
    PatchRate link = metered("link", "tank", "sump", 50);
    PatchRate out = metered("out", "sump", SURROUNDINGS, 10);
    BalanceResult result =
        drawn(subject("plant", Set.of("tank", "sump"), Tolerances.NONE), FEED, baffle, link, out)
            .result();
    assertEquals(10, result.throughput(), 1e-15);
    assertEquals(0, result.residual().orElseThrow(), 1e-15);
    assertEquals(
        List.of("feed", "out"), result.lines().stream().map(BalanceResult.Line::patch).toList());
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10})
  void envelopeIsTheSumOfItsVolumes(long seed) {
    Random random = new Random(seed);
    String[] places = {"a", "b", "c", SURROUNDINGS};
    PatchRate[] rates = new PatchRate[12];
    for (int i = 0; i < rates.length; i++) {
      rates[i] =
          metered(
              "p" + i, places[random.nextInt(4)], places[random.nextInt(4)], random.nextGaussian());
    }
    double sum = 0;
    for (String name : List.of("a", "b", "c")) {
      sum += drawn(volume(name), rates).result().residual().orElseThrow();
    }
    BalanceResult all =
        drawn(subject("all", Set.of("a", "b", "c"), Tolerances.NONE), rates).result();
    assertEquals(sum, all.residual().orElseThrow(), 1e-13);
  }

  @Test
  void unknownFluxIsUndecidedAndToldWhatWouldCloseIt() {
    BalanceResult leaving =
        drawn(volume("tank"), FEED, DRAIN, unknown("leak", "tank", SURROUNDINGS)).result();
    assertEquals(Verdict.UNDECIDED, leaving.verdict());
    assertEquals(Optional.empty(), leaving.residual());
    assertEquals(Optional.empty(), leaving.outward());
    assertEquals(new BalanceResult.Closing("leak", 0.5), leaving.closedBy().orElseThrow());
    BalanceResult entering =
        drawn(volume("tank"), FEED, DRAIN, unknown("make-up", SURROUNDINGS, "tank")).result();
    assertEquals(new BalanceResult.Closing("make-up", -0.5), entering.closedBy().orElseThrow());
  }

  @Test
  void twoUnknownFluxesAreClosedByNothing() {
    BalanceResult result =
        drawn(
                volume("tank"),
                FEED,
                unknown("a", "tank", SURROUNDINGS),
                unknown("b", "tank", SURROUNDINGS))
            .result();
    assertEquals(Verdict.UNDECIDED, result.verdict());
    assertEquals(Optional.empty(), result.closedBy());
  }

  @Test
  void unknownThatCancelsInAnEnvelopeLeavesItJudged() {
    BalanceResult result =
        drawn(
                subject("plant", Set.of("tank", "sump"), Tolerances.NONE),
                FEED,
                unknown("link", "tank", "sump"),
                metered("out", "sump", SURROUNDINGS, 10))
            .result();
    assertEquals(Verdict.BALANCED, result.verdict());
  }

  /** Feed 41.8 ± 0.3, 17.9 ± 0.134; out 55.4 ± 0.46, 3.72 ± 0.06; all m3/h, by hand. */
  @Test
  void meteredBalanceIsJudgedByItsUncertainty() {
    PatchRate[] rates = {
      uncertain("first", SURROUNDINGS, "tank", 41.8, "m1"),
      uncertain("second", SURROUNDINGS, "tank", 17.9, "m2"),
      uncertain("outfall", "tank", SURROUNDINGS, 55.4, "m3"),
      uncertain("recovery", "tank", SURROUNDINGS, 3.72, "m4")
    };
    BalanceResult result =
        new BalanceBuilder(
                volume("tank"),
                List.of(rates),
                inputs(Map.of("m1", 0.3, "m2", 0.13425, "m3", 0.4619, "m4", 0.06)),
                NAMES)
            .draw()
            .result();
    double u = Math.sqrt(0.3 * 0.3 + 0.13425 * 0.13425 + 0.4619 * 0.4619 + 0.06 * 0.06);
    assertEquals(-0.58, result.residual().orElseThrow(), 1e-12);
    assertEquals(u, result.standardUncertainty(), 1e-12);
    assertEquals(Rule.UNCERTAINTY, result.rule());
    assertEquals(Verdict.BALANCED, result.verdict());
    assertEquals("m3", result.budget().get(0).source());
    assertEquals(
        (1.959963984540054 + 1.6448536269514722) * u, result.detectable().orElseThrow(), 1e-9);
  }

  @Test
  void integralsOverAnOpenSurfaceAreUndecidedMetersAreNot() {
    PatchRate out = integrated("out", "tank", SURROUNDINGS, 10);
    BalanceResult fields = drawn(open("tank"), FEED, out).result();
    assertEquals(Verdict.UNDECIDED, fields.verdict());
    assertEquals(0, fields.residual().orElseThrow(), 1e-15);
    assertEquals(Verdict.IMBALANCED, drawn(open("tank"), FEED, DRAIN).result().verdict());
  }

  @Test
  void missingInteriorLeavesNoResidual() {
    InteriorRate missing =
        new InteriorRate(
            "tank",
            "divergence",
            Optional.empty(),
            0,
            true,
            "cones",
            Optional.empty(),
            Optional.of("the surface is open"));
    BalanceResult result =
        new BalanceBuilder(volume("tank"), List.of(FEED, DRAIN), EXACT, NAMES)
            .interior(List.of(missing))
            .draw()
            .result();
    assertEquals(Verdict.UNDECIDED, result.verdict());
    assertEquals("The surface is open.", result.reason());
    assertEquals(Optional.empty(), result.residual());
    assertEquals(Optional.empty(), result.interior());
    assertEquals(-0.5, result.outward().orElseThrow(), 1e-15);
  }

  @Test
  void balancedFieldThatMakesAndDestroysIsToldSo() {
    InteriorRate beside =
        new InteriorRate(
            "tank",
            "divergence",
            Optional.of(new Estimate(0, 1e-12, Map.of())),
            3,
            true,
            "cones",
            Optional.of("2*x"),
            Optional.empty());
    BalanceResult result =
        new BalanceBuilder(
                volume("tank"),
                List.of(
                    integrated("in", SURROUNDINGS, "tank", 10),
                    integrated("out", "tank", SURROUNDINGS, 10)),
                EXACT,
                NAMES)
            .beside(beside)
            .draw()
            .result();
    assertEquals(Verdict.BALANCED, result.verdict());
    assertTrue(result.reason().contains("makes and destroys more than is stated"), result.reason());
    assertEquals(10, result.throughput(), 1e-15);
  }
}
