/**
 * From a case to its result: balances, verdicts, findings and explanations.
 *
 * <p>{@link org.hullsum.audit.AuditResult} is the one thing that every report reads; what a report
 * shows is computed here or below, never in the report. Figures in a result are in the units that
 * it names: rates in the case's rate unit, areas, lengths and volumes in SI (plain numbers with
 * {@code units: none}). The signs are those of {@link org.hullsum.model}.
 *
 * <p>Imports every floor below. Start reading at {@link org.hullsum.audit.AuditResult}.
 */
package org.hullsum.audit;
