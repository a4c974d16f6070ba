package org.hullsum.quadrature;

/**
 * Turns a tensor sample of a region into values with error bounds.
 *
 * <p>Two estimates are made and the larger is taken: what the decay of the coefficients in either
 * direction leaves open, and the difference from the rule applied before, reduced by half the
 * digits that the decay promises between the two rules. Before a second rule has spoken, the error
 * is the size of the top coefficients themselves.
 */
final class RegionAssessment {
  private static final double DIFFERENCE_SAFETY = 2;
  private static final double UNCHECKED_SAFETY = 2;

  /** No first look is better than this part of the magnitude, however well it looks. */
  private static final double UNCHECKED_FLOOR = 1e-3;

  /** A difference of two rules is never reduced by more than this. */
  private static final double LARGEST_REDUCTION = 1e-4;

  /** Error of Σ w|f| where f changes sign, as part of the smaller of its two parts. */
  private static final double COARSE_MAGNITUDE = 0.1;

  private static final int SMALLEST_RESAMPLING = 32;
  private static final int LARGEST_RESAMPLING = 128;

  private final TensorSample sample;
  private final double magnitudeRelative;
  private double[][] rows = new double[0][];

  RegionAssessment(TensorSample sample, double magnitudeRelative) {
    this.sample = sample;
    this.magnitudeRelative = magnitudeRelative;
  }

  /**
   * Enters the sample just taken into its region.
   *
   * @param total magnitudes over the whole domain so far, to tell what matters
   */
  void enter(Region region, DirectionRule ruleX, DirectionRule ruleY, double[] total) {
    boolean checked = region.looks > 0;
    for (int c = 0; c < region.value.length; c++) {
      double reduction = checked ? reduction(region, c, ruleX, ruleY) : 1;
      double difference = Math.abs(sample.value[c] - region.value[c]);
      region.value[c] = sample.value[c];
      region.magnitude[c] = sample.magnitude[c];
      region.topX[c] = sample.topX[c];
      region.middleX[c] = sample.middleX[c];
      region.topY[c] = sample.topY[c];
      region.middleY[c] = sample.middleY[c];
      double open =
          Decay.error(ruleX, sample.topX[c], newRatioX(c, ruleX), sample.magnitude[c])
              + Decay.error(ruleY, sample.topY[c], newRatioY(c, ruleY), sample.magnitude[c])
              + region.cell.rounding() * sample.magnitude[c];
      if (checked) {
        region.error[c] = Math.max(open, DIFFERENCE_SAFETY * reduction * difference);
      } else {
        double tops = UNCHECKED_SAFETY * (sample.topX[c] + sample.topY[c]);
        region.error[c] = Math.max(Math.max(open, tops), UNCHECKED_FLOOR * sample.magnitude[c]);
      }
      magnitude(region, c, ruleX, ruleY, total[c]);
    }
    region.ruleX = ruleX;
    region.ruleY = ruleY;
    region.looks++;
  }

  private double newRatioX(int c, DirectionRule rule) {
    return Decay.ratio(rule, sample.topX[c], sample.middleX[c], sample.magnitude[c]);
  }

  private double newRatioY(int c, DirectionRule rule) {
    return Decay.ratio(rule, sample.topY[c], sample.middleY[c], sample.magnitude[c]);
  }

  /** How much of the difference from the previous rule can still be in the new one. */
  private double reduction(Region region, int c, DirectionRule ruleX, DirectionRule ruleY) {
    double reduction = 0;
    if (!Decay.resolved(region.topX[c], region.magnitude[c])) {
      double ratio = Math.max(region.ratioX(c), newRatioX(c, ruleX));
      reduction = Math.pow(ratio, Math.max(0, ruleX.reach() - region.ruleX.reach()));
    }
    if (!Decay.resolved(region.topY[c], region.magnitude[c])) {
      double ratio = Math.max(region.ratioY(c), newRatioY(c, ruleY));
      double other = Math.pow(ratio, Math.max(0, ruleY.reach() - region.ruleY.reach()));
      reduction = Math.max(reduction, other);
    }
    return reduction == 0 ? 1 : Math.max(LARGEST_REDUCTION, reduction);
  }

  private void magnitude(
      Region region, int c, DirectionRule ruleX, DirectionRule ruleY, double total) {
    double opposite = sample.opposite[c];
    region.magnitudeError[c] = COARSE_MAGNITUDE * opposite;
    double negligible = 0.1 * magnitudeRelative * Math.max(total, sample.magnitude[c]);
    boolean smooth =
        Math.max(sample.topX[c], sample.topY[c]) <= magnitudeRelative * sample.magnitude[c];
    if (region.magnitudeError[c] > negligible && smooth && region.looks > 0) {
      resample(region, c, ruleX, ruleY);
    }
  }

  /**
   * The magnitude from the interpolant on a finer grid, without new evaluations: where f changes
   * sign, |f| kinks and needs more points than f does. Its error is judged by the two halves of the
   * grid, taken like the colours of a chessboard.
   */
  private void resample(Region region, int c, DirectionRule ruleX, DirectionRule ruleY) {
    double[][] toX = ruleX.resampling(resamplingSize(ruleX));
    double[][] toY = ruleY.resampling(resamplingSize(ruleY));
    int nx = ruleX.size();
    int ny = ruleY.size();
    double[] f = sample.values()[c];
    if (rows.length < nx || rows[0].length < toY.length) {
      rows = new double[Math.max(nx, rows.length)][toY.length];
    }
    for (int i = 0; i < nx; i++) {
      for (int m = 0; m < toY.length; m++) {
        double sum = 0;
        for (int j = 0; j < ny; j++) {
          sum += toY[m][j] * f[i * ny + j];
        }
        rows[i][m] = sum;
      }
    }
    double white = 0;
    double black = 0;
    for (int l = 0; l < toX.length; l++) {
      for (int m = 0; m < toY.length; m++) {
        double sum = 0;
        for (int i = 0; i < nx; i++) {
          sum += toX[l][i] * rows[i][m];
        }
        if (((l + m) & 1) == 0) {
          white += Math.abs(sum);
        } else {
          black += Math.abs(sum);
        }
      }
    }
    double scale =
        (region.toX - region.fromX)
            * (region.toY - region.fromY)
            / ((double) toX.length * toY.length);
    region.magnitude[c] = scale * (white + black);
    region.magnitudeError[c] = scale * Math.abs(white - black);
  }

  private static int resamplingSize(DirectionRule rule) {
    int size = Math.max(SMALLEST_RESAMPLING, 3 * rule.size());
    return Math.min(LARGEST_RESAMPLING, size + (size & 1));
  }
}
