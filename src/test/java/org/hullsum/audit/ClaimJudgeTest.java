package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.model.Tolerances;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Place;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ClaimJudgeTest {
  private static final Place PLACE = new Place("case.yaml", 7, 3);
  private static final Tolerances HALF_PERCENT =
      new Tolerances(OptionalDouble.empty(), OptionalDouble.of(0.005), 0.95);

  private static Optional<Finding> judge(Estimate flux, Estimate claim, Tolerances tolerances) {
    return new ClaimJudge(BalanceFixture.inputs(Map.of("set", 0.5, "meter", 0.5)), "m3/h")
        .judge(new ClaimJudge.Comparison("inlet", flux, claim, tolerances, PLACE));
  }

  @ParameterizedTest
  @CsvSource({"100.4, false", "100.6, true", "99.4, true"})
  void bareClaimIsJudgedByTheRelativeToleranceOfTheClaim(double flux, boolean missed) {
    assertEquals(
        missed, judge(Estimate.exact(flux), Estimate.exact(100), HALF_PERCENT).isPresent());
  }

  @Test
  void bareClaimWithoutToleranceIsHeldToAThousandth() {
    assertTrue(judge(Estimate.exact(100.05), Estimate.exact(100), Tolerances.NONE).isEmpty());
    assertTrue(judge(Estimate.exact(100.15), Estimate.exact(100), Tolerances.NONE).isPresent());
  }

  @ParameterizedTest
  @CsvSource({"100.9, false", "101.1, true"})
  void uncertainClaimIsJudgedByItsUncertainty(double flux, boolean missed) {
    Estimate claim = new Estimate(100, 0, Map.of("set", 1.0));
    assertEquals(missed, judge(Estimate.exact(flux), claim, HALF_PERCENT).isPresent());
  }

  @Test
  void uncertainFluxOfABareClaimWidensTheBand() {
    Estimate flux = new Estimate(101.4, 0, Map.of("meter", 1.0));
    assertTrue(judge(flux, Estimate.exact(100), HALF_PERCENT).isEmpty());
  }

  @Test
  void missedClaimCarriesItsPlaceAndFigures() {
    Finding finding = judge(Estimate.exact(80), Estimate.exact(100), HALF_PERCENT).orElseThrow();
    assertEquals(FindingCode.CLAIM_MISSED, finding.code());
    assertEquals(Optional.of(PLACE), finding.place());
    assertEquals(-20.0, finding.evidence().get("difference"));
    assertTrue(finding.message().contains("-20 %"), finding.message());
  }
}
