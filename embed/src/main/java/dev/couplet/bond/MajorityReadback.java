package dev.couplet.bond;

import dev.couplet.form.Ising;
import dev.couplet.form.State;

/** A torn branch set takes the value of most of its members; on a tie, that of its first. */
final class MajorityReadback implements Readback {
  @Override
  public State read(State host, HostedForm form, Ising guest) {
    boolean[] values = new boolean[guest.size()];
    for (int g = 0; g < values.length; g++) {
      values[g] = majority(host, form.first(g), form.first(g + 1));
    }
    return State.of(values);
  }

  private static boolean majority(State host, int from, int to) {
    int ones = 0;
    for (int k = from; k < to; k++) {
      ones += host.bit(k);
    }
    int twice = 2 * ones - (to - from);
    return twice == 0 ? host.get(from) : twice > 0;
  }

  @Override
  public String toString() {
    return "by majority";
  }
}
