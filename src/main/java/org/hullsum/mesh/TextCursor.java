package org.hullsum.mesh;

import java.io.IOException;
import java.nio.charset.StandardCharsets;

/**
 * Reads words, numbers and lines from a {@link ByteCursor} and knows the line and column of each.
 * Lines end with a line feed, a carriage return, or both.
 */
final class TextCursor implements FaultPlace {
  /** No number and no word that a reader asks for is longer. */
  static final int LONGEST_WORD = 1024;

  /** No line whose text a reader asks for is longer. */
  static final int LONGEST_LINE = 1 << 14;

  private static final int SHOWN = 24;

  private final ByteCursor bytes;
  private final DecimalScanner decimals = new DecimalScanner();

  /** Whether a backslash before the end of a line joins it to the next. */
  private final boolean joinsLines;

  private int line;

  /** Where the first column of the line would be, in bytes of the channel. */
  private long lineStart;

  private long wordStart;

  TextCursor(ByteCursor bytes, boolean joinsLines) {
    this(bytes, joinsLines, 1, 1);
  }

  /** A text that begins at a line and column of the file. */
  TextCursor(ByteCursor bytes, boolean joinsLines, int line, int column) {
    this.bytes = bytes;
    this.joinsLines = joinsLines;
    this.line = line;
    this.lineStart = bytes.offset() - (column - 1);
    this.wordStart = bytes.offset();
  }

  /** A fault at the word or number that was read last or is about to be read. */
  @Override
  public MeshFault fault(String message) {
    long column = Math.max(1, wordStart - lineStart + 1);
    return MeshFault.atLine(line, (int) Math.min(Integer.MAX_VALUE, column), message);
  }

  /** A fault at what comes next, which the message shows. */
  MeshFault faultNext(String wanted) throws IOException, MeshFault {
    wordStart = bytes.offset();
    int length = wordLength(SHOWN);
    if (length == 0) {
      boolean atEnd = bytes.peek() == ByteCursor.END;
      return fault(wanted + " is wanted where the " + (atEnd ? "file" : "line") + " ends");
    }
    StringBuilder shown = new StringBuilder();
    for (int k = 0; k < length; k++) {
      byte letter = bytes.array()[bytes.position() + k];
      shown.append(letter > ' ' && letter < 0x7f ? (char) letter : '?');
    }
    return fault(wanted + " is wanted, not '" + shown + "'");
  }

  /** Passes blanks; whether something is left on the line. */
  boolean skipBlanks() throws IOException, MeshFault {
    while (true) {
      int next = bytes.peek();
      if (next == '\\' && joinsLines && isLineEnd(bytes.peekSecond())) {
        bytes.advance(1);
        endLine();
      } else if (isBlank(next)) {
        bytes.advance(1);
      } else {
        wordStart = bytes.offset();
        return next != ByteCursor.END && !isLineEnd(next);
      }
    }
  }

  /** Passes blanks and ends of lines; whether something is left of the text. */
  boolean skipSpace() throws IOException, MeshFault {
    while (!skipBlanks()) {
      if (bytes.peek() == ByteCursor.END) {
        return false;
      }
      endLine();
    }
    return true;
  }

  /** Passes the end of the line, at which the text must stand, or does nothing at its end. */
  void endLine() throws IOException, MeshFault {
    int next = bytes.peek();
    if (next == ByteCursor.END) {
      return;
    }
    bytes.advance(next == '\r' && bytes.peekSecond() == '\n' ? 2 : 1);
    line = Math.min(Integer.MAX_VALUE - 1, line) + 1;
    lineStart = bytes.offset();
  }

  /** Passes what is left of the line and its end. */
  void skipLine() throws IOException, MeshFault {
    while (skipBlanks()) {
      bytes.advance(1);
    }
    endLine();
  }

  /** Passes what is left of the line and its end; a backslash before it joins nothing. */
  void skipComment() throws IOException, MeshFault {
    int next = bytes.peek();
    while (next != ByteCursor.END && !isLineEnd(next)) {
      bytes.advance(1);
      next = bytes.peek();
    }
    endLine();
  }

  int peek() throws IOException, MeshFault {
    return bytes.peek();
  }

  /** Passes one byte that {@link #peek} has shown. */
  void advance() {
    bytes.advance(1);
  }

  /** The next word; the text must stand at its first letter. */
  String word(String wanted) throws IOException, MeshFault {
    int length = wordLength(LONGEST_WORD);
    if (length == 0) {
      throw faultNext(wanted);
    }
    wordStart = bytes.offset();
    String word = new String(bytes.array(), bytes.position(), length, StandardCharsets.UTF_8);
    bytes.advance(length);
    return word;
  }

  /** Passes the next word. */
  void skipWord(String wanted) throws IOException, MeshFault {
    int length = wordLength(LONGEST_WORD);
    if (length == 0) {
      throw faultNext(wanted);
    }
    wordStart = bytes.offset();
    bytes.advance(length);
  }

  private int wordLength(int longest) throws IOException, MeshFault {
    int there = bytes.available(longest);
    byte[] text = bytes.array();
    int from = bytes.position();
    int at = from;
    while (at < from + there && isWordLetter(text[at] & 0xff)) {
      at++;
    }
    if (at - from == LONGEST_WORD) {
      wordStart = bytes.offset();
      throw fault("a word of " + LONGEST_WORD + " letters or more");
    }
    return at - from;
  }

  /** What is left of the line, without blanks around it; passes the end of the line. */
  String restOfLine() throws IOException, MeshFault {
    StringBuilder rest = new StringBuilder();
    while (skipBlanks()) {
      rest.append(rest.isEmpty() ? "" : " ").append(word("a word"));
      if (rest.length() > LONGEST_LINE) {
        throw fault("a line of more than " + LONGEST_LINE + " letters");
      }
    }
    endLine();
    return rest.toString();
  }

  /** The next number; the text must stand at its first letter. */
  double number(String wanted) throws IOException, MeshFault {
    int there = bytes.available(LONGEST_WORD);
    int from = bytes.position();
    double number = decimals.scan(bytes.array(), from, from + there);
    int length = decimals.end() - from;
    if (length == 0
        || length == LONGEST_WORD
        || (length < there && isWordLetter(bytes.array()[from + length] & 0xff))) {
      throw faultNext(wanted);
    }
    wordStart = bytes.offset();
    bytes.advance(length);
    return number;
  }

  /** The next whole number; the text must stand at its first letter. */
  long whole(String wanted) throws IOException, MeshFault {
    return whole(wanted, false);
  }

  /** The next whole number, whatever stands behind it. */
  long wholePart(String wanted) throws IOException, MeshFault {
    return whole(wanted, true);
  }

  private long whole(String wanted, boolean anyEnd) throws IOException, MeshFault {
    int there = bytes.available(LONGEST_WORD);
    int from = bytes.position();
    int to = from + there;
    byte[] text = bytes.array();
    int at = from;
    boolean negative = at < to && text[at] == '-';
    if (at < to && (text[at] == '-' || text[at] == '+')) {
      at++;
    }
    int firstDigit = at;
    long whole = 0;
    while (at < to && text[at] >= '0' && text[at] <= '9') {
      int digit = text[at++] - '0';
      if (whole > (Long.MAX_VALUE - digit) / 10) {
        throw faultNext(wanted + " that fits into 64 bits");
      }
      whole = 10 * whole + digit;
    }
    boolean ended = anyEnd || at == to || !isWordLetter(text[at] & 0xff);
    if (at == firstDigit || at - from == LONGEST_WORD || !ended) {
      throw faultNext(wanted);
    }
    wordStart = bytes.offset();
    bytes.advance(at - from);
    return negative ? -whole : whole;
  }

  static boolean isLineEnd(int letter) {
    return letter == '\n' || letter == '\r';
  }

  private static boolean isBlank(int letter) {
    return letter == ' ' || letter == '\t' || letter == '\f' || letter == 0x0b;
  }

  private static boolean isWordLetter(int letter) {
    return letter != ByteCursor.END && !isBlank(letter) && !isLineEnd(letter);
  }
}
