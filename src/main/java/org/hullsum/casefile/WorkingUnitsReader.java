package org.hullsum.casefile;

import java.util.Optional;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;
import org.hullsum.units.Noted;
import org.hullsum.units.Unit;
import org.hullsum.units.WorkingUnits;

/** Reads the working units. */
final class WorkingUnitsReader {
  private final ValueReader values;

  WorkingUnitsReader(ValueReader values) {
    this.values = values;
  }

  WorkingUnits read(YamlValue value) {
    Optional<YamlText> text = value.asText();
    if (text.isPresent() && text.get().text().equals("none")) {
      return WorkingUnits.NONE;
    }
    if (text.isPresent()) {
      values
          .problems()
          .add(
              ProblemKind.WRONG_VALUE,
              value.place(),
              "`units` is `none`, or a mapping such as {length: mm, time: h}; here is "
                  + value.described());
      return WorkingUnits.SI;
    }
    Optional<MapReader> map = values.section(value, Section.WORKING_UNITS);
    if (map.isEmpty()) {
      return WorkingUnits.SI;
    }
    return new WorkingUnits(
        scale(map.get(), "length", Dimension.LENGTH),
        scale(map.get(), "mass", Dimension.MASS),
        scale(map.get(), "time", Dimension.TIME),
        scale(map.get(), "temperature", Dimension.TEMPERATURE),
        false);
  }

  private double scale(MapReader map, String key, Dimension dimension) {
    Optional<Unit> unit =
        map.get(key).flatMap(v -> values.unit(v, "`" + key + "`")).map(Noted::value);
    if (unit.isEmpty()) {
      return 1;
    }
    if (!unit.get().dimension().equals(dimension)) {
      values
          .problems()
          .add(
              ProblemKind.DIMENSION,
              map.placeOf(key),
              "the working unit of "
                  + key
                  + " must be in "
                  + dimension
                  + "; `"
                  + unit.get().code()
                  + "` is in "
                  + unit.get().dimension());
      return 1;
    }
    if (unit.get().offset() != 0) {
      values
          .problems()
          .add(
              ProblemKind.UNIT,
              map.placeOf(key),
              "a working unit needs its zero where the SI unit has it: write `K`; single values may"
                  + " still be in "
                  + unit.get().code());
      return 1;
    }
    return unit.get().scale();
  }
}
