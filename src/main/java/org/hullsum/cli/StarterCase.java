package org.hullsum.cli;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/** The small, complete cases that {@code hullsum start} prints. */
enum StarterCase {
  /** A volume whose fluxes come from a formula. */
  FIELD,
  /** A volume whose fluxes are metered. */
  METERED;

  private static final Set<String> NOT_YET = Set.of("network", "mesh", "traverse");

  private String word() {
    return name().toLowerCase(Locale.ROOT);
  }

  static Optional<StarterCase> of(String kind) {
    return Arrays.stream(values()).filter(s -> s.word().equals(kind)).findFirst();
  }

  /** The kinds that there are, in words. */
  static String kinds() {
    return Arrays.stream(values()).map(StarterCase::word).collect(Collectors.joining(" or "));
  }

  /** Why there is no case of that kind. */
  static String refusal(String kind) {
    return "there is no case of the kind '"
        + kind
        + "'"
        + (NOT_YET.contains(kind) ? " yet, it is not supported" : "")
        + "; take "
        + kinds();
  }

  /** The case file. */
  String text() {
    try (InputStream in = StarterCase.class.getResourceAsStream("start-" + word() + ".yaml")) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
