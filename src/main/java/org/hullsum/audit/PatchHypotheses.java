package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The hypotheses that suppose something wrong with single patches of one balance. */
final class PatchHypotheses {
  private final Clues clues;
  private final Balance balance;
  private final double residual;
  private final String unit;

  PatchHypotheses(Clues clues, Balance balance, double residual, String unit) {
    this.clues = clues;
    this.balance = balance;
    this.residual = residual;
    this.unit = unit;
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
        all.add(reversed(rate, outward));
      }
      countedTwice(rate, outward).ifPresent(all::add);
    }
    if (turned.size() > 1) {
      all.add(shownReversed(turned, turnedChange));
    }
    return all;
  }

  private Hypothesis shownReversed(List<String> patches, double change) {
    String names = String.join("`, `", patches);
    return new Hypothesis(
        Explanation.Kind.REVERSED,
        Hypothesis.SHOWN,
        patches,
        Optional.of(-1.0),
        residual + change,
        0,
        (patches.size() == 1
                ? "`" + names + "` faces the wrong way, by where its sides lie"
                : "`" + names + "` face the wrong way, by where their sides lie")
            + "; turned, "
            + outcome(residual + change));
  }

  private Hypothesis reversed(PatchRate rate, double outward) {
    double then = residual - 2 * outward;
    return new Hypothesis(
        Explanation.Kind.REVERSED,
        Hypothesis.FREE_OF_NUMBERS,
        List.of(rate.patch()),
        Optional.of(-1.0),
        then,
        0,
        "If what is metered at `" + rate.patch() + "` ran the other way, " + outcome(then));
  }

  private Optional<Hypothesis> countedTwice(PatchRate rate, double outward) {
    Optional<Clues.Overlap> overlap =
        clues.overlaps().stream().filter(o -> o.has(rate.patch())).findFirst();
    if (outward == 0 || (clues.surfaced().contains(rate.patch()) && overlap.isEmpty())) {
      return Optional.empty();
    }
    double then = residual - outward;
    String evidence =
        overlap.map(o -> ": `" + o.first() + "` and `" + o.second() + "` coincide").orElse("");
    return Optional.of(
        new Hypothesis(
            Explanation.Kind.COUNTED_TWICE,
            Hypothesis.FREE_OF_NUMBERS,
            List.of(rate.patch()),
            Optional.of(0.0),
            then,
            0,
            "If `"
                + rate.patch()
                + "` is counted twice"
                + evidence
                + ", then without it "
                + outcome(then)));
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
    double then = residual + (leavesOutside ? value : -value);
    return Optional.of(
        new Hypothesis(
            Explanation.Kind.LEFT_OUT,
            Hypothesis.FREE_OF_NUMBERS,
            List.of(rate.patch()),
            Optional.of(1.0),
            then,
            0,
            "If `"
                + rate.patch()
                + "` "
                + (leavesOutside ? "leaves " : "enters ")
                + "`"
                + balance.subject().name()
                + "` instead of the surroundings, "
                + outcome(then)));
  }

  /** What is left of the residual then; what is within w is nothing. */
  private String outcome(double then) {
    return Math.abs(then) <= balance.halfWidth()
        ? "the residual would vanish."
        : "the residual would be " + Figures.text(then, unit) + ".";
  }
}
