package org.hullsum.quadrature;

/**
 * A point of a parameter domain.
 *
 * @param u first parameter of a square, outer variable of a nested integral, or position on a line
 * @param v second parameter or inner variable; 0 on a line
 */
public record ParameterPoint(double u, double v) {}
