package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.GraphShape;
import org.hullsum.geometry.ParametricShape;
import org.hullsum.geometry.PlaneRegion;
import org.hullsum.geometry.Profile;
import org.hullsum.geometry.RevolutionShape;
import org.hullsum.geometry.Shape;
import org.hullsum.geometry.Span;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;

/** Reads the surfaces that are given by formulas: graphs, parametric ones, those of revolution. */
final class FormulaShapeReader {
  private static final List<String> AXES = List.of("x", "y", "z");

  private final PartReader parts;
  private final FormulaReader formulas;
  private final ValueReader values;
  private final ProblemAccumulator problems;

  FormulaShapeReader(PartReader parts) {
    this.parts = parts;
    this.formulas = parts.formulas();
    this.values = parts.values();
    this.problems = values.problems();
  }

  Optional<Shape> graph(MapReader map) {
    List<String> subjects = map.present(AXES);
    if (subjects.size() != 1) {
      if (!map.faulty()) {
        problems.add(
            subjects.isEmpty() ? ProblemKind.MISSING_KEY : ProblemKind.WRONG_VALUE,
            map.place(),
            "`graph` gives one of x, y, z by a formula in the two others; here "
                + (subjects.isEmpty() ? "is none" : "are " + String.join(" and ", subjects)));
      }
      return Optional.empty();
    }
    GraphShape.Subject subject =
        GraphShape.Subject.valueOf(subjects.get(0).toUpperCase(Locale.ROOT));
    Need need =
        Need.length("the formula of the graph")
            .in(Need.both(length(subject.first()), length(subject.second())));
    Optional<Expression> value = map.get(subject.word()).flatMap(v -> formulas.expression(v, need));
    Optional<PlaneRegion> region = map.require("over").flatMap(v -> region(v, subject));
    return Together.of(value, region, (f, over) -> new GraphShape(subject, f, over));
  }

  private static Map<String, Optional<Dimension>> length(String name) {
    return Map.of(name, Optional.of(Dimension.LENGTH));
  }

  private Optional<PlaneRegion> region(YamlValue value, GraphShape.Subject subject) {
    Optional<MapReader> section = values.section(value, Section.GRAPH_RANGE);
    if (section.isEmpty()) {
      return Optional.empty();
    }
    MapReader map = section.get();
    boolean disk = map.has("disk");
    boolean polygon = map.has("polygon");
    boolean box = map.has(subject.first()) || map.has(subject.second());
    if ((disk ? 1 : 0) + (polygon ? 1 : 0) + (box ? 1 : 0) != 1 || map.has(subject.word())) {
      if (!map.faulty()) {
        problems.add(
            ProblemKind.WRONG_VALUE,
            map.place(),
            "`over` holds ranges of "
                + subject.first()
                + " and "
                + subject.second()
                + ", or one `disk`, or one `polygon`");
      }
      return Optional.empty();
    }
    if (disk) {
      return map.get("disk").flatMap(this::disk);
    }
    return polygon ? map.get("polygon").flatMap(this::polygon) : box(map, subject);
  }

  private Optional<PlaneRegion> box(MapReader map, GraphShape.Subject subject) {
    Need first = Need.length("the range of " + subject.first()).in(length(subject.second()));
    Need second = Need.length("the range of " + subject.second()).in(length(subject.first()));
    return Together.of(
        map.require(subject.first()).flatMap(v -> parts.span(v, first)),
        map.require(subject.second()).flatMap(v -> parts.span(v, second)),
        PlaneRegion.Box::new);
  }

  private Optional<PlaneRegion> disk(YamlValue value) {
    Optional<MapReader> section = values.section(value, Section.GRAPH_DISK);
    return section.flatMap(
        map ->
            Together.of(
                map.require("centre").flatMap(v -> corner(v, "`centre`")),
                parts.length(map, "radius"),
                PlaneRegion.Disk::new));
  }

  private Optional<PlaneRegion.Corner> corner(YamlValue value, String what) {
    return parts
        .span(value, Need.length(what))
        .map(pair -> new PlaneRegion.Corner(pair.from(), pair.to()));
  }

  private Optional<PlaneRegion> polygon(YamlValue value) {
    Optional<YamlList> list = values.list(value, "`polygon`", "of three points or more");
    if (list.isEmpty()) {
      return Optional.empty();
    }
    List<PlaneRegion.Corner> corners = new ArrayList<>();
    for (YamlValue item : list.get().items()) {
      corner(item, "each point of `polygon`").ifPresent(corners::add);
    }
    return corners.size() == list.get().items().size()
        ? Optional.of(new PlaneRegion.Polygon(corners))
        : Optional.empty();
  }

  Optional<Shape> parametric(MapReader map) {
    Optional<PartReader.Range> u =
        map.require("u").flatMap(v -> parts.range(v, Need.any("the range of u")));
    Map<String, Optional<Dimension>> inU =
        u.map(range -> range.variable("u")).orElse(Map.of("u", Optional.empty()));
    Optional<PartReader.Range> v =
        map.require("v").flatMap(e -> parts.range(e, Need.any("the range of v").in(inU)));
    Map<String, Optional<Dimension>> both = new LinkedHashMap<>(inU);
    both.putAll(v.map(range -> range.variable("v")).orElse(Map.of("v", Optional.empty())));
    Optional<VectorExpression> point =
        map.require("point").flatMap(e -> formulas.vector(e, Need.length("`point`").in(both)));
    return Together.of(
        point,
        u,
        v,
        (position, first, second) -> new ParametricShape(position, first.span(), second.span()));
  }

  Optional<Shape> revolution(MapReader map) {
    Optional<Span> sector = parts.angles(map, "sector");
    Optional<Vector3> zero = parts.optionalDirection(map, "zero");
    Optional<MapReader> axis = map.get("axis").flatMap(v -> values.section(v, Section.AXIS));
    VectorExpression through =
        axis.filter(a -> a.has("through"))
            .flatMap(a -> parts.point(a, "through"))
            .orElse(VectorExpression.of(Vector3.ZERO));
    Vector3 along = axis.flatMap(a -> parts.optionalDirection(a, "along")).orElse(Vector3.Z);
    return map.require("profile")
        .flatMap(this::profile)
        .map(profile -> new RevolutionShape(profile, through, along, sector, zero));
  }

  private Optional<Profile> profile(YamlValue value) {
    if (value.asMap().isPresent()) {
      return values.section(value, Section.REVOLUTION_PROFILE).flatMap(this::curve);
    }
    Optional<YamlList> list =
        values.list(value, "`profile`", "of points [radius, height], or a mapping with formulas");
    if (list.isEmpty()) {
      return Optional.empty();
    }
    List<Profile.Point> points = new ArrayList<>();
    for (YamlValue item : list.get().items()) {
      parts
          .span(item, Need.length("each point of `profile`"))
          .map(pair -> new Profile.Point(pair.from(), pair.to()))
          .ifPresent(points::add);
    }
    return points.size() == list.get().items().size()
        ? Optional.of(new Profile.Polyline(points))
        : Optional.empty();
  }

  private Optional<Profile> curve(MapReader map) {
    Optional<PartReader.Range> s =
        map.require("s").flatMap(v -> parts.range(v, Need.any("the range of s")));
    Map<String, Optional<Dimension>> inS =
        s.map(range -> range.variable("s")).orElse(Map.of("s", Optional.empty()));
    return Together.of(
        map.require("radius").flatMap(v -> formulas.expression(v, Need.length("`radius`").in(inS))),
        map.require("height").flatMap(v -> formulas.expression(v, Need.length("`height`").in(inS))),
        s,
        (radius, height, range) -> new Profile.Curve(radius, height, range.span()));
  }
}
