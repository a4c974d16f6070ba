package org.hullsum.problem;

import java.util.Objects;

/**
 * A place in a file: line and column count from 1; both are 0 where the whole file is meant.
 *
 * @param file the file as the user named it
 * @param line line, from 1, or 0 for the whole file
 * @param column column in characters, from 1, or 0 for the whole file
 */
public record Place(String file, int line, int column) {
  public Place {
    Objects.requireNonNull(file, "file");
    if (line < 0 || column < 0) {
      throw new IllegalArgumentException("place " + line + ":" + column + " is negative");
    }
  }

  /** The file as a whole. */
  public static Place wholeFile(String file) {
    return new Place(file, 0, 0);
  }

  /** {@code file:line:column}, or the file alone. */
  @Override
  public String toString() {
    return line == 0 ? file : file + ":" + line + ":" + column;
  }
}
