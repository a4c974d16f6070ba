package org.hullsum.flux;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.apache.commons.numbers.core.Sum;
import org.hullsum.expression.Expression;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Accuracy;
import org.hullsum.quadrature.Integral;

/**
 * Volume integrals from the boundary alone, by signed cones from a point p to every patch: ∫_V g dV
 * = Σ ∬ (∫_0^1 g(p + s(r − p)) s² ds) (r − p)·(r_u × r_v) du dv over the outward boundary.
 *
 * <p>This is the divergence theorem for the field whose divergence is g and which points away from
 * p. It holds for any p as long as g is defined and integrable on the cones; what they cover
 * outside the volume cancels. Not thread-safe.
 */
final class ConeRoute {
  /** The power of s in the inner integrals. */
  private static final int POWER = 2;

  /** Points of the coarse look at each chart, in each direction. */
  private static final int LOOKS = 9;

  /** Relative accuracy to which ∭|g| is wanted. */
  private static final double MAGNITUDE_ACCURACY = 0.005;

  /** The region is not taken for a smaller part of the cones than this at first sight. */
  private static final double LEAST_SHARE = 0.02;

  /** Rounding relative to the sum of |g| over all cones: nothing below it can be asked for. */
  private static final double ROUNDING = 1e-14;

  /** How many times the error asked for the bound, inner integrals included, may be. */
  private static final double FAR_OFF = 10;

  /** Part of the allowed error that the inner integrals may take. */
  private static final double INNER_SHARE = 0.1;

  private final List<Cone> cones = new ArrayList<>();
  private final List<Expression> densities;
  private final Map<String, Double> constants;
  private final OptionalDouble instant;
  private final double size;

  /**
   * @param densities the one wanted, then others that come along
   * @param size of the volume
   */
  ConeRoute(
      List<BoundaryPatch> boundary,
      List<Expression> densities,
      Map<String, Double> constants,
      OptionalDouble instant,
      double size) {
    this.densities = densities;
    this.constants = constants;
    this.instant = instant;
    this.size = size;
    for (BoundaryPatch patch : boundary) {
      for (PulledBackChart chart : patch.surface().charts()) {
        cones.add(new ConeIntegrand(chart, patch.outward(), densities, constants, instant));
      }
      patch
          .surface()
          .mesh()
          .ifPresent(mesh -> cones.add(new MeshCone(mesh, patch.outward(), densities.size())));
    }
  }

  /**
   * Integrates with the cones' common apex at p.
   *
   * @param relative accuracy relative to ∭|g|
   * @param enough an error that is small enough whatever ∭|g|, so that a density that is nothing
   *     but rounding is not chased
   * @param limit largest number of points of each chart
   */
  DensityOutcome from(Vector3 apex, double relative, double enough, long limit) {
    Densities evaluated = new Densities(densities, constants, instant, size, RayIntegrals.BLOCK);
    Coarse coarse = look(evaluated, apex);
    double magnitude = Math.max(coarse.magnitude, LEAST_SHARE * coarse.coneMagnitude);
    DensityTotals totals =
        pass(evaluated, apex, coarse, Math.max(relative * magnitude, enough), limit);
    if (totals.isFinite()
        && totals.errorBound(0) > Math.max(relative * totals.magnitude(), enough)) {
      // The coarse look took the region for larger than it is.
      long spent = totals.evaluations();
      double tighter = Math.max(relative * totals.magnitude(), enough);
      totals = pass(evaluated, apex, coarse, tighter, limit).spent(spent);
    }
    double loose = Math.max(MAGNITUDE_ACCURACY * totals.magnitude(), enough);
    if (totals.isFinite() && totals.magnitudeError() > loose) {
      measureMagnitude(totals, limit);
    }
    double asked = Math.max(relative * totals.magnitude(), enough);
    double known = Math.max(FAR_OFF * asked, FAR_OFF * ROUNDING * coarse.coneMagnitude);
    boolean farOff = totals.isFinite() && totals.errorBound(0) > known;
    return farOff ? totals.outcome().doubted(totals.errorBound(0)) : totals.outcome();
  }

  /** All cones to one accuracy. */
  private DensityTotals pass(
      Densities evaluated, Vector3 apex, Coarse coarse, double allowed, long limit) {
    double rounding = ROUNDING * coarse.coneMagnitude;
    double error = Math.max(Math.max(allowed, rounding), Double.MIN_NORMAL);
    double perRay = INNER_SHARE * error / Math.max(coarse.coneVolume, Double.MIN_NORMAL);
    double[][] starts = repeated(apex, coarse.ends[0].length);
    int level = RayIntegrals.level(evaluated, POWER, starts, coarse.ends, perRay);
    RayIntegrals rays = new RayIntegrals(evaluated, POWER, level, perRay);
    Accuracy accuracy =
        new Accuracy(0, error / (2 * cones.size()), ChartIntegral.ANY_MAGNITUDE, limit);
    DensityTotals totals = new DensityTotals(densities.size());
    for (Cone cone : cones) {
      cone.aim(apex, rays, densities.size());
      Integral[] parts = cone.integrate(accuracy);
      totals.add(parts);
      if (parts[0].nonFiniteAt().isPresent()) {
        return totals.notFinite(cone.position(parts[0].nonFiniteAt().get()));
      }
    }
    return totals;
  }

  private void measureMagnitude(DensityTotals totals, long limit) {
    double error = MAGNITUDE_ACCURACY * Math.max(totals.magnitude(), Double.MIN_NORMAL);
    Accuracy accuracy = new Accuracy(0, error / cones.size(), ChartIntegral.ANY_MAGNITUDE, limit);
    Sum magnitude = Sum.create();
    for (Cone cone : cones) {
      Integral part = cone.integrateMagnitude(accuracy);
      magnitude.add(part.value());
      totals.spent(part.evaluations());
    }
    totals.replaceMagnitude(magnitude.getAsDouble());
  }

  private static double[][] repeated(Vector3 point, int count) {
    double[][] rows = new double[3][count];
    for (int axis = 0; axis < 3; axis++) {
      Arrays.fill(rows[axis], point.component(axis));
    }
    return rows;
  }

  private Coarse look(Densities evaluated, Vector3 apex) {
    RayIntegrals rays =
        new RayIntegrals(evaluated, POWER, RayIntegrals.COARSE, Double.POSITIVE_INFINITY);
    Coarse coarse = new Coarse();
    int each = LOOKS * LOOKS;
    coarse.ends = new double[3][each * cones.size()];
    double[][] results = new double[RayIntegrals.rows(densities.size())][each];
    boolean[] all = new boolean[each];
    Arrays.fill(all, true);
    double[][] starts = repeated(apex, each);
    int first = 0;
    for (Cone cone : cones) {
      double[][] rows = cone.lattice(apex, LOOKS);
      rays.integrate(each, starts, rows, all, results);
      double[] absolute = results[densities.size()];
      for (int i = 0; i < each; i++) {
        double height = rows[3][i];
        if (Double.isFinite(absolute[i] * height)) {
          coarse.magnitude += height * absolute[i];
          coarse.coneMagnitude += Math.abs(height) * absolute[i];
          coarse.coneVolume += Math.abs(height);
        }
      }
      for (int axis = 0; axis < 3; axis++) {
        System.arraycopy(rows[axis], 0, coarse.ends[axis], first, each);
      }
      first += each;
    }
    coarse.magnitude = Math.abs(coarse.magnitude);
    return coarse;
  }

  /** What a first look at a lattice of rays shows. */
  private static final class Coarse {
    private double[][] ends = new double[3][0];

    /** ∭|g|, about. */
    private double magnitude;

    /** The sum of |g| over all cones, wherever they go. */
    private double coneMagnitude;

    /** ∬|(r − p)·N|. */
    private double coneVolume;
  }
}
