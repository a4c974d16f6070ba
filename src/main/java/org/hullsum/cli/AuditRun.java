package org.hullsum.cli;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.io.UncheckedIOException;
import java.time.Clock;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.hullsum.audit.AuditResult;
import org.hullsum.audit.CaseResult;
import org.hullsum.cli.CasePipeline.Outcome;
import org.hullsum.cli.CasePipeline.Settings;
import org.hullsum.model.Case;
import org.hullsum.problem.Problem;
import org.hullsum.report.JsonReport;
import org.hullsum.report.JunitReport;
import org.hullsum.report.TextReport;

/**
 * One {@code hullsum audit}: audits the cases side by side, prints each as soon as those before it
 * are printed, writes the documents, and tells the exit code. A case that can't be read, or on
 * which the program fails, does not keep the others from being audited; after such a failure no
 * document is written, since it would pass for a whole one.
 */
final class AuditRun {
  private final AuditRequest request;
  private final Output out;
  private final Output err;
  private final Clock clock;
  private final CasePipeline pipeline;
  private final Terminal terminal;

  AuditRun(
      AuditRequest request,
      Output out,
      Output err,
      Clock clock,
      CasePipeline pipeline,
      Terminal terminal) {
    this.request = request;
    this.out = out;
    this.err = err;
    this.clock = clock;
    this.pipeline = pipeline;
    this.terminal = terminal;
  }

  ExitCode run() {
    Instant now = clock.instant().truncatedTo(ChronoUnit.SECONDS);
    List<CaseResult> results = new ArrayList<>();
    Set<Case.SourceFile> sources = new LinkedHashSet<>();
    ExitCode code = ExitCode.FINE;
    int side = Math.min(request.threads(), request.cases().size());
    ExecutorService pool = Executors.newFixedThreadPool(side);
    try (ProgressLine progress =
        ProgressLine.on(request.progress() ? terminal : Terminal.NONE, err)) {
      Settings settings = settings(now, request.threads() / side, progress);
      List<Future<Outcome>> futures =
          request.cases().stream()
              .map(file -> pool.submit(() -> pipeline.run(file, settings)))
              .toList();
      for (int i = 0; i < futures.size(); i++) {
        Optional<Outcome> outcome = await(request.cases().get(i), futures.get(i));
        if (outcome.isEmpty()) {
          code = code.and(ExitCode.FAULT);
          continue;
        }
        CaseResult result = outcome.get().result();
        progress.wipe();
        print(result);
        results.add(result);
        sources.addAll(outcome.get().sources());
        code = code.and(ExitCode.of(result));
      }
    } finally {
      pool.shutdownNow();
    }
    AuditResult result = new AuditResult(results, provenance(now, sources));
    if (!request.documentOnStandardOutput() && !request.quiet()) {
      out.print(TextReport.closing(result));
    }
    return code == ExitCode.FAULT ? withoutDocuments() : code.and(writeDocuments(result));
  }

  private Settings settings(Instant now, int threads, ProgressLine progress) {
    return new Settings(
        request.parameters(),
        request.allowedFolders(),
        request.digits(),
        threads,
        LocalDate.ofInstant(now, ZoneOffset.UTC),
        progress,
        request.secondOpinion());
  }

  private Optional<Outcome> await(String file, Future<Outcome> future) {
    try {
      return Optional.of(future.get());
    } catch (ExecutionException e) {
      err.line(file + ": " + Faults.describe(e.getCause()));
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      err.line(file + ": the audit was interrupted");
    }
    return Optional.empty();
  }

  private void print(CaseResult result) {
    for (Problem problem : result.problems()) {
      err.line(TextReport.of(problem));
    }
    if (!request.documentOnStandardOutput()) {
      out.print(request.quiet() ? TextReport.brief(result) : TextReport.of(result));
    }
  }

  private AuditResult.Provenance provenance(Instant now, Set<Case.SourceFile> sources) {
    return new AuditResult.Provenance(
        ProgramVersion.text(),
        "formulas over blocks of points, Java " + Runtime.version().feature(),
        now.toString(),
        request.parameters(),
        List.copyOf(sources));
  }

  private ExitCode withoutDocuments() {
    if (request.json().isPresent() || request.junit().isPresent()) {
      err.line("no document was written, because the program failed on a case");
    }
    return ExitCode.FAULT;
  }

  private ExitCode writeDocuments(AuditResult result) {
    ExitCode code = ExitCode.FINE;
    if (request.json().isPresent()) {
      code = code.and(write(request.json().get(), bytes(o -> JsonReport.write(result, o))));
    }
    if (request.junit().isPresent()) {
      code = code.and(write(request.junit().get(), bytes(o -> JunitReport.write(result, o))));
    }
    return code;
  }

  private ExitCode write(String file, byte[] document) {
    if (file.equals(AuditRequest.STANDARD_OUTPUT)) {
      out.write(document);
      return ExitCode.FINE;
    }
    Optional<String> failure = OutputFile.write(file, document);
    failure.ifPresent(err::line);
    return failure.isPresent() ? ExitCode.CANNOT_WRITE : ExitCode.FINE;
  }

  /** Writes a document to any stream. */
  private interface Document {
    void writeTo(OutputStream out) throws IOException;
  }

  private static byte[] bytes(Document document) {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try {
      document.writeTo(bytes);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return bytes.toByteArray();
  }
}
