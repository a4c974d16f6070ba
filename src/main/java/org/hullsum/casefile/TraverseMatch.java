package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;
import org.hullsum.quadrature.TraverseError;
import org.hullsum.quadrature.TraverseLine;
import org.hullsum.quadrature.TraverseRule;

/**
 * Holds the places of readings against those of a rule and gives each its weight. A reading may be
 * off by the smaller of 0.5 % of the diameter, or side, and 5 % of the distance from the wall (ISO
 * 3966, from memory); radii by 2 degrees. A set with a reading missing is refused: the weights hold
 * for whole sets only.
 */
final class TraverseMatch {
  private static final double OF_DIAMETER = 0.005;
  private static final double OF_WALL_DISTANCE = 0.05;
  private static final double OF_ANGLE = Math.toRadians(2);

  /** Two diameters, or as many radii as tell a slope across the section. */
  private static final int FEWEST_RADII = 3;

  /**
   * What a rule makes of the readings.
   *
   * @param weights one for each
   * @param error the largest relative error of the rule over power-law profiles
   */
  record Weighed(List<Double> weights, double error) {}

  private final TraverseRule rule;
  private final DuctSection section;
  private final List<TraversePoint> points;
  private final Place table;
  private final TraverseText text;
  private final ProblemAccumulator problems;

  TraverseMatch(
      TraverseRule rule,
      DuctSection section,
      List<TraversePoint> points,
      Place table,
      TraverseText text,
      ProblemAccumulator problems) {
    this.rule = rule;
    this.section = section;
    this.points = List.copyOf(points);
    this.table = table;
    this.text = text;
    this.problems = problems;
  }

  /** Empty, and told, where the readings are not those of the rule. */
  Optional<Weighed> weigh() {
    return section.round() ? onRadii() : onGrid();
  }

  private static List<Double> boxed(double[] weights) {
    return Arrays.stream(weights).boxed().toList();
  }

  private void refuse(Place place, String message) {
    problems.add(ProblemKind.WRONG_VALUE, place, message);
  }

  /** The readings on one radius, from the centre to the wall. */
  private record Radius(double angle, List<Integer> readings) {}

  private Optional<Weighed> onRadii() {
    List<Radius> radii = radii();
    if (radii.size() < FEWEST_RADII) {
      refuse(
          table,
          "a traverse of a round section has readings on two diameters or on three radii or more,"
              + " equally spaced; here "
              + (radii.size() == 1 ? "is one radius" : "are " + radii.size() + " radii"));
      return Optional.empty();
    }
    if (!equallySpaced(radii)) {
      return Optional.empty();
    }
    int most = radii.stream().mapToInt(r -> r.readings().size()).max().orElseThrow();
    int fewest = radii.stream().mapToInt(r -> r.readings().size()).min().orElseThrow();
    if (!rule.onRadius(most) || most - fewest > 1) {
      Radius odd =
          radii.stream()
              .filter(r -> r.readings().size() == (rule.onRadius(most) ? fewest : most))
              .findFirst()
              .orElseThrow();
      refuse(
          points.get(odd.readings().get(0)).place(),
          "`"
              + rule.word()
              + "` has "
              + rule.countsOnRadius()
              + " readings on a radius, as many on each; on the radius at "
              + TraverseText.degrees(odd.angle())
              + " there are "
              + odd.readings().size());
      return Optional.empty();
    }
    TraverseLine line = rule.radius(most);
    double[] weights = new double[points.size()];
    boolean good = true;
    for (Radius radius : radii) {
      good &= place(radius, line, radii.size(), weights);
    }
    return good
        ? Optional.of(new Weighed(boxed(weights), TraverseError.onRadius(line)))
        : Optional.empty();
  }

  private List<Radius> radii() {
    List<Integer> byAngle = new ArrayList<>();
    for (int i = 0; i < points.size(); i++) {
      byAngle.add(i);
    }
    byAngle.sort(Comparator.comparingDouble(i -> turn(points.get(i).second())));
    List<Radius> radii = new ArrayList<>();
    for (int i : byAngle) {
      double angle = turn(points.get(i).second());
      boolean same =
          !radii.isEmpty() && angle - radii.get(radii.size() - 1).angle() <= 2 * OF_ANGLE;
      if (!same) {
        radii.add(new Radius(angle, new ArrayList<>()));
      }
      radii.get(radii.size() - 1).readings().add(i);
    }
    radii.forEach(r -> r.readings().sort(Comparator.comparingDouble(i -> points.get(i).first())));
    return radii;
  }

  /** From 0 to 2π; what is a little short of a full turn counts as none. */
  private static double turn(double angle) {
    double turn = angle - 2 * Math.PI * Math.floor(angle / (2 * Math.PI));
    return turn > 2 * Math.PI - OF_ANGLE ? turn - 2 * Math.PI : turn;
  }

  private boolean equallySpaced(List<Radius> radii) {
    double step = 2 * Math.PI / radii.size();
    for (int i = 0; i < radii.size(); i++) {
      double expected = radii.get(0).angle() + i * step;
      if (Math.abs(radii.get(i).angle() - expected) > OF_ANGLE) {
        refuse(
            points.get(radii.get(i).readings().get(0)).place(),
            "the "
                + radii.size()
                + " radii are equally spaced, so this one stands at "
                + TraverseText.degrees(expected)
                + ", give or take "
                + TraverseText.degrees(OF_ANGLE)
                + "; here it is at "
                + TraverseText.degrees(radii.get(i).angle()));
        return false;
      }
    }
    return true;
  }

  /** Weighs the readings of one radius; false where one is missing or off. */
  private boolean place(Radius radius, TraverseLine line, int radii, double[] weights) {
    List<Integer> readings = radius.readings();
    int missing = readings.size() < line.size() ? missing(readings, line.positions()) : line.size();
    if (missing < line.size()) {
      refuse(
          points.get(readings.get(0)).place(),
          "no reading at "
              + text.onRadius(line.positions().get(missing))
              + " on the radius at "
              + TraverseText.degrees(radius.angle())
              + TraverseText.REMEDY_FOR_MISSING);
      return false;
    }
    boolean good = true;
    for (int i = 0; i < readings.size(); i++) {
      TraversePoint point = points.get(readings.get(i));
      double expected = line.positions().get(i);
      double allowed = Math.min(2 * OF_DIAMETER, OF_WALL_DISTANCE * (1 - expected));
      weights[readings.get(i)] = line.weights().get(i) / radii;
      if (!point.read()) {
        refuse(point.place(), "no reading here" + TraverseText.REMEDY_FOR_MISSING);
        good = false;
      } else if (Math.abs(point.first() - expected) > allowed) {
        refuse(point.place(), text.off(rule, "from the centre", point.first(), expected, allowed));
        good = false;
      }
    }
    return good;
  }

  /** Which of the positions has no reading, given that one is missing. */
  private int missing(List<Integer> readings, List<Double> positions) {
    int best = 0;
    double least = Double.POSITIVE_INFINITY;
    for (int gap = 0; gap < positions.size(); gap++) {
      double worst = 0;
      for (int i = 0; i < readings.size(); i++) {
        double expected = positions.get(i < gap ? i : i + 1);
        worst = Math.max(worst, Math.abs(points.get(readings.get(i)).first() - expected));
      }
      if (worst < least) {
        least = worst;
        best = gap;
      }
    }
    return best;
  }

  /** The readings on the nearest points of a grid. */
  private record Grid(TraverseLine across, TraverseLine up, List<Integer> at, double worst) {
    int cells() {
      return across.size() * up.size();
    }
  }

  private Optional<Weighed> onGrid() {
    Optional<Grid> best = bestGrid();
    if (best.isEmpty()) {
      refuse(
          table,
          "`"
              + rule.word()
              + "` has "
              + (rule.forRectangles()
                  ? rule.countsOnSide() + " readings along each side; "
                  : "no set for rectangles, take log-tchebycheff, equal-area or gauss; ")
              + "here are "
              + points.size()
              + " readings");
      return Optional.empty();
    }
    Grid grid = best.get();
    double[] weights = new double[points.size()];
    boolean good = true;
    int[] taken = new int[grid.cells()];
    Arrays.fill(taken, -1);
    for (int i = 0; i < points.size(); i++) {
      int first = grid.at().get(i) % grid.across().size();
      int second = grid.at().get(i) / grid.across().size();
      weights[i] = grid.across().weights().get(first) * grid.up().weights().get(second);
      good &= stands(points.get(i), grid.across().positions().get(first), true);
      good &= stands(points.get(i), grid.up().positions().get(second), false);
      if (taken[grid.at().get(i)] >= 0 && good) {
        refuse(
            points.get(i).place(),
            "two readings at one point of the rule; the other is at "
                + points.get(taken[grid.at().get(i)]).place());
        good = false;
      }
      taken[grid.at().get(i)] = i;
    }
    return good && complete(grid, taken)
        ? Optional.of(new Weighed(boxed(weights), TraverseError.onSides(grid.across(), grid.up())))
        : Optional.empty();
  }

  private boolean complete(Grid grid, int[] taken) {
    boolean good = true;
    for (int cell = 0; cell < taken.length; cell++) {
      if (taken[cell] < 0) {
        refuse(
            table,
            "no reading at "
                + text.onSides(
                    grid.across().positions().get(cell % grid.across().size()),
                    grid.up().positions().get(cell / grid.across().size()))
                + TraverseText.REMEDY_FOR_MISSING);
        good = false;
      } else if (!points.get(taken[cell]).read()) {
        refuse(
            points.get(taken[cell]).place(), "no reading here" + TraverseText.REMEDY_FOR_MISSING);
        good = false;
      }
    }
    return good;
  }

  private boolean stands(TraversePoint point, double expected, boolean across) {
    double found = across ? point.first() : point.second();
    double wall = Math.min(expected, 1 - expected);
    double allowed = Math.min(OF_DIAMETER, OF_WALL_DISTANCE * wall);
    if (Math.abs(found - expected) <= allowed) {
      return true;
    }
    refuse(
        point.place(),
        across
            ? text.off(rule, "along the first edge", found, expected, allowed)
            : text.offUp(rule, found, expected, allowed));
    return false;
  }

  /** The grid of the rule that the readings come nearest to, whole or short of one reading. */
  private Optional<Grid> bestGrid() {
    Optional<Grid> best = Optional.empty();
    for (int m = 1; m <= points.size() + 1; m++) {
      for (int n = (points.size() + m - 1) / m; m * n <= points.size() + 1; n++) {
        if (rule.onSide(m) && rule.onSide(n)) {
          Grid grid = grid(rule.side(m), rule.side(n));
          boolean whole = best.isPresent() && best.get().cells() == points.size();
          boolean better =
              best.isEmpty()
                  || grid.worst() < best.get().worst()
                  || (grid.worst() == best.get().worst() && !whole);
          best = better ? Optional.of(grid) : best;
        }
      }
    }
    return best;
  }

  private Grid grid(TraverseLine across, TraverseLine up) {
    int[] at = new int[points.size()];
    double worst = 0;
    for (int i = 0; i < at.length; i++) {
      int first = nearest(across.positions(), points.get(i).first());
      int second = nearest(up.positions(), points.get(i).second());
      at[i] = first + across.size() * second;
      worst =
          Math.max(
              worst,
              Math.max(
                  Math.abs(across.positions().get(first) - points.get(i).first()),
                  Math.abs(up.positions().get(second) - points.get(i).second())));
    }
    // Readings that share a point are no set of this grid, however near they stand to it.
    long distinct = Arrays.stream(at).distinct().count();
    return new Grid(
        across, up, Arrays.stream(at).boxed().toList(), distinct < at.length ? worst + 1 : worst);
  }

  private static int nearest(List<Double> positions, double at) {
    int best = 0;
    for (int i = 1; i < positions.size(); i++) {
      if (Math.abs(positions.get(i) - at) < Math.abs(positions.get(best) - at)) {
        best = i;
      }
    }
    return best;
  }
}
