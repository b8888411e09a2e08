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
    boolean whole = set(state, Pace.free());
    assert whole : "a free pace never ends";
  }

  /** Moves to a state; if the pace ends that, returns false, and the fields are of no use. */
  public boolean set(State state, Pace pace) {
    for (int i = 0; i < spin.length; i++) {
      spin[i] = state.spin(rows.variable(i));
    }
    return refresh(pace);
  }

  /**
   * Computes the fields afresh from the form's coefficients; O(n + m). If the pace ends that,
   * returns false, and some fields are as they were.
   */
  public boolean refresh(Pace pace) {
    int[] portion = rows.portions();
    for (int p = 0; p + 1 < portion.length; p++) {
      int from = portion[p];
      int to = portion[p + 1];
      refresh(from, to);
      if (pace.after((long) to - from + rows.start()[to] - rows.start()[from])) {
        return false;
      }
    }
    return true;
  }

  private void refresh(int from, int to) {
    int[] start = rows.start();
    int[] neighbour = rows.neighbour();
    double[] weight = rows.weight();
    double[] linear = rows.linear();
    for (int i = from; i < to; i++) {
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

  /**
   * The energy of the state as it is now, by its fields: as the form values it, up to rounding;
   * O(n).
   */
  public double energy() {
    double[] linear = rows.linear();
    double twice = 0;
    for (int i = 0; i < field.length; i++) {
      // Half of 1 - spin is x: pairs stand in the fields of both their variables.
      twice += (1 - spin[i]) * (linear[i] + field[i]);
    }
    return rows.constant() + twice / 4;
  }

  /** The state as it is now. */
  public State state() {
    long[] words = new long[(spin.length + 63) >>> 6];
    if (rows.rearranged()) {
      for (int p = 0; p < spin.length; p++) {
        int i = rows.variable(p);
        words[i >> 6] |= Double.doubleToRawLongBits(spin[p]) >>> 63 << i;
      }
      return State.ofWords(spin.length, words);
    }
    for (int w = 0; w < words.length; w++) {
      words[w] = word(spin, w << 6, Math.min(spin.length, (w + 1) << 6));
    }
    return State.ofWords(spin.length, words);
  }

  private static long word(double[] spin, int from, int to) {
    long word = 0;
    for (int i = from; i < to; i++) {
      word |= (Double.doubleToRawLongBits(spin[i]) >>> 63) << i;
    }
    return word;
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
