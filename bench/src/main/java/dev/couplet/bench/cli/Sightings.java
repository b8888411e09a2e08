package dev.couplet.bench.cli;

import dev.couplet.sampling.Watch.Progress;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.Consumer;
import java.util.function.LongSupplier;

/** Remembers when a run first told of each energy, on the clock of the caller. Thread-safe. */
final class Sightings implements Consumer<Progress> {
  private final LongSupplier clock;
  private final long began;
  private final List<Sighting> improvements = new ArrayList<>();

  /** Begins now, on a clock in nanoseconds. */
  Sightings(LongSupplier clock) {
    this.clock = clock;
    this.began = clock.getAsLong();
  }

  private record Sighting(double energy, double seconds) {}

  @Override
  public synchronized void accept(Progress progress) {
    if (progress.best().isPresent()) {
      double energy = progress.best().getAsDouble();
      int last = improvements.size() - 1;
      if (last < 0 || energy < improvements.get(last).energy()) {
        improvements.add(new Sighting(energy, seconds()));
      }
    }
  }

  /** The seconds since the beginning. */
  double seconds() {
    return (clock.getAsLong() - began) * 1e-9;
  }

  /** When an energy of at most {@code energy} was first told of, in seconds from the beginning. */
  synchronized OptionalDouble firstAtMost(double energy) {
    return improvements.stream()
        .filter(sighting -> sighting.energy() <= energy)
        .mapToDouble(Sighting::seconds)
        .findFirst();
  }
}
