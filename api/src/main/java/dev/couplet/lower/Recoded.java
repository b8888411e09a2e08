package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.model.Count;

/**
 * A count whose bits are not its digits.
 *
 * @param count the count
 * @param first the number of its first digit among the literals
 * @param digits the code that its literals are in
 * @param bit the number of its first bit
 * @param code the code that its bits are in
 */
record Recoded(
    Count count, int first, CountEncoding.Code digits, int bit, CountEncoding.Code code) {
  /** Writes digits over bits, these numbered from {@code literals} on. */
  Polynomial overBits(Polynomial polynomial, int literals) {
    return new Recoding(this, literals + bit).of(polynomial);
  }

  /** The largest number that the bits hold. */
  long width() {
    return count.highest() - count.lowest();
  }

  boolean hasDigit(int literal) {
    return literal >= first && literal < first + digits.amounts().size();
  }

  /** Writes the digits that a pattern of the bits stands for; false if it stands for no number. */
  boolean read(State pattern, boolean[] literals) {
    boolean[] own = new boolean[code.amounts().size()];
    long number = 0;
    for (int k = 0; k < own.length; k++) {
      own[k] = pattern.get(bit + k);
      number += own[k] ? code.amounts().get(k) : 0;
    }
    boolean kept = code.penalty().value(State.of(own)) == 0;
    boolean[] set = digits.pattern(kept ? number : 0);
    System.arraycopy(set, 0, literals, first, set.length);
    return kept;
  }

  /** Writes the bits of the number that the digits are. */
  void write(State literals, boolean[] bits) {
    long number = 0;
    for (int k = 0; k < digits.amounts().size(); k++) {
      number += literals.get(first + k) ? digits.amounts().get(k) : 0;
    }
    boolean[] set = code.pattern(number);
    System.arraycopy(set, 0, bits, bit, set.length);
  }
}
