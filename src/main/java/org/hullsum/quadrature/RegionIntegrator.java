package org.hullsum.quadrature;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.PriorityQueue;
import org.apache.commons.numbers.core.Sum;

/**
 * Integrates over a list of cells to one common accuracy.
 *
 * <p>Each region starts with one small tensor rule. The most urgent region is refined again and
 * again: by a larger rule where the coefficients decay geometrically, direction by direction, and
 * otherwise by halving it in the direction that decays worse. No region is believed before two
 * rules of different sizes have agreed on it, unless its whole contribution is negligible.
 */
final class RegionIntegrator {
  private static final int FIRST_GAUSS = 10;
  private static final int FIRST_TRAPEZOID = 16;
  private static final int LARGEST_FIRST = 24;
  private static final int LOOKS = 7;
  private static final double GROWTH = 1.3;

  /** Part of the allowed error that one direction of one region may take. */
  private static final double SHARE = 0.25;

  /** Rounding of the integrand and of the sums, in units of ε·∬|f|. */
  private static final double ROUNDING = 50 * Math.ulp(1.0);

  /** Below this width, relative to its position, a region is not split any more. */
  private static final double NARROWEST = 0x1p-44;

  private final List<? extends Cell> cells;
  private final Accuracy accuracy;
  private final int accurate;
  private final int components;
  private final TensorSample sample;
  private final RegionAssessment assessment;
  private final List<Region> regions = new ArrayList<>();
  private final PriorityQueue<Region> queue =
      new PriorityQueue<>(
          (a, b) -> {
            int byUrgency = Double.compare(b.urgency, a.urgency);
            return byUrgency != 0 ? byUrgency : Integer.compare(a.order, b.order);
          });
  private final double[] error;
  private final double[] magnitude;
  private final double[] magnitudeError;
  private long evaluations;
  private int made;
  private Optional<ParameterPoint> nonFiniteAt = Optional.empty();
  private Optional<ParameterPoint> surprise = Optional.empty();

  /**
   * @param cells what to integrate over, at least one
   * @param accurate number of components, from the first, that are to reach the accuracy
   * @param spent evaluations already spent on the problem
   */
  RegionIntegrator(List<? extends Cell> cells, Accuracy accuracy, int accurate, long spent) {
    this.cells = cells;
    this.accuracy = accuracy;
    this.accurate = accurate;
    components = cells.get(0).components();
    sample = new TensorSample(components);
    assessment = new RegionAssessment(sample, accuracy.magnitudeRelative());
    error = new double[components];
    magnitude = new double[components];
    magnitudeError = new double[components];
    evaluations = spent;
  }

  /** Where a cell turned out not to be what it was made for; the integrals then mean nothing. */
  Optional<ParameterPoint> surprise() {
    return surprise;
  }

  long evaluations() {
    return evaluations;
  }

  /** Refines until the accuracy or a limit is reached. */
  Integral[] integrate() {
    for (Cell cell : cells) {
      Region region =
          new Region(
              cell,
              made++,
              new double[] {0, 1, 0, 1},
              first(cell.periodicX()),
              first(cell.periodicY()));
      look(region, region.ruleX, region.ruleY);
      if (stopped()) {
        return result();
      }
      regions.add(region);
    }
    regions.forEach(this::enqueue);
    boolean room = true;
    while (room && !stopped() && !converged() && !queue.isEmpty()) {
      room = refine(queue.poll());
    }
    return result();
  }

  private static DirectionRule first(boolean periodic) {
    return periodic ? new TrapezoidRule(FIRST_TRAPEZOID) : GaussRule.of(FIRST_GAUSS);
  }

  private boolean stopped() {
    return nonFiniteAt.isPresent() || surprise.isPresent();
  }

  /** Applies a rule to a region and corrects the running sums; false where the limit forbids it. */
  private boolean look(Region region, DirectionRule ruleX, DirectionRule ruleY) {
    long cost = (long) ruleX.size() * ruleY.size();
    if (evaluations + cost > accuracy.evaluationLimit()) {
      if (region.looks == 0) {
        java.util.Arrays.fill(region.error, Double.POSITIVE_INFINITY);
        add(region, 1);
      }
      return false;
    }
    evaluations += cost;
    if (!sample.take(region, ruleX, ruleY)) {
      surprise = Optional.of(region.cell.surprise());
      return false;
    }
    nonFiniteAt = sample.nonFiniteAt();
    if (nonFiniteAt.isPresent()) {
      return false;
    }
    if (region.looks > 0) {
      add(region, -1);
    }
    assessment.enter(region, ruleX, ruleY, magnitude);
    add(region, 1);
    return true;
  }

  private void add(Region region, double sign) {
    for (int c = 0; c < components; c++) {
      error[c] += sign * region.error[c];
      magnitude[c] += sign * region.magnitude[c];
      magnitudeError[c] += sign * region.magnitudeError[c];
    }
  }

  private void enqueue(Region region) {
    double urgency = 0;
    double byMagnitude = 0;
    for (int c = 0; c < accurate; c++) {
      urgency = Math.max(urgency, part(region.error[c], accuracy.tolerance(magnitude[c])));
      byMagnitude =
          Math.max(
              byMagnitude,
              part(region.magnitudeError[c], accuracy.magnitudeTolerance(magnitude[c])));
    }
    region.urgency = Math.max(urgency, byMagnitude);
    region.magnitudeIsUrgent = byMagnitude > 1.0 / regions.size() && urgency * regions.size() < 1;
    queue.add(region);
  }

  private static double part(double error, double allowed) {
    return error == 0 ? 0 : error / allowed;
  }

  private boolean converged() {
    if (!withinRequest()) {
      return false;
    }
    // The running sums drift by cancellation: decide on sums taken afresh.
    java.util.Arrays.fill(error, 0);
    java.util.Arrays.fill(magnitude, 0);
    java.util.Arrays.fill(magnitudeError, 0);
    regions.forEach(region -> add(region, 1));
    return withinRequest();
  }

  private boolean withinRequest() {
    for (int c = 0; c < accurate; c++) {
      if (!reached(c)) {
        return false;
      }
    }
    return true;
  }

  private boolean reached(int c) {
    return error[c] + ROUNDING * magnitude[c] <= accuracy.tolerance(magnitude[c])
        && magnitudeError[c] <= accuracy.magnitudeTolerance(magnitude[c]);
  }

  /** Refines one region by a larger rule or by halving; false where the limit forbids it. */
  private boolean refine(Region region) {
    int neededX = 0;
    int neededY = 0;
    for (int c = 0; c < accurate; c++) {
      double share = SHARE * accuracy.tolerance(magnitude[c]) / regions.size();
      neededX = Math.max(neededX, region.neededX(c, share));
      neededY = Math.max(neededY, region.neededY(c, share));
    }
    boolean hopeless =
        neededX > region.ruleX.largestSize()
            || neededY > region.ruleY.largestSize()
            || region.looks >= LOOKS
            || region.magnitudeIsUrgent && region.looks > 1;
    if (hopeless) {
      return split(region, neededX, neededY);
    }
    boolean again =
        look(region, larger(region, region.ruleX, neededX), larger(region, region.ruleY, neededY));
    if (again) {
      enqueue(region);
    }
    return again;
  }

  /** A rule that differs from the present one and is no smaller than needed. */
  private static DirectionRule larger(Region region, DirectionRule rule, int needed) {
    int least = region.looks > 1 ? (int) Math.ceil(GROWTH * rule.size()) : rule.size() + 2;
    return rule.ofSize(Math.max(least, needed));
  }

  private boolean split(Region region, int neededX, int neededY) {
    boolean mayX = wide(region.fromX, region.toX);
    boolean mayY = wide(region.fromY, region.toY);
    if (!mayX && !mayY) {
      return true;
    }
    boolean inX = mayX && (!mayY || worseInX(region, neededX, neededY));
    double middle = inX ? middle(region.fromX, region.toX) : middle(region.fromY, region.toY);
    DirectionRule ruleX = inX ? GaussRule.of(FIRST_GAUSS) : start(region.ruleX, neededX);
    DirectionRule ruleY = inX ? start(region.ruleY, neededY) : GaussRule.of(FIRST_GAUSS);
    if (evaluations + 2L * ruleX.size() * ruleY.size() > accuracy.evaluationLimit()) {
      return false;
    }
    double[] low = {region.fromX, region.toX, region.fromY, region.toY};
    double[] high = low.clone();
    low[inX ? 1 : 3] = middle;
    high[inX ? 0 : 2] = middle;
    add(region, -1);
    Region first = new Region(region.cell, region.order, low, ruleX, ruleY);
    Region second = new Region(region.cell, made++, high, ruleX, ruleY);
    regions.set(region.order, first);
    regions.add(second);
    if (look(first, ruleX, ruleY) && look(second, ruleX, ruleY)) {
      enqueue(first);
      enqueue(second);
      return true;
    }
    return false;
  }

  private boolean worseInX(Region region, int neededX, int neededY) {
    double beyondX = (double) neededX / region.ruleX.largestSize();
    double beyondY = (double) neededY / region.ruleY.largestSize();
    if (beyondX > 1 != beyondY > 1) {
      return beyondX > beyondY;
    }
    double openX = 0;
    double openY = 0;
    for (int c = 0; c < accurate; c++) {
      double allowed = accuracy.tolerance(magnitude[c]);
      openX = Math.max(openX, part(region.errorX(c), allowed));
      openY = Math.max(openY, part(region.errorY(c), allowed));
    }
    return openX == openY ? region.toX - region.fromX >= region.toY - region.fromY : openX > openY;
  }

  private static boolean wide(double from, double to) {
    return to - from > NARROWEST * Math.max(Math.abs(from), Math.abs(to));
  }

  private static double middle(double from, double to) {
    return from + 0.5 * (to - from);
  }

  /** The first rule of a half in the direction that was not halved. */
  private static DirectionRule start(DirectionRule rule, int needed) {
    int least = rule instanceof TrapezoidRule ? FIRST_TRAPEZOID : FIRST_GAUSS;
    boolean known = needed <= rule.largestSize();
    return rule.ofSize(known ? Math.max(least, Math.min(needed, LARGEST_FIRST)) : least);
  }

  private Integral[] result() {
    Integral[] integrals = new Integral[components];
    for (int c = 0; c < components; c++) {
      if (nonFiniteAt.isPresent()) {
        integrals[c] = Integral.notFinite(nonFiniteAt.get(), evaluations);
        continue;
      }
      Sum value = Sum.create();
      Sum bound = Sum.create();
      Sum size = Sum.create();
      Sum sizeError = Sum.create();
      for (Region region : regions) {
        value.add(region.value[c]);
        bound.add(region.error[c]);
        size.add(region.magnitude[c]);
        sizeError.add(region.magnitudeError[c]);
      }
      error[c] = bound.getAsDouble();
      magnitude[c] = size.getAsDouble();
      magnitudeError[c] = sizeError.getAsDouble();
      Integral.Status status = reached(c) ? Integral.Status.REACHED : Integral.Status.NOT_REACHED;
      integrals[c] =
          new Integral(
              value.getAsDouble(),
              error[c] + ROUNDING * magnitude[c],
              magnitude[c],
              evaluations,
              status);
    }
    return integrals;
  }
}
