package org.hullsum.casefile;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;
import org.hullsum.problem.InternalFault;

/**
 * The SHA-256 of a file's bytes, taken beside the reading: the platform's first digest of a run
 * costs as much time as reading a small case does.
 */
final class FileDigest {
  private static final int BLOCK = 1 << 16;

  private final FutureTask<String> task;

  private FileDigest(FutureTask<String> task) {
    this.task = task;
  }

  /** Begins; the bytes must not change from now on. */
  static FileDigest of(byte[] bytes) {
    return begun(() -> sha256(new ByteArrayInputStream(bytes)));
  }

  /** Begins; the file is read by itself. */
  static FileDigest of(Path file) {
    return begun(
        () -> {
          try (InputStream in = Files.newInputStream(file)) {
            return sha256(in);
          }
        });
  }

  private static FileDigest begun(Callable<String> work) {
    FutureTask<String> task = new FutureTask<>(work);
    Thread thread = new Thread(task, "digest");
    thread.setDaemon(true);
    thread.start();
    return new FileDigest(task);
  }

  /** In lower-case hexadecimal. */
  String text() {
    try {
      return task.get();
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new InternalFault("the reading was interrupted");
    } catch (ExecutionException e) {
      throw new InternalFault("the digest failed: " + e.getCause());
    }
  }

  private static String sha256(InputStream in) throws IOException {
    try {
      MessageDigest digest = MessageDigest.getInstance("SHA-256");
      byte[] block = new byte[BLOCK];
      for (int count = in.read(block); count >= 0; count = in.read(block)) {
        digest.update(block, 0, count);
      }
      return HexFormat.of().formatHex(digest.digest());
    } catch (NoSuchAlgorithmException e) {
      throw new InternalFault("every Java platform has SHA-256: " + e.getMessage());
    }
  }
}
