package org.hullsum.cli;

import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.time.Clock;
import java.util.List;

/** The entry point: hands the process's own streams to the {@link Program} and ends the process. */
public final class Main {
  private Main() {}

  /** Runs the command of the arguments and ends the process with its exit code. */
  public static void main(String[] arguments) {
    // The raw descriptors: System.out would swallow a write that failed.
    Program program =
        new Program(
            new FileOutputStream(FileDescriptor.out),
            new FileOutputStream(FileDescriptor.err),
            Clock.systemUTC(),
            new ReadAndAudit(),
            Terminal.ofThisProcess());
    System.exit(program.run(List.of(arguments)).status());
  }
}
