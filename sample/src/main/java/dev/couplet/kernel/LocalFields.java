package dev.couplet.kernel;

import dev.couplet.form.State;
import java.util.Arrays;
import java.util.SplittableRandom;

/**
 * One state of a form, with the local field of every variable kept up to date.
 *
 * <p>Invariant: {@code field[i] = linear[i] + sum_j weight_ij x_j} (up to rounding, if the form's
 * sums are not exact) and {@code spin[i] = 1 - 2 x_i}; so {@code spin[i] * field[i]} is the change
 * of energy if i flips. A flip costs the degree of its variable. Belongs to one thread.
 */
public final class LocalFields {
  private final Adjacency rows;
  private final double[] spin;
  private final double[] field;

  /** The state of zeros. */
  public LocalFields(Adjacency rows) {
    this.rows = rows;
    this.spin = new double[rows.size()];
    this.field = rows.linear().clone();
    Arrays.fill(spin, 1);
  }

  /** A uniformly random state; takes ceil(n / 64) numbers from the generator. */
  public static State random(int size, SplittableRandom random) {
    long[] words = new long[(size + 63) >>> 6];
    for (int w = 0; w < words.length; w++) {
      words[w] = random.nextLong();
    }
    if ((size & 63) != 0) {
      words[words.length - 1] &= (1L << size) - 1;
    }
    return State.ofWords(size, words);
  }

  /** Moves to a state; O(n + m). */
  public void set(State state) {
    for (int i = 0; i < spin.length; i++) {
      spin[i] = state.spin(i);
    }
    refresh();
  }

  /** Computes the fields afresh from the form's coefficients; O(n + m). */
  public void refresh() {
    int[] start = rows.start();
    int[] neighbour = rows.neighbour();
    double[] weight = rows.weight();
    double[] linear = rows.linear();
    for (int i = 0; i < field.length; i++) {
      double sum = linear[i];
      for (int k = start[i]; k < start[i + 1]; k++) {
        if (spin[neighbour[k]] < 0) {
          sum += weight[k];
        }
      }
      field[i] = sum;
    }
  }

  /** The change of energy if variable {@code i} flips. */
  public double gain(int i) {
    return spin[i] * field[i];
  }

  /** Flips variable {@code i}. */
  public void flip(int i) {
    int[] start = rows.start();
    int[] neighbour = rows.neighbour();
    double[] weight = rows.weight();
    double before = spin[i];
    spin[i] = -before;
    for (int k = start[i], end = start[i + 1]; k < end; k++) {
      field[neighbour[k]] += weight[k] * before;
    }
  }

  /** The state as it is now. */
  public State state() {
    long[] words = new long[(spin.length + 63) >>> 6];
    for (int i = 0; i < spin.length; i++) {
      if (spin[i] < 0) {
        words[i >> 6] |= 1L << i;
      }
    }
    return State.ofWords(spin.length, words);
  }

  /** The number of variables. */
  public int size() {
    return spin.length;
  }

  Adjacency rows() {
    return rows;
  }

  double[] spins() {
    return spin;
  }

  double[] fields() {
    return field;
  }
}
