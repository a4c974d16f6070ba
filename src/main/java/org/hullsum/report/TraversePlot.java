package org.hullsum.report;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.hullsum.audit.PatchResult;
import org.hullsum.model.TraverseReadings;
import org.hullsum.model.TraverseReadings.Reading;

/**
 * The readings of traverses: the figures of each profile and a bar for each reading, from wall to
 * wall along each diameter, or along each line of a grid. At most 80 columns wide.
 */
final class TraversePlot {
  /** More readings than these make no picture. */
  private static final int MOST_DRAWN = 64;

  private static final int LONGEST_BAR = 36;
  private static final int DIGITS = 4;
  private static final double HALF_TURN = 180;

  private TraversePlot() {}

  static void write(PageBuilder page, List<PatchResult> patches) {
    List<PatchResult> traversed = patches.stream().filter(p -> !p.traverses().isEmpty()).toList();
    if (traversed.isEmpty()) {
      return;
    }
    page.blank().line("Traverses, speeds along the normal");
    for (PatchResult patch : traversed) {
      patch.traverses().forEach(t -> write(page, patch.name(), t));
    }
  }

  private static void write(PageBuilder page, String patch, TraverseReadings readings) {
    page.blank().paragraph(2, 2, patch + ": " + summary(readings));
    if (readings.readings().size() <= MOST_DRAWN) {
      page.blank().lines(4, bars(readings));
    }
  }

  private static String summary(TraverseReadings readings) {
    return readings.rule()
        + " ("
        + readings.source()
        + "), "
        + Words.count(readings.readings().size(), "reading")
        + "; mean "
        + figure(readings.mean(), readings.unit())
        + ", largest "
        + figure(readings.largest(), readings.unit())
        + readings
            .largestToMean()
            .map(q -> " (" + Figures.significant(q, DIGITS) + " times the mean)")
            .orElse("")
        + readings
            .variation()
            .map(v -> ", varying by " + Figures.percent(v) + " (one standard deviation)")
            .orElse("")
        + readings
            .swirl()
            .map(s -> ", flow " + Figures.significant(s, 2) + " deg off the normal on average")
            .orElse("");
  }

  private static String figure(double value, String unit) {
    return Figures.withUnit(Figures.significant(value, DIGITS), unit);
  }

  private static List<String> bars(TraverseReadings readings) {
    TextTableBuilder table =
        new TextTableBuilder()
            .column(readings.round() ? "diameter" : "up", TextTableBuilder.Align.RIGHT)
            .column(readings.round() ? "r/R" : "across", TextTableBuilder.Align.RIGHT)
            .column(
                readings.unit().equals("1") ? "speed" : readings.unit(),
                TextTableBuilder.Align.RIGHT)
            .column("", TextTableBuilder.Align.LEFT);
    double longest =
        readings.readings().stream().mapToDouble(r -> Math.abs(r.speed())).max().orElseThrow();
    double sense = readings.mean() < 0 ? -1 : 1;
    Optional<String> line = Optional.empty();
    for (Row row : rows(readings)) {
      Optional<String> here = Optional.of(row.line());
      table.row(
          here.equals(line) ? "" : row.line(),
          Figures.significant(row.at(), 3),
          Figures.significant(row.speed(), DIGITS),
          bar(sense * row.speed(), longest));
      line = here;
    }
    return table.lines();
  }

  /** A reading on its line. */
  private record Row(double order, String line, double at, double speed) {}

  private static List<Row> rows(TraverseReadings readings) {
    List<Row> rows = new ArrayList<>();
    for (Reading r : readings.readings()) {
      if (readings.round()) {
        double turn = Math.round(r.second() - 2 * HALF_TURN * Math.floor(r.second() / 360));
        boolean near = turn % (2 * HALF_TURN) < HALF_TURN;
        double diameter = turn % HALF_TURN;
        rows.add(
            new Row(
                diameter,
                Figures.significant(diameter, 3) + " deg",
                near ? r.first() : -r.first(),
                r.speed()));
      } else {
        rows.add(new Row(r.second(), Figures.significant(r.second(), 3), r.first(), r.speed()));
      }
    }
    rows.sort(Comparator.comparing(Row::order).thenComparing(Row::at));
    return rows;
  }

  /** Minus signs for what flows against the mean. */
  private static String bar(double speed, double longest) {
    int length = longest == 0 ? 0 : (int) Math.round(LONGEST_BAR * Math.abs(speed) / longest);
    return (speed < 0 ? "-" : "#").repeat(length);
  }
}
