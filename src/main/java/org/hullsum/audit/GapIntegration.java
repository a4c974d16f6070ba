package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Collectors;
import org.hullsum.closure.Gap;
import org.hullsum.expression.Expression;
import org.hullsum.flux.BoundaryPatch;
import org.hullsum.flux.FluxIntegrator;
import org.hullsum.flux.FluxIntegrator.PreparedFlux;
import org.hullsum.flux.InputSensitivity;
import org.hullsum.flux.PatchGeometry;
import org.hullsum.flux.PulledBackSurface;
import org.hullsum.flux.VolumeIntegral;
import org.hullsum.flux.VolumeIntegrator;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.mesh.TriangleMeshBuilder;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.StatedFlux;
import org.hullsum.numeric.Vector3;

/**
 * What would pass through the gaps of an open surface.
 *
 * <p>Over each rim a fan of triangles from its centre is laid. Where the rim is plane it fills the
 * gap.
 */
final class GapIntegration {
  /** What the fans' straight edges may do, of the throughput. */
  private static final double GAP_ERROR = 1e-6;

  private final InputSensitivity inputs;
  private final FluxIntegrator fluxes;
  private final VolumeIntegrator volumes;
  private final List<OptionalDouble> instants;
  private final int digits;
  private final Scales scales;

  GapIntegration(
      InputSensitivity inputs, List<OptionalDouble> instants, int digits, Scales scales) {
    this.inputs = inputs;
    this.fluxes = new FluxIntegrator(inputs, digits);
    this.volumes = new VolumeIntegrator(inputs, digits);
    this.instants = List.copyOf(instants);
    this.digits = digits;
    this.scales = scales;
  }

  /**
   * What would pass through and be made, by the instant, in the rate unit.
   *
   * @param gaps in working units
   * @param between the names of the patches on their rims
   * @param fluxes outward through each, at the first instant
   * @param outward flux through all fans
   * @param divergence of the same fields in the region that the fans close
   */
  record GapAudit(
      List<Gap> gaps,
      List<String> between,
      List<Double> fluxes,
      List<Estimate> outward,
      List<Estimate> divergence) {
    GapAudit {
      gaps = List.copyOf(gaps);
      between = List.copyOf(between);
      fluxes = List.copyOf(fluxes);
      outward = List.copyOf(outward);
      divergence = List.copyOf(divergence);
    }

    /** For the explanation of one balance; the residual then, with the gaps closed by fans. */
    Clues.Gap clue(BalanceSheet.Drawn drawn, int index, Scales scales) {
      Balance balance = drawn.balances().get(index);
      Estimate flux = drawn.at(index, outward);
      Estimate made = drawn.at(index, divergence);
      boolean identity = balance.subject().check() == BalanceResult.Check.IDENTITY;
      Optional<Double> then =
          identity
              ? balance.result().outward().map(o -> o + flux.value() - made.value())
              : balance.residual().map(r -> r.value() + flux.value());
      double slack = flux.error() + (identity ? made.error() : 0);
      double area = scales.area(gaps.stream().mapToDouble(g -> g.vectorArea().norm()).sum());
      String places =
          gaps.stream().map(g -> scales.place(g.centre())).collect(Collectors.joining(" and "));
      return new Clues.Gap(
          (gaps.size() == 1 ? "an opening of " : gaps.size() + " openings, together ")
              + Figures.text(area, scales.areaUnit())
              + ", around "
              + places,
          area,
          between,
          Optional.of(flux.value()),
          then,
          slack + GAP_ERROR * balance.result().throughput());
    }
  }

  /** Empty where there is no hole with a whole rim, no field to pass it, or no finite figure. */
  Optional<GapAudit> integrate(SurfaceAudit audit, List<FieldUse.Carrier> carriers) {
    List<Gap> gaps = audit.gaps();
    boolean whole = gaps.stream().allMatch(g -> g.whole() && g.vectorArea().norm() > 0);
    if (gaps.isEmpty() || !whole || carriers.isEmpty() || audit.signs().isEmpty() || loose(audit)) {
      return Optional.empty();
    }
    List<BoundaryPatch> closed = new ArrayList<>(audit.boundary());
    List<PreparedFlux> prepared = new ArrayList<>();
    for (Gap gap : gaps) {
      PulledBackSurface fan = PulledBackSurface.of(fan(gap));
      closed.add(new BoundaryPatch(fan, PatchGeometry.of(fan, inputs.values(), digits), 1));
      carriers.forEach(c -> prepared.add(fluxes.prepare(Optional.of(fan), stated(c, audit))));
    }
    Expression density = InteriorIntegration.density(carriers);
    List<Double> through = new ArrayList<>();
    List<Estimate> outward = new ArrayList<>();
    List<Estimate> divergence = new ArrayList<>();
    for (int i = 0; i < instants.size(); i++) {
      OptionalDouble instant = instants.get(i);
      List<Estimate> parts = new ArrayList<>();
      for (PreparedFlux flux : prepared) {
        PatchAudit.estimate(flux.at(instant), scales.rate()).ifPresent(parts::add);
      }
      VolumeIntegral inside = volumes.integrate(closed, density, instant, audit.enough(i, digits));
      if (parts.size() < prepared.size() || inside.value().isEmpty()) {
        return Optional.empty();
      }
      for (int k = 0; i == 0 && k < gaps.size(); k++) {
        int first = k * carriers.size();
        through.add(Estimate.sum(parts.subList(first, first + carriers.size())).value());
      }
      outward.add(Estimate.sum(parts));
      divergence.add(
          new Estimate(inside.value().get(), inside.errorBound(), Map.of()).times(scales.rate()));
    }
    List<String> between =
        gaps.stream()
            .flatMap(g -> g.patches().stream())
            .distinct()
            .map(p -> audit.patches().get(p).name())
            .toList();
    return Optional.of(new GapAudit(gaps, between, through, outward, divergence));
  }

  /**
   * Whether a patch on a rim hangs on no other: then the rims are not those of holes but of patches
   * that should have met.
   */
  private static boolean loose(SurfaceAudit audit) {
    return audit.gaps().stream()
        .flatMap(g -> g.patches().stream())
        .anyMatch(
            p -> audit.sewn().seams().seams().stream().noneMatch(s -> s.patches().contains(p)));
  }

  private static StatedFlux stated(FieldUse.Carrier carrier, SurfaceAudit audit) {
    return new StatedFlux(
        new FluxStatement.Field(carrier.field()),
        carrier.times(),
        Optional.empty(),
        audit.volume().place());
  }

  /** The triangles between the centre and the pieces of the outline. */
  private static TriangleMesh fan(Gap gap) {
    TriangleMeshBuilder builder = new TriangleMeshBuilder();
    Vector3 c = gap.centre();
    int centre = builder.vertex(c.x(), c.y(), c.z());
    int[] rim = gap.outline().stream().mapToInt(p -> builder.vertex(p.x(), p.y(), p.z())).toArray();
    for (int k = 0; k < rim.length; k++) {
      builder.triangle(centre, rim[k], rim[(k + 1) % rim.length]);
    }
    return builder.build(1);
  }
}
