package dev.couplet.lower;

import java.util.ArrayList;
import java.util.List;

/**
 * The bits of the form being built: those of the decisions, then the auxiliary ones, each with its
 * meaning and a way to set it best once the bits before it are known.
 */
final class BitTable {
  /** Sets auxiliary bits to their best values, given all bits before them. */
  @FunctionalInterface
  interface Completion {
    void complete(boolean[] bits);
  }

  private final int decisionBits;
  private final List<String> meanings = new ArrayList<>();
  private final List<Completion> completions = new ArrayList<>();

  BitTable(Coding coding) {
    decisionBits = coding.bits();
    meanings.addAll(coding.meanings());
  }

  /** Adds an auxiliary bit and returns its number. */
  int add(String meaning) {
    meanings.add(meaning);
    return meanings.size() - 1;
  }

  /** Remembers how to set auxiliary bits; called after all bits it reads have been added. */
  void completeWith(Completion completion) {
    completions.add(completion);
  }

  int size() {
    return meanings.size();
  }

  int decisionBits() {
    return decisionBits;
  }

  List<String> meanings() {
    return List.copyOf(meanings);
  }

  List<Completion> completions() {
    return List.copyOf(completions);
  }
}
