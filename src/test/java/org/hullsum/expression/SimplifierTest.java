package org.hullsum.expression;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.hullsum.problem.TextFault;
import org.hullsum.units.WorkingUnits;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class SimplifierTest {
  private static final List<String> SYMBOLS =
      List.of("x", "y", "z", "t", "r", "theta", "polar", "a", "b", "k", "lift", "radius", "T", "h");

  private static Expression read(String text) {
    try {
      return ExpressionParser.parse(text, SYMBOLS, WorkingUnits.SI).root();
    } catch (TextFault fault) {
      throw new AssertionError(text + ": " + fault.getMessage(), fault);
    }
  }

  private static String simplified(String text) {
    return Printer.print(Simplifier.simplify(read(text)));
  }

  private static Expression divergence(String p, String q, String r) {
    Expression sum =
        Derivative.of(read(p), "x")
            .plus(Derivative.of(read(q), "y"))
            .plus(Derivative.of(read(r), "z"));
    return Simplifier.simplify(sum);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "x - x | 0",
        "2*x + 3*x | 5*x",
        "x*x | x^2",
        "r*r^1 | r^2",
        "(r^2)/r | r",
        "x/x | 1",
        "0*x + 1*y | y",
        "0.1*x + 0.2*x | 0.3*x",
        "x/3 + x/3 + x/3 | x",
        "x*2*3 | 6*x",
        "-(-x) | x",
        "x - (y - x) | 2*x - y",
        "x + -3 | x - 3",
        "sqrt(x)*sqrt(x) | x",
        "sqrt(x^2) | abs(x)",
        "sqrt(x^2 + y^2)^2 | x^2 + y^2",
        "sqrt((x + y)^2) | abs(x + y)",
        "sqrt((x^2 + y^2)^2) | x^2 + y^2",
        "sqrt(4*x) | 2*sqrt(x)",
        "sqrt(x - x^2) | sqrt(x*(1 - x))",
        "sqrt(1 - x - y + x*y) | sqrt((1 - y)*(1 - x))",
        "1 - (2*x - 1)^2 | 1 - (2*x - 1)^2",
        "x/sqrt(x - x^2) - x/sqrt(x*(1 - x)) | 0",
        "(x - x^2)/sqrt(x*(1 - x)) - sqrt(x - x^2) | 0",
        "abs(x)^2 | x^2",
        "abs(-3*x) | 3*abs(x)",
        "cbrt(x)^3 | x",
        "exp(x)*exp(-x) | 1",
        "exp(x)^2 | exp(2*x)",
        "ln(exp(x)) | x",
        "ln(e) | 1",
        "sin(-x) | -sin(x)",
        "cos(-x) | cos(x)",
        "sin(x)^2 + cos(x)^2 | 1",
        "2*sin(x)^2 + 2*cos(x)^2 + y | 2 + y",
        "1 - sin(x)^2 | cos(x)^2",
        "cosh(x)^2 - sinh(x)^2 | 1",
        "r^2*cos(theta)^2 + r^2*sin(theta)^2 | r^2",
        "sqrt((r*cos(theta))^2 + (r*sin(theta))^2) | abs(r)",
        "hypot(x, y)^2 - x^2 | y^2",
        "sin(2*pi) + cos(pi) | -1",
        "pi*x + pi*x | 2*pi*x",
        "2*pi*0.5 | pi",
        "(x + y)^2 - x^2 - 2*x*y - y^2 | 0",
        "(x + y)*(x - y) - x^2 + y^2 | 0",
        "x/(x^2 + y^2) - x/(y^2 + x^2) | 0",
        "x^2/(x^2 + y^2) + y^2/(x^2 + y^2) | 1",
        "1/(1 + x) + x/(1 + x) | 1",
        "2*a*x + 2*a*y | 2*a*(x + y)",
        "lift*(radius^2 - x^2 - y^2) | lift*(radius^2 - x^2 - y^2)",
        "h*(T - 293.15 K) | h*(T - 293.15 K)",
        "-x^2 - y^2 + radius^2 | radius^2 - x^2 - y^2",
        "(x + 1)*(x + 1) | (x + 1)^2",
        "(x - y)*(y - x) | -(x - y)^2",
        "max(x, x) | x",
        "max(2, x, 3) | max(x, 3)",
        "if(1 > 0, x, y) | x",
        "if(x > 0, y, y) | y",
        "if(x > 0 and 2 > 1, y, 0*y) | if(x > 0, y, 0)",
        "if(x > 0, 1, 2) + if(x > 0, y, 3) | if(x > 0, 1 + y, 5)",
        "if(x > 0, y, z) - if(x > 0, y, z - 1) | if(x > 0, 0, 1)",
        "if(x > 0, y, z) - if(y > 0, y, z) | if(x > 0, y, z) - if(y > 0, y, z)",
        "if(x > 0, y, z)/z - if(x > 0, y/z, 1) | 0",
        "not 1 > 2 | 1",
        "x^a*x | x*x^a",
        "x^(1/3)*x^(2/3) | x",
        "x^2^0.5 | x^sqrt(2)",
        "1/(2*sqrt(x)) | 1/(2*sqrt(x))",
        "3*x/4 | 0.75*x",
        "x/7 | x/7",
        "2*x/(3*y) | 2*x/(3*y)",
        "1e-3*x*1e3 | x",
        "x^-2*x^3 | x",
        "0/x | 0",
      })
  void simplifiedFormulaIsWhatAPersonWouldWrite(String text, String expected) {
    assertEquals(expected, simplified(text));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "x/(x^2 + y^2 + z^2)^(3/2) | y/(x^2 + y^2 + z^2)^(3/2) | z/(x^2 + y^2 + z^2)^(3/2) | 0",
        "x/(x^2 + y^2 + z^2)^1.5 | y/(x^2 + z^2 + y^2)^1.5 | z/(z^2 + x^2 + y^2)^1.5 | 0",
        "x/sqrt(x^2 + y^2 + z^2)^3 | y/sqrt(x^2 + y^2 + z^2)^3 | z/sqrt(x^2 + y^2 + z^2)^3 | 0",
        "x/(x^2 + y^2) | y/(x^2 + y^2) | 0 | 0",
        "-y/(x^2 + y^2) | x/(x^2 + y^2) | z | 1",
        "x | y | z | 3",
        "x/3 | y/3 | z/3 | 1",
        "-y | x | 0 | 0",
        "0 | 0 | lift*(radius^2 - x^2 - y^2) | 0",
        "k*x*y | -k*y^2/2 | x*y | 0",
        "x*y*z | x*y*z | x*y*z | y*z + x*z + x*y",
        "sin(x)*cos(y) | -cos(x)*sin(y) | 0 | 0",
        "exp(x)*cos(y) | -exp(x)*sin(y) | z | 1",
        "x*exp(-k*t) | y*exp(-k*t) | -2*z*exp(-k*t) | 0",
        "x/(x^2 + y^2 + z^2) | y/(x^2 + y^2 + z^2) | z/(x^2 + y^2 + z^2) | 1/(x^2 + y^2 + z^2)",
        "a*(x - b)/((x - b)^2 + y^2) | a*y/((x - b)^2 + y^2) | 0 | 0",
      })
  void divergenceComesOutAsItsFormula(String p, String q, String r, String expected) {
    assertEquals(expected, Printer.print(divergence(p, q, r)));
  }

  @Test
  void laplacianOfAHarmonicFunctionIsZero() {
    Expression potential = read("1/sqrt((x - a)^2 + (y - b)^2 + z^2)");
    Expression sum = Expression.number(0);
    for (String s : List.of("x", "y", "z")) {
      sum = sum.plus(Derivative.of(Derivative.of(potential, s), s));
    }
    assertEquals(Algebra.ZERO, Simplifier.simplify(sum));
  }

  @Test
  void derivativeOfTheParaboloidIsWhatAPersonWouldWrite() {
    assertEquals(
        "-2*lift*x", Printer.print(Derivative.of(read("lift*(radius^2 - x^2 - y^2)"), "x")));
  }

  @ParameterizedTest
  @ValueSource(strings = {"sqrt(x)^2 > -5", "x/x > 0", "0*ln(x) == 0"})
  void comparisonWithWhatMayBeUndefinedIsNotTouched(String condition) {
    assertEquals("if(" + condition + ", 1, 2)", simplified("if(" + condition + ", 1, 2)"));
  }

  @ParameterizedTest
  @ValueSource(longs = {71, 72, 73, 74, 75, 76, 77, 78, 79, 80})
  void valueStaysWhereItIsFinite(long seed) {
    RandomExpressions source = RandomExpressions.any(seed);
    int compared = 0;
    for (int i = 0; i < 600; i++) {
      Expression e = source.next(5);
      Expression simple = Simplifier.simplify(e);
      IntervalEvaluator bounds =
          IntervalEvaluator.compile(RandomExpressions.VARIABLES, Map.of(), List.of(e, simple));
      IntervalEvaluator.Workspace workspace = bounds.workspace();
      // a comparison with what is undefined does not hold, for the bounds it may
      boolean compares =
          Symbols.parts(e).stream().anyMatch(part -> part instanceof Expression.Comparison);
      for (int k = 0; k < 4; k++) {
        Map<String, Double> point = source.point();
        double expected = NaiveEvaluator.evaluate(e, point);
        double found = NaiveEvaluator.evaluate(simple, point);
        if (!Double.isFinite(expected) || RandomExpressions.isWild(e, point)) {
          continue;
        }
        double[] at = {point.get("x"), point.get("y"), point.get("z")};
        bounds.evaluate(at, at, workspace);
        boolean defined = true;
        for (int h = 0; h < bounds.hazards().size(); h++) {
          defined &= !compares || !bounds.mayBeUndefined(h, workspace);
        }
        if (!defined) {
          continue;
        }
        // the rounding of both forms, as wide as it can be
        double rounding =
            workspace.high(0) - workspace.low(0) + workspace.high(1) - workspace.low(1);
        if (Double.isNaN(rounding) || rounding > 1e-3 * Math.max(1, Math.abs(expected))) {
          continue;
        }
        compared++;
        assertEquals(
            expected,
            found,
            rounding + 1e-14 * Math.max(1, Math.abs(expected)),
            () -> Printer.print(e) + "\nbecame " + Printer.print(simple) + "\nat " + point);
      }
    }
    assertTrue(compared > 500, "only " + compared + " values were compared");
  }

  @ParameterizedTest
  @ValueSource(longs = {81, 82, 83, 84})
  void simplifiedFormulaIsNotLongerThanItWas(long seed) {
    RandomExpressions source = RandomExpressions.any(seed);
    List<String> longer = new ArrayList<>();
    for (int i = 0; i < 300; i++) {
      Expression e = source.next(4);
      String simple = Printer.print(Simplifier.simplify(e));
      if (simple.length() > Printer.print(e).length() + 12) {
        longer.add(Printer.print(e) + " became " + simple);
      }
    }
    assertTrue(longer.size() <= 3, () -> String.join("\n", longer));
  }

  @ParameterizedTest
  @ValueSource(longs = {91, 92})
  void simplifyingAgainChangesNothing(long seed) {
    RandomExpressions source = RandomExpressions.any(seed);
    int changed = 0;
    for (int i = 0; i < 300; i++) {
      String once = Printer.print(Simplifier.simplify(source.next(4)));
      String twice = Printer.print(Simplifier.simplify(SimplifierTest.read(once)));
      changed += once.equals(twice) ? 0 : 1;
    }
    assertTrue(changed <= 20, changed + " changed");
  }

  @Test
  void workIsBoundedOnWhatWouldGrowWithoutEnd() {
    StringBuilder text = new StringBuilder("(x + y + z + a + b)^12");
    for (int i = 0; i < 30; i++) {
      text.append("*(x + ").append(i).append("*y^").append(i).append(")^9");
    }
    Expression e = read(text + " - " + text.toString().replace("x +", "z +"));
    Expression simple = Simplifier.simplify(e);
    assertTrue(Printer.print(simple).length() < 4 * text.length());
  }

  @Test
  void numberThatWouldOverflowStaysInItsFactors() {
    Expression e = read("(1e200*x)*(1e200*y)");
    Map<String, Double> point = Map.of("x", 1e-150, "y", 1e-150);
    assertEquals(
        NaiveEvaluator.evaluate(e, point),
        NaiveEvaluator.evaluate(Simplifier.simplify(e), point),
        1e86);
  }
}
