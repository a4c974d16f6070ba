package org.hullsum.quadrature;

/** The empty set of switch functions. */
enum NoSwitches implements SwitchFunctions {
  INSTANCE;

  @Override
  public int count() {
    return 0;
  }

  @Override
  public void evaluate(int count, double[] u, double[] v, double[][] values) {
    throw new UnsupportedOperationException("there are no switch functions to evaluate");
  }
}
