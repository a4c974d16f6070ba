package org.hullsum.mesh;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;

/**
 * The part of a VTK file that is XML: all up to the appended data, which may be raw bytes that no
 * parser of XML would take. Behind the tag that begins them, this stream ends the document, and the
 * cursor stands at the first byte after the tag.
 */
final class XmlHeadStream extends InputStream {
  private static final byte[] APPENDED = "<AppendedData".getBytes(StandardCharsets.US_ASCII);
  private static final byte[] COMMENT = "<!--".getBytes(StandardCharsets.US_ASCII);
  private static final byte[] COMMENT_END = "-->".getBytes(StandardCharsets.US_ASCII);
  private static final byte[] CLOSING =
      "</AppendedData></VTKFile>".getBytes(StandardCharsets.US_ASCII);
  private static final int CHUNK = 1 << 12;

  private enum State {
    MARKUP,
    COMMENT,
    APPENDED_TAG,
    CLOSING
  }

  private final ByteCursor bytes;
  private State state = State.MARKUP;
  private int closed;

  XmlHeadStream(ByteCursor bytes) {
    this.bytes = bytes;
  }

  /** Whether the document has been cut off before appended data. */
  boolean atAppendedData() {
    return state == State.CLOSING;
  }

  @Override
  public int read() throws IOException {
    byte[] one = new byte[1];
    return read(one, 0, 1) < 0 ? -1 : one[0] & 0xff;
  }

  @Override
  public int read(byte[] into, int from, int length) throws IOException {
    try {
      int count = 0;
      while (count < length) {
        int here =
            state == State.CLOSING
                ? close(into, from + count, length - count)
                : pass(into, from + count, length - count);
        if (here == 0) {
          break;
        }
        count += here;
      }
      return count == 0 && length > 0 ? -1 : count;
    } catch (MeshFault fault) {
      throw new CarriedFault(fault);
    }
  }

  private int close(byte[] into, int from, int length) {
    int count = Math.min(length, CLOSING.length - closed);
    System.arraycopy(CLOSING, closed, into, from, count);
    closed += count;
    return count;
  }

  /** Passes on the next byte, and those after it that cannot change the state. */
  private int pass(byte[] into, int from, int length) throws IOException, MeshFault {
    int there = bytes.available(CHUNK);
    if (there == 0) {
      return 0;
    }
    byte first = bytes.array()[bytes.position()];
    switch (state) {
      case COMMENT -> state = first == '-' && startsWith(COMMENT_END) ? State.MARKUP : state;
      case APPENDED_TAG -> state = first == '>' ? State.CLOSING : state;
      default -> {
        if (first == '<' && startsWith(APPENDED)) {
          state = State.APPENDED_TAG;
        } else if (first == '<' && startsWith(COMMENT)) {
          state = State.COMMENT;
        }
      }
    }
    int count = 1;
    if (state == State.MARKUP) {
      int end = Math.min(there, length);
      while (count < end && bytes.array()[bytes.position() + count] != '<') {
        count++;
      }
    }
    System.arraycopy(bytes.array(), bytes.position(), into, from, count);
    bytes.advance(count);
    return count;
  }

  private boolean startsWith(byte[] word) throws IOException, MeshFault {
    if (bytes.available(word.length) < word.length) {
      return false;
    }
    for (int k = 0; k < word.length; k++) {
      if (bytes.array()[bytes.position() + k] != word[k]) {
        return false;
      }
    }
    return true;
  }
}
