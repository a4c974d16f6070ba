package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Substitution;

/** A curve in the half plane of radius and height, to be turned about the axis. */
public sealed interface Profile {
  /** The variable of a {@link Curve}. */
  String S = "s";

  /** The smooth pieces, in the order of travel. */
  List<Arc> arcs(Map<String, Double> parameters) throws SurfaceFault;

  /**
   * A smooth piece of a profile.
   *
   * @param radius in {@code v}
   * @param height in {@code v}
   */
  record Arc(Expression radius, Expression height) {
    public Arc {
      Objects.requireNonNull(radius, "radius");
      Objects.requireNonNull(height, "height");
    }
  }

  /**
   * A point of a {@link Polyline}.
   *
   * @param radius distance from the axis, not negative
   * @param height along the axis
   */
  record Point(Expression radius, Expression height) {
    public Point {
      Objects.requireNonNull(radius, "radius");
      Objects.requireNonNull(height, "height");
    }

    private boolean coincides(Point other, Figures figures) throws SurfaceFault {
      return figures.value("profile", radius) == figures.value("profile", other.radius)
          && figures.value("profile", height) == figures.value("profile", other.height);
    }
  }

  /** Straight pieces between points. */
  record Polyline(List<Point> points) implements Profile {
    public Polyline {
      points = List.copyOf(points);
    }

    @Override
    public List<Arc> arcs(Map<String, Double> parameters) throws SurfaceFault {
      Figures figures = new Figures(parameters);
      if (points.size() < 2) {
        throw new SurfaceFault(
            "profile", "the profile has " + points.size() + " point(s); state at least two");
      }
      List<Arc> arcs = new ArrayList<>();
      for (int i = 1; i < points.size(); i++) {
        Point start = points.get(i - 1);
        Point end = points.get(i);
        if (start.coincides(end, figures)) {
          throw new SurfaceFault(
              "profile",
              "points " + i + " and " + (i + 1) + " of the profile coincide; leave one out");
        }
        arcs.add(
            new Arc(
                new Span(start.radius(), end.radius()).at(Chart.v()),
                new Span(start.height(), end.height()).at(Chart.v())));
      }
      return arcs;
    }
  }

  /**
   * Radius and height as formulas.
   *
   * @param radius in {@code s}
   * @param height in {@code s}
   * @param s range of {@code s}
   */
  record Curve(Expression radius, Expression height, Span s) implements Profile {
    public Curve {
      Objects.requireNonNull(radius, "radius");
      Objects.requireNonNull(height, "height");
      Objects.requireNonNull(s, "s");
    }

    @Override
    public List<Arc> arcs(Map<String, Double> parameters) throws SurfaceFault {
      new Figures(parameters).increasing("s", s);
      Map<String, Expression> along = Map.of(S, s.at(Chart.v()));
      return List.of(
          new Arc(Substitution.replace(radius, along), Substitution.replace(height, along)));
    }
  }
}
