/**
 * What an audit found, put into words and documents: text for people, JSON for programs, JUnit XML
 * for build servers.
 *
 * <p>Every report reads an {@link org.hullsum.audit.AuditResult} and computes nothing of its own: a
 * report that would need a figure which is not in the result asks for it to be put there. What a
 * report does decide is layout, and how many digits of a figure are worth printing ({@link
 * org.hullsum.report.Figures}): as many as its error supports.
 *
 * <p>The JSON document follows the contract of {@code docs/results.md} key by key. Nothing depends
 * on the locale, the time zone or the number of threads, and lines end in a line feed everywhere.
 * Signs are those of {@link org.hullsum.model}.
 *
 * <p>Imports {@code audit}, {@code model}, {@code units}, {@code problem}, and {@code numeric} for
 * the vectors of a result. Start reading at {@link org.hullsum.report.TextReport} and {@link
 * org.hullsum.report.JsonReport}.
 */
package org.hullsum.report;
