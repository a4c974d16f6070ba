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

  private final List<Statement> statements = new ArrayList<>();

  CorrelationReader(FormulaReader formulas) {
    this.formulas = formulas;
  }

  void meters(String patch, String input) {
    meters.putIfAbsent(patch, input);
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
      String other = statement.other().text();
      if (!patches.contains(other)) {
        refuse(
            statement.other(),
            ProblemKind.UNKNOWN_NAME,
            "there is no patch " + statement.other().shown() + Nearest.hint(other, patches));
      } else if (other.equals(statement.patch())) {
        refuse(
            statement.other(),
            ProblemKind.WRONG_VALUE,
            "a figure is not correlated with itself; name another patch");
      } else if (!meters.containsKey(other) || !meters.containsKey(statement.patch())) {
        refuse(
            statement.other(),
            ProblemKind.WRONG_VALUE,
            "a correlation is between two metered figures; `"
                + (meters.containsKey(other) ? statement.patch() : other)
                + "` has none");
      } else if (!seen.add(Set.of(other, statement.patch()))) {
        refuse(
            statement.other(),
            ProblemKind.WRONG_VALUE,
            "the correlation of `"
                + statement.patch()
                + "` and `"
                + other
                + "` is stated already; state it once");
      } else if (meters.get(other).equals(meters.get(statement.patch()))) {
        refuse(
            statement.other(),
            ProblemKind.WRONG_VALUE,
            "both patches are metered by the same parameter, which is wholly correlated");
      } else {
        correlations.add(
            new Correlation(
                meters.get(statement.patch()), meters.get(other), statement.coefficient()));
      }
    }
    refuseImpossible(correlations);
    return correlations;
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
