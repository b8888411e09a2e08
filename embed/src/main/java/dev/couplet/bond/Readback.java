package dev.couplet.bond;

import dev.couplet.form.Ising;
import dev.couplet.form.State;

/**
 * From host spins to guest spins. A branch set whose members agree says what its guest spin is; the
 * ways differ in how they settle torn sets. Implementations are immutable and deterministic.
 */
@FunctionalInterface
public interface Readback {
  /**
   * The guest state that a host state stands for.
   *
   * @param host a state of the hosted form
   * @param form the form on the host
   * @param guest the guest's own form
   */
  State read(State host, HostedForm form, Ising guest);

  /** A torn set takes the value of most of its members; on a tie, that of its first. O(spins). */
  static Readback byMajority() {
    return new MajorityReadback();
  }

  /**
   * Torn sets, in the order of their guest vertices, take the value that is best for the guest's
   * form given all others: whole sets as they are, torn ones by majority until settled. O(spins +
   * m).
   */
  static Readback byLocalField() {
    return new LocalFieldReadback();
  }
}
