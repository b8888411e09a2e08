package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.model.Decision;
import dev.couplet.model.Rule;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Proves of single penalties that they are what they should be. A penalty is cut into shares that
 * have no bit in common; each share is looked at under every pattern of its bits if they are few,
 * or has to be of a form that is known to be right for any number of bits.
 */
final class RuleProver {
  /** The most decision bits of a share that is looked at pattern by pattern in any case. */
  private static final int FEW_BITS = 10;

  /** The same where no form is recognised. */
  private static final int MOST_BITS = 20;

  private final CodedUnits units;
  private final int decisionBits;
  private final Map<Decision, List<CodedUnit>> unitsOf = new LinkedHashMap<>();

  RuleProver(CodedUnits units, int decisionBits) {
    this.units = units;
    this.decisionBits = decisionBits;
    for (CodedUnit unit : units.all()) {
      unitsOf.computeIfAbsent(unit.decision(), d -> new ArrayList<>()).add(unit);
    }
  }

  /** The decisions of which a polynomial has bits that are not literals. */
  Set<Decision> codesIn(Polynomial polynomial) {
    Set<Decision> decisions = new LinkedHashSet<>();
    polynomial.forEachTerm(
        (coefficient, variables) -> {
          for (int variable : variables) {
            if (variable < decisionBits && !units.ofBit(variable).plain()) {
              decisions.add(units.ofBit(variable).decision());
            }
          }
        });
    return decisions;
  }

  /** The penalty of a required rule; what speaks against it is added to the list. */
  Optional<ShareProof> rule(Rule rule, Polynomial terms, List<String> against) {
    List<ShareProof> proofs = new ArrayList<>();
    for (Share share : Shares.of(terms, rule.parts(), units, decisionBits)) {
      Optional<ShareProof> proof = share(share, against);
      if (proof.isEmpty()) {
        return proof;
      }
      proofs.add(proof.get());
    }
    return sum(proofs, terms.constant(), against);
  }

  private Optional<ShareProof> share(Share share, List<String> against) {
    if (share.bits().length + share.others().length <= FEW_BITS) {
      return new ShareTable(share, units).penalty(0, against);
    }
    Optional<ShareProof> form = byForm(share);
    if (form.isPresent()) {
      return form;
    }
    if (share.bits().length <= MOST_BITS) {
      return new ShareTable(share, units).penalty(0, against);
    }
    against.add(
        "it has a part of "
            + share.bits().length
            + " bits that is of no form that is known here, and at most "
            + MOST_BITS
            + " bits are looked at pattern by pattern; audit a smaller model made by the same"
            + " code, or choose one bit an option");
    return Optional.empty();
  }

  private Optional<ShareProof> byForm(Share share) {
    boolean plain = true;
    for (int bit : share.bits()) {
      plain &= units.ofBit(bit).plain();
    }
    if (!plain || share.parts().size() != 1 || share.parts().get(0).terms().degree() != 1) {
      return Optional.empty();
    }
    Rule.Part part = share.parts().get(0);
    double[] amounts = new double[share.bits().length];
    for (int k = 0; k < amounts.length; k++) {
      CodedUnit unit = units.ofBit(share.bits()[k]);
      int literal = unit.firstLiteral() + share.bits()[k] - unit.firstBit();
      amounts[k] = part.terms().coefficient(literal);
    }
    Polynomial own = share.renumbered();
    return SquareShare.penalty(own, part, amounts).or(() -> symmetric(own, part, amounts));
  }

  private static Optional<ShareProof> symmetric(Polynomial own, Rule.Part part, double[] amounts) {
    boolean[] negated = new boolean[amounts.length];
    double size = Math.abs(amounts[0]);
    double base = 0;
    for (int k = 0; k < amounts.length; k++) {
      negated[k] = amounts[k] < 0;
      base += Math.min(0, amounts[k]);
      if (Math.abs(amounts[k]) != size) {
        return Optional.empty();
      }
    }
    double offset = base;
    return SymmetricShare.of(own, negated)
        .flatMap(
            share ->
                share.penalty(
                    held ->
                        offset + size * held >= part.range().lowest()
                            && offset + size * held <= part.range().highest(),
                    held -> part.violation(offset + size * held) == 0));
  }

  /** The code of a decision: 0 where its bits stand for a value, above 0 elsewhere. */
  Optional<ShareProof> code(Decision decision, Polynomial terms, List<String> against) {
    List<ShareProof> proofs = new ArrayList<>();
    Map<Integer, Share> byUnit = new LinkedHashMap<>();
    for (Share share : Shares.of(terms, List.of(), units, decisionBits)) {
      CodedUnit unit = units.ofBit(share.bits().length == 0 ? 0 : share.bits()[0]);
      boolean within =
          share.others().length == 0
              && unit.decision() == decision
              && share.bits()[0] >= unit.firstBit()
              && share.bits()[share.bits().length - 1] < unit.firstBit() + unit.bits()
              && byUnit.put(unit.firstLiteral(), share) == null;
      if (!within) {
        against.add("its penalty is not of its own bits alone, cut by groups of its literals");
        return Optional.empty();
      }
    }
    for (CodedUnit unit : unitsOf.getOrDefault(decision, List.of())) {
      Polynomial own = Polynomial.builder(terms.size()).build();
      Share share = byUnit.get(unit.firstLiteral());
      Polynomial ofUnit = share == null ? own : share.terms();
      Optional<ShareProof> proof =
          unit.plain() ? plainCode(unit, ofUnit) : tabulatedCode(unit, ofUnit, against);
      if (proof.isEmpty()) {
        against.add("its penalty does not tell values from other patterns");
        return proof;
      }
      proofs.add(proof.get());
    }
    return sum(proofs, terms.constant(), against);
  }

  private static int[] bitsOf(CodedUnit unit) {
    int[] bits = new int[unit.bits()];
    for (int k = 0; k < bits.length; k++) {
      bits[k] = unit.firstBit() + k;
    }
    return bits;
  }

  private static Optional<ShareProof> plainCode(CodedUnit unit, Polynomial terms) {
    if (!unit.grouped()) {
      return Optional.of(new ShareProof(0, Double.POSITIVE_INFINITY, 0, "bits"));
    }
    Polynomial own = new Share(terms, List.of(), bitsOf(unit), new int[0]).renumbered();
    return SymmetricShare.of(own, new boolean[unit.bits()])
        .flatMap(share -> share.penalty(held -> true, held -> held == 1));
  }

  private static Optional<ShareProof> tabulatedCode(
      CodedUnit unit, Polynomial terms, List<String> against) {
    if (unit.different() != unit.wanted()) {
      against.add(
          unit.different() + " of its " + unit.wanted() + " values are stood for by a pattern");
      return Optional.empty();
    }
    Polynomial own = new Share(terms, List.of(), bitsOf(unit), new int[0]).renumbered();
    double[] seen = {Double.NaN, Double.POSITIVE_INFINITY, 0};
    new Walk(unit.bits(), bit -> 1)
        .over(
            List.of(),
            pattern -> {
              long[] words = unit.bits() == 0 ? new long[0] : new long[] {pattern};
              double value = own.value(State.ofWords(unit.bits(), words));
              if (!unit.valid((int) pattern)) {
                seen[1] = Math.min(seen[1], value);
              } else if (Double.isNaN(seen[0]) || value == seen[0]) {
                seen[0] = value;
              } else {
                seen[2] = 1;
              }
            });
    return seen[2] == 0 && seen[1] > seen[0]
        ? Optional.of(
            new ShareProof(seen[0], seen[1] - seen[0], 0, "all patterns of each group of bits"))
        : Optional.empty();
  }

  /** What missing a preferred rule costs. */
  Optional<ShareProof> cost(Rule rule, Polynomial terms, PlanBasis basis, List<String> against) {
    double constant = terms.constant();
    double lowest = constant;
    for (Share share : Shares.of(terms, rule.parts(), units, decisionBits)) {
      if (share.bits().length > MOST_BITS) {
        return linearCost(rule, terms, basis, against);
      }
      double[] off = {Double.NaN, 0, Double.POSITIVE_INFINITY};
      new ShareTable(share, units)
          .forEach(
              true,
              (decided, codes, cost, value) -> {
                if (decided) {
                  off[0] = Double.isNaN(off[0]) ? value - cost : off[0];
                  off[1] = Math.max(off[1], Math.abs(value - cost - off[0]));
                }
                off[2] = Math.min(off[2], value);
              });
      double error = error(share.terms());
      if (off[1] > error) {
        against.add("the form's cost of missing it is off by " + Numbers.shown(off[1]));
        return Optional.empty();
      }
      constant += Double.isNaN(off[0]) ? 0 : off[0];
      lowest += off[2] < -error || terms.constant() != 0 ? off[2] : Math.max(0, off[2]);
    }
    if (Math.abs(constant) > error(terms)) {
      against.add("keeping it costs " + Numbers.shown(constant) + " in the form");
      return Optional.empty();
    }
    double below = lowest < -error(terms) ? lowest : 0;
    return Optional.of(new ShareProof(0, 1, below, "all patterns of each part's bits"));
  }

  private static double error(Polynomial terms) {
    return terms.whole() ? 0 : Math.ulp(terms.magnitude()) * 64 * (terms.terms() + 1);
  }

  /** Where no plan over-fulfils a limit, the cost is linear in the terms. */
  private Optional<ShareProof> linearCost(
      Rule rule, Polynomial terms, PlanBasis basis, List<String> against) {
    boolean linear = !rule.squared();
    List<Rule.Part> parts = rule.parts();
    int literals = parts.isEmpty() ? 0 : parts.get(0).terms().size();
    Polynomial.Builder stated = Polynomial.builder(literals);
    for (Rule.Part part : parts) {
      boolean over = part.highest() <= part.range().lowest();
      boolean under = part.lowest() >= part.range().highest();
      linear &= part.alwaysKept() || (part.step() == 1 && over != under);
      if (!part.alwaysKept()) {
        double unit = part.cost(1);
        stated.add(part.terms(), over ? unit : -unit);
        stated.add(over ? -unit * part.highest() : unit * part.lowest());
      }
    }
    boolean decisionsOnly = terms.degree() <= 1 && linear;
    if (decisionsOnly
        && Agreement.of(basis.ofBits(inBits(terms)), basis.ofLiterals(stated.build()))) {
      return Optional.of(new ShareProof(0, 1, Math.min(0, terms.lowest()), "the amount itself"));
    }
    against.add(
        "more than "
            + MOST_BITS
            + " bits hang together in it, and it is not the amount itself; audit a smaller model"
            + " made by the same code");
    return Optional.empty();
  }

  private Polynomial inBits(Polynomial terms) {
    Polynomial.Builder own = Polynomial.builder(decisionBits);
    terms.forEachTerm(own::add);
    return own.build();
  }

  /** Shares have no bit in common: breaking one of them is enough to break the rule. */
  private static Optional<ShareProof> sum(
      List<ShareProof> proofs, double constant, List<String> against) {
    double kept = constant;
    double least = Double.POSITIVE_INFINITY;
    double lowest = 0;
    Set<String> how = new LinkedHashSet<>();
    for (ShareProof proof : proofs) {
      kept += proof.kept();
      least = Math.min(least, proof.least());
      lowest += proof.lowest();
      how.add(proof.how());
    }
    if (kept != 0) {
      against.add("its penalty is " + Numbers.shown(kept) + " where it is kept, it has to be 0");
      return Optional.empty();
    }
    return Optional.of(new ShareProof(0, least, lowest, String.join("; ", how)));
  }
}
