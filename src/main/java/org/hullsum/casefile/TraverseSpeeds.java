package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.model.Input;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;
import org.hullsum.units.MeasuredQuantity;
import org.hullsum.units.Quantity;
import org.hullsum.units.Unit;
import org.hullsum.units.WorkingUnits;

/**
 * Reads the speeds of a traverse along the normal, each as a formula of its own inputs: speed · cos
 * yaw · cos pitch, the dot product of three components, or C √(2 Δp/ρ).
 */
final class TraverseSpeeds {
  static final Dimension SPEED = Dimension.LENGTH.dividedBy(Dimension.TIME);

  private static final Dimension DENSITY = Dimension.MASS.dividedBy(Dimension.LENGTH.power(3));
  private static final Dimension PRESSURE = DENSITY.times(SPEED.power(2));
  private static final List<String> AXES = List.of("x", "y", "z");

  private final FormulaReader formulas;
  private final MeasuredReader measured;
  private final CaseScope scope;
  private final String patch;

  TraverseSpeeds(FormulaReader formulas, MeasuredReader measured, String patch) {
    this.formulas = formulas;
    this.measured = measured;
    this.scope = formulas.scope();
    this.patch = patch;
  }

  /**
   * Whether a column is in the dimension that is needed; told where it is not. Without a unit its
   * numbers are in working units.
   */
  static boolean measures(ReadingsTable.Column column, Dimension dimension, CaseScope scope) {
    boolean angle = dimension.isNone();
    if (column.unit().isPresent() && scope.working().none() && !angle) {
      scope
          .problems()
          .add(ProblemKind.UNIT, column.place(), "with `units: none` no unit is written");
      return false;
    }
    boolean fits =
        column.unit().map(u -> u.dimension().equals(dimension)).orElse(true)
            && !(column.unit().isEmpty() && !scope.working().none() && !angle);
    if (!fits) {
      scope
          .problems()
          .add(
              column.unit().isEmpty() ? ProblemKind.UNIT : ProblemKind.DIMENSION,
              column.place(),
              "the column `"
                  + column.name()
                  + "` must be in "
                  + (angle ? "an angle, deg or rad" : dimension)
                  + "; "
                  + column
                      .unit()
                      .map(u -> "`" + u.code() + "` is " + described(u))
                      .orElse(
                          "write its unit in parentheses, such as `" + column.name() + " (…)`"));
    }
    return fits;
  }

  private static String described(Unit unit) {
    return unit.dimension().isNone() ? "a plain number or an angle" : "in " + unit.dimension();
  }

  /**
   * How speeds are told to people.
   *
   * @param unit its code
   * @param size in working units
   */
  private record Told(String unit, double size) {}

  /**
   * The speeds.
   *
   * @param along the normal, formulas of inputs in working units
   * @param values of these
   * @param unit in which they are told to people
   * @param size of that unit in working units
   * @param swirl mean angle between flow and normal in degrees
   */
  record Speeds(
      List<Expression> along,
      List<Double> values,
      String unit,
      double size,
      Optional<Double> swirl) {}

  /** Makes the speed of one line. */
  private interface Line {
    Optional<Expression> along(int row);
  }

  /**
   * Reads them.
   *
   * @param columns the columns of {@code speed}, {@code components} or {@code pressure}
   */
  Optional<Speeds> read(
      MapReader map,
      ReadingsTable table,
      List<ReadingsTable.Column> columns,
      DuctSection section,
      Optional<Dimension> wanted) {
    boolean pressure = map.has("pressure");
    Dimension dimension = pressure ? PRESSURE : wanted.orElse(SPEED);
    if (!columns.stream().allMatch(c -> measures(c, dimension, scope))
        || (pressure && !isSpeed(map, wanted))) {
      return Optional.empty();
    }
    Optional<ReadingUncertainty> uncertainty = ReadingUncertainty.of(map, table, formulas, patch);
    if (uncertainty.isEmpty()) {
      return Optional.empty();
    }
    List<Double> swirl = new ArrayList<>();
    Optional<Line> line =
        pressure
            ? pressures(map, table, columns.get(0), uncertainty.get())
            : columns.size() == 3
                ? Optional.of(
                    row ->
                        component(row, table, columns, section.normal(), uncertainty.get(), swirl))
                : angles(map, table, columns.get(0), uncertainty.get(), swirl);
    if (line.isEmpty()) {
      return Optional.empty();
    }
    List<Expression> along = new ArrayList<>();
    for (int row = 0; row < table.size(); row++) {
      line.get().along(row).ifPresent(along::add);
    }
    if (along.size() < table.size()) {
      return Optional.empty();
    }
    List<Double> values = along.stream().map(e -> scope.value(e).orElse(Double.NaN)).toList();
    Told told = told(columns, pressure);
    return Optional.of(
        new Speeds(
            along,
            values,
            told.unit(),
            told.size(),
            swirl.isEmpty()
                ? Optional.empty()
                : Optional.of(swirl.stream().mapToDouble(d -> d).average().orElseThrow())));
  }

  private boolean isSpeed(MapReader map, Optional<Dimension> wanted) {
    if (wanted.isEmpty() || wanted.get().equals(SPEED)) {
      return true;
    }
    scope
        .problems()
        .add(
            ProblemKind.DIMENSION,
            map.placeOf("pressure"),
            "a differential pressure gives a speed, but the flux needs "
                + wanted.get()
                + "; multiply it by a density with `times`, or change `quantity`");
    return false;
  }

  private Told told(List<ReadingsTable.Column> columns, boolean pressure) {
    WorkingUnits working = scope.working();
    if (working.none()) {
      return new Told("1", 1);
    }
    if (pressure || columns.get(0).unit().isEmpty()) {
      return new Told("m/s", working.fromSi(1, SPEED));
    }
    Unit unit = columns.get(0).unit().get();
    return new Told(unit.code(), working.fromSi(unit.scale(), unit.dimension()));
  }

  private Optional<Line> angles(
      MapReader map,
      ReadingsTable table,
      ReadingsTable.Column speed,
      ReadingUncertainty uncertainty,
      List<Double> swirl) {
    List<ReadingsTable.Column> turns = new ArrayList<>();
    for (String key : map.present(List.of("yaw", "pitch"))) {
      Optional<ReadingsTable.Column> column =
          map.get(key)
              .flatMap(v -> formulas.values().text(v, "`" + key + "`"))
              .flatMap(name -> table.column(name, scope.problems()))
              .filter(c -> measures(c, Dimension.NONE, scope));
      if (column.isEmpty()) {
        return Optional.empty();
      }
      turns.add(column.get());
    }
    return Optional.of(
        row -> {
          Optional<Expression> reading = input(row, table, speed, "", uncertainty);
          double share = 1;
          for (ReadingsTable.Column turn : turns) {
            Optional<Quantity> angle = table.quantity(row, turn, scope.problems());
            if (angle.isEmpty()) {
              return Optional.empty();
            }
            share *= Math.cos(angle.get().in(scope.working()));
          }
          if (turns.isEmpty()) {
            return reading;
          }
          swirl.add(Math.toDegrees(Math.acos(Math.min(1, Math.abs(share)))));
          Expression cosine = Expression.number(share);
          return reading.map(r -> r.times(cosine));
        });
  }

  private Optional<Expression> component(
      int row,
      ReadingsTable table,
      List<ReadingsTable.Column> columns,
      Vector3 normal,
      ReadingUncertainty uncertainty,
      List<Double> swirl) {
    List<Expression> parts = new ArrayList<>();
    double along = 0;
    double square = 0;
    for (int axis = 0; axis < columns.size(); axis++) {
      Optional<Expression> part =
          input(row, table, columns.get(axis), " " + AXES.get(axis), uncertainty);
      if (part.isEmpty()) {
        return Optional.empty();
      }
      double value = scope.value(part.get()).orElse(0.0);
      along += value * normal.component(axis);
      square += value * value;
      parts.add(part.get().times(Expression.number(normal.component(axis))));
    }
    if (square > 0) {
      swirl.add(Math.toDegrees(Math.acos(Math.min(1, Math.abs(along) / Math.sqrt(square)))));
    }
    return Optional.of(parts.get(0).plus(parts.get(1)).plus(parts.get(2)));
  }

  private Optional<Line> pressures(
      MapReader map,
      ReadingsTable table,
      ReadingsTable.Column column,
      ReadingUncertainty uncertainty) {
    Optional<MapReader> keys =
        map.get("pressure").flatMap(v -> formulas.values().section(v, Section.TRAVERSE_PRESSURE));
    Optional<Expression> density = keys.flatMap(k -> positive(k, "density", DENSITY));
    Optional<Expression> coefficient =
        keys.flatMap(k -> positive(k, "coefficient", Dimension.NONE));
    return Together.of(
        density,
        coefficient,
        (rho, c) ->
            row ->
                ofPressure(row, table, column, uncertainty)
                    .map(
                        dp ->
                            c.times(
                                Expression.call(
                                    Function.SQRT, Expression.number(2).times(dp).over(rho)))));
  }

  private Optional<Expression> ofPressure(
      int row, ReadingsTable table, ReadingsTable.Column column, ReadingUncertainty uncertainty) {
    Optional<Expression> reading = input(row, table, column, " pressure", uncertainty);
    double value = reading.flatMap(scope::value).orElse(1.0);
    if (!(value > 0)) {
      scope
          .problems()
          .add(
              ProblemKind.WRONG_VALUE,
              table.place(row, column),
              "a differential pressure that is not above zero has no speed; where the flow comes"
                  + " back, read a speed or its components");
      return Optional.empty();
    }
    return reading;
  }

  private Optional<Expression> positive(MapReader map, String key, Dimension dimension) {
    Optional<Expression> figure =
        map.require(key)
            .flatMap(
                v -> measured.measured(v, patch + " " + key, Need.of("`" + key + "`", dimension)))
            .map(Formula::expression);
    Optional<Double> value = figure.flatMap(scope::value);
    if (value.isPresent() && !(value.get() > 0)) {
      scope
          .problems()
          .add(
              ProblemKind.WRONG_VALUE,
              map.placeOf(key),
              "`" + key + "` must be greater than zero; it is " + value.get());
      return Optional.empty();
    }
    return figure;
  }

  /** A cell as an input of its own. */
  private Optional<Expression> input(
      int row,
      ReadingsTable table,
      ReadingsTable.Column column,
      String suffix,
      ReadingUncertainty uncertainty) {
    Optional<Quantity> quantity = table.quantity(row, column, scope.problems());
    Optional<MeasuredQuantity> figure = quantity.flatMap(q -> uncertainty.of(row, q));
    if (figure.isEmpty()) {
      return Optional.empty();
    }
    String name = scope.freshName(patch + " reading " + (row + 1) + suffix);
    Place place = table.place(row, column);
    scope.define(
        new Input(
            name,
            figure.get().quantity().in(scope.working()),
            figure.get().standardUncertaintyIn(scope.working()),
            figure.get().degreesOfFreedom(),
            Optional.empty(),
            true,
            place),
        column.unit().map(Unit::dimension));
    return Optional.of(Expression.symbol(name));
  }
}
