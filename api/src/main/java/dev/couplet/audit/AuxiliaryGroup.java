package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;

/**
 * Auxiliary bits that hang together, at their best under whatever the decision bits are.
 *
 * <p>The field on each is kept up to date. Bits with a single neighbour in the group are minimised
 * away into the field of that neighbour. For those that remain, the core, the lowest value is
 * remembered by the vector of fields, of which few different ones occur.
 */
final class AuxiliaryGroup implements Flips {
  private static final int SLOTS = 1 << 12;

  private final int[] members;
  private final double[] base;
  private final double[][] pair;
  private final double[][] change;

  /** What products of decision bits add to the fields, for members that occur in such terms. */
  private final Running[] products;

  private final int[] productOf;
  private final double[] field;

  /** Positions of the leaves among the members, and for each that of its neighbour in the core. */
  private final int[] leaf;

  private final int[] neighbour;
  private final int[] core;
  private final double[] coreField;
  private final Minimum minimum;
  private final double[] keys;
  private final double[] values;
  private double lowest;

  /** The group of some bits of a form; terms of degree 3 and more have one of them at most. */
  AuxiliaryGroup(Polynomial form, int decisionBits, List<Integer> members) {
    this.members = members.stream().mapToInt(Integer::intValue).toArray();
    int n = this.members.length;
    base = new double[n];
    field = new double[n];
    pair = new double[n][n];
    for (int k = 0; k < n; k++) {
      base[k] = form.coefficient(this.members[k]);
      for (int l = 0; l < n; l++) {
        pair[k][l] = k == l ? 0 : form.coefficient(this.members[k], this.members[l]);
      }
    }
    change = new double[decisionBits][];
    for (int bit = 0; bit < decisionBits; bit++) {
      change[bit] = changes(form, bit);
    }
    productOf = IntStream.range(0, n).filter(k -> inProducts(form, this.members[k])).toArray();
    products =
        Arrays.stream(productOf)
            .mapToObj(k -> products(form, decisionBits, this.members[k]))
            .toArray(Running[]::new);
    boolean[] isLeaf = leaves();
    core = positions(isLeaf, false);
    leaf = positions(isLeaf, true);
    neighbour = new int[leaf.length];
    for (int l = 0; l < leaf.length; l++) {
      for (int k = 0; k < core.length; k++) {
        neighbour[l] = pair[leaf[l]][core[k]] != 0 ? k : neighbour[l];
      }
    }
    coreField = new double[core.length];
    minimum = coreMinimum();
    int slots = core.length == 1 ? 0 : SLOTS;
    keys = new double[slots * core.length];
    values = new double[slots];
    Arrays.fill(keys, Double.NaN);
  }

  private double[] changes(Polynomial form, int bit) {
    double[] own = new double[members.length];
    for (int k = 0; k < own.length; k++) {
      own[k] = form.coefficient(bit, members[k]);
    }
    return Arrays.stream(own).allMatch(value -> value == 0) ? new double[0] : own;
  }

  private static boolean inProducts(Polynomial form, int member) {
    boolean[] found = {false};
    form.forEachTerm(
        (coefficient, variables) ->
            found[0] |= variables.length > 2 && variables[variables.length - 1] == member);
    return found[0];
  }

  private static Running products(Polynomial form, int decisionBits, int member) {
    Polynomial.Builder ofDecisions = Polynomial.builder(decisionBits);
    form.forEachTerm(
        (coefficient, variables) -> {
          if (variables.length > 2 && variables[variables.length - 1] == member) {
            ofDecisions.add(coefficient, Arrays.copyOf(variables, variables.length - 1));
          }
        });
    return new Running(ofDecisions.build());
  }

  /** Members with one neighbour; of two that have only each other, the first. */
  private boolean[] leaves() {
    boolean[] isLeaf = new boolean[members.length];
    for (int k = 0; k < members.length; k++) {
      int only = -1;
      int count = 0;
      for (int l = 0; l < members.length; l++) {
        if (pair[k][l] != 0) {
          only = l;
          count++;
        }
      }
      isLeaf[k] = count == 1 && !isLeaf[only];
    }
    return isLeaf;
  }

  private static int[] positions(boolean[] among, boolean wanted) {
    List<Integer> positions = new ArrayList<>();
    for (int k = 0; k < among.length; k++) {
      if (among[k] == wanted) {
        positions.add(k);
      }
    }
    return positions.stream().mapToInt(Integer::intValue).toArray();
  }

  private Minimum coreMinimum() {
    double[] coreBase = new double[core.length];
    double[][] corePair = new double[core.length][core.length];
    for (int k = 0; k < core.length; k++) {
      coreBase[k] = base[core[k]];
      for (int l = 0; l < core.length; l++) {
        corePair[k][l] = pair[core[k]][core[l]];
      }
    }
    return Minimum.of(coreBase, corePair);
  }

  boolean touches(int bit) {
    boolean touches = change[bit].length > 0;
    for (Running product : products) {
      touches |= product.termsOf(bit) > 0;
    }
    return touches;
  }

  @Override
  public void reset(long pattern) {
    Arrays.fill(field, 0);
    for (long left = pattern; left != 0; left &= left - 1) {
      add(change[Long.numberOfTrailingZeros(left)], 1);
    }
    for (int p = 0; p < products.length; p++) {
      products[p].reset(pattern);
      field[productOf[p]] += products[p].value();
    }
    lowest = look();
  }

  @Override
  public void flip(int bit, long pattern) {
    add(change[bit], (pattern >>> bit & 1) != 0 ? 1 : -1);
    for (int p = 0; p < products.length; p++) {
      double before = products[p].value();
      products[p].flip(bit, pattern);
      field[productOf[p]] += products[p].value() - before;
    }
    lowest = look();
  }

  double lowest() {
    return lowest;
  }

  private void add(double[] amounts, int sign) {
    for (int k = 0; k < amounts.length; k++) {
      field[k] += sign * amounts[k];
    }
  }

  private double look() {
    for (int k = 0; k < core.length; k++) {
      coreField[k] = field[core[k]];
    }
    double ofLeaves = 0;
    for (int l = 0; l < leaf.length; l++) {
      double own = base[leaf[l]] + field[leaf[l]];
      double off = Math.min(0, own);
      double on = Math.min(0, own + pair[leaf[l]][core[neighbour[l]]]);
      ofLeaves += off;
      coreField[neighbour[l]] += on - off;
    }
    return ofLeaves + (core.length == 1 ? Math.min(0, base[core[0]] + coreField[0]) : remembered());
  }

  private double remembered() {
    long hash = 0;
    for (double value : coreField) {
      hash = (hash ^ Double.doubleToRawLongBits(value)) * 0x9E3779B97F4A7C15L;
      hash ^= hash >>> 32;
    }
    int slot = (int) (hash & (SLOTS - 1));
    int from = slot * coreField.length;
    for (int k = 0; k < coreField.length; k++) {
      if (keys[from + k] != coreField[k]) {
        System.arraycopy(coreField, 0, keys, from, coreField.length);
        values[slot] = minimum.of(coreField);
        break;
      }
    }
    return values[slot];
  }
}
