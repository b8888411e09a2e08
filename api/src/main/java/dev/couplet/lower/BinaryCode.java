package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.List;

/**
 * The number of an option in binary: {@code ceil(log2 k)} bits and no penalty. Where k is no power
 * of two, a bit does not count where its other value, with the bits above it, begins no option:
 * every pattern stands for an option, the last ones are stood for by several.
 *
 * <p>An option is a product of up to {@code ceil(log2 k)} bits and negations of bits, so that
 * products of options of two choices have a high degree. Source: common practice.
 */
final class BinaryCode implements ChoiceEncoding {
  @Override
  public String name() {
    return "binary";
  }

  @Override
  public Code code(int options) {
    int bits = 32 - Integer.numberOfLeadingZeros(options - 1);
    List<Polynomial> literals = new ArrayList<>(options);
    List<State> patterns = new ArrayList<>(options);
    for (int option = 0; option < options; option++) {
      literals.add(literal(option, options, bits));
      patterns.add(pattern(option, bits));
    }
    Polynomial none = Polynomial.builder(bits).build();
    return new Code(bits, literals, patterns, none, "nothing, every pattern is an option");
  }

  private static State pattern(int option, int bits) {
    State pattern = State.zeros(bits);
    for (int bit = 0; bit < bits; bit++) {
      pattern = pattern.with(bit, (option >>> bit & 1) != 0);
    }
    return pattern;
  }

  /** The product of the bits that tell the option from all others, from the highest down. */
  private static Polynomial literal(int option, int options, int bits) {
    Polynomial product = Polynomial.builder(bits).add(1).build();
    int last = options - 1;
    for (int bit = bits - 1; bit >= 0; bit--) {
      boolean one = (option >>> bit & 1) != 0;
      boolean othersExist = one || ((option >>> bit) | 1) <= last >>> bit;
      if (othersExist) {
        Polynomial.Builder factor = Polynomial.builder(bits);
        factor.add(one ? 0 : 1).add(one ? 1 : -1, bit);
        product = product.times(factor.build());
      }
    }
    return product;
  }
}
