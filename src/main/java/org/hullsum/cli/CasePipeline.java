package org.hullsum.cli;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import org.hullsum.audit.CaseResult;
import org.hullsum.audit.ProgressListener;
import org.hullsum.model.Case;

/** From the name of a case file to its result. */
@FunctionalInterface
interface CasePipeline {
  /**
   * How a case is read and audited.
   *
   * @param parameters values that replace those of the case, by name
   * @param allowedFolders folders outside the case's own from which data may be read
   * @param digits requested accuracy
   * @param threads at least 1
   * @param today the day for waivers
   * @param progress told of finished pieces of work
   * @param secondOpinion whether winding numbers are asked of every facing
   */
  record Settings(
      Map<String, String> parameters,
      List<Path> allowedFolders,
      int digits,
      int threads,
      LocalDate today,
      ProgressListener progress,
      boolean secondOpinion) {
    public Settings {
      parameters = Map.copyOf(parameters);
      allowedFolders = List.copyOf(allowedFolders);
    }
  }

  /**
   * What came of a case.
   *
   * @param result its result
   * @param sources the files that were read for it
   */
  record Outcome(CaseResult result, List<Case.SourceFile> sources) {
    public Outcome {
      sources = List.copyOf(sources);
    }
  }

  Outcome run(String file, Settings settings);
}
