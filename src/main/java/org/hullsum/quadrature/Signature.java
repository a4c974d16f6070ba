package org.hullsum.quadrature;

/**
 * The discrete structure of a function at a position: equal within each interval on which the
 * function is smooth, different on the two sides of each place where it is not.
 */
public interface Signature {
  /** A number that is equal for equal structure. */
  long at(double t);
}
