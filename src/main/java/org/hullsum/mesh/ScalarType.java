package org.hullsum.mesh;

/** How a number is stored in a binary file. */
enum ScalarType {
  INT8(1),
  UINT8(1),
  INT16(2),
  UINT16(2),
  INT32(4),
  UINT32(4),
  INT64(8),
  UINT64(8),
  FLOAT32(4),
  FLOAT64(8);

  private final int size;

  ScalarType(int size) {
    this.size = size;
  }

  /** Bytes of one number. */
  int size() {
    return size;
  }

  boolean isWhole() {
    return this != FLOAT32 && this != FLOAT64;
  }
}
