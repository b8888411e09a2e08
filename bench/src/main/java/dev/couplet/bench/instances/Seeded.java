package dev.couplet.bench.instances;

import dev.couplet.form.Qubo;
import dev.couplet.form.Qubo.PairVisitor;
import dev.couplet.model.Statement.Sense;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/**
 * Binary quadratic programmes that are published as a seed and a density, from which anybody
 * generates the same entries: maximise {@code sum q_ii x_i + 2 sum_{i<j} q_ij x_i x_j}.
 *
 * <p>The generator multiplies its state s by 16807 modulo 2^31 - 1, its number is u = s / 2^31. For
 * each row i in order: one number for q_ii = floor(201 u) - 100; then for each j > i one number for
 * the choice of the pair, taken if 100 u, rounded to single precision, is at most the density, and
 * if taken one more for q_ij, like q_ii. The single precision matters: in double precision some of
 * the published instances come out otherwise. Time O(n^2), memory that of the form. Immutable.
 *
 * <p>Source: Palubeckis, "Multistart tabu search strategies for the unconstrained binary quadratic
 * optimization problem" (2004) and "Iterated tabu search for the unconstrained binary quadratic
 * optimization problem" (2006).
 *
 * @param name what it is called
 * @param size the number of variables n
 * @param density how many of the pairs are taken, in percent
 * @param seed where the generator starts
 */
public record Seeded(String name, int size, int density, long seed) {
  private static final long MODULUS = Integer.MAX_VALUE;
  private static final long FACTOR = 16807;
  private static final double DIVISOR = 0x1p31;
  private static final int[] DENSITIES = {50, 80, 80, 100, 100};

  private static final List<Seeded> PUBLISHED =
      Stream.of(numbered(3000, 5), numbered(4000, 5), numbered(5000, 4)).flatMap(s -> s).toList();

  /** Refuses what the generator cannot do, naming the value. */
  public Seeded {
    if (size < 0) {
      throw new IllegalArgumentException("the size is " + size + ", it must be 0 or more");
    }
    if (density < 0 || density > 100) {
      throw new IllegalArgumentException("the density is " + density + ", it must be 0 to 100");
    }
    if (seed < 1 || seed >= MODULUS) {
      throw new IllegalArgumentException(
          "the seed is " + seed + ", it must be 1 to " + (MODULUS - 1));
    }
  }

  private static Stream<Seeded> numbered(int size, int last) {
    return IntStream.rangeClosed(1, last)
        .mapToObj(
            k -> new Seeded("p" + size + "." + k, size, DENSITIES[k - 1], 10L * size + 1000L * k));
  }

  /** The published instances, p3000.1 to p5000.4. */
  public static List<Seeded> published() {
    return PUBLISHED;
  }

  /**
   * The instance of a published name, or of {@code N:DENSITY:SEED}.
   *
   * @throws IllegalArgumentException if the text is neither
   */
  public static Seeded parse(String text) {
    for (Seeded candidate : PUBLISHED) {
      if (candidate.name.equals(text)) {
        return candidate;
      }
    }
    if (!text.matches("\\d{1,9}:\\d{1,3}:\\d{1,10}")) {
      throw new IllegalArgumentException(
          "'" + text + "' names no seeded instance; say p3000.1 to p5000.4, or N:DENSITY:SEED");
    }
    String[] parts = text.split(":", -1);
    return new Seeded(
        text, Integer.parseInt(parts[0]), Integer.parseInt(parts[1]), Long.parseLong(parts[2]));
  }

  /**
   * Passes on the entries that the generator takes, row by row, indices from 0: every diagonal
   * entry and the pairs chosen. An entry can be zero.
   */
  public void forEachEntry(PairVisitor visitor) {
    long s = seed;
    for (int i = 0; i < size; i++) {
      s = next(s);
      visitor.visit(i, i, entry(s));
      for (int j = i + 1; j < size; j++) {
        s = next(s);
        if ((float) (100 * unit(s)) <= density) {
          s = next(s);
          visitor.visit(i, j, entry(s));
        }
      }
    }
  }

  /** The instance, generated anew. */
  public Instance.OfForm generate() {
    Qubo.Builder form = Qubo.builder(size);
    forEachEntry(
        (i, j, q) -> {
          if (i == j) {
            form.addLinear(i, -q);
          } else {
            form.addPair(i, j, -2 * q);
          }
        });
    return new Instance.OfForm(name, form.build(), Sense.MAXIMIZE);
  }

  private static long next(long s) {
    return FACTOR * s % MODULUS;
  }

  private static double unit(long s) {
    return s / DIVISOR;
  }

  private static double entry(long s) {
    return Math.floor(201 * unit(s)) - 100;
  }
}
