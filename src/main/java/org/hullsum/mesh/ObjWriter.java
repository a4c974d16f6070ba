package org.hullsum.mesh;

import java.io.IOException;
import java.io.Writer;
import java.util.function.IntPredicate;

/**
 * Writes a mesh as an OBJ text: each vertex once, in digits that read back to the same double, then
 * the triangles in their order, in a group for each run of one part.
 */
public final class ObjWriter {
  private ObjWriter() {}

  /**
   * Writes a mesh.
   *
   * @param turned whether a triangle is written with its corners the other way round
   */
  public static void write(TriangleMesh mesh, IntPredicate turned, Writer to) throws IOException {
    for (int v = 0; v < mesh.vertexCount(); v++) {
      to.write("v " + mesh.x(v) + " " + mesh.y(v) + " " + mesh.z(v) + "\n");
    }
    int part = -1;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (mesh.part(t) != part) {
        part = mesh.part(t);
        to.write("g " + mesh.parts().get(part) + "\n");
      }
      int first = mesh.corner(t, 0) + 1;
      int second = mesh.corner(t, turned.test(t) ? 2 : 1) + 1;
      int third = mesh.corner(t, turned.test(t) ? 1 : 2) + 1;
      to.write("f " + first + " " + second + " " + third + "\n");
    }
  }
}
