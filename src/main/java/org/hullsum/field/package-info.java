/**
 * Flux-density fields as functions of position and time: stated by components in Cartesian,
 * cylindrical or spherical coordinates, as a gradient, as a sum, or as a carrier with a content.
 *
 * <p>Every field has Cartesian components and a divergence in {@code x y z t} for evaluation, and a
 * native form for people. Numbers are in working units.
 *
 * <p>Imports {@code expression}, {@code units}, {@code numeric} and {@code problem}. Start reading
 * at {@link org.hullsum.field.VectorField}.
 */
package org.hullsum.field;
