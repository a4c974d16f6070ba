package org.hullsum.mesh;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.function.Consumer;

/**
 * Has another thread work on batches of points, in their order, and gives emptied ones for them.
 */
final class BatchQueue implements AutoCloseable {
  private static final int BATCHES = 16;

  private final Consumer<PointBatch> worker;
  private final ExecutorService thread = Executors.newSingleThreadExecutor();
  private final List<Future<?>> given = new ArrayList<>();
  private final PointBatch[] batches = new PointBatch[BATCHES];

  BatchQueue(Consumer<PointBatch> worker) {
    this.worker = worker;
  }

  /**
   * Takes a batch and gives an empty one for it, waiting for the work on that to end; throws the
   * fault with which it did.
   */
  PointBatch exchange(PointBatch batch) {
    int turn = given.size() % BATCHES;
    batches[turn] = batch;
    given.add(thread.submit(() -> worker.accept(batch)));
    int next = given.size() % BATCHES;
    if (batches[next] == null) {
      return new PointBatch();
    }
    Pieces.await(given.get(given.size() - BATCHES));
    batches[next].clear();
    return batches[next];
  }

  /** Waits for all the work; throws the fault of any. */
  void finish() {
    given.forEach(Pieces::await);
  }

  @Override
  public void close() {
    thread.shutdownNow();
  }
}
