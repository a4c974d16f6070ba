package org.hullsum.quadrature;

/**
 * A map of [0, 1] onto itself that takes square roots at chosen ends away: with x² in place of t,
 * √t is smooth; sin²(πx/2) does so at both ends.
 */
enum EndMap {
  NONE {
    @Override
    double position(double x) {
      return x;
    }

    @Override
    double slope(double x) {
      return 1;
    }
  },
  LEFT {
    @Override
    double position(double x) {
      return x * x;
    }

    @Override
    double slope(double x) {
      return 2 * x;
    }
  },
  RIGHT {
    @Override
    double position(double x) {
      return x * (2 - x);
    }

    @Override
    double slope(double x) {
      return 2 * (1 - x);
    }
  },
  BOTH {
    @Override
    double position(double x) {
      double s = Math.sin(0.5 * Math.PI * x);
      return s * s;
    }

    @Override
    double slope(double x) {
      return 0.5 * Math.PI * Math.sin(Math.PI * x);
    }
  };

  /** Where x goes; ascending from 0 to 1. */
  abstract double position(double x);

  /** Derivative of {@link #position}. */
  abstract double slope(double x);

  static EndMap of(boolean left, boolean right) {
    if (left) {
      return right ? BOTH : LEFT;
    }
    return right ? RIGHT : NONE;
  }
}
