package org.hullsum.report;

import java.util.ArrayList;
import java.util.List;
import org.hullsum.audit.BalanceResult;
import org.hullsum.audit.Verdict;

/**
 * The instants of one volume or envelope as a table of residuals. Long series show their first and
 * last instants and, of the others, those that are not balanced; how many are left out is said.
 */
final class InstantsText {
  /** Rows of a table before it is shortened. */
  private static final int MOST_ROWS = 60;

  /** Instants shown at either end of a shortened table. */
  private static final int ENDS = 5;

  private InstantsText() {}

  static void write(PageBuilder page, List<BalanceResult> instants) {
    BalanceResult first = instants.get(0);
    page.line(
        BalanceText.heading(first)
            + ", at "
            + instants.size()
            + " instants, "
            + first.check().word()
            + " check");
    page.blank();
    List<BalanceResult> shown = shown(instants);
    page.lines(2, table(shown));
    int left = instants.size() - shown.size();
    if (left > 0) {
      long balanced =
          instants.stream().filter(b -> b.verdict() == Verdict.BALANCED).count()
              - shown.stream().filter(b -> b.verdict() == Verdict.BALANCED).count();
      page.paragraph(
          2,
          2,
          Words.count(left, "instant")
              + " left out here, "
              + balanced
              + " of them balanced; the result document has them all.");
    }
  }

  private static List<BalanceResult> shown(List<BalanceResult> instants) {
    if (instants.size() <= MOST_ROWS) {
      return instants;
    }
    List<BalanceResult> shown = new ArrayList<>();
    int room = MOST_ROWS - 2 * ENDS;
    for (int i = 0; i < instants.size(); i++) {
      boolean end = i < ENDS || i >= instants.size() - ENDS;
      boolean worth = instants.get(i).verdict() != Verdict.BALANCED && room > 0;
      if (end || worth) {
        shown.add(instants.get(i));
        room -= end ? 0 : 1;
      }
    }
    return shown;
  }

  private static List<String> table(List<BalanceResult> instants) {
    TextTableBuilder.Align right = TextTableBuilder.Align.RIGHT;
    String unit = instants.get(0).unit();
    String suffix = unit.equals("1") ? "" : ", " + unit;
    TextTableBuilder table =
        new TextTableBuilder()
            .column("at, s", right)
            .column("outward" + suffix, right)
            .column("interior" + suffix, right)
            .column("residual" + suffix, right)
            .column("w", right)
            .column("verdict", TextTableBuilder.Align.LEFT);
    FigureColumnBuilder outward = new FigureColumnBuilder();
    FigureColumnBuilder interior = new FigureColumnBuilder();
    FigureColumnBuilder residual = new FigureColumnBuilder();
    for (BalanceResult b : instants) {
      double bound = b.numericalError().orElse(Double.POSITIVE_INFINITY);
      outward.add(b.outward(), bound, b.standardUncertainty());
      interior.add(b.interior(), bound, b.standardUncertainty());
      residual.add(b.residual(), bound, b.standardUncertainty());
    }
    List<String> outwards = outward.cells();
    List<String> interiors = interior.cells();
    List<String> residuals = residual.cells();
    for (int i = 0; i < instants.size(); i++) {
      BalanceResult b = instants.get(i);
      table.row(
          b.at().map(Figures::quoted).orElse("-"),
          outwards.get(i),
          interiors.get(i),
          residuals.get(i),
          b.margin().map(Figures::error).orElse("-"),
          BalanceText.verdictWord(b.verdict()));
    }
    return table.lines();
  }
}
