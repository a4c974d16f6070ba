package org.hullsum.mesh;

import java.util.ArrayList;
import java.util.BitSet;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.function.ToLongFunction;
import java.util.stream.IntStream;

/**
 * How the triangles of a mesh hang together: shells, holes, and which triangles face against the
 * others.
 *
 * <p>Two triangles hang together across an edge that no third shares. Degenerate triangles, of
 * which two corners are one vertex, and repeated ones count for nothing. Cost: linear in the number
 * of triangles.
 */
public final class MeshTopology {
  private final TriangleMesh mesh;
  private final EdgePairing pairing;
  private final BitSet turned;

  /** Triangles of closed shells. */
  private final BitSet inClosed = new BitSet();

  private final List<MeshShell> shells;
  private final List<MeshLoop> loops;

  /**
   * Triangles of closed shells that face against the others, and whether the others are to turn.
   */
  private final long closedAgainst;

  private final boolean mostToTurn;
  private final int degenerate;
  private final int duplicates;

  private MeshTopology(TriangleTree tree, int threads) {
    this.mesh = tree.mesh();
    BitSet leftOut = new BitSet();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (isDegenerate(t)) {
        leftOut.set(t);
      }
    }
    this.degenerate = leftOut.cardinality();
    EdgePairing first = EdgePairing.of(mesh, leftOut, threads);
    this.duplicates = leaveOutDuplicates(first, leftOut);
    this.pairing = duplicates > 0 ? EdgePairing.of(mesh, leftOut, threads) : first;
    this.turned = new BitSet();
    this.shells = new ShellNesting(tree, findShells(leftOut), pairing).turnCavities(turned);
    long closed = count(MeshShell::triangles);
    long toTurn = count(MeshShell::toTurn);
    this.closedAgainst = Math.min(toTurn, closed - toTurn);
    this.mostToTurn = 2 * toTurn > closed;
    this.loops = new MeshLoops(mesh, pairing).loops();
  }

  /** Looks at a mesh, on one thread. */
  public static MeshTopology of(TriangleMesh mesh) {
    return of(TriangleTree.of(mesh), 1);
  }

  /**
   * Looks at a mesh.
   *
   * @param tree of the mesh
   * @param threads that may be used; the result does not depend on it
   */
  public static MeshTopology of(TriangleTree tree, int threads) {
    return new MeshTopology(tree, threads);
  }

  private boolean isDegenerate(int t) {
    int a = mesh.corner(t, 0);
    int b = mesh.corner(t, 1);
    int c = mesh.corner(t, 2);
    return a == b || b == c || c == a;
  }

  /**
   * Triangles with the corners of an earlier one; only where edges are crowded can there be any.
   */
  private int leaveOutDuplicates(EdgePairing first, BitSet leftOut) {
    Set<Corners> seen = new HashSet<>();
    int count = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      boolean suspect =
          isSuspect(first, 3 * t) && isSuspect(first, 3 * t + 1) && isSuspect(first, 3 * t + 2);
      if (suspect && !leftOut.get(t) && !seen.add(Corners.of(mesh, t))) {
        leftOut.set(t);
        count++;
      }
    }
    return count;
  }

  /** Whether another triangle may share the edge and the two others: two alone may be a pair. */
  private boolean isSuspect(EdgePairing first, int half) {
    int mate = first.mate(half);
    return mate == EdgePairing.CROWDED || (mate >= 0 && opposite(mate) == opposite(half));
  }

  private int opposite(int half) {
    return EdgePairing.to(mesh, EdgePairing.next(half));
  }

  /** The three vertices of a triangle in ascending order. */
  private record Corners(int low, int middle, int high) {
    static Corners of(TriangleMesh mesh, int t) {
      int a = mesh.corner(t, 0);
      int b = mesh.corner(t, 1);
      int c = mesh.corner(t, 2);
      int low = Math.min(a, Math.min(b, c));
      int high = Math.max(a, Math.max(b, c));
      return new Corners(low, a + b + c - low - high, high);
    }
  }

  private List<MeshShell> findShells(BitSet leftOut) {
    int count = mesh.triangleCount();
    BitSet seen = (BitSet) leftOut.clone();
    int[] queue = new int[Math.max(1, count)];
    List<MeshShell> found = new ArrayList<>();
    for (int seed = seen.nextClearBit(0); seed < count; seed = seen.nextClearBit(seed)) {
      found.add(findShell(seed, seen, queue));
    }
    return found;
  }

  /**
   * Spreads from a triangle over paired edges; then the smaller set, or the inward one, is turned.
   */
  private MeshShell findShell(int seed, BitSet seen, int[] queue) {
    int size = 0;
    int against = 0;
    boolean orientable = true;
    boolean closed = true;
    queue[size++] = seed;
    seen.set(seed);
    ShellSums sums = new ShellSums(mesh, seed);
    for (int i = 0; i < size; i++) {
      int t = queue[i];
      boolean flipped = turned.get(t);
      against += flipped ? 1 : 0;
      sums.add(t, flipped ? -1 : 1);
      for (int h = 3 * t; h < 3 * t + 3; h++) {
        int mate = pairing.mate(h);
        closed &= mate >= 0;
        if (mate >= 0) {
          boolean agrees = EdgePairing.from(mesh, h) != EdgePairing.from(mesh, mate);
          boolean wanted = agrees == flipped;
          int other = mate / 3;
          if (!seen.get(other)) {
            seen.set(other);
            turned.set(other, wanted);
            queue[size++] = other;
          } else {
            orientable &= turned.get(other) == wanted;
          }
        }
      }
    }
    boolean bounds = closed && orientable;
    boolean turnAll = bounds ? sums.volume() < 0 : 2 * against > size;
    for (int i = 0; i < size; i++) {
      int t = queue[i];
      turned.set(t, orientable && turned.get(t) != turnAll);
      inClosed.set(t, bounds);
    }
    int toTurn = turnAll ? size - against : against;
    return new MeshShell(
        seed,
        size,
        closed,
        orientable,
        false,
        orientable ? toTurn : 0,
        orientable ? Math.min(against, size - against) : 0,
        Math.abs(sums.volume()));
  }

  public TriangleMesh mesh() {
    return mesh;
  }

  /** The shells, in the order of their first triangles. */
  public List<MeshShell> shells() {
    return shells;
  }

  /** The boundary loops. */
  public List<MeshLoop> loops() {
    return loops;
  }

  /**
   * Whether a triangle is to be turned: in a closed shell so that all face out of what the mesh
   * encloses, a shell within another being a cavity; in an open one so that all agree, the fewer
   * being turned.
   */
  public boolean isToTurn(int triangle) {
    return turned.get(triangle);
  }

  /**
   * Triangles that face against the others, the fewer: of all closed shells together, and of each
   * open one.
   */
  public long againstCount() {
    long open = shells.stream().filter(s -> !s.bounds()).mapToLong(MeshShell::against).sum();
    return open + closedAgainst;
  }

  /** Whether a triangle is one of {@link #againstCount}. */
  public boolean isAgainst(int triangle) {
    return turned.get(triangle) != (mostToTurn && inClosed.get(triangle));
  }

  /** A sum over the closed shells. */
  private long count(ToLongFunction<MeshShell> what) {
    return shells.stream().filter(MeshShell::bounds).mapToLong(what).sum();
  }

  /** Edges that more than two triangles share. */
  public int crowdedEdgeCount() {
    return pairing.crowdedEdges();
  }

  /** Triangles with two corners in one vertex. */
  public int degenerateCount() {
    return degenerate;
  }

  /** Triangles with the same corners as an earlier one. */
  public int duplicateCount() {
    return duplicates;
  }

  /** The half-edges that have no other on their edge. */
  IntStream boundary() {
    return IntStream.range(0, 3 * mesh.triangleCount())
        .filter(h -> pairing.mate(h) == EdgePairing.BOUNDARY);
  }

  /** Whether every shell is closed, and nothing crowded. */
  public boolean isClosed() {
    return pairing.crowdedEdges() == 0 && shells.stream().allMatch(MeshShell::closed);
  }
}
