package org.hullsum.audit;

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
    return new CaseAudit(audited, options).run();
  }
}
