package org.hullsum.cli;

import java.nio.file.Path;
import java.util.List;
import org.hullsum.audit.AuditOptions;
import org.hullsum.audit.Auditor;
import org.hullsum.audit.CaseResult;
import org.hullsum.casefile.CaseReader;
import org.hullsum.casefile.ReadOptions;
import org.hullsum.casefile.ReadOutcome;
import org.hullsum.model.Case;

/** Reads a case file and audits the case. */
final class ReadAndAudit implements CasePipeline {
  @Override
  public Outcome run(String file, Settings settings) {
    ReadOutcome outcome =
        CaseReader.read(
            Path.of(file), new ReadOptions(file, settings.parameters(), settings.allowedFolders()));
    if (outcome.found().isEmpty()) {
      return new Outcome(CaseResult.unreadable(file, outcome.problems()), List.of());
    }
    Case found = outcome.found().get();
    CaseResult result =
        Auditor.audit(
            found,
            new AuditOptions(
                settings.digits(), settings.threads(), settings.today(), settings.progress()));
    return new Outcome(result, found.sources());
  }
}
