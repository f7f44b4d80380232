/**
 * The command line: from arguments to files read, studies run, results written and an exit code.
 *
 * <p>Imports every other package; picocli stays here. Read {@link blochbound.cli.Blochbound}, then
 * one command such as {@code CertifyCommand}; a new command is one class and one line in {@code
 * Blochbound}. {@code FailureHandler} owns messages and exit codes of everything that goes wrong.
 *
 * <p>Invariants: results go to the standard output, everything else to the standard error; a result
 * file is written whole or not at all; bad input is found before any work starts.
 */
@NullMarked
package blochbound.cli;

import org.jspecify.annotations.NullMarked;
