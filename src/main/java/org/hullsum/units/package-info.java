/**
 * Units, quantities and measured quantities, and the readers of their texts.
 *
 * <p>A {@link org.hullsum.units.Unit} converts to coherent SI units; {@link
 * org.hullsum.units.WorkingUnits} are the coherent units in which one case is computed. Codes are
 * those of the Unified Code for Units of Measure, with the friendly spellings of the case format.
 * Uncertainties are standard uncertainties in the sense of JCGM 100:2008.
 *
 * <p>Imports {@code numeric} and {@code problem}. Start reading at {@link
 * org.hullsum.units.Dimension} and {@link org.hullsum.units.Unit}.
 */
package org.hullsum.units;
