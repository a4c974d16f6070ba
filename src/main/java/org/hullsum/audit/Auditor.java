package org.hullsum.audit;

import java.util.stream.IntStream;
import org.hullsum.closure.FacingFinder;
import org.hullsum.model.Case;

/**
 * Audits cases.
 *
 * <p>A case gives the same result, to the last bit, on any number of threads. Stateless and
 * thread-safe.
 */
public final class Auditor {
  private Auditor() {}

  /** The balances of a case, what is wrong with it, and what would explain what does not close. */
  public static CaseResult audit(Case audited, AuditOptions options) {
    return new CaseAudit(audited, options)
        .run(
            surfaces ->
                new FacingFinder(surfaces, audited.inputs().values())
                    .find(IntStream.range(0, surfaces.size()).boxed().toList()));
  }
}
