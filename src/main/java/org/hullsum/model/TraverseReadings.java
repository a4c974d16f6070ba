package org.hullsum.model;

import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * The readings of a traverse as they enter its mean, for people and pictures; the flux itself is a
 * formula of inputs. Speeds are along the construction normal, in {@link #unit}.
 *
 * @param rule the word of the rule
 * @param source the standard of its positions, or how it integrates
 * @param round whether the section is a disk, else a rectangle
 * @param unit of the speeds, {@code 1} where the case has none
 * @param readings in the order of the file
 * @param swirl mean angle between flow and normal, in degrees; empty where only speeds were read
 */
public record TraverseReadings(
    String rule,
    String source,
    boolean round,
    String unit,
    List<Reading> readings,
    Optional<Double> swirl) {

  /**
   * One reading.
   *
   * @param first share of the radius from the centre, or of the first edge from the corner
   * @param second angle in degrees, or share of the second edge
   * @param speed along the normal
   * @param weight share in the mean
   */
  public record Reading(double first, double second, double speed, double weight) {}

  public TraverseReadings {
    Objects.requireNonNull(rule, "rule");
    Objects.requireNonNull(source, "source");
    Objects.requireNonNull(unit, "unit");
    Objects.requireNonNull(swirl, "swirl");
    readings = List.copyOf(readings);
    if (readings.isEmpty()) {
      throw new IllegalArgumentException("a traverse without readings");
    }
  }

  /** The mean speed over the section. */
  public double mean() {
    return readings.stream().mapToDouble(r -> r.weight * r.speed).sum();
  }

  /** The largest speed along the mean flow, with its sign. */
  public double largest() {
    double sense = Math.signum(mean());
    return readings.stream()
        .mapToDouble(Reading::speed)
        .reduce((a, b) -> sense * a >= sense * b ? a : b)
        .orElseThrow();
  }

  /**
   * The largest speed over the mean: 1 for a flat profile, 2 for a laminar one in a pipe; empty
   * where the mean is zero.
   */
  public Optional<Double> largestToMean() {
    return mean() == 0 ? Optional.empty() : Optional.of(largest() / mean());
  }

  /** The standard deviation of the speed over the section, over the mean; empty for a zero mean. */
  public Optional<Double> variation() {
    double mean = mean();
    double sum =
        readings.stream()
            .mapToDouble(r -> Math.abs(r.weight) * (r.speed - mean) * (r.speed - mean))
            .sum();
    return mean == 0 ? Optional.empty() : Optional.of(Math.sqrt(sum) / Math.abs(mean));
  }

  /** The same for the other side of the section. */
  public TraverseReadings reversed() {
    List<Reading> turned =
        readings.stream().map(r -> new Reading(r.first, r.second, -r.speed, r.weight)).toList();
    return new TraverseReadings(rule, source, round, unit, turned, swirl);
  }
}
