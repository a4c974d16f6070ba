/**
 * Units, quantities and measured quantities, and the readers of their texts.
 *
 * <p>A {@link org.hullsum.units.Unit} converts to coherent SI units; {@link
 * org.hullsum.units.WorkingUnits} are the coherent units in which one case is computed. Codes are
 * those of the Unified Code for Units of Measure, with the friendly spellings of the case format.
 * Uncertainties are standard uncertainties in the sense of JCGM 100:2008.
 *
 * <p>Texts are read by three parsers, each with faults that say where in the text, what was found
 * and what to write instead: {@link org.hullsum.units.UnitParser}, {@link
 * org.hullsum.units.QuantityParser}, {@link org.hullsum.units.MeasuredQuantityParser}. Where a text
 * was read in one of several possible ways, a {@link org.hullsum.units.Noted} result says which. A
 * temperature scale keeps its zero only as the unit of a value; in compounds and after ± it is a
 * difference. The table of units is built once, at first use, without regular expressions, streams
 * or reflection, because every start of the program pays for it.
 *
 * <p>Imports {@code numeric} and {@code problem}. Start reading at {@link
 * org.hullsum.units.Dimension} and {@link org.hullsum.units.Unit}.
 */
package org.hullsum.units;
