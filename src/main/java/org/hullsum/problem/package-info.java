/**
 * What can be wrong, as values: a {@link org.hullsum.problem.Problem} of an input file, a {@link
 * org.hullsum.problem.Finding} about what a case describes, and the {@link
 * org.hullsum.problem.Place} of either.
 *
 * <p>A problem keeps a case from being audited and never carries a verdict; a finding comes out of
 * an audit. Both are collected and reported together, never thrown. {@link
 * org.hullsum.problem.TextFault} is thrown only inside the readers of single texts, which do not
 * know where in a file their text stands. {@link org.hullsum.problem.InternalFault} is a fault of
 * the program itself.
 *
 * <p>Imports nothing of this project. Start reading at {@link org.hullsum.problem.ProblemKind} and
 * {@link org.hullsum.problem.FindingCode}.
 */
package org.hullsum.problem;
