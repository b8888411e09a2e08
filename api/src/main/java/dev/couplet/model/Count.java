package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import java.util.ArrayList;
import java.util.List;

/**
 * A decision for a whole number of a range, and that number as an expression.
 *
 * <p>Products of counts, with themselves too, are whole numbers as they should be. How a count
 * becomes bits is for the lowering to choose.
 */
@CheckReturnValue
public final class Count extends Expr implements Decision {
  private final String name;
  private final long lowest;
  private final long highest;
  private final Slot slot;
  private final long[] digits;

  Count(Model owner, String name, int firstLiteral, long lowest, long highest) {
    this.name = name;
    this.lowest = lowest;
    this.highest = highest;
    this.digits = Digits.of(highest - lowest);
    this.slot = new Slot(owner, firstLiteral, digits.length, 0);
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public long values() {
    return highest - lowest + 1;
  }

  /** The lowest number it can be. */
  public long lowest() {
    return lowest;
  }

  /** The highest number it can be. */
  public long highest() {
    return highest;
  }

  /** What each digit adds to the lowest number where its literal holds. */
  long[] digits() {
    return digits;
  }

  /** The lowest number and the digits that hold. */
  Expr inLiterals() {
    List<Expr> sum = new ArrayList<>();
    sum.add(constant((double) lowest));
    for (int k = 0; k < digits.length; k++) {
      sum.add(new Fact(this, slot, k).times((double) digits[k]));
    }
    return sum(sum);
  }

  long requireWithin(long value) {
    if (value < lowest || value > highest) {
      throw new IllegalArgumentException(
          value + " is not within the range of count '" + name + "': " + lowest + " to " + highest);
    }
    return value;
  }

  Slot slot() {
    return slot;
  }

  @Override
  Model owner() {
    return slot.owner();
  }

  @Override
  public String toString() {
    return name;
  }
}
