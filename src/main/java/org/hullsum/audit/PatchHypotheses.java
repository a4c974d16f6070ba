package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The hypotheses that suppose something wrong with single patches of one balance. */
final class PatchHypotheses {
  private final Clues clues;
  private final Balance balance;
  private final JointResiduals joint;
  private final String unit;

  PatchHypotheses(Clues clues, Balance balance, JointResiduals joint) {
    this.clues = clues;
    this.balance = balance;
    this.joint = joint;
    this.unit = balance.result().unit();
  }

  List<Hypothesis> all() {
    List<Hypothesis> all = new ArrayList<>();
    List<String> turned = new ArrayList<>();
    double turnedChange = 0;
    for (PatchRate rate : balance.rates()) {
      int sign = balance.subject().signOf(rate);
      if (rate.total().isEmpty()) {
        continue;
      }
      if (sign == 0) {
        leftOut(rate).ifPresent(all::add);
        continue;
      }
      double outward = sign * rate.total().get().value();
      if (clues.inward().contains(rate.patch())) {
        double change = -2 * (rate.integrated() ? sign * rate.following().value() : outward);
        turned.add(rate.patch());
        turnedChange += change;
        all.add(shownReversed(List.of(rate.patch()), change));
      } else if (!clues.surfaced().contains(rate.patch()) && outward != 0) {
        all.add(reversed(rate));
      }
      countedTwice(rate, outward).ifPresent(all::add);
      if (outward != 0) {
        clues
            .causes()
            .getOrDefault(rate.patch(), List.of())
            .forEach(cause -> all.add(caused(rate, cause)));
      }
    }
    if (turned.size() > 1) {
      all.add(shownReversed(turned, turnedChange));
    }
    return all;
  }

  private Hypothesis shownReversed(List<String> patches, double change) {
    JointResiduals.Judged judged = joint.alone(balance, Estimate.exact(change));
    String names = String.join("`, `", patches);
    return new Hypothesis(
        Explanation.Kind.REVERSED,
        Hypothesis.SHOWN,
        patches,
        Optional.of(-1.0),
        judged.then(),
        judged.fits(),
        0,
        (patches.size() == 1
                ? "`" + names + "` faces the wrong way, by where its sides lie"
                : "`" + names + "` face the wrong way, by where their sides lie")
            + "; turned, "
            + outcome(judged)
            + ".");
  }

  private Hypothesis reversed(PatchRate rate) {
    return supposed(
        Explanation.Kind.REVERSED,
        rate,
        -1,
        "what is metered at `" + rate.patch() + "` runs the other way",
        "check the arrow on the meter's body and the sign in its transmitter");
  }

  private Hypothesis caused(PatchRate rate, PatchCause cause) {
    return supposed(cause.kind(), rate, cause.factor(), cause.supposition(), cause.check());
  }

  private Hypothesis supposed(
      Explanation.Kind kind, PatchRate rate, double factor, String supposition, String check) {
    JointResiduals.Judged judged = joint.multiplied(balance, rate.patch(), factor);
    return new Hypothesis(
        kind,
        Hypothesis.FREE_OF_NUMBERS,
        List.of(rate.patch()),
        Optional.of(factor),
        judged.then(),
        judged.fits(),
        judged.unlikelihood(),
        "If " + supposition + ", " + outcome(judged) + "; " + check + ".");
  }

  private Optional<Hypothesis> countedTwice(PatchRate rate, double outward) {
    Optional<Clues.Overlap> overlap =
        clues.overlaps().stream().filter(o -> o.has(rate.patch())).findFirst();
    if (outward == 0 || (clues.surfaced().contains(rate.patch()) && overlap.isEmpty())) {
      return Optional.empty();
    }
    String evidence =
        overlap.map(o -> ": `" + o.first() + "` and `" + o.second() + "` coincide").orElse("");
    return Optional.of(
        supposed(
            Explanation.Kind.COUNTED_TWICE,
            rate,
            0,
            "`" + rate.patch() + "` is counted twice" + evidence,
            "see whether another patch holds the same flow"));
  }

  /**
   * A patch of another volume that ends in the surroundings may really end in this one. The veto:
   * on a surface, this volume's must be open.
   */
  private Optional<Hypothesis> leftOut(PatchRate rate) {
    boolean leavesOutside = Explainer.isOutside(rate.leaves());
    boolean entersOutside = Explainer.isOutside(rate.enters());
    boolean allowed =
        balance.subject().members().stream()
            .anyMatch(
                m ->
                    clues.open().contains(m)
                        || (clues.surfaceless().contains(m)
                            && !clues.surfaced().contains(rate.patch())));
    boolean elsewhere =
        !balance.subject().members().contains(leavesOutside ? rate.enters() : rate.leaves());
    double value = rate.total().map(Estimate::value).orElse(0.0);
    if (!allowed || !elsewhere || leavesOutside == entersOutside || value == 0) {
      return Optional.empty();
    }
    Estimate change = rate.total().orElseThrow().times(leavesOutside ? 1 : -1);
    JointResiduals.Judged judged = joint.alone(balance, change);
    return Optional.of(
        new Hypothesis(
            Explanation.Kind.LEFT_OUT,
            Hypothesis.FREE_OF_NUMBERS,
            List.of(rate.patch()),
            Optional.of(1.0),
            judged.then(),
            judged.fits(),
            judged.unlikelihood(),
            "If `"
                + rate.patch()
                + "` "
                + (leavesOutside ? "leaves " : "enters ")
                + "`"
                + balance.subject().name()
                + "` instead of the surroundings, "
                + outcome(judged)
                + "."));
  }

  /** What is left of the residual then; what can't be told from zero is nothing. */
  private String outcome(JointResiduals.Judged judged) {
    if (judged.against().isPresent()) {
      return "the balance of `" + judged.against().get() + "`, which closes, would not any more";
    }
    return judged.fits()
        ? "the residual would vanish"
        : "the residual would be " + Figures.text(judged.then(), unit);
  }
}
