package org.hullsum.mesh;

/** Points that wait for their numbers, each with its hash and the corner at which it stands. */
final class PointBatch {
  static final int ROOM = 1 << 12;

  private final float[] coordinates = new float[3 * ROOM];
  private final long[] hashes = new long[ROOM];
  private final int[] corners = new int[ROOM];
  private int size;

  void add(float x, float y, float z, long hash, int corner) {
    coordinates[3 * size] = x;
    coordinates[3 * size + 1] = y;
    coordinates[3 * size + 2] = z;
    hashes[size] = hash;
    corners[size++] = corner;
  }

  void clear() {
    size = 0;
  }

  int size() {
    return size;
  }

  boolean isFull() {
    return size == ROOM;
  }

  float x(int i) {
    return coordinates[3 * i];
  }

  float y(int i) {
    return coordinates[3 * i + 1];
  }

  float z(int i) {
    return coordinates[3 * i + 2];
  }

  long hash(int i) {
    return hashes[i];
  }

  int corner(int i) {
    return corners[i];
  }
}
