package org.hullsum.report;

import java.util.ArrayList;
import java.util.List;
import org.hullsum.audit.BalanceResult;
import org.hullsum.audit.CaseResult;
import org.hullsum.audit.Explanation;
import org.hullsum.audit.Verdict;

/** The ranking of explanations, with the number that would fit by chance before it. */
final class ExplanationText {
  /** Fewer hypotheses than this that fit by chance are not worth a line. */
  private static final double NOTED = 0.01;

  private ExplanationText() {}

  static void write(PageBuilder page, CaseResult audited) {
    List<Explanation> explanations = audited.explanations();
    boolean off = audited.balances().stream().anyMatch(b -> b.verdict() == Verdict.IMBALANCED);
    if (explanations.isEmpty()) {
      if (off) {
        page.blank().line("What would explain it: nothing that was tried");
      }
      return;
    }
    boolean fits = explanations.stream().anyMatch(Explanation::fits);
    page.blank()
        .line(
            fits
                ? "What would explain it, the likeliest first"
                : "What would explain it: nothing that was tried; the nearest first");
    audited
        .fitByChance()
        .filter(n -> n >= NOTED)
        .ifPresent(
            n ->
                page.paragraph(
                    2,
                    2,
                    "By chance alone about "
                        + Figures.significant(n, 2)
                        + " hypotheses would be expected to fit."));
    for (int i = 0; i < explanations.size(); i++) {
      write(page, i + 1, explanations.get(i), audited);
    }
  }

  /** Numbers, those that follow one another in one go; the explanation's own does not interrupt. */
  private static String tied(List<Integer> indices, int own) {
    List<String> runs = new ArrayList<>();
    for (int i = 0, end = 0; i < indices.size(); i = end + 1) {
      end = i;
      while (end + 1 < indices.size() && follows(indices.get(end), indices.get(end + 1), own)) {
        end++;
      }
      int first = indices.get(i) + 1;
      int last = indices.get(end) + 1;
      runs.add(first == last ? "no. " + first : "no. " + first + " to " + last);
    }
    return String.join(", ", runs);
  }

  private static boolean follows(int index, int next, int own) {
    return next == index + 1 || (next == index + 2 && own == index + 2);
  }

  private static void write(
      PageBuilder page, int rank, Explanation explanation, CaseResult audited) {
    String unit =
        audited.balances().stream()
            .filter(b -> b.volume().equals(explanation.balance()))
            .map(BalanceResult::unit)
            .findFirst()
            .orElse("1");
    String tied = tied(explanation.tiedWith(), rank);
    String number = rank + ". ";
    page.paragraph(
        2,
        number.length(),
        number
            + explanation.kind().word()
            + (explanation.on().isEmpty() ? "" : ": " + String.join(", ", explanation.on()))
            + " - explains "
            + Figures.percent(explanation.explained())
            + " of the residual of "
            + explanation.balance()
            + explanation
                .residualNow()
                .map(r -> " (" + Figures.quoted(r) + " -> ")
                .orElse(" (residual then ")
            + Figures.quoted(explanation.residualThen(), unit)
            + ")"
            + (explanation.fits() ? ", fits" : ", does not bring it within w")
            + (tied.isEmpty() ? "" : ", can't be told apart from " + tied));
    page.paragraph(2 + number.length(), 0, explanation.message());
  }
}
