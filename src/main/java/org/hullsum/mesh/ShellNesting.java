package org.hullsum.mesh;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.hullsum.numeric.Vector3;

/**
 * Which closed shells of a mesh are cavities: those inside an odd number of the others, told by the
 * triangles that a line from one of their triangles crosses. Linear in the number of triangles, and
 * one line for each shell.
 */
final class ShellNesting {
  /** Directions tried for a line that meets no edge. */
  private static final List<Vector3> DIRECTIONS =
      List.of(
          new Vector3(0.5345, 0.2673, 0.8018).unit(),
          new Vector3(-0.3162, 0.7071, 0.6325).unit(),
          new Vector3(0.8729, -0.4364, 0.2182).unit(),
          new Vector3(0.1374, 0.6428, -0.7536).unit(),
          new Vector3(-0.7428, -0.5571, 0.3714).unit());

  /** Nearer than this to an edge, relative to the size of the mesh, a line is no witness. */
  private static final double REACH = 1e-12;

  /** Triangles of a shell among which the largest is taken. */
  private static final int CHOICE = 8;

  private final TriangleTree tree;
  private final List<MeshShell> shells;
  private final EdgePairing pairing;

  ShellNesting(TriangleTree tree, List<MeshShell> shells, EdgePairing pairing) {
    this.tree = tree;
    this.shells = shells;
    this.pairing = pairing;
  }

  private static boolean encloses(MeshShell shell) {
    return shell.closed() && shell.orientable() && shell.volume() > 0;
  }

  /** The shells; the triangles of those that are cavities are turned once more. */
  List<MeshShell> turnCavities(BitSet turned) {
    if (shells.stream().filter(ShellNesting::encloses).count() < 2) {
      return shells;
    }
    int[] shellOf = new int[tree.mesh().triangleCount()];
    Arrays.fill(shellOf, -1);
    int[] queue = new int[shellOf.length];
    for (int s = 0; s < shells.size(); s++) {
      spread(s, shellOf, queue);
    }
    BitSet cavities = new BitSet();
    List<MeshShell> judged = new ArrayList<>();
    for (int s = 0; s < shells.size(); s++) {
      MeshShell shell = shells.get(s);
      cavities.set(s, encloses(shell) && isInsideAnOddNumber(s, shellOf));
      judged.add(cavities.get(s) ? shell.asCavity() : shell);
    }
    for (int t = 0; t < shellOf.length; t++) {
      if (shellOf[t] >= 0 && cavities.get(shellOf[t])) {
        turned.flip(t);
      }
    }
    return judged;
  }

  private void spread(int shell, int[] shellOf, int[] queue) {
    int size = 0;
    queue[size++] = shells.get(shell).first();
    shellOf[queue[0]] = shell;
    for (int i = 0; i < size; i++) {
      for (int h = 3 * queue[i]; h < 3 * queue[i] + 3; h++) {
        int mate = pairing.mate(h);
        if (mate >= 0 && shellOf[mate / 3] < 0) {
          shellOf[mate / 3] = shell;
          queue[size++] = mate / 3;
        }
      }
    }
  }

  private boolean isInsideAnOddNumber(int shell, int[] shellOf) {
    TriangleMesh mesh = tree.mesh();
    int best = shells.get(shell).first();
    int seen = 0;
    for (int t = best; t < shellOf.length && seen < CHOICE; t++) {
      if (shellOf[t] == shell) {
        seen++;
        best = mesh.areaVector(t).norm() > mesh.areaVector(best).norm() ? t : best;
      }
    }
    Vector3 origin =
        mesh.vertex(mesh.corner(best, 0))
            .plus(mesh.vertex(mesh.corner(best, 1)))
            .plus(mesh.vertex(mesh.corner(best, 2)))
            .times(1.0 / 3);
    for (Vector3 direction : DIRECTIONS) {
      Optional<List<TriangleTree.Hit>> hits = tree.hits(origin, direction, REACH * tree.extent());
      if (hits.isPresent()) {
        Set<Integer> odd = new HashSet<>();
        for (TriangleTree.Hit hit : hits.get()) {
          int other = shellOf[hit.triangle()];
          if (hit.place() > 0 && other >= 0 && other != shell && encloses(shells.get(other))) {
            if (!odd.add(other)) {
              odd.remove(other);
            }
          }
        }
        return odd.size() % 2 == 1;
      }
    }
    return false;
  }
}
