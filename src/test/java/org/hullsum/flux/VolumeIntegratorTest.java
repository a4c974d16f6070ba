package org.hullsum.flux;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.stream.Stream;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.field.VectorField;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.flux.Assemblies.Piece;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Integral;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

class VolumeIntegratorTest {
  private static final int DIGITS = 10;

  static List<BoundaryPatch> boundary(Assembly assembly) {
    List<BoundaryPatch> patches = new ArrayList<>();
    for (Piece piece : assembly.pieces()) {
      PulledBackSurface surface = PulledBackSurface.of(piece.surface());
      patches.add(
          new BoundaryPatch(surface, PatchGeometry.of(surface, Map.of(), DIGITS), piece.outward()));
    }
    return patches;
  }

  private static VolumeIntegral integrate(Assembly assembly, Expression density) {
    return new VolumeIntegrator(TestFields.noInputs(), DIGITS)
        .integrate(boundary(assembly), density, OptionalDouble.empty(), 0);
  }

  static Stream<Arguments> assembliesWithSeeds() {
    List<Arguments> all = new ArrayList<>();
    for (long seed = 21; seed <= 23; seed++) {
      for (Assembly assembly : Assemblies.random(new Random(seed))) {
        all.add(Arguments.of(assembly, seed));
      }
    }
    return all.stream();
  }

  @ParameterizedTest(name = "{0}, seed {1}")
  @MethodSource("assembliesWithSeeds")
  void integralOfTheDivergenceEqualsTheOutwardFlux(Assembly assembly, long seed) {
    VectorField field = TestFields.random(new Random(seed));
    double outward = 0;
    double bound = 0;
    for (Piece piece : assembly.pieces()) {
      PatchFlux flux = FluxLawsTest.flux(piece.surface(), field);
      outward += piece.outward() * flux.value().orElseThrow();
      bound += flux.errorBound();
    }
    VolumeIntegral integral = integrate(assembly, field.divergence());
    assertEquals(Integral.Status.REACHED, integral.status());
    assertEquals(
        outward, integral.value().orElseThrow(), bound + integral.errorBound(), "" + integral);
    assertTrue(
        integral.errorBound() <= 1.01e-10 * integral.magnitude(),
        integral.errorBound() + " of " + integral.magnitude());
  }

  /** Integral of z² over the unit ball (check-values, D16). */
  @Test
  void squareOverTheBallHasItsPrintedValue() {
    VolumeIntegral integral = integrate(Assemblies.ball(Vector3.ZERO, 1), TestFields.Z.power(2));
    assertEquals(4 * Math.PI / 15, integral.value().orElseThrow(), integral.errorBound());
    assertEquals(4 * Math.PI / 15, integral.magnitude(), 1e-9);
  }

  @Test
  void magnitudeOfAnOddDensityIsThatOfItsAbsoluteValue() {
    VolumeIntegral integral = integrate(Assemblies.ball(Vector3.ZERO, 1), TestFields.X);
    assertEquals(0, integral.value().orElseThrow(), integral.errorBound() + 1e-15);
    assertEquals(Math.PI / 2, integral.magnitude(), 0.01 * Math.PI / 2);
  }

  @Test
  void densityWithAKinkIsIntegratedToTheAccuracy() {
    Expression kink = Expression.call(Function.ABS, TestFields.Z.minus(Expression.number(0.25)));
    VolumeIntegral integral =
        integrate(Assemblies.box(new Vector3(0, 0, 0), new Vector3(1, 2, 1)), kink);
    double exact = 2 * (0.25 * 0.25 + 0.75 * 0.75) / 2;
    assertEquals(exact, integral.value().orElseThrow(), integral.errorBound());
    assertTrue(integral.errorBound() < 1e-7, "" + integral);
  }

  /** Singular on the axis, which is in the hole: ∫ dV/ρ² = 2π H ln(R/r). */
  @Test
  void densitySingularInTheHoleOfAnAnnulusIsIntegratedRightly() {
    VolumeIntegral integral =
        integrate(Assemblies.hollowCan(0.3, 1, 2), TestFields.parse("1/(x^2+y^2)"));
    double exact = 4 * Math.PI * Math.log(1 / 0.3);
    assertEquals(exact, integral.value().orElseThrow(), integral.errorBound(), "" + integral);
    assertEquals(exact, integral.value().orElseThrow(), 1e-9, "" + integral);
  }

  /** Not integrable over the hole: ∫ dV/ρ³ = 2π H (1/r − 1/R). */
  @Test
  void densityNotIntegrableInTheHoleOfAnAnnulusTakesTheColumnRoute() {
    VolumeIntegral integral =
        integrate(Assemblies.hollowCan(0.3, 1, 2), TestFields.parse("(x^2+y^2)^(-1.5)"));
    double exact = 4 * Math.PI * (1 / 0.3 - 1);
    assertEquals(VolumeIntegral.Route.COLUMNS, integral.route(), "" + integral);
    assertEquals(exact, integral.value().orElseThrow(), integral.errorBound(), "" + integral);
    assertEquals(exact, integral.value().orElseThrow(), 1e-8, "" + integral);
  }

  /** A pole that changes its sign in the hole, beside the axis. */
  @Test
  void densityWithAPoleInTheHoleIsIntegratedRightly() {
    Assembly annulus = Assemblies.hollowCan(0.3, 1, 2);
    VolumeIntegral integral = integrate(annulus, TestFields.parse("1/((x-0.1)^2+y^2)"));
    double byMeanValue = integral.value().orElseThrow();
    // ∮ dθ/|ρe − a|² = 2π/(ρ² − a²), so the integral is 2π H ½ ln((R² − a²)/(r² − a²)).
    double exact = 2 * Math.PI * Math.log((1 - 0.01) / (0.09 - 0.01));
    assertEquals(exact, byMeanValue, integral.errorBound(), "" + integral);
    assertEquals(exact, byMeanValue, 1e-8, "" + integral);
  }

  /** The divergence 1/ρ of the unit radial field on a can about the axis: 2π R H. */
  @Test
  void integrableSingularityOnTheAxisInsideIsIntegrated() {
    VolumeIntegral integral =
        integrate(Assemblies.can(0.8, 0, 1.5), TestFields.parse("1/sqrt(x^2+y^2)"));
    double exact = 2 * Math.PI * 0.8 * 1.5;
    assertEquals(exact, integral.value().orElseThrow(), integral.errorBound(), "" + integral);
    assertEquals(exact, integral.value().orElseThrow(), 1e-8, "" + integral);
  }
}
