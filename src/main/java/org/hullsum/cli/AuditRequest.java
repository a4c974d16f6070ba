package org.hullsum.cli;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.audit.AuditOptions;

/**
 * What {@code hullsum audit} was asked to do.
 *
 * @param cases the case files as named, at least one
 * @param json where the result document goes; {@link #STANDARD_OUTPUT} is standard output
 * @param junit where the JUnit XML goes, likewise
 * @param parameters values that replace those of the cases, by name
 * @param allowedFolders folders outside the cases' own from which data may be read
 * @param threads at least 1
 * @param digits requested accuracy
 * @param progress whether a progress line may be shown
 * @param quiet one line per balance instead of the report
 * @param secondOpinion whether winding numbers are asked of every facing
 */
record AuditRequest(
    List<String> cases,
    Optional<String> json,
    Optional<String> junit,
    Map<String, String> parameters,
    List<Path> allowedFolders,
    int threads,
    int digits,
    boolean progress,
    boolean quiet,
    boolean secondOpinion) {
  static final String STANDARD_OUTPUT = "-";

  AuditRequest {
    cases = List.copyOf(cases);
    parameters = Map.copyOf(parameters);
    allowedFolders = List.copyOf(allowedFolders);
  }

  /** What is asked where nothing but the cases is named. */
  static AuditRequest usual(List<String> cases) {
    return new AuditRequest(
        cases,
        Optional.empty(),
        Optional.empty(),
        Map.of(),
        List.of(),
        Runtime.getRuntime().availableProcessors(),
        AuditOptions.USUAL_DIGITS,
        true,
        false,
        false);
  }

  /** Whether a document takes standard output, so that no text is printed there. */
  boolean documentOnStandardOutput() {
    return json.filter(STANDARD_OUTPUT::equals).isPresent()
        || junit.filter(STANDARD_OUTPUT::equals).isPresent();
  }
}
