package dev.couplet.solve;

import java.time.Duration;

/**
 * One stage of a run.
 *
 * @param name what it is
 * @param outcome what it came to, in words
 * @param took how long it took, on the run's clock
 */
public record Stage(String name, String outcome, Duration took) {}
