package org.hullsum.flux;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class TriangleRuleTest {
  private static double factorial(int n) {
    return n < 2 ? 1 : n * factorial(n - 1);
  }

  /** Over the unit triangle ∬ s^i t^j = i! j!/(i + j + 2)!, and the rule is of its mean. */
  @ParameterizedTest
  @ValueSource(ints = {1, 5, 8})
  void monomialsUpToTheDegreeAreIntegratedExactly(int degree) {
    TriangleRule rule =
        degree == 1
            ? TriangleRule.CENTROID
            : degree == 5 ? TriangleRule.DEGREE_5 : TriangleRule.DEGREE_8;
    assertEquals(degree, rule.degree());
    for (int i = 0; i <= degree; i++) {
      for (int j = 0; i + j <= degree; j++) {
        double sum = 0;
        for (int k = 0; k < rule.size(); k++) {
          sum += rule.weight(k) * Math.pow(rule.second(k), i) * Math.pow(rule.third(k), j);
        }
        double exact = 2 * factorial(i) * factorial(j) / factorial(i + j + 2);
        assertEquals(exact, sum, 2e-14, "s^" + i + " t^" + j);
      }
    }
  }
}
