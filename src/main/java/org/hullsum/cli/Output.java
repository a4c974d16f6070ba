package org.hullsum.cli;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;

/**
 * One of the two standard streams: UTF-8 text, or bytes. After a write has failed nothing more is
 * written, and {@link #hasFailed} says so at the end. Thread-safe.
 */
final class Output {
  private final OutputStream stream;
  private boolean failed;

  Output(OutputStream stream) {
    this.stream = stream;
  }

  synchronized void print(String text) {
    write(text.getBytes(StandardCharsets.UTF_8));
  }

  synchronized void line(String text) {
    print(text + "\n");
  }

  synchronized void write(byte[] bytes) {
    if (failed) {
      return;
    }
    try {
      stream.write(bytes);
      stream.flush();
    } catch (IOException e) {
      failed = true;
    }
  }

  synchronized boolean hasFailed() {
    return failed;
  }
}
