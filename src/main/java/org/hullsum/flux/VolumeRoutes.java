package org.hullsum.flux;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.expression.Expression;
import org.hullsum.numeric.Vector3;

/**
 * The choice among the routes to a volume integral.
 *
 * <p>Cones from the centroid serve where the density is proved regular over the whole box of the
 * region. Where that is not proved, cones may pass a singularity outside the region: columns are
 * taken, and where these fail, cones whose result is confirmed from another apex.
 */
final class VolumeRoutes {
  /** Points of each chart for the first apex, and for the others. */
  private static final long FIRST_LIMIT = 400_000;

  private static final long OTHER_LIMIT = 100_000;

  /** Where a density is not proved regular. */
  private static final long IRREGULAR_LIMIT = 20_000;

  /** Points of each chart from which columns hang, at first and at last. */
  private static final long FEW_COLUMNS = 4_000;

  private static final long COLUMNS_LIMIT = 30_000;

  /** Relative accuracy to which another apex is asked to confirm the first. */
  private static final double CONFIRMATION = 1e-4;

  /** Two apexes that confirm one another know the integral at least so well. */
  private static final double ROUGH = 1e-3;

  /** Where other apexes lie, relative to the middle and the diagonal of the box. */
  private static final List<Vector3> OFFSETS =
      List.of(
          Vector3.ZERO,
          new Vector3(0.11, 0.07, 0.05),
          new Vector3(-0.19, 0.23, 0.31),
          new Vector3(0.9, -0.8, 0.7));

  private final List<BoundaryPatch> boundary;
  private final EnclosedRegion region;
  private final List<Expression> densities;
  private final Map<String, Double> values;
  private final OptionalDouble instant;

  /**
   * What was found, and how.
   *
   * @param apex of the cones
   * @param evaluations of all routes tried
   */
  record Found(
      DensityOutcome outcome,
      VolumeIntegral.Route route,
      Optional<Vector3> apex,
      long evaluations) {
    Found spent(long more) {
      return new Found(outcome, route, apex, evaluations + more);
    }

    /** The better of two, with the evaluations of both. */
    Found or(Found other) {
      return isBetter(other.outcome, outcome) ? other.spent(evaluations) : spent(other.evaluations);
    }
  }

  /**
   * @param densities the one wanted, then others that come along
   * @param values of every input
   */
  VolumeRoutes(
      List<BoundaryPatch> boundary,
      List<Expression> densities,
      Map<String, Double> values,
      OptionalDouble instant) {
    this.boundary = boundary;
    this.region = EnclosedRegion.of(boundary);
    this.densities = densities;
    this.values = values;
    this.instant = instant;
  }

  /**
   * Integrates to an accuracy relative to ∭|g|, or as near to it as any route comes.
   *
   * @param enough an error that is small enough whatever ∭|g|
   */
  Found best(double relative, double enough) {
    return isRegular() ? regular(relative, enough) : irregular(relative, enough);
  }

  /** Cones wherever they like, columns if no apex will do. */
  private Found regular(double relative, double enough) {
    ConeRoute cones = cones();
    Found best =
        cones(cones.from(region.centroid(), relative, enough, FIRST_LIMIT), region.centroid(), 0);
    for (Vector3 apex : others()) {
      if (best.outcome.reached()) {
        return best;
      }
      best = best.or(cones(cones.from(apex, relative, enough, OTHER_LIMIT), apex, 0));
    }
    if (best.outcome.reached()) {
      return best;
    }
    Found cheapest = best;
    return columns(relative, enough, COLUMNS_LIMIT).map(cheapest::or).orElse(cheapest);
  }

  /** Columns, which stay inside; else cones that another apex confirms. */
  private Found irregular(double relative, double enough) {
    Optional<Found> columns = columns(relative, enough, FEW_COLUMNS);
    if (columns.isPresent() && columns.get().outcome.reached()) {
      return columns.get();
    }
    ConeRoute cones = cones();
    DensityOutcome first = cones.from(region.centroid(), relative, enough, IRREGULAR_LIMIT);
    Found byCones = cones(first, region.centroid(), columns.map(Found::evaluations).orElse(0L));
    for (Vector3 apex : first.isFinite() ? others() : List.<Vector3>of()) {
      DensityOutcome next =
          cones.from(apex, Math.max(CONFIRMATION, relative), enough, IRREGULAR_LIMIT);
      byCones = byCones.spent(next.evaluations());
      if (agree(first, next)) {
        return byCones;
      }
    }
    if (columns.isPresent()) {
      Found found = columns.get().spent(byCones.evaluations);
      return columns(relative, enough, COLUMNS_LIMIT).map(found::or).orElse(found);
    }
    // Nothing confirms what may have passed a singularity.
    return first.isFinite()
        ? cones(first.doubted(ROUGH * first.magnitude()), region.centroid(), byCones.evaluations)
        : byCones;
  }

  private ConeRoute cones() {
    return new ConeRoute(boundary, densities, values, instant, region.box().diagonal());
  }

  private static Found cones(DensityOutcome outcome, Vector3 apex, long before) {
    return new Found(
        outcome, VolumeIntegral.Route.CONES, Optional.of(apex), before + outcome.evaluations());
  }

  private Optional<Found> columns(double relative, double enough, long limit) {
    return new ColumnRoute(boundary, densities, values, instant, region.box().diagonal())
        .integrate(relative, enough, limit)
        .map(
            outcome ->
                new Found(
                    outcome,
                    VolumeIntegral.Route.COLUMNS,
                    Optional.empty(),
                    outcome.evaluations()));
  }

  private List<Vector3> others() {
    List<Vector3> apexes = new ArrayList<>();
    Vector3 middle = region.box().centre();
    double size = region.box().diagonal();
    for (Vector3 offset : OFFSETS) {
      Vector3 apex = middle.plus(offset.times(size));
      if (apex.minus(region.centroid()).norm() > CONFIRMATION * size) {
        apexes.add(apex);
      }
    }
    return apexes;
  }

  /** Whether the density is proved regular wherever cones from within the box may go. */
  private boolean isRegular() {
    HazardCheck check = HazardCheck.of(densities.get(0), values, instant);
    return check.none()
        || new HazardSearch(new BoxDomain(region.box()), check).run().isProvedAbsent();
  }

  private static boolean agree(DensityOutcome a, DensityOutcome b) {
    if (!a.isFinite() || !b.isFinite()) {
      return false;
    }
    double bound = a.errorBounds().get(0) + b.errorBounds().get(0);
    double magnitude = Math.max(a.magnitude(), b.magnitude());
    return bound <= ROUGH * magnitude && Math.abs(a.values().get(0) - b.values().get(0)) <= bound;
  }

  private static boolean isBetter(DensityOutcome candidate, DensityOutcome best) {
    return candidate.isFinite()
        && (!best.isFinite() || candidate.errorBounds().get(0) < best.errorBounds().get(0));
  }
}
