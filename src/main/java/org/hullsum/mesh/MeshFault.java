package org.hullsum.mesh;

import java.util.OptionalInt;
import java.util.OptionalLong;

/**
 * What is wrong with a file of triangles and where: at a byte of a binary file, or at a line and
 * column of a text. Thrown by the readers and turned by the reader of the case, which knows the
 * file's name, into a problem.
 */
public final class MeshFault extends Exception {
  private static final long serialVersionUID = 1L;

  private static final long NO_OFFSET = -1;
  private static final int NO_LINE = 0;

  private final long offset;
  private final int line;
  private final int column;

  private MeshFault(long offset, int line, int column, String message) {
    super(message, null, false, false);
    this.offset = offset;
    this.line = line;
    this.column = column;
  }

  /**
   * @param offset bytes before the one at fault, at least 0; of a packed file, as unpacked
   * @param message what was found, what was expected
   */
  static MeshFault atByte(long offset, String message) {
    if (offset < 0) {
      throw new IllegalArgumentException("byte " + offset + " is not in a file");
    }
    return new MeshFault(offset, NO_LINE, NO_LINE, message);
  }

  /**
   * @param line from 1
   * @param column from 1, counted in bytes
   * @param message what was found, what was expected
   */
  static MeshFault atLine(int line, int column, String message) {
    if (line < 1 || column < 1) {
      throw new IllegalArgumentException("line " + line + ", column " + column + " is no place");
    }
    return new MeshFault(NO_OFFSET, line, column, message);
  }

  /** Bytes before the one at fault, for binary data; of a packed file, as unpacked. */
  public OptionalLong offset() {
    return offset == NO_OFFSET ? OptionalLong.empty() : OptionalLong.of(offset);
  }

  /** The line at fault, from 1, for text. */
  public OptionalInt line() {
    return line == NO_LINE ? OptionalInt.empty() : OptionalInt.of(line);
  }

  /** The column at fault, from 1, counted in bytes, for text. */
  public OptionalInt column() {
    return line == NO_LINE ? OptionalInt.empty() : OptionalInt.of(column);
  }
}
