package org.hullsum.casefile;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.hullsum.model.Case;

/**
 * Reads case files of the format {@code hullsum-case/1}.
 *
 * <p>All problems of a file are found in one reading, but for a file that is no YAML, where the
 * first fault hides the rest. Reading is bounded in the size of the file, the nesting, the aliases
 * and the length of a formula. Stateless and thread-safe.
 */
public final class CaseReader {
  private CaseReader() {}

  /** Reads a file; never throws for what is wrong with it. */
  public static ReadOutcome read(Path file, ReadOptions options) {
    ProblemAccumulator problems = new ProblemAccumulator();
    Optional<FileTextReader.Content> content = FileTextReader.read(file, options.name(), problems);
    Optional<Case> found =
        content.flatMap(
            c ->
                YamlReader.read(c.source(), problems)
                    .flatMap(
                        map -> new CaseBuilder(c, folderOf(file), options, problems).build(map)));
    return found.isPresent() && problems.fatalCount() == 0
        ? new ReadOutcome(found, List.of())
        : new ReadOutcome(Optional.empty(), problems.all());
  }

  private static Path folderOf(Path file) {
    Path parent = file.toAbsolutePath().getParent();
    return parent == null ? file.toAbsolutePath() : parent;
  }
}
