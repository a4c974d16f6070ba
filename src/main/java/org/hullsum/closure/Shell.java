package org.hullsum.closure;

import java.util.List;

/**
 * Patches of one volume that hang together by seams.
 *
 * @param patches in ascending order
 * @param signs with which their construction normals agree; where {@link #oriented}, +1 is out of
 *     the volume
 * @param consistent whether the seams agree with one another; else it is not orientable
 * @param closed whether no gap and no crowded seam is on it
 * @param cavity whether it bounds the volume from within
 */
public record Shell(
    List<Integer> patches,
    List<Integer> signs,
    boolean consistent,
    boolean closed,
    boolean cavity) {
  public Shell {
    patches = List.copyOf(patches);
    signs = List.copyOf(signs);
  }

  /** Whether the signs tell the outside. */
  public boolean oriented() {
    return consistent && closed;
  }
}
