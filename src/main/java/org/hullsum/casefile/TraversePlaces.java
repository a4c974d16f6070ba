package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;
import org.hullsum.units.Quantity;

/** Reads where the readings of a traverse were taken, and refuses places outside the section. */
final class TraversePlaces {
  /** A place may be beyond the wall by a rounding. */
  private static final double ROUNDING = 1e-9;

  private final CaseScope scope;
  private final ReadingsTable table;
  private final DuctSection section;
  private final TraverseText text;

  TraversePlaces(CaseScope scope, ReadingsTable table, DuctSection section, TraverseText text) {
    this.scope = scope;
    this.table = table;
    this.section = section;
    this.text = text;
  }

  /** Two columns, and whether they are a radius and an angle. */
  private record Columns(ReadingsTable.Column first, ReadingsTable.Column second, boolean polar) {}

  /**
   * The places, one for each line.
   *
   * @param reading the column that is empty where a reading is missing
   */
  Optional<List<TraversePoint>> read(MapReader at, ReadingsTable.Column reading) {
    Optional<Columns> columns = columns(at);
    if (columns.isEmpty()) {
      return Optional.empty();
    }
    List<TraversePoint> points = new ArrayList<>();
    for (int row = 0; row < table.size(); row++) {
      point(row, columns.get(), reading).ifPresent(points::add);
    }
    return points.size() == table.size() ? Optional.of(points) : Optional.empty();
  }

  private Optional<Columns> columns(MapReader at) {
    boolean polar = at.has("radius") || at.has("angle");
    boolean straight = at.has("across") || at.has("up");
    if (polar == straight) {
      scope
          .problems()
          .add(
              straight ? ProblemKind.WRONG_VALUE : ProblemKind.MISSING_KEY,
              at.place(),
              "`at` names the columns of the places: {radius: COLUMN, angle: COLUMN} or {across:"
                  + " COLUMN, up: COLUMN}");
      return Optional.empty();
    }
    if (polar && !section.round()) {
      scope
          .problems()
          .add(
              ProblemKind.WRONG_VALUE,
              at.place(),
              "places in a rectangle are {across: COLUMN, up: COLUMN}, lengths along its two edges"
                  + " from the corner");
      return Optional.empty();
    }
    Optional<ReadingsTable.Column> first =
        column(at, polar ? "radius" : "across", Dimension.LENGTH);
    Optional<ReadingsTable.Column> second =
        column(at, polar ? "angle" : "up", polar ? Dimension.NONE : Dimension.LENGTH);
    return Together.of(first, second, (a, b) -> new Columns(a, b, polar));
  }

  private Optional<ReadingsTable.Column> column(MapReader at, String key, Dimension dimension) {
    return at.require(key)
        .flatMap(v -> new ValueReader(scope.problems()).text(v, "`" + key + "`"))
        .flatMap(name -> table.column(name, scope.problems()))
        .filter(c -> TraverseSpeeds.measures(c, dimension, scope));
  }

  private Optional<TraversePoint> point(int row, Columns columns, ReadingsTable.Column reading) {
    Optional<Double> first = number(row, columns.first());
    Optional<Double> second = number(row, columns.second());
    if (first.isEmpty() || second.isEmpty()) {
      return Optional.empty();
    }
    double a = first.get() / section.first();
    double b = second.get();
    if (section.round() && !columns.polar()) {
      double up = b / section.second();
      b = Math.atan2(up, a);
      a = Math.hypot(a, up);
    } else if (!section.round()) {
      b = b / section.second();
    }
    if (columns.polar() && a < 0) {
      refuse(
          row,
          columns.first(),
          "a distance from the centre is not negative; turn the angle by 180 degrees instead");
      return Optional.empty();
    }
    boolean outside =
        a > 1 + ROUNDING
            || a < -ROUNDING
            || (!section.round() && (b > 1 + ROUNDING || b < -ROUNDING));
    if (outside) {
      refuse(row, columns.first(), outside(a, b));
      return Optional.empty();
    }
    return Optional.of(
        new TraversePoint(a, b, !table.isEmpty(row, reading), table.place(row, reading)));
  }

  private String outside(double a, double b) {
    return section.round()
        ? "this reading stands "
            + text.length(a * section.first())
            + " from the centre, outside the section of radius "
            + text.length(section.first())
        : "this reading stands "
            + text.onSides(a, b)
            + ", outside the section of "
            + text.length(section.first())
            + " by "
            + text.length(section.second());
  }

  private void refuse(int row, ReadingsTable.Column column, String message) {
    scope.problems().add(ProblemKind.WRONG_VALUE, table.place(row, column), message);
  }

  private Optional<Double> number(int row, ReadingsTable.Column column) {
    Optional<Quantity> quantity = table.quantity(row, column, scope.problems());
    return quantity.map(q -> q.in(scope.working()));
  }
}
