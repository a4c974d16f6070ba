package org.hullsum.mesh;

import java.io.IOException;

/** Numbers written as text, with blanks or ends of lines between them. */
final class TextScalars implements ScalarSource {
  private final TextCursor text;

  TextScalars(TextCursor text) {
    this.text = text;
  }

  @Override
  public double real(ScalarType type) throws IOException, MeshFault {
    text.skipSpace();
    return text.number("a finite number");
  }

  @Override
  public long whole(ScalarType type) throws IOException, MeshFault {
    text.skipSpace();
    return text.whole("a whole number");
  }

  @Override
  public void skip(ScalarType type, long count) throws IOException, MeshFault {
    for (long k = 0; k < count; k++) {
      text.skipSpace();
      text.skipWord("a number");
    }
  }

  @Override
  public boolean hasMore() throws IOException, MeshFault {
    return text.skipSpace();
  }

  @Override
  public MeshFault fault(String message) {
    return text.fault(message);
  }
}
