package org.hullsum.casefile;

import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.model.Tolerances;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;

/**
 * Reads tolerances. What a volume or an envelope states stands in the place of the default of the
 * case as a whole; a coverage that it does not state is the default's.
 */
final class TolerancesReader {
  private final FormulaReader formulas;
  private final Optional<Dimension> rate;
  private final Tolerances usual;

  /**
   * @param rate the dimension of rates, empty where there are no units
   * @param usual what holds where nothing is stated
   */
  TolerancesReader(FormulaReader formulas, Optional<Dimension> rate, Tolerances usual) {
    this.formulas = formulas;
    this.rate = rate;
    this.usual = usual;
  }

  Tolerances read(Optional<YamlValue> value) {
    Optional<MapReader> section =
        value.flatMap(v -> formulas.values().section(v, Section.TOLERANCES));
    if (section.isEmpty()) {
      return usual;
    }
    MapReader map = section.get();
    OptionalDouble absolute = OptionalDouble.empty();
    if (map.has("absolute")) {
      Need need = rate.map(d -> Need.of("`absolute`", d)).orElse(Need.any("`absolute`"));
      absolute = positive(map, "absolute", need);
    }
    OptionalDouble relative = positive(map, "relative", Need.plain("`relative`"));
    OptionalDouble coverage = positive(map, "coverage", Need.plain("`coverage`"));
    if (relative.isPresent() && relative.getAsDouble() > 1) {
      refuse(map, "relative", "a fraction of the throughput: write 0.5 % or 0.005");
      relative = OptionalDouble.empty();
    }
    if (coverage.isPresent() && !(coverage.getAsDouble() < 1 && coverage.getAsDouble() > 0)) {
      refuse(map, "coverage", "a probability between 0 and 1: write 95 % or 0.95");
      coverage = OptionalDouble.empty();
    }
    return new Tolerances(absolute, relative, coverage.orElse(usual.coverage()));
  }

  private OptionalDouble positive(MapReader map, String key, Need need) {
    Optional<YamlValue> value = map.get(key);
    OptionalDouble number =
        value.isPresent() ? formulas.number(value.get(), need) : OptionalDouble.empty();
    if (number.isPresent() && number.getAsDouble() < 0) {
      refuse(map, key, "not negative");
      return OptionalDouble.empty();
    }
    return number;
  }

  private void refuse(MapReader map, String key, String rule) {
    formulas
        .values()
        .problems()
        .add(ProblemKind.WRONG_VALUE, map.placeOf(key), "`" + key + "` is " + rule);
  }
}
