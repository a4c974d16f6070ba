package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.hullsum.numeric.Interval;

/**
 * The curves in a chart's unit square that border what is kept, as short segments: marching squares
 * on the cells of a regular grid in which interval enclosures leave the condition undecided.
 *
 * <p>The grid is halved until every undecided cell is close to one in which a curve was found, so
 * that a small opening is not missed between grid points; or until it has {@link #MOST_CELLS}
 * undecided cells or 2^{@link #DEEPEST} cells a side. A curve too small for its cells is followed
 * on a finer grid.
 */
final class TrimContour {
  private static final int SHALLOWEST = 6;
  private static final int DEEPEST = 12;
  private static final int MOST_CELLS = 3_000;

  /** Fewer undecided cells than this follow a small curve too coarsely. */
  private static final int FEWEST_CELLS = 48;

  /** How far from a curve's cells enclosures may leave a cell undecided, in cells. */
  private static final int LOOSENESS = 5;

  /** From this level on a body's face that runs along a side of the square may stay undecided. */
  private static final int SIDE_LEVEL = 8;

  /** Corners and edges of a cell in the order of a left turn round it. */
  private static final int[] CORNER_I = {0, 1, 1, 0};

  private static final int[] CORNER_J = {0, 0, 1, 1};

  private final KeptRegion region;
  private int level;
  private List<Cell> cells = List.of(new Cell(0, 0));
  private final Map<Cell, Boolean> nodes = new HashMap<>();

  /** A cell, or a node at its first corner, by its column and row. */
  private record Cell(int i, int j) {
    Cell plus(int di, int dj) {
      return new Cell(i + di, j + dj);
    }
  }

  /** A grid edge by its two nodes, the kept one first. */
  private record Edge(Cell kept, Cell cut) {}

  TrimContour(KeptRegion region) {
    this.region = region;
  }

  /** The grid's number of cells along a side, once the segments have been asked for. */
  int cellsPerSide() {
    return 1 << level;
  }

  List<SquareSegment> segments() {
    refine();
    List<Edge[]> found = new ArrayList<>();
    for (Cell cell : cells) {
      march(cell, found);
    }
    Map<Edge, Integer> places = new HashMap<>();
    for (Edge[] segment : found) {
      places.putIfAbsent(segment[0], places.size());
      places.putIfAbsent(segment[1], places.size());
    }
    double[][] points = located(places);
    List<SquareSegment> segments = new ArrayList<>();
    for (Edge[] segment : found) {
      int start = places.get(segment[0]);
      int end = places.get(segment[1]);
      segments.add(
          new SquareSegment(points[0][start], points[1][start], points[0][end], points[1][end]));
    }
    return segments;
  }

  private void refine() {
    while (level < DEEPEST && cells.size() <= MOST_CELLS) {
      boolean enough = cells.isEmpty() || cells.size() >= FEWEST_CELLS;
      if (level >= SHALLOWEST && enough && isResolved()) {
        return;
      }
      level++;
      List<Cell> finer = new ArrayList<>();
      for (Cell cell : cells) {
        for (int k = 0; k < CORNER_I.length; k++) {
          Cell child = new Cell(2 * cell.i() + CORNER_I[k], 2 * cell.j() + CORNER_J[k]);
          if (isUndecided(child)) {
            finer.add(child);
          }
        }
      }
      cells = finer;
      nodes.clear();
    }
    evaluateNodes();
  }

  private double coordinate(int index) {
    return KeptRegion.inset(Math.scalb((double) index, -level));
  }

  private boolean isUndecided(Cell cell) {
    Interval u = new Interval(coordinate(cell.i()), coordinate(cell.i() + 1));
    Interval v = new Interval(coordinate(cell.j()), coordinate(cell.j() + 1));
    return region.over(u, v) == KeptRegion.Knowledge.UNDECIDED;
  }

  private void evaluateNodes() {
    Set<Cell> open = new HashSet<>();
    for (Cell cell : cells) {
      for (int k = 0; k < CORNER_I.length; k++) {
        open.add(cell.plus(CORNER_I[k], CORNER_J[k]));
      }
    }
    List<Cell> order = new ArrayList<>(open);
    double[] u = order.stream().mapToDouble(node -> coordinate(node.i())).toArray();
    double[] v = order.stream().mapToDouble(node -> coordinate(node.j())).toArray();
    boolean[] kept = region.kept(u, v);
    for (int i = 0; i < order.size(); i++) {
      nodes.put(order.get(i), kept[i]);
    }
  }

  private boolean isResolved() {
    evaluateNodes();
    Set<Cell> mixed = new HashSet<>();
    cells.stream().filter(this::isMixed).forEach(mixed::add);
    return cells.stream()
        .allMatch(cell -> isNear(cell, mixed) || (level >= SIDE_LEVEL && isAlongSide(cell)));
  }

  private boolean isMixed(Cell cell) {
    boolean first = nodes.get(cell);
    for (int k = 1; k < CORNER_I.length; k++) {
      if (nodes.get(cell.plus(CORNER_I[k], CORNER_J[k])) != first) {
        return true;
      }
    }
    return false;
  }

  private boolean isAlongSide(Cell cell) {
    int last = cellsPerSide() - 1;
    int fromSide =
        Math.min(Math.min(cell.i(), last - cell.i()), Math.min(cell.j(), last - cell.j()));
    return fromSide < LOOSENESS;
  }

  private static boolean isNear(Cell cell, Set<Cell> mixed) {
    for (int di = -LOOSENESS; di <= LOOSENESS; di++) {
      for (int dj = -LOOSENESS; dj <= LOOSENESS; dj++) {
        if (mixed.contains(cell.plus(di, dj))) {
          return true;
        }
      }
    }
    return false;
  }

  /** Adds the one or two segments of a cell, each from the edge where kept turns to cut away. */
  private void march(Cell cell, List<Edge[]> found) {
    List<Integer> exits = new ArrayList<>();
    List<Integer> entries = new ArrayList<>();
    for (int k = 0; k < CORNER_I.length; k++) {
      boolean here = nodes.get(corner(cell, k));
      boolean next = nodes.get(corner(cell, k + 1));
      if (here && !next) {
        exits.add(k);
      } else if (!here && next) {
        entries.add(k);
      }
    }
    for (int exit : exits) {
      int entry = entries.size() == 1 ? entries.get(0) : partner(cell, exit);
      found.add(
          new Edge[] {
            new Edge(corner(cell, exit), corner(cell, exit + 1)),
            new Edge(corner(cell, entry + 1), corner(cell, entry))
          });
    }
  }

  private static Cell corner(Cell cell, int k) {
    int corner = k % CORNER_I.length;
    return cell.plus(CORNER_I[corner], CORNER_J[corner]);
  }

  /** Where opposite corners are kept, the middle decides which of them are connected. */
  private int partner(Cell cell, int exit) {
    double u = 0.5 * (coordinate(cell.i()) + coordinate(cell.i() + 1));
    double v = 0.5 * (coordinate(cell.j()) + coordinate(cell.j() + 1));
    boolean connected = region.kept(new double[] {u}, new double[] {v})[0];
    return (exit + (connected ? 1 : 3)) % CORNER_I.length;
  }

  private double[][] located(Map<Edge, Integer> places) {
    double[][] inside = new double[2][places.size()];
    double[][] outside = new double[2][places.size()];
    places.forEach(
        (edge, place) -> {
          inside[0][place] = coordinate(edge.kept().i());
          inside[1][place] = coordinate(edge.kept().j());
          outside[0][place] = coordinate(edge.cut().i());
          outside[1][place] = coordinate(edge.cut().j());
        });
    region.bisect(inside, outside);
    return inside;
  }
}
