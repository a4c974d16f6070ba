package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.hullsum.model.Inputs.Correlation;
import org.hullsum.problem.ProblemKind;

/**
 * Collects which metered figures are correlated, patch by patch, and resolves them when all patches
 * have been read: each pair once, whichever patch states it.
 */
final class CorrelationReader {
  /** A statement at one patch about another. */
  private record Statement(String patch, YamlText other, double coefficient) {}

  private final FormulaReader formulas;

  /** The input behind the first metered figure of each patch. */
  private final Map<String, String> meters = new LinkedHashMap<>();

  private final Set<String> refused = new HashSet<>();
  private final List<Statement> statements = new ArrayList<>();

  CorrelationReader(FormulaReader formulas) {
    this.formulas = formulas;
  }

  void meters(String patch, String input) {
    meters.putIfAbsent(patch, input);
  }

  /** A metered figure that was refused: nothing more is said of its correlations. */
  void refused(String patch) {
    refused.add(patch);
  }

  void state(String patch, YamlValue value) {
    Optional<YamlMap> map =
        formulas.values().map(value, "`correlated-with`", "from patches to coefficients");
    for (YamlMap.Entry entry : map.map(YamlMap::entries).orElse(List.of())) {
      OptionalDouble coefficient =
          formulas.number(entry.value(), Need.plain("a correlation coefficient"));
      if (coefficient.isPresent() && !(Math.abs(coefficient.getAsDouble()) <= 1)) {
        refuse(
            entry.value(),
            ProblemKind.WRONG_VALUE,
            "a correlation coefficient is between -1 and 1");
      } else if (coefficient.isPresent()) {
        statements.add(new Statement(patch, entry.key(), coefficient.getAsDouble()));
      }
    }
  }

  /**
   * The correlations between inputs.
   *
   * @param patches the names of all patches
   */
  List<Correlation> resolve(Set<String> patches) {
    List<Correlation> correlations = new ArrayList<>();
    Set<Set<String>> seen = new HashSet<>();
    for (Statement statement : statements) {
      if (!refused.contains(statement.other().text()) && !refused.contains(statement.patch())) {
        resolve(statement, patches, seen).ifPresent(correlations::add);
      }
    }
    refuseImpossible(correlations);
    return correlations;
  }

  private Optional<Correlation> resolve(
      Statement statement, Set<String> patches, Set<Set<String>> seen) {
    String patch = statement.patch();
    String other = statement.other().text();
    Optional<String> fault = Optional.empty();
    if (!patches.contains(other)) {
      refuse(
          statement.other(),
          ProblemKind.UNKNOWN_NAME,
          "there is no patch " + statement.other().shown() + Nearest.hint(other, patches));
      return Optional.empty();
    }
    if (other.equals(patch)) {
      fault = Optional.of("a figure is not correlated with itself; name another patch");
    } else if (!meters.containsKey(other) || !meters.containsKey(patch)) {
      fault =
          Optional.of(
              "a correlation is between two metered figures; `"
                  + (meters.containsKey(other) ? patch : other)
                  + "` has none");
    } else if (!seen.add(Set.of(other, patch))) {
      fault =
          Optional.of(
              "the correlation of `"
                  + patch
                  + "` and `"
                  + other
                  + "` is stated already; once is"
                  + " enough");
    } else if (meters.get(other).equals(meters.get(patch))) {
      fault = Optional.of("both patches are metered by one parameter, which is wholly correlated");
    }
    if (fault.isPresent()) {
      refuse(statement.other(), ProblemKind.WRONG_VALUE, fault.get());
      return Optional.empty();
    }
    return Optional.of(
        new Correlation(meters.get(patch), meters.get(other), statement.coefficient()));
  }

  private void refuse(YamlValue value, ProblemKind kind, String message) {
    formulas.values().problems().add(kind, value.place(), message);
  }

  /** A matrix of correlations has no negative variance in any direction. */
  private void refuseImpossible(List<Correlation> correlations) {
    Map<String, Integer> index = new HashMap<>();
    for (Correlation c : correlations) {
      index.putIfAbsent(c.first(), index.size());
      index.putIfAbsent(c.second(), index.size());
    }
    double[][] matrix = new double[index.size()][index.size()];
    for (int i = 0; i < matrix.length; i++) {
      matrix[i][i] = 1;
    }
    for (Correlation c : correlations) {
      int i = index.get(c.first());
      int j = index.get(c.second());
      matrix[i][j] = c.coefficient();
      matrix[j][i] = c.coefficient();
    }
    if (!CorrelationMatrix.isPossible(matrix)) {
      refuse(
          statements.get(0).other(),
          ProblemKind.WRONG_VALUE,
          "the correlation coefficients contradict one another: some sum of the figures would have"
              + " a negative variance");
    }
  }
}
