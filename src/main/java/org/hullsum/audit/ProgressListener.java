package org.hullsum.audit;

/** Told how far an audit has come; may be called from several threads, never at once. */
@FunctionalInterface
public interface ProgressListener {
  /** Says nothing. */
  ProgressListener SILENT = (what, done, all) -> {};

  /**
   * A piece of work is finished.
   *
   * @param what the stage, such as {@code patches}
   * @param done finished pieces of this stage
   * @param all pieces of this stage
   */
  void finished(String what, int done, int all);
}
