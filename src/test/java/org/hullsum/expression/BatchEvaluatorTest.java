package org.hullsum.expression;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Relation;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class BatchEvaluatorTest {
  private static final Expression X = Expression.symbol("x");
  private static final Expression Y = Expression.symbol("y");
  private static final Expression K = Expression.symbol("k");
  private static final double POWER_ACCURACY = 1e-9;

  private static double[] at(Expression e, double... xs) {
    BatchEvaluator evaluator = BatchEvaluator.compile(List.of("x"), Map.of(), List.of(e));
    double[] values = new double[xs.length];
    evaluator.evaluate(
        new double[][] {xs}, xs.length, new double[][] {values}, evaluator.workspace());
    return values;
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void randomFormulasAgreeWithOnePointThroughTheTree(long seed) {
    RandomExpressions source = RandomExpressions.any(seed);
    List<Expression> outputs = new ArrayList<>();
    for (int i = 0; i < 40; i++) {
      outputs.add(source.next(5));
    }
    BatchEvaluator evaluator =
        BatchEvaluator.compile(RandomExpressions.VARIABLES, Map.of(), outputs);
    int count = 700;
    double[][] inputs = new double[3][count];
    List<Map<String, Double>> points = new ArrayList<>();
    for (int i = 0; i < count; i++) {
      Map<String, Double> point = source.point();
      points.add(point);
      for (int k = 0; k < 3; k++) {
        inputs[k][i] = point.get(RandomExpressions.VARIABLES.get(k));
      }
    }
    double[][] values = new double[outputs.size()][count];
    evaluator.evaluate(inputs, count, values, evaluator.workspace());
    int agreeing = 0;
    int compared = 0;
    for (int k = 0; k < outputs.size(); k++) {
      for (int i = 0; i < count; i++) {
        double expected = NaiveEvaluator.evaluate(outputs.get(k), points.get(i));
        compared++;
        boolean close =
            Double.compare(expected, values[k][i]) == 0
                || expected == values[k][i]
                || Math.abs(expected - values[k][i])
                    <= POWER_ACCURACY * Math.max(1, Math.abs(expected));
        agreeing += close ? 1 : 0;
      }
    }
    // powers are multiplied out, so a rounding may be amplified or flip a condition now and then
    assertTrue(compared - agreeing <= compared / 500, compared - agreeing + " of " + compared);
  }

  @Test
  void branchNotTakenLeavesNoTraceOfItsNaN() {
    Expression e =
        new Conditional(
            new Comparison(Relation.GREATER, X, Expression.number(0)),
            Expression.call(Function.LN, X),
            Expression.number(-1));
    assertArrayEquals(new double[] {-1, -1, 0, Math.log(2)}, at(e, -3, 0, 1, 2));
  }

  @Test
  void sharedSubexpressionsAreComputedOnceOverAllOutputs() {
    Expression r2 = X.power(2).plus(Y.power(2));
    Expression again = X.power(2).plus(Y.power(2));
    BatchEvaluator evaluator =
        BatchEvaluator.compile(List.of("x", "y"), Map.of(), List.of(X.over(r2), Y.over(again)));
    assertEquals(5, evaluator.instructionCount());
  }

  @Test
  void constantPartsAreComputedOnCompiling() {
    Expression e = Expression.call(Function.SIN, K.times(Expression.number(2))).times(X);
    BatchEvaluator evaluator = BatchEvaluator.compile(List.of("x"), Map.of("k", 0.25), List.of(e));
    assertEquals(1, evaluator.instructionCount());
    double[] out = new double[1];
    evaluator.evaluate(new double[][] {{3}}, 1, new double[][] {out}, evaluator.workspace());
    assertEquals(3 * Math.sin(0.5), out[0]);
  }

  @Test
  void powersFollowTheLibraryAtSpecialValues() {
    double[] xs = {-2, -0.5, 0, 0.25, 3};
    for (double exponent : new double[] {2, 3, 5, -1, -3, 0.5, 1.5, -0.5, 40, 0, 1, 0.3}) {
      double[] values = at(X.power(exponent), xs);
      for (int i = 0; i < xs.length; i++) {
        double expected = Math.pow(xs[i], exponent);
        assertEquals(
            expected,
            values[i],
            Double.isFinite(expected) ? 1e-14 * Math.abs(expected) + Double.MIN_VALUE : 1,
            xs[i] + "^" + exponent);
      }
    }
  }

  @Test
  void constantOutputAndUnusedVariableNeedNoInput() {
    BatchEvaluator evaluator =
        BatchEvaluator.compile(List.of("x", "y"), Map.of(), List.of(Expression.number(7), X));
    double[][] out = new double[2][2];
    evaluator.evaluate(new double[][] {{1, 2}, {}}, 2, out, evaluator.workspace());
    assertArrayEquals(new double[] {7, 7}, out[0]);
    assertArrayEquals(new double[] {1, 2}, out[1]);
    assertEquals(2, evaluator.outputCount());
    assertEquals(2, evaluator.variableCount());
  }

  @Test
  void symbolThatIsNeitherVariableNorConstantIsRefused() {
    IllegalArgumentException fault =
        assertThrows(
            IllegalArgumentException.class,
            () -> BatchEvaluator.compile(List.of("x"), Map.of(), List.of(K)));
    assertTrue(fault.getMessage().contains("k"), fault.getMessage());
  }

  @Test
  void workspaceOfAnotherEvaluatorIsRefused() {
    BatchEvaluator one = BatchEvaluator.compile(List.of("x"), Map.of(), List.of(X));
    BatchEvaluator other = BatchEvaluator.compile(List.of("x"), Map.of(), List.of(X));
    assertThrows(
        IllegalArgumentException.class,
        () -> one.evaluate(new double[1][1], 1, new double[1][1], other.workspace()));
  }
}
