package org.hullsum.units;

import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.TDistribution;
import org.hullsum.problem.TextFault;

/**
 * What a figure after ± means: the standard uncertainty is the figure over a divisor (JCGM
 * 100:2008, 4.3 and annex G).
 */
public sealed interface UncertaintyMeaning {

  /**
   * The divisor that turns the figure into a standard uncertainty.
   *
   * @param degreesOfFreedom of the figure, at least 1, infinite where none are stated
   */
  double divisor(double degreesOfFreedom);

  /**
   * A multiple k of the standard uncertainty: {@code (k=2)}.
   *
   * @param factor positive
   */
  record CoverageFactor(double factor) implements UncertaintyMeaning {
    public CoverageFactor {
      if (!(factor > 0) || Double.isInfinite(factor)) {
        throw new IllegalArgumentException("coverage factor " + factor);
      }
    }

    @Override
    public double divisor(double degreesOfFreedom) {
      return factor;
    }
  }

  /**
   * The half-width of a symmetric interval of a probability, {@code (95 %)}: of the normal
   * distribution, or of Student's with finite degrees of freedom.
   *
   * @param probability between 0 and 1, exclusive
   */
  record CoverageProbability(double probability) implements UncertaintyMeaning {
    public CoverageProbability {
      if (!(probability > 0 && probability < 1)) {
        throw new IllegalArgumentException("coverage probability " + probability);
      }
    }

    @Override
    public double divisor(double degreesOfFreedom) {
      double tail = (1 - probability) / 2;
      return Double.isInfinite(degreesOfFreedom)
          ? NormalDistribution.of(0, 1).inverseSurvivalProbability(tail)
          : TDistribution.of(degreesOfFreedom).inverseSurvivalProbability(tail);
    }
  }

  /** The half-width of limits between which every value is as likely: {@code (limits)}. */
  record Rectangular() implements UncertaintyMeaning {
    @Override
    public double divisor(double degreesOfFreedom) {
      return Math.sqrt(3);
    }
  }

  /** The half-width of limits with values near the middle likelier: {@code (triangular)}. */
  record Triangular() implements UncertaintyMeaning {
    @Override
    public double divisor(double degreesOfFreedom) {
      return Math.sqrt(6);
    }
  }

  /**
   * Reads {@code k=2}, {@code 95 %}, {@code limits} or {@code rectangular}, {@code triangular}: a
   * meaning without degrees of freedom, which belong to single figures.
   */
  static UncertaintyMeaning parse(String text) throws TextFault {
    return UncertaintyMeaningReader.meaningAlone(text);
  }
}
