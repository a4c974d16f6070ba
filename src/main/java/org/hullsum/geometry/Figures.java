package org.hullsum.geometry;

import java.util.List;
import java.util.Map;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;

/** Values of formulas of the parameters, and the checks that all kinds of surface share. */
final class Figures {
  private final Map<String, Double> parameters;

  Figures(Map<String, Double> parameters) {
    this.parameters = Map.copyOf(parameters);
  }

  Map<String, Double> parameters() {
    return parameters;
  }

  /** The value, finite or refused. */
  double value(String key, Expression e) throws SurfaceFault {
    double value = values(List.of(e), List.of(), new double[0][1])[0][0];
    if (!Double.isFinite(value)) {
      throw new SurfaceFault(key, key + " is not a finite number; correct the formula");
    }
    return value;
  }

  Vector3 value(String key, VectorExpression e) throws SurfaceFault {
    return new Vector3(value(key, e.x()), value(key, e.y()), value(key, e.z()));
  }

  /**
   * Formulas in named variables at several points.
   *
   * @param inputs {@code inputs[k][i]}: variable k at point i
   * @return {@code [k][i]}: formula k at point i
   */
  double[][] values(List<Expression> formulas, List<String> variables, double[][] inputs) {
    int count = inputs.length == 0 ? 1 : inputs[0].length;
    BatchEvaluator evaluator = BatchEvaluator.compile(variables, parameters, formulas);
    double[][] outputs = new double[formulas.size()][count];
    evaluator.evaluate(inputs, count, outputs, evaluator.workspace());
    return outputs;
  }

  double positive(String key, Expression e) throws SurfaceFault {
    double value = value(key, e);
    if (!(value > 0)) {
      throw new SurfaceFault(key, key + " is " + value + ", and must be greater than zero");
    }
    return value;
  }

  double notNegative(String key, Expression e) throws SurfaceFault {
    double value = value(key, e);
    if (!(value >= 0)) {
      throw new SurfaceFault(key, key + " is " + value + ", and must not be negative");
    }
    return value;
  }

  /** A stated direction, scaled to length one. */
  static Vector3 direction(String key, Vector3 direction) throws SurfaceFault {
    if (!direction.isFinite()) {
      throw new SurfaceFault(key, key + " is not finite; state three finite numbers");
    }
    if (direction.norm() == 0) {
      throw new SurfaceFault(
          key, key + " has length zero; state a direction such as [0, 0, 1], of any length");
    }
    return direction.unit();
  }

  /** Checks a range of an angle: increasing, and by no more than one turn. */
  Turn turn(String key, Span span) throws SurfaceFault {
    double from = value(key, span.from());
    double to = value(key, span.to());
    double full = 2 * Math.PI;
    if (!(to > from)) {
      throw new SurfaceFault(
          key, key + " goes from " + from + " rad to " + to + " rad; state the smaller one first");
    }
    if (to - from > full * (1 + Tolerance.ROUNDING)) {
      throw new SurfaceFault(
          key, key + " spans " + (to - from) + " rad, more than a full turn; end it earlier");
    }
    return new Turn(span, to - from >= full * (1 - Tolerance.ROUNDING));
  }

  /** Checks a range of a coordinate: increasing. */
  void increasing(String key, Span span) throws SurfaceFault {
    double from = value(key, span.from());
    double to = value(key, span.to());
    if (!(to > from)) {
      throw new SurfaceFault(
          key, key + " goes from " + from + " to " + to + "; state the smaller one first");
    }
  }

  /**
   * An angle's range.
   *
   * @param span in radians
   * @param full whether it is a whole turn
   */
  record Turn(Span span, boolean full) {}
}
