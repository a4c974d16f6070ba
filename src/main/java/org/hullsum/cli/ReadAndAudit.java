package org.hullsum.cli;

import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.List;
import org.hullsum.audit.AuditOptions;
import org.hullsum.audit.Auditor;
import org.hullsum.audit.CaseResult;
import org.hullsum.casefile.CaseReader;
import org.hullsum.casefile.ReadOptions;
import org.hullsum.casefile.ReadOutcome;
import org.hullsum.model.Case;
import org.hullsum.problem.Place;
import org.hullsum.problem.Problem;
import org.hullsum.problem.ProblemKind;

/** Reads a case file and audits the case in it. */
final class ReadAndAudit implements CasePipeline {
  @Override
  public Outcome run(String file, Settings settings) {
    ReadOutcome read;
    try {
      read =
          CaseReader.read(
              Path.of(file),
              new ReadOptions(
                  file, settings.parameters(), settings.allowedFolders(), settings.threads()));
    } catch (InvalidPathException e) {
      return unreadable(
          file,
          List.of(
              new Problem(
                  ProblemKind.FILE_UNREADABLE,
                  Place.wholeFile(file),
                  "no file can have this name: " + e.getReason())));
    }
    if (read.found().isEmpty()) {
      return unreadable(file, read.problems());
    }
    Case found = read.found().get();
    CaseResult result =
        Auditor.audit(
            found,
            new AuditOptions(
                settings.digits(),
                settings.threads(),
                settings.today(),
                settings.progress(),
                settings.secondOpinion()));
    return new Outcome(result, found.sources());
  }

  private static Outcome unreadable(String file, List<Problem> problems) {
    return new Outcome(CaseResult.unreadable(file, problems), List.of());
  }
}
