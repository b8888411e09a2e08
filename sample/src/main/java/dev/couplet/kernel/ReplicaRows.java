package dev.couplet.kernel;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The rows of a form in the shape that {@link ReplicaSweeps} wants: gains counted in small steps.
 *
 * <p>The gain of variable i is written as a sum of positive parts, so that it can be counted up:
 * with y_j = x_j where the pair's weight w_j is positive and 1 - x_j where it is negative, the
 * local field is {@code low + sum |w_j| y_j}, low = linear + the negative weights. If x_i is 0 the
 * gain is the field; if it is 1, it is minus the field, which is {@code -high + sum |w_j| (1 -
 * y_j)}, high = low + sum |w_j|. So the gain is {@code base(x_i) + sum |w_j| (y_j xor x_i)} with
 * base(0) = low and base(1) = -high.
 *
 * <p>A step is the common divisor of the weights, or a divisor of it of which half divides all
 * linear coefficients; bases are kept in half steps. base(0) and base(1) differ by whole steps, so
 * the half step of a gain is known beforehand.
 *
 * <p>Variables are ordered colour by colour of a greedy colouring, and cut into blocks of one
 * colour. Of the words of the spins, word p holds the variable at place p of that order, word n + p
 * its complement, and a neighbour is the index of the one that is y_j.
 */
public final class ReplicaRows {
  static final int BLOCK = 256;

  private static final int LARGEST_GAIN = 127;

  private final int[] order;
  private final List<ReplicaBlock> blocks;
  private final long pairs;
  private final double half;
  private final int gainDigits;
  private final int weightDigits;
  private final boolean halves;

  private ReplicaRows(int[] order, List<ReplicaBlock> blocks, ReplicaScale scale, long pairs) {
    this.pairs = pairs;
    this.order = order;
    this.blocks = blocks;
    this.half = scale.half();
    this.gainDigits = digits(scale.largestGain());
    this.weightDigits = digits(scale.largestWeight());
    this.halves = scale.odd();
  }

  private static int digits(int number) {
    return Integer.SIZE - Integer.numberOfLeadingZeros(number);
  }

  /** The rows, if gains are at most 127 steps. O(n + m) time and memory. */
  public static Optional<ReplicaRows> of(Adjacency rows) {
    return of(rows, Pace.free());
  }

  /** The rows, if gains are at most 127 steps and the pace does not end before they are built. */
  public static Optional<ReplicaRows> of(Adjacency rows, Pace pace) {
    ReplicaScale scale = ReplicaScale.of(rows, pace);
    if (pace.ended() || scale.half() == 0 || scale.largestGain() > LARGEST_GAIN) {
      return Optional.empty();
    }
    return Colouring.order(rows, pace).flatMap(order -> of(rows, order, scale, pace));
  }

  private static Optional<ReplicaRows> of(
      Adjacency rows, int[] order, ReplicaScale scale, Pace pace) {
    int[] position = new int[order.length];
    for (int p = 0; p < order.length; p++) {
      position[order[p]] = p;
    }
    int weightDigits = digits(scale.largestWeight());
    int masks = weightDigits > 1 ? weightDigits : 0;
    int[] seen = new int[order.length];
    List<ReplicaBlock> all = new ArrayList<>();
    for (int from = 0; from < order.length; ) {
      int length = Colouring.independent(rows, order, from, BLOCK, seen);
      ReplicaBlock block =
          new ReplicaBlock(rows, order, position, from, length, scale.half(), masks);
      all.add(block);
      from += length;
      if (pace.after((long) length * (1 + block.place.length))) {
        return Optional.empty();
      }
    }
    return Optional.of(new ReplicaRows(order, List.copyOf(all), scale, rows.pairs()));
  }

  /** The number of variables n. */
  public int size() {
    return order.length;
  }

  /** The number of pairs m. */
  public long pairs() {
    return pairs;
  }

  /** The variable at each place. */
  int[] order() {
    return order;
  }

  /** All places, in order. */
  List<ReplicaBlock> blocks() {
    return blocks;
  }

  /** The length of the longest block. */
  int longestBlock() {
    return blocks.stream().mapToInt(block -> block.length).max().orElse(0);
  }

  /** Half a step in terms of the form's energy. */
  double half() {
    return half;
  }

  /** Whether any gain is not a whole number of steps. */
  boolean halves() {
    return halves;
  }

  /** Binary digits of the largest gain, in steps. */
  int gainDigits() {
    return gainDigits;
  }

  /** Binary digits of the largest weight, in steps. */
  int weightDigits() {
    return weightDigits;
  }
}
