package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.model.InteriorTerm;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;

/** Reads what a volume makes and keeps. */
final class InteriorReader {
  private static final List<String> TERMS = List.copyOf(Section.INTERIOR.keys());

  private final ValueReader values;
  private final FieldReader fields;
  private final MeasuredReader measured;
  private final DensityReader densities;
  private final Rates rates;

  InteriorReader(FormulaReader formulas, FieldReader fields, MeasuredReader measured, Rates rates) {
    this.values = formulas.values();
    this.fields = fields;
    this.measured = measured;
    this.densities = new DensityReader(formulas);
    this.rates = rates;
  }

  List<InteriorTerm> read(YamlValue value, String volume) {
    List<InteriorTerm> terms = new ArrayList<>();
    int stated = 0;
    Optional<Place> divergence = Optional.empty();
    for (YamlValue item : ValueReader.oneOrMore(value)) {
      Optional<MapReader> section = values.section(item, Section.INTERIOR);
      if (section.isEmpty()) {
        continue;
      }
      MapReader map = section.get();
      List<String> present = map.present(TERMS);
      stated += present.size();
      if (present.contains("divergence-of")) {
        divergence = Optional.of(map.placeOfKey("divergence-of"));
      }
      if (present.isEmpty() && !map.faulty()) {
        values
            .problems()
            .add(
                ProblemKind.MISSING_KEY,
                item.place(),
                "`interior` is one of " + String.join(", ", TERMS) + "; here is none");
      }
      present.forEach(key -> term(map, key, volume).ifPresent(terms::add));
    }
    if (divergence.isPresent() && stated > 1) {
      values
          .problems()
          .add(
              ProblemKind.WRONG_VALUE,
              divergence.get(),
              "`divergence-of` stands alone in its volume: it is the whole interior");
    }
    return terms;
  }

  private Optional<InteriorTerm> term(MapReader map, String key, String volume) {
    Optional<YamlValue> value = map.get(key);
    if (value.isEmpty()) {
      return Optional.empty();
    }
    Place place = map.placeOfKey(key);
    boolean generation = key.equals("generation");
    if (key.equals("divergence-of")) {
      return fields.reference(value.get()).flatMap(entry -> divergence(entry, value.get(), place));
    }
    if (value.get().asMap().isPresent()) {
      return values
          .section(value.get(), Section.PER_VOLUME)
          .flatMap(m -> perVolume(m, generation))
          .map(
              density ->
                  generation
                      ? new InteriorTerm.GenerationPerVolume(density, place)
                      : new InteriorTerm.AccumulationPerVolume(density, place));
    }
    return measured
        .measured(value.get(), volume + " " + key, rates.need("`" + key + "`").in(Need.TIME))
        .map(Formula::expression)
        .map(
            rate ->
                generation
                    ? new InteriorTerm.Generation(rate, place)
                    : new InteriorTerm.Accumulation(rate, place));
  }

  private Optional<InteriorTerm> divergence(FieldEntry entry, YamlValue value, Place place) {
    if (entry.dimension().isPresent()
        && rates.perArea().isPresent()
        && !entry.dimension().equals(rates.perArea())) {
      values
          .problems()
          .add(
              ProblemKind.DIMENSION,
              value.place(),
              "the field `"
                  + entry.field().name()
                  + "` is in "
                  + entry.dimension().get()
                  + "; a flux density of the quantity `"
                  + rates.name()
                  + "` is in "
                  + rates.perArea().get());
      return Optional.empty();
    }
    return Optional.of(new InteriorTerm.DivergenceOf(entry.field(), place));
  }

  private Optional<Expression> perVolume(MapReader map, boolean generation) {
    if (!map.has("per-volume")) {
      if (!map.faulty()) {
        map.require("per-volume");
      }
      return Optional.empty();
    }
    return densities
        .density(
            map,
            "per-volume",
            generation ? rates.perVolume() : rates.contentPerVolume(),
            generation
                ? "a source of the quantity `" + rates.name() + "` per volume"
                : "a content of the quantity `" + rates.name() + "` per volume")
        .map(Formula::expression);
  }
}
