package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.model.Claim;
import org.hullsum.model.Facing;
import org.hullsum.model.Patch;
import org.hullsum.model.StatedFlux;
import org.hullsum.model.Volume;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;

/** Reads the patches. */
final class PatchReader {
  private final ValueReader values;
  private final ProblemAccumulator problems;
  private final SurfaceReader surfaces;
  private final FacingReader facings;
  private final FieldReader fields;
  private final MeasuredReader measured;
  private final FluxReader fluxes;
  private final VolumeReader volumes;
  private final Rates rates;
  private final Map<String, YamlMap.Entry> stated = new LinkedHashMap<>();

  PatchReader(
      FormulaReader formulas,
      DataFiles files,
      FieldReader fields,
      MeasuredReader measured,
      FluxReader fluxes,
      VolumeReader volumes,
      Rates rates) {
    this.values = formulas.values();
    this.problems = values.problems();
    this.surfaces = new SurfaceReader(formulas, files);
    this.facings = new FacingReader(formulas);
    this.fields = fields;
    this.measured = measured;
    this.fluxes = fluxes;
    this.volumes = volumes;
    this.rates = rates;
  }

  /** The patches that could be read; all names are known afterwards. */
  List<Patch> readAll(YamlValue value) {
    Optional<YamlMap> map = values.map(value, "`patches`", "from names to patches");
    if (map.isPresent() && map.get().entries().isEmpty()) {
      problems.add(
          ProblemKind.MISSING_KEY,
          value.place(),
          "`patches` names one patch or more; here is none");
    }
    map.ifPresent(m -> m.entries().forEach(this::declare));
    List<Patch> patches = new ArrayList<>();
    stated.values().forEach(entry -> patch(entry).ifPresent(patches::add));
    return patches;
  }

  Set<String> names() {
    return stated.keySet();
  }

  private void declare(YamlMap.Entry entry) {
    Optional<String> fault = NameRules.faultOfObject(entry.name());
    fault.ifPresent(
        f ->
            problems.add(
                ProblemKind.BAD_NAME,
                entry.key().place(),
                "a patch can't be called " + entry.key().shown() + ": " + f));
    stated.put(entry.name(), entry);
  }

  private Optional<Patch> patch(YamlMap.Entry entry) {
    Optional<MapReader> section = values.section(entry.value(), Section.PATCH);
    if (section.isEmpty()) {
      return Optional.empty();
    }
    MapReader map = section.get();
    Place place = entry.key().place();
    Optional<Sides> sides = sides(map, place);
    Optional<SurfaceEntry> surface = map.get("surface").flatMap(surfaces::read);
    Optional<Facing> facing = map.get("facing").flatMap(facings::read);
    if (map.has("facing") && !map.has("surface")) {
      problems.add(
          ProblemKind.SUSPICIOUS,
          map.placeOf("facing"),
          "`facing` has no effect: the patch has no surface");
    }
    List<StatedFlux> flux =
        map.require("flux")
            .map(v -> fluxes.read(v, entry.name(), map.has("surface"), surface))
            .orElse(List.of());
    List<Claim> claims = map.get("claim").map(v -> claims(v, entry.name())).orElse(List.of());
    return sides.map(
        s ->
            new Patch(
                entry.name(),
                map.get("label").flatMap(v -> values.freeText(v, "`label`")),
                map.get("about").flatMap(v -> values.freeText(v, "`about`")),
                s.leaves(),
                s.enters(),
                surface.flatMap(SurfaceEntry::patchSurface),
                facing.orElse(new Facing.AsDrawn()),
                flux,
                claims,
                place,
                map.has("facing") ? map.placeOf("facing") : place));
  }

  /** The volumes behind and ahead of the normal. */
  private record Sides(String leaves, String enters) {}

  private Optional<Sides> sides(MapReader map, Place place) {
    Optional<String> leaves = map.get("leaves").flatMap(v -> volume(v, "`leaves`"));
    Optional<String> enters = map.get("enters").flatMap(v -> volume(v, "`enters`"));
    boolean refused =
        map.has("leaves") && leaves.isEmpty() || map.has("enters") && enters.isEmpty();
    if (refused) {
      return Optional.empty();
    }
    List<String> names = volumes.names();
    if (volumes.none()) {
      return Optional.of(new Sides(Volume.SURROUNDINGS, Volume.SURROUNDINGS));
    }
    if (leaves.isEmpty() && enters.isEmpty()) {
      if (names.size() == 1) {
        return Optional.of(new Sides(names.get(0), Volume.SURROUNDINGS));
      }
      if (!map.faulty()) {
        problems.add(
            ProblemKind.MISSING_KEY,
            place,
            "with several volumes a patch needs `leaves` or `enters`: " + String.join(", ", names));
      }
      return Optional.empty();
    }
    Sides sides = new Sides(leaves.orElse(Volume.SURROUNDINGS), enters.orElse(Volume.SURROUNDINGS));
    if (sides.leaves().equals(Volume.SURROUNDINGS) && sides.enters().equals(Volume.SURROUNDINGS)) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          leaves.isPresent() ? map.placeOf("leaves") : map.placeOf("enters"),
          "the patch leaves and enters the surroundings; name the volume on its other side ("
              + String.join(", ", names)
              + ")");
      return Optional.empty();
    }
    return Optional.of(sides);
  }

  private Optional<String> volume(YamlValue value, String what) {
    Optional<YamlText> name = values.text(value, what);
    if (name.isEmpty()) {
      return Optional.empty();
    }
    List<String> known = new ArrayList<>(volumes.names());
    known.add(Volume.SURROUNDINGS);
    if (!known.contains(name.get().text())) {
      problems.add(
          ProblemKind.UNKNOWN_NAME,
          value.place(),
          "there is no volume "
              + name.get().shown()
              + Nearest.hint(name.get().text(), known)
              + YamlTraps.hint(name.get()));
      return Optional.empty();
    }
    return name.map(YamlText::text);
  }

  private List<Claim> claims(YamlValue value, String patch) {
    List<Claim> claims = new ArrayList<>();
    for (YamlValue item : ValueReader.oneOrMore(value)) {
      if (item.asMap().isPresent()) {
        values
            .section(item, Section.CLAIM)
            .filter(map -> !map.faulty())
            .flatMap(map -> map.require("field"))
            .flatMap(fields::reference)
            .map(f -> new Claim(Optional.empty(), Optional.of(f.field()), item.place()))
            .ifPresent(claims::add);
      } else {
        measured
            .measured(item, patch + " claim", rates.need("`claim`"))
            .map(f -> new Claim(Optional.of(f.expression()), Optional.empty(), item.place()))
            .ifPresent(claims::add);
      }
    }
    return claims;
  }
}
