package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.audit.BalanceResult.Check;
import org.hullsum.audit.BalanceResult.Rule;
import org.hullsum.model.Tolerances;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class DecisionTest {
  private static final double K95 = 1.959963984540054;

  private static Tolerances tolerances(double absolute, double relative) {
    return new Tolerances(
        absolute < 0 ? OptionalDouble.empty() : OptionalDouble.of(absolute),
        relative < 0 ? OptionalDouble.empty() : OptionalDouble.of(relative),
        0.95);
  }

  private static Decision decide(
      double residual, double error, double u, double throughput, Check check, Tolerances stated) {
    return Decision.of(
        new Decision.Evidence(
            residual, error, true, u, Coverage.normal(0.95), throughput, check, stated, "m3/s"));
  }

  @ParameterizedTest
  @CsvSource({
    // residual, error, u, verdict; T = 1
    "0.5, 0.1, 0, BALANCED",
    "0.9, 0.1, 0, BALANCED",
    "0.95, 0.1, 0, UNDECIDED",
    "1.05, 0.1, 0, UNDECIDED",
    "1.2, 0.1, 0, IMBALANCED",
    "-1.2, 0.1, 0, IMBALANCED",
    "-0.95, 0.1, 0, UNDECIDED",
    "0.5, 0, 0.2, BALANCED",
    "0.7, 0, 0.2, UNDECIDED",
    "1.3, 0, 0.2, UNDECIDED",
    "1.4, 0, 0.2, IMBALANCED",
    "0, 2, 0, UNDECIDED",
    "0, 0, 1, UNDECIDED"
  })
  void guardedRuleFollowsTheHandTable(double residual, double error, double u, Verdict expected) {
    Decision decision = decide(residual, error, u, 100, Check.CONSERVATION, tolerances(1, -1));
    assertEquals(expected, decision.verdict());
    assertEquals(Rule.TOLERANCE, decision.rule());
    assertEquals(error + K95 * u, decision.halfWidth(), 1e-12);
    assertEquals(error + (K95 + 1.6448536269514722) * u, decision.detectable(), 1e-12);
  }

  @Test
  void largerOfTwoTolerancesHolds() {
    assertEquals(
        Optional.of(5.0),
        decide(0, 0, 0, 1000, Check.CONSERVATION, tolerances(1, 0.005)).tolerance());
    assertEquals(
        Optional.of(1.0),
        decide(0, 0, 0, 100, Check.CONSERVATION, tolerances(1, 0.005)).tolerance());
  }

  @ParameterizedTest
  @CsvSource({"1.0, BALANCED", "-1.9, BALANCED", "2.0, IMBALANCED", "-2.0, IMBALANCED"})
  void withoutToleranceTheUncertaintyDecides(double residual, Verdict expected) {
    Decision decision = decide(residual, 0, 1, 100, Check.CONSERVATION, tolerances(-1, -1));
    assertEquals(expected, decision.verdict());
    assertEquals(Rule.UNCERTAINTY, decision.rule());
    assertEquals(Optional.empty(), decision.tolerance());
  }

  @Test
  void coarseUncertaintyRuleIsSaidToBeTooCoarse() {
    assertTrue(decide(0, 0, 3, 100, Check.CONSERVATION, tolerances(-1, -1)).tooCoarse());
    assertFalse(decide(0, 0, 2, 100, Check.CONSERVATION, tolerances(-1, -1)).tooCoarse());
  }

  @Test
  void conservationWithoutToleranceOrUncertaintyTakesAThousandth() {
    assertEquals(
        Optional.of(0.1), decide(0, 0, 0, 100, Check.CONSERVATION, tolerances(-1, -1)).tolerance());
  }

  @Test
  void identityWithoutToleranceTakesAMillionthOrThreeErrors() {
    Decision coarse = decide(1e-3, 1e-3, 0, 100, Check.IDENTITY, tolerances(-1, -1));
    assertEquals(3e-3, coarse.tolerance().orElseThrow(), 1e-18);
    assertEquals(Verdict.BALANCED, coarse.verdict());
    Decision fine = decide(1e-3, 1e-9, 0, 100, Check.IDENTITY, tolerances(-1, -1));
    assertEquals(1e-4, fine.tolerance().orElseThrow(), 1e-18);
    assertEquals(Verdict.IMBALANCED, fine.verdict());
  }

  @Test
  void nothingThatFlowsIsBalancedWithANote() {
    Decision decision = decide(1e-18, 1e-16, 0, 1e-17, Check.CONSERVATION, tolerances(-1, 0.005));
    assertEquals(Verdict.BALANCED, decision.verdict());
    assertTrue(decision.throughputZero());
  }

  @Test
  void inaccurateIntegralsAreNotTakenForNothing() {
    Decision decision =
        Decision.of(
            new Decision.Evidence(
                0.5,
                2,
                false,
                0,
                Coverage.normal(0.95),
                1,
                Check.CONSERVATION,
                tolerances(-1, 0.005),
                "m3/s"));
    assertEquals(Verdict.UNDECIDED, decision.verdict());
    assertFalse(decision.throughputZero());
  }

  /**
   * JCGM 106:2012, 7.4 example 1 (from memory): a Zener diode's breakdown voltage of −5.47 V with u
   * = 0.05 V against a limit of −5.40 V conforms with probability Φ(1.40) = 0.92.
   */
  @Test
  void probabilityWrongFollowsThePublishedConformanceProbability() {
    double tolerance = 5.40;
    Decision decision = decide(5.33, 0, 0.05, 100, Check.CONSERVATION, tolerances(tolerance, -1));
    assertEquals(Verdict.UNDECIDED, decision.verdict());
    assertEquals(Optional.empty(), decision.probabilityWrong());
    // The same distance from the limit in units of u as 1.96 and more decides.
    Decision within = decide(5.30, 0, 0.05, 100, Check.CONSERVATION, tolerances(tolerance, -1));
    assertEquals(0.02275, within.probabilityWrong().orElseThrow(), 1e-5);
    assertEquals(0.0808, Coverage.normal(0.95).above((5.40 - 5.33) / 0.05), 1e-4);
  }

  @Test
  void probabilityWrongIsZeroWithoutUncertainty() {
    assertEquals(
        Optional.of(0.0),
        decide(2, 0, 0, 100, Check.CONSERVATION, tolerances(1, -1)).probabilityWrong());
  }

  @Test
  void wrongRejectionIsAsImprobableAsItsMirrorImage() {
    Decision rejected = decide(1.1, 0, 0.05, 100, Check.CONSERVATION, tolerances(1, -1));
    assertEquals(Verdict.IMBALANCED, rejected.verdict());
    assertEquals(0.02275, rejected.probabilityWrong().orElseThrow(), 1e-5);
  }

  @Test
  void identityOfAnIntegralFarOffItsAccuracyIsUndecided() {
    Decision decision = decide(0.5, 120, 0, 370, Check.IDENTITY, tolerances(-1, -1));
    assertEquals(Verdict.UNDECIDED, decision.verdict());
  }
}
