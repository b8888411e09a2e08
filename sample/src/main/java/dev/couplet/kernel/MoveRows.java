package dev.couplet.kernel;

import dev.couplet.form.Qubo;
import java.util.Optional;

/**
 * The coefficients of a form as whole numbers, laid out for {@link Moves}: built once, shared by
 * the threads of a run.
 *
 * <p>Coefficients are multiplied by a power of two, 2^exponent, and rounded, so that no local field
 * reaches 2^28. Forms whose coefficients are integers, and not that large, are taken over exactly;
 * others to about eight digits of their largest field, which is for the caller to allow for.
 *
 * <p>A form that is dense enough is laid out in full rows, packed: with coefficients of at most w =
 * 8, 16 or 32 bits, a word of a row holds 32 / w of them. Variables lie in 32 / w strands of equal
 * length, variable i at place {@code i % length} of strand {@code i / length}; word k of a row
 * holds place k of every strand, strand s in bits w s to w s + w - 1. So a strand is unpacked with
 * two shifts, which run in vector registers; shorter strands than 1,024 places are not worth it.
 * The pairs' common power of two is left out of the row and comes back with a third. Other forms
 * are laid out by neighbours, in one strand.
 *
 * <p>Memory: n^2 w / 8 bytes for full rows, 16 bytes a pair else.
 */
public final class MoveRows {
  private static final int DENSE = 12;
  private static final int STRAND = 1 << 10;
  private static final long MOST_BYTES = 1L << 30;

  private final Scale scale;
  private final int size;
  private final int[] linear;
  private final int strands;
  private final int length;
  private final int common;
  private final int[][] packed;
  private final Adjacency adjacency;
  private final int[] start;
  private final int[] neighbour;
  private final int[] weight;

  private MoveRows(Qubo form, Scale scale, int[][] packed, Adjacency rows, Pace pace) {
    int width = width(form, scale);
    this.scale = scale;
    this.size = form.size();
    this.linear = new int[size];
    for (int i = 0; i < size; i++) {
      linear[i] = scale.whole(form.linear(i));
    }
    this.strands = Integer.SIZE / width;
    this.common = common(scale, width);
    this.length = length(size, width);
    this.packed = packed;
    this.adjacency = rows;
    this.start = rows.start();
    this.neighbour = rows.neighbour();
    this.weight = new int[neighbour.length];
    for (int k = 0; k < weight.length && !pace.after(1); k++) {
      weight[k] = scale.whole(rows.weight()[k]);
    }
  }

  /** The rows of a form; O(n + m) for sparse ones, O(n^2) for dense ones. */
  public static MoveRows of(Qubo form) {
    return of(form, Pace.free()).orElseThrow();
  }

  /** The rows of a form, unless the pace ends before they are built. */
  public static Optional<MoveRows> of(Qubo form, Pace pace) {
    Scale scale = Scale.of(form, pace);
    int width = width(form, scale);
    boolean dense = dense(form, width);
    int[][] packed = dense && !pace.ended() ? pack(form, scale, width, pace) : new int[0][];
    Qubo sparse = dense ? Qubo.builder(0).build() : form;
    return pace.ended()
        ? Optional.empty()
        : Adjacency.of(sparse, pace)
            .filter(rows -> !pace.lookBefore(8L * rows.pairs()))
            .map(rows -> new MoveRows(form, scale, packed, rows, pace))
            .filter(whole -> !pace.ended());
  }

  private static int common(Scale scale, int width) {
    return width == Integer.SIZE ? 0 : scale.zeros();
  }

  private static int length(int size, int width) {
    int strands = Integer.SIZE / width;
    return (size + strands - 1) / strands;
  }

  private static int width(Qubo form, Scale scale) {
    for (int width = Byte.SIZE; width < Integer.SIZE; width *= 2) {
      boolean fits = (scale.largest() >> scale.zeros()) < (1 << (width - 1));
      boolean worthwhile = (long) form.size() * width >= (long) STRAND * Integer.SIZE;
      if (fits && worthwhile && dense(form, width)) {
        return width;
      }
    }
    return Integer.SIZE;
  }

  private static boolean dense(Qubo form, int width) {
    double all = (double) form.size() * form.size();
    return 2.0 * DENSE * form.pairs() >= all && all * width / Byte.SIZE <= MOST_BYTES;
  }

  private static int[][] pack(Qubo form, Scale scale, int width, Pace pace) {
    int common = common(scale, width);
    int length = length(form.size(), width);
    int[][] all = new int[form.size()][];
    for (int i = 0; i < all.length; i++) {
      all[i] = new int[pace.after(length) ? 0 : length];
    }
    boolean whole =
        !pace.ended()
            && form.forEachPairUntil(
                pace::look,
                (i, j, value) -> {
                  int bits = (scale.whole(value) >> common) & (int) ((1L << width) - 1);
                  all[i][j % length] |= bits << (j / length * width);
                  all[j][i % length] |= bits << (i / length * width);
                });
    return whole ? all : new int[0][];
  }

  /** Whether the whole numbers are the form's coefficients times 2^exponent, without rounding. */
  public boolean exact() {
    return scale.exact();
  }

  /** An energy of the form in the units of the moves, not rounded. */
  public double inUnits(double energy) {
    return Math.scalb(energy, scale.exponent());
  }

  /** The form by neighbours, with its own coefficients; empty if the rows are full. */
  public Adjacency adjacency() {
    return adjacency;
  }

  /** Whether the rows are full. */
  public boolean dense() {
    return packed.length > 0;
  }

  int size() {
    return size;
  }

  int strands() {
    return strands;
  }

  int length() {
    return length;
  }

  int common() {
    return common;
  }

  int[] packed(int i) {
    return packed[i];
  }

  int[] linear() {
    return linear;
  }

  int[] start() {
    return start;
  }

  int[] neighbour() {
    return neighbour;
  }

  int[] weight() {
    return weight;
  }
}
