package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.hullsum.geometry.KeptRegion.Knowledge;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;

/**
 * Lays out the triangles of one chart: a quadtree over its square, each lowest cell a fan about its
 * middle that takes in the corners of smaller neighbours, what a trim may cut cut triangle by
 * triangle. One use.
 */
final class ChartTrianglesBuilder {
  private static final int COARSEST = 3;
  private static final int FINEST = 9;

  /** Cells beyond which none is halved any more. */
  private static final int MOST_CELLS = 30_000;

  /** Steps of the finest grid along a side of the square, middles of the finest cells included. */
  private static final int STEPS = 2 << FINEST;

  /** Quarters of a cell at which it is measured: corners, middles of sides, middle, spokes. */
  private static final int[] QUARTER_I = {0, 4, 4, 0, 2, 4, 2, 0, 2, 1, 3, 3, 1};

  private static final int[] QUARTER_J = {0, 0, 4, 4, 0, 2, 4, 2, 2, 1, 1, 3, 3};

  /** Midpoints by the places of the two ends between which they lie. */
  private static final int[][] MIDDLES = {
    {4, 0, 1}, {5, 1, 2}, {6, 2, 3}, {7, 3, 0}, {9, 8, 0}, {10, 8, 1}, {11, 8, 2}, {12, 8, 3}
  };

  /** Largest distance of a kinked line from a chord, over that at the chord's middle. */
  private static final double SAFETY = 2;

  private final ChartPositions positions;
  private final KeptRegion region;
  private final double wanted;
  private final List<Cell> leaves = new ArrayList<>();
  private final Set<Node> nodes = new HashSet<>();
  private final TriangleCutBuilder triangles;
  private double deviation;

  /** A cell of the quadtree: column and row on its level, and whether all of it is kept. */
  private record Cell(int i, int j, int level, boolean kept) {
    int size() {
      return STEPS >> level;
    }

    Node node(int quarterI, int quarterJ) {
      return new Node(i * size() + quarterI * size() / 4, j * size() + quarterJ * size() / 4);
    }
  }

  /** A point of the finest grid. */
  record Node(int i, int j) {
    double u() {
      return (double) i / STEPS;
    }

    double v() {
      return (double) j / STEPS;
    }

    private Node towards(Node other) {
      return new Node((i + other.i) / 2, (j + other.j) / 2);
    }

    /** Whether both are on one side of the square. */
    boolean isAlongSide(Node other) {
      return i == other.i && (i == 0 || i == STEPS) || j == other.j && (j == 0 || j == STEPS);
    }
  }

  ChartTrianglesBuilder(ChartPositions positions, KeptRegion region, double wanted) {
    this.positions = positions;
    this.region = region;
    this.wanted = wanted;
    this.triangles = new TriangleCutBuilder(positions, region);
  }

  SurfaceTriangles build() {
    divide();
    for (Cell leaf : leaves) {
      for (int k = 0; k < 4; k++) {
        nodes.add(corner(leaf, k));
      }
    }
    for (Cell leaf : leaves) {
      Node middle = leaf.node(2, 2);
      List<Node> round = new ArrayList<>();
      for (int k = 0; k < 4; k++) {
        walk(corner(leaf, k), corner(leaf, k + 1), round);
      }
      triangles.fan(middle, round, leaf.kept());
    }
    return triangles.build(SAFETY * deviation);
  }

  private static Node corner(Cell cell, int k) {
    return cell.node(QUARTER_I[k % 4], QUARTER_J[k % 4]);
  }

  /** The nodes from one corner up to, not including, the next. */
  private void walk(Node from, Node to, List<Node> round) {
    int length = Math.abs(to.i() - from.i()) + Math.abs(to.j() - from.j());
    Node middle = from.towards(to);
    if (length > 2 && nodes.contains(middle)) {
      walk(from, middle, round);
      walk(middle, to, round);
    } else {
      round.add(from);
    }
  }

  private void divide() {
    List<Cell> open = new ArrayList<>();
    for (int i = 0; i < 1 << COARSEST; i++) {
      for (int j = 0; j < 1 << COARSEST; j++) {
        open.add(new Cell(i, j, COARSEST, !region.isTrimmed()));
      }
    }
    // Each round goes one level down, to FINEST at most.
    while (!open.isEmpty()) {
      open = divided(open);
    }
  }

  private List<Cell> divided(List<Cell> open) {
    List<Cell> left = new ArrayList<>();
    for (Cell cell : open) {
      Knowledge known =
          cell.kept() ? Knowledge.KEPT : region.over(span(cell.i(), cell), span(cell.j(), cell));
      if (known != Knowledge.CUT_AWAY) {
        left.add(new Cell(cell.i(), cell.j(), cell.level(), known == Knowledge.KEPT));
      }
    }
    double[] measured = measured(left);
    List<Cell> finer = new ArrayList<>();
    for (int c = 0; c < left.size(); c++) {
      Cell cell = left.get(c);
      boolean room = leaves.size() + left.size() - c + finer.size() < MOST_CELLS;
      boolean close = cell.kept() && measured[c] <= wanted;
      if (close || !room || cell.level() == FINEST) {
        leaves.add(cell);
        deviation = Math.max(deviation, measured[c]);
      } else {
        for (int k = 0; k < 4; k++) {
          finer.add(
              new Cell(
                  2 * cell.i() + QUARTER_I[k] / 4,
                  2 * cell.j() + QUARTER_J[k] / 4,
                  cell.level() + 1,
                  cell.kept()));
        }
      }
    }
    return finer;
  }

  private static Interval span(int index, Cell cell) {
    return new Interval(
        KeptRegion.inset(Math.scalb((double) index, -cell.level())),
        KeptRegion.inset(Math.scalb((double) index + 1, -cell.level())));
  }

  /** How far the middles of sides and spokes are from their chords; infinite where not finite. */
  private double[] measured(List<Cell> cells) {
    int each = QUARTER_I.length;
    double[][] at = new double[2][each * cells.size()];
    for (int c = 0; c < cells.size(); c++) {
      Cell cell = cells.get(c);
      for (int k = 0; k < each; k++) {
        at[0][each * c + k] = Math.scalb(cell.i() + QUARTER_I[k] / 4.0, -cell.level());
        at[1][each * c + k] = Math.scalb(cell.j() + QUARTER_J[k] / 4.0, -cell.level());
      }
    }
    Vector3[] r = positions.at(at, at[0].length);
    double[] measured = new double[cells.size()];
    for (int c = 0; c < cells.size(); c++) {
      for (int[] m : MIDDLES) {
        Vector3 chord = r[each * c + m[1]].plus(r[each * c + m[2]]).times(0.5);
        double distance = chord.minus(r[each * c + m[0]]).norm();
        measured[c] =
            Double.isFinite(distance) ? Math.max(measured[c], distance) : Double.POSITIVE_INFINITY;
      }
    }
    return measured;
  }
}
