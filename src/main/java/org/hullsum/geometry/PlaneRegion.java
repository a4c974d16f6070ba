package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.expression.Symbols;
import org.hullsum.geometry.Chart.Side;

/** A region of a coordinate plane over which a graph stands. */
public sealed interface PlaneRegion {
  /**
   * Maps of the unit square that cover the region, each turning u to v as the first coordinate
   * turns to the second.
   *
   * @param first name of the first coordinate of the plane
   * @param second name of the second
   * @param parameters the value of every parameter
   */
  List<Piece> pieces(String first, String second, Map<String, Double> parameters)
      throws SurfaceFault;

  /**
   * A map of the unit square.
   *
   * @param first the first coordinate, in {@code u} and {@code v}
   * @param second the second
   * @param periodicU whether u runs a full turn
   * @param periodicV whether v does
   * @param rim the sides on the region's boundary
   */
  record Piece(
      Expression first, Expression second, boolean periodicU, boolean periodicV, Set<Side> rim) {
    public Piece {
      rim = Set.copyOf(rim);
    }
  }

  /**
   * Two ranges, of which one may depend on the other coordinate.
   *
   * @param first of the first coordinate
   * @param second of the second
   */
  record Box(Span first, Span second) implements PlaneRegion {
    public Box {
      Objects.requireNonNull(first, "first");
      Objects.requireNonNull(second, "second");
    }

    @Override
    public List<Piece> pieces(String firstName, String secondName, Map<String, Double> parameters)
        throws SurfaceFault {
      Figures figures = new Figures(parameters);
      ParameterBox.Coordinate alongU = new ParameterBox.Coordinate(firstName, first, Chart.u());
      ParameterBox.Coordinate alongV = new ParameterBox.Coordinate(secondName, second, Chart.v());
      boolean firstIsInner =
          Symbols.in(first.from()).contains(secondName)
              || Symbols.in(first.to()).contains(secondName);
      ChartSides sides = new ChartSides();
      if (firstIsInner) {
        ParameterBox box = ParameterBox.of(alongV, alongU, figures);
        sides.add(Side.U_START, true).add(Side.U_END, true);
        sides.add(Side.V_START, !box.startCollapsed()).add(Side.V_END, !box.endCollapsed());
        return List.of(new Piece(box.inner(), box.outer(), false, false, sides.rim()));
      }
      ParameterBox box = ParameterBox.of(alongU, alongV, figures);
      sides.add(Side.V_START, true).add(Side.V_END, true);
      sides.add(Side.U_START, !box.startCollapsed()).add(Side.U_END, !box.endCollapsed());
      return List.of(new Piece(box.outer(), box.inner(), false, false, sides.rim()));
    }
  }

  /**
   * A disk.
   *
   * @param centre its middle
   * @param radius greater than zero
   */
  record Disk(Corner centre, Expression radius) implements PlaneRegion {
    public Disk {
      Objects.requireNonNull(centre, "centre");
      Objects.requireNonNull(radius, "radius");
    }

    @Override
    public List<Piece> pieces(String firstName, String secondName, Map<String, Double> parameters)
        throws SurfaceFault {
      Figures figures = new Figures(parameters);
      centre.value("centre", figures);
      figures.positive("radius", radius);
      Expression angle = Span.fullTurn().at(Chart.v());
      Expression distance = radius.times(Chart.u());
      return List.of(
          new Piece(
              centre.first().plus(distance.times(Expression.call(Function.COS, angle))),
              centre.second().plus(distance.times(Expression.call(Function.SIN, angle))),
              false,
              true,
              Set.of(Side.U_END)));
    }
  }

  /** A polygon, convex or not, its corners counted either way round. */
  record Polygon(List<Corner> corners) implements PlaneRegion {
    public Polygon {
      corners = List.copyOf(corners);
    }

    @Override
    public List<Piece> pieces(String firstName, String secondName, Map<String, Double> parameters)
        throws SurfaceFault {
      Figures figures = new Figures(parameters);
      List<Corner> turned = new ArrayList<>(corners);
      List<PlanePoint> points = new ArrayList<>();
      for (Corner corner : corners) {
        points.add(corner.value("polygon", figures));
      }
      if (points.size() > 2 && PlanePolygon.doubledArea(points) < 0) {
        Collections.reverse(points);
        Collections.reverse(turned);
      }
      List<Piece> pieces = new ArrayList<>();
      for (PlanePolygon.Triangle t : PlanePolygon.of("polygon", points).triangles("polygon")) {
        Corner a = turned.get(t.a());
        Corner b = turned.get(t.b());
        Corner c = turned.get(t.c());
        pieces.add(
            new Piece(
                TriangleChart.at(a.first(), b.first(), c.first()),
                TriangleChart.at(a.second(), b.second(), c.second()),
                false,
                false,
                TriangleChart.rim(t, turned.size())));
      }
      return pieces;
    }
  }

  /**
   * A point of the plane.
   *
   * @param first its first coordinate
   * @param second its second
   */
  record Corner(Expression first, Expression second) {
    public Corner {
      Objects.requireNonNull(first, "first");
      Objects.requireNonNull(second, "second");
    }

    private PlanePoint value(String key, Figures figures) throws SurfaceFault {
      return new PlanePoint(figures.value(key, first), figures.value(key, second));
    }
  }
}
