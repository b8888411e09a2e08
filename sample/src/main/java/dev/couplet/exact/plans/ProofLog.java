package dev.couplet.exact.plans;

import dev.couplet.form.State;
import java.util.Optional;
import java.util.function.Consumer;

/**
 * Writes what a walk does in lines from which it can be checked without it. A value is written as
 * its literal with a sign: {@code +7} that literal 7 holds, {@code -7} that the bit 7 does not.
 *
 * <pre>
 * unit N               numbers below are in 1 / N of the objective's own unit
 * root                 the walk goes back to the root
 * take V               a value is taken, one level down
 * cut V                with this value, and what is taken and cut, rules cannot be kept
 * plan 0101            the literals of a plan; those that are no better are of no interest
 * row R.P M            part P of rule R is moved into the costs with multiplier M
 * shift V L S          S is moved from V to its pair with the variable that literal L begins
 * skip V               by the rows and shifts before it, plans with V are of no interest
 * close cost           by the rows and shifts before it, no plan below is of interest; level up
 * close rules          rules leave nothing below; level up
 * </pre>
 *
 * Rows and shifts hold until the next skip or close. The proof is complete when the root is closed.
 */
final class ProofLog {
  static final ProofLog NONE = new ProofLog(Optional.empty());

  private final Optional<Consumer<String>> lines;

  private ProofLog(Optional<Consumer<String>> lines) {
    this.lines = lines;
  }

  static ProofLog to(Consumer<String> lines) {
    return new ProofLog(Optional.of(lines));
  }

  /** Whether anything is written. */
  boolean on() {
    return lines.isPresent();
  }

  private void line(String text) {
    lines.ifPresent(out -> out.accept(text));
  }

  void unit(Network network) {
    if (on()) {
      line("unit " + network.scale.unit());
    }
  }

  void root() {
    line("root");
  }

  void take(Network network, int value) {
    if (on()) {
      line("take " + network.variables.inWords(value));
    }
  }

  void cut(Network network, int value) {
    if (on()) {
      line("cut " + network.variables.inWords(value));
    }
  }

  void plan(State literals) {
    if (on()) {
      line("plan " + literals.toText());
    }
  }

  /** Plans with a value that may still be taken cost too much. */
  void skip(Network network, Partial partial, int value) {
    if (on()) {
      moves(network, partial);
      line("skip " + network.variables.inWords(value));
    }
  }

  /** Every value of a variable has been dealt with. */
  void exhausted() {
    line("close rules");
  }

  /** Nothing below is of interest: a variable has no value left, or the bound tells. */
  void close(Network network, Partial partial, long limit) {
    if (!on()) {
      return;
    }
    boolean bound = partial.bound() > limit;
    if (bound) {
      moves(network, partial);
    }
    line(bound ? "close cost" : "close rules");
  }

  private void moves(Network network, Partial partial) {
    for (int r = 0; r < network.rows.length; r++) {
      if (partial.multipliers[r] != 0) {
        line("row " + network.rows[r].number + " " + partial.multipliers[r]);
      }
    }
    for (Pair pair : network.pairs) {
      int rows = network.variables.values(pair.one());
      shifts(network, partial, pair.one(), pair.other(), pair.shift());
      shifts(network, partial, pair.other(), pair.one(), pair.shift() + rows);
    }
  }

  private void shifts(Network network, Partial partial, int variable, int other, int shift) {
    Variables variables = network.variables;
    int begins = variables.literal(variables.first(other));
    for (int a = 0; a < variables.values(variable); a++) {
      long moved = partial.shifts[shift + a];
      if (moved != 0) {
        line(
            "shift "
                + variables.inWords(variables.first(variable) + a)
                + " "
                + begins
                + " "
                + moved);
      }
    }
  }
}
