package org.hullsum.expression;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.OptionalInt;
import java.util.Set;
import org.hullsum.problem.TextFault;
import org.hullsum.units.WorkingUnits;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class ExpressionQueriesTest {
  private static final List<String> NAMES = List.of("x", "y", "z", "a", "n");

  private static Expression read(String text) throws TextFault {
    return ExpressionParser.parse(text, NAMES, WorkingUnits.SI).root();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "3 | 0",
        "a*sin(a) | 0",
        "x | 1",
        "x*y^2 - z | 3",
        "(x + y)^3*a | 3",
        "x/a | 1",
        "-x^2 | 2",
        "if(a > 0, x, x*y) | 2",
        "a^n | 0",
        "x - x | 1",
      })
  void polynomialHasItsTotalDegreeAsWritten(String text, int degree) throws TextFault {
    assertEquals(OptionalInt.of(degree), Degree.in(read(text), Set.of("x", "y", "z")));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "1/x",
        "sin(x)",
        "x^0.5",
        "x^-1",
        "x^n",
        "a^x",
        "if(x > 0, 1, 2)",
        "abs(y)",
        "x^20000"
      })
  void whatIsNoPolynomialHasNoDegree(String text) throws TextFault {
    assertTrue(Degree.in(read(text), Set.of("x", "y", "z")).isEmpty());
  }

  @Test
  void symbolsAreListedOnceInOrder() throws TextFault {
    assertEquals(
        List.of("a", "x", "y"), List.copyOf(Symbols.in(read("y*x + sin(x)/if(a > 1, x, pi)"))));
  }

  @Test
  void replacementsAreMadeAllAtOnceAndNotSearchedAgain() throws TextFault {
    Expression swapped =
        Substitution.replace(read("x - 2*y"), Map.of("x", read("y"), "y", read("x")));
    assertEquals("y - 2*x", Printer.print(swapped));
  }

  @Test
  void partsWithoutAReplacementStayTheSameNodes() throws TextFault {
    Expression.Binary e = (Expression.Binary) read("sin(a)^2 + x");
    Expression.Binary replaced =
        (Expression.Binary) Substitution.replace(e, Map.of("x", read("y")));
    assertEquals("sin(a)^2 + y", Printer.print(replaced));
    assertSame(e.left(), replaced.left());
    assertSame(e, Substitution.replace(e, Map.of("z", read("y"))));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "1e-7*x | 1e-7*x",
        "0.1 + x | 0.1 + x",
        "1234567 | 1234567",
        "1e22*x | 1e22*x",
        "1.5e-3 1/(m.s) | 1.5e-3 1/(m.s)",
        "(2 m)^2 | (2 m)^2",
        "(4 m)/a | (4 m)/a",
        "x*(3 m) + 2 m | x*(3 m) + 2 m",
        "(x^y)^z | (x^y)^z",
        "x^y^z | x^y^z",
        "x/(y*z) | x/(y*z)",
        "x/y*z | x/y*z",
        "x - (y - z) | x - (y - z)",
        "(x > 1)*2 | (x > 1)*2",
        "not (x > 1 or y > 1) and z > 1 | not (x > 1 or y > 1) and z > 1",
        "(-x)^2 | (-x)^2",
        "2^-x | 2^-x",
        "x*(-y) | x*(-y)",
      })
  void printedFormulaHasNoNeedlessParenthesesAndKeepsTheOthers(String text, String expected)
      throws TextFault {
    assertEquals(expected, Printer.print(read(text)));
  }
}
