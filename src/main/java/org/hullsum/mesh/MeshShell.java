package org.hullsum.mesh;

/**
 * Triangles that hang together across their edges.
 *
 * @param first the triangle with the smallest number
 * @param triangles their number
 * @param closed whether each edge of each has exactly one other triangle
 * @param orientable whether they can be turned so that all agree
 * @param toTurn number of triangles to be turned: in a closed shell to face outward, in an open one
 *     to agree
 * @param against number of triangles that face against the others of the shell, the fewer
 * @param volume that the triangles, turned, enclose with their first corner: of a closed shell the
 *     volume inside
 */
public record MeshShell(
    int first,
    int triangles,
    boolean closed,
    boolean orientable,
    int toTurn,
    int against,
    double volume) {}
