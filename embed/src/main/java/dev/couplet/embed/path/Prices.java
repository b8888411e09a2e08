package dev.couplet.embed.path;

import dev.couplet.host.Host;

/**
 * What it costs to enter each host vertex while branch sets compete for them: negotiated
 * congestion.
 *
 * <p>The price is {@code (BASE + history) * (1 + pressure * use)}, with {@code use} the number of
 * trees on the vertex. History grows on vertices that stay overused, so that the trees that can do
 * without them learn to; pressure grows from sweep to sweep, so that in the end nobody shares.
 * Source: McMurchie and Ebeling, "PathFinder: a negotiation-based performance-driven router for
 * FPGAs" (1995), from memory.
 */
final class Prices {
  private static final int BASE = 16;
  private static final int BLAME = 4;
  private static final double GROWTH = 1.1;

  /** By host vertex: the price, and how many trees stand on it. */
  final int[] cost;

  final int[] use;

  private final boolean[] present;
  private final int[] history;
  private double pressure = 1;
  private int overlap;

  Prices(Host host) {
    int n = host.vertices();
    cost = new int[n];
    use = new int[n];
    history = new int[n];
    present = new boolean[n];
    for (int h = 0; h < n; h++) {
      present[h] = host.present(h);
    }
    setAll();
  }

  /** How many uses of host vertices are one too many. */
  int overlap() {
    return overlap;
  }

  void enter(int h) {
    if (use[h]++ > 0) {
      overlap++;
    }
    set(h);
  }

  void leave(int h) {
    if (--use[h] > 0) {
      overlap--;
    }
    set(h);
  }

  /** Overused vertices are blamed, and the pressure grows. */
  void raise() {
    for (int h = 0; h < use.length; h++) {
      if (use[h] > 1) {
        history[h] = Math.min(Spread.LARGEST, history[h] + BLAME * (use[h] - 1));
      }
    }
    pressure = Math.min(Spread.LARGEST, pressure * GROWTH);
    setAll();
  }

  /** The pressure falls to a new level, and half the blame is forgotten. */
  void ease(double newPressure) {
    for (int h = 0; h < use.length; h++) {
      history[h] /= 2;
    }
    pressure = newPressure;
    setAll();
  }

  private void setAll() {
    for (int h = 0; h < use.length; h++) {
      set(h);
    }
  }

  private void set(int h) {
    double price = (BASE + history[h]) * (1 + pressure * use[h]);
    cost[h] = present[h] ? (int) Math.min(Spread.LARGEST, price) : Spread.BLOCKED;
  }
}
