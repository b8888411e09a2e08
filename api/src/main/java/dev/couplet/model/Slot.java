package dev.couplet.model;

/**
 * Where the literals of a decision stand among those of its model, and how many of them hold
 * together.
 *
 * <p>With {@code groups} above 0 the literals are cut, in order, into so many groups of equal size,
 * and a plan makes exactly one literal of each hold; with 0 every pattern of them is a value.
 *
 * @param owner the model
 * @param first the number of the first literal
 * @param literals how many there are
 * @param groups how many groups of which exactly one holds
 */
record Slot(Model owner, int first, int literals, int groups) {
  static Slot of(Decision decision) {
    if (decision instanceof Bit bit) {
      return new Slot(bit.owner(), bit.index(), 1, 0);
    }
    if (decision instanceof Choice<?> choice) {
      return choice.slot();
    } else if (decision instanceof Spin spin) {
      return spin.slot();
    } else if (decision instanceof Count count) {
      return count.slot();
    } else if (decision instanceof Order<?> order) {
      return order.slot();
    }
    return ((Subset<?>) decision).slot();
  }

  /** The number of literals in each group; 0 without groups. */
  int groupSize() {
    return groups == 0 ? 0 : literals / groups;
  }

  /**
   * The number of the first literal in the group of a literal of this decision; it needs groups.
   */
  int groupOf(int literal) {
    return literal - (literal - first) % groupSize();
  }
}
