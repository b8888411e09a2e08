package dev.couplet.bench.instances;

import dev.couplet.bench.models.NumberTable;
import dev.couplet.bench.models.Tour;
import java.util.SplittableRandom;

/**
 * Invented cities on a square of 1,000 by 1,000, whole coordinates drawn by a seed, with the
 * distances in the plane rounded to the nearest. The shortest tour is sought. Time O(n^2) for the
 * distances. Immutable.
 *
 * @param count how many cities, 3 or more
 * @param seed of the coordinates
 */
public record Cities(int count, long seed) {
  private static final int SIDE = 1000;
  private static final int MOST = 10_000;

  /** Refuses what makes no tour, naming the value. */
  public Cities {
    if (count < 3 || count > MOST) {
      throw new IllegalArgumentException(
          "the number of cities is " + count + ", it must be 3 to " + MOST);
    }
  }

  /**
   * The cities of a text {@code N:SEED}.
   *
   * @throws IllegalArgumentException if it is not written so
   */
  public static Cities parse(String text) {
    if (!text.matches("\\d{1,9}:\\d{1,18}")) {
      throw new IllegalArgumentException("'" + text + "' names no cities; say N:SEED, as in 10:1");
    }
    String[] parts = text.split(":", -1);
    return new Cities(Integer.parseInt(parts[0]), Long.parseLong(parts[1]));
  }

  /** The distances between all cities. */
  public NumberTable distances() {
    SplittableRandom random = new SplittableRandom(seed);
    double[] x = new double[count];
    double[] y = new double[count];
    for (int city = 0; city < count; city++) {
      x[city] = random.nextInt(SIDE + 1);
      y[city] = random.nextInt(SIDE + 1);
    }
    return TspDistance.EUC_2D.table(x, y);
  }

  /** The instance, generated anew. */
  public Instance.OfModel generate() {
    String name = "cities:" + count + ":" + seed;
    return new Instance.OfModel(name, Tour.of(name, distances()).statement());
  }
}
