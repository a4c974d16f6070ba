package org.hullsum.quadrature;

/**
 * Watches that switch functions keep their signs over all points that an integration visits, where
 * a search has found no sign change.
 */
final class SignWatch {
  private final SwitchFunctions switches;
  private final double[] u;
  private final double[] v;
  private final double[][] block;
  private final int[] sign;
  private int pending;
  private boolean steady = true;
  private double placeU;
  private double placeV;

  SignWatch(SwitchFunctions switches) {
    this.switches = switches;
    int size = switches.count() == 0 ? 0 : SquareIntegrand.BLOCK;
    u = new double[size];
    v = new double[size];
    block = new double[switches.count()][size];
    sign = new int[switches.count()];
  }

  void add(double u, double v) {
    if (sign.length == 0) {
      return;
    }
    this.u[pending] = u;
    this.v[pending] = v;
    pending++;
    if (pending == SquareIntegrand.BLOCK) {
      flush();
    }
  }

  /** Whether the signs have been the same at all points so far. */
  boolean finish() {
    if (pending > 0) {
      flush();
    }
    return steady;
  }

  /** A place where a sign differs from the one first seen. */
  ParameterPoint place() {
    return new ParameterPoint(placeU, placeV);
  }

  private void flush() {
    switches.evaluate(pending, u, v, block);
    for (int k = 0; k < sign.length; k++) {
      for (int i = 0; i < pending; i++) {
        int here = (int) Math.signum(block[k][i]);
        if (sign[k] == 0) {
          sign[k] = here;
        } else if (here == -sign[k] && steady) {
          steady = false;
          placeU = u[i];
          placeV = v[i];
        }
      }
    }
    pending = 0;
  }
}
