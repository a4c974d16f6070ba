package org.hullsum.casefile;

import java.util.List;
import java.util.Optional;
import org.hullsum.problem.Place;

/** A mapping whose keys are texts, each once, in the order of the file. */
record YamlMap(List<Entry> entries, Place place) implements YamlValue {
  /** A key with its value. */
  record Entry(YamlText key, YamlValue value) {
    String name() {
      return key.text();
    }
  }

  YamlMap {
    entries = List.copyOf(entries);
  }

  Optional<Entry> entry(String key) {
    return entries.stream().filter(e -> e.name().equals(key)).findFirst();
  }

  @Override
  public String described() {
    return "a mapping";
  }

  @Override
  public Optional<YamlMap> asMap() {
    return Optional.of(this);
  }
}
