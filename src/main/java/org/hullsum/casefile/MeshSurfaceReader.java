package org.hullsum.casefile;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.mesh.MeshFault;
import org.hullsum.mesh.MeshFile;
import org.hullsum.mesh.MeshTopology;
import org.hullsum.mesh.MeshWeld;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.mesh.TriangleMeshBuilder;
import org.hullsum.mesh.TriangleTree;
import org.hullsum.mesh.VertexMerger;
import org.hullsum.model.PatchSurface;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;
import org.hullsum.units.WorkingUnits;

/** Reads the surface {@code mesh}: a file of triangles, or one part of it. */
final class MeshSurfaceReader {
  /** Of the diagonal of the box around a mesh. */
  private static final double MOST_WELDED = 0.01;

  private final FormulaReader formulas;
  private final ProblemAccumulator problems;
  private final DataFiles files;

  MeshSurfaceReader(FormulaReader formulas, DataFiles files) {
    this.formulas = formulas;
    this.problems = formulas.values().problems();
    this.files = files;
  }

  Optional<PatchSurface> read(MapReader map) {
    Optional<YamlText> name = map.require("file").flatMap(v -> formulas.values().text(v, "`file`"));
    OptionalDouble scale = scale(map);
    Optional<YamlText> part = map.get("part").flatMap(v -> formulas.values().text(v, "`part`"));
    Optional<Path> file = name.flatMap(files::find);
    if (file.isEmpty() || scale.isEmpty() || (map.has("part") && part.isEmpty())) {
      return Optional.empty();
    }
    Optional<TriangleMesh> whole = mesh(file.get(), name.get(), scale.getAsDouble());
    OptionalDouble length = whole.map(mesh -> weldLength(map, mesh)).orElse(OptionalDouble.empty());
    if (map.has("weld") && length.isEmpty()) {
      return Optional.empty();
    }
    Optional<VertexMerger.Merged> merged =
        length.isPresent()
            ? whole.map(mesh -> VertexMerger.merge(mesh, length.getAsDouble()))
            : Optional.empty();
    return merged
        .map(VertexMerger.Merged::mesh)
        .or(() -> whole)
        .flatMap(mesh -> part.isPresent() ? part(mesh, part.get()) : Optional.of(mesh))
        .map(TriangleTree::of)
        .map(tree -> triangles(tree, merged.map(VertexMerger.Merged::weld)));
  }

  private PatchSurface triangles(TriangleTree tree, Optional<MeshWeld> weld) {
    MeshTopology topology = MeshTopology.of(tree, files.threads());
    return new PatchSurface.Triangles(topology, tree.agreed(topology), weld);
  }

  /** The length within which vertices are welded; refused where it is no small part of the mesh. */
  private OptionalDouble weldLength(MapReader map, TriangleMesh mesh) {
    OptionalDouble length =
        map.get("weld")
            .map(v -> formulas.number(v, Need.length("`weld`")))
            .orElse(OptionalDouble.empty());
    double most = MOST_WELDED * mesh.high().minus(mesh.low()).norm();
    if (length.isPresent() && !(length.getAsDouble() > 0 && length.getAsDouble() <= most)) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          map.placeOf("weld"),
          "`weld` is a length above 0 and at most a hundredth of the mesh's size, "
              + most
              + " in working units; here is "
              + length.getAsDouble());
      return OptionalDouble.empty();
    }
    return length;
  }

  /** From the file's unit of length to the working one, times {@code scale}. */
  private OptionalDouble scale(MapReader map) {
    OptionalDouble factor =
        map.get("scale")
            .map(v -> formulas.number(v, Need.plain("`scale`")))
            .orElse(OptionalDouble.of(1));
    if (factor.isPresent() && !(factor.getAsDouble() > 0)) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          map.placeOf("scale"),
          "`scale` is a number above 0; here is " + factor.getAsDouble());
      return OptionalDouble.empty();
    }
    WorkingUnits working = formulas.scope().working();
    if (working.none()) {
      if (map.has("unit")) {
        problems.add(
            ProblemKind.UNIT,
            map.placeOf("unit"),
            "with `units: none` no unit is written; leave it out");
        return OptionalDouble.empty();
      }
      return factor;
    }
    if (!map.has("unit") && !map.faulty()) {
      problems.add(
          ProblemKind.MISSING_KEY,
          map.place(),
          "files of triangles do not say in which unit their coordinates are; write `unit`, such"
              + " as `unit: mm`");
      return OptionalDouble.empty();
    }
    Optional<Double> unit =
        map.get("unit")
            .flatMap(v -> formulas.values().unit(v, "`unit`"))
            .map(noted -> noted.value())
            .filter(
                u -> {
                  boolean length = u.dimension().equals(Dimension.LENGTH);
                  if (!length) {
                    problems.add(
                        ProblemKind.UNIT,
                        map.placeOf("unit"),
                        "coordinates are lengths; " + u.code() + " is none");
                  }
                  return length;
                })
            .map(u -> working.fromSi(u.toSi(1), Dimension.LENGTH));
    return unit.isPresent() && factor.isPresent()
        ? OptionalDouble.of(unit.get() * factor.getAsDouble())
        : OptionalDouble.empty();
  }

  private Optional<TriangleMesh> mesh(Path file, YamlText name, double scale) {
    try {
      TriangleMeshBuilder builder = MeshFile.read(file, files.threads());
      return Optional.of(builder.build(scale));
    } catch (MeshFault fault) {
      problems.add(
          ProblemKind.FILE_UNREADABLE,
          name.place(),
          name.text() + where(fault) + fault.getMessage());
    } catch (IOException e) {
      problems.add(
          ProblemKind.FILE_UNREADABLE,
          name.place(),
          name.text() + " can't be read: " + e.getClass().getSimpleName());
    }
    return Optional.empty();
  }

  private static String where(MeshFault fault) {
    if (fault.offset().isPresent()) {
      return ", byte " + fault.offset().getAsLong() + ": ";
    }
    return ", line " + fault.line().orElse(1) + ", column " + fault.column().orElse(1) + ": ";
  }

  private Optional<TriangleMesh> part(TriangleMesh mesh, YamlText part) {
    int index = mesh.parts().indexOf(part.text());
    if (index < 0) {
      problems.add(
          ProblemKind.UNKNOWN_NAME,
          part.place(),
          "the file has no part "
              + part.shown()
              + "; it has "
              + (mesh.parts().size() == 1 && mesh.parts().get(0).isEmpty()
                  ? "one without a name, so leave `part` out"
                  : String.join(", ", mesh.parts())));
      return Optional.empty();
    }
    return Optional.of(mesh.only(index));
  }
}
