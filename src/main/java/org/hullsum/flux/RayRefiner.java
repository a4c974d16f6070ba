package org.hullsum.flux;

import java.util.Arrays;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.GaussRule;

/**
 * One ray at a time: ∫_0^1 g(p + s(r − p)) s^k ds, split where a density switches and halved where
 * two Gauss rules disagree.
 *
 * <p>The worst piece is halved until the sum of the differences is within the tolerance or the
 * number of pieces, of the ray or of all rays, reaches its bound; that sum is the error that is
 * reported. Not thread-safe.
 */
final class RayRefiner {
  private static final GaussRule SMALL = GaussRule.of(8);
  private static final GaussRule LARGE = GaussRule.of(12);
  private static final int NODES = SMALL.size() + LARGE.size();

  /** Most pieces of one ray. */
  private static final int MOST_PIECES = 96;

  /** Most pieces of all rays together; after that no ray is halved any more. */
  private static final long MOST_WORK = 200_000;

  /** Points at which the signs of the switch functions are looked at. */
  private static final int WATCHED = 33;

  /** Halvings of a bracket: beyond the digits of a double nothing is gained. */
  private static final int HALVINGS = 52;

  private final Densities densities;
  private final int power;
  private final double tolerance;
  private final double[][] at = new double[3][Math.max(WATCHED, NODES)];
  private final double[][] values;
  private final double[][] switchValues;
  private final double[] lows = new double[MOST_PIECES];
  private final double[] highs = new double[MOST_PIECES];
  private final double[] error = new double[MOST_PIECES];
  private final double[][] results;
  private Vector3 start = Vector3.ZERO;
  private Vector3 span = Vector3.ZERO;
  private int pieces;
  private long work;

  RayRefiner(Densities densities, int power, double tolerance) {
    this.densities = densities;
    this.power = power;
    this.tolerance = tolerance;
    this.values = new double[densities.count()][at[0].length];
    this.switchValues = new double[densities.switchCount()][at[0].length];
    this.results = new double[MOST_PIECES][RayIntegrals.rows(densities.count())];
  }

  /** Integrates along the ray from p to r, into column {@code ray} of the rows. */
  void refine(Vector3 from, Vector3 end, int ray, double[][] rows) {
    start = from;
    span = end.minus(from);
    split();
    for (int piece = 0; piece < pieces; piece++) {
      integrate(piece);
    }
    while (pieces < MOST_PIECES && work < MOST_WORK && !(totalError() <= tolerance)) {
      int worst = worst();
      double middle = 0.5 * (lows[worst] + highs[worst]);
      lows[pieces] = middle;
      highs[pieces] = highs[worst];
      highs[worst] = middle;
      integrate(worst);
      integrate(pieces++);
    }
    for (int k = 0; k < rows.length; k++) {
      double sum = 0;
      for (int piece = 0; piece < pieces; piece++) {
        sum += results[piece][k];
      }
      rows[k][ray] = sum;
    }
  }

  private double totalError() {
    double sum = 0;
    for (int piece = 0; piece < pieces; piece++) {
      sum += error[piece];
    }
    return sum;
  }

  private int worst() {
    int worst = 0;
    for (int piece = 1; piece < pieces; piece++) {
      if (!(error[piece] <= error[worst])) {
        worst = piece;
      }
    }
    return worst;
  }

  /** Pieces between the places where a switch function changes sign. */
  private void split() {
    double[] breaks = new double[MOST_PIECES / 2];
    int count = 0;
    breaks[count++] = 0;
    if (switchValues.length > 0) {
      double[] s = new double[WATCHED];
      for (int i = 0; i < WATCHED; i++) {
        s[i] = i / (WATCHED - 1.0);
      }
      place(WATCHED, s);
      densities.evaluateSwitches(WATCHED, at[0], at[1], at[2], switchValues);
      for (int k = 0; k < switchValues.length; k++) {
        double[] function = switchValues[k].clone();
        for (int i = 1; i < WATCHED && count < breaks.length; i++) {
          if (function[i - 1] * function[i] < 0) {
            breaks[count++] = root(k, s[i - 1], s[i], function[i - 1] < 0);
          }
        }
      }
    }
    Arrays.sort(breaks, 0, count);
    pieces = 0;
    for (int i = 0; i < count; i++) {
      double next = i + 1 < count ? breaks[i + 1] : 1;
      if (next > breaks[i]) {
        lows[pieces] = breaks[i];
        highs[pieces++] = next;
      }
    }
  }

  private double root(int function, double low, double high, boolean rising) {
    double a = low;
    double b = high;
    double[] s = new double[1];
    for (int step = 0; step < HALVINGS; step++) {
      s[0] = 0.5 * (a + b);
      place(1, s);
      densities.evaluateSwitches(1, at[0], at[1], at[2], switchValues);
      if (switchValues[function][0] < 0 == rising) {
        a = s[0];
      } else {
        b = s[0];
      }
    }
    return 0.5 * (a + b);
  }

  private void place(int count, double[] s) {
    for (int axis = 0; axis < 3; axis++) {
      double origin = start.component(axis);
      double direction = span.component(axis);
      for (int i = 0; i < count; i++) {
        at[axis][i] = origin + s[i] * direction;
      }
    }
  }

  private void integrate(int piece) {
    double[] s = new double[NODES];
    double low = lows[piece];
    double width = highs[piece] - low;
    for (int i = 0; i < NODES; i++) {
      double node = i < SMALL.size() ? SMALL.node(i) : LARGE.node(i - SMALL.size());
      s[i] = low + width * node;
    }
    place(NODES, s);
    densities.evaluate(NODES, at[0], at[1], at[2], values);
    work++;
    int count = densities.count();
    for (int k = 0; k < count; k++) {
      double small = 0;
      double large = 0;
      double absolute = 0;
      for (int i = 0; i < NODES; i++) {
        double value = (power == 2 ? s[i] * s[i] : 1) * values[k][i] * width;
        if (i < SMALL.size()) {
          small += SMALL.weight(i) * value;
        } else {
          large += LARGE.weight(i - SMALL.size()) * value;
          absolute += LARGE.weight(i - SMALL.size()) * Math.abs(value);
        }
      }
      results[piece][k] = large;
      if (k == 0) {
        error[piece] = Math.abs(large - small);
        results[piece][count] = absolute;
        results[piece][count + 1] = error[piece];
      }
    }
  }
}
