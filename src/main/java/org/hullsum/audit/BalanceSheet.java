package org.hullsum.audit;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.hullsum.model.Case;
import org.hullsum.model.Schedule;

/**
 * Draws the balances of volumes and envelopes: one for each instant, then the interval's.
 *
 * <p>What a balance is drawn from is given by the instant; the interval's figures are the means of
 * them.
 */
final class BalanceSheet {
  private final Case audited;
  private final Scales scales;
  private final List<List<PatchRate>> rates;
  private final List<InteriorAudit> interiors;
  private final BalanceBuilder.RateNames names;

  /**
   * @param rates of every patch, by the instant
   * @param interiors of every volume
   */
  BalanceSheet(
      Case audited, Scales scales, List<List<PatchRate>> rates, List<InteriorAudit> interiors) {
    this.audited = audited;
    this.scales = scales;
    this.rates = List.copyOf(rates);
    this.interiors = List.copyOf(interiors);
    this.names = new BalanceBuilder.RateNames(audited.quantity().name(), scales.rateUnit());
  }

  /**
   * The balances of one volume or envelope.
   *
   * @param balances each instant, then the interval
   */
  record Drawn(BalanceSubject subject, List<Balance> balances, Schedule schedule) {
    Drawn {
      balances = List.copyOf(balances);
    }

    /**
     * The index of the balance that is explained: the interval's where it does not close, else the
     * instant with the gravest verdict and the largest residual.
     */
    int worst() {
      int last = balances.size() - 1;
      if (schedule.span() && balances.get(last).result().verdict() != Verdict.BALANCED) {
        return last;
      }
      Comparator<Integer> graver =
          Comparator.<Integer, Verdict>comparing(i -> balances.get(i).result().verdict())
              .thenComparing(
                  i -> Math.abs(balances.get(i).residual().map(Estimate::value).orElse(0.0)));
      int worst = 0;
      for (int i = 1; i < balances.size(); i++) {
        worst = graver.compare(i, worst) > 0 ? i : worst;
      }
      return worst;
    }

    /** A figure that is known by the instant, at the balance of that index. */
    Estimate at(int index, List<Estimate> byInstant) {
      return index < byInstant.size()
          ? byInstant.get(index)
          : TimeMean.over(byInstant.size()).of(byInstant);
    }
  }

  Drawn draw(BalanceSubject subject) {
    Schedule schedule = audited.schedule();
    List<Balance> balances = new ArrayList<>();
    for (int i = 0; i < rates.size(); i++) {
      int instant = i;
      BalanceBuilder builder =
          new BalanceBuilder(subject, rates.get(i), audited.inputs(), names)
              .interior(interiors.stream().flatMap(v -> v.terms().get(instant).stream()).toList());
      divergence(subject, i).ifPresent(builder::beside);
      if (!schedule.instants().isEmpty()) {
        builder.at(scales.time() * schedule.instants().get(i));
      }
      balances.add(builder.draw());
    }
    if (schedule.span()) {
      balances.add(mean(subject, balances));
    }
    return new Drawn(subject, balances, schedule);
  }

  private Balance mean(BalanceSubject subject, List<Balance> balances) {
    TimeMean mean = TimeMean.over(rates.size());
    List<PatchRate> meanRates = new ArrayList<>();
    for (int p = 0; p < rates.get(0).size(); p++) {
      int patch = p;
      meanRates.add(PatchRate.mean(rates.stream().map(r -> r.get(patch)).toList(), mean));
    }
    List<InteriorRate> interior = new ArrayList<>();
    for (InteriorAudit volume : interiors) {
      for (int k = 0; k < volume.terms().get(0).size(); k++) {
        int term = k;
        interior.add(
            InteriorRate.mean(volume.terms().stream().map(t -> t.get(term)).toList(), mean));
      }
    }
    List<Estimate> residuals = balances.stream().flatMap(b -> b.residual().stream()).toList();
    BalanceBuilder builder =
        new BalanceBuilder(subject, meanRates, audited.inputs(), names).interior(interior);
    List<InteriorRate> beside = new ArrayList<>();
    for (int i = 0; i < rates.size(); i++) {
      divergence(subject, i).ifPresent(beside::add);
    }
    if (beside.size() == rates.size()) {
      builder.beside(InteriorRate.mean(beside, mean));
    }
    List<Double> instants = audited.schedule().instants();
    return builder
        .over(
            scales.time() * instants.get(0),
            scales.time() * instants.get(instants.size() - 1),
            residuals.size() == rates.size() ? Optional.of(mean.of(residuals)) : Optional.empty())
        .draw();
  }

  /** The integral of the fields' divergence over all members, where each has one. */
  private Optional<InteriorRate> divergence(BalanceSubject subject, int instant) {
    if (subject.check() == BalanceResult.Check.IDENTITY) {
      return Optional.empty();
    }
    List<InteriorRate> parts = new ArrayList<>();
    for (InteriorAudit volume : interiors) {
      if (subject.members().contains(volume.volume())) {
        if (volume.divergence().isEmpty() || volume.divergence().get(instant).value().isEmpty()) {
          return Optional.empty();
        }
        parts.add(volume.divergence().get(instant));
      }
    }
    return parts.isEmpty()
        ? Optional.empty()
        : Optional.of(InteriorRate.sum(subject.name(), parts));
  }
}
