package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.flux.FluxBasis;
import org.hullsum.flux.PatchFlux;
import org.hullsum.flux.PatchGeometry;
import org.hullsum.model.Case;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.StatedFlux;
import org.hullsum.model.TraverseReadings;

/** What is reported of each patch, in the units of the result. */
final class PatchReport {
  private final Case audited;
  private final Scales scales;
  private final FacingAudit facings;

  PatchReport(Case audited, Scales scales, FacingAudit facings) {
    this.audited = audited;
    this.scales = scales;
    this.facings = facings;
  }

  List<PatchResult> results(List<PatchAudit> patches) {
    return patches.stream().map(this::result).toList();
  }

  private PatchResult result(PatchAudit audit) {
    Optional<PatchGeometry> geometry = audit.geometry().filter(g -> Double.isFinite(g.area()));
    FacingAudit.Seen seen = facings.of(audit.name());
    return new PatchResult(
        audit.name(),
        audit.patch().label(),
        audit.patch().leaves(),
        audit.patch().enters(),
        geometry.map(g -> scales.area(g.area())),
        geometry
            .filter(g -> audit.sign() != 0)
            .map(g -> scales.vectorArea(g.vectorArea().times(audit.sign()))),
        fluxes(audit),
        traverses(audit),
        audit.patch().facing().text(),
        seen.found(),
        seen.reason());
  }

  /** Those whose facing can be told. */
  private static List<TraverseReadings> traverses(PatchAudit audit) {
    List<TraverseReadings> traverses = new ArrayList<>();
    for (StatedFlux flux : audit.patch().fluxes()) {
      if (flux.statement() instanceof FluxStatement.Traverse traverse && audit.sign() != 0) {
        traverses.add(audit.sign() > 0 ? traverse.readings() : traverse.readings().reversed());
      }
    }
    return traverses;
  }

  private List<PatchResult.Flux> fluxes(PatchAudit audit) {
    List<Double> instants = audited.schedule().instants();
    List<PatchResult.Flux> fluxes = new ArrayList<>();
    for (int i = 0; i < audit.fluxes().size(); i++) {
      Optional<Double> at =
          instants.isEmpty() ? Optional.empty() : Optional.of(scales.time() * instants.get(i));
      for (PatchFlux flux : audit.fluxes().get(i)) {
        fluxes.add(flux(audit, flux, at));
      }
    }
    return fluxes;
  }

  private PatchResult.Flux flux(PatchAudit audit, PatchFlux flux, Optional<Double> at) {
    boolean turns = flux.basis().followsNormal();
    boolean told = !turns || audit.sign() != 0;
    Optional<Estimate> estimate =
        flux.basis() == FluxBasis.UNKNOWN || !told
            ? Optional.empty()
            : PatchAudit.estimate(flux, scales.rate() * (turns ? audit.sign() : 1));
    return new PatchResult.Flux(
        audited.quantity().name(),
        scales.rateUnit(),
        at,
        estimate.map(Estimate::value),
        estimate.map(Estimate::error).orElse(0.0),
        estimate
            .map(e -> UncertaintyBudget.of(List.of(e), audited.inputs()).standardUncertainty())
            .orElse(0.0),
        flux.evaluations(),
        flux.basis().word());
  }
}
