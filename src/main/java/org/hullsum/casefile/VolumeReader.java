package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.model.Envelope;
import org.hullsum.model.InteriorTerm;
import org.hullsum.model.Tolerances;
import org.hullsum.model.Volume;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;

/** Reads the volumes and the envelopes around them. */
final class VolumeReader {
  /** The name of the only volume of a case that states none. */
  static final String ONLY = "volume";

  private final ValueReader values;
  private final ProblemAccumulator problems;
  private final Map<String, YamlMap.Entry> stated = new LinkedHashMap<>();
  private final Set<String> envelopeNames = new LinkedHashSet<>();
  private boolean implicit;
  private boolean none;

  VolumeReader(ValueReader values) {
    this.values = values;
    this.problems = values.problems();
  }

  /** Takes note of the names, before anything that refers to them is read. */
  void declare(Optional<YamlValue> volumes) {
    if (volumes.isEmpty()) {
      implicit = true;
      return;
    }
    if (volumes.get().asText().filter(t -> t.text().equals("none")).isPresent()) {
      none = true;
      return;
    }
    Optional<YamlMap> map =
        values.map(volumes.get(), "`volumes`", "from names to volumes, or `none`");
    implicit = map.isEmpty();
    map.ifPresent(m -> m.entries().forEach(this::declare));
    if (map.isPresent() && stated.isEmpty()) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          volumes.get().place(),
          "`volumes` names one volume or more; leave it out for a single one called `volume`, or"
              + " write `volumes: none`");
      implicit = true;
    }
  }

  private void declare(YamlMap.Entry entry) {
    checkName(entry.key(), "a volume");
    stated.put(entry.name(), entry);
  }

  private void checkName(YamlText key, String what) {
    Optional<String> fault =
        key.text().equals(Volume.SURROUNDINGS)
            ? Optional.of("`surroundings` is the outside of every volume")
            : NameRules.faultOfObject(key.text());
    fault.ifPresent(
        f ->
            problems.add(
                ProblemKind.BAD_NAME,
                key.place(),
                what + " can't be called " + key.shown() + ": " + f));
  }

  /** The names of the volumes, without the surroundings. */
  List<String> names() {
    return implicit ? List.of(ONLY) : List.copyOf(stated.keySet());
  }

  /** Whether the case says that its patches bound nothing. */
  boolean none() {
    return none;
  }

  Set<String> envelopeNames() {
    return envelopeNames;
  }

  List<Volume> read(InteriorReader interiors, TolerancesReader tolerances, Place elsewhere) {
    if (implicit) {
      Tolerances usual = tolerances.read(Optional.empty());
      return List.of(new Volume(ONLY, Optional.empty(), List.of(), usual, elsewhere));
    }
    List<Volume> volumes = new ArrayList<>();
    for (YamlMap.Entry entry : stated.values()) {
      volumes.add(volume(entry, interiors, tolerances));
    }
    return volumes;
  }

  private Volume volume(
      YamlMap.Entry entry, InteriorReader interiors, TolerancesReader tolerances) {
    boolean empty = entry.value().asText().filter(YamlText::missing).isPresent();
    Optional<MapReader> map =
        empty ? Optional.empty() : values.section(entry.value(), Section.VOLUME);
    List<InteriorTerm> interior =
        map.flatMap(m -> m.get("interior"))
            .map(v -> interiors.read(v, entry.name()))
            .orElse(List.of());
    return new Volume(
        entry.name(),
        map.flatMap(m -> m.get("label")).flatMap(v -> values.freeText(v, "`label`")),
        interior,
        tolerances.read(map.flatMap(m -> m.get("tolerances"))),
        entry.key().place());
  }

  List<Envelope> envelopes(YamlValue value, TolerancesReader tolerances) {
    Optional<YamlMap> map = values.map(value, "`envelopes`", "from names to lists of volumes");
    List<Envelope> envelopes = new ArrayList<>();
    map.ifPresent(m -> m.entries().forEach(e -> envelopes.add(envelope(e, tolerances))));
    return envelopes;
  }

  private Envelope envelope(YamlMap.Entry entry, TolerancesReader tolerances) {
    checkName(entry.key(), "an envelope");
    if (names().contains(entry.name())) {
      problems.add(
          ProblemKind.BAD_NAME,
          entry.key().place(),
          "an envelope can't be called " + entry.key().shown() + ": a volume is called so");
    }
    envelopeNames.add(entry.name());
    Optional<MapReader> map =
        entry.value().asMap().isPresent()
            ? values.section(entry.value(), Section.ENVELOPE)
            : Optional.empty();
    Optional<YamlValue> members =
        map.isPresent() ? map.get().require("of") : Optional.of(entry.value());
    return new Envelope(
        entry.name(),
        map.flatMap(m -> m.get("label")).flatMap(v -> values.freeText(v, "`label`")),
        members.map(this::members).orElse(List.of()),
        tolerances.read(map.flatMap(m -> m.get("tolerances"))),
        entry.key().place());
  }

  private List<String> members(YamlValue value) {
    Optional<YamlList> list = values.list(value, "an envelope", "of names of volumes");
    Set<String> members = new LinkedHashSet<>();
    for (YamlValue item : list.map(YamlList::items).orElse(List.of())) {
      Optional<YamlText> name = values.text(item, "a volume of an envelope");
      if (name.isEmpty()) {
        continue;
      }
      if (!names().contains(name.get().text())) {
        problems.add(
            ProblemKind.UNKNOWN_NAME,
            item.place(),
            "there is no volume " + name.get().shown() + Nearest.hint(name.get().text(), names()));
      } else if (!members.add(name.get().text())) {
        problems.add(
            ProblemKind.WRONG_VALUE,
            item.place(),
            "the volume " + name.get().shown() + " stands twice in this envelope");
      }
    }
    if (list.isPresent() && list.get().items().isEmpty()) {
      problems.add(ProblemKind.WRONG_VALUE, value.place(), "an envelope holds one volume or more");
    }
    return List.copyOf(members);
  }
}
