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
import org.hullsum.numeric.Vector3;
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

  /** Points of each chart for the first apex, and for the others. */
  private static final long FIRST_LIMIT = 400_000;

  private static final long OTHER_LIMIT = 100_000;

  /** Relative accuracy of integrals that are differenced. */
  private static final double DIFFERENCE_ACCURACY = 1e-10;

  /** Where other apexes lie, relative to the middle and the diagonal of the box. */
  private static final List<Vector3> OFFSETS =
      List.of(
          Vector3.ZERO,
          new Vector3(0.11, 0.07, 0.05),
          new Vector3(-0.19, 0.23, 0.31),
          new Vector3(0.9, -0.8, 0.7));

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
    ConeRoute cones =
        new ConeRoute(boundary, densities, inputs.values(), instant, region.box().diagonal());
    Optional<VolumeIntegral> best = Optional.empty();
    long limit = FIRST_LIMIT;
    for (Vector3 apex : apexes(region)) {
      ConeRoute.Outcome outcome = cones.from(apex, relative, enough, limit);
      limit = OTHER_LIMIT;
      VolumeIntegral integral = integral(outcome, apex);
      if (outcome.status() == Integral.Status.REACHED) {
        return withSensitivities(integral, outcome.values(), varying, boundary, g, instant);
      }
      best = better(best, integral);
    }
    return best.orElseThrow();
  }

  private static List<Vector3> apexes(EnclosedRegion region) {
    List<Vector3> apexes = new ArrayList<>();
    apexes.add(region.centroid());
    Vector3 middle = region.box().centre();
    OFFSETS.forEach(offset -> apexes.add(middle.plus(offset.times(region.box().diagonal()))));
    return apexes;
  }

  private static Optional<VolumeIntegral> better(
      Optional<VolumeIntegral> best, VolumeIntegral candidate) {
    return best.isPresent() && best.get().errorBound() <= candidate.errorBound()
        ? best
        : Optional.of(candidate);
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

  private static VolumeIntegral integral(ConeRoute.Outcome outcome, Vector3 apex) {
    boolean finite = outcome.nonFiniteAt().isEmpty();
    return new VolumeIntegral(
        finite ? Optional.of(outcome.values().get(0)) : Optional.empty(),
        finite ? outcome.errorBounds().get(0) : Double.POSITIVE_INFINITY,
        finite ? outcome.magnitude() : 0,
        Map.of(),
        outcome.evaluations(),
        outcome.status(),
        VolumeIntegral.Route.CONES,
        Optional.of(apex),
        outcome.nonFiniteAt());
  }

  private VolumeIntegral withSensitivities(
      VolumeIntegral bare,
      List<Double> values,
      List<String> varying,
      List<BoundaryPatch> boundary,
      Expression g,
      OptionalDouble instant) {
    Map<String, Double> partials = BoundaryMotion.terms(boundary, g, inputs, instant);
    for (int k = 0; k < varying.size(); k++) {
      partials.merge(varying.get(k), values.get(k + 1), Double::sum);
    }
    Map<String, Double> sensitivities = inputs.toBases(partials);
    Set<String> moving = inputs.basesOf(inputs.varyingIn(Switches.jumps(g)));
    for (String base : moving) {
      sensitivities.put(base, difference(base, boundary, g, instant, bare.apex().orElseThrow()));
    }
    return new VolumeIntegral(
        bare.value(),
        bare.errorBound(),
        bare.magnitude(),
        sensitivities,
        bare.evaluations(),
        bare.status(),
        bare.route(),
        bare.apex(),
        bare.nonFiniteAt());
  }

  /** Over ± one standard uncertainty: the input moves a surface on which the density jumps. */
  private double difference(
      String base,
      List<BoundaryPatch> boundary,
      Expression g,
      OptionalDouble instant,
      Vector3 apex) {
    double step = inputs.standardUncertainty(base);
    double centre = inputs.values().get(base);
    double[] ends = new double[2];
    for (int side = 0; side < 2; side++) {
      Map<String, Double> values =
          inputs.valuesWith(base, side == 0 ? centre - step : centre + step);
      ConeRoute cones =
          new ConeRoute(
              boundary, List.of(g), values, instant, EnclosedRegion.of(boundary).box().diagonal());
      ends[side] = cones.from(apex, DIFFERENCE_ACCURACY, 0, FIRST_LIMIT).values().get(0);
    }
    return (ends[1] - ends[0]) / (2 * step);
  }
}
