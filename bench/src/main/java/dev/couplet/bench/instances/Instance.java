package dev.couplet.bench.instances;

import dev.couplet.form.Qubo;
import dev.couplet.model.Sense;

/**
 * One problem that stands in a file or comes from a generator, as a form to be minimised.
 *
 * <p>Values are those of the file, in its own sense and units; energies are those of the form.
 * Where a problem is to be maximised, the one is the other with its sign changed. Immutable.
 *
 * @param name the name it is published under: the file's, without folder and ending
 * @param form the form, to be minimised
 * @param sense whether the file's own values are to be low or high
 */
public record Instance(String name, Qubo form, Sense sense) {
  /** The value, in the file's own sense and units, of a state of this energy. */
  public double value(double energy) {
    return turn(energy);
  }

  /** The energy of a state of this value. */
  public double energy(double value) {
    return turn(value);
  }

  /** Adding zero turns a negative zero into zero. */
  private double turn(double number) {
    return sense.sign() * number + 0.0;
  }
}
