package org.hullsum.mesh;

import java.util.Arrays;

/** Whole numbers, as many as have been read; grows with the file, never with a count in it. */
final class IntList {
  private static final int FIRST_ROOM = 64;

  /** Some virtual machines refuse arrays closer to the largest int. */
  private static final int LARGEST_ROOM = Integer.MAX_VALUE - 8;

  private int[] values = new int[FIRST_ROOM];
  private int size;

  int size() {
    return size;
  }

  int get(int k) {
    return values[k];
  }

  int[] array() {
    return values;
  }

  void add(int value, FaultPlace place) throws MeshFault {
    if (size == values.length) {
      values = Arrays.copyOf(values, moreRoom(size, place));
    }
    values[size++] = value;
  }

  void set(int k, int value) {
    values[k] = value;
  }

  void shorten(int length) {
    size = length;
  }

  void clear() {
    size = 0;
  }

  /** Half as much room again. */
  static int moreRoom(int room, FaultPlace place) throws MeshFault {
    if (room == LARGEST_ROOM) {
      throw place.fault("more than " + LARGEST_ROOM + " numbers in one list are not read");
    }
    return (int) Math.min(LARGEST_ROOM, room + (room >> 1) + (long) FIRST_ROOM);
  }
}
