package org.hullsum.audit;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeSet;
import org.hullsum.expression.Derivative;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Printer;
import org.hullsum.expression.Symbols;
import org.hullsum.field.VectorField;
import org.hullsum.flux.BoundaryPatch;
import org.hullsum.flux.FieldJump;
import org.hullsum.flux.InputSensitivity;
import org.hullsum.flux.JumpSearch;
import org.hullsum.flux.PulledBackSurface;
import org.hullsum.flux.SingularityOutcome;
import org.hullsum.flux.SingularitySearch;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.InteriorTerm;
import org.hullsum.model.StatedFlux;

/**
 * Looks for singularities of what flows through each patch and of what is integrated over each
 * volume, and for jumps of the fields inside.
 *
 * <p>What does not depend on the time is looked at once; what does, at the first, the middle and
 * the last instant. Velocity profiles are exempt: their laws are known. Thread-safe.
 */
final class SingularityInspection {
  private final Map<String, Double> values;
  private final SingularitySearch search;
  private final List<OptionalDouble> instants;

  SingularityInspection(Map<String, Double> values, List<OptionalDouble> instants) {
    this.values = values;
    this.search = new SingularitySearch(values);
    int last = instants.size() - 1;
    this.instants = new TreeSet<>(List.of(0, last / 2, last)).stream().map(instants::get).toList();
  }

  SingularityAudit inspect(PatchAudit audit) {
    Map<String, SingularityOutcome> outcomes = new LinkedHashMap<>();
    if (audit.hasArea()) {
      PulledBackSurface surface = audit.surface().orElseThrow();
      for (StatedFlux flux : audit.patch().fluxes()) {
        flux.statement().accept(new OnPatch(surface, outcomes));
      }
    }
    return new SingularityAudit(audit.name(), audit.patch().place(), outcomes, Map.of());
  }

  /**
   * Inspects the inside of a volume that encloses a region.
   *
   * @param fields that give the fluxes through its surface
   */
  SingularityAudit inspect(SurfaceAudit surface, List<VectorField> fields) {
    InRegion region = new InRegion(surface.boundary());
    fields.forEach(region::look);
    surface.volume().interior().forEach(term -> term.accept(region));
    return new SingularityAudit(
        surface.volume().name(), surface.volume().place(), region.outcomes, region.jumps);
  }

  /** One look at an instant. */
  private interface Look {
    SingularityOutcome at(OptionalDouble instant);
  }

  private void look(
      String what, boolean steady, Look look, Map<String, SingularityOutcome> outcomes) {
    for (OptionalDouble instant : steady ? instants.subList(0, 1) : instants) {
      SingularityOutcome outcome = look.at(instant);
      SingularityOutcome before = outcomes.get(what);
      if (before == null || outcome.isFound() || before.isProvedAbsent()) {
        outcomes.put(what, outcome);
      }
      if (outcome.isFound()) {
        return;
      }
    }
  }

  private static boolean isSteady(VectorField field) {
    return isSteady(field.components().x())
        && isSteady(field.components().y())
        && isSteady(field.components().z());
  }

  private static boolean isSteady(Expression formula) {
    return !Symbols.in(formula).contains(InputSensitivity.TIME);
  }

  private static String named(VectorField field) {
    return "field `" + field.name() + "`";
  }

  private final class OnPatch implements FluxStatement.Visitor<Boolean> {
    private final PulledBackSurface surface;
    private final Map<String, SingularityOutcome> outcomes;

    OnPatch(PulledBackSurface surface, Map<String, SingularityOutcome> outcomes) {
      this.surface = surface;
      this.outcomes = outcomes;
    }

    @Override
    public Boolean field(FluxStatement.Field statement) {
      VectorField field = statement.field();
      look(named(field), isSteady(field), t -> search.onSurface(surface, field, t), outcomes);
      return true;
    }

    @Override
    public Boolean density(FluxStatement.Density statement) {
      Expression density = statement.density();
      look(
          "`" + Printer.print(density) + "`",
          isSteady(density),
          t -> search.onSurface(surface, density, t),
          outcomes);
      return true;
    }

    @Override
    public Boolean profile(FluxStatement.Profile statement) {
      return false;
    }

    @Override
    public Boolean traverse(FluxStatement.Traverse statement) {
      return false;
    }

    @Override
    public Boolean metered(FluxStatement.Metered statement) {
      return false;
    }

    @Override
    public Boolean none() {
      return false;
    }

    @Override
    public Boolean unknown() {
      return false;
    }
  }

  private final class InRegion implements InteriorTerm.Visitor<Boolean> {
    private final List<BoundaryPatch> boundary;
    private final Map<String, SingularityOutcome> outcomes = new LinkedHashMap<>();
    private final Map<String, FieldJump> jumps = new LinkedHashMap<>();

    InRegion(List<BoundaryPatch> boundary) {
      this.boundary = boundary;
    }

    void look(VectorField field) {
      String what = named(field);
      if (outcomes.containsKey(what)) {
        return;
      }
      SingularityInspection.this.look(
          what, isSteady(field), t -> search.inRegion(boundary, field, t), outcomes);
      Optional<FieldJump> jump = JumpSearch.find(boundary, field, values, instants.get(0));
      jump.ifPresent(j -> jumps.put(what, j));
    }

    private void look(Expression density) {
      SingularityInspection.this.look(
          "`" + Printer.print(density) + "`",
          isSteady(density),
          t -> search.inRegion(boundary, density, t),
          outcomes);
    }

    @Override
    public Boolean divergenceOf(InteriorTerm.DivergenceOf term) {
      look(term.field());
      return true;
    }

    @Override
    public Boolean generation(InteriorTerm.Generation term) {
      return false;
    }

    @Override
    public Boolean generationPerVolume(InteriorTerm.GenerationPerVolume term) {
      look(term.density());
      return true;
    }

    @Override
    public Boolean accumulation(InteriorTerm.Accumulation term) {
      return false;
    }

    @Override
    public Boolean accumulationPerVolume(InteriorTerm.AccumulationPerVolume term) {
      look(Derivative.of(term.density(), InputSensitivity.TIME));
      return true;
    }
  }
}
