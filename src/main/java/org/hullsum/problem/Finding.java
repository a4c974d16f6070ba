package org.hullsum.problem;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;

/**
 * One thing wrong with what a case describes, with its place and its evidence.
 *
 * @param code the kind, with a stable code
 * @param severity its weight here
 * @param message one or two lines
 * @param on the patch, volume, field or name concerned
 * @param place where the case file speaks of it
 * @param waived the reason for which it does not count, where it was waived
 * @param evidence named figures and texts: {@code Double}, {@code double[]}, {@code Integer},
 *     {@code Boolean}, {@code String} or a list of these, in the order to print
 */
public record Finding(
    FindingCode code,
    Severity severity,
    String message,
    Optional<String> on,
    Optional<Place> place,
    Optional<String> waived,
    Map<String, Object> evidence) {
  public Finding {
    Objects.requireNonNull(code, "code");
    Objects.requireNonNull(severity, "severity");
    Objects.requireNonNull(message, "message");
    Objects.requireNonNull(on, "on");
    Objects.requireNonNull(place, "place");
    Objects.requireNonNull(waived, "waived");
    evidence = Collections.unmodifiableMap(new LinkedHashMap<>(evidence));
  }

  /** A finding of its code's own severity, not waived. */
  public static Finding of(
      FindingCode code,
      String message,
      String on,
      Optional<Place> place,
      Map<String, Object> evidence) {
    return new Finding(
        code, code.severity(), message, Optional.of(on), place, Optional.empty(), evidence);
  }

  /** The same, waived for the given reason. */
  public Finding waivedBecause(String reason) {
    return new Finding(code, severity, message, on, place, Optional.of(reason), evidence);
  }

  /** The same at another severity. */
  public Finding weighing(Severity other) {
    return new Finding(code, other, message, on, place, waived, evidence);
  }
}
