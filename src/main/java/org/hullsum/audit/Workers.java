package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.FutureTask;
import java.util.function.IntFunction;
import java.util.function.Supplier;
import org.hullsum.problem.InternalFault;

/**
 * Does independent pieces of work, on several threads where asked, and returns the results in their
 * order, so that what follows does not depend on the number of threads.
 */
final class Workers {
  private final int threads;
  private final ProgressListener progress;

  Workers(AuditOptions options) {
    this.threads = options.threads();
    this.progress = options.progress();
  }

  /**
   * The results of the pieces 0 to {@code count} − 1.
   *
   * @param what the stage, for the progress
   */
  <T> List<T> map(String what, int count, IntFunction<T> piece) {
    Counter counter = new Counter(what, count, progress);
    if (threads == 1 || count < 2) {
      List<T> results = new ArrayList<>();
      for (int i = 0; i < count; i++) {
        results.add(piece.apply(i));
        counter.finished();
      }
      return results;
    }
    ExecutorService pool = Executors.newFixedThreadPool(Math.min(threads, count));
    try {
      List<Future<T>> futures = new ArrayList<>();
      for (int i = 0; i < count; i++) {
        int index = i;
        futures.add(
            pool.submit(
                () -> {
                  T result = piece.apply(index);
                  counter.finished();
                  return result;
                }));
      }
      List<T> results = new ArrayList<>();
      for (Future<T> future : futures) {
        results.add(resultOf(future));
      }
      return results;
    } finally {
      pool.shutdownNow();
    }
  }

  /**
   * Begins one piece of work beside what follows; on one thread it is done when it is asked for.
   *
   * @return gives the result, waiting for it where it is not there yet
   */
  <T> Supplier<T> begin(Supplier<T> piece) {
    if (threads == 1) {
      return piece;
    }
    FutureTask<T> task = new FutureTask<>(piece::get);
    Thread thread = new Thread(task, "beside");
    thread.setDaemon(true);
    thread.start();
    return () -> resultOf(task);
  }

  private static <T> T resultOf(Future<T> future) {
    try {
      return future.get();
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new InternalFault("the audit was interrupted");
    } catch (ExecutionException e) {
      if (e.getCause() instanceof RuntimeException fault) {
        throw fault;
      }
      if (e.getCause() instanceof Error error) {
        throw error;
      }
      throw new InternalFault("a piece of work failed: " + e.getCause());
    }
  }

  /** Counts and tells, one call at a time. */
  private static final class Counter {
    private final String what;
    private final int all;
    private final ProgressListener progress;
    private int done;

    Counter(String what, int all, ProgressListener progress) {
      this.what = what;
      this.all = all;
      this.progress = progress;
    }

    synchronized void finished() {
      done++;
      progress.finished(what, done, all);
    }
  }
}
