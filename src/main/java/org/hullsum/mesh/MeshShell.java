package org.hullsum.mesh;

/**
 * Triangles that hang together across their edges.
 *
 * @param first the triangle with the smallest number
 * @param triangles their number
 * @param closed whether each edge of each has exactly one other triangle
 * @param orientable whether they can be turned so that all agree
 * @param cavity whether the mesh encloses what is outside it: whether it lies in an odd number of
 *     the others
 * @param toTurn number of triangles to be turned: in a closed shell to face out of what the mesh
 *     encloses, in an open one to agree
 * @param against number of triangles that face against the others of the shell, the fewer
 * @param volume that the triangles, turned, enclose with their first corner: of a closed shell the
 *     volume inside
 */
public record MeshShell(
    int first,
    int triangles,
    boolean closed,
    boolean orientable,
    boolean cavity,
    int toTurn,
    int against,
    double volume) {
  /** The same as a cavity, so that the others of its triangles are to be turned. */
  MeshShell asCavity() {
    return new MeshShell(
        first, triangles, closed, orientable, true, triangles - toTurn, against, volume);
  }

  /** Whether it has an inside: closed, and to be turned so that all agree. */
  public boolean bounds() {
    return closed && orientable;
  }
}
