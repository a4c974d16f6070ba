package org.hullsum.casefile;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Symbols;
import org.hullsum.model.Input;
import org.hullsum.problem.Place;
import org.hullsum.units.Dimension;
import org.hullsum.units.UncertaintyMeaning;
import org.hullsum.units.WorkingUnits;

/**
 * What the readers of one case's parts share: its units, its parameters and inline figures as they
 * become known, and where its problems and notes go. Not thread-safe.
 */
final class CaseScope {
  private final ProblemAccumulator problems;
  private final WorkingUnits working;
  private final Optional<UncertaintyMeaning> usualMeaning;

  /** Every declared parameter; without a dimension where it is bare or was refused. */
  private final Map<String, Optional<Dimension>> dimensions = new LinkedHashMap<>();

  private final Map<String, Input> inputs = new LinkedHashMap<>();
  private final Map<String, Double> values = new LinkedHashMap<>();
  private final Set<String> notes = new LinkedHashSet<>();
  private final Set<String> used = new LinkedHashSet<>();
  private Optional<Place> firstUseOfTime = Optional.empty();

  CaseScope(
      ProblemAccumulator problems,
      WorkingUnits working,
      Optional<UncertaintyMeaning> usualMeaning) {
    this.problems = problems;
    this.working = working;
    this.usualMeaning = usualMeaning;
  }

  ProblemAccumulator problems() {
    return problems;
  }

  WorkingUnits working() {
    return working;
  }

  /** The meaning of uncertainty figures that state none. */
  Optional<UncertaintyMeaning> usualMeaning() {
    return usualMeaning;
  }

  void declare(String parameter) {
    dimensions.put(parameter, Optional.empty());
  }

  /** The dimension of every declared parameter. */
  Map<String, Optional<Dimension>> dimensions() {
    return Collections.unmodifiableMap(dimensions);
  }

  /** A parameter or inline figure that has been read; its name is new, or declared before. */
  void define(Input input, Optional<Dimension> dimension) {
    if (!input.inline()) {
      dimensions.put(input.name(), dimension);
    }
    inputs.put(input.name(), input);
    values.put(input.name(), input.value());
  }

  /** A name for an inline figure that no other has. */
  String freshName(String wanted) {
    String name = wanted;
    for (int i = 2; inputs.containsKey(name); i++) {
      name = wanted + " " + i;
    }
    return name;
  }

  Map<String, Input> inputs() {
    return Collections.unmodifiableMap(inputs);
  }

  Map<String, Double> values() {
    return Collections.unmodifiableMap(values);
  }

  /** Whether every symbol of a formula of parameters has a value, none having been refused. */
  boolean resolved(Expression e) {
    return values.keySet().containsAll(Symbols.in(e));
  }

  /** Whether every declared parameter has a value, so that surfaces can be built. */
  boolean complete() {
    return values.keySet().containsAll(dimensions.keySet());
  }

  /** The value of a formula of parameters; empty where one of them was refused. */
  Optional<Double> value(Expression e) {
    if (!resolved(e)) {
      return Optional.empty();
    }
    Map<String, Double> needed = new LinkedHashMap<>();
    Symbols.in(e).forEach(name -> needed.put(name, values.get(name)));
    BatchEvaluator evaluator = BatchEvaluator.compile(List.of(), needed, List.of(e));
    double[][] result = new double[1][1];
    evaluator.evaluate(new double[0][0], 1, result, evaluator.workspace());
    return Optional.of(result[0][0]);
  }

  void note(String sentence) {
    notes.add(sentence);
  }

  List<String> notes() {
    return List.copyOf(notes);
  }

  /** Something in the file refers to a parameter or a field. */
  void uses(String name) {
    used.add(name);
  }

  Set<String> usedNames() {
    return Collections.unmodifiableSet(used);
  }

  void usesTime(Place place) {
    if (firstUseOfTime.isEmpty()) {
      firstUseOfTime = Optional.of(place);
    }
  }

  Optional<Place> firstUseOfTime() {
    return firstUseOfTime;
  }
}
