package dev.couplet.model;

/**
 * A rule that a plan does not keep.
 *
 * @param rule the rule's name; for a choice without exactly one option, words that name the choice
 * @param required whether a plan that breaks it is infeasible
 * @param amount by how much it is missed, in the units of its condition
 * @param cost what that costs: amount times cost per unit for a preferred rule, else 0
 */
public record Unmet(String rule, boolean required, double amount, double cost) {
  @Override
  public String toString() {
    String text = rule + ": missed by " + Text.number(amount);
    return required ? text : text + ", cost " + Text.number(cost);
  }
}
