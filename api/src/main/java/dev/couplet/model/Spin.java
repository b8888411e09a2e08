package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;

/**
 * A decision between up and down, worth +1 and -1 as an expression, for models that are stated the
 * way physics does.
 */
@CheckReturnValue
public final class Spin extends Expr implements Decision {
  private final String name;
  private final Slot slot;

  Spin(Model owner, String name, int literal) {
    this.name = name;
    this.slot = new Slot(owner, literal, 1, 0);
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public long values() {
    return 2;
  }

  /** The fact that the spin is up, +1. */
  public Literal up() {
    return down().not();
  }

  /** The fact that the spin is down, -1. */
  public Literal down() {
    return new Fact(this, slot, 0);
  }

  /** 1 where it is up, 1 - 2 where it is down. */
  Expr inLiterals() {
    return constant(1).plus(down().times(-2));
  }

  Slot slot() {
    return slot;
  }

  @Override
  Model owner() {
    return slot.owner();
  }

  @Override
  public String toString() {
    return name;
  }
}
