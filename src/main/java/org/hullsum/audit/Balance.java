package org.hullsum.audit;

import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * A balance that was drawn, with what its explanations need beyond the result.
 *
 * @param subject of what
 * @param rates every patch of the case, at the instant or on average
 * @param residual with its error and sensitivities; empty where it could not be computed
 * @param decision empty where there is no residual
 * @param result for the reports
 */
record Balance(
    BalanceSubject subject,
    List<PatchRate> rates,
    Optional<Estimate> residual,
    Optional<Decision> decision,
    BalanceResult result) {
  Balance {
    Objects.requireNonNull(subject, "subject");
    Objects.requireNonNull(residual, "residual");
    Objects.requireNonNull(decision, "decision");
    Objects.requireNonNull(result, "result");
    rates = List.copyOf(rates);
  }

  /** w; 0 where there is no residual. */
  double halfWidth() {
    return decision.map(Decision::halfWidth).orElse(0.0);
  }
}
