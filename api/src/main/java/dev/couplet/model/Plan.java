package dev.couplet.model;

import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * A value for every decision of a model, with what it is worth and which rules it breaks, all
 * checked against the model itself.
 *
 * <p>A plan read from a draw may leave a choice undecided, when the draw says none or several of
 * its options; such a plan is infeasible, and its value counts the literals as they stand. The
 * natural order puts the better plan first: feasible before infeasible, then by value in the
 * model's sense. Immutable.
 */
public final class Plan implements Comparable<Plan> {
  private static final int SHOWN = 40;

  private final Statement statement;
  private final State literals;
  private final double value;
  private final List<Unmet> unmet;
  private final List<Decision> undecided;
  private final Set<Decision> open;

  private Plan(
      Statement statement,
      State literals,
      double value,
      List<Unmet> unmet,
      List<Decision> undecided) {
    this.statement = statement;
    this.literals = literals;
    this.value = value;
    this.unmet = List.copyOf(unmet);
    this.undecided = List.copyOf(undecided);
    this.open = Set.copyOf(undecided);
  }

  static Plan of(Statement statement, State given, Set<Decision> broken) {
    State literals = statement.withFixed(new Values(given).normal(statement));
    List<Unmet> unmet = new ArrayList<>();
    double cost = 0;
    for (Rule rule : statement.rules()) {
      if (!rule.kept(literals)) {
        double own = rule.cost(literals);
        unmet.add(new Unmet(rule.name(), rule.required(), rule.amount(literals), own));
        cost += own;
      }
    }
    List<Decision> undecided = new ArrayList<>();
    for (Decision decision : statement.decisions()) {
      int excess = Statement.excess(decision, literals);
      if (excess > 0 || broken.contains(decision)) {
        undecided.add(decision);
        unmet.add(new Unmet(decision.code(), true, Math.max(1, excess), 0));
      }
    }
    double value = statement.objective().value(literals) + statement.sense().sign() * cost;
    return new Plan(statement, literals, value, unmet, undecided);
  }

  /**
   * What the plan is worth: the objectives and the costs of preferred rules, in the model's sense.
   * With objectives in strict order, a number that orders plans as these do.
   */
  public double value() {
    return value;
  }

  /**
   * What one of the model's objectives comes to, in its own units.
   *
   * @throws IllegalArgumentException if the statement has no objective of that name
   */
  public double value(Statement.Objective objective) {
    for (Statement.Objective own : statement.objectives()) {
      if (own.name().equals(objective.name())) {
        return own.terms().value(literals);
      }
    }
    throw new IllegalArgumentException(
        "the plan is of " + statement + ", which has no objective '" + objective.name() + "'");
  }

  /** Whether every choice is decided and every required rule is kept. */
  public boolean feasible() {
    return unmet.stream().noneMatch(Unmet::required);
  }

  /** The rules that are not kept, in the order of the model; then choices without one option. */
  public List<Unmet> unmet() {
    return unmet;
  }

  /** The decisions that the plan leaves open. */
  public List<Decision> undecided() {
    return undecided;
  }

  /**
   * The option that a choice takes.
   *
   * @throws IllegalArgumentException if it is of another model
   * @throws IllegalStateException if the plan leaves it undecided
   */
  public <T> T value(Choice<T> choice) {
    return decided(choice).of(choice);
  }

  /** The option that a choice takes, if it is decided. */
  public <T> Optional<T> find(Choice<T> choice) {
    return isDecided(choice) ? Optional.of(value(choice)) : Optional.empty();
  }

  /** The number that a count is; refusals as for a choice. */
  public long value(Count count) {
    return decided(count).of(count);
  }

  /** +1 where a spin is up, -1 where it is down. */
  public int value(Spin spin) {
    return decided(spin).of(spin);
  }

  /**
   * The items at the places of an order, from the first on; refusals as for a choice. Where the
   * plan breaks the rule that no item comes twice, one does.
   */
  public <T> List<T> value(Order<T> order) {
    return decided(order).of(order);
  }

  /** The items that a subset takes, in the order of its items. */
  public <T> Set<T> value(Subset<T> subset) {
    return decided(subset).of(subset);
  }

  /**
   * Whether a decision has one value under the plan.
   *
   * @throws IllegalArgumentException if it is of another model
   */
  public boolean isDecided(Decision decision) {
    statement.require(decision);
    return !open.contains(decision);
  }

  private Values decided(Decision decision) {
    if (!isDecided(decision)) {
      throw new IllegalStateException(
          "decision '"
              + decision.name()
              + "' is undecided in this plan; look at undecided() first, or use isDecided");
    }
    return new Values(literals);
  }

  /** The value of a bit. */
  public boolean value(Bit bit) {
    return holds(bit);
  }

  /** Whether a literal holds. */
  public boolean holds(Literal literal) {
    if (literal instanceof Compound compound) {
      return compound.holds(this::holds);
    }
    statement.require(literal.owner().decisionOf(literal.index()));
    return literals.get(literal.index()) != literal.negated();
  }

  /**
   * The number that an expression is under this plan; linear in the expression.
   *
   * @throws IllegalArgumentException if it speaks of another model, or of a decision that was made
   *     after the plan's statement
   */
  public double number(Expr expr) {
    Model.requireOwner(expr, statement.owner());
    return Evaluation.of(expr, this::holds);
  }

  /** Which literals of the statement hold. */
  public State literals() {
    return literals;
  }

  /** The statement that the plan was checked against. */
  public Statement statement() {
    return statement;
  }

  @Override
  public int compareTo(Plan other) {
    if (feasible() != other.feasible()) {
      return feasible() ? -1 : 1;
    }
    int sign = statement.sense().sign();
    int byValue = Double.compare(sign * value, sign * other.value);
    return byValue != 0 ? byValue : literals.compareTo(other.literals);
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof Plan other
        && statement.owner() == other.statement.owner()
        && literals.equals(other.literals)
        && value == other.value
        && unmet.equals(other.unmet);
  }

  @Override
  public int hashCode() {
    return literals.hashCode();
  }

  /** The decisions and their values, cut short; then value and unmet rules. */
  @Override
  public String toString() {
    StringBuilder text = new StringBuilder("Plan(");
    List<Decision> decisions = statement.decisions();
    for (int d = 0; d < Math.min(SHOWN, decisions.size()); d++) {
      text.append(d == 0 ? "" : ", ").append(decisions.get(d).name()).append(" = ");
      text.append(shown(decisions.get(d)));
    }
    text.append(decisions.size() > SHOWN ? ", ..." : "").append("; value ");
    text.append(Text.number(value)).append(feasible() ? ", feasible" : ", infeasible");
    return text.append(unmet.isEmpty() ? "" : ", unmet " + Text.list(unmet)).append(')').toString();
  }

  private Object shown(Decision decision) {
    return isDecided(decision) ? new Values(literals).shown(decision) : "undecided";
  }

  /**
   * A plan being written by hand: set every decision, then evaluate. Belongs to one thread.
   *
   * <p>Use it to score what is done today, or as a start for a sampler.
   */
  public static final class Draft {
    private final Statement statement;
    private final boolean[] literals;
    private final Set<Decision> decided = new HashSet<>();

    Draft(Statement statement) {
      this.statement = statement;
      this.literals = new boolean[statement.literals()];
      statement.writeFixed(literals);
    }

    /**
     * Sets a choice, also a second time.
     *
     * @throws IllegalArgumentException if it is of another model, or has no such option
     */
    public <T> Draft set(Choice<T> choice, T option) {
      return write(choice, Values.pattern(choice, option));
    }

    /**
     * Sets a bit, also a second time.
     *
     * @throws IllegalArgumentException if it is of another model
     */
    public Draft set(Bit bit, boolean value) {
      return write(bit, value);
    }

    /** Sets a spin to +1 or -1; refusals as for a choice. */
    public Draft set(Spin spin, int value) {
      return write(spin, Values.pattern(spin, value));
    }

    /**
     * Sets a count.
     *
     * @throws IllegalArgumentException if it is of another model, or the number out of its range
     */
    public Draft set(Count count, long value) {
      return write(count, Values.pattern(count, value));
    }

    /**
     * Sets an order: an item for each place, from the first on.
     *
     * @throws IllegalArgumentException if it is of another model, has another number of places, or
     *     one of the items is not among its own
     */
    public <T> Draft set(Order<T> order, List<? extends T> value) {
      return write(order, Values.pattern(order, value));
    }

    /**
     * Sets a subset: the items that are taken.
     *
     * @throws IllegalArgumentException if it is of another model, or has no such item
     */
    public <T> Draft set(Subset<T> subset, Collection<? extends T> taken) {
      return write(subset, Values.pattern(subset, taken));
    }

    private Draft write(Decision decision, boolean... pattern) {
      int first = statement.firstLiteral(decision);
      if (statement.fixing().contradicts(decision, pattern)) {
        throw new IllegalArgumentException(
            "decision '"
                + decision.name()
                + "' is fixed to another value in model '"
                + statement.name()
                + "'; leave it out of the plan");
      }
      System.arraycopy(pattern, 0, literals, first, pattern.length);
      decided.add(decision);
      return this;
    }

    /** The number that an expression is, if all that it takes is set. */
    OptionalDouble numberIfSet(Expr expr) {
      boolean[] open = {false};
      double number =
          Evaluation.of(
              expr,
              literal -> {
                open[0] |= isOpen(statement.decisionOf(literal.index()));
                return literals[literal.index()] != literal.negated();
              });
      return open[0] ? OptionalDouble.empty() : OptionalDouble.of(number);
    }

    boolean isOpen(Decision decision) {
      return !decided.contains(decision) && !statement.isFixed(decision);
    }

    /**
     * The plan with these values, checked against the model. The largest and smallest of
     * expressions are worked out where they are not set.
     *
     * @throws IllegalStateException naming the first decision that was not set
     */
    public Plan evaluate() {
      statement.extremes().forEach(extreme -> extreme.fillIn(this));
      for (Decision decision : statement.decisions()) {
        if (isOpen(decision)) {
          throw new IllegalStateException(
              "decision '" + decision.name() + "' is not set; set every decision of the plan");
        }
      }
      return statement.plan(State.of(literals));
    }
  }
}
