package org.hullsum.model;

import java.util.Objects;
import java.util.Optional;
import org.hullsum.geometry.Surface;
import org.hullsum.mesh.MeshTopology;
import org.hullsum.mesh.MeshWeld;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.mesh.TriangleTree;

/** What a patch is made of. */
public sealed interface PatchSurface {
  /** The alternatives, one method each. */
  interface Visitor<T> {
    T formulas(Formulas surface);

    T triangles(Triangles surface);
  }

  <T> T accept(Visitor<T> visitor);

  /**
   * A surface given by formulas.
   *
   * @param surface with its construction normal
   */
  record Formulas(Surface surface) implements PatchSurface {
    public Formulas {
      Objects.requireNonNull(surface, "surface");
    }

    @Override
    public <T> T accept(Visitor<T> visitor) {
      return visitor.formulas(this);
    }
  }

  /**
   * A triangle mesh; its construction normal is each triangle's right-hand rule.
   *
   * @param topology of the mesh as drawn, in working units of length
   * @param tree of the mesh with the triangles turned that face against the others: the surface
   *     that it bounds a region with
   * @param weld what was welded within a length, where that was asked for
   */
  record Triangles(MeshTopology topology, TriangleTree tree, Optional<MeshWeld> weld)
      implements PatchSurface {
    public Triangles {
      Objects.requireNonNull(topology, "topology");
      Objects.requireNonNull(tree, "tree");
      Objects.requireNonNull(weld, "weld");
    }

    /** As drawn. */
    public TriangleMesh mesh() {
      return topology.mesh();
    }

    @Override
    public <T> T accept(Visitor<T> visitor) {
      return visitor.triangles(this);
    }
  }
}
