package org.hullsum.casefile;

import java.util.List;
import java.util.Optional;
import org.hullsum.problem.Place;

/** A list. */
record YamlList(List<YamlValue> items, Place place) implements YamlValue {
  YamlList {
    items = List.copyOf(items);
  }

  @Override
  public String described() {
    return items.size() == 1 ? "a list of one item" : "a list of " + items.size() + " items";
  }

  @Override
  public Optional<YamlList> asList() {
    return Optional.of(this);
  }
}
