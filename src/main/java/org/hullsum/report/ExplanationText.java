package org.hullsum.report;

import java.util.List;
import java.util.stream.Collectors;
import org.hullsum.audit.BalanceResult;
import org.hullsum.audit.CaseResult;
import org.hullsum.audit.Explanation;

/** The ranking of explanations, with the number that would fit by chance before it. */
final class ExplanationText {
  private ExplanationText() {}

  static void write(PageBuilder page, CaseResult audited) {
    List<Explanation> explanations = audited.explanations();
    if (explanations.isEmpty()) {
      return;
    }
    page.blank().line("What would explain it, the likeliest first");
    audited
        .fitByChance()
        .ifPresent(
            n ->
                page.paragraph(
                    2,
                    2,
                    "By chance alone "
                        + Figures.significant(n, 2)
                        + " of the hypotheses tried would fit."));
    for (int i = 0; i < explanations.size(); i++) {
      write(page, i + 1, explanations.get(i), audited);
    }
  }

  private static void write(
      PageBuilder page, int rank, Explanation explanation, CaseResult audited) {
    String unit =
        audited.balances().stream()
            .filter(b -> b.volume().equals(explanation.balance()))
            .map(BalanceResult::unit)
            .findFirst()
            .orElse("1");
    String tied =
        explanation.tiedWith().stream()
            .map(i -> "no. " + (i + 1))
            .collect(Collectors.joining(", "));
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
