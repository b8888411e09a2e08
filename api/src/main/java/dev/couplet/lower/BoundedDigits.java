package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.List;

/** Powers of two below a bound, then the bound as often as it fits, then what is left. */
record BoundedDigits(long largest) implements CountEncoding {
  @Override
  public String name() {
    return largest == Long.MAX_VALUE ? "binary" : "binary, amounts up to " + largest;
  }

  @Override
  public Code code(long width) {
    List<Long> amounts = new ArrayList<>();
    long held = 0;
    for (long power = 1; held < width; ) {
      long amount = Math.min(Math.min(power, largest), width - held);
      amounts.add(amount);
      held += amount;
      power = power > largest / 2 ? largest : power * 2;
    }
    Polynomial none = Polynomial.builder(amounts.size()).build();
    return new Code(amounts, none, "nothing, every pattern is a number");
  }
}
