package org.hullsum.casefile;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.Span;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;

/** Reads the parts of which surfaces and bodies are made, each from its key. */
final class PartReader {
  private final FormulaReader formulas;

  PartReader(FormulaReader formulas) {
    this.formulas = formulas;
  }

  FormulaReader formulas() {
    return formulas;
  }

  ValueReader values() {
    return formulas.values();
  }

  private static String quoted(String key) {
    return "`" + key + "`";
  }

  Optional<VectorExpression> point(MapReader map, String key) {
    return map.require(key).flatMap(v -> formulas.point(v, quoted(key)));
  }

  Optional<Expression> length(MapReader map, String key) {
    return map.require(key).flatMap(v -> formulas.expression(v, Need.length(quoted(key))));
  }

  Optional<Expression> optionalLength(MapReader map, String key) {
    return map.get(key).flatMap(v -> formulas.expression(v, Need.length(quoted(key))));
  }

  Optional<Vector3> direction(MapReader map, String key) {
    return map.require(key).flatMap(v -> formulas.direction(v, quoted(key)));
  }

  Optional<Vector3> optionalDirection(MapReader map, String key) {
    return map.get(key).flatMap(v -> formulas.direction(v, quoted(key)));
  }

  /** A range of an angle, in radians where it is bare. */
  Optional<Span> angles(MapReader map, String key) {
    return map.get(key).flatMap(v -> span(v, Need.plain(quoted(key))));
  }

  /** Two ends. */
  Optional<Span> span(YamlValue value, Need need) {
    return values()
        .items(value, 2, need.what(), "of two ends, [from, to]")
        .flatMap(
            ends ->
                Together.of(
                    formulas.expression(ends.get(0), need),
                    formulas.expression(ends.get(1), need),
                    Span::new));
  }

  /** Two ends with the dimension that they share, if any states one. */
  Optional<Range> range(YamlValue value, Need need) {
    Optional<List<YamlValue>> ends =
        values().items(value, 2, need.what(), "of two ends, [from, to]");
    if (ends.isEmpty()) {
      return Optional.empty();
    }
    Optional<Formula> from = formulas.formula(ends.get().get(0), need);
    Optional<Formula> to = formulas.formula(ends.get().get(1), need);
    if (from.isEmpty() || to.isEmpty()) {
      return Optional.empty();
    }
    Optional<Dimension> first = from.get().dimension();
    Optional<Dimension> second = to.get().dimension();
    if (first.isPresent() && second.isPresent() && !first.equals(second)) {
      values()
          .problems()
          .add(
              ProblemKind.DIMENSION,
              value.place(),
              need.what() + " goes from " + first.get() + " to " + second.get());
      return Optional.empty();
    }
    return Optional.of(
        new Range(
            new Span(from.get().expression(), to.get().expression()),
            first.isPresent() ? first : second));
  }

  /** A range of a free variable, with its dimension if it has one. */
  record Range(Span span, Optional<Dimension> dimension) {
    Map<String, Optional<Dimension>> variable(String name) {
      return Map.of(name, dimension);
    }
  }

  /** So many points in a list, such as the edges of a box. */
  Optional<List<VectorExpression>> points(MapReader map, String key, int count) {
    Optional<List<YamlValue>> items =
        map.require(key)
            .flatMap(v -> values().items(v, count, quoted(key), "of " + count + " vectors"));
    return items.flatMap(list -> points(list, quoted(key)));
  }

  /** All the points of a list. */
  Optional<List<VectorExpression>> points(List<YamlValue> items, String what) {
    List<Optional<VectorExpression>> points =
        items.stream().map(item -> formulas.point(item, "each vector of " + what)).toList();
    return points.stream().allMatch(Optional::isPresent)
        ? Optional.of(points.stream().flatMap(Optional::stream).toList())
        : Optional.empty();
  }
}
