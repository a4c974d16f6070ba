package org.hullsum.flux;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.stream.Stream;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.field.VectorField;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.flux.Assemblies.Piece;
import org.hullsum.geometry.Chart;
import org.hullsum.geometry.Placement;
import org.hullsum.geometry.Surface;
import org.hullsum.model.FluxStatement;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The laws that hold for every surface and every field, with random ones. */
class FluxLawsTest {
  private static final int DIGITS = 10;
  private static final double ACCURACY = 1e-10;

  static PatchFlux flux(Surface surface, VectorField field) {
    return new FluxIntegrator(TestFields.noInputs(), DIGITS)
        .prepare(PulledBackSurface.of(surface), new FluxStatement.Field(field))
        .at(OptionalDouble.empty());
  }

  /** Outward flux of a closed surface with its error bound and magnitude. */
  private record Total(double value, double bound, double magnitude) {
    static Total of(Assembly assembly, VectorField field) {
      double value = 0;
      double bound = 0;
      double magnitude = 0;
      for (Piece piece : assembly.pieces()) {
        PatchFlux flux = flux(piece.surface(), field);
        value += piece.outward() * flux.value().orElseThrow();
        bound += flux.errorBound();
        magnitude += flux.magnitude();
      }
      return new Total(value, bound, magnitude);
    }
  }

  static Stream<Arguments> assembliesWithSeeds() {
    List<Arguments> all = new ArrayList<>();
    for (long seed = 1; seed <= 3; seed++) {
      for (Assembly assembly : Assemblies.random(new Random(seed))) {
        all.add(Arguments.of(assembly, seed));
      }
    }
    return all.stream();
  }

  @ParameterizedTest(name = "{0}, seed {1}")
  @MethodSource("assembliesWithSeeds")
  void curlHasNoFluxThroughAClosedSurface(Assembly assembly, long seed) {
    Total total = Total.of(assembly, TestFields.randomCurl(new Random(seed)));
    assertEquals(0, total.value, total.bound);
    assertTrue(total.bound <= 2 * ACCURACY * total.magnitude + 1e-13, "bound " + total.bound);
  }

  @ParameterizedTest(name = "{0}, seed {1}")
  @MethodSource("assembliesWithSeeds")
  void thirdOfThePositionHasTheVolumeAsItsFluxAboutAnyPoint(Assembly assembly, long seed) {
    Random random = new Random(seed);
    Vector3 about = new Vector3(random.nextGaussian(), random.nextGaussian(), 3);
    Total total = Total.of(assembly, TestFields.third(about));
    Total again = Total.of(assembly, TestFields.third(Vector3.ZERO));
    assertEquals(again.value, total.value, again.bound + total.bound);
    if (Double.isFinite(assembly.volume())) {
      assertEquals(assembly.volume(), total.value, total.bound);
    }
  }

  @ParameterizedTest(name = "{0}, seed {1}")
  @MethodSource("assembliesWithSeeds")
  void fluxIsLinearInTheField(Assembly assembly, long seed) {
    Random random = new Random(seed);
    VectorField f = TestFields.random(random);
    VectorField g = TestFields.random(random);
    Surface surface = assembly.pieces().get(0).surface();
    PatchFlux first = flux(surface, f);
    PatchFlux second = flux(surface, g);
    PatchFlux both = flux(surface, TestFields.sum(f, -2.5, g));
    assertEquals(
        first.value().orElseThrow() - 2.5 * second.value().orElseThrow(),
        both.value().orElseThrow(),
        first.errorBound() + 2.5 * second.errorBound() + both.errorBound());
  }

  @ParameterizedTest(name = "{0}, seed {1}")
  @MethodSource("assembliesWithSeeds")
  void rigidMotionOfSurfaceAndFieldTogetherChangesNothing(Assembly assembly, long seed) {
    if (assembly.pieces().get(0).surface().trim().isPresent()) {
      return;
    }
    Random random = new Random(seed);
    VectorField field = TestFields.random(random);
    Vector3 move = new Vector3(0.3, -1.2, 0.7);
    double angle = 1.1;
    Placement placement =
        new Placement(
            Optional.of(new Placement.Turn(Vector3.Z, Expression.number(angle))),
            Optional.of(VectorExpression.of(move)));
    Surface surface = assembly.pieces().get(0).surface();
    PatchFlux before = flux(surface, field);
    PatchFlux after =
        flux(
            Assemblies.placed(surface, placement),
            turned(field, Math.cos(angle), Math.sin(angle), move));
    assertEquals(
        before.value().orElseThrow(),
        after.value().orElseThrow(),
        before.errorBound() + after.errorBound());
  }

  /** The field turned about z and moved: R F(Rᵀ(r − move)). */
  private static VectorField turned(VectorField field, double cos, double sin, Vector3 move) {
    VectorExpression back = VectorExpression.position().minus(VectorExpression.of(move));
    Expression c = Expression.number(cos);
    Expression s = Expression.number(sin);
    VectorExpression moved =
        field
            .cartesian()
            .replace(
                java.util.Map.of(
                    "x", c.times(back.x()).plus(s.times(back.y())),
                    "y", c.times(back.y()).minus(s.times(back.x())),
                    "z", back.z()));
    return TestFields.field(
        c.times(moved.x()).minus(s.times(moved.y())),
        s.times(moved.x()).plus(c.times(moved.y())),
        moved.z());
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {5, 6, 7, 8})
  void splittingAPatchChangesNeitherFluxNorMagnitude(long seed) {
    Random random = new Random(seed);
    VectorField field = TestFields.random(random);
    Surface whole = Assemblies.torus(1.5, 0.4).pieces().get(0).surface();
    double cut = 0.2 + 0.6 * random.nextDouble();
    PatchFlux before = flux(whole, field);
    double value = 0;
    double bound = before.errorBound();
    double magnitude = 0;
    for (double[] range : new double[][] {{0, cut}, {cut, 1}}) {
      PatchFlux part = flux(strip(whole, range[0], range[1]), field);
      value += part.value().orElseThrow();
      bound += part.errorBound();
      magnitude += part.magnitude();
    }
    assertEquals(before.value().orElseThrow(), value, bound);
    assertEquals(before.magnitude(), magnitude, 0.01 * magnitude);
  }

  private static Surface strip(Surface whole, double from, double to) {
    Chart chart = whole.charts().get(0);
    Expression u = Expression.number(from).plus(Expression.number(to - from).times(Chart.u()));
    Chart part =
        new Chart(
            chart.position().replace(java.util.Map.of(Chart.U, u)),
            false,
            chart.periodicV(),
            java.util.Set.of(Chart.Side.U_START, Chart.Side.U_END));
    return new Surface("strip", List.of(part), Optional.empty());
  }

  /** Gauss: 4π from inside, 0 from outside, 2π on a face (check-values, section E). */
  @ParameterizedTest(name = "{0}, seed {1}")
  @MethodSource("assembliesWithSeeds")
  void sourceOutsideAClosedSurfaceHasNoFlux(Assembly assembly, long seed) {
    Total total = Total.of(assembly, TestFields.source(new Vector3(3, 2.5, 4)));
    assertEquals(0, total.value, total.bound);
  }

  @Test
  void sourceInsideABoxHasFourPi() {
    Assembly box = Assemblies.box(new Vector3(-1, -0.5, -0.7), new Vector3(0.8, 1.1, 0.4));
    Total total = Total.of(box, TestFields.source(new Vector3(0.2, 0.3, -0.2)));
    assertEquals(4 * Math.PI, total.value, total.bound);
    assertTrue(total.bound < 1e-8, "bound " + total.bound);
  }

  @Test
  void cubeFaceSeenFromTheCentreHasASixthOfTheSphere() {
    Surface face =
        Assemblies.rectangle(new Vector3(-1, -1, 1), Vector3.X.times(2), Vector3.Y.times(2));
    PatchFlux flux = flux(face, TestFields.source(Vector3.ZERO));
    assertEquals(2 * Math.PI / 3, flux.value().orElseThrow(), flux.errorBound());
  }

  /** 2π(1 − L/√(L² + r²)) (check-values, section E). */
  @Test
  void diskOnTheAxisHasItsSolidAngle() {
    PatchFlux flux =
        flux(Assemblies.disk(Vector3.Z, Vector3.Z, 1), TestFields.source(Vector3.ZERO));
    assertEquals(1.8403023690, flux.value().orElseThrow(), 1e-9);
    assertEquals(2 * Math.PI * (1 - Math.sqrt(0.5)), flux.value().orElseThrow(), flux.errorBound());
  }

  @ParameterizedTest(name = "{0}, seed {1}")
  @MethodSource("assembliesWithSeeds")
  void tangentialFieldHasNoFluxAndCostsLittle(Assembly assembly, long seed) {
    VectorField swirl =
        TestFields.field(TestFields.Y.negated(), TestFields.X, Expression.number(0));
    for (Piece piece : assembly.pieces()) {
      PatchFlux flux = flux(piece.surface(), swirl);
      if (flux.magnitude() < 1e-12) {
        assertEquals(0, flux.value().orElseThrow(), 1e-14);
        assertTrue(flux.evaluations() < 3000, "evaluations " + flux.evaluations());
        assertEquals(org.hullsum.quadrature.Integral.Status.REACHED, flux.status());
      }
    }
  }
}
