package org.hullsum.audit;

import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.Optional;

/**
 * One balance: of a volume or an envelope, at an instant, over an interval, or timeless. Rates are
 * in {@code unit}; over an interval they are means.
 *
 * @param volume name of the volume or envelope
 * @param label a name for people
 * @param envelope whether it is an envelope
 * @param quantity what is conserved
 * @param unit the rate unit
 * @param at the instant in seconds
 * @param over begin and end of the interval in seconds
 * @param check which of the two checks this is
 * @param lines the patches that make up the outward sum, in the order of the case; for an envelope
 *     the patches of its outer surface
 * @param outward the sum of the outward fluxes; empty where a flux is unknown
 * @param interior what is made less what is kept; empty where it could not be computed
 * @param residual outward − interior
 * @param terms of the interior
 * @param throughput the measure of what flows, to 1 %
 * @param rule by which the verdict was reached
 * @param tolerance the tolerance in rate units, for the rule {@code tolerance}
 * @param numericalError a bound on the residual's numerical error
 * @param standardUncertainty of the residual, from the measured figures
 * @param coverageFactor k
 * @param detectable the smallest imbalance that this balance would have detected
 * @param probabilityWrong the probability that the verdict is wrong
 * @param budget which source contributes how much of the variance, largest first
 * @param closedBy the value of the one unknown flux that would close the balance, from leaves to
 *     enters, with the patch's name
 * @param divergence the volume integral of the fields' divergence, computed beside a conservation
 *     check
 * @param verdict what follows
 * @param reason why, in one sentence
 */
public record BalanceResult(
    String volume,
    Optional<String> label,
    boolean envelope,
    String quantity,
    String unit,
    Optional<Double> at,
    Optional<Interval> over,
    Check check,
    List<Line> lines,
    Optional<Double> outward,
    Optional<Double> interior,
    Optional<Double> residual,
    List<Term> terms,
    double throughput,
    Rule rule,
    Optional<Double> tolerance,
    Optional<Double> numericalError,
    double standardUncertainty,
    double coverageFactor,
    Optional<Double> detectable,
    Optional<Double> probabilityWrong,
    List<Contribution> budget,
    Optional<Closing> closedBy,
    Optional<Term> divergence,
    Verdict verdict,
    String reason) {

  /** Identity: against the field's own divergence. Conservation: against what is made and kept. */
  public enum Check {
    IDENTITY,
    CONSERVATION;

    /** The word of the result document. */
    public String word() {
      return name().toLowerCase(Locale.ROOT);
    }
  }

  /** The decision rules. */
  public enum Rule {
    TOLERANCE,
    UNCERTAINTY;

    /** The word of the result document. */
    public String word() {
      return name().toLowerCase(Locale.ROOT);
    }
  }

  /** Begin and end, in seconds. */
  public record Interval(double begin, double end) {}

  /**
   * One patch in the outward sum.
   *
   * @param patch its name
   * @param sign +1 where it leaves, −1 where it enters
   * @param outward its flux counted outward; empty where unknown
   * @param numericalError a bound
   * @param standardUncertainty from the measured figures
   */
  public record Line(
      String patch,
      int sign,
      Optional<Double> outward,
      double numericalError,
      double standardUncertainty) {}

  /**
   * One interior term, with the sign in which it enters the interior.
   *
   * @param kind such as {@code divergence}, {@code generation}, {@code accumulation}
   * @param value empty where it could not be computed
   * @param numericalError a bound
   * @param standardUncertainty from the measured figures
   * @param route how a volume integral was computed: {@code cones}, {@code columns}, or {@code
   *     stated}
   * @param formula what was integrated, for people
   */
  public record Term(
      String kind,
      Optional<Double> value,
      Optional<Double> numericalError,
      double standardUncertainty,
      String route,
      Optional<String> formula) {}

  /**
   * One source of uncertainty.
   *
   * @param source name of the input
   * @param contribution standard uncertainty of the residual from this source, in rate units
   * @param share of the variance, 0 to 1
   */
  public record Contribution(String source, double contribution, double share) {}

  /** The flux through an otherwise unknown patch that would close the balance. */
  public record Closing(String patch, double value) {}

  public BalanceResult {
    Objects.requireNonNull(volume, "volume");
    Objects.requireNonNull(unit, "unit");
    Objects.requireNonNull(check, "check");
    Objects.requireNonNull(rule, "rule");
    Objects.requireNonNull(verdict, "verdict");
    Objects.requireNonNull(reason, "reason");
    lines = List.copyOf(lines);
    terms = List.copyOf(terms);
    budget = List.copyOf(budget);
  }

  /**
   * What separates a residual from zero or from a tolerance: w = numericalError + coverageFactor ·
   * standardUncertainty; empty where no error bound is known.
   */
  public Optional<Double> margin() {
    return numericalError.map(e -> e + coverageFactor * standardUncertainty);
  }
}
