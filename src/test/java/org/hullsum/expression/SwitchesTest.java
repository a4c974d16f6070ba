package org.hullsum.expression;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.hullsum.problem.TextFault;
import org.hullsum.units.WorkingUnits;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class SwitchesTest {
  private static Expression read(String text) throws TextFault {
    return ExpressionParser.parse(text, List.of("x", "y", "z", "a"), WorkingUnits.SI).root();
  }

  private static String written(List<Expression> switches) {
    return String.join("; ", switches.stream().map(Printer::print).toList());
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "x^2 + sin(y) | ''",
        "abs(x - 1) | x - 1",
        "sign(x*y) | x*y",
        "min(x, y) | x - y",
        "max(x, y, 2) | x - y; x - 2; y - 2",
        "if(x > 1, y, z) | x - 1",
        "if(x > 1 and not y < z, y, z) | x - 1; y - z",
        "if(x > 1, abs(y), abs(z)) | y; z; x - 1",
        "abs(x - 1) + abs(1 - x) | x - 1",
        "min(x, y) + max(y, x) | x - y",
        "abs(abs(x) - 1) | abs(x) - 1; x",
        "abs(2) + abs(a) | a",
        "sqrt((x - 1)^2) | x - 1",
        "((x - y)^2)^1.5 | x - y",
        "hypot(x, 0) | x",
        "sqrt(x^2 + y^2) | ''",
      })
  void switchesAreTheFunctionsWhoseZerosMakeKinksOrJumps(String text, String expected)
      throws TextFault {
    assertEquals(expected, written(Switches.of(read(text))));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "abs(x) + min(x, y) | ''",
        "sign(x - 2)*abs(y) | x - 2",
        "if(abs(x) > 1, y, z) | abs(x) - 1",
        "x + (y >= z) | y - z",
      })
  void jumpsAreTheSwitchesAtWhichTheValueMayChange(String text, String expected) throws TextFault {
    assertEquals(expected, written(Switches.jumps(read(text))));
  }
}
