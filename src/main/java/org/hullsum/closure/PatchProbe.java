package org.hullsum.closure;

import java.util.List;
import java.util.Map;
import org.hullsum.geometry.Crossing;
import org.hullsum.geometry.Crossings;
import org.hullsum.geometry.Surface;
import org.hullsum.mesh.TriangleTree;
import org.hullsum.numeric.Vector3;

/**
 * One patch prepared for parity: its crossings with lines, and points on it from which lines are
 * run. Not thread-safe.
 */
public interface PatchProbe {
  /** Of a surface given by formulas. */
  static PatchProbe of(Surface surface, Map<String, Double> parameters) {
    return new FormulaProbe(surface, parameters);
  }

  /** Of a mesh. */
  static PatchProbe of(TriangleTree tree) {
    return new MeshProbe(tree);
  }

  /** The crossings with a line. */
  Crossings along(Vector3 origin, Vector3 direction);

  /** Distance within which a crossing is at the point from which the line started. */
  double near();

  /**
   * Up to so many points of the patch, clear of its edges; the first ones are the same however many
   * are asked for.
   */
  List<SamplePoint> points(int count);

  /** Number of crossings at the point from which the line started. */
  static int count(Crossings found, double near) {
    int here = 0;
    for (Crossing crossing : found.crossings()) {
      here += Math.abs(crossing.t()) <= near ? 1 : 0;
    }
    return here;
  }
}
