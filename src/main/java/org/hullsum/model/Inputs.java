package org.hullsum.model;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/**
 * The named numbers of a case and how they depend on one another.
 *
 * @param all by name, in the order of the file
 * @param correlations between the uncertainties of pairs of figures, each pair once
 */
public record Inputs(Map<String, Input> all, List<Correlation> correlations) {
  /**
   * The correlation coefficient of two figures.
   *
   * @param first name of an input
   * @param second name of another
   * @param coefficient from −1 to 1
   */
  public record Correlation(String first, String second, double coefficient) {
    public Correlation {
      Objects.requireNonNull(first, "first");
      Objects.requireNonNull(second, "second");
      if (!(Math.abs(coefficient) <= 1)) {
        throw new IllegalArgumentException("correlation coefficient " + coefficient);
      }
    }
  }

  public Inputs {
    all = Collections.unmodifiableMap(new LinkedHashMap<>(all));
    correlations = List.copyOf(correlations);
  }

  /** The value of every input by name, in working units: the constants of every formula. */
  public Map<String, Double> values() {
    Map<String, Double> values = new LinkedHashMap<>();
    all.forEach((name, input) -> values.put(name, input.value()));
    return Collections.unmodifiableMap(values);
  }
}
