package org.hullsum.audit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.function.Supplier;
import org.hullsum.closure.VolumeFacings;
import org.hullsum.closure.WindingOpinion;
import org.hullsum.flux.InputSensitivity;
import org.hullsum.model.Case;
import org.hullsum.model.Envelope;
import org.hullsum.model.Patch;
import org.hullsum.model.Tolerances;
import org.hullsum.model.Volume;
import org.hullsum.problem.Finding;
import org.hullsum.problem.Place;

/**
 * One audit, step by step: patches are integrated, surfaces inspected, singularities looked for,
 * interiors integrated, balances drawn, findings gathered, and what does not close is explained.
 *
 * <p>The work of each step is shared among threads by patch or volume; the results are taken in the
 * order of the case.
 */
final class CaseAudit {
  private final Case audited;
  private final AuditOptions options;
  private final Workers workers;
  private final Scales scales;
  private final InputSensitivity inputs;
  private final List<OptionalDouble> instants;

  CaseAudit(Case audited, AuditOptions options) {
    this.audited = audited;
    this.options = options;
    this.workers = new Workers(options);
    this.scales = Scales.of(audited);
    this.inputs = InputSensitivity.of(audited.inputs());
    List<Double> stated = audited.schedule().instants();
    this.instants =
        stated.isEmpty()
            ? List.of(OptionalDouble.empty())
            : stated.stream().map(OptionalDouble::of).toList();
  }

  CaseResult run() {
    LineInspection lines = new LineInspection(audited);
    Supplier<List<LineInspection.Seen>> seen = workers.begin(lines::look);
    List<PatchAudit> drawnPatches = integratePatches();
    List<SurfaceAudit> surfaces = inspectSurfaces(drawnPatches, seen.get());
    Map<String, WindingOpinion> opinions =
        new WindingInspection(options.secondOpinion(), inputs.values(), workers).look(surfaces);
    FacingAudit facings = new FacingAudit(drawnPatches, surfaces, opinions);
    List<PatchAudit> patches = drawnPatches.stream().map(facings::resolved).toList();
    List<SingularityAudit> onPatches = inspectPatches(patches);
    List<SingularityAudit> inVolumes = inspectVolumes(surfaces);
    List<InteriorAudit> interiors = integrateInteriors(surfaces, inVolumes);
    List<List<PatchRate>> rates = rates(patches, onPatches, surfaces);
    BalanceSheet sheet = new BalanceSheet(audited, scales, rates, interiors);
    List<BalanceSheet.Drawn> drawn =
        Subjects.of(audited, surfaces, scales).stream().map(sheet::draw).toList();
    Map<String, GapIntegration.GapAudit> gaps = integrateGaps(surfaces);
    CaseFindings findings = new CaseFindings(scales);
    onPatches.forEach(found -> findings.addAll(found.findings(scales)));
    for (int v = 0; v < inVolumes.size(); v++) {
      boolean stated = StatedSource.in(audited.volumes().get(v));
      List<Finding> found = inVolumes.get(v).findings(scales);
      findings.addAll(stated ? found.stream().map(StatedSource::weighed).toList() : found);
    }
    gather(findings, patches, surfaces, facings, interiors, rates, drawn);
    Explainer.Explanations explained = explain(patches, surfaces, facings, interiors, drawn, gaps);
    List<BalanceResult> balances =
        drawn.stream().flatMap(d -> d.balances().stream()).map(Balance::result).toList();
    return new CaseResult(
        audited.file(),
        audited.title(),
        audited.about(),
        scales.lengthUnit(),
        audited.warnings(),
        audited.notes(),
        balances,
        new PatchReport(audited, scales, facings).results(patches),
        surfaces.stream().map(s -> s.result(scales, gapFluxes(gaps, s))).toList(),
        Waivers.apply(findings.inOrder(), audited.waivers(), options.today()),
        explained.explanations(),
        explained.fitByChance(),
        correctedCoverage(balances.size()));
  }

  private List<PatchAudit> integratePatches() {
    PatchIntegration integration = new PatchIntegration(inputs, instants, options.digits());
    List<Patch> patches = audited.patches();
    return workers.map("patches", patches.size(), i -> integration.integrate(patches.get(i)));
  }

  private List<SurfaceAudit> inspectSurfaces(
      List<PatchAudit> patches, List<LineInspection.Seen> seen) {
    SurfaceInspection inspection = new SurfaceInspection(patches, inputs.values());
    return inspection.judge(workers.map("surfaces", seen.size(), i -> inspection.sew(seen.get(i))));
  }

  private List<SingularityAudit> inspectPatches(List<PatchAudit> patches) {
    SingularityInspection inspection = new SingularityInspection(inputs.values(), instants);
    return workers.map("fields", patches.size(), i -> inspection.inspect(patches.get(i)));
  }

  private List<SingularityAudit> inspectVolumes(List<SurfaceAudit> surfaces) {
    SingularityInspection inspection = new SingularityInspection(inputs.values(), instants);
    return workers.map(
        "insides",
        surfaces.size(),
        i -> {
          SurfaceAudit surface = surfaces.get(i);
          Volume volume = surface.volume();
          return surface.noRegion().isPresent()
              ? new SingularityAudit(volume.name(), volume.place(), Map.of(), Map.of())
              : inspection.inspect(
                  surface,
                  FieldUse.common(volume, audited.patches()).stream()
                      .map(FieldUse.Carrier::field)
                      .toList());
        });
  }

  private List<InteriorAudit> integrateInteriors(
      List<SurfaceAudit> surfaces, List<SingularityAudit> inVolumes) {
    InteriorIntegration integration =
        new InteriorIntegration(inputs, instants, options.digits(), scales);
    return workers.map(
        "interiors",
        surfaces.size(),
        i -> {
          SurfaceAudit surface = surfaces.get(i);
          boolean identity = FieldUse.isIdentity(surface.volume(), audited.patches());
          List<FieldUse.Carrier> carriers =
              identity ? List.of() : FieldUse.common(surface.volume(), audited.patches());
          Optional<String> unfit = surface.noRegion().or(() -> inVolumes.get(i).singular(scales));
          return InstantRounding.of(integration.integrate(surface, carriers, unfit));
        });
  }

  private List<List<PatchRate>> rates(
      List<PatchAudit> patches, List<SingularityAudit> onPatches, List<SurfaceAudit> surfaces) {
    Map<String, Double> slackAreas = new LinkedHashMap<>();
    for (SurfaceAudit surface : surfaces) {
      for (int k = 0; k < surface.patches().size(); k++) {
        double slackArea = surface.sewn().seams().slackArea(k);
        slackAreas.merge(surface.patches().get(k).name(), slackArea, Math::max);
      }
    }
    List<List<PatchRate>> rates = new ArrayList<>();
    for (int i = 0; i < instants.size(); i++) {
      List<PatchRate> now = new ArrayList<>();
      for (int p = 0; p < patches.size(); p++) {
        PatchAudit patch = patches.get(p);
        Optional<String> bad = onPatches.get(p).singular(scales);
        now.add(patch.rateAt(i, scales.rate(), bad, slackAreas.getOrDefault(patch.name(), 0.0)));
      }
      rates.add(now);
    }
    return InstantRounding.ofPatches(rates);
  }

  private Map<String, GapIntegration.GapAudit> integrateGaps(List<SurfaceAudit> surfaces) {
    GapIntegration integration = new GapIntegration(inputs, instants, options.digits(), scales);
    Map<String, GapIntegration.GapAudit> gaps = new LinkedHashMap<>();
    for (SurfaceAudit surface : surfaces) {
      integration
          .integrate(surface, FieldUse.likely(surface.volume(), audited.patches()))
          .ifPresent(g -> gaps.put(surface.volume().name(), g));
    }
    return gaps;
  }

  private static List<Double> gapFluxes(
      Map<String, GapIntegration.GapAudit> gaps, SurfaceAudit surface) {
    return Optional.ofNullable(gaps.get(surface.volume().name()))
        .map(GapIntegration.GapAudit::fluxes)
        .orElse(List.of());
  }

  private void gather(
      CaseFindings findings,
      List<PatchAudit> patches,
      List<SurfaceAudit> surfaces,
      FacingAudit facings,
      List<InteriorAudit> interiors,
      List<List<PatchRate>> rates,
      List<BalanceSheet.Drawn> drawn) {
    ClaimJudge judge = new ClaimJudge(audited.inputs(), scales.rateUnit());
    for (int p = 0; p < patches.size(); p++) {
      int patch = p;
      findings.addPatch(patches.get(p), options.digits());
      findings.addClaims(
          patches.get(p),
          rates.stream().map(r -> r.get(patch)).toList(),
          tolerancesOf(patches.get(p).patch()),
          judge);
      if (options.secondOpinion()) {
        findings.addAll(
            SelfIntersectionFindings.of(patches.get(p).patch(), scales, options.threads()));
      }
    }
    findings.addAll(facings.findings(patches));
    surfaces.forEach(surface -> findings.addSurface(surface, facings.byWindingAlone()));
    for (int v = 0; v < interiors.size(); v++) {
      findings.addInterior(interiors.get(v), audited.volumes().get(v), options.digits());
    }
    Map<String, Patch> byName = new LinkedHashMap<>();
    audited.patches().forEach(p -> byName.put(p.name(), p));
    drawn.forEach(d -> findings.addBalances(d, placeOf(d.subject().name()), byName));
    findings.addAll(NameUse.findings(audited));
  }

  /** The tolerances of the volume that a patch leaves, else of the one that it enters. */
  private Tolerances tolerancesOf(Patch patch) {
    for (String name : List.of(patch.leaves(), patch.enters())) {
      for (Volume volume : audited.volumes()) {
        if (volume.name().equals(name)) {
          return Subjects.scaled(volume.tolerances(), scales);
        }
      }
    }
    return Tolerances.NONE;
  }

  private Place placeOf(String subject) {
    return audited.volumes().stream()
        .filter(v -> v.name().equals(subject))
        .map(Volume::place)
        .findFirst()
        .or(
            () ->
                audited.envelopes().stream()
                    .filter(e -> e.name().equals(subject))
                    .map(Envelope::place)
                    .findFirst())
        .orElseGet(() -> Place.wholeFile(audited.file()));
  }

  private Explainer.Explanations explain(
      List<PatchAudit> patches,
      List<SurfaceAudit> surfaces,
      FacingAudit facings,
      List<InteriorAudit> interiors,
      List<BalanceSheet.Drawn> drawn,
      Map<String, GapIntegration.GapAudit> gaps) {
    Map<String, Clues.Gap> gapClues = new LinkedHashMap<>();
    Map<String, List<String>> fields = new LinkedHashMap<>();
    List<Balance> explained = new ArrayList<>();
    for (BalanceSheet.Drawn d : drawn) {
      int worst = d.worst();
      explained.add(d.balances().get(worst));
      GapIntegration.GapAudit gap = gaps.get(d.subject().name());
      if (gap != null) {
        gapClues.put(d.subject().name(), gap.clue(d, worst, scales));
      }
      fields.put(d.subject().name(), fieldsOf(d.subject(), interiors));
    }
    Set<String> surfaced = new LinkedHashSet<>();
    patches.stream().filter(p -> p.surface().isPresent()).forEach(p -> surfaced.add(p.name()));
    Set<String> open = new LinkedHashSet<>();
    Set<String> surfaceless = new LinkedHashSet<>();
    List<Clues.Overlap> overlaps = new ArrayList<>();
    for (SurfaceAudit surface : surfaces) {
      surface.openReason().ifPresent(reason -> open.add(surface.volume().name()));
      surface.bare().ifPresent(b -> surfaceless.add(surface.volume().name()));
      for (VolumeFacings.Overlap overlap : surface.facings().overlaps()) {
        overlaps.add(
            new Clues.Overlap(
                surface.patches().get(overlap.first()).name(),
                surface.patches().get(overlap.second()).name()));
      }
    }
    boolean closed = explained.stream().allMatch(b -> b.result().verdict() == Verdict.BALANCED);
    Clues clues =
        new Clues(
            facings.inward(),
            surfaced,
            overlaps,
            open,
            surfaceless,
            gapClues,
            fields,
            closed ? Map.of() : new PatchCauses(audited, inputs).all());
    return new Explainer(clues, audited.inputs()).explain(explained);
  }

  private static List<String> fieldsOf(BalanceSubject subject, List<InteriorAudit> interiors) {
    return interiors.stream()
        .filter(i -> subject.members().contains(i.volume()))
        .flatMap(i -> i.fields().stream())
        .distinct()
        .toList();
  }

  private Optional<Double> correctedCoverage(int balances) {
    if (balances < 2) {
      return Optional.empty();
    }
    double lowest = 1;
    for (Volume volume : audited.volumes()) {
      lowest = Math.min(lowest, volume.tolerances().coverage());
    }
    return Optional.of(Coverage.corrected(lowest, balances));
  }
}
