package org.hullsum.mesh;

import java.util.Arrays;

/**
 * Gives points with equal coordinates one number, counted from 0 in the order in which they are
 * first met.
 *
 * <p>A hash table of open addresses with no object for any point: each slot holds half of the hash
 * beside the number, so that one that is empty or another's is passed without a look at the
 * coordinates. Not thread-safe.
 */
final class VertexTable {
  private static final int FIRST_ROOM = 1 << 10;

  /** Some virtual machines refuse arrays closer to the largest int. */
  private static final int LARGEST_ROOM = (Integer.MAX_VALUE - 8) / 3;

  private static final int LARGEST_TABLE = 1 << 30;
  private static final long EMPTY = 0;

  /** Points of a batch that are looked for at a time, so that far memory answers them together. */
  private static final int TOGETHER = 256;

  private final int expected;
  private double[] coordinates = new double[0];

  /** The upper half of the hash, then the number and one more; 0 where nothing stands. */
  private long[] slots = new long[0];

  private int size;
  private final long[] found = new long[TOGETHER];

  VertexTable() {
    this(FIRST_ROOM);
  }

  /**
   * @param expected vertices for which room is made when the first one comes
   */
  VertexTable(int expected) {
    this.expected = expected;
  }

  /** Mixes all bits of a point; −0 must have been made into 0. */
  static long hash(double x, double y, double z) {
    long bits =
        Double.doubleToRawLongBits(x)
            + 0x9E3779B97F4A7C15L * Double.doubleToRawLongBits(y)
            + 0xC2B2AE3D27D4EB4FL * Double.doubleToRawLongBits(z);
    bits = (bits ^ bits >>> 32) * 0xD6E8FEB86659FD93L;
    return bits ^ bits >>> 32;
  }

  private int slot(long hash) {
    return (int) hash & (slots.length - 1);
  }

  private static boolean isHashOf(long slot, long hash) {
    return (slot ^ hash) >>> 32 == 0;
  }

  private static int number(long slot) {
    return (int) slot - 1;
  }

  private static long slotOf(int number, long hash) {
    return hash & 0xffffffff00000000L | (number + 1L);
  }

  /** How many vertices there are. */
  int size() {
    return size;
  }

  /** The number of a point. */
  int vertex(double x, double y, double z) {
    // Adding zero makes −0 into 0.
    double px = x + 0.0;
    double py = y + 0.0;
    double pz = z + 0.0;
    makeRoom(1);
    return vertex(px, py, pz, hash(px, py, pz));
  }

  private int vertex(double x, double y, double z, long hash) {
    int slot = slot(hash);
    for (; slots[slot] != EMPTY; slot = (slot + 1) & (slots.length - 1)) {
      if (isHashOf(slots[slot], hash) && isAt(number(slots[slot]), x, y, z)) {
        return number(slots[slot]);
      }
    }
    slots[slot] = slotOf(size, hash);
    coordinates[3 * size] = x;
    coordinates[3 * size + 1] = y;
    coordinates[3 * size + 2] = z;
    return size++;
  }

  private boolean isAt(int vertex, double x, double y, double z) {
    int at = 3 * vertex;
    return coordinates[at] == x && coordinates[at + 1] == y && coordinates[at + 2] == z;
  }

  /** Writes the number of each point of a batch to the corner at which it stands. */
  void settle(PointBatch batch, int[] corners) {
    makeRoom(batch.size());
    for (int from = 0; from < batch.size(); from += TOGETHER) {
      settle(batch, from, Math.min(batch.size(), from + TOGETHER), corners);
    }
  }

  private void settle(PointBatch batch, int from, int to, int[] corners) {
    for (int i = from; i < to; i++) {
      found[i - from] = slots[slot(batch.hash(i))];
    }
    for (int i = from; i < to; i++) {
      long slot = found[i - from];
      boolean here =
          slot != EMPTY
              && isHashOf(slot, batch.hash(i))
              && isAt(number(slot), batch.x(i), batch.y(i), batch.z(i));
      found[i - from] = here ? slot : EMPTY;
    }
    for (int i = from; i < to; i++) {
      long slot = found[i - from];
      corners[batch.corner(i)] =
          slot == EMPTY ? vertex(batch.x(i), batch.y(i), batch.z(i), batch.hash(i)) : number(slot);
    }
  }

  private void makeRoom(int more) {
    if (coordinates.length - 3 * size >= 3 * more) {
      return;
    }
    long room = coordinates.length / 3;
    if (room >= LARGEST_ROOM) {
      throw new IllegalStateException("more than " + LARGEST_ROOM + " vertices");
    }
    long wanted = Math.max(expected, Math.max(room + room / 2, (long) size + more));
    room = Math.min(LARGEST_ROOM, wanted);
    coordinates = Arrays.copyOf(coordinates, (int) (3 * room));
    // At least one slot in three stays empty.
    if (slots.length < LARGEST_TABLE && slots.length < room + room / 2) {
      fillSlots((int) Math.min(LARGEST_TABLE, Long.highestOneBit(room + room / 2 - 1) << 1));
    }
  }

  private void fillSlots(int length) {
    slots = new long[length];
    for (int v = 0; v < size; v++) {
      long hash = hash(coordinates[3 * v], coordinates[3 * v + 1], coordinates[3 * v + 2]);
      int slot = slot(hash);
      while (slots[slot] != EMPTY) {
        slot = (slot + 1) & (slots.length - 1);
      }
      slots[slot] = slotOf(v, hash);
    }
  }

  /**
   * Gives up the coordinates, x, y, z of each vertex in turn and room behind; afterwards nothing
   * can be asked.
   */
  double[] takeCoordinates() {
    double[] taken = coordinates;
    coordinates = new double[0];
    slots = new long[0];
    return taken;
  }
}
