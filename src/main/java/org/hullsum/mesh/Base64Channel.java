package org.hullsum.mesh;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.ReadableByteChannel;
import java.util.Arrays;

/**
 * Decodes base64 (RFC 4648, section 4) with blanks anywhere between groups of four. Unlike the
 * platform's decoder it goes on behind padding, since several encoded stretches may stand one
 * behind the other. Ends at the end of the text or at markup.
 */
final class Base64Channel implements ReadableByteChannel {
  private static final String LETTERS =
      "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789+/";
  private static final int NO_LETTER = -1;
  private static final int PADDING = -2;

  private final ByteCursor text;
  private final int[] values = new int[256];

  /** What was decoded and did not fit into the target. */
  private final byte[] rest = new byte[3];

  private int restFrom = 3;

  Base64Channel(ByteCursor text) {
    this.text = text;
    Arrays.fill(values, NO_LETTER);
    for (int k = 0; k < LETTERS.length(); k++) {
      values[LETTERS.charAt(k)] = k;
    }
    values['='] = PADDING;
  }

  @Override
  public int read(ByteBuffer target) throws IOException {
    int start = target.position();
    try {
      while (target.hasRemaining()) {
        if (restFrom < rest.length) {
          target.put(rest[restFrom++]);
        } else if (!decode()) {
          break;
        }
      }
    } catch (MeshFault fault) {
      throw new CarriedFault(fault);
    }
    int count = target.position() - start;
    return count == 0 && target.hasRemaining() ? -1 : count;
  }

  /** Decodes the next group; false at the end of the text. */
  private boolean decode() throws IOException, MeshFault {
    int letter = nextLetter();
    if (letter == ByteCursor.END || letter == '<') {
      return false;
    }
    int bits = 0;
    int padding = 0;
    for (int k = 0; k < 4; k++) {
      int value = letter == ByteCursor.END ? NO_LETTER : values[letter];
      if (value == PADDING && k >= 2) {
        padding++;
        value = 0;
      } else if (value < 0 || padding > 0) {
        throw text.fault("base64 is wanted, in groups of four letters");
      }
      bits = bits << 6 | value;
      text.advance(1);
      letter = k < 3 ? nextLetter() : letter;
    }
    // With padding, the one or two bytes stand at the end of the three.
    int whole = bits >> 8 * padding;
    rest[2] = (byte) whole;
    rest[1] = (byte) (whole >> 8);
    rest[0] = (byte) (whole >> 16);
    restFrom = padding;
    return true;
  }

  private int nextLetter() throws IOException, MeshFault {
    int letter = text.peek();
    while (letter == ' ' || letter == '\n' || letter == '\r' || letter == '\t') {
      text.advance(1);
      letter = text.peek();
    }
    return letter;
  }

  @Override
  public boolean isOpen() {
    return true;
  }

  @Override
  public void close() {}
}
