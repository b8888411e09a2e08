package dev.couplet.sampling;

import java.time.Duration;
import java.util.OptionalDouble;

/**
 * How far a run has come.
 *
 * @param elapsed the time since its start, on the run's clock
 * @param share the share of the work done, 0 to 1; empty if the method cannot tell
 * @param best the lowest energy (or best value) so far; empty if there is none yet
 * @param bound a proved bound on the energy (or value); empty if there is none yet
 */
public record Progress(
    Duration elapsed, OptionalDouble share, OptionalDouble best, OptionalDouble bound) {}
