package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.List;

/** One bit an option; the penalty is the square of their sum less 1. */
final class OneHot implements ChoiceEncoding {
  @Override
  public String name() {
    return "one-hot";
  }

  @Override
  public Code code(int options) {
    Polynomial.Builder difference = Polynomial.builder(options).add(-1);
    List<Polynomial> literals = new ArrayList<>(options);
    List<State> patterns = new ArrayList<>(options);
    for (int option = 0; option < options; option++) {
      difference.add(1, option);
      literals.add(Polynomial.builder(options).add(1, option).build());
      patterns.add(State.zeros(options).with(option, true));
    }
    return new Code(options, literals, patterns, SquareForm.squared(difference), "square");
  }
}
