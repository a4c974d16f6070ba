package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The hypotheses with one number that is fitted so that a balance closes: a stale level, one meter
 * biased, a leak, a flow that the case does not name. Only where something is metered; each with
 * the interval of its number at the coverage of the balance.
 */
final class FittedHypotheses {
  /** A meter that is off by more than its whole reading is not biased but broken. */
  private static final double LARGEST_BIAS = 1;

  private final Clues clues;
  private final Balance balance;
  private final JointResiduals joint;
  private final Estimate residual;
  private final String unit;

  FittedHypotheses(Clues clues, Balance balance, JointResiduals joint) {
    this.clues = clues;
    this.balance = balance;
    this.joint = joint;
    this.residual = balance.residual().orElseThrow();
    this.unit = balance.result().unit();
  }

  List<Hypothesis> all() {
    List<Hypothesis> all = new ArrayList<>();
    List<PatchRate> metered =
        balance.rates().stream()
            .filter(r -> balance.subject().signOf(r) != 0)
            .filter(r -> !r.integrated() && r.total().filter(t -> t.value() != 0).isPresent())
            .toList();
    if (metered.isEmpty() || residual.value() == 0) {
      return all;
    }
    staleLevel().ifPresent(all::add);
    metered.forEach(rate -> bias(rate).ifPresent(all::add));
    all.add(leak());
    if (clues.mayLack(balance.subject())) {
      all.add(leftOut());
    }
    return all;
  }

  private Optional<Hypothesis> staleLevel() {
    List<BalanceResult.Term> kept =
        balance.result().terms().stream()
            .filter(t -> t.kind().equals("accumulation") && t.value().isPresent())
            .toList();
    if (kept.isEmpty()) {
      return Optional.empty();
    }
    // It enters the interior with a minus.
    double stated = -kept.stream().mapToDouble(t -> t.value().orElseThrow()).sum();
    double needed = stated - residual.value();
    JointResiduals.Judged without = joint.alone(balance, Estimate.exact(-residual.value()));
    return Optional.of(
        hypothesis(
            Explanation.Kind.STALE_LEVEL,
            List.of(),
            Optional.of(needed),
            without,
            0,
            "If a reading of the level is stale, what is kept inside is "
                + interval(needed, without.uncertainty())
                + " where "
                + Figures.text(stated, unit)
                + " is stated; read the gauge twice, and dip the tank."));
  }

  private Optional<Hypothesis> bias(PatchRate rate) {
    int sign = balance.subject().signOf(rate);
    Estimate stated = rate.total().orElseThrow();
    // What is read less what is true.
    double bias = sign * residual.value();
    if (Math.abs(bias) > LARGEST_BIAS * Math.abs(stated.value())) {
      return Optional.empty();
    }
    JointResiduals.Judged judged = joint.fitted(balance, rate);
    JointResiduals.Judged without = joint.alone(balance, stated.times(-sign));
    double share = bias / stated.value();
    return Optional.of(
        hypothesis(
            Explanation.Kind.ONE_METER_BIAS,
            List.of(rate.patch()),
            Optional.of((stated.value() - bias) / stated.value()),
            judged,
            judged.unlikelihood() + Math.abs(share),
            "If the meter of `"
                + rate.patch()
                + "` alone is off, it reads "
                + interval(Math.abs(bias), without.uncertainty())
                + (share > 0 ? " too much, " : " too little, ")
                + Figures.percent(Math.abs(share))
                + " of its reading"
                + judged
                    .against()
                    .map(b -> "; but then `" + b + "`, which closes, would not any more")
                    .orElse("")
                + "; check it by bucket and stopwatch, or against another meter."));
  }

  private Hypothesis leak() {
    double rate = -residual.value();
    JointResiduals.Judged judged = joint.alone(balance, residual.times(-1));
    return hypothesis(
        Explanation.Kind.LEAK,
        List.of(balance.subject().name()),
        Optional.of(rate),
        judged,
        0,
        "If `"
            + balance.subject().name()
            + "` leaks, it "
            + (rate > 0 ? "loses " : "gains ")
            + interval(Math.abs(rate), balance.result().standardUncertainty())
            + "; shut every nozzle and watch the level.");
  }

  private Hypothesis leftOut() {
    double rate = -residual.value();
    JointResiduals.Judged judged = joint.alone(balance, residual.times(-1));
    return hypothesis(
        Explanation.Kind.LEFT_OUT,
        List.of(),
        Optional.of(rate),
        judged,
        0,
        "If a flow is left out that the case does not name, it "
            + (rate > 0 ? "takes away " : "brings ")
            + interval(Math.abs(rate), balance.result().standardUncertainty())
            + "; walk round and count the nozzles.");
  }

  private Hypothesis hypothesis(
      Explanation.Kind kind,
      List<String> on,
      Optional<Double> number,
      JointResiduals.Judged judged,
      double unlikelihood,
      String message) {
    return new Hypothesis(
        kind, Hypothesis.FITTED, on, number, 0, judged.against().isEmpty(), unlikelihood, message);
  }

  private String interval(double value, double uncertainty) {
    double half = balance.result().coverageFactor() * uncertainty + residual.error();
    return Figures.text(value, unit) + (half > 0 ? " ± " + Figures.error(half, unit) : "");
  }
}
