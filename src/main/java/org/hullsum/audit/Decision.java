package org.hullsum.audit;

import java.util.Objects;
import java.util.Optional;
import org.hullsum.model.Tolerances;

/**
 * A verdict and why: guarded acceptance and rejection against a tolerance (JCGM 106:2012, 8.3), or
 * against the residual's own uncertainty where no tolerance is given.
 *
 * <p>With w = numerical error bound + k·u: rule {@code tolerance}: balanced where |residual| + w ≤
 * T, imbalanced where |residual| − w > T, else undecided. Rule {@code uncertainty}: balanced where
 * |residual| ≤ w, else imbalanced.
 *
 * @param verdict what follows
 * @param rule by which
 * @param tolerance T, for the rule {@code tolerance}
 * @param halfWidth w
 * @param detectable w + 1.645 u, the smallest imbalance that would have been detected
 * @param probabilityWrong the probability that the true residual is on the other side of the
 *     tolerance, given the residual and its uncertainty and nothing else known beforehand; 0 where
 *     there is no uncertainty; empty where undecided or where there is no tolerance
 * @param throughputZero whether nothing flows that could be told from zero
 * @param tooCoarse whether the rule {@code uncertainty} could miss a tenth of the throughput
 * @param reason one sentence
 */
record Decision(
    Verdict verdict,
    BalanceResult.Rule rule,
    Optional<Double> tolerance,
    double halfWidth,
    double detectable,
    Optional<Double> probabilityWrong,
    boolean throughputZero,
    boolean tooCoarse,
    String reason) {
  /** Of the throughput, where no tolerance is stated for a conservation check. */
  static final double USUAL_RELATIVE = 1e-3;

  /** Of the throughput, where no tolerance is stated for an identity check. */
  private static final double IDENTITY_RELATIVE = 1e-6;

  /** Of the numerical error bound, for an identity check without a stated tolerance. */
  private static final double IDENTITY_ERRORS = 3;

  /** The share of the throughput above which an undetected imbalance is worth a warning. */
  private static final double COARSE = 0.1;

  Decision {
    Objects.requireNonNull(verdict, "verdict");
    Objects.requireNonNull(rule, "rule");
    Objects.requireNonNull(reason, "reason");
  }

  /**
   * What is known of a residual.
   *
   * @param residual outward − interior, in {@code unit}
   * @param numericalError a bound
   * @param accurate whether every integral reached the accuracy asked for
   * @param standardUncertainty u
   * @param coverage expands u
   * @param throughput the measure of what flows
   * @param check identity or conservation
   * @param tolerances stated, the absolute one in {@code unit}
   * @param unit the rate unit, for the reason
   */
  record Evidence(
      double residual,
      double numericalError,
      boolean accurate,
      double standardUncertainty,
      Coverage coverage,
      double throughput,
      BalanceResult.Check check,
      Tolerances tolerances,
      String unit) {
    double halfWidth() {
      return numericalError + coverage.factor() * standardUncertainty;
    }

    /**
     * Whether the throughput can't be told from zero: where the integrals are as accurate as asked,
     * only rounding can exceed the whole throughput.
     */
    boolean nothingFlows() {
      return accurate && throughput <= numericalError;
    }
  }

  static Decision of(Evidence evidence) {
    if (!evidence.tolerances().stated() && evidence.standardUncertainty() > 0) {
      return byUncertainty(evidence);
    }
    boolean identity = evidence.check() == BalanceResult.Check.IDENTITY;
    boolean defaultIdentity = identity && !evidence.tolerances().stated();
    if (evidence.nothingFlows()
        && evidence.tolerances().absolute().isEmpty()
        && !defaultIdentity
        && Math.abs(evidence.residual()) <= evidence.numericalError()) {
      return decided(
          evidence,
          Verdict.BALANCED,
          0,
          "nothing flows: the residual and the throughput can't be told from zero");
    }
    return byTolerance(evidence, toleranceOf(evidence));
  }

  private static double toleranceOf(Evidence evidence) {
    Tolerances stated = evidence.tolerances();
    if (stated.stated()) {
      return Math.max(
          stated.absolute().orElse(0), stated.relative().orElse(0) * evidence.throughput());
    }
    double usual = USUAL_RELATIVE * evidence.throughput();
    if (evidence.check() == BalanceResult.Check.CONSERVATION) {
      return usual;
    }
    // An integral far off its accuracy must not buy itself a verdict.
    double errors = IDENTITY_ERRORS * evidence.numericalError();
    double allowed = evidence.nothingFlows() ? errors : Math.min(errors, usual);
    return Math.max(IDENTITY_RELATIVE * evidence.throughput(), allowed);
  }

  private static Decision byTolerance(Evidence evidence, double tolerance) {
    double size = Math.abs(evidence.residual());
    double w = evidence.halfWidth();
    String found =
        "|residual| "
            + Figures.text(size, evidence.unit())
            + (w > 0 ? " ± " + Figures.error(w, evidence.unit()) : "");
    String limit = " the tolerance " + Figures.text(tolerance, evidence.unit());
    if (size + w <= tolerance) {
      return decided(evidence, Verdict.BALANCED, tolerance, found + " is within" + limit);
    }
    if (size - w > tolerance) {
      return decided(evidence, Verdict.IMBALANCED, tolerance, found + " is beyond" + limit);
    }
    return decided(evidence, Verdict.UNDECIDED, tolerance, found + " straddles" + limit);
  }

  private static Decision decided(
      Evidence evidence, Verdict verdict, double tolerance, String reason) {
    double w = evidence.halfWidth();
    return new Decision(
        verdict,
        BalanceResult.Rule.TOLERANCE,
        Optional.of(tolerance),
        w,
        detectable(evidence),
        probabilityWrong(evidence, verdict, tolerance),
        evidence.nothingFlows(),
        false,
        reason);
  }

  private static Decision byUncertainty(Evidence evidence) {
    double size = Math.abs(evidence.residual());
    double w = evidence.halfWidth();
    boolean within = size <= w;
    String reason =
        "|residual| "
            + Figures.text(size, evidence.unit())
            + " is "
            + (within ? "within" : "beyond")
            + " its uncertainty of "
            + Figures.text(w, evidence.unit())
            + " ("
            + Figures.percent(evidence.coverage().probability())
            + ")";
    return new Decision(
        within ? Verdict.BALANCED : Verdict.IMBALANCED,
        BalanceResult.Rule.UNCERTAINTY,
        Optional.empty(),
        w,
        detectable(evidence),
        Optional.empty(),
        evidence.nothingFlows(),
        detectable(evidence) > COARSE * evidence.throughput(),
        reason);
  }

  private static double detectable(Evidence evidence) {
    return evidence.halfWidth() + Coverage.POWER_QUANTILE * evidence.standardUncertainty();
  }

  /** The numerical error counts in the direction that makes the probability larger. */
  private static Optional<Double> probabilityWrong(
      Evidence evidence, Verdict verdict, double tolerance) {
    if (verdict == Verdict.UNDECIDED) {
      return Optional.empty();
    }
    double u = evidence.standardUncertainty();
    if (u == 0) {
      return Optional.of(0.0);
    }
    Coverage coverage = evidence.coverage();
    if (verdict == Verdict.BALANCED) {
      double size = Math.abs(evidence.residual()) + evidence.numericalError();
      return Optional.of(
          coverage.above((tolerance - size) / u) + coverage.above((tolerance + size) / u));
    }
    double size = Math.abs(evidence.residual()) - evidence.numericalError();
    return Optional.of(
        coverage.above((size - tolerance) / u) - coverage.above((size + tolerance) / u));
  }
}
