package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.List;

/**
 * One bit less than there are options: option k is stood for by k bits at 1, then zeros. The
 * penalty counts the walls too many: a zero that a one follows.
 *
 * <p>Source: Chancellor, "Domain wall encoding of discrete variables for quantum annealing and
 * QAOA" (2019).
 */
final class DomainWall implements ChoiceEncoding {
  @Override
  public String name() {
    return "domain wall";
  }

  @Override
  public Code code(int options) {
    int bits = options - 1;
    List<Polynomial> literals = new ArrayList<>(options);
    List<State> patterns = new ArrayList<>(options);
    State pattern = State.zeros(bits);
    Polynomial.Builder walls = Polynomial.builder(bits);
    for (int option = 0; option < options; option++) {
      Polynomial.Builder literal = Polynomial.builder(bits);
      if (option == 0) {
        literal.add(1);
      } else {
        literal.add(1, option - 1);
        pattern = pattern.with(option - 1, true);
      }
      if (option < bits) {
        literal.add(-1, option);
      }
      literals.add(literal.build());
      patterns.add(pattern);
    }
    for (int bit = 1; bit < bits; bit++) {
      walls.add(1, bit).add(-1, bit - 1, bit);
    }
    return new Code(bits, literals, patterns, walls.build(), "walls too many");
  }
}
