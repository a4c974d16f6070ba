package org.hullsum.flux;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.expression.Expression;
import org.hullsum.flux.FluxIntegrator.PreparedFlux;
import org.hullsum.geometry.Surface;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.StatedFlux;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Place;
import org.hullsum.quadrature.Integral;
import org.junit.jupiter.api.Test;

class FluxIntegratorTest {
  private static final FluxIntegrator INTEGRATOR = new FluxIntegrator(TestFields.noInputs(), 9);
  private static final PulledBackSurface DISK =
      PulledBackSurface.of(Assemblies.disk(Vector3.ZERO, Vector3.Z, 2));

  private static FluxStatement field(String p, String q, String r) {
    return new FluxStatement.Field(TestFields.parse(List.of(p, q, r)));
  }

  @Test
  void fluxThatDependsOnTimeIsEvaluatedAtEachInstant() {
    PreparedFlux flux = INTEGRATOR.prepare(DISK, field("0", "0", "t*x^2"));
    assertTrue(flux.dependsOnTime());
    assertEquals(12 * Math.PI, flux.at(OptionalDouble.of(3)).value().orElseThrow(), 1e-7);
    assertEquals(20 * Math.PI, flux.at(OptionalDouble.of(5)).value().orElseThrow(), 1e-7);
    assertFalse(
        INTEGRATOR.prepare(DISK, field("t", "0", "1")).at(OptionalDouble.of(1)).value().isEmpty());
  }

  /** The tangential component never enters, so it makes nothing depend on time either. */
  @Test
  void fluxWhoseNormalPartIsSteadyIsSteady() {
    assertFalse(INTEGRATOR.prepare(DISK, field("0", "0", "1")).dependsOnTime());
  }

  @Test
  void placeWhereTheFieldIsUndefinedIsReported() {
    PatchFlux flux =
        INTEGRATOR.prepare(DISK, field("0", "0", "sqrt(x - 0.5)")).at(OptionalDouble.empty());
    assertEquals(Integral.Status.NOT_FINITE, flux.status());
    assertEquals(Optional.empty(), flux.value());
    Vector3 place = flux.nonFiniteAt().orElseThrow();
    assertTrue(place.x() < 0.5 && place.norm() <= 2, "" + place);
  }

  @Test
  void profileOverADiskFollowsItsNormal() {
    Expression laminar = TestFields.parse("3*(1 - (x^2 + y^2)/4)");
    PatchFlux flux =
        INTEGRATOR
            .prepare(DISK, new FluxStatement.Profile(laminar, "laminar"))
            .at(OptionalDouble.empty());
    assertEquals(6 * Math.PI, flux.value().orElseThrow(), flux.errorBound());
    assertEquals(FluxBasis.PROFILE, flux.basis());
    assertTrue(flux.basis().followsNormal());
  }

  /** Singular derivative at the wall: u = 2 (1 − r/R)^(1/7), mean/max = 2n²/((n+1)(2n+1)). */
  @Test
  void powerLawProfileHasItsMeanToTheAccuracyReported() {
    Expression power = TestFields.parse("2*max(0, 1 - sqrt(x^2 + y^2)/2)^(1/7)");
    PatchFlux flux =
        INTEGRATOR
            .prepare(DISK, new FluxStatement.Profile(power, "power law, n = 7"))
            .at(OptionalDouble.empty());
    double exact = 4 * Math.PI * 2 * 98.0 / (8 * 15);
    assertEquals(exact, flux.value().orElseThrow(), flux.errorBound());
    assertEquals(exact, flux.value().orElseThrow(), 1e-7 * exact);
  }

  @Test
  void magnitudeCountsBothWaysOfABackwardFlux() {
    PatchFlux flux = INTEGRATOR.prepare(DISK, field("0", "0", "x")).at(OptionalDouble.empty());
    assertEquals(0, flux.value().orElseThrow(), flux.errorBound());
    double exact = 4.0 * 8 / 3;
    assertEquals(exact, flux.magnitude(), 0.01 * exact);
  }

  @Test
  void statementThatNeedsASurfaceIsRefusedWithoutOne() {
    StatedFlux stated =
        new StatedFlux(
            field("1", "0", "0"), Optional.empty(), Optional.empty(), new Place("c.yaml", 1, 1));
    assertThrows(
        IllegalArgumentException.class, () -> INTEGRATOR.prepare(Optional.empty(), stated));
  }

  /** Projected form of the flux through a graph, ∬ (−P g_x − Q g_y + R) dA, by Commons Math. */
  @Test
  void randomGraphsAgreeWithTheirProjectedIntegralByAnotherLibrary() {
    for (int k = 1; k <= 20; k++) {
      double a = 0.3 * k % 1.7;
      double b = 0.7 * k % 1.3;
      Surface graph =
          Assemblies.build(
              new org.hullsum.geometry.GraphShape(
                  org.hullsum.geometry.GraphShape.Subject.Z,
                  TestFields.parse("sin(" + a + "*x)*y + " + b + "*x^2"),
                  new org.hullsum.geometry.PlaneRegion.Box(
                      org.hullsum.geometry.Span.of(-1, 1.5), org.hullsum.geometry.Span.of(0, 2))));
      PatchFlux flux =
          INTEGRATOR
              .prepare(PulledBackSurface.of(graph), field("x*z", "cos(y)", "exp(-x^2)"))
              .at(OptionalDouble.empty());
      double expected =
          nested(
              (x, y) -> {
                double z = Math.sin(a * x) * y + b * x * x;
                double gx = a * Math.cos(a * x) * y + 2 * b * x;
                double gy = Math.sin(a * x);
                return -x * z * gx - Math.cos(y) * gy + Math.exp(-x * x);
              });
      assertEquals(expected, flux.value().orElseThrow(), flux.errorBound() + 1e-9);
    }
  }

  private static double nested(java.util.function.DoubleBinaryOperator f) {
    var outer =
        new org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory()
            .legendre(24, -1, 1.5);
    var inner =
        new org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory()
            .legendre(24, 0, 2);
    return outer.integrate(x -> inner.integrate(y -> f.applyAsDouble(x, y)));
  }
}
