package org.hullsum.closure;

import java.util.ArrayList;
import java.util.List;

/**
 * A stretch of a rim.
 *
 * @param rim its index
 * @param from the parameter at which it starts
 * @param to the one at which it ends, larger; beyond the rim's length where a closed rim is passed
 *     through its first point
 */
record Stretch(int rim, double from, double to) {
  double length() {
    return to - from;
  }

  double middle() {
    return at(0.5);
  }

  /** The parameter at a part of the length. */
  double at(double part) {
    return from + part * (to - from);
  }

  /** The stretches of a rim between its cuts, which are in ascending order. */
  static List<Stretch> between(int index, Rim rim, List<Double> cuts) {
    List<Stretch> stretches = new ArrayList<>();
    if (cuts.isEmpty()) {
      stretches.add(new Stretch(index, 0, rim.length()));
      return stretches;
    }
    for (int k = 1; k < cuts.size(); k++) {
      stretches.add(new Stretch(index, cuts.get(k - 1), cuts.get(k)));
    }
    if (rim.closed()) {
      stretches.add(new Stretch(index, cuts.get(cuts.size() - 1), cuts.get(0) + rim.length()));
    }
    return stretches;
  }
}
