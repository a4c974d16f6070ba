package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.model.Volume;

/**
 * Explains the balances that do not close, by hypotheses of one cause each.
 *
 * <p>Class 1: {@code reversed} where the found facing differs (with several such patches also all
 * of them together), {@code gap}, {@code field-makes-source}. Class 2: {@code reversed}, {@code
 * counted-twice}, {@code left-out}. Patches with surfaces have a veto: class 2 reverses none of
 * them, one counted twice needs an overlap, one left out a surface that is not closed.
 *
 * <p><b>Fits by chance.</b> For one balance with N hypotheses of class 2, residual r and half-width
 * w, let R be the larger of |r| and the largest change |then − r| among them. A change that had
 * nothing to do with the residual, drawn evenly from −R to R, lands within w of zero with
 * probability min(1, w/R). The number stated is Σ N·min(1, w/R) over the balances. Hypotheses of
 * class 1 rest on evidence of their own and are not counted.
 */
final class Explainer {
  /** Hypotheses that explain less are not worth reading, but for what is seen to be wrong. */
  private static final double WORTH_SAYING = 0.5;

  /** So many explanations of one balance at most. */
  private static final int MOST = 12;

  private final Clues clues;

  Explainer(Clues clues) {
    this.clues = clues;
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
    for (Balance balance : balances) {
      if (balance.result().verdict() == Verdict.BALANCED) {
        continue;
      }
      List<Hypothesis> hypotheses = hypotheses(balance);
      any |= !hypotheses.isEmpty();
      byChance += fitByChance(hypotheses, balance);
      rank(hypotheses, balance, explanations);
    }
    return new Explanations(explanations, any ? Optional.of(byChance) : Optional.empty());
  }

  private List<Hypothesis> hypotheses(Balance balance) {
    List<Hypothesis> all = new ArrayList<>();
    gap(balance).ifPresent(all::add);
    if (balance.residual().isPresent()) {
      double residual = balance.residual().get().value();
      String unit = balance.result().unit();
      PatchHypotheses patches = new PatchHypotheses(clues, balance, residual, unit);
      all.addAll(patches.all());
      makesSource(balance, residual).ifPresent(all::add);
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
                    g.slack(),
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
  private Optional<Hypothesis> makesSource(Balance balance, double residual) {
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
            residual + stated - makes,
            beside.get().numericalError().orElse(0.0),
            message));
  }

  private static double fitByChance(List<Hypothesis> hypotheses, Balance balance) {
    double residual = balance.residual().map(Estimate::value).orElse(0.0);
    double range = Math.abs(residual);
    int count = 0;
    for (Hypothesis hypothesis : hypotheses) {
      if (hypothesis.rank() == Hypothesis.FREE_OF_NUMBERS) {
        count++;
        range = Math.max(range, Math.abs(hypothesis.then() - residual));
      }
    }
    return count == 0 || range == 0 ? 0 : count * Math.min(1, balance.halfWidth() / range);
  }

  private static void rank(
      List<Hypothesis> hypotheses, Balance balance, List<Explanation> explanations) {
    Optional<Double> now = balance.residual().map(Estimate::value);
    double w = balance.halfWidth();
    List<Hypothesis> kept =
        hypotheses.stream()
            .sorted(Hypothesis.ranking(now.orElse(0.0), w))
            .filter(h -> isEvident(h) || explained(now, h, w) >= WORTH_SAYING)
            .limit(MOST)
            .toList();
    int first = explanations.size();
    for (int i = 0; i < kept.size(); i++) {
      Hypothesis h = kept.get(i);
      List<Integer> tied = new ArrayList<>();
      for (int j = 0; j < kept.size(); j++) {
        Hypothesis other = kept.get(j);
        if (j != i && h.fits(w) && other.fits(w) && other.rank() == h.rank()) {
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
              explained(now, h, w),
              h.fits(w),
              tied,
              h.message()));
    }
  }

  private static boolean isEvident(Hypothesis h) {
    return h.rank() == Hypothesis.SHOWN && h.kind() != Explanation.Kind.FIELD_MAKES_SOURCE;
  }

  /** Without a residual a hypothesis explains all or nothing. */
  private static double explained(Optional<Double> now, Hypothesis h, double halfWidth) {
    if (now.isEmpty()) {
      return h.fits(halfWidth) ? 1 : 0;
    }
    double size = Math.abs(now.get());
    return size == 0 ? 0 : Math.max(0, 1 - Math.abs(h.then()) / size);
  }

  /** Whether a name is a volume of the case rather than the outside. */
  static boolean isOutside(String volume) {
    return Volume.SURROUNDINGS.equals(volume);
  }
}
