package org.hullsum.audit;

import static org.hullsum.audit.Audits.audit;
import static org.hullsum.audit.Audits.balance;
import static org.hullsum.audit.Audits.finding;
import static org.hullsum.audit.Audits.only;
import static org.hullsum.audit.Audits.shipped;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import org.hullsum.audit.BalanceResult.Check;
import org.hullsum.audit.Explanation.Kind;
import org.hullsum.audit.PatchResult.FoundFacing;
import org.hullsum.model.Case;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class ShippedCasesTest {
  @ParameterizedTest
  @CsvSource({
    "stirred-tank, CONSERVATION",
    "conduction-block, CONSERVATION",
    "dished-vessel, IDENTITY",
    "elbow, CONSERVATION",
    "branch-on-shell, IDENTITY",
    "dosing-annulus, IDENTITY",
    "basin-and-sump, CONSERVATION",
    "brine-tank-metered, CONSERVATION",
    "duct-junction-traverses, CONSERVATION",
    "tidal-basin, CONSERVATION"
  })
  void soundCaseIsBalancedWithoutFinding(String name, Check check) {
    CaseResult result = audit(shipped(name));
    for (BalanceResult balance : result.balances()) {
      assertEquals(Verdict.BALANCED, balance.verdict(), balance.reason());
      assertEquals(check, balance.check());
    }
    assertFalse(result.hasError(), () -> result.findings().toString());
    assertTrue(result.explanations().isEmpty());
  }

  @Test
  void reversedMeterIsFirstAndLeavesTheOtherVolumeClosed() {
    CaseResult result = audit(shipped("brine-manifold-reversed-meter"));
    assertEquals(Verdict.IMBALANCED, balance(result, "manifold").verdict());
    assertEquals(Verdict.BALANCED, balance(result, "collector").verdict());
    Explanation first = result.explanations().get(0);
    assertEquals(Kind.REVERSED, first.kind());
    assertEquals(List.of("branch-2"), first.on());
    assertTrue(first.fits() && first.tiedWith().isEmpty());
    // A bias of the shared meter that closed the manifold would open the collector.
    assertTrue(result.explanations().stream().noneMatch(e -> e.on().contains("crossover")));
  }

  @Test
  void unitThatClosesTheDosingTankIsFirst() {
    Explanation first = audit(shipped("dosing-skid-unit-slip")).explanations().get(0);
    assertEquals(Kind.UNIT_SLIP, first.kind());
    assertEquals(List.of("dilution-water"), first.on());
    assertEquals(3.785411784, first.factor().orElseThrow(), 1e-9);
    assertTrue(first.message().contains("[gal_us]/min"), first.message());
    assertTrue(first.fits() && first.tiedWith().isEmpty());
  }

  @Test
  void imbalanceThatTheMetersCouldNotShowIsWithinItsUncertainty() {
    BalanceResult balance = only(audit(shipped("blowdown-looks-bad")));
    assertEquals(Verdict.BALANCED, balance.verdict());
    assertEquals(BalanceResult.Rule.UNCERTAINTY, balance.rule());
    // Rectangular limits: u = a/sqrt(3) (JCGM 100:2008, 4.3.7).
    double u = Math.sqrt((0.8 * 0.8 + 0.6 * 0.6 + 0.8 * 0.8 + 0.3 * 0.3) / 3);
    assertEquals(u, balance.standardUncertainty(), 1e-12);
    assertEquals(-0.9, balance.residual().orElseThrow(), 1e-12);
  }

  @Test
  void claimedInletFlowIsMissedThoughTheDuctBalances() {
    CaseResult result = audit(shipped("duct-claim"));
    assertEquals(Verdict.BALANCED, only(result).verdict());
    assertTrue(finding(result, FindingCode.CLAIM_MISSED, "inlet").isPresent());
    // Mean over centreline speed of a power-law profile, n = 7: 49/60.
    double area = Math.PI * 0.25 * 0.25;
    assertEquals(
        5.0 * 49 / 60 * area, result.patches().get(0).fluxes().get(0).value().orElseThrow(), 1e-8);
  }

  /** Means computed beforehand by another program when the readings were invented. */
  @Test
  void traversesOfTheJunctionGiveTheMeansOfTheirReadings() {
    CaseResult result = audit(shipped("duct-junction-traverses"));
    PatchResult extract = result.patches().get(0);
    PatchResult main = result.patches().get(2);
    assertEquals(9.464261928383694, extract.traverses().get(0).mean(), 1e-12);
    assertEquals(8.531659028019485, main.traverses().get(0).mean(), 1e-12);
    assertEquals(3600 * 1.1893142298343913, extract.fluxes().get(0).value().orElseThrow(), 1e-8);
    assertEquals("traverse", main.fluxes().get(0).basis());
    assertEquals(
        "main coefficient", only(result).budget().get(0).source(), result.balances().toString());
    // Turned, the traverse's flux turns; the fan's, metered, does not.
    CaseResult turned = audit(Audits.turned(shipped("duct-junction-traverses"), "main"));
    assertEquals(-8.531659028019485, turned.patches().get(2).traverses().get(0).mean(), 1e-12);
    assertEquals(
        -main.fluxes().get(0).value().orElseThrow(),
        turned.patches().get(2).fluxes().get(0).value().orElseThrow(),
        1e-9);
  }

  @Test
  void turnedConeIsFoundAndExplainsTheResidual() {
    CaseResult result = audit(shipped("vessel-reversed-patch"));
    assertEquals(Verdict.IMBALANCED, only(result).verdict());
    assertTrue(finding(result, FindingCode.ORIENTATION_REVERSED, "outlet-cone").isPresent());
    Explanation first = result.explanations().get(0);
    assertEquals(Kind.REVERSED, first.kind());
    assertEquals(List.of("outlet-cone"), first.on());
    assertTrue(first.fits());
  }

  @Test
  void forgottenNozzleIsLocatedByItsRim() {
    CaseResult result = audit(shipped("vessel-forgotten-nozzle"));
    assertEquals(Verdict.UNDECIDED, only(result).verdict());
    assertEquals(Optional.of(false), result.surfaces().get(0).closed());
    SurfaceResult.Gap gap = result.surfaces().get(0).gaps().get(0);
    assertEquals(0.3, gap.centre().x(), 1e-9);
    assertEquals(1.1, gap.centre().z(), 1e-9);
    assertEquals(Math.PI * 0.15 * 0.15, gap.area(), 1e-9);
    Explanation first = result.explanations().get(0);
    assertEquals(Kind.GAP, first.kind());
    assertTrue(first.fits());
    assertEquals(0.012 * Math.PI * 0.15 * 0.15, gap.fluxThrough().orElseThrow(), 1e-9);
  }

  @Test
  void boundaryThatDoesNotMatchItsSourceIsImbalanced() {
    BalanceResult balance = only(audit(shipped("all-flux-boundary")));
    assertEquals(Verdict.IMBALANCED, balance.verdict());
    assertEquals(-0.08453520910529644, balance.residual().orElseThrow(), 1e-10);
  }

  @Test
  void fieldThatMakesMassIsNamed() {
    CaseResult result = audit(shipped("mass-from-nothing"));
    BalanceResult balance = only(result);
    assertEquals(Verdict.IMBALANCED, balance.verdict());
    assertEquals(0.04, balance.residual().orElseThrow(), 1e-10);
    assertEquals(
        0.04, balance.divergence().flatMap(BalanceResult.Term::value).orElseThrow(), 1e-10);
    Explanation first = result.explanations().get(0);
    assertEquals(Kind.FIELD_MAKES_SOURCE, first.kind());
    assertEquals(List.of("fitted"), first.on());
  }

  @Test
  void envelopeIsTheSumOfItsVolumes() {
    CaseResult result = audit(shipped("basin-and-sump"));
    double sum =
        balance(result, "basin").residual().orElseThrow()
            + balance(result, "sump").residual().orElseThrow();
    assertEquals(sum, balance(result, "station").residual().orElseThrow(), 1e-14);
    assertTrue(result.correctedCoverage().orElseThrow() > 0.95);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "stirred-tank",
        "conduction-block",
        "dished-vessel",
        "elbow",
        "basin-and-sump",
        "all-flux-boundary",
        "mass-from-nothing",
        "branch-on-shell",
        "duct-claim",
        "dosing-annulus"
      })
  void turningAnyOnePatchIsFoundWhateverItsFlux(String name) {
    Case sound = shipped(name);
    CaseResult before = audit(sound);
    for (PatchResult patch : before.patches()) {
      CaseResult after = audit(Audits.turned(sound, patch.name()));
      assertTrue(
          finding(after, FindingCode.ORIENTATION_REVERSED, patch.name()).isPresent(), patch.name());
      assertEquals(
          1,
          after.findings().stream()
              .filter(f -> f.code() == FindingCode.ORIENTATION_REVERSED)
              .count());
      assertEquals(
          Optional.of(FoundFacing.INWARD),
          after.patches().stream()
              .filter(p -> p.name().equals(patch.name()))
              .findFirst()
              .orElseThrow()
              .foundFacing());
      for (int b = 0; b < before.balances().size(); b++) {
        assertResidualMovedByMinusTwiceTheFlux(
            patch.name(), before.balances().get(b), after.balances().get(b), after);
      }
    }
  }

  private static void assertResidualMovedByMinusTwiceTheFlux(
      String patch, BalanceResult before, BalanceResult after, CaseResult result) {
    double flux =
        before.lines().stream()
            .filter(l -> l.patch().equals(patch))
            .findFirst()
            .flatMap(BalanceResult.Line::outward)
            .orElse(0.0);
    double slack = before.numericalError().orElseThrow() + after.numericalError().orElseThrow();
    assertEquals(
        before.residual().orElseThrow() - 2 * flux,
        after.residual().orElseThrow(),
        Math.max(slack, Double.MIN_NORMAL),
        patch);
    if (2 * Math.abs(flux) > 2 * after.tolerance().orElseThrow()
        && before.verdict() == Verdict.BALANCED) {
      Explanation first =
          result.explanations().stream()
              .filter(e -> e.balance().equals(after.volume()))
              .findFirst()
              .orElseThrow();
      assertEquals(Kind.REVERSED, first.kind(), patch);
      assertEquals(List.of(patch), first.on());
      assertTrue(first.fits(), patch);
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"basin-and-sump", "vessel-reversed-patch", "tidal-basin", "duct-claim"})
  void sameBitsOnAnyNumberOfThreads(String name) {
    Case audited = shipped(name);
    CaseResult one = audit(audited);
    for (int threads : new int[] {2, 3}) {
      CaseResult more =
          Auditor.audit(
              audited, new AuditOptions(8, threads, Audits.TODAY, ProgressListener.SILENT, false));
      assertEquals(one.balances(), more.balances());
      assertEquals(one.patches(), more.patches());
      assertEquals(one.surfaces(), more.surfaces());
      assertEquals(one.explanations(), more.explanations());
      assertEquals(
          one.findings().stream().map(Finding::message).toList(),
          more.findings().stream().map(Finding::message).toList());
    }
  }
}
