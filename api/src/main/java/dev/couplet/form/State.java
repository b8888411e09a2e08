package dev.couplet.form;

import java.util.Arrays;
import java.util.BitSet;
import java.util.Objects;

/**
 * One assignment of 0 or 1 to the variables {@code 0 .. size() - 1} of a form.
 *
 * <p>The same state read as spins has {@code s = 1 - 2x}: a 0 is +1, a 1 is -1. States are
 * immutable, compare by value, and take one bit a variable. Their natural order is that of their
 * {@linkplain #toText() text}.
 */
@CheckReturnValue
public final class State implements Comparable<State> {
  private static final int SHOWN = 80;

  private final int size;
  private final long[] words;

  private State(int size, long[] words) {
    this.size = size;
    this.words = words;
  }

  /** The state of {@code size} zeros. */
  public static State zeros(int size) {
    Check.size(size);
    return new State(size, new long[wordsFor(size)]);
  }

  /** The state with the given values, variable 0 first. */
  public static State of(boolean... values) {
    long[] words = new long[wordsFor(values.length)];
    for (int i = 0; i < values.length; i++) {
      if (values[i]) {
        words[i >> 6] |= 1L << i;
      }
    }
    return new State(values.length, words);
  }

  /**
   * The state whose variable {@code i} is bit {@code i % 64} of {@code words[i / 64]}.
   *
   * @throws IllegalArgumentException if there are fewer words than {@code size} needs, or a bit
   *     beyond {@code size} is set
   */
  public static State ofWords(int size, long... words) {
    Check.size(size);
    int needed = wordsFor(size);
    if (words.length < needed) {
      throw new IllegalArgumentException(
          "a state of " + size + " variables needs " + needed + " words, got " + words.length);
    }
    for (int w = 0; w < words.length; w++) {
      int used = Math.max(0, Math.min(64, size - 64 * w));
      if (used < 64 && words[w] >>> used != 0) {
        throw new IllegalArgumentException(
            "word " + w + " has bits set beyond the " + size + " variables of the state");
      }
    }
    return new State(size, Arrays.copyOf(words, needed));
  }

  /**
   * The state written as a run of 0 and 1, variable 0 first.
   *
   * @throws IllegalArgumentException naming the first character that is neither
   */
  public static State parse(String text) {
    boolean[] values = new boolean[text.length()];
    for (int i = 0; i < values.length; i++) {
      char c = text.charAt(i);
      if (c != '0' && c != '1') {
        throw new IllegalArgumentException(
            "a state is written with 0 and 1 only, found '" + c + "' at position " + i);
      }
      values[i] = c == '1';
    }
    return of(values);
  }

  /** The number of variables. */
  public int size() {
    return size;
  }

  /** Whether variable {@code i} is 1. */
  public boolean get(int i) {
    Objects.checkIndex(i, size);
    return (words[i >> 6] >>> i & 1) != 0;
  }

  /** The value of variable {@code i} as a number: 0 or 1. */
  public int bit(int i) {
    return get(i) ? 1 : 0;
  }

  /** The value of variable {@code i} as a spin: +1 for 0, -1 for 1. */
  public int spin(int i) {
    return get(i) ? -1 : 1;
  }

  /** How many variables are 1. */
  public int ones() {
    int count = 0;
    for (long word : words) {
      count += Long.bitCount(word);
    }
    return count;
  }

  /** This state with variable {@code i} set to {@code value}. */
  public State with(int i, boolean value) {
    if (get(i) == value) {
      return this;
    }
    long[] copy = words.clone();
    copy[i >> 6] ^= 1L << i;
    return new State(size, copy);
  }

  /** This state with variable {@code i} flipped. */
  public State flipped(int i) {
    return with(i, !get(i));
  }

  /** This state with every variable flipped. */
  public State flipped() {
    long[] copy = new long[words.length];
    for (int w = 0; w < copy.length; w++) {
      copy[w] = ~words[w];
    }
    if ((size & 63) != 0) {
      copy[copy.length - 1] &= (1L << size) - 1;
    }
    return new State(size, copy);
  }

  /**
   * In how many variables the two states differ.
   *
   * @throws IllegalArgumentException if their sizes differ
   */
  public int distance(State other) {
    if (other.size != size) {
      throw new IllegalArgumentException(
          "cannot compare states of " + size + " and " + other.size + " variables");
    }
    int count = 0;
    for (int w = 0; w < words.length; w++) {
      count += Long.bitCount(words[w] ^ other.words[w]);
    }
    return count;
  }

  /** The values as booleans, a new array. */
  public boolean[] toBooleans() {
    boolean[] values = new boolean[size];
    for (int i = 0; i < size; i++) {
      values[i] = get(i);
    }
    return values;
  }

  /** The values as 64-bit words, lowest variable in the lowest bit; a new array. */
  public long[] toWords() {
    return words.clone();
  }

  /** The words themselves, which nobody writes to. */
  long[] words() {
    return words;
  }

  /** The variables that are 1, a new set. */
  public BitSet toBitSet() {
    return BitSet.valueOf(words);
  }

  @Override
  public int compareTo(State other) {
    int common = Math.min(words.length, other.words.length);
    for (int w = 0; w < common; w++) {
      long differing = words[w] ^ other.words[w];
      if (differing != 0) {
        long first = Long.lowestOneBit(differing);
        int index = 64 * w + Long.numberOfTrailingZeros(first);
        if (index >= Math.min(size, other.size)) {
          break;
        }
        return (words[w] & first) == 0 ? -1 : 1;
      }
    }
    return Integer.compare(size, other.size);
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof State other && other.size == size && Arrays.equals(other.words, words);
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(words) + size;
  }

  /** The values as a run of 0 and 1, variable 0 first: what {@link #parse} reads. */
  public String toText() {
    return text(size);
  }

  /** As {@link #toText()}, but long states are cut short. */
  @Override
  public String toString() {
    return size <= SHOWN ? toText() : text(SHOWN) + "... (" + size + " variables)";
  }

  private String text(int length) {
    StringBuilder text = new StringBuilder(length);
    for (int i = 0; i < length; i++) {
      text.append(get(i) ? '1' : '0');
    }
    return text.toString();
  }

  private static int wordsFor(int size) {
    return (size >>> 6) + ((size & 63) == 0 ? 0 : 1);
  }
}
