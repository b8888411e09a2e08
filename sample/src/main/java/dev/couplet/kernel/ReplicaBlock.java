package dev.couplet.kernel;

import java.util.Arrays;

/**
 * Some variables without pairs among them, laid out so that they are updated together: neighbour q
 * of all variables stands in one array. Those with fewer neighbours than others are given
 * themselves as neighbours, which adds nothing.
 */
final class ReplicaBlock {
  /** The place of the first variable, and how many there are. */
  final int from;

  final int length;

  /** {@code place[q][k]} is the index of the word that is y for neighbour q of variable k. */
  final int[][] place;

  /** {@code mask[q][b][k]} is digit b of that pair's weight, as a whole word. */
  final long[][][] mask;

  /** The bases of each variable, in half steps. */
  final long[] baseZero;

  final long[] baseOne;

  /** Whether the bases differ for any variable. */
  final boolean lopsided;

  /**
   * The block of the variables at places {@code from} on.
   *
   * @param position the place of every variable
   * @param half half a step
   * @param digits how many digits of weights to lay out
   */
  ReplicaBlock(
      Adjacency rows, int[] order, int[] position, int from, int length, double half, int digits) {
    this.from = from;
    this.length = length;
    int degree = 0;
    for (int k = 0; k < length; k++) {
      degree = Math.max(degree, rows.degree(order[from + k]));
    }
    this.place = new int[degree][length];
    this.mask = new long[degree][digits][length];
    this.baseZero = new long[length];
    this.baseOne = new long[length];
    for (int k = 0; k < length; k++) {
      fill(rows, order[from + k], k, position, half);
    }
    this.lopsided = !Arrays.equals(baseZero, baseOne);
  }

  private void fill(Adjacency rows, int i, int k, int[] position, double half) {
    long low = (long) (rows.linear()[i] / half);
    long high = low;
    for (int q = 0; q < place.length; q++) {
      int p = rows.start()[i] + q;
      if (p >= rows.start()[i + 1]) {
        place[q][k] = from + k;
        continue;
      }
      long weight = (long) (rows.weight()[p] / half);
      low += Math.min(0, weight);
      high += Math.max(0, weight);
      place[q][k] = position[rows.neighbour()[p]] + (weight < 0 ? position.length : 0);
      for (int b = 0; b < mask[q].length; b++) {
        mask[q][b][k] = -(((Math.abs(weight) / 2) >> b) & 1);
      }
    }
    baseZero[k] = low;
    baseOne[k] = -high;
  }
}
