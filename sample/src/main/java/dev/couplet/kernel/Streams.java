package dev.couplet.kernel;

import java.util.SplittableRandom;

/**
 * Independent streams of random numbers, counted from 0, for one seed.
 *
 * <p>Seed and count go through a finaliser before they seed the generator, and the generator is
 * split once, so that streams differ in their step as well as in their position: neighbouring seeds
 * or counts have nothing in common. Source of the generator: Steele, Lea and Flood, "Fast
 * splittable pseudorandom number generators" (2014); its finaliser: Stafford's variant 13.
 */
public final class Streams {
  private static final long STEP = 0x9e3779b97f4a7c15L;

  private Streams() {}

  /** Stream {@code k} of a seed, at its beginning. */
  public static SplittableRandom of(long seed, long k) {
    return new SplittableRandom(position(seed, k)).split();
  }

  /** A well-mixed number for each pair of a seed and a count; for one seed, no two are equal. */
  public static long position(long seed, long k) {
    return mix(mix(seed + STEP) + STEP * k);
  }

  /** A one-to-one map in which every bit of the result depends on every bit of the argument. */
  public static long mix(long bits) {
    long z = bits;
    z = (z ^ z >>> 30) * 0xbf58476d1ce4e5b9L;
    z = (z ^ z >>> 27) * 0x94d049bb133111ebL;
    return z ^ z >>> 31;
  }
}
