package org.hullsum.flux;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.hullsum.expression.Derivative;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Simplifier;
import org.hullsum.expression.Switches;
import org.hullsum.expression.Symbols;
import org.hullsum.quadrature.Integral;

/**
 * Integrals of densities over the region that a closed boundary encloses, without a volume mesh.
 *
 * <p>A constant density is multiplied by the volume, which the moments give. Otherwise signed cones
 * are drawn from the centroid ({@link ConeRoute}); where the density is not finite on a cone, or
 * the accuracy is not reached, from other points; and at last columns are taken along an axis
 * ({@link ColumnRoute}), which never look outside the region. The facings are those found, never
 * those declared.
 *
 * <p>Immutable and thread-safe.
 */
public final class VolumeIntegrator {
  private static final Set<String> SPACE = Set.of("x", "y", "z");

  /** Relative accuracy of integrals that are differenced. */
  private static final double DIFFERENCE_ACCURACY = 1e-10;

  private final InputSensitivity inputs;
  private final double relative;

  /**
   * @param digits the integrals' error is to be within 10^−digits of ∭|g| dV
   */
  public VolumeIntegrator(InputSensitivity inputs, int digits) {
    this.inputs = Objects.requireNonNull(inputs, "inputs");
    this.relative = Math.pow(10, -digits);
  }

  /**
   * Integrates a density.
   *
   * @param boundary the closed boundary of the region, each patch with its found facing
   * @param density a formula in {@code x y z t} and inputs
   * @param enough an error that is small enough whatever ∭|g| dV, such as a small part of what
   *     flows through the boundary; 0 to ask for the relative accuracy alone
   */
  public VolumeIntegral integrate(
      List<BoundaryPatch> boundary, Expression density, OptionalDouble instant, double enough) {
    Expression g = Simplifier.simplify(density);
    EnclosedRegion region = EnclosedRegion.of(boundary);
    if (Collections.disjoint(Symbols.in(g), SPACE)) {
      return constant(boundary, region, g, instant);
    }
    List<String> varying = List.copyOf(inputs.varyingIn(List.of(g)));
    List<Expression> densities = new ArrayList<>();
    densities.add(g);
    varying.forEach(name -> densities.add(Derivative.of(g, name)));
    VolumeRoutes.Found found =
        new VolumeRoutes(boundary, densities, inputs.values(), instant).best(relative, enough);
    DensityOutcome outcome = found.outcome();
    boolean finite = outcome.isFinite();
    return new VolumeIntegral(
        finite ? Optional.of(outcome.values().get(0)) : Optional.empty(),
        finite ? outcome.errorBounds().get(0) : Double.POSITIVE_INFINITY,
        finite ? outcome.magnitude() : 0,
        finite ? sensitivities(outcome, varying, boundary, g, instant) : Map.of(),
        found.evaluations(),
        outcome.status(),
        found.route(),
        found.apex(),
        outcome.nonFiniteAt());
  }

  private VolumeIntegral constant(
      List<BoundaryPatch> boundary, EnclosedRegion region, Expression g, OptionalDouble instant) {
    InputSensitivity.Evaluated density = inputs.evaluate(g, instant);
    Map<String, Double> sensitivities = new LinkedHashMap<>();
    density
        .sensitivities()
        .forEach((base, rate) -> sensitivities.put(base, rate * region.volume()));
    if (density.value() != 0) {
      inputs
          .toBases(BoundaryMotion.terms(boundary, g, inputs, instant))
          .forEach((base, rate) -> sensitivities.merge(base, rate, Double::sum));
    }
    boolean finite = Double.isFinite(density.value());
    return new VolumeIntegral(
        finite ? Optional.of(density.value() * region.volume()) : Optional.empty(),
        finite ? Math.abs(density.value()) * region.volumeError() : Double.POSITIVE_INFINITY,
        finite ? Math.abs(density.value() * region.volume()) : 0,
        sensitivities,
        0,
        finite ? Integral.Status.REACHED : Integral.Status.NOT_FINITE,
        VolumeIntegral.Route.CONES,
        Optional.of(region.centroid()),
        finite ? Optional.empty() : Optional.of(region.centroid()));
  }

  private Map<String, Double> sensitivities(
      DensityOutcome outcome,
      List<String> varying,
      List<BoundaryPatch> boundary,
      Expression g,
      OptionalDouble instant) {
    Map<String, Double> partials = BoundaryMotion.terms(boundary, g, inputs, instant);
    for (int k = 0; k < varying.size(); k++) {
      partials.merge(varying.get(k), outcome.values().get(k + 1), Double::sum);
    }
    Map<String, Double> sensitivities = inputs.toBases(partials);
    for (String base : inputs.basesOf(inputs.varyingIn(Switches.jumps(g)))) {
      sensitivities.put(base, difference(base, boundary, g, instant));
    }
    return sensitivities;
  }

  /** Over ± one standard uncertainty: the input moves a surface on which the density jumps. */
  private double difference(
      String base, List<BoundaryPatch> boundary, Expression g, OptionalDouble instant) {
    double step = inputs.standardUncertainty(base);
    double centre = inputs.values().get(base);
    double above = valueWith(base, centre + step, boundary, g, instant);
    double below = valueWith(base, centre - step, boundary, g, instant);
    return (above - below) / (2 * step);
  }

  private double valueWith(
      String base,
      double value,
      List<BoundaryPatch> boundary,
      Expression g,
      OptionalDouble instant) {
    return new VolumeRoutes(boundary, List.of(g), inputs.valuesWith(base, value), instant)
        .best(DIFFERENCE_ACCURACY, 0)
        .outcome()
        .values()
        .get(0);
  }
}
