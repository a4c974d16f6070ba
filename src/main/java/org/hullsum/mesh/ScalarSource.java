package org.hullsum.mesh;

import java.io.IOException;

/** Numbers one after the other, written as text or in binary. */
interface ScalarSource extends FaultPlace {
  /** The next number, as near as a double comes to it; perhaps not finite. */
  double real(ScalarType type) throws IOException, MeshFault;

  /** The next number, which must be whole. */
  long whole(ScalarType type) throws IOException, MeshFault;

  /** Passes numbers. */
  void skip(ScalarType type, long count) throws IOException, MeshFault;

  /** Whether there is anything left to read. */
  boolean hasMore() throws IOException, MeshFault;
}
