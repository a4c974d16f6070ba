package org.hullsum.mesh;

import java.io.IOException;
import java.nio.channels.ReadableByteChannel;

/**
 * Reads OBJ files (Wavefront, Advanced Visualizer Manual, appendix B1): the statements {@code v},
 * {@code f}, {@code g} and {@code o}. A group or object begins a part with its name, told once it
 * has a face; a name may come back. Free-form curves and surfaces are refused, and so are
 * statements that bring in other files; what else there is has no faces and is passed. The format
 * has no unit.
 */
final class ObjReader {
  private final TextCursor text;
  private final TriangleSink sink;
  private final FaceAccumulator faces;

  /** The part that the sink is in. */
  private String part = "";

  /** The part that the next face is in. */
  private String nextPart = "";

  private ObjReader(ByteCursor bytes, TriangleSink sink) {
    this.text = new TextCursor(bytes, true);
    this.sink = sink;
    this.faces = new FaceAccumulator(sink);
  }

  /** Reads a file, as {@link MeshReader} says. */
  static void read(ReadableByteChannel file, TriangleSink sink) throws IOException, MeshFault {
    new ObjReader(new ByteCursor(file), sink).read();
  }

  private void read() throws IOException, MeshFault {
    while (text.skipSpace()) {
      if (text.peek() == '#') {
        text.skipComment();
      } else {
        readStatement(text.word("a statement"));
      }
    }
    if (faces.triangles() == 0) {
      throw text.fault("the file ends and has had no face");
    }
  }

  private void readStatement(String word) throws IOException, MeshFault {
    switch (word) {
      case "v" -> readPoint();
      case "f", "fo" -> readFace();
      case "g", "o" -> nextPart = text.restOfLine();
      case "curv", "curv2", "surf", "bzp", "bsp", "cdc", "cdp", "cstype" ->
          throw text.fault(
              "'"
                  + word
                  + "' belongs to a free-form curve or surface, which is not read: write"
                  + " the surface as faces");
      case "call", "csh" ->
          throw text.fault("'" + word + "' brings in what another file holds: write all into one");
      default -> {
        if (!Character.isLetter(word.charAt(0))) {
          throw text.fault("a statement of an OBJ file is wanted");
        }
        text.skipLine();
      }
    }
  }

  /** The coordinates; a weight or a colour may follow them. */
  private void readPoint() throws IOException, MeshFault {
    text.skipBlanks();
    double x = text.number("the coordinate x");
    text.skipBlanks();
    double y = text.number("the coordinate y");
    text.skipBlanks();
    double z = text.number("the coordinate z");
    faces.point(x, y, z, text);
    text.skipLine();
  }

  private void readFace() throws IOException, MeshFault {
    if (!nextPart.equals(part)) {
      part = nextPart;
      sink.part(part);
    }
    faces.begin();
    while (text.skipBlanks() && text.peek() != '#') {
      readCorner();
    }
    faces.polygon(text);
    text.skipComment();
  }

  /** The number of a point, from 1 or counted back from the last as −1; /vt, //vn or /vt/vn. */
  private void readCorner() throws IOException, MeshFault {
    long number = text.wholePart("a corner: the number of a point");
    long points = faces.points();
    if (number == 0 || number > points || number < -points) {
      throw text.fault("point " + number + " is not among the " + points + " points so far");
    }
    faces.corner(number > 0 ? number - 1 : points + number, text);
    for (int k = 0; k < 2 && text.peek() == '/'; k++) {
      text.advance();
      int next = text.peek();
      if (next == '-' || (next >= '0' && next <= '9')) {
        text.wholePart("the number of a texture point or normal");
      }
    }
    int next = text.peek();
    if (next != ByteCursor.END && next > ' ' && next != '#' && next != '\\') {
      throw text.faultNext("a corner written as v, v/vt, v//vn or v/vt/vn");
    }
  }
}
