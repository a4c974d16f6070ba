package org.hullsum.casefile;

import java.util.Map;
import java.util.Optional;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;
import org.hullsum.units.Noted;
import org.hullsum.units.Unit;

/** Reads a density, a formula with its {@code unit} beside it. */
final class DensityReader {
  private final FormulaReader formulas;

  DensityReader(FormulaReader formulas) {
    this.formulas = formulas;
  }

  /**
   * The formula under a key.
   *
   * @param wanted what it must measure, empty for any
   * @param because what it is for, such as {@code a mass rate per area}
   */
  Optional<Formula> density(MapReader map, String key, Optional<Dimension> wanted, String because) {
    Map<String, Optional<Dimension>> variables = Need.SPACE_AND_TIME;
    if (formulas.scope().working().none()) {
      refuseUnit(map);
      return map.get(key)
          .flatMap(v -> formulas.formula(v, Need.any("`" + key + "`").in(variables)));
    }
    Optional<Unit> unit = unit(map);
    if (unit.isPresent() && wanted.isPresent() && !unit.get().dimension().equals(wanted.get())) {
      formulas
          .values()
          .problems()
          .add(
              ProblemKind.DIMENSION,
              map.placeOf("unit"),
              "`"
                  + unit.get().code()
                  + "` is in "
                  + unit.get().dimension()
                  + "; "
                  + because
                  + " is in "
                  + wanted.get());
      return Optional.empty();
    }
    Need any = Need.any("`" + key + "`").in(variables);
    Need need = unit.isPresent() ? any.in(unit.get()) : any;
    return map.get(key)
        .flatMap(v -> formulas.formula(v, need))
        .filter(f -> unit.isPresent())
        .map(f -> new Formula(f.expression(), unit.map(Unit::dimension)));
  }

  private Optional<Unit> unit(MapReader map) {
    Optional<Noted<Unit>> unit =
        map.require("unit").flatMap(v -> formulas.values().unit(v, "`unit`"));
    unit.ifPresent(u -> u.notes().forEach(formulas.scope()::note));
    return unit.map(Noted::value);
  }

  private void refuseUnit(MapReader map) {
    if (map.has("unit")) {
      formulas
          .values()
          .problems()
          .add(
              ProblemKind.UNIT,
              map.placeOf("unit"),
              "with `units: none` no unit is written; leave it out");
    }
  }
}
