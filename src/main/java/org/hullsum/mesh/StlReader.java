package org.hullsum.mesh;

import java.io.IOException;
import java.nio.ByteOrder;
import java.nio.channels.ReadableByteChannel;
import java.util.Locale;

/**
 * Reads STL files (3D Systems, Inc., "StereoLithography Interface Specification", 1989), binary and
 * as text. Stored normals are passed over: the order of the corners says the side. Each {@code
 * solid} of a text is a part.
 *
 * <p>A file is a text if it begins with {@code solid}, the word {@code facet} or {@code endsolid}
 * follows in its head, and no byte there is zero; binary files that begin with {@code solid} are
 * common. One whose size agrees with its count is read by {@link StlRecords} and never comes here.
 */
final class StlReader {
  private static final int HEADER = 80;
  private static final int TRIANGLE = 50;
  private static final int NORMAL = 12;
  private static final int ATTRIBUTE = 2;
  private static final int HEAD = 512;

  /** As its bytes look in Latin 1. */
  private static final String BYTE_ORDER_MARK = "\u00ef\u00bb\u00bf";

  private final ByteCursor bytes;
  private final TriangleSink sink;

  private StlReader(ByteCursor bytes, TriangleSink sink) {
    this.bytes = bytes;
    this.sink = sink;
  }

  /** Reads a file, as {@link MeshReader} says. */
  static void read(ReadableByteChannel file, TriangleSink sink) throws IOException, MeshFault {
    ByteCursor bytes = new ByteCursor(file);
    int there = bytes.available(HEAD);
    String head =
        new String(
                bytes.array(),
                bytes.position(),
                Math.min(there, HEAD),
                java.nio.charset.StandardCharsets.ISO_8859_1)
            .toLowerCase(Locale.ROOT);
    StlReader reader = new StlReader(bytes, sink);
    boolean marked = head.startsWith(BYTE_ORDER_MARK);
    boolean text =
        head.substring(marked ? BYTE_ORDER_MARK.length() : 0).stripLeading().startsWith("solid")
            && (head.contains("facet") || head.contains("endsolid"))
            && head.indexOf('\0') < 0;
    bytes.advance(text && marked ? BYTE_ORDER_MARK.length() : 0);
    if (text) {
      reader.readText();
    } else {
      reader.readBinary();
    }
  }

  private void readBinary() throws IOException, MeshFault {
    if (bytes.available(HEADER + Integer.BYTES) < HEADER + Integer.BYTES) {
      throw bytes.fault(
          "the file ends within the head of 84 bytes with which a binary STL file begins");
    }
    bytes.order(ByteOrder.LITTLE_ENDIAN);
    bytes.advance(HEADER);
    long stated = bytes.whole(ScalarType.UINT32);
    long read = 0;
    for (; read < stated && bytes.available(TRIANGLE) >= TRIANGLE; read++) {
      bytes.advance(NORMAL);
      int a = corner();
      int b = corner();
      int c = corner();
      bytes.advance(ATTRIBUTE);
      sink.triangle(a, b, c);
    }
    if (read < stated) {
      boolean whole = bytes.available(1) == 0;
      throw bytes.fault(
          "the file states "
              + stated
              + " triangles in bytes 80 to 83 and ends "
              + (whole ? "after number " + read : "within number " + (read + 1))
              + "; export it again, or mend the count");
    }
    checkEnd(stated);
  }

  /** Nothing but zeros may follow the last triangle, as some programs fill blocks with them. */
  private void checkEnd(long stated) throws IOException, MeshFault {
    long offset = bytes.offset();
    long behind = 0;
    boolean filling = true;
    while (bytes.available(1) > 0) {
      filling &= bytes.peek() == 0;
      bytes.advance(1);
      behind++;
    }
    if (stated == 0 || !filling) {
      throw bytes.faultAt(
          offset,
          "the file states "
              + stated
              + " triangles in bytes 80 to 83 and "
              + (behind == 0
                  ? "has none"
                  : "goes on for " + behind + " bytes, " + more(behind) + " behind them")
              + "; export it again, or mend the count");
    }
  }

  private static String more(long bytes) {
    return bytes % TRIANGLE == 0
        ? bytes / TRIANGLE + " triangles more"
        : "not a whole number of triangles";
  }

  private int corner() throws IOException, MeshFault {
    long offset = bytes.offset();
    byte[] from = bytes.array();
    int at = bytes.position();
    float x = real(from, at);
    float y = real(from, at + Float.BYTES);
    float z = real(from, at + 2 * Float.BYTES);
    if (!Float.isFinite(x) || !Float.isFinite(y) || !Float.isFinite(z)) {
      throw StlRecords.notFinite(offset, x, y, z);
    }
    bytes.advance(3 * Float.BYTES);
    return sink.vertex(x, y, z);
  }

  private static float real(byte[] from, int at) {
    return Float.intBitsToFloat(
        (from[at] & 0xff)
            | (from[at + 1] & 0xff) << 8
            | (from[at + 2] & 0xff) << 16
            | (from[at + 3] & 0xff) << 24);
  }

  private void readText() throws IOException, MeshFault {
    TextCursor text = new TextCursor(bytes, false);
    long triangles = 0;
    while (text.skipSpace()) {
      String word = text.word("solid").toLowerCase(Locale.ROOT);
      switch (word) {
        case "solid" -> sink.part(text.restOfLine().strip());
        case "endsolid" -> text.skipLine();
        case "facet" -> {
          triangles++;
          readFacet(text);
        }
        default -> throw text.fault("'" + word + "' stands where solid, facet or endsolid should");
      }
    }
    if (triangles == 0) {
      throw text.fault("the file ends and has had no facet");
    }
  }

  /** What follows {@code facet}: the normal, whatever it is, and a loop of three corners. */
  private void readFacet(TextCursor text) throws IOException, MeshFault {
    text.skipLine();
    expect(text, "outer");
    expect(text, "loop");
    int[] corners = new int[3];
    for (int k = 0; k < corners.length; k++) {
      expect(text, "vertex");
      double x = number(text);
      double y = number(text);
      corners[k] = sink.vertex(x, y, number(text));
    }
    text.skipSpace();
    String word = text.word("endloop").toLowerCase(Locale.ROOT);
    if (word.equals("vertex")) {
      throw text.fault("a fourth corner: a facet of an STL file has three");
    }
    if (!word.equals("endloop")) {
      throw text.fault("'" + word + "' stands where endloop should");
    }
    expect(text, "endfacet");
    sink.triangle(corners[0], corners[1], corners[2]);
  }

  private static void expect(TextCursor text, String wanted) throws IOException, MeshFault {
    boolean more = text.skipSpace();
    String word = more ? text.word(wanted).toLowerCase(Locale.ROOT) : "";
    if (!word.equals(wanted)) {
      throw text.fault(
          more
              ? "'" + word + "' stands where " + wanted + " should"
              : "the file ends where " + wanted + " should stand");
    }
  }

  private static double number(TextCursor text) throws IOException, MeshFault {
    text.skipSpace();
    double value = text.number("a coordinate");
    if (!Double.isFinite(value)) {
      throw text.fault("the coordinate " + value + " is not finite");
    }
    return value;
  }
}
