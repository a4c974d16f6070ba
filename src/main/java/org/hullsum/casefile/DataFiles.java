package org.hullsum.casefile;

import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.model.Case;
import org.hullsum.problem.ProblemKind;

/** The data files that a case names: found beside it, and remembered with their digests. */
final class DataFiles {
  private final Path folder;
  private final List<Path> allowed;
  private final int threads;
  private final ProblemAccumulator problems;
  private final Map<String, FileDigest> used = new LinkedHashMap<>();

  /**
   * @param folder of the case file
   * @param options say from which folders outside it files may be read
   */
  DataFiles(Path folder, ReadOptions options, ProblemAccumulator problems) {
    this.folder = folder;
    this.allowed = options.allowedOutside();
    this.threads = options.threads();
    this.problems = problems;
  }

  /** The file that a text names, relative to the case; empty, and told, where it can't be read. */
  Optional<Path> find(YamlText name) {
    Path file;
    try {
      file = folder.resolve(name.text()).normalize();
    } catch (InvalidPathException e) {
      problems.add(
          ProblemKind.FILE_UNREADABLE, name.place(), name.shown() + " can't be the name of a file");
      return Optional.empty();
    }
    Optional<String> fault = fault(file, name);
    fault.ifPresent(f -> problems.add(ProblemKind.FILE_UNREADABLE, name.place(), f));
    if (fault.isPresent()) {
      return Optional.empty();
    }
    used.computeIfAbsent(name.text(), n -> FileDigest.of(file));
    return Optional.of(file);
  }

  private Optional<String> fault(Path file, YamlText name) {
    Path absolute = file.toAbsolutePath().normalize();
    boolean inside =
        absolute.startsWith(folder.toAbsolutePath().normalize())
            || allowed.stream().anyMatch(a -> absolute.startsWith(a.toAbsolutePath().normalize()));
    if (!inside) {
      return Optional.of(
          name.shown()
              + " lies outside the case's folder; move it there, or allow its folder with"
              + " --allow-outside");
    }
    if (!Files.exists(file)) {
      return Optional.of("there is no file " + name.shown() + " beside the case");
    }
    if (Files.isDirectory(file)) {
      return Optional.of(name.shown() + " is a folder; name the file inside it");
    }
    return Files.isReadable(file)
        ? Optional.empty()
        : Optional.of("permission to read " + name.shown() + " is missing");
  }

  /** The threads that may be used to read them. */
  int threads() {
    return threads;
  }

  /** The files that were found, each once. */
  List<Case.SourceFile> sources() {
    List<Case.SourceFile> sources = new ArrayList<>();
    used.forEach((name, digest) -> sources.add(new Case.SourceFile(name, digest.text())));
    return sources;
  }
}
