package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.expression.ParsedExpression;
import org.hullsum.expression.Symbols;
import org.hullsum.model.Input;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;
import org.hullsum.units.MeasuredQuantity;

/**
 * Reads the parameters: figures, measured figures, and formulas of one another in any order. They
 * are put in order by Kahn's algorithm (A. B. Kahn, Topological sorting of large networks, CACM 5,
 * 1962); what is left over holds the cycles.
 */
final class ParameterReader {
  private final FormulaReader formulas;
  private final MeasuredReader measured;
  private final CaseScope scope;
  private final ProblemAccumulator problems;
  private final Map<String, YamlText> stated = new LinkedHashMap<>();
  private final Map<String, ParsedExpression> parsed = new LinkedHashMap<>();
  private final Map<String, Place> places = new LinkedHashMap<>();

  ParameterReader(FormulaReader formulas, MeasuredReader measured) {
    this.formulas = formulas;
    this.measured = measured;
    this.scope = formulas.scope();
    this.problems = scope.problems();
  }

  /**
   * Reads all parameters into the scope.
   *
   * @param overrides texts by name that stand in the place of those of the file
   */
  void readAll(Optional<YamlValue> parameters, Map<String, String> overrides) {
    parameters
        .flatMap(v -> formulas.values().map(v, "`parameters`", "from names to values"))
        .ifPresent(map -> map.entries().forEach(this::declare));
    override(overrides);
    parseAll();
    for (String name : inOrder()) {
      define(name);
    }
  }

  private void declare(YamlMap.Entry entry) {
    String name = entry.name();
    Optional<String> fault = NameRules.faultOfParameter(name);
    if (fault.isPresent()) {
      problems.add(
          ProblemKind.BAD_NAME,
          entry.key().place(),
          "a parameter can't be called " + entry.key().shown() + ": " + fault.get());
    }
    scope.declare(name);
    formulas
        .values()
        .text(entry.value(), "the parameter `" + name + "`")
        .filter(text -> fault.isEmpty())
        .ifPresent(text -> stated.put(name, text));
    places.put(name, entry.key().place());
  }

  private void override(Map<String, String> overrides) {
    overrides.forEach(
        (name, value) -> {
          String origin = "--set " + name;
          if (!places.containsKey(name)) {
            problems.add(
                ProblemKind.UNKNOWN_NAME,
                Place.wholeFile(origin),
                "the case has no parameter `" + name + "`" + Nearest.hint(name, places.keySet()));
            return;
          }
          Optional<YamlText> before = Optional.ofNullable(stated.get(name));
          scope.note(
              "`"
                  + name
                  + "` is "
                  + YamlText.quoted(value)
                  + " by --set"
                  + before.map(t -> ", in place of " + t.shown() + " of the file").orElse("")
                  + ".");
          SourceText source = new SourceText(origin, value);
          stated.put(
              name, new YamlText(value, YamlText.Style.PLAIN, false, 0, value.length(), source));
        });
  }

  /** The parameters, each after those that it needs; cycles are reported and left out. */
  private List<String> inOrder() {
    Map<String, Set<String>> waiting = new LinkedHashMap<>();
    Map<String, List<String>> dependents = new LinkedHashMap<>();
    List<String> ready = new ArrayList<>();
    for (String name : stated.keySet()) {
      Set<String> needs = needs(name);
      needs.forEach(n -> dependents.computeIfAbsent(n, x -> new ArrayList<>()).add(name));
      if (needs.isEmpty()) {
        ready.add(name);
      } else {
        waiting.put(name, needs);
      }
    }
    for (int i = 0; i < ready.size(); i++) {
      for (String dependent : dependents.getOrDefault(ready.get(i), List.of())) {
        Set<String> rest = waiting.get(dependent);
        rest.remove(ready.get(i));
        if (rest.isEmpty()) {
          waiting.remove(dependent);
          ready.add(dependent);
        }
      }
    }
    reportCycles(waiting);
    return ready;
  }

  /** The stated parameters that a parameter's formula refers to. */
  private Set<String> needs(String name) {
    Set<String> symbols =
        new LinkedHashSet<>(
            Optional.ofNullable(parsed.get(name)).map(p -> Symbols.in(p.root())).orElse(Set.of()));
    symbols.retainAll(stated.keySet());
    return symbols;
  }

  private void parseAll() {
    for (Map.Entry<String, YamlText> entry : List.copyOf(stated.entrySet())) {
      if (MeasuredReader.hasUncertainty(entry.getValue().text())) {
        continue;
      }
      formulas
          .parse(entry.getValue(), need(entry.getKey()))
          .ifPresentOrElse(p -> parsed.put(entry.getKey(), p), () -> stated.remove(entry.getKey()));
    }
  }

  private static Need need(String name) {
    return Need.any("the parameter `" + name + "`");
  }

  /** One problem for each loop: walking from any parameter left over must come to one. */
  private void reportCycles(Map<String, Set<String>> waiting) {
    Set<String> seen = new LinkedHashSet<>();
    for (String start : waiting.keySet()) {
      List<String> path = new ArrayList<>();
      Set<String> onPath = new LinkedHashSet<>();
      String at = start;
      while (seen.add(at)) {
        path.add(at);
        onPath.add(at);
        at = waiting.get(at).stream().filter(waiting::containsKey).findFirst().orElse(at);
      }
      if (onPath.contains(at)) {
        List<String> loop = new ArrayList<>(path.subList(path.indexOf(at), path.size()));
        loop.add(at);
        problems.add(
            ProblemKind.CYCLE,
            places.get(at),
            loop.size() == 2
                ? "the parameter `" + at + "` is defined by itself"
                : "the parameters " + String.join(" → ", loop) + " are defined by one another");
      }
    }
  }

  private void define(String name) {
    YamlText text = stated.get(name);
    Place place = places.get(name);
    if (MeasuredReader.hasUncertainty(text.text())) {
      measured.figure(text).ifPresent(figure -> defineFigure(name, place, figure));
      return;
    }
    Optional<Formula> formula = formulas.formula(text, Need.any("the parameter `" + name + "`"));
    Optional<Double> value = formula.map(Formula::expression).flatMap(scope::value);
    if (value.isEmpty()) {
      return;
    }
    if (!Double.isFinite(value.get())) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          text.place(),
          "the parameter `" + name + "` is not a finite number: it is " + value.get());
      return;
    }
    Expression expression = formula.get().expression();
    scope.define(
        new Input(
            name,
            value.get(),
            0,
            Double.POSITIVE_INFINITY,
            Figures.isFigure(expression) ? Optional.empty() : Optional.of(expression),
            false,
            place,
            MeasuredReader.statedUnit(text)),
        formula.get().dimension());
  }

  private void defineFigure(String name, Place place, MeasuredQuantity figure) {
    Optional<Dimension> dimension =
        figure.quantity().bare() || scope.working().none()
            ? Optional.empty()
            : Optional.of(figure.quantity().unit().dimension());
    scope.define(
        new Input(
            name,
            figure.quantity().in(scope.working()),
            figure.standardUncertaintyIn(scope.working()),
            figure.degreesOfFreedom(),
            Optional.empty(),
            false,
            place,
            figure.quantity().bare() ? Optional.empty() : Optional.of(figure.quantity().unit())),
        dimension);
  }
}
