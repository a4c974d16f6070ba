package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.closure.PatchRims;
import org.hullsum.flux.FluxBasis;
import org.hullsum.flux.PatchFlux;
import org.hullsum.flux.PatchGeometry;
import org.hullsum.flux.PulledBackSurface;
import org.hullsum.model.Facing;
import org.hullsum.model.Patch;
import org.hullsum.quadrature.Integral;

/**
 * One patch, integrated.
 *
 * @param patch of the case
 * @param surface made ready for integration
 * @param geometry for the construction normal, in working units
 * @param rims its boundary, where there is a surface
 * @param sign of the declared facing against the construction normal; 0 where it can't be told; +1
 *     without a surface
 * @param degenerate why the patch is no surface, or has no facing
 * @param fluxes by the instant, one for each statement; for the construction normal where they
 *     follow it
 * @param claims by the instant, one for each claim, from leaves to enters; empty where it could not
 *     be computed
 */
record PatchAudit(
    Patch patch,
    Optional<PulledBackSurface> surface,
    Optional<PatchGeometry> geometry,
    Optional<PatchRims> rims,
    int sign,
    Optional<String> degenerate,
    List<List<PatchFlux>> fluxes,
    List<List<Optional<Estimate>>> claims) {
  /** How much denser than on average over the patch the flux is taken to be along its seams. */
  private static final double SEAM_DENSITY = 10;

  PatchAudit {
    Objects.requireNonNull(patch, "patch");
    Objects.requireNonNull(surface, "surface");
    Objects.requireNonNull(geometry, "geometry");
    Objects.requireNonNull(rims, "rims");
    Objects.requireNonNull(degenerate, "degenerate");
    fluxes = List.copyOf(fluxes);
    claims = List.copyOf(claims);
  }

  String name() {
    return patch.name();
  }

  /** Whether its facing is to be found, and was not declared. */
  boolean facesAsFound() {
    return surface.isPresent() && patch.facing() instanceof Facing.Outward;
  }

  /**
   * The same, facing as found.
   *
   * @param found sign against the construction normal, by which a field's flux is turned too
   */
  PatchAudit facing(int found) {
    List<List<Optional<Estimate>>> turned = new ArrayList<>();
    for (List<Optional<Estimate>> now : claims) {
      List<Optional<Estimate>> estimates = new ArrayList<>();
      for (int k = 0; k < now.size(); k++) {
        boolean follows = patch.claims().get(k).field().isPresent();
        estimates.add(now.get(k).map(e -> follows ? e.times(found * sign) : e));
      }
      turned.add(estimates);
    }
    return new PatchAudit(patch, surface, geometry, rims, found, degenerate, fluxes, turned);
  }

  /** The same where it can't be told which way it faces. */
  PatchAudit withoutFacing(String reason) {
    String unknown = "the facing `outward` of `" + name() + "` can't be told: " + reason;
    return new PatchAudit(patch, surface, geometry, rims, 0, Optional.of(unknown), fluxes, claims);
  }

  /** Whether there is a surface, and more to it than a line or a point. */
  boolean hasArea() {
    return geometry.filter(g -> Double.isFinite(g.area()) && g.area() > g.areaError()).isPresent();
  }

  /** Whether a flux of it follows the normal. */
  boolean followsNormal() {
    return fluxes.get(0).stream().anyMatch(f -> f.basis().followsNormal());
  }

  /** Whether what follows the normal is zero at every instant and everywhere. */
  boolean passesNothing() {
    return fluxes.stream()
        .flatMap(List::stream)
        .noneMatch(f -> f.basis().followsNormal() && f.magnitude() > 0);
  }

  /**
   * The rate at an instant.
   *
   * @param instant its index
   * @param scale from working units to the rate unit
   * @param bad why a flux that follows the normal can't be used
   * @param slackArea what may be missing, or there twice, along its seams
   */
  PatchRate rateAt(int instant, double scale, Optional<String> bad, double slackArea) {
    List<Estimate> parts = new ArrayList<>();
    List<Estimate> following = new ArrayList<>();
    double magnitude = 0;
    boolean accurate = true;
    boolean unknown = false;
    Optional<String> missing = Optional.empty();
    for (PatchFlux flux : fluxes.get(instant)) {
      boolean turns = flux.basis().followsNormal();
      magnitude += Math.abs(scale) * flux.magnitude();
      accurate &= flux.status() == Integral.Status.REACHED;
      unknown |= flux.basis() == FluxBasis.UNKNOWN;
      Optional<String> fault = turns ? bad.or(() -> degenerate) : Optional.empty();
      Optional<Estimate> estimate =
          turns
              ? estimate(flux, scale * sign).map(e -> e.widened(slack(flux, scale, slackArea)))
              : estimate(flux, scale);
      if (flux.basis() != FluxBasis.UNKNOWN && missing.isEmpty()) {
        missing = fault.or(() -> estimate.isEmpty() ? Optional.of(notFinite()) : Optional.empty());
      }
      estimate.ifPresent(parts::add);
      if (turns) {
        estimate.ifPresent(following::add);
      }
    }
    if (missing.isEmpty() && !hasArea() && surface.isPresent()) {
      // Nothing could be integrated: what follows the normal is not zero but not known.
      missing =
          patch.fluxes().stream().anyMatch(f -> NormalFollowing.of(f.statement()))
              ? degenerate
              : Optional.empty();
    }
    boolean whole = !unknown && missing.isEmpty();
    return new PatchRate(
        name(),
        patch.leaves(),
        patch.enters(),
        whole ? Optional.of(Estimate.sum(parts)) : Optional.empty(),
        Estimate.sum(following),
        !following.isEmpty(),
        magnitude,
        accurate,
        missing);
  }

  /** What may flow through the slack of the seams. */
  private double slack(PatchFlux flux, double scale, double slackArea) {
    double area = geometry.map(PatchGeometry::area).orElse(0.0);
    return area > 0 ? SEAM_DENSITY * Math.abs(scale) * flux.magnitude() / area * slackArea : 0;
  }

  private String notFinite() {
    return "the flux through `" + name() + "` is not finite";
  }

  /** Empty where the value or a sensitivity is not finite. */
  static Optional<Estimate> estimate(PatchFlux flux, double scale) {
    boolean finite =
        Double.isFinite(flux.errorBound())
            && flux.sensitivities().values().stream().allMatch(Double::isFinite);
    return flux.value()
        .filter(v -> finite && Double.isFinite(v))
        .map(v -> new Estimate(v, flux.errorBound(), flux.sensitivities()).times(scale));
  }
}
