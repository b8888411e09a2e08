package dev.couplet.audit;

import dev.couplet.audit.LoweringAudit.Certificate;
import dev.couplet.audit.LoweringAudit.RuleProof;
import dev.couplet.form.Polynomial;
import dev.couplet.lower.Ledger.Kind;
import dev.couplet.lower.Ledger.Source;
import dev.couplet.lower.Lowered;
import dev.couplet.model.Decision;
import dev.couplet.model.Plan;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * One audit rule by rule: takes the form apart by its ledger, proves each part by itself, and puts
 * the proofs together by the weights. Belongs to one thread.
 */
final class RuleAudit {
  /** A rule or code whose penalty is proved. */
  private record Proved(double weight, double least, double lowest, Set<Decision> codes) {}

  private final Lowered lowered;
  private final Statement statement;
  private final int decisionBits;
  private final Notes notes = new Notes();
  private final CodedUnits units;
  private final PlanBasis basis;
  private final RuleProver prover;
  private final Map<String, Map<Kind, Source>> sources = new LinkedHashMap<>();
  private final Map<Integer, String> ownerOf = new HashMap<>();
  private final List<RuleProof> proofs = new ArrayList<>();
  private final Map<String, Proved> proved = new LinkedHashMap<>();
  private double lowest;
  private double highest;

  RuleAudit(Lowered lowered, Optional<Plan> known) {
    this.lowered = lowered;
    this.statement = lowered.statement();
    this.decisionBits = lowered.decisionBits();
    this.units = new CodedUnits(lowered, notes);
    this.basis = new PlanBasis(units, statement.literals());
    this.prover = new RuleProver(units, decisionBits);
    this.highest = highest(known);
  }

  /** The most that the best feasible plan can cost. */
  private double highest(Optional<Plan> known) {
    Polynomial minimised = statement.objective().times(statement.sense().sign());
    double all = statement.range(minimised).highest();
    for (Rule rule : statement.rules()) {
      all += rule.largestCost();
    }
    if (known.isEmpty()) {
      return all;
    }
    Plan plan = known.get();
    if (!plan.feasible() || !plan.statement().sameModel(statement)) {
      throw new IllegalArgumentException(
          "the known plan is of "
              + plan.statement()
              + (plan.feasible() ? "" : " and is not feasible")
              + "; pass a feasible plan of the model that was lowered");
    }
    return Math.min(all, lowered.energyOf(statement.plan(plan.literals()).value()));
  }

  Certificate certificate() {
    if (LedgerSum.check(lowered, notes)) {
      proveAll();
    } else {
      lowest = Double.NEGATIVE_INFINITY;
    }
    return new Certificate(
        Math.max(0, highest - lowest),
        proofs,
        notes.of("the lowering of '" + statement.name() + "', rule by rule"));
  }

  private void proveAll() {
    takeLedger();
    proveObjective();
    statement.decisions().forEach(this::proveCode);
    for (Rule rule : statement.rules()) {
      if (rule.required()) {
        proveRequired(rule);
      } else {
        provePreferred(rule);
      }
    }
    compareWeights();
  }

  private void takeLedger() {
    Polynomial form = lowered.qubo().toPolynomial();
    List<Source> all = lowered.ledger().sources();
    boolean others = form.size() > decisionBits;
    ProductBits products =
        others ? ProductBits.of(form, decisionBits, 0) : ProductBits.of(form, form.size(), 0);
    for (Source source : all) {
      Polynomial terms = products.replacedIn(source.terms());
      String name = source.kind() == Kind.OBJECTIVE ? "" : source.name();
      claim(name.isEmpty() ? "the objective" : name, terms);
      if (source.kind() == Kind.PRODUCT) {
        notes.expect(
            "auxiliary bits",
            terms.terms() == 0,
            () -> "not certified: bits of " + source.name() + " are not held to their products");
      } else {
        Source own = new Source(name, source.kind(), terms, source.factor());
        sources
            .computeIfAbsent(name, n -> new LinkedHashMap<>())
            .merge(source.kind(), own, RuleAudit::sum);
      }
    }
  }

  private static Source sum(Source a, Source b) {
    Polynomial.Builder sum = Polynomial.builder(a.terms().size());
    sum.add(a.terms(), a.factor()).add(b.terms(), b.factor());
    return new Source(a.name(), a.kind(), sum.build(), 1);
  }

  /** An auxiliary bit is of one part only, so that each is minimised by itself. */
  private void claim(String owner, Polynomial terms) {
    Set<Integer> own = new LinkedHashSet<>();
    terms.forEachTerm(
        (coefficient, variables) -> {
          for (int variable : variables) {
            if (variable >= decisionBits) {
              own.add(variable);
            }
          }
        });
    for (int bit : own) {
      String other = ownerOf.putIfAbsent(bit, owner);
      notes.expect(
          "auxiliary bits",
          other == null || other.equals(owner),
          () ->
              "not certified: '"
                  + owner
                  + "' and '"
                  + other
                  + "' share auxiliary bit "
                  + lowered.ledger().meaning(bit));
    }
  }

  private void proveObjective() {
    Polynomial stated = statement.objective().times(statement.sense().sign());
    Map<Kind, Source> own = sources.getOrDefault("", Map.of());
    Polynomial terms = Polynomial.builder(lowered.qubo().size()).build();
    for (Source source : own.values()) {
      terms = Polynomial.builder(terms.size()).add(source.terms(), source.factor()).build();
    }
    Optional<Polynomial> minimised = ObjectiveShare.minimised(terms, decisionBits);
    if (minimised.isEmpty()) {
      lowest = Double.NEGATIVE_INFINITY;
      notes.add("objective", "not certified: auxiliary bits of it hang together with too many");
      return;
    }
    Polynomial overBits = minimised.get();
    lowest += overBits.lowest();
    boolean same = Agreement.of(basis.ofBits(overBits), basis.ofLiterals(stated));
    notes.expect(
        "objective",
        basis.fits() && same,
        () ->
            basis.fits()
                ? "the form's objective differs from the model's under some plan"
                : "not certified: too many products of options to be written out");
  }

  private void proveCode(Decision decision) {
    Map<Kind, Source> own = sources.getOrDefault(decision.code(), Map.of());
    Source code = own.get(Kind.CODE);
    Set<Decision> touched = Set.of(decision);
    Polynomial none = Polynomial.builder(lowered.qubo().size()).build();
    List<String> against = new ArrayList<>();
    Optional<ShareProof> proof = prover.code(decision, code == null ? none : code.terms(), against);
    if (proof.isEmpty()) {
      notes.add("code", "not certified: '" + decision.code() + "': " + String.join("; ", against));
    } else if (proof.get().least() < Double.POSITIVE_INFINITY) {
      double weight = code == null ? 0 : code.factor();
      proved.put(decision.code(), new Proved(weight, proof.get().least(), 0, touched));
      proofs.add(new RuleProof(decision.code(), proof.get().how()));
    }
  }

  private void proveRequired(Rule rule) {
    Source source = sources.getOrDefault(rule.name(), Map.of()).get(Kind.PENALTY);
    Polynomial none = Polynomial.builder(lowered.qubo().size()).build();
    List<String> against = new ArrayList<>();
    Polynomial terms = source == null ? none : source.terms();
    Optional<ShareProof> proof =
        source == null && rule.alwaysKept()
            ? Optional.of(new ShareProof(0, Double.POSITIVE_INFINITY, 0, "every plan keeps it"))
            : prover.rule(rule, terms, against);
    if (proof.isEmpty()) {
      notes.add("rule", "not certified: '" + rule.name() + "': " + String.join("; ", against));
      return;
    }
    ShareProof sure = proof.get();
    proofs.add(new RuleProof(rule.name(), sure.how()));
    if (sure.least() < Double.POSITIVE_INFINITY || sure.lowest() < 0) {
      double weight = source == null ? 0 : source.factor();
      proved.put(
          rule.name(), new Proved(weight, sure.least(), sure.lowest(), prover.codesIn(terms)));
    }
  }

  private void provePreferred(Rule rule) {
    Polynomial.Builder sum = Polynomial.builder(lowered.qubo().size());
    for (Source source : sources.getOrDefault(rule.name(), Map.of()).values()) {
      sum.add(source.terms(), source.factor());
    }
    List<String> against = new ArrayList<>();
    Optional<ShareProof> proof = prover.cost(rule, sum.build(), basis, against);
    if (proof.isEmpty()) {
      notes.add("cost", "not certified: '" + rule.name() + "': " + String.join("; ", against));
      lowest = Double.NEGATIVE_INFINITY;
    } else {
      lowest += Math.min(0, proof.get().lowest());
      proofs.add(new RuleProof(rule.name(), proof.get().how()));
    }
  }

  /**
   * A pattern that breaks a rule and no code is worth at least the lowest of the objective and its
   * penalty; where codes are broken, also what the penalties of rules over these can be below 0.
   */
  private void compareWeights() {
    Map<Decision, Double> below = new HashMap<>();
    proved
        .values()
        .forEach(
            one -> {
              for (Decision decision : one.lowest() < 0 ? one.codes() : Set.<Decision>of()) {
                below.merge(decision, -one.weight() * one.lowest(), Double::sum);
              }
            });
    double magnitude = Math.max(Math.abs(lowest), Math.abs(highest));
    double error = lowest == Math.rint(lowest) && highest == Math.rint(highest) ? 0 : magnitude;
    error *= 0x1p-40;
    for (Map.Entry<String, Proved> entry : proved.entrySet()) {
      Proved one = entry.getValue();
      boolean code = sources.getOrDefault(entry.getKey(), Map.of()).containsKey(Kind.CODE);
      double most = 0;
      for (Decision decision : code ? one.codes() : Set.<Decision>of()) {
        most = Math.max(most, below.getOrDefault(decision, 0.0));
      }
      double needed = (Math.max(0, highest - lowest) + most + error) / one.least();
      notes.expect("weight", one.weight() > needed, () -> tooLight(entry.getKey(), one, needed));
    }
  }

  private String tooLight(String rule, Proved one, double needed) {
    return "not certified: '"
        + rule
        + "' weighs "
        + Numbers.shown(one.weight())
        + ", proved to suffice above "
        + Numbers.shown(needed)
        + "; raise it, leave the weights to a bound, or pass a feasible plan that is known: the"
        + " objective is "
        + Numbers.shown(lowest)
        + " at the least and "
        + Numbers.shown(highest)
        + " at the most, less under the best plan";
  }
}
