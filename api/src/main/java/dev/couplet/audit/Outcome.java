package dev.couplet.audit;

import dev.couplet.sampling.Draws;
import java.util.Optional;

/**
 * How one call of a sampler ended.
 *
 * @param draws what it returned, if it returned
 * @param thrown what it threw, if it threw
 * @param interrupted whether the caller's interrupt flag was set afterwards
 */
record Outcome(Optional<Draws> draws, Optional<Throwable> thrown, boolean interrupted) {
  static Outcome returned(Draws draws, boolean interrupted) {
    return new Outcome(Optional.of(draws), Optional.empty(), interrupted);
  }

  static Outcome threw(Throwable thrown, boolean interrupted) {
    return new Outcome(Optional.empty(), Optional.of(thrown), interrupted);
  }

  @Override
  public String toString() {
    return draws
        .map(Draws::toString)
        .or(() -> thrown.map(t -> "threw " + t))
        .orElse("returned nothing");
  }
}
