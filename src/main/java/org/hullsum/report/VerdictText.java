package org.hullsum.report;

import java.util.Optional;
import java.util.stream.Collectors;
import org.hullsum.audit.BalanceResult;
import org.hullsum.audit.BalanceResult.Check;
import org.hullsum.audit.CaseResult;
import org.hullsum.audit.SurfaceResult;
import org.hullsum.audit.Verdict;

/** A verdict in words: why, what it means and what it does not say. */
final class VerdictText {
  /** Sources of uncertainty that are named; the smaller ones stand in the result document. */
  private static final int MOST_SOURCES = 5;

  private VerdictText() {}

  static void write(PageBuilder page, int indent, CaseResult audited, BalanceResult balance) {
    page.blank();
    page.paragraph(
        indent,
        2,
        BalanceText.verdictWord(balance.verdict())
            + " - "
            + balance.check().word()
            + " check. "
            + balance.reason());
    int inner = indent + 2;
    page.lines(inner, MarginTable.lines(balance));
    page.paragraph(inner, 2, "Means: " + meaning(balance));
    closedness(audited, balance).ifPresent(c -> page.paragraph(inner, 2, "Surface: " + c));
    balance
        .closedBy()
        .ifPresent(
            c ->
                page.paragraph(
                    inner,
                    2,
                    "It would close with "
                        + Figures.quoted(c.value(), balance.unit())
                        + " through "
                        + c.patch()
                        + ", counted from the volume it leaves to the one it enters."));
    writeBudget(page, inner, balance);
  }

  private static String meaning(BalanceResult balance) {
    return balance.check() == Check.IDENTITY
        ? identity(balance.verdict())
            + " An identity check says nothing of whether the geometry or the field is the intended"
            + " one, or whether the quantity is conserved."
        : conservation(balance);
  }

  private static String identity(Verdict verdict) {
    return switch (verdict) {
      case BALANCED ->
          "the outward fluxes agree with the field's own divergence, so integrals and the facings"
              + " of what is flowed through hold together.";
      case IMBALANCED ->
          "the outward fluxes contradict the field's own divergence: a facing is wrong, the field"
              + " jumps or is singular inside, or an integral went wrong.";
      case UNDECIDED -> "neither agreement nor contradiction is shown; it is not a pass.";
    };
  }

  private static String conservation(BalanceResult balance) {
    return switch (balance.verdict()) {
      case BALANCED ->
          "what leaves through the surface equals what is made less what is kept, as far as w can"
              + " tell.";
      case IMBALANCED -> imbalance(balance);
      case UNDECIDED -> "the figures at hand show neither balance nor imbalance; it is not a pass.";
    };
  }

  private static String imbalance(BalanceResult balance) {
    double residual = balance.residual().orElse(Double.NaN);
    String size = Figures.quoted(Math.abs(residual), balance.unit());
    return residual > 0
        ? size + " more leaves through the surface than is accounted for."
        : size + " less leaves through the surface than is accounted for.";
  }

  private static Optional<String> closedness(CaseResult audited, BalanceResult balance) {
    return audited.surfaces().stream()
        .filter(s -> !balance.envelope() && s.volume().equals(balance.volume()))
        .findFirst()
        .map(VerdictText::closedness);
  }

  /** Whether a surface is closed, and why that is said. */
  private static String closedness(SurfaceResult surface) {
    String reason = surface.reason().map(r -> r.endsWith(".") ? r : r + ".").orElse("");
    String word = closednessWord(surface);
    if (reason.isEmpty()) {
      return word + ".";
    }
    boolean saidInTheReason = reason.startsWith(word) || reason.startsWith("not applicable");
    return saidInTheReason ? reason : word + ": " + reason;
  }

  /** Whether a surface is closed, in two or three words. */
  static String closednessWord(SurfaceResult surface) {
    return surface.closed().map(c -> c ? "closed" : "OPEN").orElse("closedness not proved");
  }

  private static void writeBudget(PageBuilder page, int indent, BalanceResult balance) {
    if (balance.budget().isEmpty()) {
      return;
    }
    String shares =
        balance.budget().stream()
            .limit(MOST_SOURCES)
            .map(c -> c.source() + " " + Figures.percent(c.share()))
            .collect(Collectors.joining(", "));
    int others = balance.budget().size() - MOST_SOURCES;
    page.paragraph(
        indent,
        2,
        "Variance of the residual comes from: "
            + shares
            + (others > 0 ? ", and " + Words.count(others, "smaller source") : "")
            + ".");
  }
}
