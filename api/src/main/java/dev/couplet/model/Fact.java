package dev.couplet.model;

/** One of the facts that a decision settles, such as that a choice is one of its options. */
final class Fact extends Literal {
  private final Decision decision;
  private final Slot slot;
  private final int position;

  Fact(Decision decision, Slot slot, int position) {
    this.decision = decision;
    this.slot = slot;
    this.position = position;
  }

  @Override
  int index() {
    return slot.first() + position;
  }

  @Override
  boolean negated() {
    return false;
  }

  @Override
  Model owner() {
    return slot.owner();
  }

  @Override
  public String toString() {
    return describe(decision, position);
  }

  /** The literal of a decision at a position in words. */
  static String describe(Decision decision, int position) {
    if (decision instanceof Choice<?> choice) {
      return choice.name() + " = " + choice.options().get(position);
    } else if (decision instanceof Spin) {
      return decision.name() + " down";
    } else if (decision instanceof Count count) {
      return count.digits()[position] + " of '" + count.name() + "'";
    } else if (decision instanceof Order<?> order) {
      Object item = order.items().get(position % order.items().size());
      return order.name() + " " + position / order.items().size() + " = " + item;
    } else if (decision instanceof Subset<?> subset) {
      return subset.name() + " has " + subset.items().get(position);
    }
    return decision.name();
  }
}
