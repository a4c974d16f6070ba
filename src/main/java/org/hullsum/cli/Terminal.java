package org.hullsum.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;

/** Whether someone watches standard error on a terminal. */
@FunctionalInterface
interface Terminal {
  /** Nobody watches. */
  Terminal NONE = () -> false;

  /** Asked only when there is something to show, since finding out takes its time. */
  boolean isWatched();

  /** Set to true by the start script, which can ask where Java can't. */
  String PROPERTY = "hullsum.terminal";

  /**
   * The terminal of this process: what the start script says, or, on systems that list a process's
   * open files, whether standard error is one.
   */
  static Terminal ofThisProcess() {
    return () -> {
      if (Boolean.getBoolean(PROPERTY)) {
        return true;
      }
      try {
        String device = Files.readSymbolicLink(Path.of("/proc/self/fd/2")).toString();
        return device.startsWith("/dev/pts/") || device.startsWith("/dev/tty");
      } catch (IOException | UnsupportedOperationException | InvalidPathException e) {
        return false;
      }
    };
  }
}
