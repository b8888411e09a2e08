package dev.couplet.bond;

import dev.couplet.sampling.Draws;
import java.util.List;

/**
 * What a hosted run gave: the guest's draws, and how often each branch set was torn.
 *
 * @param draws the draws of the guest's form, read back
 * @param tornShares for each guest vertex the share of draws in which its set's members disagreed
 */
public record HostedDraws(Draws draws, List<Double> tornShares) {
  /** Copies the list. */
  public HostedDraws {
    tornShares = List.copyOf(tornShares);
  }

  /** The share of torn sets over all guest vertices and draws; 0 without vertices. */
  public double tornShare() {
    return tornShares.stream().mapToDouble(Double::doubleValue).average().orElse(0);
  }
}
