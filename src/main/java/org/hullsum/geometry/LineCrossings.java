package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.geometry.Crossings.Doubt;
import org.hullsum.numeric.Vector3;

/**
 * Finds all crossings of a straight line with a surface, with proof.
 *
 * <p>Each chart's square is halved again and again. A cell is dropped where enclosures of its
 * positions or tangents prove that the line stays away from it by more than the reach. Where the
 * tangents vary little over the cell (‖I − Y J‖ &lt; 1 for every Jacobian J of the projection along
 * the line, Y an inverse in the middle) there is at most one crossing; Newton's method finds it and
 * the Krawczyk operator proves that it is there (R. Krawczyk, "Newton-Algorithmen zur Bestimmung
 * von Nullstellen mit Fehlerschranken", Computing 4 (1969) 187–201; R. E. Moore, R. B. Kearfott, M.
 * J. Cloud, "Introduction to Interval Analysis", SIAM 2009, chapter 8). What comes within reach of
 * a side of a chart (rim, pole, glued side), of a curve of the trim, or is nearly tangent, is
 * reported as a doubt: another line is to be taken. The reach is {@link #REACH} of the surface's
 * extent.
 *
 * <p>Immutable and thread-safe; what changes is in a {@link Workspace}, one per thread. The answer
 * for a line does not depend on lines asked before. Cost: a few cells per crossing once the cells
 * have been made.
 */
public final class LineCrossings {
  /** How near to an edge is too near, relative to the extent of the surface. */
  public static final double REACH = 1e-7;

  /** Rounding of positions far from the surface, relative to the distance. */
  private static final double ROUNDING = 1e-14;

  private final Surface surface;
  private final List<ChartCells> charts;
  private final double extent;

  /** Scratch memory of one thread. */
  public static final class Workspace {
    private final LineCrossings owner;
    private final List<ChartEnclosure> enclosures;
    private final List<TrimPoint> trims;

    private Workspace(LineCrossings owner) {
      this.owner = owner;
      this.enclosures = owner.charts.stream().map(ChartCells::enclosure).toList();
      this.trims = owner.charts.stream().map(ChartCells::trimPoint).toList();
    }
  }

  private LineCrossings(Surface surface, List<ChartCells> charts, double extent) {
    this.surface = surface;
    this.charts = charts;
    this.extent = extent;
  }

  /**
   * Prepares a surface.
   *
   * @param parameters the value of every parameter in its formulas
   */
  public static LineCrossings of(Surface surface, Map<String, Double> parameters) {
    List<ChartCells> charts =
        surface.charts().stream().map(chart -> ChartCells.of(surface, chart, parameters)).toList();
    return new LineCrossings(surface, charts, Extent.of(surface, parameters));
  }

  public Surface surface() {
    return surface;
  }

  /** The distance within which a line counts as touching an edge, in working units of length. */
  public double reach() {
    return REACH * extent;
  }

  public Workspace workspace() {
    return new Workspace(this);
  }

  /**
   * All crossings of the line origin + t · direction, for every real t.
   *
   * @param direction of any length but zero
   * @param workspace from {@link #workspace}
   */
  public Crossings along(Vector3 origin, Vector3 direction, Workspace workspace) {
    if (workspace.owner != this) {
      throw new IllegalArgumentException("the workspace belongs to another surface");
    }
    Line line = Line.of(origin, direction, reach() + ROUNDING * origin.norm());
    List<Crossing> crossings = new ArrayList<>();
    Optional<Doubt> doubt = Optional.empty();
    for (int i = 0; i < charts.size(); i++) {
      ChartLineSearch search =
          new ChartLineSearch(
              line, i, workspace.enclosures.get(i), workspace.trims.get(i), crossings);
      Optional<Doubt> found = search.run(charts.get(i).root());
      doubt = doubt.or(() -> found);
    }
    crossings.sort(Comparator.comparingDouble(Crossing::t).thenComparingInt(Crossing::chart));
    return new Crossings(crossings, doubt);
  }
}
