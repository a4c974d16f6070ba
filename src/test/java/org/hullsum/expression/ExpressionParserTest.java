package org.hullsum.expression;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTimeout;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.Duration;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.hullsum.units.Dimension;
import org.hullsum.units.WorkingUnits;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class ExpressionParserTest {
  private static final List<String> SYMBOLS =
      List.of("x", "y", "z", "t", "s", "T", "h", "radius", "lift");
  private static final Map<String, Double> VALUES =
      Map.of(
          "x", 2.0, "y", 3.0, "z", 5.0, "t", 7.0, "s", 11.0, "T", 300.0, "h", 13.0, "radius", 17.0,
          "lift", 19.0);

  private static ParsedExpression parsed(String text) {
    try {
      return ExpressionParser.parse(text, SYMBOLS, WorkingUnits.SI);
    } catch (TextFault fault) {
      throw new AssertionError(
          fault.getMessage() + "\n" + Carets.render(text, fault.start(), fault.end()), fault);
    }
  }

  private static double value(String text) {
    return NaiveEvaluator.evaluate(parsed(text).root(), VALUES);
  }

  private static TextFault fault(String text) {
    return assertThrows(
        TextFault.class, () -> ExpressionParser.parse(text, SYMBOLS, WorkingUnits.SI), text);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "-x^2 | -4",
        "2^3^2 | 512",
        "2^-3 | 0.125",
        "2^-x^2 | 0.0625",
        "-x*y | -6",
        "x - y - z | -6",
        "z/x/x | 1.25",
        "2 * x + 3*y | 13",
        "x*-y | -6",
        "+x | 2",
        "(x + y)*z | 25",
        "if(x < y, 10, 20) | 10",
        "if(not x < y and z > 0 or y == 3, 1, 0) | 1",
        "if(not (x < y or z > 0), 1, 0) | 0",
        "max(x, y, z) | 5",
        "hypot(3, 4) | 5",
        "(x > 1)*4 | 4",
        "1.5e-3*x | 0.003",
        "1E3 | 1000",
        "ln(e) + 0*pi | 1",
        "2*(x > 2 and y > 2) | 0",
        "x != 2 | 0",
        "if(x > 2 or y >= 3, x, y) | 2",
      })
  void grammarGivesTheValueThatAPersonExpects(String text, double expected) {
    assertEquals(expected, value(text), 1e-15);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "3 m + x | 5",
        "4 m/s * t | 28",
        "5 1/s*x | 10",
        "2 m/x | 1",
        "(4 m)/s | 0.36363636363636365",
        "h*(T - 293.15 K) | 89.05",
        "1.5e-3 1/(m.s)*x | 0.003",
        "90 deg + x | 3.5707963267948966",
        "2 km - 3 m-x | 1995",
        "max(2 m, 3 cm) | 2",
        "5 %*x | 0.1",
        "2 m^2*x | 4",
        "36 km/h+x | 12",
        "if(x > 1 m and y > 2, 1, 0) | 1",
        "if(x > 1 m, 1 m/s, 0 m/s) | 1",
        "T - 20 degC | 6.85",
        "(2 m)^2 | 4",
        "2 m3/h*3600 s | 2",
      })
  void numbersWithUnitsEndWhereTheWriterExpects(String text, double expected) {
    assertEquals(expected, value(text), 1e-12);
  }

  @Test
  void quantityKeepsItsDimensionAndItsText() {
    Constant constant = (Constant) parsed("12.5 m3/h").root();
    assertEquals(
        Optional.of(Dimension.LENGTH.power(3).dividedBy(Dimension.TIME)), constant.dimension());
    assertEquals(Optional.of("12.5 m3/h"), constant.text());
    assertEquals(12.5 / 3600, constant.value(), 1e-18);
  }

  @Test
  void quantityIsConvertedToWorkingUnits() throws TextFault {
    WorkingUnits millimetres = new WorkingUnits(1e-3, 1, 3600, 1, false);
    ParsedExpression e = ExpressionParser.parse("2 m/h", List.of(), millimetres);
    assertEquals(2000, ((Constant) e.root()).value(), 1e-9);
  }

  @Test
  void bareNumberHasNoDimensionAndNoText() {
    assertEquals(Expression.number(2.5), parsed("2.5").root());
  }

  @Test
  void spansCoverTheParenthesesOfOperandsButNotTheirOwn() {
    ParsedExpression e = parsed("2*(x + y)^2");
    Binary product = (Binary) e.root();
    Binary power = (Binary) product.right();
    assertArrayEquals(new int[] {0, 11}, e.spanOf(product));
    assertArrayEquals(new int[] {2, 11}, e.spanOf(power));
    assertArrayEquals(new int[] {3, 8}, e.spanOf(power.left()));
    assertArrayEquals(new int[] {10, 11}, e.spanOf(power.right()));
  }

  @Test
  void nodeOfAnotherExpressionHasTheSpanOfTheWhole() {
    assertArrayEquals(new int[] {0, 5}, parsed("x + y").spanOf(Expression.symbol("x")));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '"',
      value = {
        "3x | EXPRESSION | 0 | 2 | 3*x",
        "2*3radius | EXPRESSION | 2 | 9 | 3*radius",
        "x² | EXPRESSION | 1 | 2 | ^2",
        "x**2 | EXPRESSION | 1 | 3 | ^",
        "log(x) | UNKNOWN_NAME | 0 | 3 | ln(x)",
        "raduis + 1 | UNKNOWN_NAME | 0 | 6 | 'radius'",
        "1 + sine(x) | UNKNOWN_NAME | 4 | 8 | 'sin'",
        "x + true | UNKNOWN_NAME | 4 | 8 | 1 == 1",
        "x + PI | UNKNOWN_NAME | 4 | 6 | 'pi'",
        "wholly_unlike | UNKNOWN_NAME | 0 | 13 | known here",
        "sin(x | EXPRESSION | 3 | 4 | not closed",
        "(x + y | EXPRESSION | 0 | 1 | not closed",
        "x + y) | EXPRESSION | 5 | 6 | never opened",
        "sin(x, y) | EXPRESSION | 0 | 9 | 1 argument, not 2",
        "atan2(x) | EXPRESSION | 0 | 8 | 2 arguments, not 1",
        "max() | EXPRESSION | 0 | 5 | not 0",
        "if(x > 1, 2) | EXPRESSION | 0 | 12 | if(condition, a, b)",
        "if(x, 2, 3) | EXPRESSION | 3 | 4 | condition",
        "x and y > 1 | EXPRESSION | 0 | 1 | condition",
        "if(not x, 1, 2) | EXPRESSION | 7 | 8 | condition",
        "x = 2 | EXPRESSION | 2 | 3 | ==",
        "x − 2 | EXPRESSION | 2 | 3 | hyphen",
        "x×2 | EXPRESSION | 1 | 2 | *",
        "x ≤ 2 | EXPRESSION | 2 | 3 | <=",
        "x && y | EXPRESSION | 2 | 4 | and",
        "!x | EXPRESSION | 0 | 1 | not",
        "0 < x < 1 | EXPRESSION | 0 | 7 | a < b and b < c",
        "x + | EXPRESSION | 3 | 3 | ends",
        "x * / y | EXPRESSION | 4 | 5 | expected",
        "sin x | EXPRESSION | 0 | 3 | sin( … )",
        "x y | EXPRESSION | 2 | 3 | *",
        "(x)(y) | EXPRESSION | 3 | 4 | *",
        "x(y + 1) | EXPRESSION | 0 | 2 | not a function",
        "2(x) | EXPRESSION | 1 | 2 | *",
        "1,5 | EXPRESSION | 1 | 2 | point",
        ".5 | EXPRESSION | 0 | 1 | 0.5",
        "5.*x | EXPRESSION | 0 | 2 | 5.0",
        "1.2.3 | EXPRESSION | 0 | 4 | one decimal point",
        "1e999 | EXPRESSION | 0 | 5 | largest",
        "() | EXPRESSION | 0 | 2 | nothing",
        "x + [y] | EXPRESSION | 4 | 5 | parentheses",
        "x $ y | EXPRESSION | 2 | 3 | nothing",
        "2 x | UNIT | 2 | 3 | 2*x",
        "2 min(x, y) | UNIT | 2 | 5 | 2*min",
        "2 cos(x) | UNIT | 2 | 5 | 2*cos",
        "5%*x | EXPRESSION | 0 | 2 | blank",
        "7 % x | EXPRESSION | 4 | 5 | *",
      })
  void faultNamesItsKindPlaceAndRemedy(
      String text, ProblemKind kind, int start, int end, String remedy) {
    TextFault fault = fault(text);
    String shown = fault.getMessage() + "\n" + Carets.render(text, fault.start(), fault.end());
    assertEquals(kind, fault.kind(), shown);
    assertEquals(start, fault.start(), shown);
    assertEquals(end, fault.end(), shown);
    assertTrue(fault.getMessage().contains(remedy), shown);
  }

  @ParameterizedTest
  @ValueSource(strings = {"", " ", "\t"})
  void emptyFormulaIsRefused(String text) {
    assertTrue(fault(text).getMessage().contains("empty"));
  }

  @Test
  void controlCharacterIsNamedByItsCode() {
    assertTrue(fault("x\u0007").getMessage().contains("U+0007"));
  }

  @ParameterizedTest
  @ValueSource(ints = {9_999, 1_000_000})
  void parenthesesWithoutEndAreAnsweredAtOnce(int count) {
    assertTimeout(
        Duration.ofSeconds(1),
        () -> assertEquals(ProblemKind.LIMIT_EXCEEDED, fault("(".repeat(count)).kind()));
  }

  @ParameterizedTest
  @ValueSource(strings = {"-", "not ", "x^", "sin(", "if(x>1,", "+", "2*("})
  void anyKindOfNestingIsBounded(String prefix) {
    assertEquals(
        ProblemKind.LIMIT_EXCEEDED, fault(prefix.repeat(9_000 / prefix.length()) + "x").kind());
  }

  @Test
  void chainOfTooManyOperationsIsRefusedAndAShorterOneSurvivesAllPasses() {
    assertEquals(ProblemKind.LIMIT_EXCEEDED, fault("x+".repeat(4_000) + "x").kind());
    Expression longest = parsed("x*y+".repeat(390) + "x").root();
    Expression derivative = Derivative.of(longest, "x");
    assertEquals(390 * 3 + 1, NaiveEvaluator.evaluate(derivative, VALUES), 1e-9);
    assertTrue(Printer.print(longest).length() > 390);
  }

  @Test
  void withoutUnitsOnlyAnglesHaveOne() throws TextFault {
    assertEquals(
        Math.PI,
        ((Constant) ExpressionParser.parse("180 deg", List.of(), WorkingUnits.NONE).root()).value(),
        1e-15);
    TextFault fault =
        assertThrows(
            TextFault.class, () -> ExpressionParser.parse("2 + 3 m", List.of(), WorkingUnits.NONE));
    assertEquals(ProblemKind.UNIT, fault.kind());
    assertEquals(6, fault.start());
    assertEquals(7, fault.end());
  }

  @Test
  void choiceMadeInReadingAUnitIsNoted() {
    assertTrue(parsed("3 gal/min").notes().toString().contains("US"));
    assertTrue(parsed("3 m").notes().isEmpty());
  }

  @ParameterizedTest
  @ValueSource(longs = {31, 32, 33, 34, 35, 36})
  void printedFormulaReadsBackToTheSameValue(long seed) throws TextFault {
    RandomExpressions source = RandomExpressions.any(seed);
    for (int i = 0; i < 300; i++) {
      Expression e = source.next(5);
      String text = Printer.print(e);
      if (text.length() > ExpressionParser.MAX_LENGTH) {
        continue;
      }
      Expression again =
          ExpressionParser.parse(text, RandomExpressions.VARIABLES, WorkingUnits.SI).root();
      for (int k = 0; k < 5; k++) {
        Map<String, Double> point = source.point();
        double expected = NaiveEvaluator.evaluate(e, point);
        double found = NaiveEvaluator.evaluate(again, point);
        assertTrue(
            expected == found || Double.compare(expected, found) == 0,
            () -> text + " read back as " + Printer.print(again) + ": " + expected + ", " + found);
      }
    }
  }

  @Test
  void randomTextsGiveAFormulaOrAFaultInsideTheText() {
    java.util.Random random = new java.util.Random(41);
    String alphabet = "xyz0123456789.e+-*/^()<>=!,  mskif²−°%[]andor";
    for (int i = 0; i < 20_000; i++) {
      StringBuilder text = new StringBuilder();
      int length = random.nextInt(25);
      for (int k = 0; k < length; k++) {
        text.append(alphabet.charAt(random.nextInt(alphabet.length())));
      }
      try {
        ExpressionParser.parse(text.toString(), SYMBOLS, WorkingUnits.SI);
      } catch (TextFault fault) {
        assertTrue(fault.end() <= length, () -> text + ": " + fault.getMessage());
        assertTrue(Carets.render(text.toString(), fault.start(), fault.end()).contains("^"));
      }
    }
  }
}
