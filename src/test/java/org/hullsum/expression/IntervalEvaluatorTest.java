package org.hullsum.expression;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.hullsum.numeric.ErrorFunction;
import org.hullsum.numeric.Interval;
import org.hullsum.problem.TextFault;
import org.hullsum.units.WorkingUnits;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class IntervalEvaluatorTest {
  private static final List<String> VARIABLES = RandomExpressions.VARIABLES;

  private static Expression read(String text) {
    try {
      return ExpressionParser.parse(text, VARIABLES, WorkingUnits.SI).root();
    } catch (TextFault fault) {
      throw new AssertionError(text, fault);
    }
  }

  private static IntervalEvaluator compiled(Expression e) {
    return IntervalEvaluator.compile(VARIABLES, Map.of(), List.of(e));
  }

  /** Over x in [low, high], y in [1, 2], z = 0. */
  private static IntervalEvaluator.Workspace over(
      IntervalEvaluator evaluator, double low, double high) {
    IntervalEvaluator.Workspace workspace = evaluator.workspace();
    evaluator.evaluate(new double[] {low, 1, 0}, new double[] {high, 2, 0}, workspace);
    return workspace;
  }

  @ParameterizedTest
  @ValueSource(longs = {51, 52, 53, 54, 55, 56, 57, 58})
  void everyValueAtAMemberLiesInTheEnclosure(long seed) {
    RandomExpressions source = RandomExpressions.any(seed);
    Random random = new Random(seed);
    int informative = 0;
    for (int i = 0; i < 400; i++) {
      Expression e = source.next(5);
      IntervalEvaluator evaluator = compiled(e);
      IntervalEvaluator.Workspace workspace = evaluator.workspace();
      // a comparison with what is undefined does not hold, so its value is defined all the same
      boolean compares =
          Symbols.parts(e).stream().anyMatch(part -> part instanceof Expression.Comparison);
      for (int box = 0; box < 4; box++) {
        double[] low = new double[3];
        double[] high = new double[3];
        double size = box == 0 ? 0 : Math.pow(10, -2 * random.nextDouble());
        for (int k = 0; k < 3; k++) {
          low[k] = 4 * random.nextDouble() - 2;
          high[k] = low[k] + size * random.nextDouble();
        }
        evaluator.evaluate(low, high, workspace);
        informative += workspace.high(0) - workspace.low(0) < 1000 ? 1 : 0;
        boolean safe = true;
        for (int h = 0; h < evaluator.hazards().size(); h++) {
          safe &= !evaluator.mayBeUndefined(h, workspace);
        }
        for (int sample = 0; sample < 12; sample++) {
          Map<String, Double> point = new HashMap<>();
          for (int k = 0; k < 3; k++) {
            point.put(VARIABLES.get(k), member(low[k], high[k], sample, random));
          }
          if (RandomExpressions.isWild(e, point)) {
            continue;
          }
          double value = NaiveEvaluator.evaluate(e, point);
          boolean overflow =
              Double.isInfinite(workspace.low(0)) || Double.isInfinite(workspace.high(0));
          if (Double.isNaN(value)) {
            assertTrue(
                !safe || overflow, () -> Printer.print(e) + " is NaN at " + point + " unforeseen");
          } else if ((safe || Double.isFinite(value) && !compares)
              && (workspace.low(0) > value || workspace.high(0) < value)) {
            assertEquals(
                Double.NaN,
                value,
                Printer.print(e) + " at " + point + " in " + workspace.interval(0));
          }
        }
      }
    }
    assertTrue(informative > 800, "only " + informative + " boxes gave bounds");
  }

  private static double member(double low, double high, int sample, Random random) {
    if (sample < 2) {
      return sample == 0 ? low : high;
    }
    return Math.min(high, low + random.nextDouble() * (high - low));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "x^2 | -1 | 1 | 0 | 1",
        "x*x | -1 | 1 | 0 | 1",
        "x^3 | -1 | 2 | -1 | 8",
        "x - x | -1 | 2 | 0 | 0",
        "x^1.5 | -1 | 4 | 0 | 8",
        "sqrt(x) | -1 | 4 | 0 | 2",
        "1/x | 0.5 | 2 | 0.5 | 2",
        "sin(x) | 0 | 3 | 0 | 1",
        "sin(x) | 4 | 5 | -1 | -0.7568024953079282",
        "cos(x) | 3 | 4 | -1 | -0.6536436208636119",
        "cos(x) | -1 | 1 | 0.5403023058681398 | 1",
        "sin(x) | -100 | 100 | -1 | 1",
        "abs(x) | -3 | 2 | 0 | 3",
        "cosh(x) | -1 | 1 | 1 | 1.5430806348152437",
        "atan2(y, x) | 1 | 2 | 0.4636476090008061 | 1.1071487177940904",
        "hypot(x, y) | -1 | 1 | 1 | 2.23606797749979",
        "min(x, y) | 0 | 3 | 0 | 2",
        "sign(x) | -3 | 2 | -1 | 1",
        "if(x > 0, 1, 5) | 1 | 2 | 1 | 1",
        "if(x > 0, 1, 5) | -2 | -1 | 5 | 5",
        "if(x > 0, 1, 5) | -2 | 1 | 1 | 5",
        "if(x > 0 and x < 3, 1, 5) | 1 | 2 | 1 | 1",
        "tanh(x) | -1000 | 1000 | -1 | 1",
        "erfc(x) | 0 | 1 | 0.15729920705028513 | 1",
        "y^x | -1 | 1 | 0.5 | 2",
        "ln(x) | 1 | 2 | 0 | 0.6931471805599453",
      })
  void enclosureIsAsTightAsTheRange(
      String text, double low, double high, double least, double most) {
    IntervalEvaluator evaluator = compiled(read(text));
    IntervalEvaluator.Workspace workspace = over(evaluator, low, high);
    assertEquals(least, workspace.low(0), 1e-15 * Math.max(4, Math.abs(least)));
    assertEquals(most, workspace.high(0), 1e-15 * Math.max(4, Math.abs(most)));
    assertTrue(workspace.low(0) <= least && workspace.high(0) >= most, workspace.interval(0) + "");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "1/x | -1 | 1 | x is zero",
        "1/(x - 1) | 0 | 3 | x - 1 is zero",
        "x^-2 | -1 | 1 | x is zero",
        "1/(x^2 + z^2)^1.5 | -1 | 1 | x^2 + z^2 is zero",
        "ln(x) | 0 | 1 | x is not positive",
        "log10(x - 1) | 0 | 3 | x - 1 is not positive",
        "sqrt(x) | -1 | 1 | x is negative",
        "x^0.3 | -1 | 1 | x is negative",
        "x^y | -1 | 1 | x is negative",
        "asin(x) | 0 | 1.5 | x is outside -1 to 1",
        "tan(x) | 1 | 2 | x is an odd multiple of pi/2",
      })
  void hazardIsNamedWhereTheBoxReachesIt(String text, double low, double high, String named) {
    IntervalEvaluator evaluator = compiled(read(text));
    IntervalEvaluator.Workspace workspace = over(evaluator, low, high);
    List<String> found = new ArrayList<>();
    for (int h = 0; h < evaluator.hazards().size(); h++) {
      if (evaluator.mayBeUndefined(h, workspace)) {
        found.add(evaluator.hazards().get(h).toString());
        assertFalse(evaluator.certainlyUndefined(h, workspace));
      }
    }
    assertEquals(List.of(named), found);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "1/x | 0.001 | 1",
        "sqrt(x^2 + z^2) | -1 | 1",
        "sqrt(x^2*y) | -1 | 1",
        "ln(exp(x)) | -5 | 1",
        "(x^2)^0.3 | -1 | 1",
        "sqrt(abs(x)) | -1 | 1",
        "if(x > 0, ln(x), sqrt(y)) | -2 | -1",
        "if(x > 0, 1/(1 + x), 1/(x - 1)) | 1 | 3",
        "sin(x)/x | -1 | 1",
        "(1 - cos(x))/x^2 | -1 | 1",
        "y*sin(x)/(y*x) | -1 | 1",
        "(exp(x) - 1)/x | 0 | 1",
        "1/(2 + sin(x)) | -9 | 9",
      })
  void nothingIsFearedWhereTheFormulaIsDefined(String text, double low, double high) {
    IntervalEvaluator evaluator = compiled(read(text));
    IntervalEvaluator.Workspace workspace = over(evaluator, low, high);
    for (int h = 0; h < evaluator.hazards().size(); h++) {
      assertFalse(evaluator.mayBeUndefined(h, workspace), evaluator.hazards().get(h).toString());
    }
    assertTrue(Double.isFinite(workspace.low(0)) && Double.isFinite(workspace.high(0)));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "sqrt(x) | -2 | -1 | true",
        "ln(x) | -2 | 0 | true",
        "1/(x - x) | 1 | 2 | true",
        "acos(x) | 2 | 3 | true",
        "x^0.3 | -2 | -1 | true",
        "if(y > 1.5, sqrt(x), 1) | -2 | -1 | false",
        "if(y > 0, sqrt(x), 1) | -2 | -1 | true",
      })
  void whatIsUndefinedEverywhereIsSaidForCertainOnlyWhereItCounts(
      String text, double low, double high, boolean certain) {
    IntervalEvaluator evaluator = compiled(read(text));
    IntervalEvaluator.Workspace workspace = over(evaluator, low, high);
    boolean found = false;
    for (int h = 0; h < evaluator.hazards().size(); h++) {
      found |= evaluator.certainlyUndefined(h, workspace);
    }
    assertEquals(certain, found);
  }

  @Test
  void removableQuotientIsEnclosedByTheMeanValueOfTheDerivative() {
    IntervalEvaluator evaluator = compiled(read("sin(x)/x"));
    IntervalEvaluator.Workspace workspace = over(evaluator, -0.1, 0.1);
    assertEquals(Math.cos(0.1), workspace.low(0), 1e-14);
    assertEquals(1, workspace.high(0), 1e-14);
  }

  @Test
  void quotientWhoseNumeratorJumpsAtZeroIsNotRemovable() {
    IntervalEvaluator evaluator = compiled(read("(sign(x)*x^2 + sign(x))/x"));
    IntervalEvaluator.Workspace workspace = over(evaluator, -1, 1);
    assertTrue(evaluator.mayBeUndefined(0, workspace));
  }

  @Test
  void magnitudeOverASquareIsNotRemovable() {
    IntervalEvaluator evaluator = compiled(read("abs(x)/x^2"));
    IntervalEvaluator.Workspace workspace = over(evaluator, -1, 1);
    assertTrue(evaluator.mayBeUndefined(0, workspace));
  }

  @Test
  void magnitudeOverItsVariableIsEnclosedByItsSlopes() {
    IntervalEvaluator.Workspace workspace = over(compiled(read("abs(x)/x")), -1, 1);
    assertEquals(-1, workspace.low(0));
    assertEquals(1, workspace.high(0));
  }

  @Test
  void divisorThatOnlyTouchesZeroGivesAHalfLine() {
    IntervalEvaluator.Workspace workspace = over(compiled(read("1/x")), 0, 2);
    assertEquals(0.5, workspace.low(0), 1e-15);
    assertEquals(Double.POSITIVE_INFINITY, workspace.high(0));
  }

  @Test
  void constantsAreNotRoundedOnCompiling() {
    IntervalEvaluator evaluator = compiled(read("1/3 + 0*x"));
    Interval third =
        evaluator.evaluate(new Interval[] {Interval.UNIT, Interval.UNIT, Interval.UNIT})[0];
    BigDecimal exact = BigDecimal.ONE.divide(BigDecimal.valueOf(3), MathContext.DECIMAL128);
    assertTrue(new BigDecimal(third.low()).compareTo(exact) < 0);
    assertTrue(new BigDecimal(third.high()).compareTo(exact) > 0);
    assertTrue(third.width() < 1e-15);
  }

  @Test
  void errorFunctionIsWithinTheUnitsTakenForIt() {
    Random random = new Random(61);
    for (int i = 0; i < 300; i++) {
      double x = 4 * random.nextDouble();
      double exact = erf(x);
      assertEquals(exact, ErrorFunction.erf(x), 4 * Math.ulp(exact), "erf " + x);
    }
  }

  /** 2/√π Σ (−1)^k x^(2k+1)/(k! (2k+1)), in 60 digits. */
  private static double erf(double x) {
    MathContext digits = new MathContext(60);
    BigDecimal square = new BigDecimal(x).pow(2, digits);
    BigDecimal power = new BigDecimal(x);
    BigDecimal sum = BigDecimal.ZERO;
    for (int k = 0; k < 200; k++) {
      sum = sum.add(power.divide(BigDecimal.valueOf(2L * k + 1), digits), digits);
      power = power.multiply(square, digits).divide(BigDecimal.valueOf(-(k + 1L)), digits);
    }
    BigDecimal pi = new BigDecimal("3.14159265358979323846264338327950288419716939937510582097494");
    return sum.multiply(BigDecimal.valueOf(2)).divide(pi.sqrt(digits), digits).doubleValue();
  }

  @Test
  void emptyOrUndefinedSideOfABoxIsRefused() {
    IntervalEvaluator evaluator = compiled(read("x"));
    assertThrows(IllegalArgumentException.class, () -> over(evaluator, 1, 0));
    assertThrows(IllegalArgumentException.class, () -> over(evaluator, Double.NaN, 0));
  }

  @Test
  void workspaceOfAnotherEvaluatorIsRefused() {
    IntervalEvaluator evaluator = compiled(read("x"));
    IntervalEvaluator.Workspace other = compiled(read("x")).workspace();
    assertThrows(
        IllegalArgumentException.class,
        () -> evaluator.evaluate(new double[3], new double[3], other));
  }
}
