package org.hullsum.casefile;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.model.ConservedQuantity;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;
import org.hullsum.units.Noted;
import org.hullsum.units.Unit;
import org.hullsum.units.WorkingUnits;

/** Reads what is conserved, with the unit in which its rates are reported. */
final class ConservedQuantityReader {
  private static final Map<String, Unit> KNOWN = known();

  private final CaseScope scope;
  private final ValueReader values;
  private final WorkingUnits working;

  ConservedQuantityReader(FormulaReader formulas) {
    this.scope = formulas.scope();
    this.values = formulas.values();
    this.working = scope.working();
  }

  private static Map<String, Unit> known() {
    Dimension perTime = Dimension.TIME.power(-1);
    Dimension volume = Dimension.LENGTH.power(3).times(perTime);
    Dimension energy =
        Dimension.MASS.times(Dimension.LENGTH.power(2)).times(Dimension.TIME.power(-3));
    Map<String, Unit> known = new LinkedHashMap<>();
    known.put("volume", new Unit("m3/s", volume, 1, 0));
    known.put("mass", new Unit("kg/s", Dimension.MASS.times(perTime), 1, 0));
    known.put("energy", new Unit("W", energy, 1, 0));
    known.put("amount", new Unit("mol/s", Dimension.AMOUNT.times(perTime), 1, 0));
    known.put("charge", new Unit("A", Dimension.CURRENT, 1, 0));
    return known;
  }

  Optional<ConservedQuantity> read(MapReader top) {
    if (working.none()) {
      if (top.has("quantity")) {
        values
            .problems()
            .add(
                ProblemKind.WRONG_VALUE,
                top.placeOf("quantity"),
                "with `units: none` every number is plain: leave `quantity` out, or state units");
      }
      return Optional.of(new ConservedQuantity("quantity", Unit.ONE));
    }
    if (top.has("quantities")) {
      return Optional.empty();
    }
    Optional<YamlValue> value = top.require("quantity");
    if (value.isEmpty()) {
      return Optional.empty();
    }
    return value.get().asMap().isPresent()
        ? values.section(value.get(), Section.CONSERVED).flatMap(this::own)
        : values
            .text(value.get(), "`quantity`")
            .flatMap(
                t ->
                    values.word(
                        t, "`quantity` (or {name: …, unit: …})", List.copyOf(KNOWN.keySet())))
            .map(name -> new ConservedQuantity(name, KNOWN.get(name)));
  }

  private Optional<ConservedQuantity> own(MapReader map) {
    Optional<String> name = map.require("name").flatMap(v -> values.freeText(v, "`name`"));
    Optional<Noted<Unit>> noted = map.require("unit").flatMap(v -> values.unit(v, "`unit`"));
    noted.ifPresent(u -> u.notes().forEach(scope::note));
    Optional<Unit> unit = noted.map(Noted::value);
    if (unit.isPresent() && unit.get().offset() != 0) {
      values
          .problems()
          .add(ProblemKind.UNIT, map.placeOf("unit"), "a rate is not in " + unit.get().code());
      return Optional.empty();
    }
    return Together.of(name, unit, ConservedQuantity::new);
  }
}
