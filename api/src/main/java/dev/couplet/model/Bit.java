package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;

/** A yes/no decision, and the literal that holds where the answer is yes. */
@CheckReturnValue
public final class Bit extends Literal implements Decision {
  private final Model owner;
  private final String name;
  private final int index;

  Bit(Model owner, String name, int index) {
    this.owner = owner;
    this.name = name;
    this.index = index;
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public long values() {
    return 2;
  }

  @Override
  int index() {
    return index;
  }

  @Override
  boolean negated() {
    return false;
  }

  @Override
  Model owner() {
    return owner;
  }

  @Override
  public String toString() {
    return name;
  }
}
