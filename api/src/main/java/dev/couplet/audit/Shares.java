package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Rule;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.TreeSet;

/** Cuts a rule's polynomial into the pieces that share no bit, by union of sets. */
final class Shares {
  private final CodedUnits units;
  private final int decisionBits;
  private final Map<Integer, Integer> parent = new HashMap<>();

  private Shares(CodedUnits units, int decisionBits) {
    this.units = units;
    this.decisionBits = decisionBits;
  }

  /** The pieces; a part without literals belongs to none. */
  static List<Share> of(
      Polynomial polynomial, List<Rule.Part> parts, CodedUnits units, int decisionBits) {
    return new Shares(units, decisionBits).cut(polynomial, parts);
  }

  private List<Share> cut(Polynomial polynomial, List<Rule.Part> parts) {
    polynomial.forEachTerm((coefficient, variables) -> joinTerm(variables));
    for (Rule.Part part : parts) {
      int[] last = {-1};
      part.terms()
          .forEachTerm(
              (coefficient, literals) -> {
                for (int literal : literals) {
                  for (int bit : bitsOf(literal)) {
                    last[0] = join(last[0], bit);
                  }
                }
              });
    }
    Map<Integer, Polynomial.Builder> terms = new LinkedHashMap<>();
    Map<Integer, List<Rule.Part>> partsOf = new LinkedHashMap<>();
    Map<Integer, TreeSet<Integer>> variables = new LinkedHashMap<>();
    new TreeSet<>(parent.keySet())
        .forEach(v -> variables.computeIfAbsent(root(v), r -> new TreeSet<>()).add(v));
    polynomial.forEachTerm(
        (coefficient, own) -> {
          if (own.length > 0) {
            terms
                .computeIfAbsent(root(own[0]), r -> Polynomial.builder(polynomial.size()))
                .add(coefficient, own);
          }
        });
    for (Rule.Part part : parts) {
      int bit = anyBit(part);
      if (bit >= 0) {
        partsOf.computeIfAbsent(root(bit), r -> new ArrayList<>()).add(part);
      }
    }
    List<Share> shares = new ArrayList<>();
    variables.forEach(
        (root, own) ->
            shares.add(
                new Share(
                    terms.getOrDefault(root, Polynomial.builder(polynomial.size())).build(),
                    partsOf.getOrDefault(root, List.of()),
                    own.stream().filter(v -> v < decisionBits).mapToInt(v -> v).toArray(),
                    own.stream().filter(v -> v >= decisionBits).mapToInt(v -> v).toArray())));
    return shares;
  }

  private void joinTerm(int[] variables) {
    int last = -1;
    for (int variable : variables) {
      last = join(last, variable);
      if (variable < decisionBits && !units.ofBit(variable).plain()) {
        for (int bit : allOf(units.ofBit(variable))) {
          last = join(last, bit);
        }
      }
    }
  }

  private int[] bitsOf(int literal) {
    CodedUnit unit = units.ofLiteral(literal);
    return unit.plain() ? new int[] {unit.firstBit() + literal - unit.firstLiteral()} : allOf(unit);
  }

  private static int[] allOf(CodedUnit unit) {
    int[] bits = new int[unit.bits()];
    for (int k = 0; k < bits.length; k++) {
      bits[k] = unit.firstBit() + k;
    }
    return bits;
  }

  private int anyBit(Rule.Part part) {
    int[] found = {-1};
    part.terms()
        .forEachTerm(
            (coefficient, literals) -> {
              for (int literal : literals) {
                int[] bits = bitsOf(literal);
                found[0] = bits.length > 0 ? bits[0] : found[0];
              }
            });
    return found[0];
  }

  private int join(int a, int b) {
    int rootOfB = root(b);
    if (a >= 0) {
      parent.put(rootOfB, root(a));
    }
    return b;
  }

  private int root(int variable) {
    int at = variable;
    int up = parent.computeIfAbsent(at, v -> v);
    while (up != at) {
      int above = Objects.requireNonNull(parent.get(up));
      parent.put(at, above);
      at = up;
      up = above;
    }
    return at;
  }
}
