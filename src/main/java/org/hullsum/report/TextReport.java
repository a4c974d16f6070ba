package org.hullsum.report;

import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import org.hullsum.audit.AuditResult;
import org.hullsum.audit.BalanceResult;
import org.hullsum.audit.CaseResult;
import org.hullsum.problem.Place;
import org.hullsum.problem.Problem;
import org.hullsum.problem.Severity;

/**
 * The report for people: plain text of 100 columns, without colours, verdict first.
 *
 * <p>Figures carry as many digits as their error supports, eight at most. Control characters in
 * names and titles are replaced, so that no terminal obeys a case file. Lines end in a line feed.
 * Thread-safe; O(size of the result).
 */
public final class TextReport {
  private static final String CAUTION =
      "A verdict of this program does not replace local codes and licensed practice where pressure,"
          + " toxic release, structural or safety decisions depend on it.";

  private TextReport() {}

  /** The whole report. */
  public static String of(AuditResult result) {
    StringBuilder text = new StringBuilder();
    result.cases().forEach(c -> text.append(of(c)));
    return text.append(closing(result)).toString();
  }

  /** The part of one case; ends in a line feed. */
  public static String of(CaseResult audited) {
    return new CaseText(audited).write().toString();
  }

  /**
   * One problem of a file: {@code FILE:LINE:COLUMN: message}, over several lines if it has them.
   */
  public static String of(Problem problem) {
    String kind = problem.kind().fatal() ? "" : "warning: ";
    return (problem.place() + ": " + kind + problem.message())
        .lines()
        .map(Words::printable)
        .collect(Collectors.joining("\n"));
  }

  /** What follows the last case: the verdict over several cases, and the caution. */
  public static String closing(AuditResult result) {
    PageBuilder page = new PageBuilder();
    page.line("=".repeat(PageBuilder.WIDTH));
    if (result.cases().size() > 1) {
      result.cases().forEach(c -> page.line(summary(c)));
      page.blank();
    }
    return page.paragraph(0, 0, CAUTION).toString();
  }

  private static String summary(CaseResult audited) {
    return String.format(Locale.ROOT, "%-19s", word(audited)) + audited.file();
  }

  private static String word(CaseResult audited) {
    if (audited.isUnreadable()) {
      return "NOT AUDITED";
    }
    String verdict = audited.verdict().map(BalanceText::verdictWord).orElse("NO BALANCE");
    return audited.hasError() ? verdict + ", ERROR" : verdict;
  }

  /**
   * The short form: a line for each balance and each error, or one for a case without either; each
   * begins with the verdict and names the file.
   */
  public static String brief(CaseResult audited) {
    PageBuilder page = new PageBuilder();
    if (audited.isUnreadable()) {
      String count = Words.count(audited.problems().size(), "problem");
      return page.line(padded("NOT AUDITED") + audited.file() + ": " + count).toString();
    }
    audited.balances().forEach(b -> page.line(brief(audited, b)));
    if (audited.balances().isEmpty()) {
      page.line(padded("NO BALANCE") + audited.file());
    }
    audited.findings().stream()
        .filter(f -> f.severity() == Severity.ERROR && f.waived().isEmpty())
        .forEach(
            f ->
                page.line(
                    padded(f.severity().word().toUpperCase(Locale.ROOT))
                        + f.place().map(Place::toString).orElse(audited.file())
                        + ": "
                        + f.code().code()
                        + f.on().map(o -> " on " + o).orElse("")));
    return page.toString();
  }

  private static String brief(CaseResult audited, BalanceResult balance) {
    List<String> parts =
        List.of(
            padded(BalanceText.verdictWord(balance.verdict())) + audited.file(),
            balance.volume() + BalanceText.when(balance),
            balance.check().word(),
            balance.residual().map(r -> residual(balance, r)).orElse("no residual"),
            balance
                .tolerance()
                .map(t -> "tolerance " + Figures.significant(t, 3))
                .orElse("no tolerance"));
    return String.join("  ", parts);
  }

  private static String residual(BalanceResult balance, double residual) {
    String margin = balance.margin().map(w -> " ± " + Figures.error(w)).orElse("");
    return "residual "
        + Figures.withUnit(Figures.significant(residual, 4) + margin, balance.unit());
  }

  private static String padded(String word) {
    return String.format(Locale.ROOT, "%-13s", word);
  }
}
