/**
 * Surfaces: how each kind of the case format is made of charts of the unit square, how it is moved
 * and trimmed, where its boundary runs and where a line crosses it.
 *
 * <p>Every surface is a list of {@link org.hullsum.geometry.Chart}s whose positions are formulas in
 * u and v, so that tangents are symbolic derivatives, enclosures are interval evaluations, and the
 * sensitivity to a parameter is a derivative like any other. The construction normal is r_u × r_v;
 * which way a patch faces is not known here. Lengths are in working units.
 *
 * <p>Imports {@code expression} and {@code numeric}. Start reading at {@link
 * org.hullsum.geometry.Surface}.
 */
package org.hullsum.geometry;
