package org.hullsum.report;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** A table of text, columns two blanks apart, with a heading row if any is headed; one use. */
final class TextTableBuilder {
  private static final String GAP = "  ";

  /** Where the text of a column stands. */
  enum Align {
    LEFT,
    RIGHT
  }

  private record Column(String heading, Align align) {}

  private final List<Column> columns = new ArrayList<>();
  private final List<List<String>> rows = new ArrayList<>();

  TextTableBuilder column(String heading, Align align) {
    columns.add(new Column(heading, align));
    return this;
  }

  /** Adds a row; it has one cell for each column. */
  TextTableBuilder row(List<String> cells) {
    if (cells.size() != columns.size()) {
      throw new IllegalArgumentException(
          cells.size() + " cells in a table of " + columns.size() + " columns");
    }
    rows.add(List.copyOf(cells));
    return this;
  }

  TextTableBuilder row(String... cells) {
    return row(Arrays.asList(cells));
  }

  /** Adds a rule across the table. */
  TextTableBuilder rule() {
    rows.add(List.of());
    return this;
  }

  /** The lines of the table, none of which ends in a blank. */
  List<String> lines() {
    int[] widths = new int[columns.size()];
    for (int i = 0; i < widths.length; i++) {
      widths[i] = columns.get(i).heading().length();
      for (List<String> row : rows) {
        widths[i] = row.isEmpty() ? widths[i] : Math.max(widths[i], row.get(i).length());
      }
    }
    int total = Arrays.stream(widths).sum() + GAP.length() * (widths.length - 1);
    List<String> lines = new ArrayList<>();
    if (columns.stream().anyMatch(c -> !c.heading().isEmpty())) {
      lines.add(line(columns.stream().map(Column::heading).toList(), widths));
    }
    for (List<String> row : rows) {
      lines.add(row.isEmpty() ? "-".repeat(total) : line(row, widths));
    }
    return lines;
  }

  private String line(List<String> cells, int[] widths) {
    StringBuilder line = new StringBuilder();
    for (int i = 0; i < widths.length; i++) {
      String blanks = " ".repeat(widths[i] - cells.get(i).length());
      line.append(i == 0 ? "" : GAP);
      line.append(
          columns.get(i).align() == Align.LEFT ? cells.get(i) + blanks : blanks + cells.get(i));
    }
    return line.toString().stripTrailing();
  }
}
