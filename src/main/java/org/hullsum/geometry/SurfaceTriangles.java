package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.hullsum.numeric.Vector3;

/**
 * Triangles close to a surface, for what looks at it from some way off.
 *
 * <p>Each chart's square is halved until its triangles are as close as asked; cells that a trim may
 * cut are halved further and then cut. Neighbouring triangles of a chart share their corners, so
 * within it there are no cracks.
 *
 * @param corners three for each triangle, its normal to the side of the construction normal
 * @param borders the sides of the charts and the curves of the trim, as the triangles follow them
 * @param deviation how far the surface may be from the triangles: twice the largest distance
 *     measured at midpoints, which covers any smooth piece and one kink between two corners ({@link
 *     Double#POSITIVE_INFINITY} where a position is not finite)
 */
public record SurfaceTriangles(List<Vector3> corners, List<Border> borders, double deviation) {
  /**
   * A straight piece of a border.
   *
   * @param from its first end
   * @param to its second end
   * @param deviation how far the border may be from it, found likewise
   */
  public record Border(Vector3 from, Vector3 to, double deviation) {
    public Border {
      Objects.requireNonNull(from, "from");
      Objects.requireNonNull(to, "to");
    }
  }

  public SurfaceTriangles {
    corners = List.copyOf(corners);
    borders = List.copyOf(borders);
  }

  /**
   * The triangles of a surface.
   *
   * @param parameters the value of every parameter
   * @param deviation wanted, relative to the extent of the surface; not reached where that takes
   *     too many triangles, which {@link #deviation} then says
   */
  public static SurfaceTriangles of(
      Surface surface, Map<String, Double> parameters, double deviation) {
    double wanted = deviation * Extent.of(surface, parameters);
    List<Vector3> corners = new ArrayList<>();
    List<Border> borders = new ArrayList<>();
    double largest = 0;
    for (Chart chart : surface.charts()) {
      ChartTrianglesBuilder builder =
          new ChartTrianglesBuilder(
              ChartPositions.of(chart, parameters),
              new KeptRegion(surface.trimOn(chart), parameters),
              wanted);
      SurfaceTriangles built = builder.build();
      corners.addAll(built.corners());
      borders.addAll(built.borders());
      largest = Math.max(largest, built.deviation());
    }
    return new SurfaceTriangles(corners, borders, largest);
  }
}
