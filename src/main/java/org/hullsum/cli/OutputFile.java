package org.hullsum.cli;

import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.Optional;

/**
 * A file that is written whole or not at all: beside its place first, then moved there. Devices and
 * pipes are written directly, and a link stays a link.
 */
final class OutputFile {
  private OutputFile() {}

  /** Writes the file; tells why it could not be written. */
  static Optional<String> write(String file, byte[] bytes) {
    try {
      Path target = Path.of(file);
      if (Files.exists(target) && !Files.isRegularFile(target)) {
        Files.write(target, bytes, StandardOpenOption.WRITE);
      } else {
        replace(Files.exists(target) ? target.toRealPath() : target.toAbsolutePath(), bytes);
      }
      return Optional.empty();
    } catch (IOException | InvalidPathException e) {
      return Optional.of(file + ": can't be written: " + reason(e));
    }
  }

  private static void replace(Path target, byte[] bytes) throws IOException {
    Path beside =
        target.resolveSibling(target.getFileName() + "." + ProcessHandle.current().pid() + ".part");
    try {
      Files.write(beside, bytes);
      try {
        Files.move(beside, target, StandardCopyOption.ATOMIC_MOVE);
      } catch (AtomicMoveNotSupportedException e) {
        Files.move(beside, target, StandardCopyOption.REPLACE_EXISTING);
      }
    } finally {
      Files.deleteIfExists(beside);
    }
  }

  private static String reason(Exception fault) {
    if (fault instanceof NoSuchFileException) {
      return "its folder does not exist";
    }
    if (fault instanceof AccessDeniedException) {
      return "permission denied";
    }
    if (fault instanceof FileSystemException system && system.getReason() != null) {
      return system.getReason();
    }
    return fault.getMessage();
  }
}
