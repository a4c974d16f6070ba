package org.hullsum.audit;

import static org.hullsum.audit.BalanceFixture.drawn;
import static org.hullsum.audit.BalanceFixture.integrated;
import static org.hullsum.audit.BalanceFixture.metered;
import static org.hullsum.audit.BalanceFixture.open;
import static org.hullsum.audit.BalanceFixture.volume;
import static org.hullsum.model.Volume.SURROUNDINGS;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.audit.Explanation.Kind;
import org.junit.jupiter.api.Test;

class ExplainerTest {
  private static Clues inward(Set<String> inward, Set<String> surfaced) {
    return new Clues(inward, surfaced, List.of(), Set.of(), Set.of(), Map.of(), Map.of(), Map.of());
  }

  private static List<Explanation> explain(Clues clues, Balance... balances) {
    return new Explainer(clues, BalanceFixture.EXACT).explain(List.of(balances)).explanations();
  }

  @Test
  void reversedPatchIsFirstAndLeavesMinusTwiceItsFlux() {
    Balance balance =
        drawn(
            volume("tank"),
            integrated("a", "tank", SURROUNDINGS, 5),
            integrated("b", "tank", SURROUNDINGS, 3),
            integrated("c", "tank", SURROUNDINGS, -2));
    List<Explanation> explanations = explain(inward(Set.of("b"), Set.of("a", "b", "c")), balance);
    assertEquals(1, explanations.size());
    Explanation first = explanations.get(0);
    assertEquals(Kind.REVERSED, first.kind());
    assertEquals(List.of("b"), first.on());
    assertEquals(Optional.of(6.0), first.residualNow());
    assertEquals(0, first.residualThen(), 1e-15);
    assertEquals(1, first.explained(), 1e-15);
    assertTrue(first.fits());
  }

  @Test
  void twoReversedPatchesAreExplainedTogether() {
    Balance balance =
        drawn(
            volume("tank"),
            integrated("a", "tank", SURROUNDINGS, 5),
            integrated("b", "tank", SURROUNDINGS, 3),
            integrated("c", "tank", SURROUNDINGS, 2));
    List<Explanation> explanations =
        explain(inward(Set.of("b", "c"), Set.of("a", "b", "c")), balance);
    assertEquals(List.of("b", "c"), explanations.get(0).on());
    assertEquals(0, explanations.get(0).residualThen(), 1e-15);
    assertEquals(3, explanations.size());
  }

  @Test
  void meteredPatchesAreReversedAndCountedTwiceFreely() {
    Balance balance =
        drawn(
            volume("tank"),
            metered("feed", SURROUNDINGS, "tank", 10),
            metered("drain", "tank", SURROUNDINGS, 10),
            metered("bleed", "tank", SURROUNDINGS, 4));
    Explainer.Explanations told =
        new Explainer(Clues.NONE, BalanceFixture.EXACT).explain(List.of(balance));
    Explanation first = told.explanations().get(0);
    assertEquals(Kind.COUNTED_TWICE, first.kind());
    assertEquals(List.of("bleed"), first.on());
    // Of six hypotheses two change the residual of 4 by between 2 and 8.
    assertEquals(2 * 2 * balance.halfWidth() / (3 * 4), told.fitByChance().orElseThrow(), 1e-20);
  }

  @Test
  void patchesWithSurfacesVetoFreeHypotheses() {
    Balance balance =
        drawn(
            volume("tank"),
            metered("feed", SURROUNDINGS, "tank", 10),
            integrated("drain", "tank", SURROUNDINGS, 14));
    List<Explanation> explanations = explain(inward(Set.of(), Set.of("feed", "drain")), balance);
    assertEquals(
        List.of(Kind.ONE_METER_BIAS, Kind.LEAK),
        explanations.stream().map(Explanation::kind).toList());
  }

  @Test
  void overlapAllowsCountedTwiceOfSurfaces() {
    Balance balance =
        drawn(
            volume("tank"),
            integrated("in", SURROUNDINGS, "tank", 10),
            integrated("out", "tank", SURROUNDINGS, 10),
            integrated("again", "tank", SURROUNDINGS, 10));
    Clues clues =
        new Clues(
            Set.of(),
            Set.of("in", "out", "again"),
            List.of(new Clues.Overlap("out", "again")),
            Set.of(),
            Set.of(),
            Map.of(),
            Map.of(),
            Map.of());
    List<Explanation> explanations = explain(clues, balance);
    assertEquals(2, explanations.size());
    assertEquals(List.of(1), explanations.get(0).tiedWith());
    assertEquals(List.of(0), explanations.get(1).tiedWith());
    assertEquals(Kind.COUNTED_TWICE, explanations.get(0).kind());
  }

  @Test
  void forgottenNozzleOfAnotherVolumeIsLeftOut() {
    Balance balance =
        drawn(
            volume("tank"),
            metered("feed", SURROUNDINGS, "tank", 10),
            metered("drain", "tank", SURROUNDINGS, 7),
            metered("vent", SURROUNDINGS, "sump", 3));
    Clues clues =
        new Clues(
            Set.of(), Set.of(), List.of(), Set.of(), Set.of("tank"), Map.of(), Map.of(), Map.of());
    Explanation first = explain(clues, balance).get(0);
    assertEquals(Kind.LEFT_OUT, first.kind());
    assertEquals(List.of("vent"), first.on());
    assertEquals(0, first.residualThen(), 1e-15);
    assertTrue(explain(Clues.NONE, balance).stream().noneMatch(e -> e.kind() == Kind.LEFT_OUT));
  }

  @Test
  void fieldThatMakesTheResidualIsNamed() {
    InteriorRate makes =
        new InteriorRate(
            "tank",
            "divergence",
            Optional.of(new Estimate(2, 1e-9, Map.of())),
            2,
            true,
            "cones",
            Optional.of("2*lift"),
            Optional.empty());
    Balance balance =
        new BalanceBuilder(
                volume("tank"),
                List.of(
                    integrated("in", SURROUNDINGS, "tank", 10),
                    integrated("out", "tank", SURROUNDINGS, 12)),
                BalanceFixture.EXACT,
                BalanceFixture.NAMES)
            .beside(makes)
            .draw();
    Clues clues =
        new Clues(
            Set.of(),
            Set.of("in", "out"),
            List.of(),
            Set.of(),
            Set.of(),
            Map.of(),
            Map.of("tank", List.of("flow")),
            Map.of());
    Explanation first = explain(clues, balance).get(0);
    assertEquals(Kind.FIELD_MAKES_SOURCE, first.kind());
    assertEquals(List.of("flow"), first.on());
    assertTrue(first.fits());
  }

  @Test
  void gapWithItsPlaneFluxIsOfferedOnAnOpenSurface() {
    Balance balance =
        drawn(
            open("tank"),
            integrated("in", SURROUNDINGS, "tank", 10),
            integrated("out", "tank", SURROUNDINGS, 8));
    Clues clues =
        new Clues(
            Set.of(),
            Set.of("in", "out"),
            List.of(),
            Set.of("tank"),
            Set.of(),
            Map.of(
                "tank",
                new Clues.Gap(
                    "0.25 m2 around (1, 2, 3) m",
                    0.25,
                    List.of("out"),
                    Optional.of(2.0),
                    Optional.of(0.0),
                    0)),
            Map.of(),
            Map.of());
    Explanation first = explain(clues, balance).get(0);
    assertEquals(Kind.GAP, first.kind());
    assertEquals(Optional.of(0.25), first.factor());
    assertTrue(first.message().contains("(1, 2, 3)"), first.message());
  }

  @Test
  void classesComeBeforeFits() {
    Balance balance =
        drawn(
            volume("tank"),
            metered("feed", SURROUNDINGS, "tank", 10),
            metered("drain", "tank", SURROUNDINGS, 10),
            metered("bleed", "tank", SURROUNDINGS, 4),
            integrated("wall", "tank", SURROUNDINGS, 1));
    List<Explanation> explanations = explain(inward(Set.of("wall"), Set.of("wall")), balance);
    assertEquals(List.of("wall"), explanations.get(0).on());
    assertFalse(explanations.get(0).fits());
    assertEquals(3, explanations.get(0).residualThen(), 1e-15);
  }

  @Test
  void balancedBalanceIsNotExplained() {
    Explainer.Explanations told =
        new Explainer(Clues.NONE, BalanceFixture.EXACT)
            .explain(
                List.of(
                    drawn(
                        volume("tank"),
                        metered("feed", SURROUNDINGS, "tank", 10),
                        metered("drain", "tank", SURROUNDINGS, 10))));
    assertTrue(told.explanations().isEmpty());
    assertEquals(Optional.empty(), told.fitByChance());
  }
}
