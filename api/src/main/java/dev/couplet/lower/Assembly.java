package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.form.Qubo;
import dev.couplet.lower.Ledger.Kind;
import dev.couplet.lower.Ledger.Source;
import dev.couplet.lower.Lowered.Weight;
import dev.couplet.model.Decision;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import dev.couplet.model.Statement.Objective;
import dev.couplet.model.Statement.Range;
import dev.couplet.sampling.Structure;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** One lowering under way: collects sources in the order of the statement, weighs and adds them. */
final class Assembly {
  /** Whole numbers that add up to less are exact, quarters of them too. */
  private static final double WHOLE_LIMIT = 0x1p51;

  /** A sum of so many times a number holds the number to about one part in a thousand. */
  private static final double DIGITS_LEFT = 0x1p43;

  private final Statement statement;
  private final Lowering settings;
  private final Coding coding;
  private final BitTable bits;
  private final Range objective;
  private final boolean whole;
  private final List<Source> sources = new ArrayList<>();
  private final List<Weight> weights = new ArrayList<>();
  private final List<String> approximate = new ArrayList<>();

  /** How far the weighted penalties of rules go below 0 on patterns that break a code. */
  private final Map<Decision, Double> below = new HashMap<>();

  Assembly(Statement statement, Lowering settings) {
    this.statement = statement;
    this.coding = new Coding(statement, settings);
    this.settings = settings.begin(statement, coding.literalsAreBits());
    this.bits = new BitTable(coding);
    this.objective = objectiveRange();
    this.whole = objectiveIsWhole();
  }

  Lowered lowered() {
    int sign = statement.sense().sign();
    for (Objective part : statement.shares()) {
      addSource(part.name(), Kind.OBJECTIVE, coding.overBits(part.terms().times(sign)), 1);
    }
    int objectives = sources.size();
    for (Rule rule : statement.rules()) {
      addRule(rule);
    }
    List<Source> ofRules = takeFrom(sources, objectives);
    List<Weight> weightsOfRules = takeFrom(weights, 0);
    addCodes();
    sources.addAll(ofRules);
    weights.addAll(weightsOfRules);
    List<Source> quadratic = DegreeReduction.of(List.copyOf(sources), settings.aim(), bits);
    sources.clear();
    sources.addAll(quadratic);
    return new Lowered(
        statement,
        qubo(),
        coding,
        bits,
        ledger(),
        List.copyOf(weights),
        List.copyOf(approximate),
        structure());
  }

  /** Codes come before rules, but are weighed after them. */
  private static <T> List<T> takeFrom(List<T> list, int from) {
    List<T> tail = list.subList(from, list.size());
    List<T> taken = new ArrayList<>(tail);
    tail.clear();
    return taken;
  }

  /** Sources were made while bits were still being added: all are brought to the final number. */
  private Ledger ledger() {
    List<Source> widened =
        sources.stream()
            .map(
                s -> new Source(s.name(), s.kind(), s.terms().inVariables(bits.size()), s.factor()))
            .toList();
    return new Ledger(widened, bits.meanings());
  }

  /** A decision of several groups has one code, whose penalties add up. */
  private void addCodes() {
    List<Coding.Coded> coded = coding.coded();
    for (int from = 0; from < coded.size(); ) {
      Decision decision = coded.get(from).decision();
      List<Penalty> penalties = new ArrayList<>();
      for (; from < coded.size() && coded.get(from).decision() == decision; from++) {
        Coding.Coded one = coded.get(from);
        penalties.add(new Penalty(coding.penalty(one), one.code().form()));
      }
      Penalty penalty = Penalty.sum(penalties, bits.size());
      if (penalty.terms().terms() > 0) {
        addPenalty(decision.code(), Kind.CODE, penalty, below.getOrDefault(decision, 0.0));
      }
    }
    for (Recoded one : coding.recoded()) {
      Penalty penalty = new Penalty(coding.penalty(one), one.code().form());
      if (penalty.terms().terms() > 0) {
        addPenalty(one.count().code(), Kind.CODE, penalty, 0);
      }
    }
  }

  private void addRule(Rule rule) {
    if (rule.alwaysKept()) {
      weights.add(new Weight(rule.name(), "nothing", 0, "every plan keeps it"));
    } else if (rule.required()) {
      List<Penalty> penalties = RequiredRule.penalties(rule, coding, bits, settings);
      Penalty penalty = Penalty.sum(penalties, bits.size());
      double weight = addPenalty(rule.name(), Kind.PENALTY, penalty, 0);
      if (penalty.lowest() < 0) {
        for (Decision decision : coding.codedIn(penalty.terms())) {
          below.merge(decision, weight * penalty.lowest(), Double::sum);
        }
      }
    } else {
      addPreferred(rule);
    }
  }

  /** Returns the weight; what it guards may let other penalties go so far below 0. */
  private double addPenalty(String name, Kind kind, Penalty penalty, double othersBelow) {
    if (penalty.approximate()) {
      String why = "approximate: feasible plans cost something too; nothing is proved";
      approximate.add(name);
      weights.add(new Weight(name, penalty.form(), 1, why));
      addSource(name, kind, penalty.terms(), 1);
      return 1;
    }
    Range guarded = new Range(objective.lowest() + othersBelow, objective.highest());
    Weights.Chosen chosen = settings.choose(new Weights.Facts(name, statement, guarded, whole));
    String reason =
        othersBelow == 0
            ? chosen.reason()
            : chosen.reason() + "; of that " + Weights.shown(-othersBelow) + " by rules";
    weights.add(new Weight(name, penalty.form(), chosen.value(), reason));
    addSource(name, kind, penalty.terms(), chosen.value());
    return chosen.value();
  }

  private void addPreferred(Rule rule) {
    List<PreferredRule> parts = new ArrayList<>();
    double unitCost = 0;
    for (Rule.Part part : rule.parts()) {
      if (!part.alwaysKept()) {
        PreferredRule preferred = PreferredRule.of(part, rule, coding, bits, settings.aim());
        parts.add(preferred);
        addSource(rule.name(), Kind.COST, preferred.cost(), part.cost(1));
        unitCost = Math.max(unitCost, part.cost(1));
      }
    }
    String form = Penalty.words(parts.stream().map(PreferredRule::form).toList());
    if (parts.stream().allMatch(part -> part.tie().isEmpty())) {
      weights.add(new Weight(rule.name(), form, unitCost, "its own cost, exactly"));
      return;
    }
    boolean wholeCost = unitCost == Math.rint(unitCost);
    double enough = RangeBound.above(unitCost, wholeCost);
    String reason = "above its cost a unit, so that counting the whole amount is cheapest";
    weights.add(new Weight(rule.name(), form, enough, reason));
    for (PreferredRule part : parts) {
      part.tie().ifPresent(tie -> addSource(rule.name(), Kind.PENALTY, tie, enough));
    }
  }

  private void addSource(String name, Kind kind, Polynomial terms, double factor) {
    sources.add(new Source(name, kind, terms, factor));
  }

  /** Lowest over all bit patterns, highest under any plan; preferred rules included. */
  private Range objectiveRange() {
    Polynomial minimised = statement.objective().times(statement.sense().sign());
    double highest = statement.range(minimised).highest();
    for (Rule rule : statement.rules()) {
      highest += rule.largestCost();
    }
    Polynomial overBits = coding.overBits(minimised);
    double lowest = Terms.lowest(overBits);
    double magnitude = Math.max(Terms.magnitude(overBits), Math.abs(highest));
    double error = objectiveIsWhole() || magnitude == 0 ? 0 : Math.ulp(magnitude) * 4;
    error *= statement.objective().terms() + statement.rules().size() + 1;
    return new Range(lowest - error, highest + error);
  }

  private boolean objectiveIsWhole() {
    boolean all = Terms.whole(statement.objective());
    for (Rule rule : statement.rules()) {
      for (Rule.Part part : rule.parts()) {
        double cost = part.cost(1);
        all &= cost == Math.rint(cost);
      }
    }
    return all;
  }

  private Qubo qubo() {
    refuseTooLarge();
    Qubo.Builder form = Qubo.builder(bits.size());
    for (Source source : sources) {
      form = form.add(source.terms(), source.factor());
    }
    return form.build();
  }

  /** The largest form whose energies are exact, or for real objectives hold most of its digits. */
  private double largest() {
    double felt = RangeBound.felt(objective.width(), objective);
    return whole || felt == 0 ? WHOLE_LIMIT : felt * DIGITS_LEFT;
  }

  private void refuseTooLarge() {
    double total = 0;
    double heaviest = 0;
    String name = "";
    for (Source source : sources) {
      double terms = Terms.magnitude(source.terms());
      refuseInexact(source, terms);
      double magnitude = terms * source.factor();
      total += magnitude;
      if (magnitude > heaviest) {
        heaviest = magnitude;
        name = source.name();
      }
    }
    if (total >= largest()) {
      throw new IllegalArgumentException(
          "the coefficients of the form would add up to "
              + Weights.shown(total)
              + (whole
                  ? ", energies are exact below 2^51"
                  : ", so that rounding would eat up an objective that can win no more than "
                      + Weights.shown(objective.width()))
              + "; the heaviest part is '"
              + name
              + "' with "
              + Weights.shown(heaviest)
              + ": choose larger units there, or a smaller weight");
    }
  }

  /** Penalties are whole before they are weighed; rounded ones would not vanish where they must. */
  private static void refuseInexact(Source source, double magnitude) {
    if (isWhole(source.kind()) && magnitude >= WHOLE_LIMIT) {
      throw new IllegalArgumentException(
          "the whole coefficients of the penalty of '"
              + source.name()
              + "' add up to "
              + Weights.shown(magnitude)
              + ", they are exact below 2^51; choose larger units there");
    }
  }

  private static boolean isWhole(Kind kind) {
    return kind != Kind.OBJECTIVE && kind != Kind.PRODUCT;
  }

  private Structure structure() {
    List<List<Integer>> sets = coding.exactlyOne();
    return sets.isEmpty() ? Structure.none() : Structure.exactlyOne(sets);
  }
}
