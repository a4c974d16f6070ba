package org.hullsum.mesh;

import java.util.List;

/**
 * A boundary curve of a mesh.
 *
 * @param vertices in order, the mesh on the left seen against its normals where these agree; the
 *     first is not repeated
 * @param closed whether the last joins the first
 */
public record MeshLoop(List<Integer> vertices, boolean closed) {
  public MeshLoop {
    vertices = List.copyOf(vertices);
  }
}
