package org.hullsum.casefile;

import java.util.Optional;
import org.hullsum.problem.TextFault;
import org.hullsum.units.MeasuredQuantity;
import org.hullsum.units.MeasuredQuantityParser;
import org.hullsum.units.Noted;
import org.hullsum.units.Quantity;

/**
 * What the uncertainty of readings is stated to be: {@code ± …} for all of them, or a column with a
 * figure for each, perhaps with what the figures mean: {@code spread (k=2)}.
 */
final class ReadingUncertainty {
  private final CaseScope scope;
  private final MeasuredQuantityParser parser;
  private final Optional<YamlText> stated;
  private final ReadingsTable table;
  private final Optional<ReadingsTable.Column> column;
  private final String meaning;

  private ReadingUncertainty(
      CaseScope scope,
      Optional<YamlText> stated,
      ReadingsTable table,
      Optional<ReadingsTable.Column> column,
      String meaning) {
    this.scope = scope;
    this.parser = MeasuredQuantityParser.of(scope.usualMeaning(), scope.working());
    this.stated = stated;
    this.table = table;
    this.column = column;
    this.meaning = meaning;
  }

  /** The one that {@code uncertainty} states; without it the readings are exact, with a note. */
  static Optional<ReadingUncertainty> of(
      MapReader map, ReadingsTable table, FormulaReader formulas, String patch) {
    CaseScope scope = formulas.scope();
    if (!map.has("uncertainty")) {
      scope.note(
          "The readings of the traverse over `"
              + patch
              + "` state no uncertainty and are taken as exact.");
      return Optional.of(
          new ReadingUncertainty(scope, Optional.empty(), table, Optional.empty(), ""));
    }
    Optional<YamlText> text =
        map.get("uncertainty").flatMap(v -> formulas.values().text(v, "`uncertainty`"));
    if (text.isEmpty()) {
      return Optional.empty();
    }
    if (MeasuredReader.hasUncertainty(text.get().text())) {
      return Optional.of(new ReadingUncertainty(scope, text, table, Optional.empty(), ""));
    }
    String named = text.get().text().strip();
    int open = named.indexOf('(');
    String meaning = open > 0 ? named.substring(open) : "";
    String name = open > 0 ? named.substring(0, open).strip() : named;
    return table
        .column(name, text.get().place(), scope.problems())
        .map(c -> new ReadingUncertainty(scope, text, table, Optional.of(c), meaning));
  }

  /** A reading with its uncertainty; empty, and told, where the figure is wrong. */
  Optional<MeasuredQuantity> of(int row, Quantity reading) {
    if (stated.isEmpty()) {
      return Optional.of(MeasuredQuantity.exact(reading));
    }
    String text = stated.get().text().strip();
    if (column.isPresent()) {
      Optional<Quantity> figure = table.quantity(row, column.get(), scope.problems());
      if (figure.isEmpty()) {
        return Optional.empty();
      }
      text =
          "± "
              + figure.get().value()
              + column.get().unit().map(u -> " " + u.code()).orElse("")
              + " "
              + meaning;
    }
    try {
      Noted<MeasuredQuantity> read = parser.withUncertainty(reading, text);
      read.notes().forEach(scope::note);
      return Optional.of(read.value());
    } catch (TextFault fault) {
      if (column.isPresent()) {
        scope.problems().add(fault.kind(), table.place(row, column.get()), fault.getMessage());
      } else {
        scope.problems().add(stated.get(), fault);
      }
      return Optional.empty();
    }
  }
}
