package dev.couplet.examples.rounds;

import java.util.List;

/**
 * What is to be decided about.
 *
 * @param villages to be served, each by one van
 * @param vans that serve them
 * @param wishes of villages for vans
 * @param together villages that must share a van
 * @param apart villages that must not
 * @param library where the vans start and return
 */
record RoundsData(
    List<Village> villages,
    List<Van> vans,
    List<Wish> wishes,
    List<Pair> together,
    List<Pair> apart,
    Library library) {
  RoundsData {
    villages = List.copyOf(villages);
    vans = List.copyOf(vans);
    wishes = List.copyOf(wishes);
    together = List.copyOf(together);
    apart = List.copyOf(apart);
  }

  /** Data with the library amid the villages. */
  RoundsData(
      List<Village> villages,
      List<Van> vans,
      List<Wish> wishes,
      List<Pair> together,
      List<Pair> apart) {
    this(villages, vans, wishes, together, apart, Library.amid(villages));
  }

  /** The crates of all villages. */
  long crates() {
    return villages.stream().mapToLong(Village::crates).sum();
  }

  /** What all vans carry together. */
  long capacity() {
    return vans.stream().mapToLong(Van::capacity).sum();
  }
}
