/**
 * The case as immutable records, and the sign convention of everything above.
 *
 * <h2>Signs</h2>
 *
 * <p>A patch <em>leaves</em> one volume and <em>enters</em> another; its normal points from the
 * first to the second, and a positive flux goes that way.
 *
 * <ul>
 *   <li>outward(V) = Σ fluxes of the patches leaving V − Σ fluxes of the patches entering V
 *   <li>interior(V) = generation − accumulation, or the volume integral of a field's divergence
 *   <li>residual(V) = outward(V) − interior(V): positive when more leaves than is accounted for; an
 *       unmetered leak of rate q out of V gives −q
 *   <li>an envelope S: outward(S) = Σ over V in S of outward(V), so inner patches cancel; likewise
 *       interior and residual
 * </ul>
 *
 * <p>Fluxes from a field, a flux density or a profile follow the patch normal as it is faced:
 * turning the facing turns them. A metered flux follows leaves → enters, whatever the geometry.
 *
 * <p>Every number in a case is in its working units ({@link org.hullsum.units.WorkingUnits}).
 * Figures with an uncertainty, named parameters and inline figures alike, are the {@link
 * org.hullsum.model.Inputs} of the case; formulas refer to them by name, so that the sensitivity to
 * each is a derivative.
 *
 * <p>Imports {@code field}, {@code geometry}, {@code expression}, {@code units}, {@code numeric}
 * and {@code problem}. Start reading at {@link org.hullsum.model.Case}.
 */
package org.hullsum.model;
