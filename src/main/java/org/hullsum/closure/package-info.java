/**
 * Whether a surface closes, and which way its patches face.
 *
 * <p>Facings are found by parity, from where lines cross the patches, and never from what is
 * declared or from the construction normals: {@link org.hullsum.closure.FacingFinder}. The vector
 * areas and moments of the patches, with the signs found, give conditions that are necessary for
 * closedness and never sufficient: {@link org.hullsum.closure.MomentClosure}.
 *
 * <p>Imports {@code geometry}, {@code mesh}, {@code numeric} and {@code problem}; integrals come in
 * as plain figures. Lengths are in working units.
 */
package org.hullsum.closure;
