package org.hullsum.quadrature;

/**
 * A line of constant outer coordinate across the unit square, with the places where a switch
 * function changes sign along it.
 */
final class Row {
  private final double[] roots;
  private final long signature;

  /**
   * @param roots inner coordinates, ascending; taken over, not copied
   * @param signature equal for rows on which the same functions change sign in the same order
   */
  Row(double[] roots, long signature) {
    this.roots = roots;
    this.signature = signature;
  }

  long signature() {
    return signature;
  }

  /** Number of strips into which the roots cut the row. */
  int strips() {
    return roots.length + 1;
  }

  /** Inner coordinate at which strip {@code k} begins. */
  double begin(int k) {
    return k == 0 ? 0 : roots[k - 1];
  }

  /** Inner coordinate at which strip {@code k} ends. */
  double end(int k) {
    return k == roots.length ? 1 : roots[k];
  }
}
