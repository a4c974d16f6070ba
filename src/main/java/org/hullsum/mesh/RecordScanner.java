package org.hullsum.mesh;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.util.Arrays;
import java.util.function.UnaryOperator;

/**
 * Goes through the records of a binary STL file and sorts out the corners at points that it has met
 * a short while before, most of them: these are marked with the complement of the earlier corner.
 * The others are handed on in batches. Not thread-safe.
 */
final class RecordScanner {
  /** Triangles that are read at a time. */
  private static final int BLOCK = 1 << 12;

  /** Points that are remembered, at most: some rows of a large mesh. */
  private static final int RECENT = 1 << 14;

  private static final int NORMAL = 12;
  private static final int NOWHERE = -1;

  private final FileChannel file;
  private final int triangles;
  private final int[] corners;
  private final UnaryOperator<PointBatch> next;
  private final float[] recentPoints = new float[3 * RECENT];
  private final int[] recentCorners = new int[RECENT];
  private PointBatch batch;

  /**
   * @param corners to be marked
   * @param next takes a full batch and gives an empty one for it
   */
  RecordScanner(FileChannel file, int triangles, int[] corners, UnaryOperator<PointBatch> next) {
    this.file = file;
    this.triangles = triangles;
    this.corners = corners;
    this.next = next;
    this.batch = new PointBatch();
    Arrays.fill(recentCorners, NOWHERE);
  }

  /** Goes through the whole file. */
  void scan() throws IOException, MeshFault {
    ByteBuffer block =
        ByteBuffer.allocateDirect(StlRecords.TRIANGLE * BLOCK).order(ByteOrder.LITTLE_ENDIAN);
    for (int first = 0; first < triangles; first += BLOCK) {
      int count = Math.min(BLOCK, triangles - first);
      long offset = StlRecords.HEAD + (long) StlRecords.TRIANGLE * first;
      block.clear().limit(StlRecords.TRIANGLE * count);
      while (block.hasRemaining()) {
        if (file.read(block, offset + block.position()) < 0) {
          throw MeshFault.atByte(
              offset + block.position(), "the file has become shorter while it was read");
        }
      }
      int bad = scan(block, first, count);
      if (bad != NOWHERE) {
        int at = StlRecords.TRIANGLE * (bad / 3) + NORMAL + 3 * Float.BYTES * (bad % 3);
        throw StlRecords.notFinite(
            offset + at, block.getFloat(at), block.getFloat(at + 4), block.getFloat(at + 8));
      }
    }
    batch = next.apply(batch);
  }

  /** The first corner of a block that is not finite, or {@link #NOWHERE}. */
  private int scan(ByteBuffer block, int first, int count) {
    for (int t = 0; t < count; t++) {
      int at = StlRecords.TRIANGLE * t + NORMAL;
      for (int k = 0; k < 3; k++, at += 3 * Float.BYTES) {
        // Adding zero makes −0 into 0.
        float x = Float.intBitsToFloat(block.getInt(at)) + 0f;
        float y = Float.intBitsToFloat(block.getInt(at + Float.BYTES)) + 0f;
        float z = Float.intBitsToFloat(block.getInt(at + 2 * Float.BYTES)) + 0f;
        if (!meet(x, y, z, 3 * (first + t) + k)) {
          return 3 * t + k;
        }
      }
    }
    return NOWHERE;
  }

  /** False where the point is not finite. */
  private boolean meet(float x, float y, float z, int corner) {
    long hash = VertexTable.hash(x, y, z);
    int slot = (int) (hash >>> 40) & (RECENT - 1);
    int p = 3 * slot;
    int earlier = recentCorners[slot];
    if (earlier != NOWHERE
        && recentPoints[p] == x
        && recentPoints[p + 1] == y
        && recentPoints[p + 2] == z) {
      corners[corner] = ~earlier;
      return true;
    }
    if (!Double.isFinite((double) x + y + z)) {
      return false;
    }
    recentCorners[slot] = corner;
    recentPoints[p] = x;
    recentPoints[p + 1] = y;
    recentPoints[p + 2] = z;
    batch.add(x, y, z, hash, corner);
    if (batch.isFull()) {
      batch = next.apply(batch);
    }
    return true;
  }
}
