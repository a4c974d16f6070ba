package org.hullsum.casefile;

import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import de.siegmar.fastcsv.reader.FieldMismatchStrategy;
import java.io.IOException;
import java.nio.charset.CharacterCodingException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.hullsum.units.Quantity;
import org.hullsum.units.QuantityParser;
import org.hullsum.units.Unit;
import org.hullsum.units.UnitParser;

/**
 * A table of readings: UTF-8, comma or semicolon, a header whose columns have their units in
 * parentheses, such as {@code speed (m/s)}; a decimal comma only with semicolons. Whatever is wrong
 * is told at its line and column. Immutable.
 */
final class ReadingsTable {
  /** Far more than a section is ever read at. */
  static final int MOST_ROWS = 400;

  private static final int MOST_BYTES = 1 << 20;

  /**
   * A column.
   *
   * @param name without its unit
   * @param unit empty where the header states none
   * @param index from 0
   * @param place of its header
   */
  record Column(String name, Optional<Unit> unit, int index, Place place) {}

  /** The cells of a line. */
  private record Row(int line, List<String> cells, List<Integer> starts) {}

  private final String file;
  private final boolean semicolons;
  private final List<Column> columns;
  private final List<Row> rows;

  private ReadingsTable(String file, boolean semicolons, List<Column> columns, List<Row> rows) {
    this.file = file;
    this.semicolons = semicolons;
    this.columns = List.copyOf(columns);
    this.rows = List.copyOf(rows);
  }

  /**
   * Reads a file.
   *
   * @param name as the case has it, for places
   */
  static Optional<ReadingsTable> read(Path file, YamlText name, ProblemAccumulator problems) {
    Optional<String> text = text(file, name, problems);
    if (text.isEmpty()) {
      return Optional.empty();
    }
    int end = text.get().indexOf('\n');
    boolean semicolons = text.get().substring(0, end < 0 ? text.get().length() : end).contains(";");
    Optional<List<Row>> rows = rows(text.get(), semicolons, name, problems);
    if (rows.isEmpty()) {
      return Optional.empty();
    }
    if (rows.get().size() < 2 || rows.get().size() > MOST_ROWS + 1) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          Place.wholeFile(name.text()),
          "a table of readings has a header and 1 to "
              + MOST_ROWS
              + " lines under it; here "
              + (rows.get().isEmpty() ? "is nothing" : "are " + (rows.get().size() - 1)));
      return Optional.empty();
    }
    if (hasTooManyCells(rows.get(), name.text(), problems)) {
      return Optional.empty();
    }
    Optional<List<Column>> columns = columns(rows.get().get(0), name.text(), problems);
    List<Row> body = rows.get().subList(1, rows.get().size());
    return columns.map(c -> new ReadingsTable(name.text(), semicolons, c, body));
  }

  private static Optional<String> text(Path file, YamlText name, ProblemAccumulator problems) {
    try {
      if (Files.size(file) > MOST_BYTES) {
        problems.add(
            ProblemKind.LIMIT_EXCEEDED,
            Place.wholeFile(name.text()),
            "this is larger than a table of readings ever is");
        return Optional.empty();
      }
      String text = Files.readString(file);
      return Optional.of(text.startsWith("\uFEFF") ? text.substring(1) : text);
    } catch (CharacterCodingException e) {
      problems.add(
          ProblemKind.NOT_TEXT,
          Place.wholeFile(name.text()),
          "this is not UTF-8 text; save the table as CSV in UTF-8");
    } catch (IOException e) {
      problems.add(
          ProblemKind.FILE_UNREADABLE,
          name.place(),
          name.text() + " can't be read: " + e.getClass().getSimpleName());
    }
    return Optional.empty();
  }

  private static Optional<List<Row>> rows(
      String text, boolean semicolons, YamlText name, ProblemAccumulator problems) {
    SourceText source = new SourceText(name.text(), text);
    List<Row> rows = new ArrayList<>();
    try (CsvReader<CsvRecord> reader =
        CsvReader.builder()
            .fieldSeparator(semicolons ? ';' : ',')
            .extraFieldStrategy(FieldMismatchStrategy.IGNORE)
            .missingFieldStrategy(FieldMismatchStrategy.IGNORE)
            .ofCsvRecord(text)) {
      for (CsvRecord read : reader) {
        int line = (int) read.getStartingLineNumber();
        rows.add(
            new Row(line, read.getFields(), starts(source.line(line - 1), semicolons ? ';' : ',')));
      }
      return Optional.of(rows);
    } catch (CsvParseException | IOException e) {
      problems.add(
          ProblemKind.SYNTAX,
          new Place(name.text(), rows.isEmpty() ? 1 : rows.get(rows.size() - 1).line() + 1, 1),
          "this is no line of a CSV table: a quoted cell is not closed, or is too long");
      return Optional.empty();
    }
  }

  private static boolean hasTooManyCells(List<Row> rows, String file, ProblemAccumulator problems) {
    int count = rows.get(0).cells().size();
    boolean found = false;
    for (Row row : rows) {
      if (row.cells().size() > count) {
        problems.add(
            ProblemKind.SYNTAX,
            place(file, row, count),
            "this line has "
                + row.cells().size()
                + " cells under "
                + count
                + " columns; a table with decimal commas has semicolons between its cells");
        found = true;
      }
    }
    return found;
  }

  /** Where each cell of a line begins, in columns from 1. */
  private static List<Integer> starts(String line, char separator) {
    List<Integer> starts = new ArrayList<>(List.of(1));
    boolean quoted = false;
    for (int i = 0; i < line.length(); i++) {
      quoted ^= line.charAt(i) == '"';
      if (!quoted && line.charAt(i) == separator) {
        starts.add(line.codePointCount(0, i) + 2);
      }
    }
    return starts;
  }

  private static Optional<List<Column>> columns(
      Row header, String file, ProblemAccumulator problems) {
    List<Column> columns = new ArrayList<>();
    boolean good = true;
    for (int i = 0; i < header.cells().size(); i++) {
      String cell = header.cells().get(i).strip();
      Place place = place(file, header, i);
      int open = cell.indexOf('(');
      boolean stated = open > 0 && cell.endsWith(")");
      String name = stated ? cell.substring(0, open).strip() : cell;
      Optional<Unit> unit = Optional.empty();
      if (stated) {
        try {
          unit = Optional.of(UnitParser.parse(cell.substring(open + 1, cell.length() - 1).strip()));
        } catch (TextFault fault) {
          problems.add(fault.kind(), place, "the column `" + name + "`: " + fault.getMessage());
          good = false;
        }
      }
      boolean twice = columns.stream().anyMatch(c -> c.name().equals(name));
      if (twice && !name.isEmpty()) {
        problems.add(ProblemKind.DUPLICATE_KEY, place, "two columns are called `" + name + "`");
        good = false;
      }
      columns.add(new Column(name, unit, i, place));
    }
    return good ? Optional.of(columns) : Optional.empty();
  }

  private static Place place(String file, Row row, int column) {
    return new Place(file, row.line(), column < row.starts().size() ? row.starts().get(column) : 1);
  }

  /** The column of a name; told where there is none. */
  Optional<Column> column(YamlText name, ProblemAccumulator problems) {
    return column(name.text(), name.place(), problems);
  }

  Optional<Column> column(String name, Place from, ProblemAccumulator problems) {
    Optional<Column> column = columns.stream().filter(c -> c.name().equals(name)).findFirst();
    if (column.isEmpty()) {
      List<String> names = columns.stream().map(Column::name).toList();
      problems.add(
          ProblemKind.UNKNOWN_NAME,
          from,
          file
              + " has no column `"
              + name
              + "`"
              + Nearest.hint(name, names)
              + "; it has "
              + String.join(", ", names));
    }
    return column;
  }

  int size() {
    return rows.size();
  }

  Place place(int row, Column column) {
    return place(file, rows.get(row), column.index());
  }

  Place wholeFile() {
    return Place.wholeFile(file);
  }

  boolean isEmpty(int row, Column column) {
    List<String> cells = rows.get(row).cells();
    return column.index() >= cells.size() || cells.get(column.index()).isBlank();
  }

  /** A number in the unit of its column; told, and empty, where the cell holds none. */
  Optional<Quantity> quantity(int row, Column column, ProblemAccumulator problems) {
    if (isEmpty(row, column)) {
      problems.add(
          ProblemKind.MISSING_KEY,
          place(row, column),
          "`" + column.name() + "` is missing on this line");
      return Optional.empty();
    }
    String cell = rows.get(row).cells().get(column.index()).strip();
    try {
      Quantity number = QuantityParser.parse(semicolons ? cell.replace(',', '.') : cell);
      if (!number.bare()) {
        problems.add(
            ProblemKind.UNIT,
            place(row, column),
            "units stand in the header, as in `" + column.name() + " (m/s)`; here is " + cell);
        return Optional.empty();
      }
      return Optional.of(
          new Quantity(number.value(), column.unit().orElse(Unit.ONE), column.unit().isEmpty()));
    } catch (TextFault fault) {
      problems.add(fault.kind(), place(row, column), fault.getMessage());
      return Optional.empty();
    }
  }
}
