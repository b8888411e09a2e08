package dev.couplet.bound;

import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Vigil;

/**
 * The state of one semidefinite bound in work. Spin 0 stands for the constant +1, so that fields
 * are couplings to it; spin i + 1 is bit i.
 */
final class SemidefiniteRounds {
  private static final int FIRST_SWEEPS = 60;
  private static final int SWEEPS = 6;
  private static final int RENEW_EVERY = 5;
  private static final double LEAST_SHARE = 0.2;

  private final Qubo form;
  private final ScaledForm scaled;
  private final double constant;
  private final double conversion;
  private final int size;
  private final double[][] coupling;
  private final double[][] matrix;
  private final UnitVectors vectors;
  private final Triangles triangles;
  private final PositiveTest test;
  private double goal;

  /** How far a step goes, as a share of what it would take to close the gap at once. */
  private double share = 1;

  private double estimate = Double.NEGATIVE_INFINITY;
  private int round;

  /**
   * Begins a bound.
   *
   * @param enough an energy that the bound need not exceed
   */
  SemidefiniteRounds(Qubo form, double enough, Vigil vigil) {
    this.form = form;
    this.goal = enough;
    scaled = new ScaledForm(form);
    Ising spins = form.toIsing();
    constant = spins.constant();
    conversion = Rounding.ofSums(form, (long) form.size() + form.pairs() + 8);
    size = form.size() + 1;
    coupling = new double[size][size];
    for (int i = 1; i < size; i++) {
      coupling[0][i] = coupling[i][0] = spins.linear(i - 1) / 2;
    }
    spins.forEachPair((i, j, value) -> coupling[i + 1][j + 1] = coupling[j + 1][i + 1] = value / 2);
    matrix = new double[size][];
    vectors = new UnitVectors(size, vigil);
    triangles = new Triangles(size, 8 * size, vigil);
    test = new PositiveTest(size, vigil);
    refill();
  }

  private void refill() {
    for (int i = 0; i < size; i++) {
      matrix[i] = coupling[i].clone();
    }
    triangles.subtractFrom(matrix);
  }

  /** What the bound need not exceed: the lowest energy seen, unless less is enough. */
  double goal() {
    return goal;
  }

  /** Minimises over the vectors, then moves the multipliers. */
  void round() {
    if (round > 0) {
      triangles.step(vectors, share * Math.max(0, goal - estimate));
      if (round % RENEW_EVERY == 1) {
        triangles.renew(vectors);
      }
      refill();
    }
    double value = 0;
    for (int sweep = round == 0 ? FIRST_SWEEPS : SWEEPS; sweep > 0; sweep--) {
      value = vectors.sweep(matrix);
    }
    double now = constant + value - triangles.total();
    if (now < estimate) {
      share = Math.max(LEAST_SHARE, 0.95 * share);
    }
    estimate = now;
    round++;
    goal = Math.min(goal, rounded());
  }

  /** The energy of the spins on either side of the constant one. */
  private double rounded() {
    boolean[] values = new boolean[form.size()];
    for (int i = 0; i < values.length; i++) {
      values[i] = vectors.product(0, i + 1) < 0;
    }
    return form.value(State.of(values));
  }

  /**
   * The bound that the present multipliers and vectors prove. For diagonal entries y with {@code
   * matrix + diag(y) + d I} without negative eigenvalues, no energy of the spins is below {@code
   * -sum y - n d}.
   */
  double certified() {
    vectors.measure(matrix);
    double shift = test.shift(matrix, vectors.pull);
    double sum = 0;
    double magnitude = Math.abs(constant);
    for (int i = 0; i < size; i++) {
      sum += vectors.pull[i];
      magnitude += vectors.pull[i] + shift;
      for (int j = 0; j < size; j++) {
        magnitude += Math.abs(coupling[i][j]);
      }
    }
    magnitude += 8 * triangles.total();
    // Sums here, and those of the matrix, to which each triangle adds one term an entry.
    double rounding = (4.0 * size + triangles.active() + 16) * 0x1p-52 * magnitude;
    double bound = constant - sum - size * shift - triangles.total() - rounding - conversion;
    return scaled.raised(bound);
  }
}
