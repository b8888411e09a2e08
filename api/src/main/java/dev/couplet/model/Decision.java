package dev.couplet.model;

/**
 * Something a plan has to settle. Made by a {@link Model}, which owns it; decisions are compared by
 * identity.
 */
public sealed interface Decision permits Bit, Spin, Count, Choice, Order, Subset {
  /** The name, unique in the model. */
  String name();

  /** The number of values to choose from; the largest long if there are more. */
  long values();

  /**
   * The words under which plans and lowerings speak of the condition that the decision has one
   * value, as they speak of a rule by its name.
   */
  default String code() {
    return "one value of '" + name() + "'";
  }
}
