package org.hullsum.cli;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.time.Clock;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.audit.AuditOptions;
import org.hullsum.audit.CaseResult;
import org.hullsum.audit.PatchResult;
import org.hullsum.audit.PatchResult.FoundFacing;
import org.hullsum.audit.ProgressListener;
import org.hullsum.casefile.FacingRewriter;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Problem;
import org.hullsum.report.TextReport;

/**
 * One {@code hullsum orient}: writes the case with the facing of the patches corrected that were
 * found to face inward. What is written is audited before it takes its place.
 */
final class OrientRun {
  private static final String SUFFIX = "-oriented";

  private final String file;
  private final boolean inPlace;
  private final Output out;
  private final Output err;
  private final CasePipeline pipeline;
  private final CasePipeline.Settings settings;

  OrientRun(
      String file, boolean inPlace, Output out, Output err, Clock clock, CasePipeline pipeline) {
    this.file = file;
    this.inPlace = inPlace;
    this.out = out;
    this.err = err;
    this.pipeline = pipeline;
    this.settings =
        new CasePipeline.Settings(
            Map.of(),
            List.of(),
            AuditOptions.USUAL_DIGITS,
            Runtime.getRuntime().availableProcessors(),
            LocalDate.ofInstant(clock.instant(), ZoneOffset.UTC),
            ProgressListener.SILENT);
  }

  ExitCode run() {
    CaseResult result = pipeline.run(file, settings).result();
    for (Problem problem : result.problems()) {
      err.line(TextReport.of(problem));
    }
    if (result.isUnreadable()) {
      return ExitCode.WRONG_INPUT;
    }
    Set<String> inward = inward(result);
    ExitCode left = whatIsLeft(result);
    if (inward.isEmpty()) {
      out.line(file + ": nothing to turn");
      return left;
    }
    try {
      return turn(inward).and(left);
    } catch (IOException e) {
      err.line(file + ": can't be written: " + e.getMessage());
      return ExitCode.CANNOT_WRITE;
    }
  }

  private static Set<String> inward(CaseResult result) {
    Set<String> names = new LinkedHashSet<>();
    for (PatchResult patch : result.patches()) {
      if (patch.foundFacing().filter(FoundFacing.INWARD::equals).isPresent()) {
        names.add(patch.name());
      }
    }
    return names;
  }

  /** Tells the patches of which the right facing is not known. */
  private ExitCode whatIsLeft(CaseResult result) {
    ExitCode code = ExitCode.FINE;
    for (PatchResult patch : result.patches()) {
      if (patch.foundFacing().filter(FoundFacing.UNDETERMINED::equals).isPresent()) {
        out.line(
            file
                + ": "
                + patch.name()
                + " is left as it is: "
                + patch.facingReason().orElse("its facing is undetermined"));
        code = ExitCode.IMBALANCED;
      }
    }
    boolean conflict =
        result.findings().stream().anyMatch(f -> f.code() == FindingCode.ORIENTATION_CONFLICT);
    return conflict ? ExitCode.IMBALANCED : code;
  }

  private ExitCode turn(Set<String> inward) throws IOException {
    Path original = Path.of(file).toRealPath();
    Path target = inPlace ? original : beside(original);
    if (!inPlace && Files.exists(target)) {
      err.line(target + " is there already; move it away, or ask for --in-place");
      return ExitCode.CANNOT_WRITE;
    }
    FacingRewriter.Turned turned = FacingRewriter.turn(original, inward);
    turned.refused().forEach((name, reason) -> out.line(file + ": " + name + ": " + reason));
    Set<String> done = new LinkedHashSet<>(inward);
    done.removeAll(turned.refused().keySet());
    if (done.isEmpty()) {
      return ExitCode.IMBALANCED;
    }
    Path part = original.resolveSibling(original.getFileName() + ".part.yaml");
    try {
      Files.copy(original, part, StandardCopyOption.COPY_ATTRIBUTES);
      Files.write(part, turned.text().getBytes(StandardCharsets.UTF_8));
      Optional<String> wrong = stillWrong(part, done);
      if (wrong.isPresent()) {
        err.line(file + ": " + wrong.get() + " would still face inward; nothing was written");
        return ExitCode.FAULT;
      }
      Files.move(part, target, StandardCopyOption.ATOMIC_MOVE);
    } finally {
      Files.deleteIfExists(part);
    }
    out.line((inPlace ? file : besideName()) + ": turned " + String.join(", ", done));
    return turned.refused().isEmpty() ? ExitCode.FINE : ExitCode.IMBALANCED;
  }

  private Optional<String> stillWrong(Path part, Set<String> done) {
    Set<String> inward = inward(pipeline.run(part.toString(), settings).result());
    return done.stream().filter(inward::contains).findFirst();
  }

  private static Path beside(Path original) {
    return original.resolveSibling(orientedName(String.valueOf(original.getFileName())));
  }

  private String besideName() {
    Path given = Path.of(file);
    return given.resolveSibling(orientedName(String.valueOf(given.getFileName()))).toString();
  }

  private static String orientedName(String name) {
    int dot = name.lastIndexOf('.');
    return dot > 0 ? name.substring(0, dot) + SUFFIX + name.substring(dot) : name + SUFFIX;
  }
}
