package org.hullsum.audit;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import org.hullsum.model.Inputs;

/**
 * The residuals of all balances of a case: what is supposed of a patch changes each balance on
 * whose boundary it lies, and one that closed speaks against what would open it.
 */
final class JointResiduals {
  private final List<Member> members = new ArrayList<>();
  private final Map<Balance, Integer> numbers = new IdentityHashMap<>();

  /** One balance that has a residual. */
  private record Member(Balance balance, ResidualModel model, Map<String, PatchRate> rates) {
    boolean isAsOf(Balance other) {
      return balance.result().at().equals(other.result().at())
          && balance.result().over().equals(other.result().over());
    }
  }

  /**
   * A supposition, judged.
   *
   * @param then the residual of the balance in question
   * @param uncertainty its standard uncertainty
   * @param fits whether that can't be told from zero and nothing speaks against it
   * @param unlikelihood over all balances that it changes; the larger the less likely
   * @param against a balance that closes as stated and would not then
   */
  record Judged(
      double then,
      double uncertainty,
      boolean fits,
      double unlikelihood,
      Optional<String> against) {}

  JointResiduals(List<Balance> balances, Inputs inputs) {
    for (Balance balance : balances) {
      if (balance.residual().isPresent()) {
        Map<String, PatchRate> rates = new HashMap<>();
        balance.rates().forEach(rate -> rates.put(rate.patch(), rate));
        numbers.put(balance, members.size());
        members.add(new Member(balance, ResidualModel.of(balance, inputs), rates));
      }
    }
  }

  /** What one balance alone would be with something added to its residual. */
  Judged alone(Balance balance, Estimate change) {
    ResidualModel.Outcome outcome = memberOf(balance).model().after(change);
    return new Judged(
        outcome.value(),
        outcome.uncertainty(),
        outcome.fits(),
        outcome.unlikelihood(),
        Optional.empty());
  }

  /** If the true rate of a patch were a multiple of the stated one. */
  Judged multiplied(Balance balance, String patch, double factor) {
    return judged(balance, patch, rate -> rate.times(factor - 1));
  }

  /** If the true rate of a patch were such that the balance closes. */
  Judged fitted(Balance balance, PatchRate patch) {
    Estimate residual = balance.residual().orElseThrow();
    Estimate shift = residual.times(-balance.subject().signOf(patch));
    return judged(balance, patch.patch(), rate -> shift);
  }

  private Judged judged(Balance balance, String patch, Function<Estimate, Estimate> shift) {
    Judged own = alone(balance, change(memberOf(balance), patch, shift).orElseThrow());
    double unlikelihood = own.unlikelihood();
    Optional<String> against = Optional.empty();
    for (int m = 0; m < members.size(); m++) {
      Member member = members.get(m);
      if (m == numbers.get(balance) || !member.isAsOf(balance)) {
        continue;
      }
      Optional<Estimate> change = change(member, patch, shift);
      if (change.isPresent()) {
        ResidualModel.Outcome now = member.model().now();
        ResidualModel.Outcome then = member.model().after(change.get());
        unlikelihood += then.unlikelihood() - now.unlikelihood();
        if (now.fits() && !then.fits()) {
          against = Optional.of(member.balance().subject().name());
        }
      }
    }
    return new Judged(
        own.then(), own.uncertainty(), own.fits() && against.isEmpty(), unlikelihood, against);
  }

  /** What is added to a balance's residual; empty where the patch is not on its boundary. */
  private static Optional<Estimate> change(
      Member member, String patch, Function<Estimate, Estimate> shift) {
    PatchRate rate = member.rates().get(patch);
    int sign = rate == null ? 0 : member.balance().subject().signOf(rate);
    return sign == 0 ? Optional.empty() : rate.total().map(total -> shift.apply(total).times(sign));
  }

  private Member memberOf(Balance balance) {
    return members.get(numbers.get(balance));
  }
}
