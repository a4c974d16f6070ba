package org.hullsum.cli;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;

/** The name and version of the program, as the build wrote them down. */
final class ProgramVersion {
  private ProgramVersion() {}

  static String text() {
    try (InputStream in = ProgramVersion.class.getResourceAsStream("version.txt")) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8).strip();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
