package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.StatedFlux;
import org.hullsum.numeric.Interval;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;

/** Reads how the flux through a patch is known. */
final class FluxReader {
  private static final List<String> STATEMENTS =
      List.of("field", "flux-density", "metered", "profile", "traverse", "none", "unknown");
  private static final List<String> WORDS = List.of("none", "unknown");

  private final FormulaReader formulas;
  private final ValueReader values;
  private final ProblemAccumulator problems;
  private final FieldReader fields;
  private final MeasuredReader measured;
  private final DensityReader densities;
  private final ProfileReader profiles;
  private final DataFiles files;
  private final CorrelationReader correlations;
  private final Rates rates;

  FluxReader(
      FormulaReader formulas,
      FieldReader fields,
      MeasuredReader measured,
      CorrelationReader correlations,
      DataFiles files,
      Rates rates) {
    this.formulas = formulas;
    this.values = formulas.values();
    this.problems = values.problems();
    this.fields = fields;
    this.measured = measured;
    this.densities = new DensityReader(formulas);
    this.profiles = new ProfileReader(formulas, measured);
    this.files = files;
    this.correlations = correlations;
    this.rates = rates;
  }

  /**
   * The items of a patch's flux.
   *
   * @param stated whether the patch states a surface, read or refused
   * @param surface empty where it states none or it was refused
   */
  List<StatedFlux> read(
      YamlValue value, String patch, boolean stated, Optional<SurfaceEntry> surface) {
    List<StatedFlux> fluxes = new ArrayList<>();
    for (YamlValue item : ValueReader.oneOrMore(value)) {
      item(item, new Owner(patch, stated, surface)).ifPresent(fluxes::add);
    }
    if (value.asList().filter(l -> l.items().isEmpty()).isPresent()) {
      problems.add(ProblemKind.WRONG_VALUE, value.place(), "`flux` lists one item or more");
    }
    return fluxes;
  }

  /** The patch at hand. */
  private record Owner(String patch, boolean hasSurface, Optional<SurfaceEntry> surface) {}

  private Optional<StatedFlux> item(YamlValue item, Owner owner) {
    Optional<YamlText> word = item.asText().filter(t -> !t.missing());
    if (word.isPresent()) {
      return values
          .word(word.get(), "`flux` (or a mapping such as {field: NAME})", WORDS)
          .map(w -> new StatedFlux(bare(w), Optional.empty(), Optional.empty(), item.place()));
    }
    Optional<MapReader> section = values.section(item, Section.FLUX);
    if (section.isEmpty()) {
      return Optional.empty();
    }
    MapReader map = section.get();
    List<String> kinds = map.present(STATEMENTS);
    if (kinds.size() != 1) {
      if (!map.faulty()) {
        problems.add(
            kinds.isEmpty() ? ProblemKind.MISSING_KEY : ProblemKind.WRONG_VALUE,
            map.place(),
            "an item of `flux` is one of "
                + String.join(", ", STATEMENTS)
                + "; here "
                + (kinds.isEmpty() ? "is none" : "are " + String.join(" and ", kinds)));
      }
      return Optional.empty();
    }
    refuseMisplaced(map, kinds.get(0));
    Optional<Formula> times =
        map.get("times")
            .flatMap(v -> measured.measured(v, owner.patch() + " times", Need.any("`times`")));
    Optional<Interval> within = map.get("within").flatMap(this::within);
    Optional<FluxStatement> statement =
        statement(map, kinds.get(0), owner, new Factor(map.has("times"), times));
    if (map.has("times") && times.isEmpty()) {
      return Optional.empty();
    }
    return statement.map(
        s -> new StatedFlux(s, times.map(Formula::expression), within, map.place()));
  }

  private static FluxStatement bare(String word) {
    return word.equals("none") ? new FluxStatement.None() : new FluxStatement.Unknown();
  }

  private void refuseMisplaced(MapReader map, String kind) {
    refuse(map, "unit", kind.equals("flux-density"), "`flux-density`; other figures carry theirs");
    refuse(map, "fixed", kind.equals("metered"), "`metered`");
    refuse(map, "correlated-with", kind.equals("metered"), "`metered`");
    refuse(
        map,
        "within",
        kind.equals("metered") || kind.equals("unknown"),
        "a metered or an unknown flow");
    refuse(map, "times", !WORDS.contains(kind), "a flux that is known");
  }

  private void refuse(MapReader map, String key, boolean allowed, String owner) {
    if (map.has(key) && !allowed) {
      problems.add(
          ProblemKind.WRONG_VALUE, map.placeOfKey(key), "`" + key + "` belongs to " + owner);
    }
  }

  /** The factor {@code times}. */
  private record Factor(boolean stated, Optional<Formula> formula) {
    /** What is left for the statement to measure, given what the product must. */
    Optional<Dimension> leaves(Optional<Dimension> product) {
      if (!stated) {
        return product;
      }
      Optional<Dimension> factor = formula.flatMap(Formula::dimension);
      return product.flatMap(p -> factor.map(p::dividedBy));
    }
  }

  private Optional<FluxStatement> statement(
      MapReader map, String kind, Owner owner, Factor factor) {
    if (List.of("field", "flux-density", "profile", "traverse").contains(kind)
        && !owner.hasSurface()) {
      problems.add(
          ProblemKind.MISSING_KEY,
          map.placeOfKey(kind),
          "`" + kind + "` is a flux through a surface; the patch needs the key `surface`");
    }
    Optional<Dimension> rate = factor.leaves(rates.dimension());
    Optional<Dimension> perArea = factor.leaves(rates.perArea());
    return switch (kind) {
      case "field" -> map.get(kind).flatMap(v -> field(v, perArea, factor.stated()));
      case "flux-density" ->
          densities
              .density(map, kind, perArea, "a flux density of the quantity `" + rates.name() + "`")
              .map(f -> new FluxStatement.Density(f.expression()));
      case "metered" -> map.get(kind).flatMap(v -> metered(v, map, owner.patch(), rate));
      case "profile" ->
          map.get(kind).flatMap(v -> profiles.read(v, owner.surface(), owner.patch(), perArea));
      case "traverse" ->
          map.get(kind)
              .flatMap(
                  v ->
                      new TraverseReader(formulas, measured, files)
                          .read(v, owner.surface(), owner.patch(), perArea));
      default -> word(map, kind);
    };
  }

  private Optional<FluxStatement> word(MapReader map, String kind) {
    if (map.isBare(kind)) {
      return Optional.of(bare(kind));
    }
    problems.add(
        ProblemKind.WRONG_VALUE, map.placeOf(kind), "`" + kind + "` needs no value, or `true`");
    return Optional.empty();
  }

  private Optional<FluxStatement> field(
      YamlValue value, Optional<Dimension> wanted, boolean factor) {
    Optional<FieldEntry> entry = fields.reference(value);
    Optional<Dimension> found = entry.flatMap(FieldEntry::dimension);
    if (found.isPresent() && wanted.isPresent() && !found.equals(wanted)) {
      problems.add(
          ProblemKind.DIMENSION,
          value.place(),
          "the field `"
              + entry.get().field().name()
              + "` is in "
              + found.get()
              + (factor
                  ? ", but with this `times` a flux of the quantity `"
                  : ", but a flux of the quantity `")
              + rates.name()
              + "` needs "
              + wanted.get()
              + (factor ? "" : "; multiply it by a density with `times`, or change `quantity`"));
      return Optional.empty();
    }
    return entry.map(e -> new FluxStatement.Field(e.field()));
  }

  private Optional<FluxStatement> metered(
      YamlValue value, MapReader map, String patch, Optional<Dimension> rate) {
    if (value.asMap().isPresent()) {
      values.section(value, Section.METERED);
      correlations.refused(patch);
      return Optional.empty();
    }
    boolean fixed = map.get("fixed").flatMap(v -> values.flag(v, "`fixed`")).orElse(false);
    Need need = new Need("`metered`", Map.of(), rate, rate.flatMap(r -> rates.unit()));
    Optional<Formula> figure = measured.measured(value, patch + " metered", need);
    if (figure.isEmpty()) {
      correlations.refused(patch);
    }
    if (figure.isPresent() && Figures.isBareName(figure.get().expression())) {
      String input = Figures.name(figure.get().expression());
      noteExact(patch, value, input);
      correlations.meters(patch, input);
    }
    if (map.has("correlated-with")) {
      map.get("correlated-with").ifPresent(v -> correlations.state(patch, v));
    }
    return figure.map(f -> new FluxStatement.Metered(f.expression(), fixed));
  }

  private void noteExact(String patch, YamlValue value, String input) {
    boolean inline =
        formulas.scope().inputs().containsKey(input)
            && formulas.scope().inputs().get(input).inline();
    boolean stated =
        value.asText().filter(t -> MeasuredReader.hasUncertainty(t.text())).isPresent();
    if (inline && !stated) {
      formulas
          .scope()
          .note(
              "The metered figure of `"
                  + patch
                  + "`, "
                  + value.asText().map(t -> t.text().strip()).orElse("")
                  + ", states no uncertainty and is taken as exact.");
    }
  }

  private Optional<Interval> within(YamlValue value) {
    Optional<List<YamlValue>> ends =
        values.items(value, 2, "`within`", "of two bounds, [LOW, HIGH]");
    if (ends.isEmpty()) {
      return Optional.empty();
    }
    Need need = new Need("a bound of `within`", Map.of(), rates.dimension(), Optional.empty());
    OptionalDouble low = formulas.number(ends.get().get(0), need);
    OptionalDouble high = formulas.number(ends.get().get(1), need);
    if (low.isEmpty() || high.isEmpty()) {
      return Optional.empty();
    }
    if (low.getAsDouble() > high.getAsDouble()) {
      problems.add(ProblemKind.WRONG_VALUE, value.place(), "`within` states the lower bound first");
      return Optional.empty();
    }
    return Optional.of(new Interval(low.getAsDouble(), high.getAsDouble()));
  }
}
