package org.hullsum.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;

class ProgressLineTest {
  private static final Duration PATIENCE = Duration.ofSeconds(20);

  /** A stream that tells when something was written to it. */
  private static final class Watched extends ByteArrayOutputStream {
    private final CountDownLatch written = new CountDownLatch(1);

    @Override
    public synchronized void writeBytes(byte[] bytes) {
      super.writeBytes(bytes);
      written.countDown();
    }

    @Override
    public void write(byte[] bytes) {
      writeBytes(bytes);
    }
  }

  @Test
  void aWatchedLineAppearsAfterAWhileAndIsWipedAtTheEnd() throws InterruptedException {
    Watched stream = new Watched();
    try (ProgressLine line = ProgressLine.on(() -> true, new Output(stream))) {
      line.finished("patches", 3, 14);
      assertTrue(stream.written.await(PATIENCE.toSeconds(), TimeUnit.SECONDS));
    }
    String text = stream.toString(StandardCharsets.UTF_8);
    assertTrue(text.startsWith("\rauditing, "), text);
    assertTrue(text.contains("patches 3 of 14"), text);
    String wiped = "\r" + " ".repeat(60) + "\r";
    assertTrue(text.endsWith(wiped), text);
  }

  @Test
  void aShortAuditShowsNothingAndWipesNothing() {
    ByteArrayOutputStream stream = new ByteArrayOutputStream();
    try (ProgressLine line = ProgressLine.on(() -> true, new Output(stream))) {
      line.finished("patches", 14, 14);
    }
    assertEquals("", stream.toString(StandardCharsets.UTF_8));
  }
}
