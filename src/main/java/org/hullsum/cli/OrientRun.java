package org.hullsum.cli;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.time.Clock;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.LinkedHashMap;
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
import org.hullsum.casefile.MeshTurner;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Problem;
import org.hullsum.report.TextReport;

/**
 * One {@code hullsum orient}: writes the case with the facing of the patches corrected that were
 * found to face inward, and copies of meshes some of whose triangles face against the others. What
 * is written is audited before the case takes its place; if it is not right, no copy stays.
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
            ProgressListener.SILENT,
            false);
  }

  ExitCode run() {
    CaseResult result = pipeline.run(file, settings).result();
    for (Problem problem : result.problems()) {
      err.line(TextReport.of(problem));
    }
    if (result.isUnreadable()) {
      return ExitCode.WRONG_INPUT;
    }
    Set<String> mixed = mixed(result);
    if (inward(result).isEmpty() && mixed.isEmpty()) {
      out.line(file + ": nothing to turn");
      return whatIsLeft(result);
    }
    try {
      return turn(result, mixed);
    } catch (IOException e) {
      err.line(file + ": can't be written: " + e.getMessage());
      return ExitCode.CANNOT_WRITE;
    }
  }

  /** The meshes some of whose triangles face against the others. */
  private static Set<String> mixed(CaseResult result) {
    Set<String> names = new LinkedHashSet<>();
    result.findings().stream()
        .filter(f -> f.code() == FindingCode.ORIENTATION_REVERSED)
        .filter(f -> f.evidence().containsKey("triangles"))
        .forEach(f -> f.on().ifPresent(names::add));
    return names;
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

  /** Of a facing that not everything tells. */
  private void sayWhy(PatchResult patch) {
    patch
        .facingReason()
        .ifPresent(reason -> out.line(file + ": the facing of " + patch.name() + " " + reason));
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

  /** First the triangles of meshes, then, of what is then inward, the facings. */
  private ExitCode turn(CaseResult result, Set<String> mixed) throws IOException {
    Path original = Path.of(file).toRealPath();
    Path target = inPlace ? original : beside(original);
    if (!inPlace && Files.exists(target)) {
      err.line(target + " is there already; move it away, or ask for --in-place");
      return ExitCode.CANNOT_WRITE;
    }
    MeshTurner.Plan meshes = MeshTurner.plan(original, mixed, settings.threads());
    List<Path> fresh = new ArrayList<>();
    Path part = original.resolveSibling(original.getFileName() + ".part.yaml");
    Files.copy(original, part, StandardCopyOption.COPY_ATTRIBUTES);
    boolean done = false;
    try {
      for (MeshTurner.Copy copy : meshes.copies()) {
        if (copy.write()) {
          fresh.add(copy.file());
        }
      }
      Files.write(part, meshes.text().getBytes(StandardCharsets.UTF_8));
      CaseResult now = meshes.copies().isEmpty() ? result : again(part);
      Set<String> inward = inward(now);
      now.patches().stream().filter(p -> inward.contains(p.name())).forEach(this::sayWhy);
      ExitCode code = write(part, target, inward, meshes).and(whatIsLeft(now));
      done = code != ExitCode.FAULT;
      return code;
    } catch (FileAlreadyExistsException e) {
      // Of a copy: the case's own place was looked at before.
      err.line(e.getFile() + " is there already and holds something else; move it away");
      return ExitCode.CANNOT_WRITE;
    } finally {
      Files.deleteIfExists(part);
      for (Path copy : done ? List.<Path>of() : fresh) {
        Files.deleteIfExists(copy);
      }
    }
  }

  private CaseResult again(Path part) {
    return pipeline.run(part.toString(), settings).result();
  }

  private ExitCode write(Path part, Path target, Set<String> inward, MeshTurner.Plan meshes)
      throws IOException {
    FacingRewriter.Turned turned = FacingRewriter.turn(part, inward);
    Map<String, String> refused = new LinkedHashMap<>(meshes.refused());
    refused.putAll(turned.refused());
    refused.forEach((name, reason) -> out.line(file + ": " + name + ": " + reason));
    Set<String> done = new LinkedHashSet<>(inward);
    done.removeAll(refused.keySet());
    if (done.isEmpty() && meshes.copies().isEmpty()) {
      return ExitCode.IMBALANCED;
    }
    Files.write(part, turned.text().getBytes(StandardCharsets.UTF_8));
    Optional<String> wrong = stillWrong(part, done, meshes);
    if (wrong.isPresent()) {
      err.line(file + ": " + wrong.get() + "; nothing was written");
      return ExitCode.FAULT;
    }
    Files.move(part, target, StandardCopyOption.ATOMIC_MOVE);
    for (MeshTurner.Copy copy : meshes.copies()) {
      out.line(copy.file().getFileName() + ": turned " + copy.turned() + " triangles");
    }
    if (!done.isEmpty() || !meshes.copies().isEmpty()) {
      out.line(
          (inPlace ? file : besideName())
              + (done.isEmpty() ? ": written" : ": turned " + String.join(", ", done)));
    }
    return refused.isEmpty() ? ExitCode.FINE : ExitCode.IMBALANCED;
  }

  /** What the case as it would be written has against it. */
  private Optional<String> stillWrong(Path part, Set<String> done, MeshTurner.Plan meshes) {
    CaseResult written = again(part);
    if (written.isUnreadable()) {
      return Optional.of("what would be written can't be read: " + written.problems().get(0));
    }
    Set<String> inward = inward(written);
    Set<String> mixed = mixed(written);
    mixed.removeAll(meshes.refused().keySet());
    return done.stream()
        .filter(inward::contains)
        .map(p -> p + " would still face inward")
        .findFirst()
        .or(() -> mixed.stream().map(p -> p + " would still be at odds with itself").findFirst());
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
