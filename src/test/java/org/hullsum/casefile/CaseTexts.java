package org.hullsum.casefile;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Collectors;
import org.hullsum.model.Case;

/** Cases for tests, read from texts. */
final class CaseTexts {
  static final String NAME = "case.yaml";

  private CaseTexts() {}

  static ReadOutcome read(String text) {
    return read(text, ReadOptions.named(NAME));
  }

  static ReadOutcome read(String text, ReadOptions options) {
    return read(text.getBytes(StandardCharsets.UTF_8), options);
  }

  static ReadOutcome read(byte[] bytes, ReadOptions options) {
    try {
      Path file = Files.createTempFile("hullsum", ".yaml");
      try {
        Files.write(file, bytes);
        return CaseReader.read(file, options);
      } finally {
        Files.delete(file);
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** The case of a text that must be good. */
  static Case good(String text) {
    ReadOutcome outcome = read(text);
    return outcome
        .found()
        .orElseThrow(() -> new AssertionError("refused:\n" + problems(outcome) + "\n" + text));
  }

  static String problems(ReadOutcome outcome) {
    return outcome.problems().stream()
        .map(p -> p.kind() + " " + p)
        .collect(Collectors.joining("\n"));
  }

  /** A case with the given top-level parts, completed by a format, a quantity and a patch. */
  static String completed(String parts) {
    StringBuilder text = new StringBuilder();
    if (!hasKey(parts, "format")) {
      text.append("format: hullsum-case/1\n");
    }
    if (!hasKey(parts, "quantity") && !parts.contains("units: none")) {
      text.append("quantity: volume\n");
    }
    if (!hasKey(parts, "patches")) {
      text.append("patches:\n  p: {flux: none}\n");
    }
    return text.append(parts).toString();
  }

  static boolean hasKey(String parts, String key) {
    return parts.lines().anyMatch(line -> line.startsWith(key + ":"));
  }

  /** The good case, of which the one-fault siblings are made. */
  static String goodCase() {
    try (InputStream in = CaseTexts.class.getResourceAsStream("good.yaml")) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
