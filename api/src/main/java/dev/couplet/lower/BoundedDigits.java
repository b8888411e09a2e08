package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.List;

/** Powers of two below a bound, then the bound as often as it fits, then what is left. */
record BoundedDigits(long largest) implements CountEncoding {
  /** Binary. */
  static final BoundedDigits UNBOUNDED = new BoundedDigits(Long.MAX_VALUE);

  @Override
  public String name() {
    return equals(UNBOUNDED) ? "binary" : "binary, amounts up to " + largest;
  }

  @Override
  public Code code(long width) {
    List<Long> amounts = amounts(width);
    Polynomial none = Polynomial.builder(amounts.size()).build();
    return new Code(amounts, none, "nothing, every pattern is a number");
  }

  /** What each bit adds; none for a width of 0. */
  List<Long> amounts(long width) {
    List<Long> amounts = new ArrayList<>();
    long held = 0;
    for (long power = 1; held < width; ) {
      long amount = Math.min(Math.min(power, largest), width - held);
      amounts.add(amount);
      held += amount;
      power = power > largest / 2 ? largest : power * 2;
    }
    return amounts;
  }
}
