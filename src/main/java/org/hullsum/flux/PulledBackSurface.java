package org.hullsum.flux;

import java.util.List;
import java.util.Optional;
import org.hullsum.geometry.Surface;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.mesh.TriangleTree;
import org.hullsum.model.PatchSurface;

/**
 * A surface made ready for integration: of formulas, with tangents derived and the trim expressed
 * in u and v; or of triangles.
 *
 * <p>Made once for a patch and shared by all its integrals. Immutable and thread-safe.
 */
public final class PulledBackSurface {
  private final Optional<Surface> surface;
  private final List<PulledBackChart> charts;
  private final Optional<TriangleTree> tree;
  private final Optional<TriangleMesh> drawn;

  private PulledBackSurface(
      Optional<Surface> surface,
      List<PulledBackChart> charts,
      Optional<TriangleTree> tree,
      Optional<TriangleMesh> drawn) {
    this.surface = surface;
    this.charts = List.copyOf(charts);
    this.tree = tree;
    this.drawn = drawn;
  }

  public static PulledBackSurface of(Surface surface) {
    return new PulledBackSurface(
        Optional.of(surface),
        surface.charts().stream().map(c -> PulledBackChart.of(c, surface.trim())).toList(),
        Optional.empty(),
        Optional.empty());
  }

  public static PulledBackSurface of(PatchSurface surface) {
    return surface.accept(
        new PatchSurface.Visitor<>() {
          @Override
          public PulledBackSurface formulas(PatchSurface.Formulas formulas) {
            return of(formulas.surface());
          }

          @Override
          public PulledBackSurface triangles(PatchSurface.Triangles triangles) {
            return new PulledBackSurface(
                Optional.empty(),
                List.of(),
                Optional.of(triangles.tree()),
                Optional.of(triangles.mesh()));
          }
        });
  }

  /** Of triangles. */
  public static PulledBackSurface of(TriangleMesh mesh) {
    return new PulledBackSurface(
        Optional.empty(), List.of(), Optional.of(TriangleTree.of(mesh)), Optional.of(mesh));
  }

  /** The formulas; empty where it is of triangles. */
  Optional<Surface> surface() {
    return surface;
  }

  /** The charts; none where it is of triangles. */
  List<PulledBackChart> charts() {
    return charts;
  }

  /** The same triangles for lines through them; empty where it is of formulas. */
  Optional<TriangleTree> tree() {
    return tree;
  }

  /** The triangles as drawn, whatever they face: what a flux passes. */
  Optional<TriangleMesh> drawnMesh() {
    return drawn;
  }

  /** The triangles, those turned that face against the others: what bounds a region. */
  Optional<TriangleMesh> mesh() {
    return tree.map(TriangleTree::mesh);
  }
}
