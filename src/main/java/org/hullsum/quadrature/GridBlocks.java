package org.hullsum.quadrature;

/** Gathers points into blocks for a {@link SquareIntegrand} and lays the values out in a row. */
final class GridBlocks {
  private final SquareIntegrand integrand;
  private final double[] u = new double[SquareIntegrand.BLOCK];
  private final double[] v = new double[SquareIntegrand.BLOCK];
  private final double[][] block;
  private double[][] target;
  private int pending;
  private int done;

  GridBlocks(SquareIntegrand integrand) {
    this.integrand = integrand;
    block = new double[integrand.components()][SquareIntegrand.BLOCK];
    target = block;
  }

  /** Starts laying out values at the beginning of the rows of {@code target}. */
  void begin(double[][] target) {
    this.target = target;
    pending = 0;
    done = 0;
  }

  void add(double u, double v) {
    this.u[pending] = u;
    this.v[pending] = v;
    pending++;
    if (pending == SquareIntegrand.BLOCK) {
      flush();
    }
  }

  void finish() {
    if (pending > 0) {
      flush();
    }
  }

  private void flush() {
    integrand.evaluate(pending, u, v, block);
    for (int c = 0; c < block.length; c++) {
      System.arraycopy(block[c], 0, target[c], done, pending);
    }
    done += pending;
    pending = 0;
  }
}
