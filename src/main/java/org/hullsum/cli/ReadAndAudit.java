package org.hullsum.cli;

import java.util.List;
import org.hullsum.audit.CaseResult;

final class ReadAndAudit implements CasePipeline {
  @Override
  public Outcome run(String file, Settings settings) {
    return new Outcome(CaseResult.unreadable(file, List.of()), List.of());
  }
}
