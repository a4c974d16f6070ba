package org.hullsum.casefile;

import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;
import org.hullsum.problem.InternalFault;

/**
 * The SHA-256 of a file's bytes, taken beside the reading: the platform's first digest of a run
 * costs as much time as reading a small case does.
 */
final class FileDigest {
  private final FutureTask<String> task;

  private FileDigest(FutureTask<String> task) {
    this.task = task;
  }

  /** Begins; the bytes must not change from now on. */
  static FileDigest of(byte[] bytes) {
    FutureTask<String> task = new FutureTask<>(() -> sha256(bytes));
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

  private static String sha256(byte[] bytes) {
    try {
      return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
    } catch (NoSuchAlgorithmException e) {
      throw new InternalFault("every Java platform has SHA-256: " + e.getMessage());
    }
  }
}
