package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class WorkersTest {
  private static Workers workers(int threads, ProgressListener progress) {
    return new Workers(new AuditOptions(8, threads, LocalDate.EPOCH, progress, false));
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 7})
  void resultsStandInTheOrderOfThePieces(int threads) {
    List<Integer> squares =
        workers(threads, ProgressListener.SILENT).map("pieces", 100, i -> i * i);
    assertEquals(IntStream.range(0, 100).map(i -> i * i).boxed().toList(), squares);
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 3})
  void everyFinishedPieceIsToldOnceAndInOrder(int threads) {
    List<Integer> told = Collections.synchronizedList(new ArrayList<>());
    workers(threads, (what, done, all) -> told.add(done)).map("pieces", 20, i -> i);
    assertEquals(IntStream.rangeClosed(1, 20).boxed().toList(), told);
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2})
  void faultOfAPieceIsThrown(int threads) {
    Workers workers = workers(threads, ProgressListener.SILENT);
    IllegalStateException fault =
        assertThrows(
            IllegalStateException.class,
            () ->
                workers.map(
                    "pieces",
                    4,
                    i -> {
                      if (i == 2) {
                        throw new IllegalStateException("piece 2");
                      }
                      return i;
                    }));
    assertEquals("piece 2", fault.getMessage());
  }

  @Test
  void optionsOutOfRangeAreRefused() {
    assertThrows(
        IllegalArgumentException.class,
        () -> new AuditOptions(0, 1, LocalDate.EPOCH, ProgressListener.SILENT, false));
    assertThrows(
        IllegalArgumentException.class,
        () -> new AuditOptions(8, 0, LocalDate.EPOCH, ProgressListener.SILENT, false));
  }
}
