package org.hullsum.mesh;

/** Whole numbers, as many as have been read; grows with the file, never with a count in it. */
final class IntList {
  private static final int FIRST_ROOM = 64;

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
      values = Growth.grown(values, place);
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
}
