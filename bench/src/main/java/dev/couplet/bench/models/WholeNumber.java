package dev.couplet.bench.models;

import static dev.couplet.model.Expr.sum;

import dev.couplet.model.Bit;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import java.util.ArrayList;
import java.util.List;

/**
 * A whole number between two limits, as bits of a model: powers of two, and a top coefficient cut
 * so that no value lies outside.
 */
final class WholeNumber {
  private record Digit(Bit bit, int weight) {}

  private final String name;
  private final int lowest;
  private final int highest;
  private final List<Digit> digits = new ArrayList<>();

  WholeNumber(Model model, String name, int lowest, int highest) {
    if (lowest > highest) {
      throw new IllegalArgumentException(
          name + " would lie between " + lowest + " and " + highest + ", where there is nothing");
    }
    this.name = name;
    this.lowest = lowest;
    this.highest = highest;
    int held = 0;
    for (int power = 1; held < highest - lowest; power *= 2) {
      int weight = Math.min(power, highest - lowest - held);
      digits.add(new Digit(model.bit("digit " + (digits.size() + 1) + " of " + name), weight));
      held += weight;
    }
  }

  int lowest() {
    return lowest;
  }

  int highest() {
    return highest;
  }

  Expr expr() {
    return sum(digits, digit -> digit.bit().times(digit.weight())).plus(lowest);
  }

  void set(Plan.Draft draft, int value) {
    if (value < lowest || value > highest) {
      throw new IllegalArgumentException(
          name + " is " + value + ", it lies between " + lowest + " and " + highest);
    }
    int left = value - lowest;
    for (int k = digits.size() - 1; k >= 0; k--) {
      Digit digit = digits.get(k);
      boolean holds = left >= digit.weight();
      draft.set(digit.bit(), holds);
      left -= holds ? digit.weight() : 0;
    }
  }
}
