package dev.couplet.examples.rounds;

import java.util.Optional;

/** The kinds of rules that the model has. */
enum RuleKind {
  LOAD("load of a van"),
  TOGETHER("villages that share a van"),
  APART("villages kept apart"),
  WISH("wish");

  private final String words;

  RuleKind(String words) {
    this.words = words;
  }

  /** What a rule of a kind is about; a rule of none is the code of a choice. */
  static String words(Optional<RuleKind> kind) {
    return kind.map(known -> known.words).orElse("one van for a village");
  }
}
