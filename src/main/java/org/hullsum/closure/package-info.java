/**
 * Whether a surface closes, and which way its patches face.
 *
 * <p>Rims are matched into seams; what is left over are gaps: {@link
 * org.hullsum.closure.SeamFinder}. Facings are found twice, by parity from where lines cross the
 * patches, {@link org.hullsum.closure.FacingFinder}, and from the seams, {@link
 * org.hullsum.closure.OrientationSystem}; what is declared has no say in either. Winding numbers
 * are a third opinion, {@link org.hullsum.closure.SecondOpinion}, and the only one where neither
 * rims nor lines tell. Vector areas and moments must confirm them: {@link
 * org.hullsum.closure.MomentClosure}.
 *
 * <p>Imports {@code geometry}, {@code mesh}, {@code numeric} and {@code problem}; integrals come in
 * as plain figures. Lengths are in working units.
 */
package org.hullsum.closure;
