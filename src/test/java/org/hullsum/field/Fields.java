package org.hullsum.field;

import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.stream.IntStream;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.Expression;
import org.hullsum.expression.ExpressionParser;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.TextFault;
import org.hullsum.units.WorkingUnits;

/** Fields from texts, and their values. */
final class Fields {
  static final List<String> SPACE = List.of("x", "y", "z", "t");
  static final Map<String, Double> PARAMETERS = Map.of("a", 1.3, "b", 0.7, "k", 2.5);

  private static final List<String> SYMBOLS =
      List.of("x", "y", "z", "t", "r", "theta", "polar", "azimuth", "a", "b", "k");

  /** Step of the differences: their error is h⁴ and rounding over h, both near 1e-11 here. */
  private static final double STEP = 2e-3;

  private Fields() {}

  static Expression parse(String text) {
    try {
      return ExpressionParser.parse(text, SYMBOLS, WorkingUnits.SI).root();
    } catch (TextFault fault) {
      throw new IllegalArgumentException(text, fault);
    }
  }

  static VectorExpression vector(String x, String y, String z) {
    return new VectorExpression(parse(x), parse(y), parse(z));
  }

  static double value(Expression e, Vector3 at) {
    BatchEvaluator evaluator = BatchEvaluator.compile(SPACE, PARAMETERS, List.of(e));
    double[][] result = new double[1][1];
    double[][] inputs = {{at.x()}, {at.y()}, {at.z()}, {0.4}};
    evaluator.evaluate(inputs, 1, result, evaluator.workspace());
    return result[0][0];
  }

  static Vector3 value(VectorExpression v, Vector3 at) {
    return new Vector3(value(v.x(), at), value(v.y(), at), value(v.z(), at));
  }

  /** ∂e/∂(direction) by the five-point central difference, of fourth order. */
  static double slope(Expression e, Vector3 at, Vector3 direction) {
    double near =
        value(e, at.plus(direction.times(STEP))) - value(e, at.minus(direction.times(STEP)));
    double far =
        value(e, at.plus(direction.times(2 * STEP)))
            - value(e, at.minus(direction.times(2 * STEP)));
    return (8 * near - far) / (12 * STEP);
  }

  static double numericDivergence(VectorField field, Vector3 at) {
    return slope(field.cartesian().x(), at, Vector3.X)
        + slope(field.cartesian().y(), at, Vector3.Y)
        + slope(field.cartesian().z(), at, Vector3.Z);
  }

  /** Points away from the coordinate planes, where every angle is smooth. */
  static List<Vector3> points(long seed, int count) {
    Random random = new Random(seed);
    return IntStream.range(0, count)
        .mapToObj(i -> new Vector3(coordinate(random), coordinate(random), coordinate(random)))
        .toList();
  }

  private static double coordinate(Random random) {
    return 0.5 + random.nextDouble();
  }
}
