package dev.couplet.model;

/** The fact that a choice is one of its options. */
final class ChoiceLiteral extends Literal {
  private final Choice<?> choice;
  private final int option;

  ChoiceLiteral(Choice<?> choice, int option) {
    this.choice = choice;
    this.option = option;
  }

  @Override
  int index() {
    return choice.firstLiteral() + option;
  }

  @Override
  boolean negated() {
    return false;
  }

  @Override
  Model owner() {
    return choice.owner();
  }

  @Override
  public String toString() {
    return choice.name() + " = " + choice.options().get(option);
  }
}
