package org.hullsum.mesh;

/** Numbers, as many as have been read; grows with the file, never with a count in it. */
final class DoubleList {
  private double[] values = new double[64];
  private int size;

  int size() {
    return size;
  }

  double get(int k) {
    return values[k];
  }

  void add(double value, FaultPlace place) throws MeshFault {
    if (size == values.length) {
      values = Growth.grown(values, place);
    }
    values[size++] = value;
  }
}
