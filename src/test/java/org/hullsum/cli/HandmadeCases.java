package org.hullsum.cli;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.audit.BalanceResult;
import org.hullsum.audit.CaseResult;
import org.hullsum.audit.Verdict;
import org.hullsum.model.Case;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Place;
import org.hullsum.problem.Problem;
import org.hullsum.problem.ProblemKind;

/** A pipeline whose result is the name of the case, so that the command line is tested alone. */
final class HandmadeCases {
  private HandmadeCases() {}

  static CasePipeline.Outcome run(String file, CasePipeline.Settings settings) {
    CaseResult result =
        switch (file) {
          case "balanced.yaml" -> result(file, Verdict.BALANCED, List.of(), List.of());
          case "imbalanced.yaml" -> result(file, Verdict.IMBALANCED, List.of(), List.of());
          case "undecided.yaml" -> result(file, Verdict.UNDECIDED, List.of(), List.of());
          case "error.yaml" -> result(file, Verdict.BALANCED, List.of(finding()), List.of());
          case "waived.yaml" ->
              result(
                  file,
                  Verdict.BALANCED,
                  List.of(finding().waivedBecause("commissioning")),
                  List.of());
          case "warned.yaml" ->
              result(
                  file,
                  Verdict.BALANCED,
                  List.of(),
                  List.of(problem(ProblemKind.SUSPICIOUS, file, "a \u001B[31mtrap")));
          case "bad.yaml" ->
              CaseResult.unreadable(
                  file,
                  List.of(
                      problem(ProblemKind.UNKNOWN_KEY, file, "unknown key 'raduis'"),
                      problem(ProblemKind.EXPRESSION, file, "no operand\n  3 * \n      ^")));
          case "overflow.yaml" -> throw new StackOverflowError();
          case "memory.yaml" -> throw new OutOfMemoryError("heap");
          case "fault.yaml" -> throw new IllegalStateException("rule\nbroken");
          default -> throw new IllegalArgumentException(file);
        };
    return new CasePipeline.Outcome(result, List.of(new Case.SourceFile(file, "00" + file)));
  }

  private static Finding finding() {
    return Finding.of(
        FindingCode.FIELD_SINGULAR, "1/r on the axis", "flow", Optional.empty(), Map.of());
  }

  private static Problem problem(ProblemKind kind, String file, String message) {
    return new Problem(kind, new Place(file, 4, 3), message);
  }

  private static CaseResult result(
      String file, Verdict verdict, List<Finding> findings, List<Problem> problems) {
    double residual = verdict == Verdict.IMBALANCED ? 1.75 : 0;
    BalanceResult balance =
        new BalanceResult(
            "tank",
            Optional.empty(),
            false,
            "volume",
            "m3/s",
            Optional.empty(),
            Optional.empty(),
            BalanceResult.Check.CONSERVATION,
            List.of(),
            Optional.of(residual),
            Optional.of(0.0),
            Optional.of(residual),
            List.of(),
            1,
            BalanceResult.Rule.TOLERANCE,
            Optional.of(0.1),
            Optional.of(0.0),
            0,
            1.96,
            Optional.empty(),
            Optional.empty(),
            List.of(),
            Optional.empty(),
            Optional.empty(),
            verdict,
            "By hand.");
    return new CaseResult(
        file,
        Optional.empty(),
        Optional.empty(),
        "m",
        problems,
        List.of(),
        List.of(balance),
        List.of(),
        List.of(),
        findings,
        List.of(),
        Optional.empty(),
        Optional.empty());
  }
}
