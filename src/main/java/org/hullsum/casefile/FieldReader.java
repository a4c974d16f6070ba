package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.VectorExpression;
import org.hullsum.field.AxisFrame;
import org.hullsum.field.CoordinateSystems;
import org.hullsum.field.Coordinates;
import org.hullsum.field.VectorField;
import org.hullsum.field.VectorFields;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;
import org.hullsum.units.Noted;
import org.hullsum.units.Unit;

/** Reads the named fields, in whatever order they refer to one another. */
final class FieldReader {
  private static final List<String> KINDS = List.of("vector", "gradient", "sum", "carrier");
  private static final List<String> COORDINATES = List.of("cartesian", "cylindrical", "spherical");

  /** How deep fields may be made of one another. */
  private static final int MOST_LAYERS = 50;

  private final FormulaReader formulas;
  private final ValueReader values;
  private final ProblemAccumulator problems;
  private final Map<String, YamlMap.Entry> stated = new LinkedHashMap<>();
  private final Map<String, Optional<FieldEntry>> read = new LinkedHashMap<>();

  /** The fields being read, from the first to the one at hand. */
  private final List<String> open = new ArrayList<>();

  FieldReader(FormulaReader formulas) {
    this.formulas = formulas;
    this.values = formulas.values();
    this.problems = values.problems();
  }

  void readAll(YamlValue fields) {
    Optional<YamlMap> map = values.map(fields, "`fields`", "from names to fields");
    map.ifPresent(m -> m.entries().forEach(this::declare));
    List.copyOf(stated.keySet()).forEach(this::field);
  }

  private void declare(YamlMap.Entry entry) {
    Optional<String> fault = NameRules.faultOfObject(entry.name());
    if (fault.isPresent()) {
      problems.add(
          ProblemKind.BAD_NAME,
          entry.key().place(),
          "a field can't be called " + entry.key().shown() + ": " + fault.get());
    }
    stated.put(entry.name(), entry);
  }

  /** The fields that were read without a fault, in the order of the file. */
  Map<String, VectorField> fields() {
    Map<String, VectorField> fields = new LinkedHashMap<>();
    for (String name : stated.keySet()) {
      Optional<FieldEntry> entry = read.getOrDefault(name, Optional.empty());
      entry.ifPresent(e -> fields.put(name, e.field()));
    }
    return fields;
  }

  Map<String, Place> places() {
    Map<String, Place> places = new LinkedHashMap<>();
    stated.forEach((name, entry) -> places.put(name, entry.key().place()));
    return Collections.unmodifiableMap(places);
  }

  /** The field that a value names; empty where it is unknown (reported) or was refused. */
  Optional<FieldEntry> reference(YamlValue value) {
    Optional<YamlText> name = values.text(value, "the name of a field");
    if (name.isEmpty()) {
      return Optional.empty();
    }
    if (!stated.containsKey(name.get().text())) {
      problems.add(
          ProblemKind.UNKNOWN_NAME,
          value.place(),
          "there is no field "
              + name.get().shown()
              + Nearest.hint(name.get().text(), stated.keySet())
              + YamlTraps.hint(name.get()));
      return Optional.empty();
    }
    formulas.scope().uses(name.get().text());
    if (open.size() >= MOST_LAYERS) {
      problems.add(
          ProblemKind.LIMIT_EXCEEDED,
          value.place(),
          "fields are made of one another in more than " + MOST_LAYERS + " layers");
      return Optional.empty();
    }
    if (open.contains(name.get().text())) {
      problems.add(
          ProblemKind.CYCLE,
          value.place(),
          "the fields "
              + String.join(" → ", open.subList(open.indexOf(name.get().text()), open.size()))
              + " → "
              + name.get().text()
              + " are made of one another");
      return Optional.empty();
    }
    return field(name.get().text());
  }

  private Optional<FieldEntry> field(String name) {
    Optional<FieldEntry> known = read.get(name);
    if (known != null) {
      return known;
    }
    open.add(name);
    Optional<FieldEntry> field = read(name, stated.get(name).value());
    open.remove(open.size() - 1);
    read.put(name, field);
    return field;
  }

  private Optional<FieldEntry> read(String name, YamlValue value) {
    Optional<MapReader> section = values.section(value, Section.FIELD);
    if (section.isEmpty()) {
      return Optional.empty();
    }
    MapReader map = section.get();
    List<String> kinds = map.present(KINDS);
    if (kinds.size() != 1) {
      if (!map.faulty()) {
        problems.add(
            kinds.isEmpty() ? ProblemKind.MISSING_KEY : ProblemKind.WRONG_VALUE,
            map.place(),
            "a field has one of the keys vector, gradient, sum, carrier; here "
                + (kinds.isEmpty() ? "is none" : "are " + String.join(" and ", kinds)));
      }
      return Optional.empty();
    }
    if (map.has("content") && !map.has("carrier")) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          map.placeOfKey("content"),
          "`content` belongs beside `carrier`, the field that it multiplies");
    }
    Optional<Unit> unit = unit(map);
    Optional<Coordinates> coordinates = coordinates(map);
    if (coordinates.isEmpty()) {
      return Optional.empty();
    }
    return switch (kinds.get(0)) {
      case "vector" -> components(name, map, coordinates.get(), unit);
      case "gradient" -> gradient(name, map, coordinates.get(), unit);
      case "sum" -> sum(name, map, unit);
      default -> carried(name, map, coordinates.get(), unit);
    };
  }

  private Optional<Unit> unit(MapReader map) {
    boolean none = formulas.scope().working().none();
    boolean needed = !none && (map.has("vector") || map.has("gradient"));
    if (none && map.has("unit")) {
      problems.add(
          ProblemKind.UNIT,
          map.placeOf("unit"),
          "with `units: none` no unit is written; leave it out");
      return Optional.empty();
    }
    Optional<Noted<Unit>> unit =
        (needed ? map.require("unit") : map.get("unit")).flatMap(v -> values.unit(v, "`unit`"));
    unit.ifPresent(u -> u.notes().forEach(formulas.scope()::note));
    return unit.map(Noted::value);
  }

  private Optional<Coordinates> coordinates(MapReader map) {
    Optional<String> kind = Optional.of("cartesian");
    if (map.has("coordinates")) {
      kind =
          map.get("coordinates")
              .flatMap(v -> values.text(v, "`coordinates`"))
              .flatMap(t -> values.word(t, "`coordinates`", COORDINATES));
    }
    if (kind.isPresent() && kind.get().equals("cartesian") && map.has("axis")) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          map.placeOfKey("axis"),
          "`axis` belongs to cylindrical or spherical coordinates; these are Cartesian");
      return Optional.empty();
    }
    Optional<AxisFrame> frame =
        map.has("axis") ? map.get("axis").flatMap(this::axis) : Optional.of(AxisFrame.STANDARD);
    if (kind.isEmpty() || frame.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        switch (kind.get()) {
          case "cylindrical" -> CoordinateSystems.cylindrical(frame.get());
          case "spherical" -> CoordinateSystems.spherical(frame.get());
          default -> CoordinateSystems.cartesian();
        });
  }

  private Optional<AxisFrame> axis(YamlValue value) {
    Optional<MapReader> map = values.section(value, Section.AXIS);
    if (map.isEmpty()) {
      return Optional.empty();
    }
    Optional<VectorExpression> through =
        map.get().has("through")
            ? map.get().get("through").flatMap(v -> formulas.point(v, "`through`"))
            : Optional.of(VectorExpression.of(Vector3.ZERO));
    Optional<Vector3> along =
        map.get().has("along")
            ? map.get().get("along").flatMap(v -> formulas.direction(v, "`along`"))
            : Optional.of(Vector3.Z);
    return through.isPresent() && along.isPresent()
        ? AxisFrame.of(through.get(), along.get())
        : Optional.empty();
  }

  private static Map<String, Optional<Dimension>> variables(Coordinates coordinates) {
    Map<String, Optional<Dimension>> variables = new LinkedHashMap<>(Need.TIME);
    for (String name : coordinates.definitions().keySet()) {
      boolean angle = List.of("theta", "polar", "azimuth").contains(name);
      variables.put(name, Optional.of(angle ? Dimension.NONE : Dimension.LENGTH));
    }
    return variables;
  }

  private static Need need(String what, Coordinates coordinates, Optional<Unit> unit) {
    Need need = Need.any(what).in(variables(coordinates));
    return unit.isPresent() ? need.in(unit.get()) : need;
  }

  private Optional<FieldEntry> components(
      String name, MapReader map, Coordinates coordinates, Optional<Unit> unit) {
    return map.get("vector")
        .flatMap(v -> formulas.vector(v, need("the vector of a field", coordinates, unit)))
        .map(v -> VectorFields.ofComponents(name, coordinates, v))
        .map(field -> new FieldEntry(field, unit.map(Unit::dimension)));
  }

  private Optional<FieldEntry> gradient(
      String name, MapReader map, Coordinates coordinates, Optional<Unit> unit) {
    Optional<MapReader> section =
        map.get("gradient").flatMap(v -> values.section(v, Section.GRADIENT));
    if (section.isEmpty()) {
      return Optional.empty();
    }
    Need any = need("`of`", coordinates, Optional.empty());
    Optional<Formula> of = section.get().require("of").flatMap(v -> formulas.formula(v, any));
    Optional<Formula> times =
        section.get().has("times")
            ? section.get().get("times").flatMap(v -> formulas.formula(v, any.called("`times`")))
            : Optional.of(Formula.bare(1));
    if (of.isEmpty() || times.isEmpty()) {
      return Optional.empty();
    }
    Optional<Dimension> found =
        of.get()
            .dimension()
            .flatMap(o -> times.get().dimension().map(t -> o.times(t).dividedBy(Dimension.LENGTH)));
    if (!agrees(found, unit, map.placeOf("gradient"), "times · grad(of)")) {
      return Optional.empty();
    }
    return Optional.of(
        new FieldEntry(
            VectorFields.gradient(
                name, coordinates, of.get().expression(), times.get().expression()),
            unit.map(Unit::dimension)));
  }

  private boolean agrees(Optional<Dimension> found, Optional<Unit> unit, Place place, String what) {
    if (found.isPresent() && unit.isPresent() && !found.get().equals(unit.get().dimension())) {
      problems.add(
          ProblemKind.DIMENSION,
          place,
          what
              + " is in "
              + found.get()
              + ", but the stated unit `"
              + unit.get().code()
              + "` is in "
              + unit.get().dimension());
      return false;
    }
    return true;
  }

  private Optional<FieldEntry> sum(String name, MapReader map, Optional<Unit> unit) {
    Optional<YamlList> list =
        map.get("sum").flatMap(v -> values.list(v, "`sum`", "of names of fields"));
    if (list.isEmpty()) {
      return Optional.empty();
    }
    List<VectorField> parts = new ArrayList<>();
    Optional<Dimension> dimension = unit.map(Unit::dimension);
    for (YamlValue item : list.get().items()) {
      Optional<FieldEntry> part = reference(item);
      if (part.isEmpty()) {
        continue;
      }
      if (dimension.isPresent()
          && part.get().dimension().isPresent()
          && !dimension.equals(part.get().dimension())) {
        problems.add(
            ProblemKind.DIMENSION,
            item.place(),
            "the field `"
                + part.get().field().name()
                + "` is in "
                + part.get().dimension().get()
                + ", the sum in "
                + dimension.get());
        return Optional.empty();
      }
      dimension = dimension.isPresent() ? dimension : part.get().dimension();
      parts.add(part.get().field());
    }
    if (list.get().items().isEmpty()) {
      problems.add(ProblemKind.WRONG_VALUE, list.get().place(), "`sum` names one field or more");
    }
    return parts.isEmpty() || parts.size() < list.get().items().size()
        ? Optional.empty()
        : Optional.of(new FieldEntry(VectorFields.sum(name, parts), dimension));
  }

  private Optional<FieldEntry> carried(
      String name, MapReader map, Coordinates coordinates, Optional<Unit> unit) {
    Optional<FieldEntry> carrier = map.get("carrier").flatMap(this::reference);
    Optional<Formula> content =
        map.require("content")
            .flatMap(v -> formulas.formula(v, need("`content`", coordinates, Optional.empty())));
    if (carrier.isEmpty() || content.isEmpty()) {
      return Optional.empty();
    }
    Optional<Dimension> found =
        carrier.get().dimension().flatMap(c -> content.get().dimension().map(c::times));
    if (!agrees(found, unit, map.placeOf("carrier"), "carrier times content")) {
      return Optional.empty();
    }
    VectorField field =
        VectorFields.carried(name, carrier.get().field(), coordinates, content.get().expression());
    return Optional.of(new FieldEntry(field, unit.isPresent() ? unit.map(Unit::dimension) : found));
  }
}
