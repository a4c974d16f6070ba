package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.Chart.Side;
import org.hullsum.geometry.Profile.Arc;
import org.hullsum.numeric.Vector3;

/**
 * A profile turned about an axis. The normal points to the right of the direction of travel along
 * the profile, drawn with radius to the right and height upward.
 *
 * <p>Each chart's u runs along the angle, its v along the profile.
 *
 * @param profile the curve
 * @param through a point of the axis, where the height is zero
 * @param along direction of the axis
 * @param sector range of the angle about the axis; a full turn if empty
 * @param zero where angles start; the default of the case format if empty
 */
public record RevolutionShape(
    Profile profile,
    VectorExpression through,
    Vector3 along,
    Optional<Span> sector,
    Optional<Vector3> zero)
    implements Shape {
  /** Points at which a formula profile is looked at. */
  private static final int SAMPLES = 129;

  public RevolutionShape {
    Objects.requireNonNull(profile, "profile");
    Objects.requireNonNull(through, "through");
    Objects.requireNonNull(along, "along");
    Objects.requireNonNull(sector, "sector");
    Objects.requireNonNull(zero, "zero");
  }

  @Override
  public Surface surface(Map<String, Double> parameters) throws SurfaceFault {
    Figures figures = new Figures(parameters);
    figures.value("through", through);
    Frame frame = Frame.about("along", along, zero);
    Figures.Turn turn = figures.turn("sector", sector.orElseGet(Span::fullTurn));
    List<Arc> arcs = profile.arcs(parameters);
    Ends ends = ends(arcs, figures);
    List<Chart> charts = new ArrayList<>();
    for (int i = 0; i < arcs.size(); i++) {
      if (ends.onAxis().get(i)) {
        continue;
      }
      Arc arc = arcs.get(i);
      VectorExpression position =
          through
              .plus(frame.radial(turn.span().at(Chart.u())).times(arc.radius()))
              .plus(frame.axis().times(arc.height()));
      ChartSides sides =
          new ChartSides()
              .turn(turn.full(), Side.U_START, Side.U_END)
              .add(Side.V_START, i == 0 && ends.startIsRim())
              .add(Side.V_END, i == arcs.size() - 1 && ends.endIsRim());
      charts.add(
          new Chart(
              position.simplified(),
              turn.full(),
              ends.smoothlyClosed() && arcs.size() == 1,
              sides.rim()));
    }
    return new Surface("revolution", charts, Optional.empty());
  }

  /**
   * What the two ends of the profile are.
   *
   * @param smoothlyClosed whether they meet in one point and one direction
   * @param onAxis for each arc, whether it lies on the axis and sweeps no surface
   */
  private record Ends(
      boolean startIsRim, boolean endIsRim, boolean smoothlyClosed, List<Boolean> onAxis) {}

  private static Ends ends(List<Arc> arcs, Figures figures) throws SurfaceFault {
    double[] v = new double[SAMPLES];
    for (int i = 0; i < SAMPLES; i++) {
      v[i] = i / (SAMPLES - 1.0);
    }
    double[][][] values = new double[arcs.size()][][];
    double size = 0;
    for (int i = 0; i < arcs.size(); i++) {
      Arc arc = arcs.get(i);
      values[i] =
          figures.values(List.of(arc.radius(), arc.height()), List.of(Chart.V), new double[][] {v});
      for (int k = 0; k < SAMPLES; k++) {
        if (!Double.isFinite(values[i][0][k]) || !Double.isFinite(values[i][1][k])) {
          throw new SurfaceFault("profile", "radius or height is not finite along the profile");
        }
        size = Math.max(size, Math.abs(values[i][0][k]));
      }
    }
    for (double[][] arc : values) {
      for (double radius : arc[0]) {
        if (radius < -Tolerance.ROUNDING * size) {
          throw new SurfaceFault(
              "profile",
              "the profile's radius reaches " + radius + "; it must not be negative anywhere");
        }
      }
    }
    if (size == 0) {
      throw new SurfaceFault("profile", "the profile lies on the axis and spans no surface");
    }
    double least = Tolerance.ROUNDING * size;
    List<Boolean> onAxis =
        Arrays.stream(values)
            .map(arc -> Arrays.stream(arc[0]).allMatch(radius -> radius <= least))
            .toList();
    double[][] last = values[arcs.size() - 1];
    double gap =
        Math.hypot(last[0][SAMPLES - 1] - values[0][0][0], last[1][SAMPLES - 1] - values[0][1][0]);
    boolean closed = gap <= Tolerance.POSITION * size;
    return new Ends(
        !closed && values[0][0][0] > Tolerance.ROUNDING * size,
        !closed && last[0][SAMPLES - 1] > Tolerance.ROUNDING * size,
        closed && arcs.size() == 1 && isSmooth(arcs.get(0), figures),
        onAxis);
  }

  /** Whether a closed arc ends in the direction in which it began. */
  private static boolean isSmooth(Arc arc, Figures figures) {
    VectorExpression speed =
        new VectorExpression(arc.radius(), arc.height(), Expression.number(0)).derivative(Chart.V);
    double[][] at =
        figures.values(List.of(speed.x(), speed.y()), List.of(Chart.V), new double[][] {{0, 1}});
    double change = Math.hypot(at[0][1] - at[0][0], at[1][1] - at[1][0]);
    return change <= Tolerance.POSITION * Math.hypot(at[0][0], at[1][0]);
  }
}
