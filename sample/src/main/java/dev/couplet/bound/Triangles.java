package dev.couplet.bound;

import dev.couplet.sampling.Vigil;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.PriorityQueue;
import java.util.Set;

/**
 * Triangle inequalities and their multipliers: of three spins, the products {@code a, b, c} of each
 * two satisfy {@code a + b + c >= -1}, and so with any two of them negated (Padberg, The Boolean
 * quadric polytope, 1989).
 */
final class Triangles {
  private static final double VIOLATED = 0.02;

  /** At most so many times the number of spins are added at a time. */
  private static final int ADDED = 4;

  /** One inequality: the products of i, j and k, the signs by the bits of {@code kind}. */
  private static final class Triangle {
    final int i;
    final int j;
    final int k;
    final int kind;
    double multiplier;
    double excess;

    Triangle(int i, int j, int k, int kind) {
      this.i = i;
      this.j = j;
      this.k = k;
      this.kind = kind;
    }

    // Kind 0 negates nothing; kinds 1, 2 and 3 keep the sign of ij, ik and jk alone.
    int signIj() {
      return kind == 0 || kind == 1 ? 1 : -1;
    }

    int signIk() {
      return kind == 0 || kind == 2 ? 1 : -1;
    }

    int signJk() {
      return kind == 0 || kind == 3 ? 1 : -1;
    }
  }

  private static final Comparator<Triangle> BY_EXCESS = Comparator.comparingDouble(t -> t.excess);

  private final int size;
  private final int most;
  private final Vigil vigil;
  private final List<Triangle> active = new ArrayList<>();
  private final Set<Long> known = new HashSet<>();
  private double total;

  Triangles(int size, int most, Vigil vigil) {
    this.size = size;
    this.vigil = vigil;
    this.most = most;
  }

  /** The sum of all multipliers. */
  double total() {
    return total;
  }

  int active() {
    return active.size();
  }

  /** Takes the inequalities with their multipliers out of a matrix. */
  void subtractFrom(double[][] matrix) {
    for (Triangle t : active) {
      double half = t.multiplier / 2;
      change(matrix, t.i, t.j, -half * t.signIj());
      change(matrix, t.i, t.k, -half * t.signIk());
      change(matrix, t.j, t.k, -half * t.signJk());
    }
  }

  private static void change(double[][] matrix, int i, int j, double by) {
    matrix[i][j] += by;
    matrix[j][i] += by;
  }

  /** Moves the multipliers along the violations, so far that the bound could reach the goal. */
  void step(UnitVectors vectors, double distance) {
    double square = 0;
    for (Triangle t : active) {
      double sum =
          t.signIj() * vectors.product(t.i, t.j)
              + t.signIk() * vectors.product(t.i, t.k)
              + t.signJk() * vectors.product(t.j, t.k);
      t.excess = -1 - sum;
      if (t.excess > 0 || t.multiplier > 0) {
        square += t.excess * t.excess;
      }
    }
    if (square == 0) {
      return;
    }
    total = 0;
    for (Triangle t : active) {
      t.multiplier = Math.max(0, t.multiplier + distance / square * t.excess);
      total += t.multiplier;
    }
  }

  /** Drops inequalities that do nothing and adds the most violated ones. */
  void renew(UnitVectors vectors) {
    active.removeIf(
        t -> {
          boolean idle = t.multiplier == 0 && t.excess < 0;
          if (idle) {
            known.remove(key(t));
          }
          return idle;
        });
    for (Triangle t : violated(vectors)) {
      if (active.size() >= most) {
        break;
      }
      if (known.add(key(t))) {
        active.add(t);
      }
    }
  }

  private List<Triangle> violated(UnitVectors vectors) {
    double[][] product = new double[size][size];
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < i; j++) {
        product[i][j] = vectors.product(i, j);
      }
    }
    PriorityQueue<Triangle> found = new PriorityQueue<>(BY_EXCESS);
    for (int k = 0; k < size && !vigil.over(); k++) {
      for (int j = 0; j < k; j++) {
        for (int i = 0; i < j; i++) {
          look(i, j, k, product[j][i], product[k][i], product[k][j], found);
        }
      }
    }
    List<Triangle> worst = new ArrayList<>(found);
    worst.sort(BY_EXCESS.reversed());
    return worst;
  }

  /** Keeps the triangle if it is among the most violated ones. */
  private void look(
      int i, int j, int k, double ij, double ik, double jk, PriorityQueue<Triangle> found) {
    double lowest =
        Math.min(Math.min(ij + ik + jk, ij - ik - jk), Math.min(ik - ij - jk, jk - ij - ik));
    double excess = -1 - lowest;
    if (excess < VIOLATED || (found.size() == ADDED * size && excess <= found.element().excess)) {
      return;
    }
    Triangle triangle = new Triangle(i, j, k, kind(ij, ik, jk, lowest));
    triangle.excess = excess;
    found.add(triangle);
    if (found.size() > ADDED * size) {
      found.poll();
    }
  }

  private static int kind(double ij, double ik, double jk, double lowest) {
    if (lowest == ij + ik + jk) {
      return 0;
    }
    if (lowest == ij - ik - jk) {
      return 1;
    }
    return lowest == ik - ij - jk ? 2 : 3;
  }

  private long key(Triangle t) {
    return (((long) t.i * size + t.j) * size + t.k) * 4 + t.kind;
  }
}
