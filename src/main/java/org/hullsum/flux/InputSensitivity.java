package org.hullsum.flux;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.Derivative;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Symbols;
import org.hullsum.model.Input;
import org.hullsum.model.Inputs;

/**
 * How everything depends on the uncertain inputs of a case, those that others define resolved by
 * the chain rule.
 *
 * <p>A <em>base</em> is an input with a standard uncertainty of its own; an input <em>varies</em>
 * where it is a base or is defined through one. With the partial derivatives ∂f/∂q by every varying
 * input q that occurs in a formula, df/db = Σ ∂f/∂q · dq/db for each base b.
 *
 * <p>Immutable.
 */
public final class InputSensitivity {
  /** The time in formulas. */
  public static final String TIME = "t";

  private final Inputs inputs;
  private final Map<String, Double> values;

  /** dq/db by the varying input q and the base b. */
  private final Map<String, Map<String, Double>> byBase;

  /**
   * The value of a formula of inputs and its derivative by each base on which it depends.
   *
   * @param value in working units
   * @param sensitivities by the base's name
   */
  public record Evaluated(double value, Map<String, Double> sensitivities) {
    public Evaluated {
      sensitivities = Collections.unmodifiableMap(new LinkedHashMap<>(sensitivities));
    }
  }

  private InputSensitivity(
      Inputs inputs, Map<String, Double> values, Map<String, Map<String, Double>> byBase) {
    this.inputs = inputs;
    this.values = values;
    this.byBase = byBase;
  }

  public static InputSensitivity of(Inputs inputs) {
    Map<String, Double> values = inputs.values();
    Map<String, Map<String, Double>> byBase = new LinkedHashMap<>();
    for (Input input : inputs.all().values()) {
      resolve(input, inputs, values, byBase);
    }
    byBase.values().removeIf(Map::isEmpty);
    return new InputSensitivity(inputs, values, byBase);
  }

  /** Definitions form no cycle: the reader of the case has refused those. */
  private static Map<String, Double> resolve(
      Input input,
      Inputs inputs,
      Map<String, Double> values,
      Map<String, Map<String, Double>> byBase) {
    Map<String, Double> known = byBase.get(input.name());
    if (known != null) {
      return known;
    }
    Map<String, Double> derivatives = new LinkedHashMap<>();
    if (input.definition().isPresent()) {
      Expression definition = input.definition().get();
      for (String symbol : Symbols.in(definition)) {
        Input other = inputs.all().get(symbol);
        if (other != null) {
          Map<String, Double> inner = resolve(other, inputs, values, byBase);
          if (!inner.isEmpty()) {
            double outer = number(Derivative.of(definition, symbol), values);
            inner.forEach((base, rate) -> derivatives.merge(base, outer * rate, Double::sum));
          }
        }
      }
    } else if (input.standardUncertainty() > 0) {
      derivatives.put(input.name(), 1.0);
    }
    byBase.put(input.name(), derivatives);
    return derivatives;
  }

  /** The value of every input by name. */
  public Map<String, Double> values() {
    return values;
  }

  /** The varying inputs among the symbols of the formulas. */
  Set<String> varyingIn(List<Expression> formulas) {
    Set<String> names = new LinkedHashSet<>();
    for (Expression formula : formulas) {
      Symbols.in(formula).stream().filter(byBase::containsKey).forEach(names::add);
    }
    return names;
  }

  /** The bases on which any of the given varying inputs depends. */
  Set<String> basesOf(Set<String> varying) {
    Set<String> bases = new LinkedHashSet<>();
    varying.forEach(name -> bases.addAll(byBase.get(name).keySet()));
    return bases;
  }

  /** The derivatives by the bases from those by the varying inputs. */
  Map<String, Double> toBases(Map<String, Double> partials) {
    Map<String, Double> derivatives = new LinkedHashMap<>();
    partials.forEach(
        (name, partial) ->
            byBase
                .get(name)
                .forEach((base, rate) -> derivatives.merge(base, partial * rate, Double::sum)));
    return derivatives;
  }

  double standardUncertainty(String base) {
    return inputs.all().get(base).standardUncertainty();
  }

  /** The values of all inputs when one base takes another value. */
  Map<String, Double> valuesWith(String base, double value) {
    Map<String, Double> changed = new LinkedHashMap<>();
    for (Input input : inputs.all().values()) {
      reevaluate(input, base, value, changed);
    }
    return changed;
  }

  private double reevaluate(Input input, String base, double value, Map<String, Double> changed) {
    Double known = changed.get(input.name());
    if (known != null) {
      return known;
    }
    double result = input.value();
    if (input.name().equals(base)) {
      result = value;
    } else if (byBase.getOrDefault(input.name(), Map.of()).containsKey(base)) {
      Expression definition = input.definition().orElseThrow();
      for (String symbol : Symbols.in(definition)) {
        Input other = inputs.all().get(symbol);
        if (other != null) {
          reevaluate(other, base, value, changed);
        }
      }
      result = number(definition, changed);
    }
    changed.put(input.name(), result);
    return result;
  }

  /**
   * A formula of inputs and, where an instant is given, {@code t}.
   *
   * @throws IllegalArgumentException where another symbol occurs in it
   */
  public Evaluated evaluate(Expression formula, OptionalDouble instant) {
    Map<String, Double> constants = at(instant, values);
    Map<String, Double> partials = new LinkedHashMap<>();
    for (String name : varyingIn(List.of(formula))) {
      partials.put(name, number(Derivative.of(formula, name), constants));
    }
    return new Evaluated(number(formula, constants), toBases(partials));
  }

  /** The figures on which a formula depends, those that others define resolved. */
  public Set<String> figuresIn(Expression formula) {
    Set<String> figures = new LinkedHashSet<>();
    for (String symbol : Symbols.in(formula)) {
      Input input = inputs.all().get(symbol);
      if (input != null && input.definition().isPresent()) {
        figures.addAll(figuresIn(input.definition().get()));
      } else if (input != null) {
        figures.add(symbol);
      }
    }
    return figures;
  }

  /** A formula of inputs where one figure is another. */
  public double valueWith(Expression formula, String figure, double other) {
    Map<String, Double> changed = new LinkedHashMap<>();
    for (String symbol : Symbols.in(formula)) {
      Input input = inputs.all().get(symbol);
      if (input != null) {
        changed.put(
            symbol,
            symbol.equals(figure)
                ? other
                : input.definition().isPresent()
                    ? valueWith(input.definition().get(), figure, other)
                    : input.value());
      }
    }
    return number(formula, changed);
  }

  /** The constants of a formula at an instant. */
  static Map<String, Double> at(OptionalDouble instant, Map<String, Double> values) {
    if (instant.isEmpty()) {
      return values;
    }
    Map<String, Double> constants = new LinkedHashMap<>(values);
    constants.put(TIME, instant.getAsDouble());
    return constants;
  }

  static double number(Expression formula, Map<String, Double> constants) {
    BatchEvaluator evaluator = BatchEvaluator.compile(List.of(), constants, List.of(formula));
    double[][] result = new double[1][1];
    evaluator.evaluate(new double[0][], 1, result, evaluator.workspace());
    return result[0][0];
  }
}
