package org.hullsum.audit;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.problem.Finding;
import org.hullsum.problem.Problem;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.Severity;

/**
 * The result of one case. A case that could not be read has problems and nothing else.
 *
 * @param file the case file as the user named it
 * @param title empty where none is stated
 * @param about free text of the case
 * @param lengthUnit the unit of lengths in this result: {@code m}, or {@code 1}
 * @param problems of the files, warnings included
 * @param notes sentences that the report owes the reader
 * @param balances of volumes, then of envelopes; each instant, then the interval
 * @param patches in the order of the case
 * @param surfaces one for each volume
 * @param findings in the order of the case
 * @param explanations in their ranking
 * @param fitByChance the number of hypotheses that would fit by chance, empty where nothing was
 *     explained
 * @param correctedCoverage the coverage per balance that keeps the stated one over all balances,
 *     empty for a single balance
 */
public record CaseResult(
    String file,
    Optional<String> title,
    Optional<String> about,
    String lengthUnit,
    List<Problem> problems,
    List<String> notes,
    List<BalanceResult> balances,
    List<PatchResult> patches,
    List<SurfaceResult> surfaces,
    List<Finding> findings,
    List<Explanation> explanations,
    Optional<Double> fitByChance,
    Optional<Double> correctedCoverage) {
  public CaseResult {
    Objects.requireNonNull(file, "file");
    Objects.requireNonNull(title, "title");
    Objects.requireNonNull(about, "about");
    Objects.requireNonNull(lengthUnit, "lengthUnit");
    Objects.requireNonNull(fitByChance, "fitByChance");
    Objects.requireNonNull(correctedCoverage, "correctedCoverage");
    problems = List.copyOf(problems);
    notes = List.copyOf(notes);
    balances = List.copyOf(balances);
    patches = List.copyOf(patches);
    surfaces = List.copyOf(surfaces);
    findings = List.copyOf(findings);
    explanations = List.copyOf(explanations);
  }

  /** The result of a case that could not be read. */
  public static CaseResult unreadable(String file, List<Problem> problems) {
    return new CaseResult(
        file,
        Optional.empty(),
        Optional.empty(),
        "m",
        problems,
        List.of(),
        List.of(),
        List.of(),
        List.of(),
        List.of(),
        List.of(),
        Optional.empty(),
        Optional.empty());
  }

  /** Whether the files were wrong, so that nothing was audited. */
  public boolean isUnreadable() {
    return problems.stream().map(Problem::kind).anyMatch(ProblemKind::fatal);
  }

  /** The gravest verdict of the balances; empty where there is none. */
  public Optional<Verdict> verdict() {
    return balances.stream().map(BalanceResult::verdict).reduce(Verdict::and);
  }

  /** Whether a finding that is not waived is an error. */
  public boolean hasError() {
    return findings.stream().anyMatch(f -> f.severity() == Severity.ERROR && f.waived().isEmpty());
  }
}
