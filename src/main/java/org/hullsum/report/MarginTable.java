package org.hullsum.report;

import java.util.List;
import org.hullsum.audit.BalanceResult;

/** The figures by which a verdict was reached, one a line: residual, w, tolerance, throughput. */
final class MarginTable {
  private MarginTable() {}

  static List<String> lines(BalanceResult balance) {
    String unit = balance.unit();
    TextTableBuilder table =
        new TextTableBuilder()
            .column("", TextTableBuilder.Align.LEFT)
            .column("", TextTableBuilder.Align.LEFT)
            .column("", TextTableBuilder.Align.LEFT);
    table.row(
        "|residual|",
        balance.residual().map(r -> Figures.quoted(Math.abs(r), unit)).orElse("-"),
        "outward sum less interior");
    table.row(
        "w",
        balance.margin().map(w -> rounded(w, unit)).orElse("-"),
        balance
            .numericalError()
            .map(
                e ->
                    "numerical error bound "
                        + Figures.error(e)
                        + " + "
                        + Figures.significant(balance.coverageFactor(), 3)
                        + " x standard uncertainty "
                        + Figures.error(balance.standardUncertainty()))
            .orElse("no error bound is known"));
    switch (balance.rule()) {
      case TOLERANCE ->
          table.row(
              "tolerance T",
              balance.tolerance().map(t -> rounded(t, unit)).orElse("-"),
              "balanced: |residual| + w <= T; imbalanced: |residual| - w > T");
      case UNCERTAINTY -> {
        table.row("tolerance", "none", "balanced: |residual| <= w; imbalanced: |residual| > w");
        table.row(
            "detectable",
            balance.detectable().map(d -> rounded(d, unit)).orElse("-"),
            "the smallest imbalance that would have shown");
      }
    }
    table.row("throughput", rounded(balance.throughput(), unit), "what a relative tolerance is of");
    return table.lines();
  }

  private static String rounded(double value, String unit) {
    return Figures.withUnit(Figures.significant(value, 3), unit);
  }
}
