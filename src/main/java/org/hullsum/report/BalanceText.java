package org.hullsum.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.hullsum.audit.BalanceResult;
import org.hullsum.audit.CaseResult;
import org.hullsum.audit.PatchResult;
import org.hullsum.audit.Verdict;

/**
 * One balance in full, for people: the table of its patches, the sums, and the verdict in words.
 */
final class BalanceText {
  private static final int INDENT = 2;

  private final CaseResult audited;
  private final BalanceResult balance;
  private final boolean measured;

  BalanceText(CaseResult audited, BalanceResult balance) {
    this.audited = audited;
    this.balance = balance;
    this.measured =
        balance.standardUncertainty() > 0
            || balance.lines().stream().anyMatch(l -> l.standardUncertainty() > 0);
  }

  /** Such as {@code Volume basin (Filtrate basin), volume in m3/s, at 12 s}. */
  static String heading(BalanceResult balance) {
    return (balance.envelope() ? "Envelope " : "Volume ")
        + balance.volume()
        + balance.label().map(l -> " (" + l + ")").orElse("")
        + ": "
        + balance.quantity()
        + (balance.unit().equals("1") ? ", plain numbers" : " in " + balance.unit());
  }

  /** When the balance holds, with a comma before it; nothing for a timeless one. */
  static String when(BalanceResult balance) {
    String instant = balance.at().map(t -> ", at " + Figures.quoted(t, "s")).orElse("");
    String span =
        balance
            .over()
            .map(
                o ->
                    ", mean over "
                        + Figures.quoted(o.begin())
                        + " to "
                        + Figures.quoted(o.end(), "s"))
            .orElse("");
    return instant + span;
  }

  void writeTo(PageBuilder page) {
    page.line(heading(balance) + when(balance)).blank();
    page.lines(INDENT, table());
    balance.terms().forEach(t -> writeTerm(page, t));
    balance
        .divergence()
        .ifPresent(
            d ->
                page.blank()
                    .paragraph(
                        INDENT,
                        2,
                        "Beside it, what the field itself makes: ∭ div F dV = "
                            + termValue(d)
                            + d.formula().map(f -> ", div F = " + f).orElse("")
                            + how(d)
                            + "."));
    VerdictText.write(page, INDENT, audited, balance);
  }

  private List<String> table() {
    TextTableBuilder table =
        new TextTableBuilder()
            .column("patch", TextTableBuilder.Align.LEFT)
            .column("direction", TextTableBuilder.Align.LEFT)
            .column(withUnit("area", areaUnit()), TextTableBuilder.Align.RIGHT)
            .column(withUnit("outward", balance.unit()), TextTableBuilder.Align.RIGHT)
            .column("error bound", TextTableBuilder.Align.RIGHT);
    if (measured) {
      table.column("std. uncertainty", TextTableBuilder.Align.RIGHT);
    }
    List<String> figures = figures();
    List<String> areas = areas();
    for (int i = 0; i < balance.lines().size(); i++) {
      BalanceResult.Line line = balance.lines().get(i);
      table.row(
          cells(
              line.patch(),
              line.sign() > 0 ? "leaves" : "enters",
              areas.get(i),
              figures.get(i),
              line.outward().isPresent() ? Figures.error(line.numericalError()) : "-",
              line.outward().isPresent() ? Figures.error(line.standardUncertainty()) : "-"));
    }
    table.rule();
    int next = balance.lines().size();
    table.row(cells("outward sum", "", "", figures.get(next++), "", ""));
    for (BalanceResult.Term term : balance.terms()) {
      table.row(
          cells(
              "  " + term.kind(),
              "",
              "",
              figures.get(next++),
              term.numericalError().map(Figures::error).orElse("-"),
              term.value().isPresent() ? Figures.error(term.standardUncertainty()) : "-"));
    }
    table.row(cells("interior", "", "", figures.get(next++), "", ""));
    table.row(
        cells(
            "residual",
            "",
            "",
            figures.get(next),
            balance.numericalError().map(Figures::error).orElse("-"),
            balance.residual().isPresent() ? Figures.error(balance.standardUncertainty()) : "-"));
    return table.lines();
  }

  /** The outward column: each patch, their sum, each interior term, the interior, the residual. */
  private List<String> figures() {
    double bound = balance.numericalError().orElse(0.0);
    double uncertainty = balance.standardUncertainty();
    FigureColumnBuilder column = new FigureColumnBuilder();
    balance
        .lines()
        .forEach(l -> column.add(l.outward(), l.numericalError(), l.standardUncertainty()));
    column.add(balance.outward(), bound, uncertainty);
    balance
        .terms()
        .forEach(
            t ->
                column.add(
                    t.value(),
                    t.numericalError().orElse(Double.POSITIVE_INFINITY),
                    t.standardUncertainty()));
    column.add(balance.interior(), bound, uncertainty);
    column.add(balance.residual(), bound, uncertainty);
    return column.cells();
  }

  private List<String> areas() {
    return balance.lines().stream()
        .map(l -> patch(l.patch()).flatMap(PatchResult::area))
        .map(Figures::optional)
        .toList();
  }

  private Optional<PatchResult> patch(String name) {
    return audited.patches().stream().filter(p -> p.name().equals(name)).findFirst();
  }

  private String areaUnit() {
    return audited.lengthUnit().equals("1") ? "1" : audited.lengthUnit() + "2";
  }

  private List<String> cells(String... cells) {
    List<String> row = new ArrayList<>(List.of(cells));
    if (!measured) {
      row.remove(row.size() - 1);
    }
    return row;
  }

  private void writeTerm(PageBuilder page, BalanceResult.Term term) {
    if (term.formula().isPresent()) {
      String name =
          term.kind().toLowerCase(Locale.ROOT).startsWith("divergence")
              ? "div F"
              : Words.capital(term.kind());
      page.blank().paragraph(INDENT, 2, name + " = " + term.formula().get() + how(term) + ".");
    }
  }

  private String termValue(BalanceResult.Term term) {
    return term.value().map(v -> Figures.quoted(v, balance.unit())).orElse("not computed");
  }

  private static String how(BalanceResult.Term term) {
    String accuracy =
        term.numericalError().filter(e -> e > 0).map(e -> " to ±" + Figures.error(e)).orElse("");
    return term.route().equals("stated")
        ? ""
        : ", integrated over the enclosed volume by " + term.route() + accuracy;
  }

  private static String withUnit(String name, String unit) {
    return unit.equals("1") ? name : name + ", " + unit;
  }

  /** The line of a balance in a table of many instants or in the short form. */
  static String verdictWord(Verdict verdict) {
    return verdict.word().toUpperCase(Locale.ROOT);
  }
}
