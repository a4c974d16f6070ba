package org.hullsum.mesh;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.OptionalInt;

/**
 * Reads and welds the records of a binary STL file whose size agrees with its count: 84 bytes, then
 * 50 for each triangle. One thread scans the file while another numbers the points.
 */
final class StlRecords {
  static final int HEAD = 84;
  static final int TRIANGLE = 50;

  /** Corners stand in one array. */
  private static final int MOST = (Integer.MAX_VALUE - 8) / 3;

  /** Below this a second thread costs more than it brings. */
  private static final int SMALL = 1 << 14;

  private StlRecords() {}

  /**
   * The number of triangles of a binary file whose size agrees with it; empty for any other file.
   *
   * @param head the first bytes
   * @param size of the whole file
   */
  static OptionalInt count(byte[] head, long size) {
    if (head.length < HEAD) {
      return OptionalInt.empty();
    }
    long count =
        ByteBuffer.wrap(head).order(ByteOrder.LITTLE_ENDIAN).getInt(HEAD - Integer.BYTES)
            & 0xffffffffL;
    return count > 0 && count <= MOST && size == HEAD + TRIANGLE * count
        ? OptionalInt.of((int) count)
        : OptionalInt.empty();
  }

  /**
   * Reads a file.
   *
   * @param triangles as {@link #count} says
   */
  static TriangleMeshBuilder read(Path path, int triangles, int threads)
      throws IOException, MeshFault {
    int[] corners = new int[3 * triangles];
    // A closed surface has one vertex for two triangles and two more for each shell.
    VertexTable vertices = new VertexTable(triangles / 2 + triangles / 64);
    int used = triangles < SMALL ? 1 : threads;
    try (FileChannel file = FileChannel.open(path, StandardOpenOption.READ)) {
      if (used == 1) {
        new RecordScanner(
                file,
                triangles,
                corners,
                batch -> {
                  vertices.settle(batch, corners);
                  batch.clear();
                  return batch;
                })
            .scan();
      } else {
        try (BatchQueue queue = new BatchQueue(batch -> vertices.settle(batch, corners))) {
          new RecordScanner(file, triangles, corners, queue::exchange).scan();
          queue.finish();
        }
      }
    }
    Pieces.run(
        used,
        used,
        k -> {
          int end = (int) ((k + 1L) * corners.length / used);
          for (int c = (int) ((long) k * corners.length / used); c < end; c++) {
            corners[c] = corners[c] < 0 ? corners[~corners[c]] : corners[c];
          }
        });
    return TriangleMeshBuilder.holding(vertices, corners);
  }

  static MeshFault notFinite(long offset, float x, float y, float z) {
    return MeshFault.atByte(offset, "the corner (" + x + ", " + y + ", " + z + ") is not finite");
  }
}
