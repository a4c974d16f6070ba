package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.geometry.Body;
import org.hullsum.geometry.SurfaceFault;
import org.hullsum.problem.ProblemKind;

/** Reads the solids that trim surfaces. */
final class BodyReader {
  private static final List<String> KINDS = List.copyOf(Section.BODY.keys());

  private final PartReader parts;
  private final ProblemAccumulator problems;

  BodyReader(PartReader parts) {
    this.parts = parts;
    this.problems = parts.values().problems();
  }

  /** The bodies of a list, or one body alone; those that were refused are left out. */
  List<Body> bodies(YamlValue value) {
    List<Body> bodies = new ArrayList<>();
    for (YamlValue item : ValueReader.oneOrMore(value)) {
      parts.values().section(item, Section.BODY).flatMap(this::body).ifPresent(bodies::add);
    }
    return bodies;
  }

  private Optional<Body> body(MapReader map) {
    List<String> kinds = map.present(KINDS);
    if (kinds.size() != 1) {
      if (!map.faulty()) {
        problems.add(
            kinds.isEmpty() ? ProblemKind.MISSING_KEY : ProblemKind.WRONG_VALUE,
            map.place(),
            "a body is one of " + String.join(", ", KINDS));
      }
      return Optional.empty();
    }
    String kind = kinds.get(0);
    Optional<YamlValue> value = map.get(kind);
    return switch (kind) {
      case "where" -> value.flatMap(this::where);
      case "cylinder" -> measured(value, Section.BODY_CYLINDER);
      case "cone" -> measured(value, Section.BODY_CONE);
      case "sphere" -> measured(value, Section.BODY_SPHERE);
      case "ellipsoid" -> measured(value, Section.BODY_ELLIPSOID);
      case "box" -> measured(value, Section.BOX);
      default -> measured(value, Section.HALF_SPACE);
    };
  }

  private Optional<Body> measured(Optional<YamlValue> value, Section section) {
    Optional<MapReader> map = value.flatMap(v -> parts.values().section(v, section));
    Optional<Body> body = map.flatMap(m -> measured(m, section));
    return body.filter(b -> isSound(b, map.get()));
  }

  private Optional<Body> measured(MapReader map, Section section) {
    return switch (section) {
      case BODY_CYLINDER ->
          Together.of(
              parts.point(map, "from"),
              parts.point(map, "to"),
              parts.length(map, "radius"),
              Body.Cylinder::new);
      case BODY_CONE ->
          Together.of(
              parts.point(map, "from"),
              parts.point(map, "to"),
              new ShapeReader(parts).radii(map),
              (from, to, radii) -> new Body.Cone(from, to, radii.from(), radii.to()));
      case BODY_SPHERE ->
          Together.of(parts.point(map, "centre"), parts.length(map, "radius"), Body.Sphere::new);
      case BODY_ELLIPSOID ->
          Together.of(
              parts.point(map, "centre"), parts.point(map, "semi-axes"), Body.Ellipsoid::new);
      case BOX ->
          Together.of(
              parts.point(map, "corner"),
              parts.points(map, "edges", 3),
              (corner, e) -> new Body.Box(corner, e.get(0), e.get(1), e.get(2)));
      default ->
          Together.of(
              parts.point(map, "through"), parts.direction(map, "normal"), Body.HalfSpace::new);
    };
  }

  private boolean isSound(Body body, MapReader map) {
    if (!parts.formulas().scope().complete()) {
      return true;
    }
    try {
      body.condition(parts.formulas().scope().values());
      return true;
    } catch (SurfaceFault fault) {
      problems.add(ProblemKind.WRONG_VALUE, map.placeOf(fault.key()), fault.getMessage());
      return false;
    }
  }

  private Optional<Body> where(YamlValue value) {
    Optional<Expression> condition =
        parts.formulas().expression(value, Need.any("`where`").in(Need.SPACE));
    if (condition.isPresent() && !Conditions.isCondition(condition.get())) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          value.place(),
          "`where` is an inequality in x, y, z, such as `x^2 + y^2 <= 4`; here is "
              + value.described());
      return Optional.empty();
    }
    return condition.map(Body.Where::new);
  }
}
