package org.hullsum.cli;

import java.io.ByteArrayOutputStream;
import java.nio.charset.StandardCharsets;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneId;
import java.util.List;

/** One run of the program in this process: its exit code and what it printed. */
record ProgramRun(int status, String out, String err) {
  private static final Clock CLOCK =
      Clock.fixed(Instant.parse("2026-03-01T23:30:00.5Z"), ZoneId.of("Asia/Tokyo"));

  static ProgramRun of(CasePipeline pipeline, String... arguments) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    ExitCode code = new Program(out, err, CLOCK, pipeline, Terminal.NONE).run(List.of(arguments));
    return new ProgramRun(
        code.status(), out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
  }
}
