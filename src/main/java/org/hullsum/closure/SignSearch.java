package org.hullsum.closure;

import java.util.Arrays;

/**
 * Signs x, each +1 or −1, for which a linear form C x is nearest to given values: ‖C x − h‖² least.
 *
 * <p>Up to {@value #FEW} signs are all tried, in the order of a Gray code, in which each differs
 * from the last by one sign (F. Gray, US patent 2632058, 1953). More are searched from several
 * beginnings by turning one or two at a time while that helps; then nothing proves that there is no
 * better answer. For each sign the best answer with the other value of it is kept as well.
 */
final class SignSearch {
  /** Signs of which all combinations are tried. */
  static final int FEW = 14;

  private final int count;
  private final double[][] gram;
  private final double[] right;

  /** Best sum of squares with each sign at −1 and at +1, and the signs. */
  private final double[][] least;

  private final int[][][] answers;
  private int[] best;

  private SignSearch(double[][] form, double[] values) {
    this.count = form.length == 0 ? 0 : form[0].length;
    this.gram = new double[count][count];
    this.right = new double[count];
    for (int row = 0; row < form.length; row++) {
      for (int g = 0; g < count; g++) {
        right[g] += form[row][g] * values[row];
        for (int k = 0; k < count; k++) {
          gram[g][k] += form[row][g] * form[row][k];
        }
      }
    }
    this.least = new double[count][2];
    this.answers = new int[count][2][];
    for (double[] pair : least) {
      Arrays.fill(pair, Double.POSITIVE_INFINITY);
    }
  }

  /**
   * Searches.
   *
   * @param form C, by rows, at least one
   * @param values h
   */
  static SignSearch of(double[][] form, double[] values) {
    SignSearch search = new SignSearch(form, values);
    if (search.count <= FEW) {
      search.tryAll();
    } else {
      search.descend();
    }
    search.choose();
    return search;
  }

  /** The signs found. */
  int[] best() {
    return best.clone();
  }

  /** The best signs among those that have the other value of one. */
  int[] otherwise(int sign) {
    return answers[sign][best[sign] > 0 ? 0 : 1].clone();
  }

  private void choose() {
    double smallest = Double.POSITIVE_INFINITY;
    best = new int[count];
    for (int g = 0; g < count; g++) {
      for (int value = 0; value < 2; value++) {
        if (least[g][value] < smallest) {
          smallest = least[g][value];
          best = answers[g][value];
        }
      }
    }
  }

  /** Signs on their way, with half the gradient C'(C x − h) of the sum of squares. */
  private final class Walk {
    private final int[] x;
    private final double[] slope;
    private double sum;

    Walk(int[] start) {
      x = start.clone();
      slope = new double[count];
      for (int g = 0; g < count; g++) {
        slope[g] = -right[g];
        for (int k = 0; k < count; k++) {
          slope[g] += gram[g][k] * x[k];
        }
        // ‖C x − h‖² less ‖h‖²: x'C'C x − 2 x'C'h.
        sum += x[g] * (slope[g] - right[g]);
      }
    }

    /** What turning a sign adds. */
    double change(int g) {
      return 4 * (gram[g][g] - x[g] * slope[g]);
    }

    double change(int g, int k) {
      return change(g) + change(k) + 8 * x[g] * x[k] * gram[g][k];
    }

    void turn(int g) {
      sum += change(g);
      x[g] = -x[g];
      for (int k = 0; k < count; k++) {
        slope[k] += 2 * gram[k][g] * x[g];
      }
    }

    void enter() {
      for (int g = 0; g < count; g++) {
        int value = x[g] > 0 ? 1 : 0;
        if (sum < least[g][value]) {
          least[g][value] = sum;
          answers[g][value] = x.clone();
        }
      }
    }
  }

  private void tryAll() {
    int[] start = new int[count];
    Arrays.fill(start, 1);
    Walk walk = new Walk(start);
    walk.enter();
    for (int k = 1; k < 1 << count; k++) {
      walk.turn(Integer.numberOfTrailingZeros(k));
      walk.enter();
    }
  }

  private void descend() {
    int[] start = new int[count];
    for (int sign : new int[] {1, -1}) {
      Arrays.fill(start, sign);
      improve(start, count);
    }
    // Each pass begins where the best so far has one sign turned, and leaves that as it is.
    choose();
    int[] first = best;
    for (int g = 0; g < count; g++) {
      int[] turned = first.clone();
      turned[g] = -turned[g];
      improve(turned, g);
    }
  }

  /** Turns what helps most until nothing does; one sign is held. */
  private void improve(int[] start, int held) {
    Walk walk = new Walk(start);
    walk.enter();
    for (int step = 0; step < 4 * count; step++) {
      int[] turn = mostHelpful(walk, held);
      if (turn.length == 0) {
        return;
      }
      for (int g : turn) {
        walk.turn(g);
      }
      walk.enter();
    }
  }

  /** The sign, or else the pair, whose turning lowers the sum most; none where none does. */
  private int[] mostHelpful(Walk walk, int held) {
    // What rounding alone may seem to gain is no gain.
    double most = -1e-12 * count;
    int[] turn = {};
    for (int g = 0; g < count; g++) {
      if (g != held && walk.change(g) < most) {
        most = walk.change(g);
        turn = new int[] {g};
      }
    }
    for (int g = 0; g < count && turn.length != 1; g++) {
      for (int k = 0; k < g; k++) {
        if (g != held && k != held && walk.change(g, k) < most) {
          most = walk.change(g, k);
          turn = new int[] {k, g};
        }
      }
    }
    return turn;
  }
}
