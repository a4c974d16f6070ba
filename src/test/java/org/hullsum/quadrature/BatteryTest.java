package org.hullsum.quadrature;

import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Integrals with known answers: the true error must lie within the bound, whatever happens. */
class BatteryTest {
  @ParameterizedTest
  @ValueSource(doubles = {1e-4, 1e-6, 1e-8, 1e-10})
  void trueErrorLiesWithinTheBoundAtEveryRequest(double request) {
    for (BatteryCase one : SurfaceFields.cases()) {
      Integral found = SquareIntegrator.integrate(one.problem(Accuracy.relative(request)))[0];
      double error = Math.abs(found.value() - one.exact());
      assertTrue(
          error <= found.errorBound(),
          () -> one.name() + ": error " + error + " beyond bound " + found.errorBound());
    }
  }
}
