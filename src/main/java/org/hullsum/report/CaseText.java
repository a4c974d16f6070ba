package org.hullsum.report;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.hullsum.audit.BalanceResult;
import org.hullsum.audit.CaseResult;
import org.hullsum.audit.PatchResult;
import org.hullsum.audit.SurfaceResult;
import org.hullsum.audit.Verdict;
import org.hullsum.problem.Finding;
import org.hullsum.problem.Place;
import org.hullsum.problem.Severity;

/** One case for people: verdict first, then the balances, the surfaces, findings, explanations. */
final class CaseText {
  /** Up to so many instants each stand in full; more stand in a table of residuals. */
  private static final int MOST_IN_FULL = 3;

  private final CaseResult audited;
  private final PageBuilder page = new PageBuilder();

  CaseText(CaseResult audited) {
    this.audited = audited;
  }

  @Override
  public String toString() {
    return page.toString();
  }

  CaseText write() {
    page.line("=".repeat(PageBuilder.WIDTH));
    audited.title().ifPresent(t -> page.paragraph(0, 0, t));
    page.line(audited.file());
    if (audited.isUnreadable()) {
      page.paragraph(
          0,
          0,
          "NOT AUDITED: "
              + Words.count(audited.problems().size(), "problem")
              + " in the files, listed on standard error.");
      return this;
    }
    page.paragraph(0, 0, verdictLine());
    audited.about().ifPresent(a -> page.blank().paragraph(0, 0, a));
    byVolume().values().forEach(this::writeBalances);
    writeLonePatches();
    TraversePlot.write(page, audited.patches());
    writeSurfaces();
    writeFindings();
    ExplanationText.write(page, audited);
    writeNotes();
    return this;
  }

  private String verdictLine() {
    String verdict =
        audited
            .verdict()
            .map(v -> "Verdict: " + BalanceText.verdictWord(v))
            .orElse("No balance to judge: the patches bound no volume");
    Map<Verdict, Long> counts =
        audited.balances().stream()
            .collect(Collectors.groupingBy(BalanceResult::verdict, Collectors.counting()));
    List<String> parts = new ArrayList<>();
    if (audited.balances().size() > 1) {
      for (Verdict v : List.of(Verdict.BALANCED, Verdict.UNDECIDED, Verdict.IMBALANCED)) {
        if (counts.containsKey(v)) {
          parts.add(counts.get(v) + " " + v.word());
        }
      }
    }
    addCount(parts, Severity.ERROR, "error");
    addCount(parts, Severity.WARNING, "warning");
    boolean contradiction =
        audited.hasError() && audited.verdict().equals(Optional.of(Verdict.BALANCED));
    return verdict
        + (contradiction ? ", but something is wrong, see the findings" : "")
        + (parts.isEmpty() ? "" : " (" + String.join(", ", parts) + ")");
  }

  private void addCount(List<String> parts, Severity severity, String noun) {
    long count =
        audited.findings().stream()
            .filter(f -> f.severity() == severity && f.waived().isEmpty())
            .count();
    if (count > 0) {
      parts.add(Words.count(count, noun));
    }
  }

  /** The balances of each volume and envelope together, in the order of the result. */
  private Map<String, List<BalanceResult>> byVolume() {
    return audited.balances().stream()
        .collect(
            Collectors.groupingBy(BalanceText::heading, LinkedHashMap::new, Collectors.toList()));
  }

  private void writeBalances(List<BalanceResult> balances) {
    List<BalanceResult> instants = balances.stream().filter(b -> b.at().isPresent()).toList();
    boolean compact = instants.size() > MOST_IN_FULL;
    if (compact) {
      page.blank();
      InstantsText.write(page, instants);
    }
    for (BalanceResult balance : balances) {
      if (!compact || balance.at().isEmpty()) {
        page.blank();
        new BalanceText(audited, balance).writeTo(page);
      }
    }
  }

  /** Patches in no balance: those of a case without volumes, and baffles. */
  private void writeLonePatches() {
    List<PatchResult> lone = audited.patches().stream().filter(p -> !isInABalance(p)).toList();
    if (lone.isEmpty()) {
      return;
    }
    page.blank().line("Patches that stand in no balance");
    page.blank().lines(2, PatchTable.lines(audited.lengthUnit(), lone));
  }

  private boolean isInABalance(PatchResult patch) {
    return audited.balances().stream()
        .flatMap(b -> b.lines().stream())
        .anyMatch(l -> l.patch().equals(patch.name()));
  }

  private void writeSurfaces() {
    List<SurfaceResult> surfaces =
        audited.surfaces().stream()
            .filter(s -> s.closed().isPresent() || s.enclosedVolume().isPresent())
            .toList();
    if (surfaces.isEmpty()) {
      return;
    }
    page.blank().line("Surfaces");
    for (SurfaceResult surface : surfaces) {
      page.paragraph(
          2,
          2,
          surface.volume()
              + ": "
              + VerdictText.closednessWord(surface)
              + surface
                  .enclosedVolume()
                  .map(v -> ", encloses " + Figures.quoted(v, cubed(audited.lengthUnit())))
                  .orElse(""));
      surface.gaps().forEach(g -> page.paragraph(4, 2, gap(g)));
    }
  }

  private String gap(SurfaceResult.Gap gap) {
    String unit = audited.lengthUnit();
    String rateUnit = audited.balances().stream().findFirst().map(BalanceResult::unit).orElse("1");
    return "gap"
        + (gap.between().isEmpty() ? "" : " between " + String.join(" and ", gap.between()))
        + " of "
        + Figures.quoted(gap.area(), unit.equals("1") ? "1" : unit + "2")
        + " about "
        + Figures.vector(gap.centre())
        + (unit.equals("1") ? "" : " " + unit)
        + ", rim "
        + Figures.quoted(gap.length(), unit)
        + gap.fluxThrough()
            .map(f -> ", outward flux through a plane over it " + Figures.quoted(f, rateUnit))
            .orElse("");
  }

  private static String cubed(String unit) {
    return unit.equals("1") ? "1" : unit + "3";
  }

  private void writeFindings() {
    if (audited.findings().isEmpty()) {
      return;
    }
    page.blank().line("Findings");
    for (Finding finding : audited.findings()) {
      Optional<String> place = finding.place().map(Place::toString);
      page.paragraph(
          2,
          4,
          finding.severity().word()
              + " "
              + finding.code().code()
              + finding.on().map(o -> " on " + o).orElse("")
              + place.map(p -> " at " + p).orElse("")
              + ": "
              + finding.message());
      finding
          .waived()
          .ifPresent(r -> page.paragraph(6, 2, "waived, does not count for the exit code: " + r));
    }
  }

  private void writeNotes() {
    List<String> notes = new ArrayList<>(audited.notes());
    audited
        .correctedCoverage()
        .ifPresent(
            c ->
                notes.add(
                    "With "
                        + audited.balances().size()
                        + " balances, a coverage of "
                        + Figures.significant(100 * c, 4)
                        + " % for each keeps the stated one over all of them together."));
    if (notes.isEmpty()) {
      return;
    }
    page.blank().line("Notes");
    notes.forEach(n -> page.paragraph(2, 2, "- " + n));
  }
}
