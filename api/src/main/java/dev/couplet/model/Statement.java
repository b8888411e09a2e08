package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

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
  /**
   * One named part of what a model minimises or maximises.
   *
   * @param name the name, unique in the model
   * @param terms a polynomial over the model's literals, in the model's own sense
   */
  public record Objective(String name, Polynomial terms) {
    Objective inLiterals(int literals) {
      return new Objective(name, terms.inVariables(literals));
    }
  }

  private final Model owner;
  private final List<Decision> decisions;
  private final Decision[] decisionOf;
  private final List<Rule> rules;
  private final List<Objective> objectives;
  private final Sense sense;
  private final Polynomial objective;

  Statement(
      Model owner,
      List<Decision> decisions,
      List<Rule> rules,
      List<Objective> objectives,
      Sense sense) {
    this.owner = owner;
    this.decisions = List.copyOf(decisions);
    this.decisionOf = decisionOf(decisions);
    int literals = decisionOf.length;
    this.rules = rules.stream().map(rule -> rule.inLiterals(literals)).toList();
    this.objectives = objectives.stream().map(part -> part.inLiterals(literals)).toList();
    this.sense = sense;
    this.objective = sum(this.objectives, literals);
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
      int literals = decision instanceof Choice<?> choice ? choice.values() : 1;
      for (int k = 0; k < literals; k++) {
        owners.add(decision);
      }
    }
    return owners.toArray(new Decision[0]);
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

  /** The sum of the objectives, without the costs of preferred rules, in the model's own sense. */
  public Polynomial objective() {
    return objective;
  }

  /** The number of literals. */
  public int literals() {
    return decisionOf.length;
  }

  /** The number of the first literal of a decision of this model. */
  public int firstLiteral(Decision decision) {
    require(decision);
    return decision instanceof Choice<?> choice ? choice.firstLiteral() : ((Bit) decision).index();
  }

  /** The decision that a literal belongs to. */
  public Decision decisionOf(int literal) {
    return decisionOf[literal];
  }

  /** A literal in words: the name of a bit, or of a choice and its option. */
  public String describe(int literal) {
    Decision decision = decisionOf[literal];
    return decision instanceof Choice<?> choice
        ? choice.name() + " = " + choice.options().get(literal - choice.firstLiteral())
        : decision.name();
  }

  /**
   * Between which numbers a polynomial over the literals lies under any plan. Exact for linear
   * polynomials with whole coefficients, else a range that holds; linear in its terms.
   */
  public Range range(Polynomial polynomial) {
    return Ranges.of(polynomial, this::decisionOf);
  }

  /** Begins a plan by hand. */
  public Plan.Draft plan() {
    return new Plan.Draft(this);
  }

  /**
   * The plan that the literals' values stand for. Choices with no option or several are undecided
   * in it. Linear in the size of rules and objective.
   *
   * @throws IllegalArgumentException if the state is not of size {@link #literals()}
   */
  public Plan plan(State literals) {
    return Plan.of(this, literals);
  }

  /** The position of a choice's only option that holds; empty if none or several do. */
  Optional<Integer> chosen(Choice<?> choice, State literals) {
    Optional<Integer> found = Optional.empty();
    for (int k = 0; k < choice.values(); k++) {
      if (literals.get(choice.firstLiteral() + k)) {
        if (found.isPresent()) {
          return Optional.empty();
        }
        found = Optional.of(k);
      }
    }
    return found;
  }

  /**
   * Insists that a decision belongs to this statement.
   *
   * @throws IllegalArgumentException if it is of another model, or was made after this statement
   */
  void require(Decision decision) {
    Model other = decision instanceof Choice<?> choice ? choice.owner() : ((Bit) decision).owner();
    int first =
        decision instanceof Choice<?> choice ? choice.firstLiteral() : ((Bit) decision).index();
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
    if (first >= literals()) {
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
