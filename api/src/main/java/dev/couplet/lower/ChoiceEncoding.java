package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.util.List;

/**
 * How a decision for one of several options becomes bits. Implementations are immutable and give
 * the same code for the same number every time.
 */
public interface ChoiceEncoding {
  /** The name, for reports. */
  String name();

  /** The code of a choice among so many options, at least 1. */
  Code code(int options);

  /** One bit an option, exactly one of them at 1. */
  static ChoiceEncoding oneHot() {
    return new OneHot();
  }

  /**
   * One bit less than options, ones before zeros; few pairs, and products of options keep degree 2.
   * Source: Chancellor, "Domain wall encoding of discrete variables for quantum annealing and QAOA"
   * (2019).
   */
  static ChoiceEncoding domainWall() {
    return new DomainWall();
  }

  /**
   * The number of the option in binary: fewest bits and no penalty, but products of options have a
   * high degree, which takes auxiliary bits. For choices that few rules speak of.
   */
  static ChoiceEncoding binary() {
    return new BinaryCode();
  }

  /**
   * A code over its own bits, numbered from 0.
   *
   * @param bits how many there are
   * @param options for each option the polynomial that is 1 where the bits stand for it and 0 where
   *     they stand for another one; patterns that stand for none may give it any whole value
   * @param patterns for each option the pattern that a plan is written with
   * @param penalty 0 where the bits stand for an option, 1 or more elsewhere; of degree 2 at most
   * @param form how the penalty was made, in words
   */
  record Code(
      int bits, List<Polynomial> options, List<State> patterns, Polynomial penalty, String form) {
    /**
     * Checks the code on its patterns; options times the terms of the penalty and options.
     *
     * @throws IllegalArgumentException naming the first option for which it does not hold
     */
    public Code {
      options = List.copyOf(options);
      patterns = List.copyOf(patterns);
      for (int option = 0; option < options.size(); option++) {
        State pattern = patterns.get(option);
        if (stoodFor(options, pattern) != option || penalty.value(pattern) != 0) {
          throw new IllegalArgumentException(
              "the code's pattern "
                  + pattern
                  + " of option "
                  + option
                  + " makes another polynomial than its own hold, or its penalty is not 0");
        }
      }
    }

    /** The option that a pattern stands for, -1 if it stands for none. */
    int stoodFor(State pattern) {
      return stoodFor(options, pattern);
    }

    private static int stoodFor(List<Polynomial> options, State pattern) {
      int found = -1;
      for (int option = 0; option < options.size(); option++) {
        double value = options.get(option).value(pattern);
        if (value != 0 && (value != 1 || found >= 0)) {
          return -1;
        }
        found = value == 1 ? option : found;
      }
      return found;
    }
  }
}
