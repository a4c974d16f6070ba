package org.hullsum.quadrature;

import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.Map;

/**
 * Finds where switch functions change sign along rows of the unit square.
 *
 * <p>A row is sampled at equal distances; a change of sign is a bracket. Where three neighbours of
 * one sign bend toward zero, the least magnitude between them is sought, so that two roots closer
 * than the samples are seen as well. Brackets are closed by false position with halvings in between
 * (Dowell and Jarratt, BIT 11 (1971) 168–174), all of a row at a time, down to rounding. Zero
 * counts as positive. Rows are kept, since the strips of one row share its roots.
 */
final class RowRoots {
  private static final int INTERVALS = 64;
  private static final int CLOSING_STEPS = 80;
  private static final int LEAST_STEPS = 44;
  private static final double GOLDEN = 0.5 * (3 - Math.sqrt(5));

  /** A parabola that keeps more than this part of its samples' least magnitude stays clear. */
  private static final double CLEAR = 0.75;

  private static final int MOST_BRACKETS = SquareIntegrand.BLOCK;
  private static final int MOST_KEPT = 50_000;

  private final SwitchFunctions switches;
  private final boolean outerIsU;
  private final double[] outers = new double[SquareIntegrand.BLOCK];
  private final double[] inners = new double[SquareIntegrand.BLOCK];
  private final double[][] values;
  private final double[][] sampled;
  private final Map<Double, Row> kept = new HashMap<>();
  private final double[] low = new double[MOST_BRACKETS];
  private final double[] high = new double[MOST_BRACKETS];
  private final double[] atLow = new double[MOST_BRACKETS];
  private final double[] atHigh = new double[MOST_BRACKETS];
  private final int[] function = new int[MOST_BRACKETS];
  private int brackets;

  /**
   * @param outerIsU whether rows have constant u; else constant v
   */
  RowRoots(SwitchFunctions switches, boolean outerIsU) {
    this.switches = switches;
    this.outerIsU = outerIsU;
    values = new double[switches.count()][SquareIntegrand.BLOCK];
    sampled = new double[switches.count()][INTERVALS + 1];
  }

  boolean outerIsU() {
    return outerIsU;
  }

  /** The row at an outer coordinate. */
  Row at(double outer) {
    Row known = kept.get(outer);
    if (known == null) {
      known = find(outer);
      if (kept.size() < MOST_KEPT) {
        kept.put(outer, known);
      }
    }
    return known;
  }

  private Row find(double outer) {
    Arrays.fill(outers, outer);
    brackets = 0;
    sample();
    for (int k = 0; k < sampled.length; k++) {
      for (int j = 0; j < INTERVALS; j++) {
        if (positive(sampled[k][j]) != positive(sampled[k][j + 1])) {
          bracket(k, place(j), sampled[k][j], place(j + 1), sampled[k][j + 1]);
        } else if (j > 0 && bendsToZero(sampled[k], j)) {
          dip(k, j);
        }
      }
    }
    close();
    Integer[] order = new Integer[brackets];
    Arrays.setAll(order, i -> i);
    Arrays.sort(
        order,
        Comparator.<Integer>comparingDouble(i -> high[i]).thenComparingInt(i -> function[i]));
    double[] roots = new double[brackets];
    long signature = 1;
    for (double[] one : sampled) {
      signature = 2 * signature + (positive(one[0]) ? 1 : 0);
    }
    for (int i = 0; i < brackets; i++) {
      roots[i] = high[order[i]];
      signature = 31 * signature + function[order[i]] + 2;
    }
    return new Row(roots, signature);
  }

  private static double place(int j) {
    return (double) j / INTERVALS;
  }

  private static boolean positive(double value) {
    return value >= 0;
  }

  private void sample() {
    for (int from = 0; from <= INTERVALS; from += SquareIntegrand.BLOCK) {
      int count = Math.min(SquareIntegrand.BLOCK, INTERVALS + 1 - from);
      for (int i = 0; i < count; i++) {
        inners[i] = place(from + i);
      }
      evaluate(count);
      for (int k = 0; k < sampled.length; k++) {
        System.arraycopy(values[k], 0, sampled[k], from, count);
      }
    }
  }

  private void evaluate(int count) {
    switches.evaluate(count, outerIsU ? outers : inners, outerIsU ? inners : outers, values);
  }

  /** Whether |s| at j − 1, j, j + 1, all of one sign, may reach zero between. */
  private static boolean bendsToZero(double[] s, int j) {
    if (positive(s[j - 1]) != positive(s[j])) {
      return false;
    }
    double before = Math.abs(s[j - 1]);
    double here = Math.abs(s[j]);
    double after = Math.abs(s[j + 1]);
    double bend = before - 2 * here + after;
    double slope = 0.5 * (after - before);
    if (!(bend > 0) || Math.abs(slope) > bend) {
      return false;
    }
    double least = here - 0.5 * slope * slope / bend;
    return least <= CLEAR * Math.min(before, Math.min(here, after));
  }

  /** Seeks the least |s| between j − 1 and j + 1; two brackets where the sign differs there. */
  private void dip(int k, int j) {
    double a = place(j - 1);
    double b = place(j + 1);
    boolean sign = positive(sampled[k][j]);
    double x = a + GOLDEN * (b - a);
    double y = b - GOLDEN * (b - a);
    double atX = value(k, x);
    double atY = value(k, y);
    for (int step = 0; step < LEAST_STEPS; step++) {
      double found = positive(atX) == sign ? atY : atX;
      if (positive(found) != sign) {
        double middle = positive(atX) == sign ? y : x;
        bracket(k, place(j - 1), sampled[k][j - 1], middle, found);
        bracket(k, middle, found, place(j + 1), sampled[k][j + 1]);
        return;
      }
      if (Math.abs(atX) < Math.abs(atY)) {
        b = y;
        y = x;
        atY = atX;
        x = a + GOLDEN * (b - a);
        atX = value(k, x);
      } else {
        a = x;
        x = y;
        atX = atY;
        y = b - GOLDEN * (b - a);
        atY = value(k, y);
      }
    }
  }

  private double value(int k, double inner) {
    inners[0] = inner;
    evaluate(1);
    return values[k][0];
  }

  private void bracket(int k, double from, double atFrom, double to, double atTo) {
    if (brackets < MOST_BRACKETS) {
      function[brackets] = k;
      low[brackets] = from;
      high[brackets] = to;
      atLow[brackets] = atFrom;
      atHigh[brackets] = atTo;
      brackets++;
    }
  }

  /** Closes all brackets to neighbouring numbers, as far as {@link #CLOSING_STEPS} reach. */
  private void close() {
    boolean open = brackets > 0;
    for (int step = 0; step < CLOSING_STEPS && open; step++) {
      open = false;
      for (int i = 0; i < brackets; i++) {
        double middle = 0.5 * (low[i] + high[i]);
        double guess = low[i] - atLow[i] * (high[i] - low[i]) / (atHigh[i] - atLow[i]);
        boolean inside = guess > low[i] && guess < high[i];
        inners[i] = step % 3 == 2 || !inside ? middle : guess;
        open |= middle > low[i] && middle < high[i];
      }
      evaluate(brackets);
      for (int i = 0; i < brackets; i++) {
        narrow(i, inners[i], values[function[i]][i]);
      }
    }
  }

  private void narrow(int i, double at, double value) {
    if (positive(value) == positive(atLow[i])) {
      low[i] = at;
      atLow[i] = value;
      atHigh[i] *= 0.5;
    } else {
      high[i] = at;
      atHigh[i] = value;
      atLow[i] *= 0.5;
    }
  }
}
