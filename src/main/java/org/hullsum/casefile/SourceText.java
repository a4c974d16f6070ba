package org.hullsum.casefile;

import java.util.Arrays;
import org.hullsum.problem.Place;

/**
 * The text of a file and where its lines begin, to turn an index into a {@link Place}. Lines end
 * with a line feed, a carriage return, or both; columns count characters (code points).
 */
final class SourceText {
  private final String file;
  private final String text;
  private final int[] lineStarts;

  SourceText(String file, String text) {
    this.file = file;
    this.text = text;
    this.lineStarts = lineStarts(text);
  }

  private static int[] lineStarts(String text) {
    int[] starts = new int[16];
    int count = 1;
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      boolean ends =
          c == '\n' || (c == '\r' && !(i + 1 < text.length() && text.charAt(i + 1) == '\n'));
      if (ends) {
        if (count == starts.length) {
          starts = Arrays.copyOf(starts, 2 * count);
        }
        starts[count++] = i + 1;
      }
    }
    return Arrays.copyOf(starts, count);
  }

  String file() {
    return file;
  }

  String text() {
    return text;
  }

  int lineCount() {
    return lineStarts.length;
  }

  /** The text of a line without its end; lines count from 0. */
  String line(int line) {
    int end = line + 1 < lineStarts.length ? lineStarts[line + 1] : text.length();
    while (end > lineStarts[line]
        && (text.charAt(end - 1) == '\n' || text.charAt(end - 1) == '\r')) {
      end--;
    }
    return text.substring(lineStarts[line], end);
  }

  /** Characters of a line, its end included. */
  int lineLength(int line) {
    return (line + 1 < lineStarts.length ? lineStarts[line + 1] : text.length()) - lineStarts[line];
  }

  /** The line, from 0, that holds an index. */
  int lineAt(int index) {
    int found = Arrays.binarySearch(lineStarts, index);
    return found >= 0 ? found : -found - 2;
  }

  /** The index of a line and a column in code points, both from 0, cut at the end of the text. */
  int indexOf(int line, int column) {
    if (line >= lineStarts.length) {
      return text.length();
    }
    int index = lineStarts[line];
    for (int i = 0; i < column && index < text.length(); i++) {
      index += Character.charCount(text.codePointAt(index));
    }
    return index;
  }

  /** The place of an index. */
  Place place(int index) {
    int within = Math.min(Math.max(index, 0), text.length());
    int line = lineAt(within);
    return new Place(file, line + 1, text.codePointCount(lineStarts[line], within) + 1);
  }

  Place wholeFile() {
    return Place.wholeFile(file);
  }
}
