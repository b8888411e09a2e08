package dev.couplet.model;

/** The negation of a bit or of a choice's option. */
final class Negation extends Literal {
  private final Literal fact;

  Negation(Literal fact) {
    this.fact = fact;
  }

  @Override
  int index() {
    return fact.index();
  }

  @Override
  boolean negated() {
    return true;
  }

  @Override
  Model owner() {
    return fact.owner();
  }

  @Override
  public Literal not() {
    return fact;
  }

  @Override
  public String toString() {
    return "not " + fact;
  }
}
