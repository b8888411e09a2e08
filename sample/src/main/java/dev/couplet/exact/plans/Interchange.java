package dev.couplet.exact.plans;

import java.util.Arrays;
import java.util.List;

/**
 * Options of several choices that a statement treats alike: swapping two of them in every choice
 * changes nothing. As long as neither of two such options has been taken, the plans with the one
 * are those with the other, renamed, and only one need be tried.
 *
 * <p>Source: Law and Lee, "Global constraints for integer and set value precedence" (2004); here
 * options precede each other in the order in which a walk takes them, so that the walk is free to
 * choose which variable comes next. Immutable.
 */
final class Interchange {
  private final int[] optionOf;
  private final int[] classOf;
  private final List<String> found;

  /**
   * What is alike.
   *
   * @param optionOf the option that each value is, -1 if it is none of a choice
   * @param classOf the class of each option; options of one class are alike
   * @param found the classes of two options and more, in words
   */
  Interchange(int[] optionOf, int[] classOf, List<String> found) {
    this.optionOf = optionOf;
    this.classOf = classOf;
    this.found = List.copyOf(found);
  }

  /** Nothing is alike. */
  static Interchange none(Variables variables) {
    int[] options = new int[variables.values()];
    Arrays.fill(options, -1);
    return new Interchange(options, new int[0], List.of());
  }

  /** The classes of two options and more, in words. */
  List<String> found() {
    return found;
  }

  /** Whether a value is like one of those listed, and neither option is among those taken. */
  boolean likeAnother(int value, int[] listed, int count, int[] taken) {
    int option = optionOf[value];
    if (found.isEmpty() || option < 0 || among(option, taken)) {
      return false;
    }
    for (int k = 0; k < count; k++) {
      int other = optionOf[listed[k]];
      if (classOf[other] == classOf[option] && !among(other, taken)) {
        return true;
      }
    }
    return false;
  }

  private boolean among(int option, int[] taken) {
    for (int value : taken) {
      if (optionOf[value] == option) {
        return true;
      }
    }
    return false;
  }
}
