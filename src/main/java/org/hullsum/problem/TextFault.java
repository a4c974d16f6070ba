package org.hullsum.problem;

/**
 * A fault inside one text (a quantity, an expression): thrown by the parsers of texts and turned by
 * the reader of the file, which knows where the text stands, into a {@link Problem}.
 */
public final class TextFault extends Exception {
  private static final long serialVersionUID = 1L;

  private final ProblemKind kind;
  private final int start;
  private final int end;

  /**
   * @param kind what is wrong
   * @param start index of the first character at fault
   * @param end index after the last character at fault, at least {@code start}
   * @param message what was found, what was expected and what to do
   */
  public TextFault(ProblemKind kind, int start, int end, String message) {
    super(message, null, false, false);
    if (start < 0 || end < start) {
      throw new IllegalArgumentException("span " + start + ".." + end + " is not a span");
    }
    this.kind = kind;
    this.start = start;
    this.end = end;
  }

  public ProblemKind kind() {
    return kind;
  }

  public int start() {
    return start;
  }

  public int end() {
    return end;
  }

  /** The same fault in a text in which this one's text begins at {@code offset}. */
  public TextFault shifted(int offset) {
    return new TextFault(kind, start + offset, end + offset, getMessage());
  }
}
