package org.hullsum.mesh;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.List;
import java.util.Optional;
import org.hullsum.numeric.Vector3;

/**
 * Which closed shells of a mesh are cavities: those inside an odd number of the others, told by the
 * number of triangles that lines from one of their own cross. Linear in the number of triangles,
 * and two lines for each shell.
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

  /** Lines that must agree. */
  private static final int WITNESSES = 2;

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
    int[] largest = new int[shells.size()];
    for (int s = 0; s < shells.size(); s++) {
      largest[s] = spread(s, shellOf, queue);
    }
    BitSet cavities = new BitSet();
    List<MeshShell> judged = new ArrayList<>();
    for (int s = 0; s < shells.size(); s++) {
      MeshShell shell = shells.get(s);
      cavities.set(s, encloses(shell) && isInsideAnOddNumber(s, largest[s], shellOf));
      judged.add(cavities.get(s) ? shell.asCavity() : shell);
    }
    for (int t = 0; t < shellOf.length; t++) {
      if (shellOf[t] >= 0 && cavities.get(shellOf[t])) {
        turned.flip(t);
      }
    }
    return judged;
  }

  /** Marks the triangles of a shell; returns the largest of the first few. */
  private int spread(int shell, int[] shellOf, int[] queue) {
    int size = 0;
    queue[size++] = shells.get(shell).first();
    shellOf[queue[0]] = shell;
    int largest = queue[0];
    double area = 0;
    for (int i = 0; i < size; i++) {
      if (i < CHOICE && tree.mesh().areaVector(queue[i]).norm() > area) {
        largest = queue[i];
        area = tree.mesh().areaVector(largest).norm();
      }
      for (int h = 3 * queue[i]; h < 3 * queue[i] + 3; h++) {
        int mate = pairing.mate(h);
        if (mate >= 0 && shellOf[mate / 3] < 0) {
          shellOf[mate / 3] = shell;
          queue[size++] = mate / 3;
        }
      }
    }
    return largest;
  }

  /**
   * Whether a shell is inside an odd number of the others, so that a line from the middle of one of
   * its triangles crosses theirs an odd number of times to either side. Lines whose two sides are
   * at odds say nothing; {@link #WITNESSES} of the rest decide if they agree.
   */
  private boolean isInsideAnOddNumber(int shell, int triangle, int[] shellOf) {
    TriangleMesh mesh = tree.mesh();
    Vector3 origin =
        mesh.vertex(mesh.corner(triangle, 0))
            .plus(mesh.vertex(mesh.corner(triangle, 1)))
            .plus(mesh.vertex(mesh.corner(triangle, 2)))
            .times(1.0 / 3);
    long inside = 0;
    long outside = 0;
    for (Vector3 direction : DIRECTIONS) {
      Optional<List<TriangleTree.Hit>> hits = tree.hits(origin, direction, REACH * tree.extent());
      long ahead = hits.map(h -> crossings(h, 1, shell, shellOf)).orElse(0L);
      long behind = hits.map(h -> crossings(h, -1, shell, shellOf)).orElse(1L);
      if ((ahead - behind) % 2 == 0) {
        inside += ahead % 2;
        outside += 1 - ahead % 2;
      }
      if (inside + outside == WITNESSES) {
        break;
      }
    }
    return inside > 0 && outside == 0;
  }

  /** The triangles of other shells that enclose, crossed on one side of the origin. */
  private long crossings(List<TriangleTree.Hit> hits, int side, int shell, int[] shellOf) {
    return hits.stream()
        .filter(hit -> side * hit.place() > 0)
        .mapToInt(hit -> shellOf[hit.triangle()])
        .filter(other -> other >= 0 && other != shell && encloses(shells.get(other)))
        .count();
  }
}
