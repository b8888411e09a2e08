package dev.couplet.audit;

import dev.couplet.model.Decision;
import java.util.List;

/**
 * Bits that stand together for a fact or a value: one group of a decision of which exactly one
 * literal holds, or all literals of a decision without groups.
 *
 * @param decision what it belongs to
 * @param firstLiteral the first of its literals, which follow each other
 * @param literals how many there are
 * @param firstBit the first of its bits, which follow each other
 * @param bits how many there are
 * @param grouped whether exactly one of the literals holds under every plan
 * @param values where the bits are not the literals, the literals that hold under each pattern of
 *     the bits, none for a pattern that stands for no value; empty where they are
 */
record CodedUnit(
    Decision decision,
    int firstLiteral,
    int literals,
    int firstBit,
    int bits,
    boolean grouped,
    List<List<Integer>> values) {
  /** The mark of a pattern that stands for no value. */
  static final List<Integer> BROKEN = List.of(-1);

  /** Whether bit k is literal k. */
  boolean plain() {
    return values.isEmpty();
  }

  boolean valid(int pattern) {
    return !values.get(pattern).equals(BROKEN);
  }

  /** How many different values patterns stand for, where the bits are not the literals. */
  long different() {
    return values.stream().filter(value -> !value.equals(BROKEN)).distinct().count();
  }

  /** How many there should be. */
  long wanted() {
    return grouped ? literals : decision.values();
  }
}
