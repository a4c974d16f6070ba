package org.hullsum.audit;

import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.hullsum.closure.FoundFacing.Side;
import org.hullsum.closure.Gap;
import org.hullsum.closure.Seam;
import org.hullsum.closure.Shell;
import org.hullsum.closure.VolumeFacings;
import org.hullsum.flux.PatchFlux;
import org.hullsum.model.Claim;
import org.hullsum.model.Patch;
import org.hullsum.model.Tolerances;
import org.hullsum.model.Volume;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Place;
import org.hullsum.problem.Severity;
import org.hullsum.quadrature.Integral;

/** The findings on patches, surfaces, interiors and balances. */
final class CaseFindings {
  /** Gaps that one message tells; the others are in the surface's own list. */
  private static final int MOST_GAPS_TOLD = 3;

  /** Gaps that are held against one another. */
  private static final int MOST_GAPS_COMPARED = 1000;

  /** Distance and difference of rims that may belong together, relative to their length. */
  private static final double ALIKE = 0.2;

  private final Scales scales;
  private final List<Finding> findings = new ArrayList<>();

  CaseFindings(Scales scales) {
    this.scales = scales;
  }

  /** In the order of the case; what has no place comes last. */
  List<Finding> inOrder() {
    Comparator<Finding> byPlace =
        Comparator.comparingInt((Finding f) -> f.place().map(Place::line).orElse(Integer.MAX_VALUE))
            .thenComparingInt(f -> f.place().map(Place::column).orElse(Integer.MAX_VALUE));
    return findings.stream().sorted(byPlace).toList();
  }

  void addAll(List<Finding> others) {
    findings.addAll(others);
  }

  /** Each code once on each name and place: of several instants the first stands. */
  private void add(Finding finding) {
    boolean said =
        findings.stream()
            .anyMatch(
                f ->
                    f.code() == finding.code()
                        && f.on().equals(finding.on())
                        && f.place().equals(finding.place()));
    if (!said) {
      findings.add(finding);
    }
  }

  private void add(
      FindingCode code, String message, String on, Place place, Map<String, Object> evidence) {
    add(Finding.of(code, message, on, Optional.of(place), evidence));
  }

  void addPatch(PatchAudit audit, int digits) {
    Patch patch = audit.patch();
    audit
        .degenerate()
        .ifPresent(
            reason ->
                add(
                    FindingCode.PATCH_DEGENERATE,
                    reason,
                    patch.name(),
                    audit.hasArea() ? patch.facingPlace() : patch.place(),
                    Map.of()));
    audit.fluxes().forEach(now -> now.forEach(flux -> addFlux(audit, flux, digits)));
    patch.surface().ifPresent(surface -> findings.addAll(MeshFindings.of(patch, surface, scales)));
  }

  private boolean has(FindingCode code, String on) {
    return findings.stream()
        .anyMatch(f -> f.code() == code && f.on().filter(on::equals).isPresent());
  }

  private void addFlux(PatchAudit audit, PatchFlux flux, int digits) {
    Patch patch = audit.patch();
    if (flux.nonFiniteAt().isPresent() && has(FindingCode.FIELD_SINGULAR, patch.name())) {
      return;
    }
    if (flux.nonFiniteAt().isPresent()) {
      Vector3 at = flux.nonFiniteAt().get();
      add(
          FindingCode.FIELD_UNDEFINED,
          "what flows through `"
              + patch.name()
              + "` is not finite at "
              + scales.place(at)
              + ", a point of the patch",
          patch.name(),
          patch.place(),
          Map.of("at", coordinates(scales.point(at))));
    } else if (flux.status() == Integral.Status.NOT_REACHED) {
      addAccuracy(
          "the flux through `" + patch.name() + "`",
          patch.name(),
          patch.place(),
          digits,
          flux.magnitude() > 0 ? flux.errorBound() / flux.magnitude() : 1);
    }
  }

  private void addAccuracy(String what, String on, Place place, int digits, double reached) {
    Map<String, Object> evidence = new LinkedHashMap<>();
    evidence.put("asked", Math.pow(10, -digits));
    evidence.put("reached", reached);
    add(
        FindingCode.ACCURACY_NOT_REACHED,
        what
            + " is known to "
            + Figures.text(reached)
            + " of its magnitude, where 1e-"
            + digits
            + " was asked for; the error bound stands",
        on,
        place,
        evidence);
  }

  static double[] coordinates(Vector3 point) {
    return new double[] {point.x(), point.y(), point.z()};
  }

  void addClaims(PatchAudit audit, List<PatchRate> rates, Tolerances tolerances, ClaimJudge judge) {
    for (int i = 0; i < rates.size(); i++) {
      List<Claim> claims = audit.patch().claims();
      for (int k = 0; k < claims.size(); k++) {
        Optional<Estimate> flux = rates.get(i).total();
        Optional<Estimate> claim = audit.claims().get(i).get(k).map(c -> c.times(scales.rate()));
        if (flux.isPresent() && claim.isPresent()) {
          judge
              .judge(
                  new ClaimJudge.Comparison(
                      audit.name(), flux.get(), claim.get(), tolerances, claims.get(k).place()))
              .ifPresent(this::add);
        }
      }
    }
  }

  /**
   * What is wrong with a surface.
   *
   * @param told patches of which the facing is told by other findings, so that none is offered
   */
  void addSurface(SurfaceAudit surface, Set<String> told) {
    Volume volume = surface.volume();
    if (!surface.bounded()) {
      add(
          FindingCode.VOLUME_UNBOUNDED,
          "no patch leaves or enters `" + volume.name() + "`",
          volume.name(),
          volume.place(),
          Map.of());
    }
    surface.facings().overlaps().forEach(o -> addOverlap(surface, o));
    if (surface.facings().overlaps().isEmpty()) {
      surface.sewn().seams().seams().stream()
          .filter(Seam::isCrowded)
          .forEach(seam -> addCrowded(surface, seam));
    }
    surface.sewn().shells().stream()
        .filter(shell -> !shell.consistent())
        .forEach(shell -> addTwisted(surface, shell));
    findings.addAll(FacetingFindings.of(surface, scales));
    surface.offered().stream()
        .filter(name -> !told.contains(name))
        .forEach(name -> addOffered(surface, name));
    if (!surface.gaps().isEmpty()) {
      addOpen(surface);
      return;
    }
    WeldSuggestion.of(surface, scales).forEach(this::addCracked);
    if (surface.bare().isEmpty() && !surface.overlaps()) {
      surface.undeterminedReason().ifPresent(reason -> addUndetermined(surface, reason));
    }
  }

  private void addOverlap(SurfaceAudit surface, VolumeFacings.Overlap overlap) {
    String first = surface.patches().get(overlap.first()).name();
    PatchAudit second = surface.patches().get(overlap.second());
    Map<String, Object> evidence = new LinkedHashMap<>();
    evidence.put("with", first);
    evidence.put("at", coordinates(scales.point(overlap.place())));
    add(
        FindingCode.SURFACE_OVERLAP,
        "`"
            + second.name()
            + "` lies on `"
            + first
            + "` around "
            + scales.place(overlap.place())
            + ": the same piece of surface is counted twice",
        second.name(),
        second.patch().place(),
        evidence);
  }

  private void addCrowded(SurfaceAudit surface, Seam seam) {
    List<String> names = names(surface, seam.patches());
    add(
        FindingCode.SURFACE_OVERLAP,
        "along one edge of "
            + Figures.text(scales.length() * seam.length(), scales.lengthUnit())
            + " meet "
            + seam.sides().size()
            + " rims of `"
            + surface.volume().name()
            + "`, of "
            + String.join(", ", names)
            + "; a closed surface has two along each edge, so one is too many or belongs inside",
        surface.volume().name(),
        surface.volume().place(),
        Map.of("patches", names));
  }

  private void addTwisted(SurfaceAudit surface, Shell shell) {
    List<String> names = names(surface, shell.patches());
    add(
        FindingCode.ORIENTATION_CONFLICT,
        "the patches "
            + String.join(", ", names)
            + " of `"
            + surface.volume().name()
            + "` can't be turned so that all agree along their seams: they form a one-sided surface",
        surface.volume().name(),
        surface.volume().place(),
        Map.of("patches", names));
  }

  /** On an open surface no side is outward: what would make the normals agree is only offered. */
  private void addOffered(SurfaceAudit surface, String name) {
    boolean undetermined =
        surface.facingOf(name).filter(f -> f.side() == Side.UNDETERMINED).isPresent();
    PatchAudit patch =
        surface.patches().stream().filter(p -> p.name().equals(name)).findFirst().orElseThrow();
    if (undetermined) {
      add(
          Finding.of(
                  FindingCode.ORIENTATION_REVERSED,
                  "the surface of `"
                      + surface.volume().name()
                      + "` is open, so no side of it is outward; turning `"
                      + name
                      + "` would make its normals agree along the seams",
                  name,
                  Optional.of(patch.patch().facingPlace()),
                  Map.of())
              .weighing(Severity.WARNING));
    }
  }

  private static List<String> names(SurfaceAudit surface, List<Integer> patches) {
    return patches.stream().map(p -> surface.patches().get(p).name()).toList();
  }

  /** Of a mesh whose rims meet, but not vertex by vertex. */
  private void addCracked(WeldSuggestion cracked) {
    Patch patch = cracked.patch().patch();
    add(
        FindingCode.MESH_CRACKED,
        "triangles of `"
            + patch.name()
            + "` meet along cracks, which stand in the error bounds; "
            + cracked.text(),
        patch.name(),
        patch.facingPlace(),
        Map.of("edges", cracked.open(), "weld", cracked.length()));
  }

  private void addOpen(SurfaceAudit surface) {
    Map<String, Object> evidence = new LinkedHashMap<>();
    if (surface.determined()) {
      surface
          .closure()
          .ifPresent(
              c ->
                  evidence.put("closureVector", coordinates(scales.vectorArea(c.closureVector()))));
    }
    List<Gap> gaps = surface.gaps();
    evidence.put("gaps", gaps.size());
    String told =
        gaps.stream()
            .limit(MOST_GAPS_TOLD)
            .map(g -> described(surface, g))
            .collect(Collectors.joining("; "));
    String more =
        gaps.size() > MOST_GAPS_TOLD ? "; and " + (gaps.size() - MOST_GAPS_TOLD) + " more" : "";
    List<WeldSuggestion> cracked = WeldSuggestion.of(surface, scales);
    String welds = "";
    if (!cracked.isEmpty()) {
      evidence.put("weldOn", cracked.stream().map(w -> w.patch().name()).toList());
      evidence.put("weld", cracked.stream().map(WeldSuggestion::length).toList());
      welds =
          cracked.stream()
              .map(WeldSuggestion::text)
              .collect(Collectors.joining("; ", ". Are these cracks? ", ""));
    }
    add(
        FindingCode.SURFACE_OPEN,
        surface.openReason().orElseThrow() + ": " + told + more + nearest(surface) + welds,
        surface.volume().name(),
        surface.volume().place(),
        evidence);
  }

  /** The two rims that most nearly fit, where they are so alike that one may be misplaced. */
  private String nearest(SurfaceAudit surface) {
    List<Gap> all = surface.gaps();
    List<Gap> gaps = all.subList(0, Math.min(all.size(), MOST_GAPS_COMPARED));
    String said = "";
    double least = ALIKE;
    for (int i = 0; i < gaps.size(); i++) {
      for (int j = i + 1; j < gaps.size(); j++) {
        Gap a = gaps.get(i);
        Gap b = gaps.get(j);
        double apart = a.centre().minus(b.centre()).norm();
        double unlike =
            (apart + Math.abs(a.length() - b.length())) / Math.min(a.length(), b.length());
        if (unlike < least && Collections.disjoint(a.patches(), b.patches())) {
          least = unlike;
          said =
              ". The rims of `"
                  + String.join("`, `", names(surface, a.patches()))
                  + "` and `"
                  + String.join("`, `", names(surface, b.patches()))
                  + "` are alike: "
                  + Figures.text(scales.length() * a.length(), scales.lengthUnit())
                  + " and "
                  + Figures.text(scales.length() * b.length(), scales.lengthUnit())
                  + " long, their centres "
                  + Figures.text(scales.length() * apart, scales.lengthUnit())
                  + " apart; should they meet?";
        }
      }
    }
    return said;
  }

  /** A gap's rim: on what, how long, where. */
  private String described(SurfaceAudit surface, Gap gap) {
    List<String> on =
        gap.patches().stream().map(p -> "`" + surface.patches().get(p).name() + "`").toList();
    String rim =
        (gap.whole() ? "a rim of " : "an edge of ")
            + String.join(" and ", on)
            + ", "
            + Figures.text(scales.length() * gap.length(), scales.lengthUnit())
            + " long around "
            + scales.place(gap.centre())
            + ", meets no other patch";
    return gap.lying() == Gap.NONE
        ? rim
        : rim
            + " but lies on the inside of `"
            + surface.patches().get(gap.lying()).name()
            + "`, which wants an opening there (`trim`)";
  }

  /** Nothing is proved of such a surface, so it weighs less than one that is shown to be open. */
  private void addUndetermined(SurfaceAudit surface, String reason) {
    add(
        Finding.of(
                FindingCode.SURFACE_OPEN,
                reason,
                surface.volume().name(),
                Optional.of(surface.volume().place()),
                Map.of())
            .weighing(Severity.WARNING));
  }

  void addInterior(InteriorAudit interior, Volume volume, int digits) {
    interior.terms().get(0).stream()
        .flatMap(term -> term.missing().stream())
        .findFirst()
        .filter(reason -> interior.faults().isEmpty() && !isExplained(volume))
        .ifPresent(
            reason ->
                add(
                    Finding.of(
                            FindingCode.SURFACE_OPEN,
                            reason,
                            volume.name(),
                            Optional.of(volume.place()),
                            Map.of())
                        .weighing(Severity.WARNING)));
    for (InteriorAudit.Fault fault : interior.faults()) {
      if (fault.nonFiniteAt().isPresent()) {
        Vector3 at = fault.nonFiniteAt().get();
        add(
            FindingCode.FIELD_UNDEFINED,
            "`"
                + fault.formula()
                + "` is not finite at "
                + scales.place(at)
                + ", where the interior of `"
                + volume.name()
                + "` is integrated",
            volume.name(),
            volume.place(),
            Map.of("at", coordinates(scales.point(at))));
      } else {
        addAccuracy(
            "the integral of `" + fault.formula() + "` over `" + volume.name() + "`",
            volume.name(),
            volume.place(),
            digits,
            fault.reached());
      }
    }
  }

  /** Whether a finding already says why nothing could be integrated over a volume. */
  private boolean isExplained(Volume volume) {
    return has(FindingCode.SURFACE_OPEN, volume.name())
        || has(FindingCode.VOLUME_UNBOUNDED, volume.name())
        || has(FindingCode.FIELD_SINGULAR, volume.name())
        || findings.stream().anyMatch(f -> f.code() == FindingCode.SURFACE_OVERLAP);
  }

  /** Notes and warnings on one volume's or envelope's balances. */
  void addBalances(BalanceSheet.Drawn drawn, Place place, Map<String, Patch> patches) {
    for (Balance balance : drawn.balances()) {
      BalanceResult result = balance.result();
      for (PatchRate rate : balance.rates()) {
        if (rate.unknown() && balance.subject().signOf(rate) != 0) {
          addUnknown(rate, result, patches.get(rate.patch()).place());
        }
      }
      if (balance.decision().filter(Decision::tooCoarse).isPresent()) {
        addCoarse(result, place);
      }
      if (balance.decision().filter(Decision::throughputZero).isPresent()) {
        add(
            FindingCode.THROUGHPUT_ZERO,
            "nothing flows through `" + result.volume() + "` that could be told from zero",
            result.volume(),
            place,
            Map.of("throughput", result.throughput()));
      }
    }
  }

  private void addUnknown(PatchRate rate, BalanceResult result, Place place) {
    Map<String, Object> evidence = new LinkedHashMap<>();
    result.closedBy().ifPresent(c -> evidence.put("closedBy", c.value()));
    add(
        FindingCode.FLUX_UNKNOWN,
        "the flux through `"
            + rate.patch()
            + "` is not known"
            + result
                .closedBy()
                .map(
                    c ->
                        "; "
                            + Figures.text(c.value(), result.unit())
                            + " would close `"
                            + result.volume()
                            + "`")
                .orElse(""),
        rate.patch(),
        place,
        evidence);
  }

  private void addCoarse(BalanceResult result, Place place) {
    double detectable = result.detectable().orElseThrow();
    Map<String, Object> evidence = new LinkedHashMap<>();
    evidence.put("detectable", detectable);
    evidence.put("throughput", result.throughput());
    add(
        FindingCode.TOO_COARSE_TO_TELL,
        "an imbalance of `"
            + result.volume()
            + "` below "
            + Figures.text(detectable, result.unit())
            + " would go unseen, which is more than a tenth of what flows ("
            + Figures.text(result.throughput(), result.unit())
            + ")",
        result.volume(),
        place,
        evidence);
  }
}
