package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.model.Inputs;

/**
 * Draws one balance: outward sum, interior, residual, throughput, uncertainty, verdict. The signs
 * are those of {@link org.hullsum.model}.
 *
 * <p>Sums are compensated and in the order of the case. Every rate is a quantity read or integrated
 * and then converted, so a few roundings of each are added to the error bound.
 */
final class BalanceBuilder {
  /** Roundings of one rate between the file and the sum: reading, unit, factor, conversion. */
  private static final double ROUNDING = 4 * Math.ulp(1.0);

  /** Sources below this share of what flows are not worth a word. */
  private static final double NOTED = 1e-7;

  /** Magnitudes are known to 1 %, so that two of them differ for certain beyond this factor. */
  private static final double MAGNITUDE_ACCURACY = 1.02;

  private final BalanceSubject subject;
  private final Inputs inputs;
  private final String quantity;
  private final String unit;
  private final List<PatchRate> rates;
  private final List<BalanceResult.Line> lines = new ArrayList<>();
  private final List<Estimate> parts = new ArrayList<>();
  private final List<Estimate> outwardParts = new ArrayList<>();
  private final List<Estimate> interiorParts = new ArrayList<>();
  private final List<BalanceResult.Term> terms = new ArrayList<>();
  private final List<PatchRate> unknown = new ArrayList<>();
  private Optional<String> outwardMissing = Optional.empty();
  private Optional<String> interiorMissing = Optional.empty();
  private Optional<BalanceResult.Term> divergence = Optional.empty();
  private double divergenceMagnitude;
  private Optional<Double> at = Optional.empty();
  private Optional<BalanceResult.Interval> over = Optional.empty();
  private Optional<Estimate> meanResidual = Optional.empty();
  private double magnitudes;
  private double interiorMagnitude;
  private boolean accurate = true;
  private boolean integrated;

  BalanceBuilder(BalanceSubject subject, List<PatchRate> rates, Inputs inputs, RateNames names) {
    this.subject = subject;
    this.rates = List.copyOf(rates);
    this.inputs = inputs;
    this.quantity = names.quantity();
    this.unit = names.unit();
    this.rates.forEach(this::addLine);
  }

  /**
   * What flows and in which unit it is reported.
   *
   * @param quantity its name
   * @param unit the code of the rate unit
   */
  record RateNames(String quantity, String unit) {}

  private void addLine(PatchRate rate) {
    int sign = subject.signOf(rate);
    if (sign == 0) {
      return;
    }
    magnitudes += rate.magnitude();
    accurate &= rate.accurate();
    integrated |= rate.integrated();
    Optional<Estimate> outward = rate.total().map(t -> rounded(t.times(sign)));
    outward.ifPresent(outwardParts::add);
    if (rate.unknown()) {
      unknown.add(rate);
    } else if (outwardMissing.isEmpty()) {
      outwardMissing = rate.missing();
    }
    lines.add(
        new BalanceResult.Line(
            rate.patch(),
            sign,
            outward.map(Estimate::value),
            outward.map(Estimate::error).orElse(0.0),
            outward.map(this::uncertainty).orElse(0.0)));
  }

  private static Estimate rounded(Estimate estimate) {
    double rounding = ROUNDING * Math.abs(estimate.value());
    return new Estimate(estimate.value(), estimate.error() + rounding, estimate.sensitivities());
  }

  private double uncertainty(Estimate estimate) {
    return UncertaintyBudget.of(List.of(estimate), inputs).standardUncertainty();
  }

  BalanceBuilder interior(List<InteriorRate> interior) {
    for (InteriorRate rate : interior) {
      if (!subject.members().contains(rate.volume())) {
        continue;
      }
      magnitudes += rate.magnitude();
      interiorMagnitude += rate.magnitude();
      accurate &= rate.accurate();
      rate.value().ifPresent(v -> interiorParts.add(rounded(v)));
      if (interiorMissing.isEmpty()) {
        interiorMissing = rate.missing();
      }
      terms.add(term(rate));
    }
    return this;
  }

  /** The integral of the fields' divergence, beside a conservation check. */
  BalanceBuilder beside(InteriorRate rate) {
    divergence = Optional.of(term(rate));
    divergenceMagnitude = rate.magnitude();
    return this;
  }

  private BalanceResult.Term term(InteriorRate rate) {
    return new BalanceResult.Term(
        rate.kind(),
        rate.value().map(Estimate::value),
        rate.value().map(Estimate::error),
        rate.value().map(this::uncertainty).orElse(0.0),
        rate.route(),
        rate.formula());
  }

  BalanceBuilder at(double seconds) {
    at = Optional.of(seconds);
    return this;
  }

  /** Over an interval; the residual's own mean carries the error of the rule in time. */
  BalanceBuilder over(double begin, double end, Optional<Estimate> residual) {
    over = Optional.of(new BalanceResult.Interval(begin, end));
    meanResidual = residual;
    return this;
  }

  Balance draw() {
    boolean known = outwardMissing.isEmpty() && unknown.isEmpty();
    Optional<Estimate> outward = known ? Optional.of(Estimate.sum(outwardParts)) : Optional.empty();
    Optional<Estimate> interior =
        interiorMissing.isEmpty() ? Optional.of(Estimate.sum(interiorParts)) : Optional.empty();
    parts.addAll(outwardParts);
    interiorParts.forEach(p -> parts.add(p.times(-1)));
    UncertaintyBudget budget = UncertaintyBudget.of(parts, inputs);
    Coverage coverage = new Coverage(subject.tolerances().coverage(), budget.degreesOfFreedom());
    Optional<Estimate> residual =
        outward.isPresent() && interior.isPresent() && subject.unbounded().isEmpty()
            ? Optional.of(difference(outward.get(), interior.get()))
            : Optional.empty();
    Optional<Decision> decision = residual.map(r -> decide(r, budget, coverage));
    Conclusion conclusion = conclude(decision, budget);
    BalanceResult result =
        new BalanceResult(
            subject.name(),
            subject.label(),
            subject.envelope(),
            quantity,
            unit,
            at,
            over,
            subject.check(),
            lines,
            outward.map(Estimate::value),
            interior.map(Estimate::value),
            residual.map(Estimate::value),
            terms,
            magnitudes / 2,
            decision.map(Decision::rule).orElse(ruleWithout(budget)),
            decision.flatMap(Decision::tolerance),
            residual.map(Estimate::error),
            budget.standardUncertainty(),
            coverage.factor(),
            decision.map(Decision::detectable),
            conclusion.probabilityWrong(),
            budget.contributions(),
            interior.flatMap(this::closing),
            divergence,
            conclusion.verdict(),
            sentence(conclusion.reason()));
    return new Balance(subject, rates, residual, decision, result);
  }

  private Decision decide(Estimate residual, UncertaintyBudget budget, Coverage coverage) {
    return Decision.of(
        new Decision.Evidence(
            residual.value(),
            residual.error(),
            accurate,
            budget.standardUncertainty(),
            coverage,
            magnitudes / 2,
            subject.check(),
            subject.tolerances(),
            unit));
  }

  private static String sentence(String reason) {
    return Character.toUpperCase(reason.charAt(0)) + reason.substring(1) + ".";
  }

  private Estimate difference(Estimate outward, Estimate interior) {
    Estimate difference = outward.minus(interior);
    double error = meanResidual.map(Estimate::error).orElse(difference.error());
    return new Estimate(difference.value(), error, difference.sensitivities());
  }

  private BalanceResult.Rule ruleWithout(UncertaintyBudget budget) {
    return !subject.tolerances().stated() && budget.standardUncertainty() > 0
        ? BalanceResult.Rule.UNCERTAINTY
        : BalanceResult.Rule.TOLERANCE;
  }

  private Optional<BalanceResult.Closing> closing(Estimate interior) {
    if (unknown.size() != 1 || outwardMissing.isPresent()) {
      return Optional.empty();
    }
    PatchRate patch = unknown.get(0);
    double needed = interior.minus(Estimate.sum(outwardParts)).value();
    return Optional.of(
        new BalanceResult.Closing(patch.patch(), subject.signOf(patch) * needed + 0.0));
  }

  private record Conclusion(Verdict verdict, Optional<Double> probabilityWrong, String reason) {
    static Conclusion undecided(String reason) {
      return new Conclusion(Verdict.UNDECIDED, Optional.empty(), reason);
    }
  }

  private Conclusion conclude(Optional<Decision> decision, UncertaintyBudget budget) {
    if (subject.unbounded().isPresent()) {
      return Conclusion.undecided(subject.unbounded().get());
    }
    if (outwardMissing.isPresent()) {
      return Conclusion.undecided(outwardMissing.get());
    }
    if (!unknown.isEmpty()) {
      String names = String.join(", ", unknown.stream().map(PatchRate::patch).toList());
      return Conclusion.undecided(
          unknown.size() == 1
              ? "the flux of " + names + " is not known"
              : "the fluxes of " + names + " are not known");
    }
    if (interiorMissing.isPresent()) {
      return Conclusion.undecided(interiorMissing.get());
    }
    if (integrated && subject.unproved().isPresent()) {
      return Conclusion.undecided(subject.unproved().get());
    }
    if (budget.refusal().isPresent()) {
      return Conclusion.undecided(budget.refusal().get());
    }
    Decision reached = decision.orElseThrow();
    return new Conclusion(
        reached.verdict(), reached.probabilityWrong(), reached.reason() + sources());
  }

  /** A balance may close though the field makes more than is stated; it must not pass unsaid. */
  private String sources() {
    double stated = MAGNITUDE_ACCURACY * interiorMagnitude;
    boolean makes =
        divergence
            .flatMap(BalanceResult.Term::numericalError)
            .filter(error -> divergenceMagnitude - stated > Math.max(error, NOTED * magnitudes))
            .isPresent();
    return makes
        ? "; the field itself makes and destroys more than is stated: \u222d|\u2207\u00b7F| = "
            + Figures.text(divergenceMagnitude, unit)
        : "";
  }
}
