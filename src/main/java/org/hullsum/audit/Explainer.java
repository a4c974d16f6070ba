package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.model.Inputs;
import org.hullsum.model.Volume;

/**
 * Explains the balances that do not close, by hypotheses of one cause each.
 *
 * <p>Class 1: {@code reversed} where the found facing differs (with several such patches also all
 * of them together), {@code gap}, {@code field-makes-source}. Class 2, with no free number: {@code
 * reversed}, {@code counted-twice}, {@code radius-for-diameter}, {@code unit-slip}, {@code
 * density-left-out}, {@code left-out}. Patches with surfaces have a veto: class 2 reverses none of
 * them, one counted twice needs an overlap, one left out a surface that is not closed. Class 3,
 * with one number that is fitted: {@code stale-level}, {@code one-meter-bias}, {@code leak}, {@code
 * left-out}. What is supposed of a patch is held against every balance on whose boundary it lies.
 *
 * <p><b>Fits by chance.</b> Of the hypotheses of class 2, N change the residual r by between half
 * of it and twice it, either way. Had they nothing to do with it, each would land within w of zero
 * with a probability of 2 w / (3 |r|), the part of that range that is so near. The number stated is
 * Σ N·min(1, 2 w / (3 |r|)) over the balances. Hypotheses of class 1 rest on evidence of their own
 * and are not counted.
 */
final class Explainer {
  /** Hypotheses that explain less are not worth reading, but for what is seen to be wrong. */
  private static final double WORTH_SAYING = 0.5;

  /** So many explanations of one class and balance at most. */
  private static final int MOST = 24;

  private final Clues clues;
  private final Inputs inputs;

  Explainer(Clues clues, Inputs inputs) {
    this.clues = clues;
    this.inputs = inputs;
  }

  /**
   * What the case is told.
   *
   * @param explanations balance by balance, each ranked
   * @param fitByChance empty where nothing was to be explained
   */
  record Explanations(List<Explanation> explanations, Optional<Double> fitByChance) {
    Explanations {
      explanations = List.copyOf(explanations);
    }
  }

  Explanations explain(List<Balance> balances) {
    List<Explanation> explanations = new ArrayList<>();
    double byChance = 0;
    boolean any = false;
    JointResiduals joint = new JointResiduals(balances, inputs);
    for (Balance balance : balances) {
      if (balance.result().verdict() == Verdict.BALANCED) {
        continue;
      }
      List<Hypothesis> hypotheses = hypotheses(balance, joint);
      any |= !hypotheses.isEmpty();
      byChance += fitByChance(hypotheses, balance);
      rank(hypotheses, balance, explanations);
    }
    return new Explanations(explanations, any ? Optional.of(byChance) : Optional.empty());
  }

  private List<Hypothesis> hypotheses(Balance balance, JointResiduals joint) {
    List<Hypothesis> all = new ArrayList<>();
    gap(balance).ifPresent(all::add);
    if (balance.residual().isPresent()) {
      all.addAll(new PatchHypotheses(clues, balance, joint).all());
      makesSource(balance, balance.residual().get()).ifPresent(all::add);
      all.addAll(new FittedHypotheses(clues, balance, joint).all());
    }
    return all;
  }

  private Optional<Hypothesis> gap(Balance balance) {
    return Optional.ofNullable(clues.gaps().get(balance.subject().name()))
        .filter(g -> g.residualThen().isPresent())
        .map(
            g ->
                new Hypothesis(
                    Explanation.Kind.GAP,
                    Hypothesis.SHOWN,
                    g.between(),
                    Optional.of(g.area()),
                    g.residualThen().get(),
                    fits(balance, g.residualThen().get(), g.slack()),
                    0,
                    "The surface has "
                        + g.described()
                        + "; plane patches over its rims would carry "
                        + Figures.text(g.flux().orElse(0.0), balance.result().unit())
                        + " outward."));
  }

  /**
   * The identity outward = ∫ div F holds, so surface, facings and integrals are right, and what is
   * left over is made by the field itself.
   */
  private Optional<Hypothesis> makesSource(Balance balance, Estimate residual) {
    List<String> fields = clues.fields().getOrDefault(balance.subject().name(), List.of());
    Optional<BalanceResult.Term> beside = balance.result().divergence();
    if (fields.isEmpty() || beside.flatMap(BalanceResult.Term::value).isEmpty()) {
      return Optional.empty();
    }
    double makes = beside.get().value().get();
    double stated = balance.result().interior().orElse(0.0);
    String unit = balance.result().unit();
    String message =
        "The divergence of `"
            + String.join("`, `", fields)
            + "` makes "
            + Figures.text(makes, unit)
            + " inside, where the case states "
            + Figures.text(stated, unit)
            + ".";
    return Optional.of(
        new Hypothesis(
            Explanation.Kind.FIELD_MAKES_SOURCE,
            Hypothesis.SHOWN,
            fields,
            Optional.empty(),
            residual.value() + stated - makes,
            fits(
                balance,
                residual.value() + stated - makes,
                beside.get().numericalError().orElse(0.0)),
            0,
            message));
  }

  /** Whether what is left is within w and a numerical error beside it. */
  private static boolean fits(Balance balance, double then, double slack) {
    return Math.abs(then) <= balance.halfWidth() + slack;
  }

  private static double fitByChance(List<Hypothesis> hypotheses, Balance balance) {
    double residual = balance.residual().map(Estimate::value).orElse(0.0);
    double size = Math.abs(residual);
    long near =
        hypotheses.stream()
            .filter(h -> h.rank() == Hypothesis.FREE_OF_NUMBERS)
            .mapToDouble(h -> Math.abs(h.then() - residual))
            .filter(change -> change >= size / 2 && change <= 2 * size)
            .count();
    return near == 0 ? 0 : near * Math.min(1, 2 * balance.halfWidth() / (3 * size));
  }

  private static void rank(
      List<Hypothesis> hypotheses, Balance balance, List<Explanation> explanations) {
    Optional<Double> now = balance.residual().map(Estimate::value);
    int[] said = new int[Hypothesis.FITTED + 1];
    // What does not fit is only worth reading where nothing without a free number does.
    boolean told = hypotheses.stream().anyMatch(h -> h.fits() && h.rank() < Hypothesis.FITTED);
    List<Hypothesis> kept =
        hypotheses.stream()
            .sorted(Hypothesis.ranking(now.orElse(0.0), balance.halfWidth()))
            .filter(h -> h.fits() || isEvident(h) || (!told && explained(now, h) >= WORTH_SAYING))
            .filter(h -> h.fits() || h.rank() != Hypothesis.FITTED)
            .filter(h -> said[h.rank()]++ < MOST)
            .toList();
    int first = explanations.size();
    for (int i = 0; i < kept.size(); i++) {
      Hypothesis h = kept.get(i);
      List<Integer> tied = new ArrayList<>();
      for (int j = 0; j < kept.size(); j++) {
        Hypothesis other = kept.get(j);
        if (j != i && h.fits() && other.fits() && other.rank() == h.rank()) {
          tied.add(first + j);
        }
      }
      explanations.add(
          new Explanation(
              h.kind(),
              balance.result().volume(),
              h.on(),
              h.factor(),
              now,
              h.then(),
              explained(now, h),
              h.fits(),
              tied,
              h.message()));
    }
  }

  private static boolean isEvident(Hypothesis h) {
    return h.rank() == Hypothesis.SHOWN && h.kind() != Explanation.Kind.FIELD_MAKES_SOURCE;
  }

  /** Without a residual a hypothesis explains all or nothing. */
  private static double explained(Optional<Double> now, Hypothesis h) {
    if (now.isEmpty()) {
      return h.fits() ? 1 : 0;
    }
    double size = Math.abs(now.get());
    return size == 0 ? 0 : Math.max(0, 1 - Math.abs(h.then()) / size);
  }

  /** Whether a name is a volume of the case rather than the outside. */
  static boolean isOutside(String volume) {
    return Volume.SURROUNDINGS.equals(volume);
  }
}
