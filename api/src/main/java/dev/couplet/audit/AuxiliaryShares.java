package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.TreeSet;

/** The groups of auxiliary bits that hang together by common terms, with all their terms. */
final class AuxiliaryShares {
  private final int[] parent;
  private final int first;

  private AuxiliaryShares(int first, int size) {
    this.first = first;
    this.parent = new int[size - first];
    Arrays.setAll(parent, k -> k);
  }

  /** The groups of a polynomial every term of which has an auxiliary bit. */
  static List<Share> of(Polynomial polynomial, int decisionBits) {
    AuxiliaryShares sets = new AuxiliaryShares(decisionBits, polynomial.size());
    polynomial.forEachTerm(
        (coefficient, variables) -> {
          for (int variable : variables) {
            if (variable >= decisionBits) {
              sets.parent[sets.root(variable)] = sets.root(variables[variables.length - 1]);
            }
          }
        });
    Map<Integer, Polynomial.Builder> terms = new TreeMap<>();
    Map<Integer, TreeSet<Integer>> bits = new TreeMap<>();
    polynomial.forEachTerm(
        (coefficient, variables) -> {
          int root = sets.root(variables[variables.length - 1]);
          terms
              .computeIfAbsent(root, r -> Polynomial.builder(polynomial.size()))
              .add(coefficient, variables);
          TreeSet<Integer> own = bits.computeIfAbsent(root, r -> new TreeSet<>());
          for (int variable : variables) {
            own.add(variable);
          }
        });
    List<Share> shares = new ArrayList<>();
    terms.forEach(
        (root, own) -> {
          int[] all = bits.getOrDefault(root, new TreeSet<>()).stream().mapToInt(v -> v).toArray();
          int[] decisions = Arrays.stream(all).filter(v -> v < decisionBits).toArray();
          int[] others = Arrays.stream(all).filter(v -> v >= decisionBits).toArray();
          shares.add(new Share(own.build(), List.of(), decisions, others));
        });
    return shares;
  }

  private int root(int variable) {
    int at = variable - first;
    while (parent[at] != at) {
      parent[at] = parent[parent[at]];
      at = parent[at];
    }
    return at;
  }
}
