package org.hullsum.audit;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.model.Inputs;
import org.hullsum.model.Tolerances;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Place;

/**
 * Judges a claimed flux against the flux found, by the decision rules of {@link Decision}.
 *
 * <p>A claim with an uncertainty is missed where |flux − claim| > w, w the numerical error bound
 * plus the expanded uncertainty of the difference. One without is missed where |flux − claim| − w
 * exceeds the volume's relative tolerance of the claim (0.1 % where none is stated): what can't be
 * told apart is not called missed.
 */
final class ClaimJudge {
  private final Inputs inputs;
  private final String unit;

  ClaimJudge(Inputs inputs, String unit) {
    this.inputs = inputs;
    this.unit = unit;
  }

  /**
   * What is compared.
   *
   * @param patch whose flux is claimed
   * @param flux found, from leaves to enters
   * @param claim stated, the same way
   * @param tolerances of the patch's volume
   * @param place of the claim
   */
  record Comparison(
      String patch, Estimate flux, Estimate claim, Tolerances tolerances, Place place) {}

  /** The finding, where the claim is missed. */
  Optional<Finding> judge(Comparison compared) {
    Estimate claim = compared.claim();
    Estimate difference = compared.flux().minus(claim);
    UncertaintyBudget budget =
        UncertaintyBudget.of(List.of(compared.flux(), claim.times(-1)), inputs);
    Coverage coverage = new Coverage(compared.tolerances().coverage(), budget.degreesOfFreedom());
    double w = difference.error() + coverage.factor() * budget.standardUncertainty();
    boolean uncertain = UncertaintyBudget.of(List.of(claim), inputs).standardUncertainty() > 0;
    double relative = compared.tolerances().relative().orElse(Decision.USUAL_RELATIVE);
    double allowed = uncertain ? w : relative * Math.abs(claim.value()) + w;
    if (Math.abs(difference.value()) <= allowed) {
      return Optional.empty();
    }
    Map<String, Object> evidence = new LinkedHashMap<>();
    evidence.put("flux", compared.flux().value());
    evidence.put("claim", claim.value());
    evidence.put("difference", difference.value());
    evidence.put("allowed", allowed);
    return Optional.of(
        Finding.of(
            FindingCode.CLAIM_MISSED,
            message(compared, difference.value(), allowed),
            compared.patch(),
            Optional.of(compared.place()),
            evidence));
  }

  private String message(Comparison compared, double difference, double allowed) {
    double claim = compared.claim().value();
    String relative = claim == 0 ? "" : " (" + Figures.percent(difference / claim) + ")";
    return "`"
        + compared.patch()
        + "` is claimed to carry "
        + Figures.text(claim, unit)
        + " and carries "
        + Figures.text(compared.flux().value(), unit)
        + ": off by "
        + Figures.text(difference, unit)
        + relative
        + ", where "
        + Figures.text(allowed, unit)
        + " is allowed";
  }
}
