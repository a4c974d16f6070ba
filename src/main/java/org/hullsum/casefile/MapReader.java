package org.hullsum.casefile;

import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;

/**
 * Gives the values of one mapping by key. Every key is checked at once: an unknown one is reported
 * with the nearest known key or the place where it belongs, one of the format that is not carried
 * out yet as such, and one without a value as missing.
 */
final class MapReader {
  private final YamlMap map;
  private final Section section;
  private final Set<String> keys;
  private final ProblemAccumulator problems;
  private final Set<String> excused = new HashSet<>();
  private boolean faulty;

  private MapReader(YamlMap map, Section section, ProblemAccumulator problems) {
    this.map = map;
    this.section = section;
    this.keys = section.keys();
    this.problems = problems;
  }

  /** A reader whose keys have been checked. */
  static MapReader of(YamlMap map, Section section, ProblemAccumulator problems) {
    MapReader reader = new MapReader(map, section, problems);
    map.entries().forEach(reader::check);
    return reader;
  }

  private void check(YamlMap.Entry entry) {
    String key = entry.name();
    if (keys.contains(key)) {
      return;
    }
    faulty = true;
    if (section.notYet().contains(key)) {
      problems.add(
          ProblemKind.NOT_SUPPORTED,
          entry.key().place(),
          "`" + key + "` in " + section.title() + " is not supported yet" + section.wayRound(key));
      return;
    }
    problems.add(
        ProblemKind.UNKNOWN_KEY,
        entry.key().place(),
        "unknown key " + entry.key().shown() + " in " + section.title() + advice(entry.key()));
  }

  private String advice(YamlText key) {
    String trap = YamlTraps.hint(key);
    if (!trap.isEmpty()) {
      excused.addAll(keys);
      return trap;
    }
    Optional<String> near = Nearest.to(key.text(), keys);
    if (near.isPresent()) {
      excused.add(near.get());
      return "; did you mean `" + near.get() + "`?";
    }
    Optional<Section> owner = Section.owning(key.text());
    if (owner.isPresent()) {
      return "; it belongs in " + owner.get().title() + ". Known here: " + known();
    }
    return keys.isEmpty() ? "" : "; known here: " + known();
  }

  private String known() {
    return keys.stream().collect(Collectors.joining(", "));
  }

  Place place() {
    return map.entries().isEmpty() ? map.place() : map.entries().get(0).key().place();
  }

  /** The place of a key's value, or of the mapping where the key is absent. */
  Place placeOf(String key) {
    return map.entry(key).map(e -> e.value().place()).orElse(place());
  }

  Place placeOfKey(String key) {
    return map.entry(key).map(e -> e.key().place()).orElse(place());
  }

  boolean has(String key) {
    return map.entry(key).isPresent();
  }

  /** Whether a key was refused, so that what is missing may have been meant by it. */
  boolean faulty() {
    return faulty;
  }

  /** Those of the given keys that are present, in the order given. */
  List<String> present(List<String> keys) {
    return keys.stream().filter(this::has).toList();
  }

  /** Whether a key stands without a value, or with {@code true}. */
  boolean isBare(String key) {
    return map.entry(key)
        .flatMap(e -> e.value().asText())
        .filter(t -> t.missing() || t.text().equals("true"))
        .isPresent();
  }

  /** The value of an optional key; a key without a value is reported. */
  Optional<YamlValue> get(String key) {
    Optional<YamlMap.Entry> entry = map.entry(key);
    if (entry.isPresent() && entry.get().value().asText().filter(YamlText::missing).isPresent()) {
      problems.add(
          ProblemKind.MISSING_KEY,
          entry.get().key().place(),
          "the key `" + key + "` has no value" + YamlTraps.hint(entry.get().key()));
      return Optional.empty();
    }
    return entry.map(YamlMap.Entry::value);
  }

  /** The value of a required key; its absence is reported unless a misspelling explains it. */
  Optional<YamlValue> require(String key) {
    if (!has(key) && !excused.contains(key)) {
      problems.add(
          ProblemKind.MISSING_KEY, place(), section.title() + " needs the key `" + key + "`");
    }
    return get(key);
  }
}
