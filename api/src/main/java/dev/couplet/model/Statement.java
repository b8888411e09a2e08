package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.IntStream;

/**
 * The content of a model at one moment: decisions, rules, objectives. Immutable and thread-safe;
 * what is lowered, audited and solved.
 *
 * <p>Literals are numbered {@code 0 .. literals() - 1}: a bit has one, a choice one for each
 * option, in the order in which the decisions were made. A {@link State} of that size says which
 * hold.
 */
@CheckReturnValue
public final class Statement {
  /** Whether a model's value is to be as low or as high as possible. */
  public enum Sense {
    /** Lower values are better; also the sense of a model without an objective. */
    MINIMIZE,
    /** Higher values are better. */
    MAXIMIZE;

    /** What a value is multiplied by where everything is minimised: 1 or -1. */
    public int sign() {
      return this == MINIMIZE ? 1 : -1;
    }
  }

  /**
   * Two numbers between which a quantity lies, both included.
   *
   * @param lowest the lower one
   * @param highest the higher one
   */
  public record Range(double lowest, double highest) {
    /** The difference of the two. */
    public double width() {
      return highest - lowest;
    }
  }

  /**
   * One named part of what a model minimises or maximises.
   *
   * @param name the name, unique in the model
   * @param terms a polynomial over the model's literals, in the model's own sense
   */
  public record Objective(String name, Polynomial terms) {
    Objective inLiterals(int literals, Fixing fixing) {
      return new Objective(name, fixing.in(terms.inVariables(literals)));
    }
  }

  private final Model owner;
  private final List<Decision> decisions;
  private final Decision[] decisionOf;
  private final BitSet grouped;
  private final List<Rule> rules;
  private final List<Objective> objectives;
  private final List<Objective> shares;
  private final List<Extreme> extremes;
  private final Sense sense;
  private final Polynomial objective;
  private final Fixing fixing;

  Statement(
      Model owner,
      List<Decision> decisions,
      List<Rule> rules,
      List<Objective> objectives,
      Sense sense,
      boolean strictOrder,
      List<Extreme> extremes,
      Map<Decision, boolean[]> fixed) {
    this.owner = owner;
    this.decisions = List.copyOf(decisions);
    this.extremes = List.copyOf(extremes);
    this.decisionOf = decisionOf(decisions);
    this.grouped = grouped(decisions);
    int literals = decisionOf.length;
    this.fixing = new Fixing(fixed, literals);
    this.rules = rules.stream().map(rule -> inLiterals(rule, literals)).toList();
    this.objectives = objectives.stream().map(part -> part.inLiterals(literals, fixing)).toList();
    this.sense = sense;
    this.shares =
        strictOrder
            ? StrictOrder.shares(this.objectives, this.rules, this::range)
            : this.objectives;
    this.objective = sum(shares, literals);
  }

  private Rule inLiterals(Rule rule, int literals) {
    Rule wide = rule.inLiterals(literals);
    return fixing.isEmpty() ? wide : wide.fixed(fixing, this::range);
  }

  private static Polynomial sum(List<Objective> objectives, int literals) {
    if (objectives.size() == 1) {
      return objectives.get(0).terms();
    }
    Polynomial.Builder sum = Polynomial.builder(literals);
    objectives.forEach(part -> sum.add(part.terms(), 1));
    return sum.build();
  }

  static Decision[] decisionOf(List<Decision> decisions) {
    List<Decision> owners = new ArrayList<>();
    for (Decision decision : decisions) {
      int literals = Slot.of(decision).literals();
      for (int k = 0; k < literals; k++) {
        owners.add(decision);
      }
    }
    return owners.toArray(new Decision[0]);
  }

  /** The literals that belong to a group of which exactly one holds. */
  private static BitSet grouped(List<Decision> decisions) {
    BitSet grouped = new BitSet();
    for (Decision decision : decisions) {
      Slot slot = Slot.of(decision);
      if (slot.groups() > 0) {
        grouped.set(slot.first(), slot.first() + slot.literals());
      }
    }
    return grouped;
  }

  /** The model's name. */
  public String name() {
    return owner.name();
  }

  /** Whether lower or higher values are better. */
  public Sense sense() {
    return sense;
  }

  /** The decisions, in the order in which they were made. */
  public List<Decision> decisions() {
    return decisions;
  }

  /** The rules, in the order in which they were stated. */
  public List<Rule> rules() {
    return rules;
  }

  /** The parts of the objective, in the order in which they were stated. */
  public List<Objective> objectives() {
    return objectives;
  }

  /**
   * What each objective adds to {@link #objective()}: itself; or in strict order so much more of
   * the earlier ones that the later ones never outweigh them, without constants.
   */
  public List<Objective> shares() {
    return shares;
  }

  /** The sum of the shares, without the costs of preferred rules, in the model's own sense. */
  public Polynomial objective() {
    return objective;
  }

  /** Writes the patterns of fixed decisions. */
  void writeFixed(boolean[] all) {
    fixing.write(all);
  }

  List<Extreme> extremes() {
    return extremes;
  }

  /** Whether an objective decides among plans that are equally good by all earlier ones. */
  boolean inStrictOrder() {
    return shares != objectives;
  }

  /** The number of literals. */
  public int literals() {
    return decisionOf.length;
  }

  /** The number of the first literal of a decision of this model. */
  public int firstLiteral(Decision decision) {
    require(decision);
    return Slot.of(decision).first();
  }

  /** The number of literals of a decision of this model; they follow its first one. */
  public int literals(Decision decision) {
    require(decision);
    return Slot.of(decision).literals();
  }

  /**
   * The groups of literals of a decision of which a plan makes exactly one hold, such as the
   * options of a choice; none where every pattern of its literals is a value, or the decision is
   * fixed.
   */
  public List<List<Integer>> exactlyOne(Decision decision) {
    require(decision);
    if (fixing.has(decision)) {
      return List.of();
    }
    Slot slot = Slot.of(decision);
    List<List<Integer>> groups = new ArrayList<>(slot.groups());
    for (int g = 0; g < slot.groups(); g++) {
      int from = slot.first() + g * slot.groupSize();
      groups.add(IntStream.range(from, from + slot.groupSize()).boxed().toList());
    }
    return groups;
  }

  /** The literals of a decision of which every pattern is a value; none where it is fixed. */
  public List<Integer> free(Decision decision) {
    require(decision);
    Slot slot = Slot.of(decision);
    if (slot.groups() > 0 || fixing.has(decision)) {
      return List.of();
    }
    return slot.literals() == 1
        ? List.of(slot.first())
        : IntStream.range(slot.first(), slot.first() + slot.literals()).boxed().toList();
  }

  /**
   * Whether a decision of this model is fixed: every plan has its value, rules speak of the rest.
   */
  public boolean isFixed(Decision decision) {
    require(decision);
    return fixing.has(decision);
  }

  /** The same literals, those of fixed decisions as they are fixed. */
  State withFixed(State literals) {
    if (fixing.isEmpty()) {
      return literals;
    }
    boolean[] all = literals.toBooleans();
    fixing.write(all);
    return State.of(all);
  }

  Fixing fixing() {
    return fixing;
  }

  /**
   * The decision that a literal belongs to.
   *
   * @throws IllegalArgumentException if there is no literal of that number
   */
  public Decision decisionOf(int literal) {
    if (literal < 0 || literal >= literals()) {
      throw new IllegalArgumentException(
          "literal "
              + literal
              + " is none of model '"
              + name()
              + "', which has "
              + literals()
              + ", numbered from 0");
    }
    return decisionOf[literal];
  }

  /** A literal in words: the name of a bit, or of a choice and its option. */
  public String describe(int literal) {
    Decision decision = decisionOf(literal);
    return Fact.describe(decision, literal - Slot.of(decision).first());
  }

  /**
   * Between which numbers a polynomial over the literals lies under any plan. Exact for linear
   * polynomials with whole coefficients, else a range that holds; linear in its terms.
   */
  public Range range(Polynomial polynomial) {
    return grouped.isEmpty()
        ? Ranges.ofFree(polynomial)
        : Ranges.of(polynomial, grouped::get, this::decisionOf);
  }

  /** Begins a plan by hand. */
  public Plan.Draft plan() {
    return new Plan.Draft(this);
  }

  /**
   * The plan that the literals' values stand for. Choices with no option or several are undecided
   * in it; fixed decisions have the value that they are fixed to, whatever the state says. Linear
   * in the size of rules and objective.
   *
   * @throws IllegalArgumentException if the state is not of size {@link #literals()}
   */
  public Plan plan(State literals) {
    return plan(literals, Set.of());
  }

  /**
   * The same where more decisions are known to be undecided: those whose bits stand for no value.
   */
  public Plan plan(State literals, Set<Decision> undecided) {
    return Plan.of(this, literals, undecided);
  }

  /** By how many literals too few or too many the groups of a decision hold; 0 if it is decided. */
  static int excess(Decision decision, State literals) {
    Slot slot = Slot.of(decision);
    int excess = 0;
    for (int g = 0; g < slot.groups(); g++) {
      int ones = 0;
      for (int k = 0; k < slot.groupSize(); k++) {
        ones += literals.bit(slot.first() + g * slot.groupSize() + k);
      }
      excess += Math.abs(ones - 1);
    }
    return excess;
  }

  /**
   * Insists that a decision belongs to this statement.
   *
   * @throws IllegalArgumentException if it is of another model, or was made after this statement
   */
  public void require(Decision decision) {
    Slot slot = Slot.of(decision);
    Model other = slot.owner();
    if (other != owner) {
      throw new IllegalArgumentException(
          "decision '"
              + decision.name()
              + "' belongs to model '"
              + other.name()
              + "', not to model '"
              + name()
              + "'");
    }
    if (slot.first() + slot.literals() > literals()) {
      throw new IllegalArgumentException(
          "decision '"
              + decision.name()
              + "' was added to model '"
              + name()
              + "' after this was made from it; lower or evaluate the model again");
    }
  }

  /** Whether another statement was made from the same model, at the same or another moment. */
  public boolean sameModel(Statement other) {
    return owner == other.owner;
  }

  Model owner() {
    return owner;
  }

  @Override
  public String toString() {
    return "Statement("
        + name()
        + ": "
        + decisions.size()
        + " decisions, "
        + rules.size()
        + " rules, "
        + objectives.size()
        + " objectives)";
  }
}
