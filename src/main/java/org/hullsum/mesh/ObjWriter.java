package org.hullsum.mesh;

import java.io.IOException;
import java.io.Writer;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.function.IntPredicate;

/**
 * Writes a mesh as an OBJ text: each vertex once, in digits that read back to the same double, then
 * the triangles in their order, in a group for each run of one part.
 */
public final class ObjWriter {
  /** Bytes of a letter. */
  private static final int LARGEST_LETTER = 4;

  /** Digits that always tell a double from its neighbours. */
  private static final int ENOUGH = 17;

  private ObjWriter() {}

  /** Whether a part's name reads back as it is: without ends of lines and blanks to be lost. */
  public static boolean isName(String part) {
    return part.equals(String.join(" ", part.trim().split("\\s+")))
        && !part.endsWith("\\")
        && part.length() < TextCursor.LONGEST_WORD / LARGEST_LETTER;
  }

  /**
   * Writes a mesh.
   *
   * @param turned whether a triangle is written with its corners the other way round
   */
  public static void write(TriangleMesh mesh, IntPredicate turned, Writer to) throws IOException {
    for (int v = 0; v < mesh.vertexCount(); v++) {
      to.write("v " + text(mesh.x(v)) + " " + text(mesh.y(v)) + " " + text(mesh.z(v)) + "\n");
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

  /** The fewest digits that read back to the same double; the platform's may be too many. */
  static String text(double value) {
    String usual = Double.toString(value);
    if (usual.length() < ENOUGH && !(Math.abs(value) < Double.MIN_NORMAL)) {
      return usual.endsWith(".0") ? usual.substring(0, usual.length() - 2) : usual;
    }
    BigDecimal fewest = new BigDecimal(usual);
    for (int digits = fewest.precision() - 1; digits > 0; digits--) {
      BigDecimal fewer = fewest.round(new MathContext(digits, RoundingMode.HALF_EVEN));
      if (fewer.doubleValue() != value) {
        break;
      }
      fewest = fewer;
    }
    return value == 0 ? "0" : fewest.stripTrailingZeros().toString();
  }
}
