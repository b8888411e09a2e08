package dev.couplet.bench.instances;

import dev.couplet.form.Ising;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.Collectors;

/**
 * A periodic lattice: sites in rows along one or more axes, each coupled to its next along every
 * axis, the last to the first. Sites are numbered with the last axis running fastest. Immutable.
 *
 * @param sides the number of sites along each axis, 3 or more
 */
public record Torus(List<Integer> sides) {
  private static final long MOST_SITES = 1 << 26;

  /** Refuses a lattice without axes, or an axis too short or too long, naming it. */
  public Torus {
    sides = List.copyOf(sides);
    long sites = sides.isEmpty() ? 0 : 1;
    for (int side : sides) {
      if (side < 3) {
        throw new IllegalArgumentException(
            "a side of the torus is "
                + side
                + ", it must be 3 or more, or its pairs fall together");
      }
      sites = Math.min(sites * side, MOST_SITES + 1);
    }
    if (sites == 0 || sites > MOST_SITES) {
      throw new IllegalArgumentException(
          "a torus has 1 to " + MOST_SITES + " sites, these sides are out of range: " + sides);
    }
  }

  /**
   * The lattice of a text like {@code torus:16x16x16}.
   *
   * @throws IllegalArgumentException if the text is not of this kind
   */
  public static Torus parse(String text) {
    if (!text.matches("torus:\\d{1,8}(x\\d{1,8})*")) {
      throw new IllegalArgumentException(
          "the lattice is '" + text + "'; say torus: and its sides, as in torus:16x16x16");
    }
    return new Torus(
        Arrays.stream(text.substring("torus:".length()).split("x", -1))
            .map(Integer::valueOf)
            .toList());
  }

  /** The number of sites. */
  public int size() {
    return sides.stream().reduce(1, (a, b) -> a * b);
  }

  /**
   * The lattice with random couplings, site by site, axis by axis; O(sites times axes).
   *
   * @param couplings where they are drawn from
   * @param seed the seed of the draws
   */
  public Ising couple(Couplings couplings, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int sites = size();
    Ising.Builder form = Ising.builder(sites);
    for (int site = 0; site < sites; site++) {
      int stride = sites;
      for (int side : sides) {
        int span = stride;
        stride /= side;
        boolean last = site % span / stride == side - 1;
        int next = last ? site - (side - 1) * stride : site + stride;
        form.addPair(site, next, couplings.draw(random));
      }
    }
    return form.build();
  }

  @Override
  public String toString() {
    return sides.stream().map(String::valueOf).collect(Collectors.joining("x", "torus:", ""));
  }
}
