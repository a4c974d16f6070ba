package org.hullsum.mesh;

import java.util.Arrays;

/**
 * Gives lists more room as a file is read. Where the program's memory does not suffice, that is a
 * fault of the file at the place that has been reached: nothing but the one array was asked for, so
 * nothing is left half done.
 */
final class Growth {
  /** Some virtual machines refuse arrays closer to the largest int. */
  private static final int LARGEST = Integer.MAX_VALUE - 8;

  private static final int LEAST = 64;

  private Growth() {}

  static int[] grown(int[] values, FaultPlace place) throws MeshFault {
    int room = moreRoom(values.length, place);
    try {
      return Arrays.copyOf(values, room);
    } catch (OutOfMemoryError full) {
      throw noMemory(room, place);
    }
  }

  static double[] grown(double[] values, FaultPlace place) throws MeshFault {
    int room = moreRoom(values.length, place);
    try {
      return Arrays.copyOf(values, room);
    } catch (OutOfMemoryError full) {
      throw noMemory(room, place);
    }
  }

  /** Half as much room again. */
  private static int moreRoom(int room, FaultPlace place) throws MeshFault {
    if (room == LARGEST) {
      throw place.fault("more than " + LARGEST + " numbers in one list are not read");
    }
    return (int) Math.min(LARGEST, room + (room >> 1) + (long) LEAST);
  }

  private static MeshFault noMemory(int room, FaultPlace place) {
    return place.fault(
        "the mesh is too large for the memory that the program may use: no room for "
            + room
            + " numbers in one list");
  }
}
