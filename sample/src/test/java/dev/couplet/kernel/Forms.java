package dev.couplet.kernel;

import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import java.util.SplittableRandom;

/** Forms for the tests of this module. */
public final class Forms {
  private Forms() {}

  /** Integer coefficients from -range to range; each pair is there with the given probability. */
  public static Qubo integers(int size, double density, int range, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Qubo.Builder form = Qubo.builder(size).addConstant(random.nextInt(-range, range + 1));
    for (int i = 0; i < size; i++) {
      form.addLinear(i, random.nextInt(-range, range + 1));
      for (int j = i + 1; j < size; j++) {
        if (random.nextDouble() < density) {
          form.addPair(i, j, random.nextInt(-range, range + 1));
        }
      }
    }
    return form.build();
  }

  /** Real coefficients, uniform on -1..1. */
  public static Qubo reals(int size, double density, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Qubo.Builder form = Qubo.builder(size);
    for (int i = 0; i < size; i++) {
      form.addLinear(i, random.nextDouble(-1, 1));
      for (int j = i + 1; j < size; j++) {
        if (random.nextDouble() < density) {
          form.addPair(i, j, random.nextDouble(-1, 1));
        }
      }
    }
    return form.build();
  }

  /** A ring with chords: twice as many pairs as variables. */
  public static Qubo ring(int size) {
    Qubo.Builder form = Qubo.builder(size);
    for (int i = 0; i < size; i++) {
      form.addLinear(i, i % 3 - 1);
      form.addPair(i, (i + 1) % size, 1);
      form.addPair(i, (i + 1001) % size, -1);
    }
    return form.build();
  }

  /** A square lattice with periodic borders of spins that are aligned by couplings of -1. */
  public static Qubo ferromagnet(int side) {
    Ising.Builder form = Ising.builder(side * side);
    for (int r = 0; r < side; r++) {
      for (int c = 0; c < side; c++) {
        form.addPair(side * r + c, side * r + (c + 1) % side, -1);
        form.addPair(side * r + c, side * ((r + 1) % side) + c, -1);
      }
    }
    return form.build().toQubo();
  }

  /** A cubic lattice with periodic borders, couplings -1 or +1 at random. */
  public static Qubo spinGlass(int side, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Ising.Builder form = Ising.builder(side * side * side);
    for (int x = 0; x < side; x++) {
      for (int y = 0; y < side; y++) {
        for (int z = 0; z < side; z++) {
          int i = (x * side + y) * side + z;
          form.addPair(i, ((x + 1) % side * side + y) * side + z, 2 * random.nextInt(2) - 1);
          form.addPair(i, (x * side + (y + 1) % side) * side + z, 2 * random.nextInt(2) - 1);
          form.addPair(i, (x * side + y) * side + (z + 1) % side, 2 * random.nextInt(2) - 1);
        }
      }
    }
    return form.build().toQubo();
  }

  /** The lowest energy, by enumeration. */
  public static double minimum(Qubo form) {
    double best = Double.POSITIVE_INFINITY;
    for (long bits = 0; bits < 1L << form.size(); bits++) {
      best = Math.min(best, form.value(state(form.size(), bits)));
    }
    return best;
  }

  /** The state whose variable i is bit i of a number. */
  public static State state(int size, long bits) {
    return size == 0 ? State.zeros(0) : State.ofWords(size, bits);
  }

  /** Whether no single flip lowers the energy by more than the given slack. */
  public static boolean localMinimum(Qubo form, State state, double slack) {
    double energy = form.value(state);
    for (int i = 0; i < form.size(); i++) {
      if (form.value(state.with(i, !state.get(i))) < energy - slack) {
        return false;
      }
    }
    return true;
  }
}
