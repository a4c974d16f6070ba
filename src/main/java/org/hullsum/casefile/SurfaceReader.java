package org.hullsum.casefile;

import java.util.List;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.Body;
import org.hullsum.geometry.DiskShape;
import org.hullsum.geometry.Placement;
import org.hullsum.geometry.RectangleShape;
import org.hullsum.geometry.Shape;
import org.hullsum.geometry.Surface;
import org.hullsum.geometry.SurfaceFault;
import org.hullsum.geometry.Trim;
import org.hullsum.model.PatchSurface;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;

/** Reads the surface of a patch: its shape, where it is placed, and what trims it. */
final class SurfaceReader {
  private static final List<String> KINDS =
      Section.SURFACE.keys().stream().filter(k -> !List.of("placed", "trim").contains(k)).toList();

  private final PartReader parts;
  private final ShapeReader shapes;
  private final FormulaShapeReader formulaShapes;
  private final BodyReader bodies;
  private final MeshSurfaceReader meshes;
  private final ProblemAccumulator problems;

  SurfaceReader(FormulaReader formulas, DataFiles files) {
    this.parts = new PartReader(formulas);
    this.meshes = new MeshSurfaceReader(formulas, files);
    this.shapes = new ShapeReader(parts);
    this.formulaShapes = new FormulaShapeReader(parts);
    this.bodies = new BodyReader(parts);
    this.problems = formulas.values().problems();
  }

  Optional<SurfaceEntry> read(YamlValue value) {
    Optional<MapReader> section = parts.values().section(value, Section.SURFACE);
    if (section.isEmpty()) {
      return Optional.empty();
    }
    MapReader map = section.get();
    List<String> kinds = map.present(KINDS);
    if (kinds.size() != 1) {
      if (!map.faulty()) {
        problems.add(
            kinds.isEmpty() ? ProblemKind.MISSING_KEY : ProblemKind.WRONG_VALUE,
            map.place(),
            "a surface is one of "
                + String.join(", ", KINDS)
                + "; here "
                + (kinds.isEmpty() ? "is none" : "are " + String.join(" and ", kinds)));
      }
      return Optional.empty();
    }
    String kind = kinds.get(0);
    Optional<MapReader> measures =
        map.get(kind).flatMap(v -> parts.values().section(v, section(kind)));
    if (kind.equals("mesh")) {
      return mesh(measures, map);
    }
    Optional<? extends Shape> shape = measures.flatMap(m -> shape(kind, m));
    Optional<Placement> placement = map.get("placed").flatMap(this::placement);
    Optional<Trim> trim = map.get("trim").flatMap(this::trim);
    if (shape.isEmpty()) {
      return Optional.empty();
    }
    Optional<SurfaceEntry.Disk> disk =
        shape
            .filter(DiskShape.class::isInstance)
            .map(DiskShape.class::cast)
            .map(d -> placed(d, placement));
    return Optional.of(
        new SurfaceEntry(
            build(new Plan(shape.get(), placement, trim), measures.get(), map)
                .map(PatchSurface.Formulas::new),
            kind,
            disk,
            trim.isPresent() ? Optional.empty() : section(shape.get(), placement)));
  }

  private Optional<SurfaceEntry> mesh(Optional<MapReader> measures, MapReader map) {
    for (String key : List.of("placed", "trim")) {
      if (map.has(key)) {
        problems.add(
            ProblemKind.WRONG_VALUE,
            map.placeOfKey(key),
            "`" + key + "` is for surfaces given by formulas; a mesh is used as its file has it");
        return Optional.empty();
      }
    }
    return measures.map(
        m -> new SurfaceEntry(meshes.read(m), "mesh", Optional.empty(), Optional.empty()));
  }

  private static Section section(String kind) {
    return switch (kind) {
      case "polygon" -> Section.POLYGON;
      case "rectangle" -> Section.RECTANGLE;
      case "disk" -> Section.DISK;
      case "cylinder" -> Section.CYLINDER;
      case "cone" -> Section.CONE;
      case "sphere" -> Section.SPHERE;
      case "ellipsoid" -> Section.ELLIPSOID;
      case "torus" -> Section.TORUS;
      case "graph" -> Section.GRAPH;
      case "parametric" -> Section.PARAMETRIC;
      case "mesh" -> Section.MESH;
      default -> Section.REVOLUTION;
    };
  }

  private Optional<? extends Shape> shape(String kind, MapReader map) {
    return switch (kind) {
      case "polygon" -> shapes.polygon(map);
      case "rectangle" -> shapes.rectangle(map);
      case "disk" -> shapes.disk(map);
      case "cylinder" -> shapes.cylinder(map);
      case "cone" -> shapes.cone(map);
      case "sphere" -> shapes.sphere(map);
      case "ellipsoid" -> shapes.ellipsoid(map);
      case "torus" -> shapes.torus(map);
      case "graph" -> formulaShapes.graph(map);
      case "parametric" -> formulaShapes.parametric(map);
      default -> formulaShapes.revolution(map);
    };
  }

  /** What a surface is made of. */
  private record Plan(Shape shape, Optional<Placement> placement, Optional<Trim> trim) {}

  private Optional<Surface> build(Plan plan, MapReader measures, MapReader surface) {
    CaseScope scope = parts.formulas().scope();
    if (!scope.complete()) {
      return Optional.empty();
    }
    Place place = measures.place();
    try {
      Surface built = plan.shape().surface(scope.values());
      place = surface.placeOf("placed");
      if (plan.placement().isPresent()) {
        built = plan.placement().get().placed(built, scope.values());
      }
      place = surface.placeOf("trim");
      if (plan.trim().isPresent()) {
        built = plan.trim().get().trimmed(built, scope.values());
      }
      return Optional.of(built);
    } catch (SurfaceFault fault) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          measures.has(fault.key()) ? measures.placeOf(fault.key()) : place,
          fault.getMessage());
      return Optional.empty();
    }
  }

  private static SurfaceEntry.Disk placed(DiskShape disk, Optional<Placement> placement) {
    VectorExpression centre =
        placement.isPresent() ? placement.get().placed(disk.centre()) : disk.centre();
    return new SurfaceEntry.Disk(centre, disk.radius(), disk.hole().isEmpty());
  }

  private Optional<DuctSection> section(Shape shape, Optional<Placement> placement) {
    if (shape instanceof DiskShape disk && disk.hole().isEmpty() && disk.sector().isEmpty()) {
      return DuctSection.of(disk, placement, parts.formulas());
    }
    return shape instanceof RectangleShape rectangle
        ? DuctSection.of(rectangle, placement, parts.formulas())
        : Optional.empty();
  }

  private Optional<Placement> placement(YamlValue value) {
    Optional<MapReader> section = parts.values().section(value, Section.PLACED);
    if (section.isEmpty()) {
      return Optional.empty();
    }
    Optional<Placement.Turn> turn = section.get().get("turn").flatMap(this::turn);
    Optional<VectorExpression> move =
        section.get().get("move").flatMap(v -> parts.formulas().point(v, "`move`"));
    return Optional.of(new Placement(turn, move));
  }

  private Optional<Placement.Turn> turn(YamlValue value) {
    Optional<MapReader> section = parts.values().section(value, Section.TURN);
    if (section.isEmpty()) {
      return Optional.empty();
    }
    Optional<Expression> angle =
        section
            .get()
            .require("angle")
            .flatMap(v -> parts.formulas().expression(v, Need.plain("`angle`")));
    return Together.of(parts.direction(section.get(), "about"), angle, Placement.Turn::new);
  }

  private Optional<Trim> trim(YamlValue value) {
    Optional<MapReader> section = parts.values().section(value, Section.TRIM);
    if (section.isEmpty()) {
      return Optional.empty();
    }
    MapReader map = section.get();
    List<Body> inside = map.get("inside").map(bodies::bodies).orElse(List.of());
    List<Body> outside = map.get("outside").map(bodies::bodies).orElse(List.of());
    return Optional.of(new Trim(inside, outside));
  }
}
