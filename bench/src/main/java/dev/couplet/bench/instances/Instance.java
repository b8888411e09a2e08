package dev.couplet.bench.instances;

import dev.couplet.form.Qubo;
import dev.couplet.model.Statement;
import dev.couplet.model.Statement.Sense;

/**
 * One problem that stands in a file or comes from a generator: a form as it stands, or a model that
 * is still to be lowered.
 *
 * <p>Values are those of the file, in its own sense and units. Immutable.
 */
public sealed interface Instance {
  /** The name it is published under: the file's, without folder and ending. */
  String name();

  /**
   * A problem that is a form to be minimised.
   *
   * <p>Energies are those of the form. Where a problem is to be maximised, value and energy are
   * each other with the sign changed.
   *
   * @param name the name it is published under
   * @param form the form, to be minimised
   * @param sense whether the file's own values are to be low or high
   */
  record OfForm(String name, Qubo form, Sense sense) implements Instance {
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

  /**
   * A problem with rules: a plan's value is one in the file's own sense and units.
   *
   * @param name the name it is published under
   * @param statement decisions, rules and objective
   */
  record OfModel(String name, Statement statement) implements Instance {}
}
