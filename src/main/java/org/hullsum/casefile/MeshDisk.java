package org.hullsum.casefile;

import java.util.List;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.model.PatchSurface;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.ProblemKind;

/**
 * Reads {@code centre} and {@code radius}, which say of a mesh patch which disk it is, and holds
 * the mesh against them. Other surfaces have theirs already.
 */
final class MeshDisk {
  /** A mesh inscribed in its circle has less area: 10 % less with 8 sides. */
  private static final double LEAST_AREA = 0.85;

  private static final double MOST_AREA = 1.05;
  private static final double MOST_RADIUS = 1.05;

  private final FormulaReader formulas;

  MeshDisk(FormulaReader formulas) {
    this.formulas = formulas;
  }

  /**
   * The disk that the keys state.
   *
   * @param centre of the disk
   * @param radius of the disk
   * @param section of the duct
   */
  record Stated(VectorExpression centre, Expression radius, DuctSection section) {
    SurfaceEntry.Disk disk() {
      return new SurfaceEntry.Disk(centre, radius, true);
    }
  }

  /** Empty where the surface is no mesh, or, told, where the keys are missing or do not fit it. */
  Optional<Stated> read(MapReader map, SurfaceEntry surface) {
    ProblemAccumulator problems = formulas.values().problems();
    if (!surface.kind().equals("mesh")) {
      for (String key : List.of("centre", "radius")) {
        if (map.has(key)) {
          problems.add(
              ProblemKind.WRONG_VALUE,
              map.placeOfKey(key),
              "`"
                  + key
                  + "` is for a mesh, which does not say it itself; a "
                  + surface.kind()
                  + " does");
        }
      }
      return Optional.empty();
    }
    PartReader parts = new PartReader(formulas);
    Optional<VectorExpression> centre = parts.point(map, "centre");
    Optional<Expression> radius = parts.length(map, "radius");
    Optional<TriangleMesh> mesh = surface.patchSurface().flatMap(s -> s.accept(new MeshOf()));
    Optional<Vector3> at = centre.flatMap(formulas::value);
    Optional<Double> size = radius.flatMap(formulas.scope()::value);
    if (mesh.isEmpty() || at.isEmpty() || size.isEmpty()) {
      return Optional.empty();
    }
    Vector3 area = vectorArea(mesh.get());
    double share = area.norm() / (Math.PI * size.get() * size.get());
    double reach = reach(mesh.get(), at.get()) / size.get();
    if (!(share >= LEAST_AREA && share <= MOST_AREA && reach <= MOST_RADIUS)) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          map.placeOf("radius"),
          "the mesh is not the disk of this centre and radius: its vector area is "
              + TraverseText.number(100 * share)
              + " % of the disk's, and it reaches "
              + TraverseText.number(reach)
              + " radii from the centre");
      return Optional.empty();
    }
    return Optional.of(
        new Stated(
            centre.get(),
            radius.get(),
            new DuctSection(
                true, DuctSection.roundArea(radius.get()), size.get(), size.get(), area.unit())));
  }

  private static Vector3 vectorArea(TriangleMesh mesh) {
    Vector3 sum = Vector3.ZERO;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      sum = sum.plus(mesh.areaVector(t));
    }
    return sum;
  }

  private static double reach(TriangleMesh mesh, Vector3 centre) {
    double farthest = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int corner = 0; corner < 3; corner++) {
        farthest = Math.max(farthest, mesh.vertex(mesh.corner(t, corner)).minus(centre).norm());
      }
    }
    return farthest;
  }

  private static final class MeshOf implements PatchSurface.Visitor<Optional<TriangleMesh>> {
    @Override
    public Optional<TriangleMesh> formulas(PatchSurface.Formulas surface) {
      return Optional.empty();
    }

    @Override
    public Optional<TriangleMesh> triangles(PatchSurface.Triangles surface) {
      return Optional.of(surface.mesh());
    }
  }
}
