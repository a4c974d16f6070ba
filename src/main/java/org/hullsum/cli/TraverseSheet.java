package org.hullsum.cli;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.hullsum.problem.TextFault;
import org.hullsum.quadrature.TraverseLine;
import org.hullsum.quadrature.TraverseRule;
import org.hullsum.units.Dimension;
import org.hullsum.units.Quantity;
import org.hullsum.units.QuantityParser;
import org.hullsum.units.WorkingUnits;
import picocli.CommandLine;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ParseResult;

/**
 * What {@code hullsum start traverse} prints: where to read a duct's section, as a sheet to take to
 * the duct, or as the CSV that a case then reads.
 */
final class TraverseSheet {
  static final String KIND = "traverse";

  private static final List<String> OPTIONS =
      List.of(
          "--section",
          "--diameter",
          "--width",
          "--height",
          "--rule",
          "--points",
          "--diameters",
          "--csv");

  private static final double MM = 1000;
  private static final int SHOWN_DIGITS = 6;
  private static final int USUAL_ON_SIDE = 5;
  private static final int USUAL_ON_DIAMETER = 10;
  private static final int MOST_DIAMETERS = 12;

  /** 40 CFR 60 appendix A-1, method 1: up to this diameter the smaller distance holds. */
  private static final double LARGE_DIAMETER = 0.61;

  private static final double NEAREST = 0.013;
  private static final double NEAREST_IN_LARGE = 0.025;

  private final CommandLine command;
  private final ParseResult parsed;

  TraverseSheet(CommandLine command, ParseResult parsed) {
    this.command = command;
    this.parsed = parsed;
  }

  static void declare(CommandSpec start) {
    add(start, "--section", "disk|rectangle", "traverse: the shape of the duct's section.");
    add(start, "--diameter", "LENGTH", "traverse: of a disk, such as 0.4 (m) or '400 mm'.");
    add(start, "--width", "LENGTH", "traverse: of a rectangle, along its first edge.");
    add(start, "--height", "LENGTH", "traverse: of a rectangle, along its second edge.");
    add(
        start,
        "--rule",
        "RULE",
        "traverse: log-linear, log-tchebycheff, equal-area or gauss; by default the first for a"
            + " disk, the second for a rectangle.");
    add(
        start,
        "--points",
        "N",
        "traverse: on each diameter, by default 10; for a rectangle N or"
            + " NxM, by default 5x5.");
    add(start, "--diameters", "N", "traverse: of a disk, by default 2.");
    start.addOption(
        OptionSpec.builder("--csv")
            .arity("0")
            .type(boolean.class)
            .description("traverse: as the table of readings, its speeds left empty.")
            .build());
  }

  private static void add(CommandSpec start, String name, String label, String description) {
    start.addOption(
        OptionSpec.builder(name)
            .paramLabel(label)
            .arity("1")
            .type(String.class)
            .description(description)
            .build());
  }

  /** Refuses the options where another kind is asked for. */
  static void refuse(CommandLine command, ParseResult parsed) {
    OPTIONS.stream()
        .filter(parsed::hasMatchedOption)
        .findFirst()
        .ifPresent(
            o -> {
              throw new ParameterException(command, o + " is for 'start traverse'");
            });
  }

  String text() {
    String section = option("--section").orElse("");
    if (section.equals("disk")) {
      without("--width", "--height");
      return disk();
    }
    if (section.equals("rectangle")) {
      without("--diameter", "--diameters");
      return rectangle();
    }
    throw wrong(
        section.isEmpty()
            ? "'start traverse' needs the section: --section disk --diameter 0.4, or --section"
                + " rectangle --width 0.6 --height 0.4"
            : "--section is disk or rectangle, not '" + section + "'");
  }

  private void without(String... options) {
    for (String o : options) {
      if (parsed.hasMatchedOption(o)) {
        throw wrong(o + " is not for a " + option("--section").orElse(""));
      }
    }
  }

  private ParameterException wrong(String message) {
    return new ParameterException(command, message);
  }

  private Optional<String> option(String name) {
    return Optional.ofNullable(parsed.matchedOptionValue(name, (String) null));
  }

  private double length(String name) {
    String text = option(name).orElseThrow(() -> wrong(name + " is missing"));
    try {
      Quantity quantity = QuantityParser.parse(text);
      double length = quantity.in(WorkingUnits.SI);
      if (!quantity.bare() && !quantity.unit().dimension().equals(Dimension.LENGTH)
          || !(length > 0)) {
        throw wrong(name + " is a length above 0, such as 0.4 (m) or '400 mm', not '" + text + "'");
      }
      return length;
    } catch (TextFault fault) {
      throw wrong(name + ": " + fault.getMessage());
    }
  }

  private TraverseRule rule(TraverseRule usual) {
    return option("--rule")
        .map(
            word ->
                TraverseRule.of(word)
                    .orElseThrow(
                        () ->
                            wrong(
                                "--rule is log-linear, log-tchebycheff, equal-area or gauss, not '"
                                    + word
                                    + "'")))
        .orElse(usual);
  }

  private int count(String name, String text) {
    try {
      int count = Integer.parseInt(text);
      if (count > 0) {
        return count;
      }
    } catch (NumberFormatException e) {
      throw wrong(name + " is a number of points, not '" + text + "'");
    }
    throw wrong(name + " is above 0");
  }

  private String disk() {
    double diameter = length("--diameter");
    TraverseRule rule = rule(TraverseRule.LOG_LINEAR);
    int points = option("--points").map(t -> count("--points", t)).orElse(USUAL_ON_DIAMETER);
    int diameters = option("--diameters").map(t -> count("--diameters", t)).orElse(2);
    if (points % 2 != 0 || !rule.onRadius(points / 2)) {
      throw wrong(
          rule.word()
              + " has "
              + rule.countsOnRadius()
              + " points on a radius, so an even --points"
              + " of twice as many; not "
              + points);
    }
    if (diameters < 2 || diameters > MOST_DIAMETERS) {
      throw wrong("--diameters is 2 to " + MOST_DIAMETERS);
    }
    TraverseLine line = rule.radius(points / 2);
    return parsed.hasMatchedOption("--csv")
        ? diskTable(line, diameter, diameters)
        : diskSheet(rule, line, diameter, diameters);
  }

  private static String diskTable(TraverseLine line, double diameter, int diameters) {
    StringBuilder table = new StringBuilder("radius (mm),angle (deg),speed (m/s)\n");
    for (int d = 0; d < 2 * diameters; d++) {
      for (double position : line.positions()) {
        table.append(
            String.format(
                Locale.ROOT, "%.1f,%s,%n", 0.5 * MM * diameter * position, angle(d, diameters)));
      }
    }
    return table.toString().replace(System.lineSeparator(), "\n");
  }

  private static String metres(double length) {
    return new BigDecimal(length)
        .round(new MathContext(SHOWN_DIGITS))
        .stripTrailingZeros()
        .toPlainString();
  }

  private static String angle(int radius, int diameters) {
    String angle = String.format(Locale.ROOT, "%.2f", radius * 180.0 / diameters);
    return angle.endsWith(".00") ? angle.substring(0, angle.length() - 3) : angle;
  }

  private static String diskSheet(
      TraverseRule rule, TraverseLine line, double diameter, int diameters) {
    StringBuilder sheet = new StringBuilder();
    sheet.append(
        String.format(
            Locale.ROOT,
            "Traverse of a round section of diameter %s m: %s (%s),%n%d points on each of %d"
                + " diameters, %d in all.%n%n",
            metres(diameter),
            rule.word(),
            rule.source(),
            2 * line.size(),
            diameters,
            2 * line.size() * diameters));
    sheet.append("  point  from the wall, mm  of the diameter, %  radius, mm    weight");
    for (int d = 0; d < diameters; d++) {
      sheet.append(String.format(Locale.ROOT, "  at %s deg", angle(d, diameters)));
    }
    sheet.append(System.lineSeparator());
    for (int i = 0; i < 2 * line.size(); i++) {
      boolean near = i < line.size();
      int index = near ? line.size() - 1 - i : i - line.size();
      double position = line.positions().get(index);
      double fromWall = 0.5 * (near ? 1 - position : 1 + position);
      sheet.append(
          String.format(
              Locale.ROOT,
              "  %5d  %17.1f  %17.2f  %10.1f  %8.5f",
              i + 1,
              MM * diameter * fromWall,
              100 * fromWall,
              0.5 * MM * diameter * position,
              line.weights().get(index) / (2 * diameters)));
      sheet.append("  ________".repeat(diameters)).append(System.lineSeparator());
    }
    sheet.append(nearWall(rule, line, diameter));
    sheet.append(after("radius: radius, angle: angle", rule));
    return sheet.toString().replace(System.lineSeparator(), "\n");
  }

  private static String nearWall(TraverseRule rule, TraverseLine line, double diameter) {
    double nearest = 0.5 * diameter * (1 - line.positions().get(line.size() - 1));
    double allowed = diameter > LARGE_DIAMETER ? NEAREST_IN_LARGE : NEAREST;
    return rule == TraverseRule.EQUAL_AREA && nearest < allowed
        ? String.format(
            Locale.ROOT,
            "%nThe outermost point is %.0f mm from the wall; 40 CFR 60, method 1, keeps %.0f mm.%n"
                + "Take fewer points, or another rule.%n",
            MM * nearest,
            MM * allowed)
        : "";
  }

  private String rectangle() {
    double width = length("--width");
    double height = length("--height");
    TraverseRule rule = rule(TraverseRule.LOG_TCHEBYCHEFF);
    String[] counts = option("--points").orElse(USUAL_ON_SIDE + "x" + USUAL_ON_SIDE).split("x", -1);
    int across = count("--points", counts[0]);
    int up = count("--points", counts[counts.length - 1]);
    if (counts.length > 2 || !rule.onSide(across) || !rule.onSide(up)) {
      throw wrong(
          rule.forRectangles()
              ? rule.word()
                  + " has "
                  + rule.countsOnSide()
                  + " points along a side, as in --points"
                  + " 5x5"
              : rule.word() + " is for disks; take log-tchebycheff, equal-area or gauss");
    }
    TraverseLine first = rule.side(across);
    TraverseLine second = rule.side(up);
    return parsed.hasMatchedOption("--csv")
        ? rectangleTable(first, second, width, height)
        : rectangleSheet(rule, first, second, width, height);
  }

  private static String rectangleTable(
      TraverseLine first, TraverseLine second, double width, double height) {
    StringBuilder table = new StringBuilder("across (mm),up (mm),speed (m/s)\n");
    for (double up : second.positions()) {
      for (double across : first.positions()) {
        table.append(
            String.format(Locale.ROOT, "%.1f,%.1f,", MM * width * across, MM * height * up));
        table.append('\n');
      }
    }
    return table.toString();
  }

  private static String rectangleSheet(
      TraverseRule rule, TraverseLine first, TraverseLine second, double width, double height) {
    StringBuilder sheet = new StringBuilder();
    sheet.append(
        String.format(
            Locale.ROOT,
            "Traverse of a rectangular section of %s m by %s m: %s (%s),%n%d points across, %d"
                + " up, %d in all; distances in mm from the corner.%n%n       up \\ across",
            metres(width),
            metres(height),
            rule.word(),
            rule.source(),
            first.size(),
            second.size(),
            first.size() * second.size()));
    first
        .positions()
        .forEach(p -> sheet.append(String.format(Locale.ROOT, "  %8.1f", MM * width * p)));
    sheet.append(System.lineSeparator());
    for (int j = second.size() - 1; j >= 0; j--) {
      sheet
          .append(String.format(Locale.ROOT, "  %16.1f", MM * height * second.positions().get(j)))
          .append("  ________".repeat(first.size()))
          .append(System.lineSeparator());
    }
    sheet.append(after("across: across, up: up", rule));
    return sheet.toString().replace(System.lineSeparator(), "\n");
  }

  private static String after(String at, TraverseRule rule) {
    return String.format(
        Locale.ROOT,
        "%nWith --csv the same points are printed as a table to fill in. In the case:%n%n    flux:%n"
            + "      traverse: {rule: %s, readings: readings.csv, speed: speed, at: {%s}}%n",
        rule.word(),
        at);
  }
}
