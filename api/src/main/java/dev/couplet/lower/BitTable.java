package dev.couplet.lower;

import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.List;

/**
 * The bits of the form being built: one for each literal of the model, then the auxiliary ones,
 * each with its meaning and a way to set it best once the bits before it are known.
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

  BitTable(Statement statement) {
    decisionBits = statement.literals();
    for (int literal = 0; literal < decisionBits; literal++) {
      meanings.add(statement.describe(literal));
    }
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
