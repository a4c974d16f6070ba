package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.mesh.WeldAdvice;
import org.hullsum.model.PatchSurface;

/**
 * A mesh with cracks that welding within a length would close.
 *
 * @param patch whose mesh it is
 * @param length in the unit of lengths of the result
 * @param open edges that have one triangle
 * @param text what welding would do, for the message of a finding
 */
record WeldSuggestion(PatchAudit patch, double length, int open, String text) {
  private static final PatchSurface.Visitor<Optional<PatchSurface.Triangles>> TRIANGLES =
      new PatchSurface.Visitor<>() {
        @Override
        public Optional<PatchSurface.Triangles> formulas(PatchSurface.Formulas surface) {
          return Optional.empty();
        }

        @Override
        public Optional<PatchSurface.Triangles> triangles(PatchSurface.Triangles surface) {
          return Optional.of(surface);
        }
      };

  /** For the patches of a surface, in their order. */
  static List<WeldSuggestion> of(SurfaceAudit surface, Scales scales) {
    List<WeldSuggestion> suggestions = new ArrayList<>();
    for (PatchAudit patch : surface.patches()) {
      patch
          .patch()
          .surface()
          .flatMap(s -> s.accept(TRIANGLES))
          .flatMap(mesh -> WeldAdvice.of(mesh.topology(), scales.length()))
          .map(advice -> of(patch, advice, scales))
          .ifPresent(suggestions::add);
    }
    return suggestions;
  }

  private static WeldSuggestion of(PatchAudit patch, WeldAdvice advice, Scales scales) {
    double length = scales.length() * advice.length();
    String closed =
        advice.closed() == advice.open()
            ? "all " + advice.open()
            : advice.closed() + " of the " + advice.open();
    String text =
        "`weld: "
            + Figures.text(length, scales.lengthUnit())
            + "` on the mesh of `"
            + patch.name()
            + "` would close "
            + closed
            + " open edges";
    return new WeldSuggestion(patch, length, advice.open(), text);
  }
}
