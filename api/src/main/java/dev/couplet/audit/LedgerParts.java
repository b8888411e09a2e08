package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import dev.couplet.form.Qubo;
import dev.couplet.lower.Ledger.Kind;
import dev.couplet.lower.Ledger.Source;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowered.Weight;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;

/**
 * The form taken apart by its ledger, coefficient by coefficient; products of decision bits stand
 * in the place of auxiliary bits that are best at them, so that parts which share such bits come
 * apart.
 */
final class LedgerParts {
  /** One source in one role: a preferred rule has a cost and a penalty. */
  private record Part(String source, Kind kind) {}

  private final Lowered lowered;
  private final Qubo qubo;
  private final Map<Part, Polynomial.Builder> terms = new LinkedHashMap<>();
  private final Map<Part, Polynomial> parts = new LinkedHashMap<>();
  private final ProductBits products;
  private final Map<Integer, Part> partOfAuxiliary = new HashMap<>();
  private final Set<Part> entangled = new HashSet<>();
  private final boolean addsUp;

  /** Reads the whole ledger, and notes where it does not add up. */
  LedgerParts(Lowered lowered, double error, Notes notes) {
    this.lowered = lowered;
    this.qubo = lowered.qubo();
    this.addsUp = LedgerSum.check(lowered, notes);
    for (Source source : lowered.ledger().sources()) {
      terms
          .computeIfAbsent(
              new Part(source.name(), source.kind()), p -> Polynomial.builder(qubo.size()))
          .add(source.terms(), source.factor());
    }
    products = ProductBits.of(qubo.toPolynomial(), lowered.decisionBits(), error);
    terms.forEach((part, own) -> parts.put(part, products.replacedIn(own.build())));
    parts.forEach(this::claim);
  }

  private void claim(Part part, Polynomial own) {
    own.forEachTerm(
        (coefficient, variables) -> {
          for (int variable : variables) {
            claim(part, variable);
          }
        });
  }

  private void claim(Part part, int variable) {
    if (variable >= lowered.decisionBits()) {
      Part other = partOfAuxiliary.putIfAbsent(variable, part);
      if (other != null && !other.equals(part)) {
        entangled.add(part);
        entangled.add(other);
      }
    }
  }

  /**
   * Which part of the form a weight multiplies, if that can be told: no other part has auxiliary
   * bits in common with it, and the ledger adds up.
   */
  private Optional<Part> partOf(Weight weight) {
    Part code = new Part(weight.rule(), Kind.CODE);
    Part penalty = new Part(weight.rule(), Kind.PENALTY);
    boolean isCode = parts.containsKey(code);
    Part part = isCode ? code : penalty;
    boolean told = parts.containsKey(part) && !(isCode && parts.containsKey(penalty));
    return told && addsUp && !entangled.contains(part) ? Optional.of(part) : Optional.empty();
  }

  /** The guards of the weights that can be analysed, by name. */
  Map<String, Guard> guards(List<Weight> weights) {
    Map<String, Guard> guards = new LinkedHashMap<>();
    for (Weight weight : weights) {
      partOf(weight)
          .ifPresent(
              part -> {
                Polynomial own = Objects.requireNonNull(parts.get(part));
                guards.put(
                    weight.rule(), new Guard(weight, Landscape.of(own, lowered.decisionBits())));
              });
    }
    return guards;
  }

  /** The form without the parts that have guards. */
  Landscape rest(List<Weight> weights) {
    if (!addsUp) {
      return Landscape.of(products.replacedIn(qubo.toPolynomial()), lowered.decisionBits());
    }
    Set<Part> guarded = new HashSet<>();
    weights.forEach(weight -> partOf(weight).ifPresent(guarded::add));
    Polynomial.Builder rest = Polynomial.builder(qubo.size());
    parts.forEach(
        (part, own) -> {
          if (!guarded.contains(part)) {
            rest.add(own, 1);
          }
        });
    return Landscape.of(rest.build(), lowered.decisionBits());
  }
}
