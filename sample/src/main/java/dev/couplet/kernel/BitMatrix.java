package dev.couplet.kernel;

import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Turns 64 states into one word a variable, and back. */
final class BitMatrix {
  private static final int SIDE = Long.SIZE;

  private BitMatrix() {}

  /** Word i holds variable i of every state, state k in bit k; missing states read as zeros. */
  static long[] fromStates(List<State> states, int size) {
    long[] words = new long[size];
    long[] block = new long[SIDE];
    List<long[]> rows = new ArrayList<>();
    states.forEach(state -> rows.add(state.toWords()));
    for (int from = 0; from < words.length; from += SIDE) {
      for (int k = 0; k < SIDE; k++) {
        block[k] = k < rows.size() ? rows.get(k)[from / SIDE] : 0;
      }
      transpose(block);
      System.arraycopy(block, 0, words, from, Math.min(SIDE, words.length - from));
    }
    return words;
  }

  /** The first {@code count} states. */
  static List<State> toStates(long[] words, int count) {
    long[] block = new long[SIDE];
    long[][] rows = new long[count][(words.length + SIDE - 1) / SIDE];
    for (int from = 0; from < words.length; from += SIDE) {
      int length = Math.min(SIDE, words.length - from);
      Arrays.fill(block, length, SIDE, 0);
      System.arraycopy(words, from, block, 0, length);
      transpose(block);
      for (int k = 0; k < count; k++) {
        rows[k][from / SIDE] = block[k];
      }
    }
    List<State> states = new ArrayList<>(count);
    for (long[] row : rows) {
      states.add(State.ofWords(words.length, row));
    }
    return states;
  }

  /** Transposes 64 words in place, by swapping ever smaller blocks (Warren, "Hacker's delight"). */
  static void transpose(long[] block) {
    long mask = 0xffffffffL;
    for (int half = SIDE / 2; half > 0; half /= 2) {
      for (int k = 0; k < SIDE; k = (k + half + 1) & ~half) {
        long swap = ((block[k] >>> half) ^ block[k + half]) & mask;
        block[k] ^= swap << half;
        block[k + half] ^= swap;
      }
      mask ^= mask << (half / 2);
    }
  }
}
