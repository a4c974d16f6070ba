package org.hullsum.flux;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.field.VectorField;
import org.hullsum.geometry.CylinderShape;
import org.hullsum.geometry.DiskShape;
import org.hullsum.geometry.Shape;
import org.hullsum.geometry.Surface;
import org.hullsum.geometry.SurfaceFault;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.StatedFlux;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Place;
import org.junit.jupiter.api.Test;

class SensitivityTest {
  private static final double RADIUS = 1.5;
  private static final double DEPTH = 2.0;
  private static final double LIFT = 0.3;

  private static final Expression R = Expression.symbol("radius");
  private static final Expression D = Expression.symbol("depth");
  private static final Expression L = Expression.symbol("lift");

  /** The diameter is measured; the radius is derived from it. */
  private static final InputSensitivity INPUTS =
      TestFields.inputs(
          TestFields.derived(
              "radius", RADIUS, Expression.symbol("diameter").over(Expression.number(2))),
          TestFields.figure("diameter", 2 * RADIUS, 0.01),
          TestFields.figure("depth", DEPTH, 0.02),
          TestFields.figure("lift", LIFT, 0.001),
          TestFields.figure("exact", 7, 0));

  private static final Expression ZERO = Expression.number(0);
  private static final VectorExpression BOTTOM = new VectorExpression(ZERO, ZERO, ZERO);
  private static final VectorExpression TOP = new VectorExpression(ZERO, ZERO, D);

  private static final VectorField PARABOLIC =
      TestFields.field(
          ZERO,
          ZERO,
          L.times(R.power(2).minus(TestFields.X.power(2)).minus(TestFields.Y.power(2))));

  private static Surface build(Shape shape) {
    try {
      return shape.surface(INPUTS.values());
    } catch (SurfaceFault fault) {
      throw new IllegalStateException(fault);
    }
  }

  private static Surface disk(VectorExpression centre, Vector3 normal) {
    return build(
        new DiskShape(centre, normal, R, Optional.empty(), Optional.empty(), Optional.empty()));
  }

  private static Surface wall() {
    return build(new CylinderShape(BOTTOM, TOP, R, Optional.empty(), Optional.empty()));
  }

  private static StatedFlux stated(FluxStatement statement, Optional<Expression> times) {
    return new StatedFlux(statement, times, Optional.empty(), new Place("case.yaml", 1, 1));
  }

  private static PatchFlux flux(Optional<Surface> surface, StatedFlux stated) {
    return new FluxIntegrator(INPUTS, 9)
        .prepare(surface.map(PulledBackSurface::of), stated)
        .at(OptionalDouble.empty());
  }

  /** Φ = π L R⁴/2, so dΦ/dL = Φ/L and dΦ/d(diameter) = 2Φ/R. */
  @Test
  void fluxThroughADiskDependsOnFieldAndGeometry() {
    PatchFlux flux =
        flux(
            Optional.of(disk(TOP, Vector3.Z)),
            stated(new FluxStatement.Field(PARABOLIC), Optional.empty()));
    double value = Math.PI * LIFT * Math.pow(RADIUS, 4) / 2;
    assertEquals(value, flux.value().orElseThrow(), flux.errorBound());
    assertEquals(Set.of("diameter", "lift"), flux.sensitivities().keySet());
    assertEquals(value / LIFT, flux.sensitivities().get("lift"), 1e-6 * value);
    assertEquals(2 * value / RADIUS, flux.sensitivities().get("diameter"), 1e-6 * value);
  }

  @Test
  void factorMultipliesValueBoundMagnitudeAndSensitivities() {
    PatchFlux flux =
        flux(
            Optional.of(disk(TOP, Vector3.Z)),
            stated(new FluxStatement.Field(PARABOLIC), Optional.of(D.times(L).negated())));
    double bare = Math.PI * LIFT * Math.pow(RADIUS, 4) / 2;
    double factor = -DEPTH * LIFT;
    assertEquals(factor * bare, flux.value().orElseThrow(), flux.errorBound());
    assertEquals(-factor * bare, flux.magnitude(), 0.01 * bare);
    assertEquals(2 * factor * bare / LIFT, flux.sensitivities().get("lift"), 1e-5 * bare);
    assertEquals(-LIFT * bare, flux.sensitivities().get("depth"), 1e-5 * bare);
  }

  @Test
  void meteredRateIsEvaluatedWithItsDerivatives() {
    PatchFlux flux =
        flux(
            Optional.empty(),
            stated(
                new FluxStatement.Metered(L.times(R.power(2)), false),
                Optional.of(Expression.symbol("exact"))));
    assertEquals(7 * LIFT * RADIUS * RADIUS, flux.value().orElseThrow(), 1e-14);
    assertEquals(7 * RADIUS * RADIUS, flux.sensitivities().get("lift"), 1e-13);
    assertEquals(7 * LIFT * RADIUS, flux.sensitivities().get("diameter"), 1e-13);
    assertEquals(FluxBasis.METERED, flux.basis());
  }

  @Test
  void unknownHasNoValueAndNoneIsZero() {
    assertEquals(
        Optional.empty(),
        flux(Optional.empty(), stated(new FluxStatement.Unknown(), Optional.empty())).value());
    PatchFlux none = flux(Optional.empty(), stated(new FluxStatement.None(), Optional.empty()));
    assertEquals(0.0, none.value().orElseThrow());
    assertEquals(Map.of(), none.sensitivities());
  }

  @Test
  void fluxDensityIsMultipliedByTheAreaElement() {
    PatchFlux flux =
        flux(
            Optional.of(wall()),
            stated(new FluxStatement.Density(TestFields.Z.times(L)), Optional.empty()));
    double value = 2 * Math.PI * RADIUS * LIFT * DEPTH * DEPTH / 2;
    assertEquals(value, flux.value().orElseThrow(), flux.errorBound());
    assertEquals(2 * value / DEPTH, flux.sensitivities().get("depth"), 1e-6 * value);
  }

  /** ∫ L z dV = π R² L D²/2. */
  @Test
  void volumeIntegralMovesWithItsBoundary() {
    List<BoundaryPatch> boundary =
        List.of(
            patch(wall()), patch(disk(TOP, Vector3.Z)), patch(disk(BOTTOM, Vector3.Z.negated())));
    VolumeIntegral integral =
        new VolumeIntegrator(INPUTS, 9)
            .integrate(boundary, L.times(TestFields.Z), OptionalDouble.empty(), 0);
    double value = Math.PI * RADIUS * RADIUS * LIFT * DEPTH * DEPTH / 2;
    assertEquals(value, integral.value().orElseThrow(), integral.errorBound());
    assertEquals(value / LIFT, integral.sensitivities().get("lift"), 1e-6 * value);
    assertEquals(value / RADIUS, integral.sensitivities().get("diameter"), 1e-6 * value);
    assertEquals(2 * value / DEPTH, integral.sensitivities().get("depth"), 1e-6 * value);
  }

  @Test
  void constantDensityMovesWithTheVolume() {
    List<BoundaryPatch> boundary =
        List.of(
            patch(wall()), patch(disk(TOP, Vector3.Z)), patch(disk(BOTTOM, Vector3.Z.negated())));
    VolumeIntegral integral =
        new VolumeIntegrator(INPUTS, 9).integrate(boundary, L, OptionalDouble.empty(), 0);
    double volume = Math.PI * RADIUS * RADIUS * DEPTH;
    assertEquals(LIFT * volume, integral.value().orElseThrow(), integral.errorBound() + 1e-14);
    assertEquals(volume, integral.sensitivities().get("lift"), 1e-6 * volume);
    assertEquals(LIFT * volume / DEPTH, integral.sensitivities().get("depth"), 1e-6 * volume);
    assertEquals(LIFT * volume / RADIUS, integral.sensitivities().get("diameter"), 1e-6 * volume);
  }

  private static BoundaryPatch patch(Surface surface) {
    PulledBackSurface pulledBack = PulledBackSurface.of(surface);
    return new BoundaryPatch(pulledBack, PatchGeometry.of(pulledBack, INPUTS.values(), 9), 1);
  }
}
