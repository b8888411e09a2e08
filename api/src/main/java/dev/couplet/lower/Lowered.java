package dev.couplet.lower;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.model.Decision;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Structure;
import java.util.List;
import java.util.stream.IntStream;

/**
 * A model as a quadratic form, and the way back.
 *
 * <p>Bits {@code 0 .. decisionBits() - 1} stand for the decisions of the statement, in their order;
 * the rest are auxiliary. On a feasible plan, with auxiliary bits at their best, the form's energy
 * is the plan's value, its sign changed if the model maximises. Every other pattern has an energy
 * above the best feasible one, if the weights suffice. None of this holds if a rule is {@link
 * #approximate()}. Immutable and thread-safe.
 */
@CheckReturnValue
public final class Lowered {
  /**
   * How heavy a rule weighs in the form, and why that suffices.
   *
   * @param rule the rule's name, or words that name a choice's code
   * @param form how the rule became a penalty
   * @param value what its penalty is multiplied by; 0 if it needs no penalty
   * @param reason why this is enough, in words
   */
  public record Weight(String rule, String form, double value, String reason) {}

  private final Statement statement;
  private final Qubo qubo;
  private final Coding coding;
  private final List<BitTable.Completion> completions;
  private final Ledger ledger;
  private final List<Weight> weights;
  private final List<String> approximate;
  private final Structure structure;

  Lowered(
      Statement statement,
      Qubo qubo,
      Coding coding,
      BitTable bits,
      Ledger ledger,
      List<Weight> weights,
      List<String> approximate,
      Structure structure) {
    this.statement = statement;
    this.qubo = qubo;
    this.coding = coding;
    this.completions = bits.completions();
    this.ledger = ledger;
    this.weights = weights;
    this.approximate = approximate;
    this.structure = structure;
  }

  /** The statement that was lowered. */
  public Statement statement() {
    return statement;
  }

  /** The form to be minimised. */
  public Qubo qubo() {
    return qubo;
  }

  /** The number of bits that stand for decisions; they come first. */
  public int decisionBits() {
    return coding.bits();
  }

  /**
   * The bits that stand for a decision, ascending; auxiliary bits are not among them.
   *
   * @throws IllegalArgumentException if it is no decision of the statement that was lowered
   */
  public List<Integer> bits(Decision decision) {
    int[] range = coding.bitsOf(decision);
    return IntStream.range(range[0], range[1]).boxed().toList();
  }

  /** The number of auxiliary bits. */
  public int auxiliaryBits() {
    return qubo.size() - coding.bits();
  }

  /** Where each coefficient came from, and what each bit stands for. */
  public Ledger ledger() {
    return ledger;
  }

  /** The weight of each rule and code, in the order of the statement, codes first. */
  public List<Weight> weights() {
    return weights;
  }

  /**
   * The names of the rules whose penalty is approximate. If there are any, energies of feasible
   * plans are not their values, and no bound or minimum of the form says anything about the model;
   * weights of other rules are those that would suffice without them.
   */
  public List<String> approximate() {
    return approximate;
  }

  /** What samplers may use: the exactly-one sets of the choices. */
  public Structure structure() {
    return structure;
  }

  /**
   * The plan that a state of the form stands for; auxiliary bits do not matter.
   *
   * @throws IllegalArgumentException if the state is not of the form's size
   */
  public Plan plan(State state) {
    if (state.size() != qubo.size()) {
      throw new IllegalArgumentException(
          "the state has "
              + state.size()
              + " bits, the form has "
              + qubo.size()
              + "; pass a state of this form");
    }
    return coding.plan(state);
  }

  /** The plans that draws of this form stand for. */
  public Plans read(Draws draws) {
    return new Plans(draws.rows().stream().map(Draw::state).map(this::plan).toList());
  }

  /**
   * The state of the form that stands for a plan, with every auxiliary bit at its best. Linear in
   * the terms of the rules; a start for samplers.
   *
   * @throws IllegalArgumentException if the plan is of another statement
   */
  public State complete(Plan plan) {
    if (plan.literals().size() != statement.literals() || !plan.statement().sameModel(statement)) {
      throw new IllegalArgumentException(
          "the plan is of "
              + plan.statement()
              + ", this form of "
              + statement
              + "; evaluate the plan on the model as it was lowered");
    }
    boolean[] bits = new boolean[qubo.size()];
    coding.write(plan.literals(), bits);
    completions.forEach(completion -> completion.complete(bits));
    return State.of(bits);
  }

  /** An energy of the form as a value in the model's own sense. */
  public double valueOf(double energy) {
    return statement.sense().sign() * energy + 0.0;
  }

  /** A value in the model's own sense as an energy of the form. */
  public double energyOf(double value) {
    return statement.sense().sign() * value + 0.0;
  }

  @Override
  public String toString() {
    return "Lowered("
        + statement.name()
        + ": "
        + coding.bits()
        + " decision bits, "
        + auxiliaryBits()
        + " auxiliary bits, "
        + qubo.pairs()
        + " pairs)";
  }
}
