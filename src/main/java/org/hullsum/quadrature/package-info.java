/**
 * Rules and adaptive integration over reference cells, with error bounds that hold.
 *
 * <p>Three integrators share one promise: the true error of every component lies within {@link
 * org.hullsum.quadrature.Integral#errorBound()}, and an accuracy that was asked for and not reached
 * is a status, never silence.
 *
 * <ul>
 *   <li>{@link org.hullsum.quadrature.SquareIntegrator}: the unit square, with the functions whose
 *       sign changes make the integrand kink or jump;
 *   <li>{@link org.hullsum.quadrature.NestedIntegrator}: an outer variable and, for each of its
 *       values, an inner line with breakpoints of the caller's;
 *   <li>{@link org.hullsum.quadrature.LineIntegrator}: a piecewise smooth function of one variable.
 * </ul>
 *
 * <p>Conventions. Parameters run over [0, 1]. Integrands are vectors: component {@code c} of point
 * {@code i} stands in {@code values[c][i]}. They are always evaluated in blocks, never point by
 * point. Rules ({@link org.hullsum.quadrature.GaussRule}, {@code TrapezoidRule}, {@code
 * KronrodRule}) know nothing of the integrators; the integrators reduce every domain to {@code
 * Cell}s, curvilinear quadrangles over which the integrand is smooth.
 *
 * <p>Invariants. The same problem gives the same bits: regions are refined in a fixed order and
 * sums over regions are compensated. Integrands may keep scratch space: an integration runs on one
 * thread. No state outlives a call, except rules, which are immutable.
 *
 * <p>Imports commons-numbers for compensated sums and nothing of this project. Start reading at
 * {@link org.hullsum.quadrature.SquareIntegrator} and {@code RegionIntegrator}.
 */
package org.hullsum.quadrature;
