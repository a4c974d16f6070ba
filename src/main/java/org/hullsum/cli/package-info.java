/**
 * The command line: commands and their options, the wiring of the floors below, progress, files
 * that are written, and exit codes.
 *
 * <p>Only this package touches the standard streams, the clock and the end of the process. What a
 * command does is a function of its arguments, its two output streams and the day ({@link
 * org.hullsum.cli.Program}), so that tests run it in one process. Text goes out as UTF-8 whatever
 * the locale, and nothing that is printed depends on locale or time zone. An output that can't be
 * written is told by its exit code, standard output included.
 *
 * <p>Options are declared by hand rather than by annotations, because reflecting on annotations is
 * paid at every start.
 *
 * <p>Imports every floor. Start reading at {@link org.hullsum.cli.Main}.
 */
package org.hullsum.cli;
