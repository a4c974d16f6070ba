package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Substitution;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.Chart.Side;

/**
 * The graph of one coordinate as a function of the two others, normal towards + of that coordinate.
 *
 * @param subject the coordinate that is given by a formula
 * @param value the formula, in the two others
 * @param over the region of the two others
 */
public record GraphShape(Subject subject, Expression value, PlaneRegion over) implements Shape {
  /** Points along each direction at which the formula is looked at. */
  private static final int SAMPLES = 9;

  /** The coordinate that a graph gives, with the two others in alphabetical order. */
  public enum Subject {
    X("x", "y", "z"),
    Y("y", "x", "z"),
    Z("z", "x", "y");

    private final String word;
    private final String first;
    private final String second;

    Subject(String word, String first, String second) {
      this.word = word;
      this.first = first;
      this.second = second;
    }

    public String word() {
      return word;
    }

    /** The first coordinate of the region. */
    public String first() {
      return first;
    }

    /** The second. */
    public String second() {
      return second;
    }

    /** Whether first × second points towards + of the subject. */
    private boolean rightHanded() {
      return this != Y;
    }
  }

  public GraphShape {
    Objects.requireNonNull(subject, "subject");
    Objects.requireNonNull(value, "value");
    Objects.requireNonNull(over, "over");
  }

  @Override
  public Surface surface(Map<String, Double> parameters) throws SurfaceFault {
    Figures figures = new Figures(parameters);
    List<Chart> charts = new ArrayList<>();
    for (PlaneRegion.Piece piece : over.pieces(subject.first(), subject.second(), parameters)) {
      Chart chart = chart(subject.rightHanded() ? piece : mirrored(piece));
      checkFinite(chart, figures);
      charts.add(chart);
    }
    return new Surface("graph", charts, Optional.empty());
  }

  private Chart chart(PlaneRegion.Piece piece) {
    Expression a = piece.first();
    Expression b = piece.second();
    Expression at = Substitution.replace(value, Map.of(subject.first(), a, subject.second(), b));
    VectorExpression position =
        switch (subject) {
          case X -> new VectorExpression(at, a, b);
          case Y -> new VectorExpression(a, at, b);
          case Z -> new VectorExpression(a, b, at);
        };
    return new Chart(position.simplified(), piece.periodicU(), piece.periodicV(), piece.rim());
  }

  /** The same piece with u and v exchanged. */
  private static PlaneRegion.Piece mirrored(PlaneRegion.Piece piece) {
    Map<String, Expression> exchange = Map.of(Chart.U, Chart.v(), Chart.V, Chart.u());
    Set<Side> rim = EnumSet.noneOf(Side.class);
    piece.rim().forEach(side -> rim.add(mirrored(side)));
    return new PlaneRegion.Piece(
        Substitution.replace(piece.first(), exchange),
        Substitution.replace(piece.second(), exchange),
        piece.periodicV(),
        piece.periodicU(),
        rim);
  }

  private static Side mirrored(Side side) {
    return switch (side) {
      case U_START -> Side.V_START;
      case U_END -> Side.V_END;
      case V_START -> Side.U_START;
      case V_END -> Side.U_END;
    };
  }

  private void checkFinite(Chart chart, Figures figures) throws SurfaceFault {
    double[][] at = ChartSamples.grid(SAMPLES);
    VectorExpression r = chart.position();
    double[][] values = figures.values(List.of(r.x(), r.y(), r.z()), List.of(Chart.U, Chart.V), at);
    for (int i = 0; i < at[0].length; i++) {
      if (!Double.isFinite(values[0][i] + values[1][i] + values[2][i])) {
        throw new SurfaceFault(
            subject.word(),
            "the formula is not finite at ("
                + values[0][i]
                + ", "
                + values[1][i]
                + ", "
                + values[2][i]
                + "); limit the region to where it is");
      }
    }
  }
}
