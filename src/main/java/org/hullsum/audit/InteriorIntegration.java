package org.hullsum.audit;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.hullsum.expression.Derivative;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Printer;
import org.hullsum.expression.Simplifier;
import org.hullsum.expression.Symbols;
import org.hullsum.flux.InputSensitivity;
import org.hullsum.flux.VolumeIntegral;
import org.hullsum.flux.VolumeIntegrator;
import org.hullsum.model.InteriorTerm;
import org.hullsum.quadrature.Integral;

/**
 * Integrates the interiors of volumes at every instant, with the facings found. What does not
 * depend on the time is evaluated once. Thread-safe.
 */
final class InteriorIntegration {
  private static final String STATED = "stated";

  private final InputSensitivity inputs;
  private final VolumeIntegrator integrator;
  private final List<OptionalDouble> instants;
  private final Scales scales;
  private final int digits;

  InteriorIntegration(
      InputSensitivity inputs, List<OptionalDouble> instants, int digits, Scales scales) {
    this.inputs = inputs;
    this.integrator = new VolumeIntegrator(inputs, digits);
    this.instants = List.copyOf(instants);
    this.scales = scales;
    this.digits = digits;
  }

  /**
   * Integrates one volume's interior.
   *
   * @param carriers the fields that give every flux of a conservation check; none otherwise
   * @param noRegion why nothing can be integrated over the volume
   */
  InteriorAudit integrate(
      SurfaceAudit surface, List<FieldUse.Carrier> carriers, Optional<String> noRegion) {
    Set<InteriorAudit.Fault> faults = new LinkedHashSet<>();
    Evaluation evaluation = new Evaluation(surface, noRegion, faults);
    List<List<InteriorRate>> byTerm =
        surface.volume().interior().stream().map(t -> t.accept(evaluation)).toList();
    List<List<InteriorRate>> terms = new ArrayList<>();
    for (int i = 0; i < instants.size(); i++) {
      int instant = i;
      terms.add(byTerm.stream().map(rates -> rates.get(instant)).toList());
    }
    List<InteriorRate> divergence =
        carriers.isEmpty() || noRegion.isPresent()
            ? List.of()
            : evaluation.density(
                "divergence", 1, density(carriers), Optional.of(printed(carriers)));
    return new InteriorAudit(
        surface.volume().name(),
        terms,
        divergence,
        carriers.stream().map(c -> c.field().name()).distinct().toList(),
        List.copyOf(faults));
  }

  static Expression density(List<FieldUse.Carrier> carriers) {
    return carriers.stream()
        .map(c -> times(c, c.field().divergence()))
        .reduce(Expression::plus)
        .orElseThrow();
  }

  private static String printed(List<FieldUse.Carrier> carriers) {
    return Printer.print(
        Simplifier.simplify(
            carriers.stream()
                .map(c -> times(c, c.field().printedDivergence()))
                .reduce(Expression::plus)
                .orElseThrow()));
  }

  private static Expression times(FieldUse.Carrier carrier, Expression divergence) {
    return carrier.times().map(f -> f.times(divergence)).orElse(divergence);
  }

  /** One volume's terms, each at every instant. */
  private final class Evaluation implements InteriorTerm.Visitor<List<InteriorRate>> {
    private final SurfaceAudit surface;
    private final Optional<String> noRegion;
    private final Set<InteriorAudit.Fault> faults;

    Evaluation(SurfaceAudit surface, Optional<String> noRegion, Set<InteriorAudit.Fault> faults) {
      this.surface = surface;
      this.noRegion = noRegion;
      this.faults = faults;
    }

    @Override
    public List<InteriorRate> divergenceOf(InteriorTerm.DivergenceOf term) {
      return density(
          "divergence",
          1,
          term.field().divergence(),
          Optional.of(Printer.print(term.field().printedDivergence())));
    }

    @Override
    public List<InteriorRate> generation(InteriorTerm.Generation term) {
      return stated("generation", 1, term.rate());
    }

    @Override
    public List<InteriorRate> generationPerVolume(InteriorTerm.GenerationPerVolume term) {
      return density("generation", 1, term.density(), Optional.of(Printer.print(term.density())));
    }

    @Override
    public List<InteriorRate> accumulation(InteriorTerm.Accumulation term) {
      return stated("accumulation", -1, term.rate());
    }

    @Override
    public List<InteriorRate> accumulationPerVolume(InteriorTerm.AccumulationPerVolume term) {
      Expression change = Derivative.of(term.density(), InputSensitivity.TIME);
      return density("accumulation", -1, change, Optional.of(Printer.print(change)));
    }

    private List<InteriorRate> stated(String kind, int sign, Expression rate) {
      List<InteriorRate> rates = new ArrayList<>();
      for (OptionalDouble instant : instants) {
        InputSensitivity.Evaluated now = inputs.evaluate(rate, instant);
        Estimate estimate =
            new Estimate(now.value(), 0, now.sensitivities()).times(sign * scales.rate());
        boolean finite = Double.isFinite(now.value());
        rates.add(
            new InteriorRate(
                surface.volume().name(),
                kind,
                finite ? Optional.of(estimate) : Optional.empty(),
                finite ? Math.abs(estimate.value()) : 0,
                true,
                STATED,
                Optional.empty(),
                finite ? Optional.empty() : Optional.of("the stated " + kind + " is not finite")));
      }
      return rates;
    }

    List<InteriorRate> density(
        String kind, int sign, Expression density, Optional<String> formula) {
      boolean steady = !Symbols.in(density).contains(InputSensitivity.TIME);
      List<InteriorRate> rates = new ArrayList<>();
      for (int i = 0; i < instants.size(); i++) {
        if (i > 0 && (steady || noRegion.isPresent())) {
          rates.add(rates.get(0));
        } else if (noRegion.isPresent()) {
          rates.add(missing(kind, formula, noRegion.get()));
        } else {
          VolumeIntegral integral =
              integrator.integrate(
                  surface.boundary(), density, instants.get(i), surface.enough(i, digits));
          rates.add(rate(kind, sign, integral, formula.orElse(kind)));
        }
      }
      return rates;
    }

    private InteriorRate missing(String kind, Optional<String> formula, String reason) {
      return new InteriorRate(
          surface.volume().name(),
          kind,
          Optional.empty(),
          0,
          true,
          VolumeIntegral.Route.CONES.word(),
          formula,
          Optional.of(reason));
    }

    private InteriorRate rate(String kind, int sign, VolumeIntegral integral, String formula) {
      boolean sensible = integral.sensitivities().values().stream().allMatch(Double::isFinite);
      boolean reached = integral.status() == Integral.Status.REACHED;
      if (!reached) {
        double relative =
            integral.magnitude() > 0 ? integral.errorBound() / integral.magnitude() : 1;
        faults.add(new InteriorAudit.Fault(formula, integral.nonFiniteAt(), relative));
      }
      Optional<Estimate> estimate =
          integral
              .value()
              .filter(v -> sensible && Double.isFinite(v))
              .map(v -> new Estimate(v, integral.errorBound(), integral.sensitivities()))
              .map(e -> e.times(sign * scales.rate()));
      return new InteriorRate(
          surface.volume().name(),
          kind,
          estimate,
          scales.rate() * integral.magnitude(),
          reached,
          integral.route().word(),
          Optional.of(formula),
          estimate.isPresent()
              ? Optional.empty()
              : Optional.of(
                  "`"
                      + formula
                      + "` is not finite everywhere inside `"
                      + surface.volume().name()
                      + "`"));
    }
  }
}
