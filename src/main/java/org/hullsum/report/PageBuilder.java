package org.hullsum.report;

import java.util.List;

/** Lines of a report for people, wrapped at {@link #WIDTH} columns. */
final class PageBuilder {
  /** Columns of a line of running text; only tables and single long words exceed it. */
  static final int WIDTH = 100;

  private final StringBuilder text = new StringBuilder();

  /** Adds a line as it is, but for control characters, which a terminal would obey. */
  PageBuilder line(String line) {
    text.append(Words.printable(line)).append('\n');
    return this;
  }

  PageBuilder blank() {
    return line("");
  }

  PageBuilder lines(int indent, List<String> lines) {
    lines.forEach(l -> line(l.isEmpty() ? "" : " ".repeat(indent) + l));
    return this;
  }

  /**
   * Adds running text, wrapped.
   *
   * @param indent blanks before the first line
   * @param hanging further blanks before the others
   */
  PageBuilder paragraph(int indent, int hanging, String words) {
    for (String part : words.strip().split("\\R", -1)) {
      wrap(indent, hanging, part.strip());
    }
    return this;
  }

  private void wrap(int indent, int hanging, String words) {
    StringBuilder line = new StringBuilder(" ".repeat(indent));
    boolean empty = true;
    for (String word : words.split("\\s+", -1)) {
      if (!empty && line.length() + 1 + word.length() > WIDTH) {
        line(line.toString());
        line.setLength(0);
        line.append(" ".repeat(indent + hanging));
        empty = true;
      }
      line.append(empty ? "" : " ").append(word);
      empty = false;
    }
    line(line.toString().stripTrailing());
  }

  @Override
  public String toString() {
    return text.toString();
  }
}
