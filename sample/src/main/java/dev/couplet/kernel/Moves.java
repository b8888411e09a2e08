package dev.couplet.kernel;

import dev.couplet.form.State;
import java.util.Arrays;
import java.util.SplittableRandom;

/**
 * One state of a form, with the gain of every flip and a mark on flips that are blocked; finds the
 * best flip that is not. Belongs to one thread.
 *
 * <p>Energies are whole numbers, in the units of the {@link MoveRows}. Invariant: {@code
 * field[s][k]} is the local field of the variable at place k of strand s, linear + sum weight_j
 * x_j, below 2^28 in magnitude; bit 31 of {@code code[s][k]} is set if x is 1, bit 30 if its flip
 * is blocked. Places beyond the last variable are blocked for ever. So keys of free moves lie below
 * 2^28, those of blocked ones above 2^29, and no difference of keys overflows.
 *
 * <p>Looking for the best flip takes a pass over n numbers in vector registers; a flip another, in
 * a dense form, or as many updates as the variable has neighbours.
 */
public final class Moves {
  private static final int ONE = 1 << 31;
  private static final int BLOCKED = 1 << 30;
  private static final int FREE_BELOW = 1 << 29;

  private final MoveRows rows;
  private final int size;
  private final int length;
  private final int width;
  private final int[][] field;
  private final int[][] code;
  private final int[] key;
  private long energy;

  /** The state of zeros, nothing blocked. */
  public Moves(MoveRows rows) {
    this.rows = rows;
    this.size = rows.size();
    this.length = rows.length();
    this.width = Integer.SIZE / rows.strands();
    this.field = new int[rows.strands()][length];
    this.code = new int[rows.strands()][length];
    this.key = new int[length];
    clear();
  }

  private void clear() {
    energy = 0;
    for (int[] strand : code) {
      Arrays.fill(strand, 0);
    }
    for (int p = size; p < length * rows.strands(); p++) {
      code[p / length][p % length] = BLOCKED;
    }
    int[] linear = rows.linear();
    for (int s = 0; s < field.length; s++) {
      int from = Math.min(size, s * length);
      System.arraycopy(linear, from, field[s], 0, Math.min(length, size - from));
    }
  }

  /** Moves to a state and frees all moves; as many flips as the state has ones. */
  public void set(State state) {
    boolean whole = set(state, Pace.free());
    assert whole : "a free pace never ends";
  }

  /** Moves to a state and frees all moves; if the pace ends that, returns false, half way there. */
  public boolean set(State state, Pace pace) {
    clear();
    for (int i = 0; i < size; i++) {
      if (state.get(i)) {
        flip(i);
        if (pace.after(rows.dense() ? size : 1L + rows.start()[i + 1] - rows.start()[i])) {
          return false;
        }
      }
    }
    return true;
  }

  /** The number of variables. */
  public int size() {
    return size;
  }

  /** The elementary steps of one look for the best move and one flip, at most. */
  public int steps() {
    return rows.dense() ? 2 * size : size + 1;
  }

  /** The energy above that of the state of zeros. */
  public long energy() {
    return energy;
  }

  /** The change of energy if variable {@code i} flips. */
  public int gain(int i) {
    int s = i / length;
    int k = i - s * length;
    return gain(s, k);
  }

  private int gain(int s, int k) {
    int negative = code[s][k] >> 31;
    return (field[s][k] ^ negative) - negative;
  }

  /** Whether variable {@code i} is 1. */
  public boolean one(int i) {
    return code[i / length][i % length] < 0;
  }

  /** Keeps {@link #best} from choosing variable {@code i}. */
  public void block(int i) {
    code[i / length][i % length] |= BLOCKED;
  }

  /** Allows {@link #best} to choose variable {@code i}. */
  public void free(int i) {
    code[i / length][i % length] &= ~BLOCKED;
  }

  /** Flips variable {@code i}, blocked or not. */
  public void flip(int i) {
    energy += gain(i);
    int s = i / length;
    int k = i - s * length;
    boolean one = code[s][k] < 0;
    code[s][k] ^= ONE;
    if (rows.dense()) {
      flipDense(rows.packed(i), one);
    } else {
      flipSparse(i, one ? -1 : 1);
    }
  }

  private void flipDense(int[] row, boolean one) {
    int right = Integer.SIZE - width;
    int common = rows.common();
    for (int s = 0; s < field.length; s++) {
      int left = Integer.SIZE - width * (s + 1);
      if (one) {
        Lanes.subtract(field[s], row, left, right, common);
      } else {
        Lanes.add(field[s], row, left, right, common);
      }
    }
  }

  private void flipSparse(int i, int change) {
    int[] only = field[0];
    int[] start = rows.start();
    int[] neighbour = rows.neighbour();
    int[] weight = rows.weight();
    for (int k = start[i], end = start[i + 1]; k < end; k++) {
      only[neighbour[k]] += change * weight[k];
    }
  }

  /**
   * The free variable whose flip changes the energy by the least number, or -1 if all are blocked.
   * Among equals any may be chosen, with the help of the generator, which is asked only then.
   */
  public int best(SplittableRandom random) {
    if (size == 0) {
      return -1;
    }
    Lanes.keys(field[0], code[0], key);
    for (int s = 1; s < field.length; s++) {
      Lanes.lowerKeys(field[s], code[s], key);
    }
    Lanes.fold(key);
    int from = Math.max(0, length - Lanes.COUNT);
    int lowest = Integer.MAX_VALUE;
    for (int k = from; k < length; k++) {
      lowest = Math.min(lowest, key[k]);
    }
    return lowest >= FREE_BELOW ? -1 : place(lane(from, lowest, random), lowest, random);
  }

  private int lane(int from, int lowest, SplittableRandom random) {
    int chosen = -1;
    int equals = 0;
    for (int k = from; k < length; k++) {
      if (key[k] == lowest && (++equals == 1 || random.nextInt(equals) == 0)) {
        chosen = k;
      }
    }
    return chosen;
  }

  private int place(int lane, int lowest, SplittableRandom random) {
    int chosen = -1;
    int equals = 0;
    for (int k = lane % Lanes.COUNT; k < length; k += Lanes.COUNT) {
      for (int s = 0; s < field.length; s++) {
        boolean free = (code[s][k] & BLOCKED) == 0;
        if (free && gain(s, k) == lowest && (++equals == 1 || random.nextInt(equals) == 0)) {
          chosen = s * length + k;
        }
      }
    }
    return chosen;
  }

  /** The state as it is now. */
  public State state() {
    long[] words = new long[(size + 63) >>> 6];
    for (int s = 0, i = 0; s < code.length; s++) {
      for (int k = 0; k < length && i < size; k++, i++) {
        words[i >> 6] |= (long) (code[s][k] >>> 31) << i;
      }
    }
    return State.ofWords(size, words);
  }
}
