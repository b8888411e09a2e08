/** Classes that the rules are tried on. */
@NullMarked
package dev.couplet.bench.architecture.bad.sampling;

import org.jspecify.annotations.NullMarked;
