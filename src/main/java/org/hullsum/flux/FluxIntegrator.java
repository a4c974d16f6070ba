package org.hullsum.flux;

import java.util.Objects;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Function;
import org.hullsum.expression.Symbols;
import org.hullsum.expression.VectorExpression;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.StatedFlux;

/**
 * The flux through patches by every kind of flux statement.
 *
 * <p>Φ = ∬ F·n dS = ∬ F(r(u, v), t)·(r_u × r_v) du dv for a field, ∬ q |r_u × r_v| du dv for a flux
 * density q along the normal. Both are for the construction normal; the facing is a sign that the
 * caller multiplies in.
 *
 * <p>Immutable and thread-safe; what it prepares is not.
 */
public final class FluxIntegrator {
  private final InputSensitivity inputs;
  private final double relative;

  /**
   * @param inputs of the case
   * @param digits the integrals' error is to be within 10^−digits of ∬|F·n| dS
   */
  public FluxIntegrator(InputSensitivity inputs, int digits) {
    this.inputs = Objects.requireNonNull(inputs, "inputs");
    this.relative = Math.pow(10, -digits);
  }

  /** A flux statement ready to be evaluated at instants; not thread-safe. */
  public interface PreparedFlux {
    /** Whether it differs from one instant to another. */
    boolean dependsOnTime();

    /** The flux at an instant; at no instant where the case has none. */
    PatchFlux at(OptionalDouble instant);
  }

  /**
   * Prepares a stated flux.
   *
   * @param surface of the patch; needed by a field, a flux density and a profile
   * @throws IllegalArgumentException where the statement needs a surface and there is none
   */
  public PreparedFlux prepare(Optional<PulledBackSurface> surface, StatedFlux stated) {
    PreparedFlux bare = stated.statement().accept(new Preparation(surface));
    return stated.times().<PreparedFlux>map(factor -> new Multiplied(bare, factor)).orElse(bare);
  }

  /** The flux of a field for which nothing but the field is stated, as in a claim. */
  public PreparedFlux prepare(PulledBackSurface surface, FluxStatement statement) {
    return statement.accept(new Preparation(Optional.of(surface)));
  }

  private final class Multiplied implements PreparedFlux {
    private final PreparedFlux bare;
    private final Expression factor;

    Multiplied(PreparedFlux bare, Expression factor) {
      this.bare = bare;
      this.factor = factor;
    }

    @Override
    public boolean dependsOnTime() {
      return bare.dependsOnTime() || Symbols.in(factor).contains(InputSensitivity.TIME);
    }

    @Override
    public PatchFlux at(OptionalDouble instant) {
      return bare.at(instant).times(inputs.evaluate(factor, instant));
    }
  }

  private record Integrated(SurfaceFlux flux, FluxBasis basis) implements PreparedFlux {
    @Override
    public boolean dependsOnTime() {
      return flux.dependsOnTime();
    }

    @Override
    public PatchFlux at(OptionalDouble instant) {
      return flux.at(instant, basis);
    }
  }

  private record Constant(PatchFlux flux) implements PreparedFlux {
    @Override
    public boolean dependsOnTime() {
      return false;
    }

    @Override
    public PatchFlux at(OptionalDouble instant) {
      return flux;
    }
  }

  private final class Preparation implements FluxStatement.Visitor<PreparedFlux> {
    private final Optional<PulledBackSurface> surface;

    Preparation(Optional<PulledBackSurface> surface) {
      this.surface = surface;
    }

    private PulledBackSurface surface() {
      return surface.orElseThrow(
          () -> new IllegalArgumentException("a flux along the normal needs a surface"));
    }

    @Override
    public PreparedFlux field(FluxStatement.Field statement) {
      VectorExpression field = statement.field().cartesian();
      if (surface().drawnMesh().isPresent()) {
        return MeshFlux.of(surface().drawnMesh().get(), field, inputs, relative);
      }
      SurfaceFlux flux =
          new SurfaceFlux(
              surface().charts(),
              chart -> chart.pullBack(field).dot(chart.areaVector()),
              chart -> length(chart.pullBack(field)).times(length(chart.areaVector())),
              inputs,
              relative);
      return new Integrated(flux, FluxBasis.FIELD);
    }

    @Override
    public PreparedFlux density(FluxStatement.Density statement) {
      return along(statement.density(), FluxBasis.FLUX_DENSITY);
    }

    @Override
    public PreparedFlux profile(FluxStatement.Profile statement) {
      return along(statement.density(), FluxBasis.PROFILE);
    }

    private PreparedFlux along(Expression density, FluxBasis basis) {
      if (surface().drawnMesh().isPresent()) {
        return MeshFlux.along(surface().drawnMesh().get(), density, basis, inputs, relative);
      }
      SurfaceFlux flux =
          new SurfaceFlux(
              surface().charts(),
              chart -> chart.pullBack(density).times(length(chart.areaVector())),
              chart -> chart.pullBack(density).times(length(chart.areaVector())),
              inputs,
              relative);
      return new Integrated(flux, basis);
    }

    @Override
    public PreparedFlux traverse(FluxStatement.Traverse statement) {
      return new Constant(
          PatchFlux.stated(
                  inputs.evaluate(statement.rate(), OptionalDouble.empty()), FluxBasis.TRAVERSE)
              .within(statement.errorBound()));
    }

    @Override
    public PreparedFlux metered(FluxStatement.Metered statement) {
      return new PreparedFlux() {
        @Override
        public boolean dependsOnTime() {
          return Symbols.in(statement.rate()).contains(InputSensitivity.TIME);
        }

        @Override
        public PatchFlux at(OptionalDouble instant) {
          return PatchFlux.stated(inputs.evaluate(statement.rate(), instant), FluxBasis.METERED);
        }
      };
    }

    @Override
    public PreparedFlux none() {
      return new Constant(
          PatchFlux.stated(new InputSensitivity.Evaluated(0, java.util.Map.of()), FluxBasis.NONE));
    }

    @Override
    public PreparedFlux unknown() {
      return new Constant(PatchFlux.unknown());
    }
  }

  static Expression length(VectorExpression vector) {
    return Expression.call(Function.SQRT, vector.dot(vector));
  }
}
