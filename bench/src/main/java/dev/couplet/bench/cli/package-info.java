/**
 * The command line: one verb, one class.
 *
 * <p>{@link dev.couplet.bench.cli.Main} is the program. Verbs print a {@link
 * dev.couplet.bench.cli.Table} on standard output and everything else on standard error. {@link
 * dev.couplet.bench.cli.Methods} knows every method by its name: a new one is a new line there.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.bench.cli;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
