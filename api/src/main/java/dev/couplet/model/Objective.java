package dev.couplet.model;

import dev.couplet.form.Polynomial;

/**
 * One named part of what a model minimises or maximises.
 *
 * @param name the name, unique in the model
 * @param terms a polynomial over the model's literals, in the model's own sense
 */
public record Objective(String name, Polynomial terms) {
  Objective inLiterals(int literals) {
    return new Objective(name, terms.inVariables(literals));
  }
}
