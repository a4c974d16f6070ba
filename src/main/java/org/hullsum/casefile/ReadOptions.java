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
 * @param threads that may be used, at least 1; what is read does not depend on it
 */
public record ReadOptions(
    String name, Map<String, String> parameters, List<Path> allowedOutside, int threads) {
  public ReadOptions {
    Objects.requireNonNull(name, "name");
    parameters = Collections.unmodifiableMap(new LinkedHashMap<>(parameters));
    allowedOutside = List.copyOf(allowedOutside);
    if (threads < 1) {
      throw new IllegalArgumentException(threads + " threads");
    }
  }

  public static ReadOptions named(String name) {
    return new ReadOptions(name, Map.of(), List.of(), 1);
  }
}
