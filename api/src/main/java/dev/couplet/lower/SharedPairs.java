package dev.couplet.lower;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.PriorityQueue;
import java.util.Set;
import java.util.function.IntUnaryOperator;
import java.util.stream.IntStream;

/**
 * Puts one auxiliary bit w in the place of a product x y wherever it occurs in longer products, and
 * goes on until none is left: first the pair that occurs in most products, of equals the one with
 * the lowest numbers. {@link Tie} is the penalty that makes w the product.
 *
 * <p>Where auxiliary bits are to be saved, substitutions that save none are then taken back, the
 * last first, and the products that had them are left to a {@link ProductForm} each.
 *
 * <p>Cost: n d^2 log(n d^2) for n products of degree d. Products of more than {@value
 * #MOST_VARIABLES} variables are left as they are.
 *
 * <p>Source: I. G. Rosenberg, "Reduction of bivalent maximization to the quadratic case" (1975).
 */
final class SharedPairs {
  private static final int MOST_VARIABLES = 16;

  private record Counted(long pair, int count) {}

  private final int first;
  private final List<Product> products;
  private final List<int[]> variables = new ArrayList<>();
  private final List<Substitution> substitutions = new ArrayList<>();
  private final Map<Long, List<Integer>> holders = new HashMap<>();
  private final Map<Long, Integer> counts = new HashMap<>();
  private final PriorityQueue<Counted> queue =
      new PriorityQueue<>(
          Comparator.comparingInt((Counted counted) -> -counted.count())
              .thenComparingLong(Counted::pair));

  /** The substitutions take the numbers from {@code first} on. */
  private SharedPairs(List<Product> products, int first) {
    this.first = first;
    this.products = products;
    products.forEach(product -> variables.add(product.variables()));
  }

  /** No substitution. */
  static SharedPairs none(List<Product> products, int first) {
    return new SharedPairs(products, first);
  }

  /** Substitution down to degree 2, every pair by one bit wherever it occurs. */
  static SharedPairs everywhere(List<Product> products, int first) {
    SharedPairs shared = new SharedPairs(products, first);
    shared.substituteAll();
    return shared;
  }

  /** The same, without the substitutions that do not save bits over what the forms take. */
  static SharedPairs saving(List<Product> products, int first, ProductForms forms) {
    SharedPairs shared = everywhere(products, first);
    shared.takeBack(forms);
    return shared;
  }

  /** Substitution down to degree 2 with bits that each serve one product only. */
  static SharedPairs apart(List<Product> products, int first) {
    SharedPairs apart = new SharedPairs(products, first);
    for (int p = 0; p < products.size(); p++) {
      while (apart.variables.get(p).length > 2) {
        int[] own = apart.variables.get(p);
        apart.substitutions.add(new Substitution(own[0], own[1], p));
        apart.substitute(p, own[0], own[1], first + apart.substitutions.size() - 1);
      }
    }
    return apart;
  }

  List<Substitution> substitutions() {
    return substitutions;
  }

  /** What is left of a product: its variables, substitutes among them, ascending. */
  int[] variables(int product) {
    return variables.get(product);
  }

  private void substituteAll() {
    for (int p = 0; p < products.size(); p++) {
      int degree = variables.get(p).length;
      if (degree > 2 && degree <= MOST_VARIABLES) {
        forPairs(p, 1, this::hold);
        forPairs(p, 1, (pair, product) -> counts.merge(pair, 1, Integer::sum));
      }
    }
    counts.forEach((pair, count) -> queue.add(new Counted(pair, count)));
    while (!queue.isEmpty()) {
      Counted next = queue.remove();
      if (count(next.pair()) == next.count()) {
        substitute(next.pair());
      }
    }
  }

  private interface PairVisitor {
    void visit(long pair, int product);
  }

  /** Visits the pairs of a product whose second variable stands at {@code from} or later. */
  private void forPairs(int product, int from, PairVisitor visitor) {
    int[] own = variables.get(product);
    for (int l = from; l < own.length; l++) {
      for (int k = 0; k < l; k++) {
        visitor.visit((long) own[k] << 32 | own[l], product);
      }
    }
  }

  private void hold(long pair, int product) {
    holders.computeIfAbsent(pair, p -> new ArrayList<>()).add(product);
  }

  private int count(long pair) {
    return counts.getOrDefault(pair, 0);
  }

  /** Puts a new bit in the place of a pair in all products of degree 3 and more that have it. */
  private void substitute(long pair) {
    int x = (int) (pair >>> 32);
    int y = (int) pair;
    int w = first + substitutions.size();
    Set<Long> changed = new HashSet<>();
    List<Integer> carriers = new ArrayList<>();
    for (int p : holders.getOrDefault(pair, List.of())) {
      if (variables.get(p).length > 2 && has(p, x) && has(p, y)) {
        carriers.add(p);
        recount(p, -1, changed);
        substitute(p, x, y, w);
        recount(p, 1, changed);
        forPairs(p, variables.get(p).length - 1, this::hold);
      }
    }
    int[] numbers = carriers.stream().mapToInt(Integer::intValue).toArray();
    substitutions.add(new Substitution(x, y, numbers));
    for (long one : changed) {
      if (count(one) > 0) {
        queue.add(new Counted(one, count(one)));
      }
    }
  }

  private void recount(int product, int sign, Set<Long> changed) {
    if (variables.get(product).length > 2) {
      forPairs(
          product,
          1,
          (pair, p) -> {
            counts.merge(pair, sign, Integer::sum);
            changed.add(pair);
          });
    }
  }

  private boolean has(int product, int variable) {
    return Arrays.binarySearch(variables.get(product), variable) >= 0;
  }

  /** A new bit is the last of all, so that the variables stay ascending. */
  private void substitute(int product, int x, int y, int w) {
    IntStream rest = Arrays.stream(variables.get(product)).filter(v -> v != x && v != y);
    variables.set(product, IntStream.concat(rest, IntStream.of(w)).toArray());
  }

  private void takeBack(ProductForms forms) {
    int[] uses = new int[substitutions.size()];
    substitutions.forEach(one -> use(uses, one, 1));
    boolean[] gone = new boolean[uses.length];
    boolean again = true;
    while (again) {
      again = false;
      for (int k = uses.length - 1; k >= 0; k--) {
        if (!gone[k] && uses[k] == 0 && saved(k, forms) <= 0) {
          use(uses, substitutions.get(k), -1);
          takeBack(k);
          gone[k] = true;
          again = true;
        }
      }
    }
    renumber(gone);
  }

  private void use(int[] uses, Substitution one, int sign) {
    for (int variable : new int[] {one.x(), one.y()}) {
      if (variable >= first) {
        uses[variable - first] += sign;
      }
    }
  }

  /** How many bits a substitution saves, itself counted; no other one builds on it. */
  private int saved(int k, ProductForms forms) {
    int saved = -1;
    for (int p : substitutions.get(k).carriers()) {
      double coefficient = products.get(p).coefficient();
      int degree = variables.get(p).length;
      saved += forms.auxiliaries(coefficient, degree + 1) - forms.auxiliaries(coefficient, degree);
    }
    return saved;
  }

  private void takeBack(int k) {
    Substitution one = substitutions.get(k);
    for (int p : one.carriers()) {
      IntStream rest = Arrays.stream(variables.get(p)).filter(v -> v != first + k);
      IntStream both = IntStream.of(one.x(), one.y());
      variables.set(p, IntStream.concat(rest, both).sorted().toArray());
    }
  }

  /** Closes the gaps that the substitutions taken back leave. */
  private void renumber(boolean[] gone) {
    int[] number = new int[gone.length];
    List<Substitution> kept = new ArrayList<>();
    for (int k = 0; k < gone.length; k++) {
      if (!gone[k]) {
        number[k] = first + kept.size();
        kept.add(substitutions.get(k));
      }
    }
    IntUnaryOperator now = v -> v < first ? v : number[v - first];
    substitutions.clear();
    for (Substitution one : kept) {
      int x = now.applyAsInt(one.x());
      int y = now.applyAsInt(one.y());
      substitutions.add(new Substitution(x, y, one.carriers()));
    }
    variables.replaceAll(own -> Arrays.stream(own).map(now).toArray());
  }
}
