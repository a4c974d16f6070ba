package org.hullsum.casefile;

import java.util.Optional;
import org.hullsum.problem.Place;

/** A value of a YAML file that knows its place: a text, a list or a mapping. */
sealed interface YamlValue permits YamlText, YamlList, YamlMap {
  Place place();

  /** What it is, for messages: {@code the text `12 m`}, {@code a list}, {@code a mapping}. */
  String described();

  default Optional<YamlText> asText() {
    return Optional.empty();
  }

  default Optional<YamlList> asList() {
    return Optional.empty();
  }

  default Optional<YamlMap> asMap() {
    return Optional.empty();
  }
}
