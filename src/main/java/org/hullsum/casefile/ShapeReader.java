package org.hullsum.casefile;

import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.geometry.ConeShape;
import org.hullsum.geometry.CylinderShape;
import org.hullsum.geometry.DiskShape;
import org.hullsum.geometry.EllipsoidShape;
import org.hullsum.geometry.PolygonShape;
import org.hullsum.geometry.RectangleShape;
import org.hullsum.geometry.Shape;
import org.hullsum.geometry.Span;
import org.hullsum.geometry.SphereShape;
import org.hullsum.geometry.TorusShape;
import org.hullsum.numeric.Vector3;

/** Reads the surfaces that are given by their measures. */
final class ShapeReader {
  private final PartReader parts;

  ShapeReader(PartReader parts) {
    this.parts = parts;
  }

  Optional<Shape> polygon(MapReader map) {
    Optional<YamlList> points =
        map.require("points")
            .flatMap(v -> parts.values().list(v, "`points`", "of three points or more"));
    return points.flatMap(list -> parts.points(list.items(), "`points`")).map(PolygonShape::new);
  }

  Optional<Shape> rectangle(MapReader map) {
    return Together.of(
        parts.point(map, "corner"),
        parts.points(map, "edges", 2),
        (corner, edges) -> new RectangleShape(corner, edges.get(0), edges.get(1)));
  }

  Optional<DiskShape> disk(MapReader map) {
    Optional<Expression> hole = parts.optionalLength(map, "hole");
    Optional<Span> sector = parts.angles(map, "sector");
    Optional<Vector3> zero = parts.optionalDirection(map, "zero");
    return Together.of(
        parts.point(map, "centre"),
        parts.direction(map, "normal"),
        parts.length(map, "radius"),
        (centre, normal, radius) -> new DiskShape(centre, normal, radius, hole, sector, zero));
  }

  Optional<Shape> cylinder(MapReader map) {
    Optional<Span> sector = parts.angles(map, "sector");
    Optional<Vector3> zero = parts.optionalDirection(map, "zero");
    return Together.of(
        parts.point(map, "from"),
        parts.point(map, "to"),
        parts.length(map, "radius"),
        (from, to, radius) -> new CylinderShape(from, to, radius, sector, zero));
  }

  Optional<Shape> cone(MapReader map) {
    Optional<Span> sector = parts.angles(map, "sector");
    Optional<Vector3> zero = parts.optionalDirection(map, "zero");
    return Together.of(
        parts.point(map, "from"),
        parts.point(map, "to"),
        radii(map),
        (from, to, radii) -> new ConeShape(from, to, radii.from(), radii.to(), sector, zero));
  }

  /** The two radii of a cone, as a range from one end to the other. */
  Optional<Span> radii(MapReader map) {
    return map.require("radii").flatMap(v -> parts.span(v, Need.length("`radii`")));
  }

  Optional<Shape> sphere(MapReader map) {
    Vector3 axis = parts.optionalDirection(map, "axis").orElse(Vector3.Z);
    Optional<Span> polar = parts.angles(map, "polar");
    Optional<Span> azimuth = parts.angles(map, "azimuth");
    Optional<Vector3> zero = parts.optionalDirection(map, "zero");
    return Together.of(
        parts.point(map, "centre"),
        parts.length(map, "radius"),
        (centre, radius) -> new SphereShape(centre, radius, axis, polar, azimuth, zero));
  }

  Optional<Shape> ellipsoid(MapReader map) {
    Optional<Span> polar = parts.angles(map, "polar");
    Optional<Span> azimuth = parts.angles(map, "azimuth");
    return Together.of(
        parts.point(map, "centre"),
        parts.point(map, "semi-axes"),
        (centre, semiAxes) -> new EllipsoidShape(centre, semiAxes, polar, azimuth));
  }

  Optional<Shape> torus(MapReader map) {
    Vector3 axis = parts.optionalDirection(map, "axis").orElse(Vector3.Z);
    Optional<Span> azimuth = parts.angles(map, "azimuth");
    Optional<Span> tube = parts.angles(map, "tube");
    Optional<Vector3> zero = parts.optionalDirection(map, "zero");
    return Together.of(
        parts.point(map, "centre"),
        parts.length(map, "ring-radius"),
        parts.length(map, "tube-radius"),
        (centre, ring, radius) -> new TorusShape(centre, axis, ring, radius, azimuth, tube, zero));
  }
}
