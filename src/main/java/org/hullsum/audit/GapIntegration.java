package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.closure.MomentClosure;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.flux.BoundaryPatch;
import org.hullsum.flux.FluxIntegrator;
import org.hullsum.flux.FluxIntegrator.PreparedFlux;
import org.hullsum.flux.InputSensitivity;
import org.hullsum.flux.PatchGeometry;
import org.hullsum.flux.PulledBackSurface;
import org.hullsum.flux.VolumeIntegral;
import org.hullsum.flux.VolumeIntegrator;
import org.hullsum.geometry.DiskShape;
import org.hullsum.geometry.Surface;
import org.hullsum.geometry.SurfaceFault;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.StatedFlux;
import org.hullsum.problem.InternalFault;

/**
 * What would pass through the plane gap that the moments of an open surface give.
 *
 * <p>The moments give the gap's vector area and centre, not its outline. It is taken for a disk of
 * that area, which is exact for a field that is linear over the gap whatever the outline.
 */
final class GapIntegration {
  /** What the gap's unknown outline and the error of its moments may do, of the throughput. */
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
   * @param gap in working units
   * @param outward flux through the disk
   * @param divergence of the same fields in the region that the disk closes
   */
  record GapAudit(MomentClosure.PlaneGap gap, List<Estimate> outward, List<Estimate> divergence) {
    GapAudit {
      outward = List.copyOf(outward);
      divergence = List.copyOf(divergence);
    }

    /** For the explanation of one balance; the residual then, with the gap closed by the disk. */
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
      double area = scales.area(gap.vectorArea().norm());
      return new Clues.Gap(
          Figures.text(area, scales.areaUnit()) + " around " + scales.place(gap.centre()),
          area,
          List.of(),
          Optional.of(flux.value()),
          then,
          slack + GAP_ERROR * balance.result().throughput());
    }
  }

  /** Empty where there is no single plane gap, no field to pass it, or no finite figure. */
  Optional<GapAudit> integrate(SurfaceAudit audit, List<FieldUse.Carrier> carriers) {
    if (audit.gap().isEmpty() || carriers.isEmpty()) {
      return Optional.empty();
    }
    MomentClosure.PlaneGap gap = audit.gap().get();
    PulledBackSurface disk = PulledBackSurface.of(disk(gap));
    List<BoundaryPatch> closed = new ArrayList<>(audit.boundary());
    closed.add(new BoundaryPatch(disk, PatchGeometry.of(disk, inputs.values(), digits), 1));
    Expression density = InteriorIntegration.density(carriers);
    List<PreparedFlux> prepared =
        carriers.stream().map(c -> fluxes.prepare(Optional.of(disk), stated(c, audit))).toList();
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
      outward.add(Estimate.sum(parts));
      divergence.add(
          new Estimate(inside.value().get(), inside.errorBound(), Map.of()).times(scales.rate()));
    }
    return Optional.of(new GapAudit(gap, outward, divergence));
  }

  private static StatedFlux stated(FieldUse.Carrier carrier, SurfaceAudit audit) {
    return new StatedFlux(
        new FluxStatement.Field(carrier.field()),
        carrier.times(),
        Optional.empty(),
        audit.volume().place());
  }

  private static Surface disk(MomentClosure.PlaneGap gap) {
    DiskShape shape =
        new DiskShape(
            VectorExpression.of(gap.centre()),
            gap.vectorArea(),
            Expression.number(Math.sqrt(gap.vectorArea().norm() / Math.PI)),
            Optional.empty(),
            Optional.empty(),
            Optional.empty());
    try {
      return shape.surface(Map.of());
    } catch (SurfaceFault e) {
      throw new InternalFault("a gap is no disk: " + e.getMessage());
    }
  }
}
