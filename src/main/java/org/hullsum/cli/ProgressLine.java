package org.hullsum.cli;

import java.util.Locale;
import org.hullsum.audit.ProgressListener;

/**
 * A line on the terminal that tells how far the work has come, once it takes over a second; wiped
 * before anything else is printed and at the end. Nothing where nobody watches.
 *
 * <p>Thread-safe: several cases may report at once; the line shows what was told last.
 */
final class ProgressLine implements ProgressListener, AutoCloseable {
  private static final long FIRST_MILLIS = 1000;
  private static final long STEP_MILLIS = 200;
  private static final int WIDTH = 60;

  private final Output err;
  private final Thread ticker;
  private final long start = System.nanoTime();
  private String latest = "working";
  private boolean shown;
  private boolean closed;

  private ProgressLine(Terminal terminal, Output err) {
    this.err = err;
    this.ticker = new Thread(() -> tick(terminal), "progress");
    ticker.setDaemon(true);
  }

  static ProgressLine on(Terminal terminal, Output err) {
    ProgressLine line = new ProgressLine(terminal, err);
    if (terminal != Terminal.NONE) {
      line.ticker.start();
    }
    return line;
  }

  private void tick(Terminal terminal) {
    try {
      Thread.sleep(FIRST_MILLIS);
      if (!terminal.isWatched()) {
        return;
      }
      while (show()) {
        Thread.sleep(STEP_MILLIS);
      }
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
    }
  }

  @Override
  public synchronized void finished(String what, int done, int all) {
    latest = what + " " + done + " of " + all;
  }

  /** Shows the line anew; false when it is over. */
  private synchronized boolean show() {
    if (closed) {
      return false;
    }
    long seconds = (System.nanoTime() - start) / 1_000_000_000L;
    String text = String.format(Locale.ROOT, "auditing, %d s: %s", seconds, latest);
    err.print("\r" + padded(text));
    shown = true;
    return true;
  }

  private static String padded(String text) {
    return text.length() >= WIDTH
        ? text.substring(0, WIDTH)
        : text + " ".repeat(WIDTH - text.length());
  }

  /** Takes the line off the terminal; it may come back. */
  synchronized void wipe() {
    if (shown) {
      err.print("\r" + " ".repeat(WIDTH) + "\r");
      shown = false;
    }
  }

  @Override
  public synchronized void close() {
    wipe();
    closed = true;
    ticker.interrupt();
  }
}
