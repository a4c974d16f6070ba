package org.hullsum.quadrature;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class RulesTest {
  private static final double ROUNDING = 1e-15;

  private static double monomial(DirectionRule rule, int degree) {
    double sum = 0;
    for (int i = 0; i < rule.size(); i++) {
      sum += rule.weights()[i] * Math.pow(rule.nodes()[i], degree);
    }
    return sum;
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 5, 8, 10, 16, 24, 44, 64, 128})
  void gaussRuleIsExactOnEveryMonomialUpToItsDegree(int size) {
    for (int degree = 0; degree <= 2 * size - 1; degree++) {
      assertEquals(1.0 / (degree + 1), monomial(GaussRule.of(size), degree), ROUNDING);
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 5, 8})
  void gaussRuleIsNotExactBeyondItsDegree(int size) {
    double exact = 1.0 / (2 * size + 1);
    assertNotEquals(exact, monomial(GaussRule.of(size), 2 * size), 1e-11);
  }

  @ParameterizedTest
  @ValueSource(ints = {2, 5, 10, 33, 100})
  void gaussNodesAreThoseOfAnIndependentLibrary(int size) {
    var other = new GaussIntegratorFactory().legendre(size, 0, 1);
    for (int i = 0; i < size; i++) {
      assertEquals(other.getPoint(i), GaussRule.of(size).node(i), 4e-15);
      assertEquals(other.getWeight(i), GaussRule.of(size).weight(i), 4e-15);
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {4, 16, 33})
  void trapezoidRuleIsExactOnWavesBelowItsSizeOnly(int size) {
    TrapezoidRule rule = new TrapezoidRule(size);
    for (int wave = 1; wave <= size; wave++) {
      double sum = 0;
      for (int i = 0; i < rule.size(); i++) {
        double angle = 2 * Math.PI * wave * (rule.nodes()[i] - rule.nodes()[0]);
        sum += rule.weights()[i] * Math.cos(angle);
      }
      assertEquals(wave == rule.size() ? 1 : 0, sum, 1e-13);
    }
  }
}
