package dev.couplet.bench.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.Couplings;
import dev.couplet.bench.instances.Torus;
import dev.couplet.form.Ising;
import java.util.Arrays;
import java.util.SplittableRandom;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;

/**
 * The schedule of the verb {@code rate} against a plain twin: sites in turn, flipped if that costs
 * nothing or else with probability exp(-cost times inverse temperature).
 *
 * <p>Ten sweeps leave every draw well above the minimum, at a height that the schedule decides.
 * Over 16,000 draws the standard error of a mean is 0.00054, that of a difference 0.00076; four of
 * those are allowed. With its end at 2.5 instead of 3 the mean lies 0.0066 lower, with geometric
 * steps 0.014 higher, on a straight line of the temperature 0.195 higher (measured).
 */
class RateScheduleTest {
  private static final int DRAWS = 16_000;
  private static final int SWEEPS = 10;
  private static final double ALLOWED = 0.003;
  private static final String LATTICE = "torus:6x6x6";
  private static final Ising FORM = Torus.parse(LATTICE).couple(Couplings.integers(2), 3);

  @Test
  void theInverseTemperatureGrowsEvenlyFromATenthToThree() {
    String options = "--couplings 2 --seed 3 --draws " + DRAWS + " --sweeps " + SWEEPS;
    CommandRun run = CommandRun.of(("rate --lattice " + LATTICE + " " + options).split(" "));
    double mean = run.number("mean_per_spin");
    assertEquals(twin(passed -> 0.1 + 2.9 * passed), mean, ALLOWED);
    double otherEnd = twin(passed -> 0.1 + 2.4 * passed);
    assertTrue(
        Math.abs(otherEnd - mean) > ALLOWED, "another end would not be noticed: " + otherEnd);
  }

  /** The mean energy a spin; the inverse temperature times the root mean square is given. */
  private static double twin(DoubleUnaryOperator schedule) {
    int n = FORM.size();
    int[][] neighbour = new int[n][0];
    double[][] coupling = new double[n][0];
    double[] square = {0};
    FORM.forEachPair(
        (i, j, value) -> {
          square[0] += value * value;
          neighbour[i] = append(neighbour[i], j);
          neighbour[j] = append(neighbour[j], i);
          coupling[i] = append(coupling[i], value);
          coupling[j] = append(coupling[j], value);
        });
    double unit = Math.sqrt(square[0] / FORM.pairs());
    SplittableRandom random = new SplittableRandom(77);
    double sum = 0;
    for (int d = 0; d < DRAWS; d++) {
      sum += annealed(neighbour, coupling, p -> schedule.applyAsDouble(p) / unit, random);
    }
    return sum / n / DRAWS;
  }

  private static double annealed(
      int[][] neighbour,
      double[][] coupling,
      DoubleUnaryOperator schedule,
      SplittableRandom random) {
    int n = coupling.length;
    int[] spin = new int[n];
    for (int i = 0; i < n; i++) {
      spin[i] = random.nextBoolean() ? 1 : -1;
    }
    for (int t = 0; t < SWEEPS; t++) {
      double inverse = schedule.applyAsDouble(t / (SWEEPS - 1.0));
      for (int i = 0; i < n; i++) {
        double cost = -2 * spin[i] * field(neighbour[i], coupling[i], spin);
        if (cost <= 0 || random.nextDouble() < Math.exp(-inverse * cost)) {
          spin[i] = -spin[i];
        }
      }
    }
    double energy = 0;
    for (int i = 0; i < n; i++) {
      energy += spin[i] * field(neighbour[i], coupling[i], spin) / 2;
    }
    return energy;
  }

  private static double field(int[] neighbours, double[] couplings, int[] spin) {
    double field = 0;
    for (int k = 0; k < neighbours.length; k++) {
      field += couplings[k] * spin[neighbours[k]];
    }
    return field;
  }

  private static int[] append(int[] array, int value) {
    int[] longer = Arrays.copyOf(array, array.length + 1);
    longer[array.length] = value;
    return longer;
  }

  private static double[] append(double[] array, double value) {
    double[] longer = Arrays.copyOf(array, array.length + 1);
    longer[array.length] = value;
    return longer;
  }
}
