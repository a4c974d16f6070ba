package org.hullsum.audit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Symbols;
import org.hullsum.flux.InputSensitivity;
import org.hullsum.model.Case;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.Input;
import org.hullsum.model.InteriorTerm;
import org.hullsum.model.Patch;
import org.hullsum.model.StatedFlux;
import org.hullsum.units.ConfusableUnits;
import org.hullsum.units.Dimension;
import org.hullsum.units.Unit;

/**
 * What may be wrong with the figures of each patch: the unit taken for another, a radius for a
 * diameter, a density left out.
 */
final class PatchCauses {
  /** Water, in kg/m3: what a mass meter shows that was set for it. */
  private static final double WATER = 1000;

  private static final Dimension VOLUME_RATE =
      Dimension.LENGTH.times(Dimension.LENGTH).times(Dimension.LENGTH).dividedBy(Dimension.TIME);

  private static final Dimension DENSITY =
      Dimension.MASS.dividedBy(Dimension.LENGTH.times(Dimension.LENGTH).times(Dimension.LENGTH));

  private final Case audited;
  private final InputSensitivity inputs;
  private final Set<Double> densities;

  /** Whether what flows may be a gas: where nothing is kept that has a level. */
  private final boolean gas;

  PatchCauses(Case audited, InputSensitivity inputs) {
    this.audited = audited;
    this.inputs = inputs;
    this.densities = densities(audited, inputs);
    this.gas =
        audited.volumes().stream()
            .flatMap(v -> v.interior().stream())
            .noneMatch(InteriorTerm.Accumulation.class::isInstance);
  }

  /** The causes by patch; those without any are left out. */
  Map<String, List<PatchCause>> all() {
    Map<String, List<PatchCause>> all = new LinkedHashMap<>();
    for (Patch patch : audited.patches()) {
      if (patch.surface().isEmpty() && patch.fluxes().size() == 1) {
        List<PatchCause> causes = causes(patch.name(), patch.fluxes().get(0));
        if (!causes.isEmpty()) {
          all.put(patch.name(), causes);
        }
      }
    }
    return all;
  }

  private List<PatchCause> causes(String patch, StatedFlux flux) {
    List<PatchCause> causes = new ArrayList<>();
    if (flux.statement() instanceof FluxStatement.Metered metered) {
      Expression rate = metered.rate();
      statedUnit(rate).ifPresent(unit -> unitSlips(patch, unit, causes));
      radii(patch, rate, causes);
      if (flux.times().isEmpty()) {
        densitiesLeftOut(patch, causes);
      }
    }
    return causes;
  }

  private Optional<Unit> statedUnit(Expression rate) {
    Set<String> symbols = Symbols.in(rate);
    return symbols.size() == 1 && rate.equals(Expression.symbol(symbols.iterator().next()))
        ? Optional.ofNullable(audited.inputs().all().get(symbols.iterator().next()))
            .flatMap(Input::unit)
        : Optional.empty();
  }

  private void unitSlips(String patch, Unit unit, List<PatchCause> causes) {
    List<ConfusableUnits.Confusion> confusions = new ArrayList<>(ConfusableUnits.of(unit));
    if (gas && unit.dimension().equals(VOLUME_RATE)) {
      confusions.addAll(ConfusableUnits.ofGasVolumes());
    }
    for (ConfusableUnits.Confusion confusion : confusions) {
      causes.add(
          new PatchCause(
              Explanation.Kind.UNIT_SLIP,
              confusion.factor(),
              "the figure of `"
                  + patch
                  + "`, stated in "
                  + unit.code()
                  + ", is in "
                  + confusion.meant(),
              "look up the unit that is set in its transmitter and on its sheet"));
    }
  }

  /** A rate that goes with the square of a length: of a radius that is taken for a diameter. */
  private void radii(String patch, Expression rate, List<PatchCause> causes) {
    if (Symbols.in(rate).contains(InputSensitivity.TIME)) {
      return;
    }
    for (String name : inputs.figuresIn(rate)) {
      Input input = audited.inputs().all().get(name);
      if (input.unit().filter(u -> u.dimension().equals(Dimension.LENGTH)).isEmpty()) {
        continue;
      }
      double stated = inputs.valueWith(rate, name, input.value());
      for (double times : new double[] {2, 0.5}) {
        double factor = inputs.valueWith(rate, name, times * input.value()) / stated;
        if (Double.isFinite(factor) && factor > 0 && factor != 1) {
          causes.add(
              new PatchCause(
                  Explanation.Kind.RADIUS_FOR_DIAMETER,
                  factor,
                  "`"
                      + name
                      + "` of `"
                      + patch
                      + (times > 1
                          ? "` is a radius where a diameter belongs"
                          : "` is a diameter where a radius belongs"),
                  "measure the bore"));
        }
      }
    }
  }

  /** The densities by which other patches are multiplied, in kg/m3. */
  private static Set<Double> densities(Case audited, InputSensitivity inputs) {
    Set<Double> found = new LinkedHashSet<>();
    for (Patch patch : audited.patches()) {
      for (StatedFlux flux : patch.fluxes()) {
        for (String name : flux.times().map(inputs::figuresIn).orElse(Set.of())) {
          Input input = audited.inputs().all().get(name);
          if (input.unit().filter(u -> u.dimension().equals(DENSITY)).isPresent()) {
            found.add(audited.working().toSi(input.value(), DENSITY));
          }
        }
      }
    }
    found.remove(WATER);
    return found;
  }

  private void densitiesLeftOut(String patch, List<PatchCause> causes) {
    for (double density : densities) {
      causes.add(
          new PatchCause(
              Explanation.Kind.DENSITY_LEFT_OUT,
              density / WATER,
              "`"
                  + patch
                  + "` shows mass as if of water, with the density of "
                  + Figures.text(density, "kg/m3")
                  + " left out",
              "look up the density that is set in its transmitter"));
    }
  }
}
