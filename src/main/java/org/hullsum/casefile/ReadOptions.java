package org.hullsum.casefile;

import java.nio.file.Path;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/**
 * How a case file is read.
 *
 * @param name the file as the user typed it, for messages
 * @param parameters texts that stand in the place of the values of parameters, by name
 * @param allowedOutside folders outside the case's own from which data files may be read
 */
public record ReadOptions(String name, Map<String, String> parameters, List<Path> allowedOutside) {
  public ReadOptions {
    Objects.requireNonNull(name, "name");
    parameters = Collections.unmodifiableMap(new LinkedHashMap<>(parameters));
    allowedOutside = List.copyOf(allowedOutside);
  }

  public static ReadOptions named(String name) {
    return new ReadOptions(name, Map.of(), List.of());
  }
}
