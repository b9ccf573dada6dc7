/**
 * The command line: commands, exit codes, progress, messages for people.
 *
 * <p><b>Comes in:</b> arguments. <b>Goes out:</b> files through {@code report} and {@code charts},
 * the answer in brief on standard output, messages and progress on standard error, an exit code.
 *
 * <p><b>Read first:</b> {@link isowright.cli.Main}, then one command, say {@link
 * isowright.cli.Run}.
 *
 * <p><b>Does not belong here:</b> any result; the only package that prints.
 */
@NullMarked
package isowright.cli;

import org.jspecify.annotations.NullMarked;
