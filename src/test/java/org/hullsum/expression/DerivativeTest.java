package org.hullsum.expression;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Relation;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

class DerivativeTest {
  private static final Expression X = Expression.symbol("x");
  private static final Expression Y = Expression.symbol("y");

  private static double at(Expression e, Map<String, Double> point, double shift) {
    Map<String, Double> moved = new HashMap<>(point);
    moved.merge("x", shift, Double::sum);
    return NaiveEvaluator.evaluate(e, moved);
  }

  /** The central difference, with two extrapolations (Richardson), and an estimate of its error. */
  private static double[] difference(Expression e, Map<String, Double> point) {
    double h = 1e-2;
    double[] d = new double[4];
    for (int i = 0; i < d.length; i++, h /= 2) {
      d[i] = (at(e, point, h) - at(e, point, -h)) / (2 * h);
    }
    double[] first = {
      (4 * d[1] - d[0]) / 3, (4 * d[2] - d[1]) / 3, (4 * d[3] - d[2]) / 3,
    };
    double[] second = {(16 * first[1] - first[0]) / 15, (16 * first[2] - first[1]) / 15};
    double noise = 1e-12 * Math.abs(at(e, point, 0)) / h;
    return new double[] {
      second[1], Math.abs(second[1] - second[0]) + Math.abs(second[1] - first[2]) + noise
    };
  }

  private static int compare(Expression e, Map<String, Double> point) {
    double[] expected = difference(e, point);
    double scale = Math.max(1, Math.abs(expected[0]));
    if (!(expected[1] < 1e-4 * scale) || RandomExpressions.isWild(e, point)) {
      return 0;
    }
    double found = NaiveEvaluator.evaluate(Derivative.of(e, "x"), point);
    if (!Double.isFinite(found)) {
      // a function that saturates or overflows: no finite derivative to compare
      return 0;
    }
    assertEquals(
        expected[0],
        found,
        10 * expected[1] + 1e-8 * scale,
        () -> "d/dx " + e + " at " + point + " is " + Derivative.of(e, "x"));
    return 1;
  }

  @ParameterizedTest
  @ValueSource(longs = {11, 12, 13, 14, 15, 16})
  void smoothFormulasAgreeWithCentralDifferences(long seed) {
    RandomExpressions source = RandomExpressions.smooth(seed);
    int compared = 0;
    for (int i = 0; i < 300; i++) {
      Expression e = source.next(5);
      for (int k = 0; k < 3; k++) {
        compared += compare(e, source.point());
      }
    }
    assertTrue(compared > 250, "only " + compared + " points could be compared");
  }

  @ParameterizedTest
  @ValueSource(longs = {21, 22, 23})
  void switchingFormulasAgreeWithCentralDifferencesOffTheirSwitches(long seed) {
    RandomExpressions source = RandomExpressions.any(seed);
    int compared = 0;
    for (int i = 0; i < 300; i++) {
      Expression e = source.next(4);
      List<Expression> switches = Switches.of(e);
      Map<String, Double> point = source.point();
      boolean away =
          switches.stream()
              .allMatch(
                  s ->
                      Math.signum(at(s, point, -0.02)) == Math.signum(at(s, point, 0.02))
                          && Math.signum(at(s, point, 0)) == Math.signum(at(s, point, 0.02))
                          && at(s, point, 0) != 0);
      if (away) {
        compared += compare(e, point);
      }
    }
    assertTrue(compared > 60, "only " + compared + " points could be compared");
  }

  @ParameterizedTest
  @EnumSource(Function.class)
  void everyFunctionAgreesWithCentralDifferences(Function function) {
    Expression u = X.times(Y).over(Expression.number(4));
    Expression v = X.minus(Y.power(2));
    Expression e =
        function.fewestArguments() == 1
            ? Expression.call(function, u)
            : Expression.call(function, u, v);
    Map<String, Double> point = Map.of("x", 0.8, "y", 1.3);
    assertEquals(1, compare(e, point));
  }

  @Test
  void powerWithVariableExponentUsesTheLogarithm() {
    Expression e = new Expression.Binary(Expression.Operator.POWER, X, X);
    Map<String, Double> point = Map.of("x", 1.7);
    assertEquals(
        Math.pow(1.7, 1.7) * (Math.log(1.7) + 1),
        NaiveEvaluator.evaluate(Derivative.of(e, "x"), point),
        1e-12);
  }

  @Test
  void extremeOfThreeTakesTheDerivativeOfTheOneThatHolds() {
    Expression e = new Call(Function.MAX, List.of(X, Y, X.times(Expression.number(3))));
    assertEquals(3, NaiveEvaluator.evaluate(Derivative.of(e, "x"), Map.of("x", 2.0, "y", 5.0)));
    assertEquals(0, NaiveEvaluator.evaluate(Derivative.of(e, "x"), Map.of("x", 2.0, "y", 7.0)));
    assertEquals(1, NaiveEvaluator.evaluate(Derivative.of(e, "x"), Map.of("x", -2.0, "y", -7.0)));
  }

  @Test
  void conditionsStayAsTheyAre() {
    Expression condition = new Comparison(Relation.LESS, X, Y);
    Expression e = new Conditional(condition, X.power(2), Y);
    assertEquals("if(x < y, 2*x, 0)", Printer.print(Derivative.of(e, "x")));
  }

  @Test
  void derivativeBySymbolThatDoesNotOccurIsZero() {
    assertEquals(Algebra.ZERO, Derivative.of(Expression.call(Function.SIN, X), "q"));
  }

  @Test
  void paraboloidDerivesToWhatAPersonWouldWrite() {
    Expression e =
        Expression.symbol("lift")
            .times(Expression.symbol("radius").power(2).minus(X.power(2)).minus(Y.power(2)));
    assertEquals("lift*(radius^2 - x^2 - y^2)", Printer.print(e));
  }
}
