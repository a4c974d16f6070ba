package org.hullsum.audit;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.field.VectorField;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.InteriorTerm;
import org.hullsum.model.Patch;
import org.hullsum.model.StatedFlux;
import org.hullsum.model.Volume;

/**
 * Which fields give the fluxes through the surface of a volume: the same on every patch, but for
 * impermeable ones, or none.
 */
final class FieldUse {
  private FieldUse() {}

  /**
   * A field times a factor.
   *
   * @param field the field
   * @param times the factor of the statement
   */
  record Carrier(VectorField field, Optional<Expression> times) {}

  /**
   * The fields, each patch having exactly these; empty where a patch's flux is something else, or
   * nothing flows by a field.
   */
  static List<Carrier> common(Volume volume, List<Patch> patches) {
    Optional<List<Carrier>> common = Optional.empty();
    for (Patch patch : patches) {
      if (patch.isBaffle() || !touches(patch, volume)) {
        continue;
      }
      List<Carrier> carriers = new ArrayList<>();
      for (StatedFlux flux : patch.fluxes()) {
        Optional<List<VectorField>> fields = flux.statement().accept(new FieldsOf());
        if (fields.isEmpty()) {
          return List.of();
        }
        fields.get().forEach(f -> carriers.add(new Carrier(f, flux.times())));
      }
      if (carriers.isEmpty()) {
        continue;
      }
      if (common.isPresent() && !common.get().equals(carriers)) {
        return List.of();
      }
      common = Optional.of(List.copyOf(carriers));
    }
    return common.orElse(List.of());
  }

  /** The fields that would pass through a gap: the common ones, or the only one that occurs. */
  static List<Carrier> likely(Volume volume, List<Patch> patches) {
    List<Carrier> common = common(volume, patches);
    if (!common.isEmpty()) {
      return common;
    }
    Set<Carrier> all = new LinkedHashSet<>();
    for (Patch patch : patches) {
      for (StatedFlux flux : touches(patch, volume) ? patch.fluxes() : List.<StatedFlux>of()) {
        flux.statement()
            .accept(new FieldsOf())
            .orElse(List.of())
            .forEach(f -> all.add(new Carrier(f, flux.times())));
      }
    }
    return all.size() == 1 ? List.copyOf(all) : List.of();
  }

  /** Whether the balance of a volume is the identity check of its interior's field. */
  static boolean isIdentity(Volume volume, List<Patch> patches) {
    if (volume.interior().size() != 1) {
      return false;
    }
    Optional<VectorField> interior = volume.interior().get(0).accept(new DivergenceField());
    List<Carrier> carriers = common(volume, patches);
    return interior.isPresent()
        && carriers.size() == 1
        && carriers.get(0).times().isEmpty()
        && carriers.get(0).field().equals(interior.get());
  }

  private static boolean touches(Patch patch, Volume volume) {
    return patch.leaves().equals(volume.name()) || patch.enters().equals(volume.name());
  }

  /** The field of a statement, nothing for an impermeable patch; empty for any other flux. */
  private static final class FieldsOf
      implements FluxStatement.Visitor<Optional<List<VectorField>>> {
    @Override
    public Optional<List<VectorField>> field(FluxStatement.Field statement) {
      return Optional.of(List.of(statement.field()));
    }

    @Override
    public Optional<List<VectorField>> density(FluxStatement.Density statement) {
      return Optional.empty();
    }

    @Override
    public Optional<List<VectorField>> traverse(FluxStatement.Traverse statement) {
      return Optional.empty();
    }

    @Override
    public Optional<List<VectorField>> metered(FluxStatement.Metered statement) {
      return Optional.empty();
    }

    @Override
    public Optional<List<VectorField>> profile(FluxStatement.Profile statement) {
      return Optional.empty();
    }

    @Override
    public Optional<List<VectorField>> none() {
      return Optional.of(List.of());
    }

    @Override
    public Optional<List<VectorField>> unknown() {
      return Optional.empty();
    }
  }

  private static final class DivergenceField
      implements InteriorTerm.Visitor<Optional<VectorField>> {
    @Override
    public Optional<VectorField> divergenceOf(InteriorTerm.DivergenceOf term) {
      return Optional.of(term.field());
    }

    @Override
    public Optional<VectorField> generation(InteriorTerm.Generation term) {
      return Optional.empty();
    }

    @Override
    public Optional<VectorField> generationPerVolume(InteriorTerm.GenerationPerVolume term) {
      return Optional.empty();
    }

    @Override
    public Optional<VectorField> accumulation(InteriorTerm.Accumulation term) {
      return Optional.empty();
    }

    @Override
    public Optional<VectorField> accumulationPerVolume(InteriorTerm.AccumulationPerVolume term) {
      return Optional.empty();
    }
  }
}
