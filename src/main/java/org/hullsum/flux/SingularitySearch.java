package org.hullsum.flux;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.OptionalDouble;
import org.hullsum.expression.Expression;
import org.hullsum.field.VectorField;
import org.hullsum.numeric.Box3;

/**
 * Looks for places on patches and in regions at which a field or a density is undefined or grows
 * without bound.
 *
 * <p>Sampling can't find them, and the divergence does not show them (that of r/r³ is zero). So the
 * denominators and the arguments of roots, logarithms, fractional powers, asin, acos and tan are
 * enclosed over boxes that cover the patch or the region; boxes outside the region are left out. A
 * field is judged by its native components: what cylindrical and spherical coordinates do on their
 * axis is no singularity of the field. Work-bounded.
 *
 * <p>Immutable and thread-safe.
 */
public final class SingularitySearch {
  private final Map<String, Double> values;

  /**
   * @param values of every input
   */
  public SingularitySearch(Map<String, Double> values) {
    this.values = Map.copyOf(Objects.requireNonNull(values, "values"));
  }

  /** A field in the region that a boundary encloses, the boundary included. */
  public SingularityOutcome inRegion(
      List<BoundaryPatch> boundary, VectorField field, OptionalDouble instant) {
    return inRegion(boundary, HazardCheck.of(field, values, instant));
  }

  /** A density in the region that a boundary encloses, the boundary included. */
  public SingularityOutcome inRegion(
      List<BoundaryPatch> boundary, Expression density, OptionalDouble instant) {
    return inRegion(boundary, HazardCheck.of(density, values, instant));
  }

  private SingularityOutcome inRegion(List<BoundaryPatch> boundary, HazardCheck check) {
    return check.none()
        ? new SingularityOutcome.ProvedAbsent()
        : new HazardSearch(new RegionDomain(boundary, values), check).run();
  }

  /** A field on a patch. */
  public SingularityOutcome onSurface(
      PulledBackSurface surface, VectorField field, OptionalDouble instant) {
    return onSurface(surface, HazardCheck.of(field, values, instant));
  }

  /** A flux density on a patch. */
  public SingularityOutcome onSurface(
      PulledBackSurface surface, Expression density, OptionalDouble instant) {
    return onSurface(surface, HazardCheck.of(density, values, instant));
  }

  private SingularityOutcome onSurface(PulledBackSurface surface, HazardCheck check) {
    SingularityOutcome result = new SingularityOutcome.ProvedAbsent();
    if (check.none()) {
      return result;
    }
    if (surface.mesh().isPresent()) {
      // The box around the triangles holds more than them, so only absence can be shown.
      Box3 box = MeshSums.box(surface.mesh().get());
      SingularityOutcome around = new HazardSearch(new BoxDomain(box), check).run();
      return around.isProvedAbsent()
          ? around
          : new SingularityOutcome.NotExcluded(box.centre(), "a part of it is zero");
    }
    for (PulledBackChart chart : surface.charts()) {
      SingularityOutcome outcome = new HazardSearch(new ChartDomain(chart, values), check).run();
      if (outcome.isFound()) {
        return outcome;
      }
      result = outcome.isProvedAbsent() ? result : outcome;
    }
    return result;
  }
}
