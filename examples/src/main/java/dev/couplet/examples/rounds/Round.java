package dev.couplet.examples.rounds;

import java.util.List;

/**
 * What one van does in a plan.
 *
 * @param van the van
 * @param villages the villages it serves; in the order of the visits, once that is decided
 */
record Round(Van van, List<Village> villages) {
  Round {
    villages = List.copyOf(villages);
  }

  /** The crates it carries. */
  long crates() {
    return villages.stream().mapToLong(Village::crates).sum();
  }

  /** The distances between every two of its villages, added up. */
  long metres() {
    long sum = 0;
    for (int a = 0; a < villages.size(); a++) {
      for (int b = a + 1; b < villages.size(); b++) {
        sum += villages.get(a).distanceTo(villages.get(b));
      }
    }
    return sum;
  }

  /** The way from the library through the villages, one after the other, and back. */
  long way(Library library) {
    long sum = 0;
    Place here = library;
    for (Village next : villages) {
      sum += here.distanceTo(next);
      here = next;
    }
    return sum + here.distanceTo(library);
  }
}
