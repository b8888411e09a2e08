package dev.couplet.bond;

import dev.couplet.form.Ising;
import dev.couplet.form.State;

/** Torn branch sets take, one after the other, the value that is best for the guest's form. */
final class LocalFieldReadback implements Readback {
  private final Readback majority = Readback.byMajority();

  @Override
  public State read(State host, HostedForm form, Ising guest) {
    boolean[] values = majority.read(host, form, guest).toBooleans();
    double[] field = null;
    for (int g = 0; g < values.length; g++) {
      if (!form.torn(host, g)) {
        continue;
      }
      field = field == null ? fields(guest, values) : field;
      boolean best = field[g] == 0 ? values[g] : field[g] > 0;
      if (best != values[g]) {
        values[g] = best;
        field = fields(guest, values);
      }
    }
    return State.of(values);
  }

  /** What each spin is pulled against: a positive field makes -1, a 1 bit, the better value. */
  private static double[] fields(Ising guest, boolean[] values) {
    double[] field = new double[values.length];
    for (int g = 0; g < values.length; g++) {
      field[g] = guest.linear(g);
    }
    guest.forEachPair(
        (g, h, coupling) -> {
          field[g] += values[h] ? -coupling : coupling;
          field[h] += values[g] ? -coupling : coupling;
        });
    return field;
  }

  @Override
  public String toString() {
    return "by local field";
  }
}
