package org.hullsum.closure;

import java.util.List;
import java.util.Map;
import java.util.function.DoubleFunction;
import org.hullsum.geometry.Surface;
import org.hullsum.geometry.SurfaceTriangles;
import org.hullsum.geometry.SurfaceTriangles.Border;
import org.hullsum.mesh.TriangleMeshBuilder;
import org.hullsum.mesh.TriangleTree;
import org.hullsum.mesh.WindingNumber;
import org.hullsum.numeric.Vector3;

/**
 * How often one patch winds round a point, its construction normal taken for the outward one.
 *
 * <p>A mesh is summed as it is. A surface given by formulas is first laid out in triangles. Drawn
 * straight from the triangles to the surface, no point moves by more than their deviation, so seen
 * from a point that is farther than that from them the two differ by what the border sweeps: at
 * most Σ length × deviation / distance² over the pieces of the border. That is added to the error.
 *
 * <p>Immutable and thread-safe.
 */
public final class PatchWinding {
  /** Deviation of the first triangles, relative to the extent of the surface. */
  public static final double USUAL_DEVIATION = 1e-3;

  /** Largest error of the sum over triangles that is asked for. */
  private static final double BOUND = 1e-4;

  private static final double SPHERE = 4 * Math.PI;

  private final WindingNumber winding;
  private final List<Border> borders;
  private final double deviation;
  private final double area;
  private final DoubleFunction<PatchWinding> refined;

  /**
   * A winding number.
   *
   * @param number of the patch
   * @param error a bound on its error; infinite where the patch is too near
   */
  record Value(double number, double error) {}

  private PatchWinding(
      TriangleTree tree,
      List<Border> borders,
      double deviation,
      DoubleFunction<PatchWinding> refined) {
    this.winding = WindingNumber.of(tree);
    this.borders = borders.stream().filter(b -> b.deviation() > 0).toList();
    this.deviation = deviation;
    this.refined = refined;
    double sum = 0;
    for (int t = 0; t < tree.mesh().triangleCount(); t++) {
      sum += tree.mesh().areaVector(t).norm();
    }
    this.area = sum;
  }

  /** Of a mesh. */
  public static PatchWinding of(TriangleTree tree) {
    return new PatchWinding(tree, List.of(), 0, d -> of(tree));
  }

  /** Of a surface given by formulas. */
  public static PatchWinding of(Surface surface, Map<String, Double> parameters) {
    return of(surface, parameters, USUAL_DEVIATION);
  }

  private static PatchWinding of(Surface surface, Map<String, Double> parameters, double relative) {
    SurfaceTriangles laid = SurfaceTriangles.of(surface, parameters, relative);
    TriangleMeshBuilder builder = new TriangleMeshBuilder();
    List<Vector3> corners = laid.corners();
    for (int k = 0; k < corners.size(); k += 3) {
      builder.triangle(
          vertex(builder, corners.get(k)),
          vertex(builder, corners.get(k + 1)),
          vertex(builder, corners.get(k + 2)));
    }
    return new PatchWinding(
        TriangleTree.of(builder.build(1)),
        laid.borders(),
        laid.deviation(),
        factor -> of(surface, parameters, factor * relative));
  }

  private static int vertex(TriangleMeshBuilder builder, Vector3 p) {
    return builder.vertex(p.x(), p.y(), p.z());
  }

  /** The same with triangles closer by a factor below 1; itself where they are the surface. */
  PatchWinding refined(double factor) {
    return deviation > 0 && Double.isFinite(deviation) ? refined.apply(factor) : this;
  }

  TriangleTree tree() {
    return winding.tree();
  }

  /** How far the surface may be from the triangles. */
  double deviation() {
    return deviation;
  }

  double area() {
    return area;
  }

  Value at(Vector3 point) {
    WindingNumber.Value value = winding.at(point, BOUND);
    double swept =
        deviation > 0 && tree().distance(point) <= deviation ? Double.POSITIVE_INFINITY : 0;
    for (Border border : borders) {
      double clear = distance(border, point) - border.deviation();
      swept +=
          clear > 0
              ? border.deviation() * border.to().minus(border.from()).norm() / (clear * clear)
              : Double.POSITIVE_INFINITY;
    }
    return new Value(value.number(), value.error() + swept / SPHERE);
  }

  private static double distance(Border border, Vector3 point) {
    Vector3 a = border.from().minus(point);
    Vector3 chord = border.to().minus(border.from());
    double square = chord.dot(chord);
    double along = square > 0 ? Math.max(0, Math.min(1, -a.dot(chord) / square)) : 0;
    return a.plus(chord.times(along)).norm();
  }
}
