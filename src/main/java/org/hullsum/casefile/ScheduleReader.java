package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.model.Schedule;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;

/** Reads when a case is audited. */
final class ScheduleReader {
  private static final int MOST_INSTANTS = 100_000;

  private final FormulaReader formulas;

  ScheduleReader(FormulaReader formulas) {
    this.formulas = formulas;
  }

  Schedule read(YamlValue value) {
    if (value.asMap().isPresent()) {
      return formulas
          .values()
          .section(value, Section.TIME)
          .flatMap(this::span)
          .orElse(Schedule.TIMELESS);
    }
    List<Double> instants = new ArrayList<>();
    for (YamlValue item : ValueReader.oneOrMore(value)) {
      OptionalDouble instant =
          formulas.number(item, Need.of("an instant of `time`", Dimension.TIME));
      if (instant.isEmpty()) {
        continue;
      }
      if (!instants.isEmpty() && instant.getAsDouble() <= instants.get(instants.size() - 1)) {
        refuse(item, "the instants of `time` ascend; this is not after the one before");
      }
      instants.add(instant.getAsDouble());
    }
    if (value.asList().filter(l -> l.items().isEmpty()).isPresent()) {
      refuse(value, "`time` lists one instant or more");
    }
    return new Schedule(instants, false);
  }

  private Optional<Schedule> span(MapReader map) {
    Need need = Need.of("`time`", Dimension.TIME);
    OptionalDouble from = number(map, "from", need);
    OptionalDouble to = number(map, "to", need);
    OptionalDouble steps = number(map, "steps", Need.plain("`steps`"));
    if (from.isEmpty() || to.isEmpty() || steps.isEmpty()) {
      return Optional.empty();
    }
    double count = steps.getAsDouble();
    if (!(count >= 1 && count < MOST_INSTANTS && count == Math.rint(count))) {
      refuse(
          map.get("steps").orElseThrow(),
          "`steps` is a whole number of intervals from 1 to " + (MOST_INSTANTS - 1));
      return Optional.empty();
    }
    if (!(to.getAsDouble() > from.getAsDouble())) {
      refuse(map.get("to").orElseThrow(), "`to` must be after `from`");
      return Optional.empty();
    }
    int intervals = (int) count;
    List<Double> instants = new ArrayList<>();
    for (int i = 0; i <= intervals; i++) {
      double fraction = i / count;
      instants.add((1 - fraction) * from.getAsDouble() + fraction * to.getAsDouble());
    }
    return Optional.of(new Schedule(instants, true));
  }

  private OptionalDouble number(MapReader map, String key, Need need) {
    Optional<YamlValue> value = map.require(key);
    return value.isPresent()
        ? formulas.number(value.get(), need.called("`" + key + "` of `time`"))
        : OptionalDouble.empty();
  }

  private void refuse(YamlValue value, String message) {
    formulas.values().problems().add(ProblemKind.WRONG_VALUE, value.place(), message);
  }
}
