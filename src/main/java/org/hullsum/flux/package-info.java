/**
 * Integrals over patches and volumes: the one place where surface, field and rule meet.
 *
 * <p>One integrator for each kind of flux statement, the geometric integrals of a patch (area,
 * vector area, moments), and volume integrals computed from the boundary alone. The facing of a
 * patch is an argument here, +1 or −1 against the construction normal, declared or found; nothing
 * in this package decides it. Results are in working units and carry an error bound.
 *
 * <p>Imports {@code model}, {@code field}, {@code geometry}, {@code expression}, {@code
 * quadrature}, {@code units}, {@code numeric} and {@code problem}.
 */
package org.hullsum.flux;
