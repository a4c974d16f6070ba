package org.hullsum.mesh;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * Joins the edges that have one triangle to loops. Where triangles face against one another an edge
 * is followed backward, if no other goes on.
 */
final class MeshLoops {
  private final TriangleMesh mesh;
  private final List<Integer> halves = new ArrayList<>();

  /** Edges not used yet, by each of their two vertices. */
  private final Map<Integer, List<Integer>> ends = new HashMap<>();

  MeshLoops(TriangleMesh mesh, EdgePairing pairing) {
    this.mesh = mesh;
    for (int h = 0; h < 3 * mesh.triangleCount(); h++) {
      if (pairing.mate(h) == EdgePairing.BOUNDARY) {
        halves.add(h);
        ends.computeIfAbsent(EdgePairing.from(mesh, h), v -> new ArrayList<>()).add(h);
        ends.computeIfAbsent(EdgePairing.to(mesh, h), v -> new ArrayList<>()).add(h);
      }
    }
  }

  List<MeshLoop> loops() {
    List<MeshLoop> loops = new ArrayList<>();
    for (int h : halves) {
      if (use(h)) {
        loops.add(loop(h));
      }
    }
    return loops;
  }

  /** Takes an edge out; false where that was done before. */
  private boolean use(int half) {
    boolean there = ends.get(EdgePairing.from(mesh, half)).remove((Integer) half);
    ends.get(EdgePairing.to(mesh, half)).remove((Integer) half);
    return there;
  }

  /** Follows the edges until the first vertex comes again, or none goes on. */
  private MeshLoop loop(int first) {
    List<Integer> vertices = new ArrayList<>();
    int start = EdgePairing.from(mesh, first);
    vertices.add(start);
    int at = EdgePairing.to(mesh, first);
    // Each round uses up one edge.
    for (int round = 0; round < halves.size() && at != start; round++) {
      vertices.add(at);
      List<Integer> here = ends.get(at);
      if (here.isEmpty()) {
        return new MeshLoop(vertices, false);
      }
      int from = at;
      int next =
          here.stream()
              .filter(h -> EdgePairing.from(mesh, h) == from)
              .findFirst()
              .orElse(here.get(0));
      use(next);
      at =
          EdgePairing.from(mesh, next) == from
              ? EdgePairing.to(mesh, next)
              : EdgePairing.from(mesh, next);
    }
    return new MeshLoop(vertices, true);
  }
}
