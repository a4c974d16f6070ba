package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.closure.PatchRims;
import org.hullsum.flux.FluxIntegrator;
import org.hullsum.flux.FluxIntegrator.PreparedFlux;
import org.hullsum.flux.InputSensitivity;
import org.hullsum.flux.PatchFlux;
import org.hullsum.flux.PatchGeometry;
import org.hullsum.flux.PulledBackSurface;
import org.hullsum.model.Claim;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.Patch;
import org.hullsum.model.PatchSurface;
import org.hullsum.model.StatedFlux;

/**
 * Integrates patches: geometry, fluxes and claims at every instant. What does not depend on the
 * time is evaluated once. Thread-safe.
 */
final class PatchIntegration {
  private final InputSensitivity inputs;
  private final FluxIntegrator integrator;
  private final List<OptionalDouble> instants;
  private final int digits;

  PatchIntegration(InputSensitivity inputs, List<OptionalDouble> instants, int digits) {
    this.inputs = inputs;
    this.integrator = new FluxIntegrator(inputs, digits);
    this.instants = List.copyOf(instants);
    this.digits = digits;
  }

  PatchAudit integrate(Patch patch) {
    Optional<PulledBackSurface> surface = patch.surface().map(PulledBackSurface::of);
    Optional<PatchGeometry> geometry =
        surface.map(s -> PatchGeometry.of(s, inputs.values(), digits));
    Optional<String> noArea = geometry.flatMap(g -> noArea(patch, g));
    int sign =
        noArea.isPresent() ? 0 : geometry.map(g -> DeclaredSign.of(patch.facing(), g)).orElse(1);
    Optional<String> degenerate = noArea;
    if (sign == 0 && noArea.isEmpty()) {
      degenerate =
          Optional.of(
              "the facing `"
                  + patch.facing().text()
                  + "` of `"
                  + patch.name()
                  + "` can't be told: the figure that should give its side is zero");
    }
    return new PatchAudit(
        patch,
        surface,
        geometry,
        patch.surface().map(boundary -> boundary.accept(new Rims())),
        sign,
        degenerate,
        noArea.isPresent() ? withoutArea(patch) : fluxes(patch, surface),
        claims(patch, noArea.isPresent() ? Optional.empty() : surface, sign));
  }

  private static Optional<String> noArea(Patch patch, PatchGeometry geometry) {
    if (!Double.isFinite(geometry.area())) {
      return Optional.of("the surface of `" + patch.name() + "` has no finite area");
    }
    return geometry.area() <= geometry.areaError()
        ? Optional.of("the surface of `" + patch.name() + "` has no area")
        : Optional.empty();
  }

  /** Nothing is integrated over a surface without area; what was metered stands. */
  private List<List<PatchFlux>> withoutArea(Patch patch) {
    List<StatedFlux> stated =
        patch.fluxes().stream().filter(f -> !NormalFollowing.of(f.statement())).toList();
    return byInstant(stated.stream().map(f -> integrator.prepare(Optional.empty(), f)).toList());
  }

  private List<List<PatchFlux>> fluxes(Patch patch, Optional<PulledBackSurface> surface) {
    return byInstant(patch.fluxes().stream().map(f -> integrator.prepare(surface, f)).toList());
  }

  private List<List<PatchFlux>> byInstant(List<PreparedFlux> prepared) {
    List<List<PatchFlux>> all = new ArrayList<>();
    for (int i = 0; i < instants.size(); i++) {
      List<PatchFlux> now = new ArrayList<>();
      for (int k = 0; k < prepared.size(); k++) {
        boolean steady = i > 0 && !prepared.get(k).dependsOnTime();
        now.add(steady ? all.get(0).get(k) : prepared.get(k).at(instants.get(i)));
      }
      all.add(List.copyOf(now));
    }
    return all;
  }

  private List<List<Optional<Estimate>>> claims(
      Patch patch, Optional<PulledBackSurface> surface, int sign) {
    List<List<Optional<Estimate>>> byClaim =
        patch.claims().stream().map(c -> claim(c, surface, sign)).toList();
    List<List<Optional<Estimate>>> all = new ArrayList<>();
    for (int i = 0; i < instants.size(); i++) {
      int instant = i;
      all.add(byClaim.stream().map(c -> c.get(instant)).toList());
    }
    return all;
  }

  private List<Optional<Estimate>> claim(
      Claim claim, Optional<PulledBackSurface> surface, int sign) {
    if (claim.rate().isPresent()) {
      return instants.stream().map(t -> Optional.of(rate(claim, t))).toList();
    }
    if (surface.isEmpty() || sign == 0) {
      return instants.stream().map(t -> Optional.<Estimate>empty()).toList();
    }
    FluxStatement.Field field = new FluxStatement.Field(claim.field().orElseThrow());
    return byInstant(List.of(integrator.prepare(surface.get(), field))).stream()
        .map(now -> PatchAudit.estimate(now.get(0), sign))
        .toList();
  }

  private Estimate rate(Claim claim, OptionalDouble instant) {
    InputSensitivity.Evaluated rate = inputs.evaluate(claim.rate().orElseThrow(), instant);
    return new Estimate(rate.value(), 0, rate.sensitivities());
  }

  private final class Rims implements PatchSurface.Visitor<PatchRims> {
    @Override
    public PatchRims formulas(PatchSurface.Formulas surface) {
      return PatchRims.of(surface.surface(), inputs.values());
    }

    @Override
    public PatchRims triangles(PatchSurface.Triangles surface) {
      return PatchRims.of(surface.topology());
    }
  }
}
