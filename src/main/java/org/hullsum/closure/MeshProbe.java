package org.hullsum.closure;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.geometry.Crossing;
import org.hullsum.geometry.Crossings;
import org.hullsum.geometry.Crossings.Doubt;
import org.hullsum.geometry.LineCrossings;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.mesh.TriangleTree;
import org.hullsum.numeric.Vector3;

/** A mesh prepared for parity. */
final class MeshProbe implements PatchProbe {
  /** The golden ratio's reciprocal: steps of it spread over the triangles. */
  private static final double STEP = 0.6180339887498949;

  /** Triangles among which each point's is the largest. */
  private static final int CHOICE = 8;

  private final TriangleTree tree;
  private final double reach;

  MeshProbe(TriangleTree tree) {
    this.tree = tree;
    this.reach = LineCrossings.REACH * tree.extent();
  }

  @Override
  public Crossings along(Vector3 origin, Vector3 direction) {
    double length = direction.norm();
    TriangleTree.LineHits hits = tree.along(origin, direction.times(1 / length), reach);
    List<Crossing> crossings =
        hits.places().stream().map(t -> new Crossing(t / length, 0, 0, 0, 1, false)).toList();
    return new Crossings(
        crossings, hits.doubtful() ? Optional.of(Doubt.NEAR_SIDE) : Optional.empty());
  }

  @Override
  public double near() {
    return 2 * reach;
  }

  @Override
  public List<SamplePoint> points(int count) {
    TriangleMesh mesh = tree.mesh();
    List<SamplePoint> points = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      int first = (int) (((k + 0.5) * STEP % 1) * mesh.triangleCount());
      int best = first;
      for (int j = 1; j < Math.min(CHOICE, mesh.triangleCount()); j++) {
        int other = (first + j) % mesh.triangleCount();
        best = mesh.areaVector(other).norm() > mesh.areaVector(best).norm() ? other : best;
      }
      Vector3 area = mesh.areaVector(best);
      if (area.norm() > 0) {
        Vector3 sum =
            mesh.vertex(mesh.corner(best, 0))
                .plus(mesh.vertex(mesh.corner(best, 1)))
                .plus(mesh.vertex(mesh.corner(best, 2)));
        points.add(new SamplePoint(sum.times(1.0 / 3), area.unit()));
      }
    }
    return points;
  }
}
