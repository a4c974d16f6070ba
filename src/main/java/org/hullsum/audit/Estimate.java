package org.hullsum.audit;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.apache.commons.numbers.core.Sum;

/**
 * A computed rate: its value, a bound on its numerical error, and how it moves with each measured
 * figure.
 *
 * @param value in the rate unit of the case
 * @param error a bound on |value − true value| from integration and rounding, at least 0
 * @param sensitivities ∂value/∂input by the name of the input, per working unit of the input; an
 *     input that is absent does not matter
 */
record Estimate(double value, double error, Map<String, Double> sensitivities) {
  static final Estimate ZERO = new Estimate(0, 0, Map.of());

  Estimate {
    if (!(error >= 0)) {
      throw new IllegalArgumentException("error bound " + error);
    }
    // A negative zero would be printed.
    value += 0.0;
    sensitivities = Collections.unmodifiableMap(new TreeMap<>(sensitivities));
  }

  /** A value without error or uncertainty. */
  static Estimate exact(double value) {
    return new Estimate(value, 0, Map.of());
  }

  Estimate times(double factor) {
    Map<String, Double> scaled = new TreeMap<>();
    sensitivities.forEach((name, value) -> scaled.put(name, factor * value));
    return new Estimate(factor * value, Math.abs(factor) * error, scaled);
  }

  Estimate widened(double more) {
    return new Estimate(value, error + more, sensitivities);
  }

  Estimate plus(Estimate other) {
    return sum(List.of(this, other));
  }

  Estimate minus(Estimate other) {
    return sum(List.of(this, other.times(-1)));
  }

  /**
   * The sum in the order of the list, compensated; the error bounds add up, the sensitivities add
   * up with their signs.
   */
  static Estimate sum(List<Estimate> parts) {
    Sum value = Sum.create();
    Sum error = Sum.create();
    Map<String, Sum> sensitivities = new TreeMap<>();
    for (Estimate part : parts) {
      value.add(part.value);
      error.add(part.error);
      part.sensitivities.forEach(
          (name, sensitivity) ->
              sensitivities.computeIfAbsent(name, n -> Sum.create()).add(sensitivity));
    }
    Map<String, Double> net = new TreeMap<>();
    sensitivities.forEach((name, sum) -> net.put(name, sum.getAsDouble()));
    return new Estimate(value.getAsDouble(), error.getAsDouble(), net);
  }

  /** Σ weight · part, the weights in the order of the parts. */
  static Estimate weighted(List<Estimate> parts, double[] weights) {
    if (parts.size() != weights.length) {
      throw new IllegalArgumentException(parts.size() + " parts, " + weights.length + " weights");
    }
    List<Estimate> scaled = new ArrayList<>();
    for (int i = 0; i < weights.length; i++) {
      scaled.add(parts.get(i).times(weights[i]));
    }
    return sum(scaled);
  }
}
