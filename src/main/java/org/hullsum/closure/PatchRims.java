package org.hullsum.closure;

import java.util.List;
import java.util.Map;
import org.hullsum.geometry.BoundaryCurves;
import org.hullsum.geometry.Extent;
import org.hullsum.geometry.Surface;
import org.hullsum.mesh.MeshTopology;
import org.hullsum.mesh.TriangleMesh;

/**
 * The boundary of one patch.
 *
 * @param size of the patch, a length: what tolerances are relative to
 * @param rims its boundary curves, none where it is closed in itself
 */
public record PatchRims(double size, List<Rim> rims) {
  /**
   * Distance of the points' polyline from a curve, relative to the size: 128 points of a circle.
   */
  private static final double CHORD = 2e-4;

  /** The same for a trimmed surface: the trim's curves may be much smaller than the surface. */
  private static final double TRIMMED_CHORD = 2e-5;

  public PatchRims {
    rims = List.copyOf(rims);
  }

  /**
   * Of a surface given by formulas.
   *
   * @param parameters the value of every parameter in them
   */
  public static PatchRims of(Surface surface, Map<String, Double> parameters) {
    double size = Extent.of(surface, parameters);
    double chord = surface.trim().isPresent() ? TRIMMED_CHORD : CHORD;
    List<Rim> rims =
        BoundaryCurves.of(surface, parameters, chord * size).stream()
            .map(curve -> Rim.smooth(curve.points(), curve.closed()))
            .toList();
    return new PatchRims(size, rims);
  }

  /** Of a mesh. */
  public static PatchRims of(MeshTopology topology) {
    TriangleMesh mesh = topology.mesh();
    List<Rim> rims =
        topology.loops().stream()
            .map(
                loop ->
                    new Rim(
                        loop.vertices().stream().map(mesh::vertex).toList(), loop.closed(), false))
            .toList();
    return new PatchRims(2 * mesh.high().minus(mesh.low()).norm(), rims);
  }
}
