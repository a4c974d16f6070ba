package org.hullsum.mesh;

import java.util.Arrays;
import org.hullsum.numeric.Vector3;

/**
 * An order of the triangles of a mesh in which neighbours in space are mostly neighbours: along the
 * curve of G. M. Morton, "A computer oriented geodetic data base and a new technique in file
 * sequencing" (1966), in a cube of 2^20 cells along each side. Sorted by radix: linear in the
 * number of triangles.
 */
final class MortonOrder {
  private static final int BITS = 20;
  private static final int DIGIT = 12;

  private MortonOrder() {}

  static int[] of(TriangleMesh mesh) {
    int count = mesh.triangleCount();
    long[] codes = codes(mesh);
    int[] order = new int[count];
    for (int t = 0; t < count; t++) {
      order[t] = t;
    }
    long[] otherCodes = new long[count];
    int[] otherOrder = new int[count];
    int[] starts = new int[(1 << DIGIT) + 1];
    for (int shift = 0; shift < 3 * BITS; shift += DIGIT) {
      sort(codes, order, otherCodes, otherOrder, shift, starts);
      long[] sortedCodes = otherCodes;
      otherCodes = codes;
      codes = sortedCodes;
      int[] sortedOrder = otherOrder;
      otherOrder = order;
      order = sortedOrder;
    }
    return order;
  }

  /** By one digit; equal ones keep their order. */
  private static void sort(
      long[] codes, int[] order, long[] intoCodes, int[] intoOrder, int shift, int[] starts) {
    int mask = (1 << DIGIT) - 1;
    Arrays.fill(starts, 0);
    for (long code : codes) {
      starts[((int) (code >>> shift) & mask) + 1]++;
    }
    for (int d = 1; d < starts.length; d++) {
      starts[d] += starts[d - 1];
    }
    for (int i = 0; i < codes.length; i++) {
      int to = starts[(int) (codes[i] >>> shift) & mask]++;
      intoCodes[to] = codes[i];
      intoOrder[to] = order[i];
    }
  }

  private static long[] codes(TriangleMesh mesh) {
    Vector3 low = mesh.low();
    Vector3 size = mesh.high().minus(low);
    double side = Math.max(size.x(), Math.max(size.y(), size.z()));
    // Coordinates of all three corners are added.
    double scale = side > 0 ? ((1 << BITS) - 1) / (3 * side) : 0;
    long[] codes = new long[mesh.triangleCount()];
    for (int t = 0; t < codes.length; t++) {
      int a = mesh.corner(t, 0);
      int b = mesh.corner(t, 1);
      int c = mesh.corner(t, 2);
      double x = mesh.x(a) + mesh.x(b) + mesh.x(c) - 3 * low.x();
      double y = mesh.y(a) + mesh.y(b) + mesh.y(c) - 3 * low.y();
      double z = mesh.z(a) + mesh.z(b) + mesh.z(c) - 3 * low.z();
      codes[t] =
          spread((long) (x * scale)) << 2
              | spread((long) (y * scale)) << 1
              | spread((long) (z * scale));
    }
    return codes;
  }

  /** Puts two zeros before each of the lowest 21 bits. */
  private static long spread(long bits) {
    long b = bits & 0x1fffff;
    b = (b | b << 32) & 0x1f00000000ffffL;
    b = (b | b << 16) & 0x1f0000ff0000ffL;
    b = (b | b << 8) & 0x100f00f00f00f00fL;
    b = (b | b << 4) & 0x10c30c30c30c30c3L;
    return (b | b << 2) & 0x1249249249249249L;
  }
}
