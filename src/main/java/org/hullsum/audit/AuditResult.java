package org.hullsum.audit;

import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.TreeMap;
import org.hullsum.model.Case;

/**
 * The result of one run over one or more cases.
 *
 * @param cases in the order of the command line
 * @param provenance what computed it from what
 */
public record AuditResult(List<CaseResult> cases, Provenance provenance) {
  /**
   * What computed a result from what.
   *
   * @param program name and version
   * @param evaluator how formulas were evaluated
   * @param at the instant, ISO 8601 in UTC: the only part of a result that differs between runs
   * @param settings parameters that were given another value on the command line, with its text
   * @param inputs every file read
   */
  public record Provenance(
      String program,
      String evaluator,
      String at,
      Map<String, String> settings,
      List<Case.SourceFile> inputs) {
    public Provenance {
      Objects.requireNonNull(program, "program");
      Objects.requireNonNull(evaluator, "evaluator");
      Objects.requireNonNull(at, "at");
      settings = Collections.unmodifiableMap(new TreeMap<>(settings));
      inputs = List.copyOf(inputs);
    }
  }

  public AuditResult {
    cases = List.copyOf(cases);
    Objects.requireNonNull(provenance, "provenance");
  }

  /** The gravest verdict of all cases; empty where no case has one. */
  public Optional<Verdict> verdict() {
    return cases.stream().flatMap(c -> c.verdict().stream()).reduce(Verdict::and);
  }
}
