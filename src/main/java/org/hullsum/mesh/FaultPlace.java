package org.hullsum.mesh;

/** Knows where in a file the reading stands. */
interface FaultPlace {
  /** A fault at what is being read. */
  MeshFault fault(String message);
}
