/**
 * Micro-benchmarks, run by JMH: {@code java -cp bench/target/couplet-bench.jar org.openjdk.jmh.Main
 * PATTERN}, where the pattern is part of a benchmark's name; {@code -l} lists them, {@code -h}
 * tells all options.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.bench.speed;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
