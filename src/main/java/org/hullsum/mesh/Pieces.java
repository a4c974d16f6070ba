package org.hullsum.mesh;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.Future;
import java.util.concurrent.FutureTask;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.IntConsumer;
import org.hullsum.problem.InternalFault;

/**
 * Does pieces of work that write to places of their own, on one thread or several; what comes out
 * does not depend on how many.
 */
final class Pieces {
  private Pieces() {}

  /** Does the pieces 0 to {@code count} − 1; the first fault of any is thrown when all are over. */
  static void run(int threads, int count, IntConsumer piece) {
    AtomicInteger next = new AtomicInteger();
    Runnable worker =
        () -> {
          for (int i = next.getAndIncrement(); i < count; i = next.getAndIncrement()) {
            piece.accept(i);
          }
        };
    List<FutureTask<Void>> others = new ArrayList<>();
    for (int k = 1; k < Math.min(threads, count); k++) {
      FutureTask<Void> task = new FutureTask<>(worker, null);
      Thread thread = new Thread(task, "triangles");
      thread.setDaemon(true);
      thread.start();
      others.add(task);
    }
    worker.run();
    others.forEach(Pieces::await);
  }

  /** Waits for a task; throws the fault with which it ended. */
  static void await(Future<?> task) {
    try {
      task.get();
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new InternalFault("the reading of triangles was interrupted");
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
}
