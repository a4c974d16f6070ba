package org.hullsum.geometry;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;

/**
 * A rigid motion of a surface: first a turn about an axis through the origin, then a move.
 *
 * @param turn the turn, if any
 * @param move by how much it is moved, if at all
 */
public record Placement(Optional<Turn> turn, Optional<VectorExpression> move) {
  /**
   * A right-handed turn.
   *
   * @param about the axis through the origin, of any length
   * @param angle in radians
   */
  public record Turn(Vector3 about, Expression angle) {
    public Turn {
      Objects.requireNonNull(about, "about");
      Objects.requireNonNull(angle, "angle");
    }
  }

  public Placement {
    Objects.requireNonNull(turn, "turn");
    Objects.requireNonNull(move, "move");
  }

  /**
   * The surface in its place. A trim stays where it is: its bodies are in the case's coordinates.
   *
   * @throws SurfaceFault where the axis has no direction or a figure is not finite
   */
  public Surface placed(Surface surface, Map<String, Double> parameters) throws SurfaceFault {
    Figures figures = new Figures(parameters);
    if (turn.isPresent()) {
      Figures.direction("about", turn.get().about());
      figures.value("angle", turn.get().angle());
    }
    if (move.isPresent()) {
      figures.value("move", move.get());
    }
    List<Chart> charts =
        surface.charts().stream()
            .map(
                chart ->
                    new Chart(
                        moved(chart.position()).simplified(),
                        chart.periodicU(),
                        chart.periodicV(),
                        chart.rim()))
            .toList();
    return new Surface(surface.kind(), charts, surface.trim());
  }

  /** A point in its place. */
  public VectorExpression placed(VectorExpression point) {
    return moved(point).simplified();
  }

  private VectorExpression moved(VectorExpression r) {
    VectorExpression turned = turn.isPresent() ? turned(r, turn.get()) : r;
    return move.isPresent() ? turned.plus(move.get()) : turned;
  }

  /** Rodrigues' formula: r cos φ + k × r sin φ + k (k·r)(1 − cos φ). */
  private static VectorExpression turned(VectorExpression r, Turn turn) {
    VectorExpression k = VectorExpression.of(turn.about().unit());
    Expression cosine = Expression.call(Function.COS, turn.angle());
    Expression sine = Expression.call(Function.SIN, turn.angle());
    return r.times(cosine)
        .plus(k.cross(r).times(sine))
        .plus(k.times(k.dot(r).times(Expression.number(1).minus(cosine))));
  }
}
