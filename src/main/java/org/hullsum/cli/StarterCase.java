package org.hullsum.cli;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/** The small, complete cases that {@code hullsum start} prints, and the mesh that one needs. */
enum StarterCase {
  /** A volume whose fluxes come from a formula. */
  FIELD("field", ".yaml"),
  /** A volume whose fluxes are metered. */
  METERED("metered", ".yaml"),
  /** A volume whose surface is a mesh. */
  MESH("mesh", ".yaml"),
  /** That mesh. */
  MESH_FILE("mesh-file", ".obj");

  private static final Set<String> NOT_YET = Set.of("network");

  private final String word;
  private final String ending;

  StarterCase(String word, String ending) {
    this.word = word;
    this.ending = ending;
  }

  /** What it is called on the command line. */
  String word() {
    return word;
  }

  static Optional<StarterCase> of(String kind) {
    return Arrays.stream(values()).filter(s -> s.word.equals(kind)).findFirst();
  }

  /** The kinds that there are, in words. */
  static String kinds() {
    return Arrays.stream(values()).map(StarterCase::word).collect(Collectors.joining(", "))
        + " or "
        + TraverseSheet.KIND;
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

  /** The file. */
  String text() {
    try (InputStream in = StarterCase.class.getResourceAsStream("start-" + word + ending)) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
