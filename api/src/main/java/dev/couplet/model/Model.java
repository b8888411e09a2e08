package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.Polynomial;
import dev.couplet.model.Statement.Objective;
import dev.couplet.model.Statement.Range;
import dev.couplet.model.Statement.Sense;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;

/**
 * A decision problem in the terms of the business: decisions, rules, an objective.
 *
 * <p>Mutable, for one thread. Mistakes are refused at the call that makes them. Lowering or solving
 * takes a {@link #snapshot()} and never changes the model.
 */
public final class Model {
  private static final double LARGEST_COUNT = 0x1p51;

  private final String name;
  private final List<Decision> decisions = new ArrayList<>();
  private final List<Decision> decisionOfLiteral = new ArrayList<>();
  private final List<Rule> rules = new ArrayList<>();
  private final List<Objective> objectives = new ArrayList<>();
  private final List<Extreme> extremes = new ArrayList<>();
  private final Set<String> decisionNames = new HashSet<>();
  private final Set<String> statementNames = new HashSet<>();
  private final Map<Decision, boolean[]> fixed = new LinkedHashMap<>();
  private @Nullable Sense sense;
  private boolean strictOrder;

  private Model(String name) {
    this.name = name;
  }

  /** A new, empty model. */
  @CheckReturnValue
  public static Model named(String name) {
    Check.name("a model", name);
    return new Model(name);
  }

  /** The name. */
  public String name() {
    return name;
  }

  /** Adds a yes/no decision. */
  public Bit bit(String bitName) {
    claim(decisionNames, "decision", bitName);
    Bit bit = new Bit(this, bitName, decisionOfLiteral.size());
    return add(bit);
  }

  private <D extends Decision> D add(D decision) {
    decisions.add(decision);
    int literals = Slot.of(decision).literals();
    for (int k = 0; k < literals; k++) {
      decisionOfLiteral.add(decision);
    }
    return decision;
  }

  /** Adds a yes/no decision for each key, named by the family's name and the key. */
  public <K> Family<K, Bit> bits(String familyName, Collection<K> keys) {
    return family(familyName, keys, this::bit);
  }

  /**
   * Adds a decision for exactly one of the options.
   *
   * @throws IllegalArgumentException if there is no option, or one stands twice
   */
  public <T> Choice<T> choice(String choiceName, Collection<T> options) {
    if (options.isEmpty()) {
      throw new IllegalArgumentException(
          "choice '" + choiceName + "' has no options; give it at least one");
    }
    Choice<T> choice = new Choice<>(this, choiceName, decisionOfLiteral.size(), options);
    claim(decisionNames, "decision", choiceName);
    return add(choice);
  }

  /**
   * Adds a decision for one of the options for each key, named by the family's name and the key.
   */
  public <K, T> Family<K, Choice<T>> choices(
      String familyName, Collection<K> keys, Collection<T> options) {
    return family(familyName, keys, choiceName -> choice(choiceName, options));
  }

  /** Adds a decision between up and down. */
  public Spin spin(String spinName) {
    claim(decisionNames, "decision", spinName);
    return add(new Spin(this, spinName, decisionOfLiteral.size()));
  }

  /** Adds a spin for each key, named by the family's name and the key. */
  public <K> Family<K, Spin> spins(String familyName, Collection<K> keys) {
    return family(familyName, keys, this::spin);
  }

  /**
   * Adds a decision for a whole number from lowest to highest, both included.
   *
   * @throws IllegalArgumentException if lowest is above highest, or one of them beyond 2^51
   */
  public Count count(String countName, long lowest, long highest) {
    if (lowest > highest) {
      throw new IllegalArgumentException(
          "count '"
              + countName
              + "' would range from "
              + lowest
              + " to "
              + highest
              + "; swap them");
    }
    for (long end : new long[] {lowest, highest}) {
      if (Math.abs((double) end) >= LARGEST_COUNT) {
        throw new IllegalArgumentException(
            "count '" + countName + "' would reach " + end + ", beyond 2^51; choose a larger unit");
      }
    }
    claim(decisionNames, "decision", countName);
    return add(new Count(this, countName, decisionOfLiteral.size(), lowest, highest));
  }

  /** Adds a count for each key, named by the family's name and the key. */
  public <K> Family<K, Count> counts(
      String familyName, Collection<K> keys, long lowest, long highest) {
    return family(familyName, keys, countName -> count(countName, lowest, highest));
  }

  /** Adds a decision for the order of all items. */
  public <T> Order<T> order(String orderName, Collection<T> items) {
    return order(orderName, items, items.size());
  }

  /**
   * Adds a decision for which of the items come at so many places, in what order.
   *
   * @throws IllegalArgumentException if there is no place, fewer items than places, or an item
   *     stands twice
   */
  public <T> Order<T> order(String orderName, Collection<T> items, int places) {
    if (places < 1 || places > items.size()) {
      throw new IllegalArgumentException(
          "order '"
              + orderName
              + "' has "
              + places
              + " places for "
              + items.size()
              + " items; it takes 1 to as many places as items");
    }
    Order<T> order = new Order<>(this, orderName, decisionOfLiteral.size(), items, places);
    requireFree(statementNames, "rule or objective", order.onceRule());
    claim(decisionNames, "decision", orderName);
    add(order);
    if (places > 1) {
      require(order.onceRule(), order.once());
    }
    return order;
  }

  /** Adds an order of all items for each key, named by the family's name and the key. */
  public <K, T> Family<K, Order<T>> orders(
      String familyName, Collection<K> keys, Collection<T> items) {
    return family(familyName, keys, orderName -> order(orderName, items));
  }

  /**
   * Adds a decision which of the items to take.
   *
   * @throws IllegalArgumentException if there is no item, or one stands twice
   */
  public <T> Subset<T> subset(String subsetName, Collection<T> items) {
    if (items.isEmpty()) {
      throw new IllegalArgumentException(
          "subset '" + subsetName + "' has no items; give it at least one");
    }
    Subset<T> subset = new Subset<>(this, subsetName, decisionOfLiteral.size(), items);
    claim(decisionNames, "decision", subsetName);
    return add(subset);
  }

  /** Adds a subset of the items for each key, named by the family's name and the key. */
  public <K, T> Family<K, Subset<T>> subsets(
      String familyName, Collection<K> keys, Collection<T> items) {
    return family(familyName, keys, subsetName -> subset(subsetName, items));
  }

  /**
   * Adds a count that is the largest of the expressions, such as the end of the last job. Rules
   * named after it see to that, with a choice by which of them it is reached. A plan by hand need
   * not set either: they are worked out.
   *
   * <p>Where a count is minimised, {@link #ceiling} does with less.
   *
   * @throws IllegalArgumentException if there is no expression, one does not have whole
   *     coefficients, or a name is taken
   */
  public Count largest(String countName, Collection<? extends Expr> exprs) {
    return extreme(countName, exprs, 1, true);
  }

  /** Adds a count that is the smallest of the expressions; as for {@link #largest}. */
  public Count smallest(String countName, Collection<? extends Expr> exprs) {
    return extreme(countName, exprs, -1, true);
  }

  /**
   * Adds a count that is no smaller than any of the expressions: their largest wherever it is
   * minimised, without a choice. A plan by hand need not set it: then it is the largest.
   *
   * @throws IllegalArgumentException as for {@link #largest}
   */
  public Count ceiling(String countName, Collection<? extends Expr> exprs) {
    return extreme(countName, exprs, 1, false);
  }

  private Count extreme(
      String countName, Collection<? extends Expr> exprs, int sign, boolean reached) {
    if (exprs.isEmpty()) {
      throw new IllegalArgumentException(
          "count '" + countName + "' is made of no expressions; give it at least one");
    }
    exprs.forEach(expr -> requireOwner(expr, this));
    String beyondAll = (sign > 0 ? "none is above '" : "none is below '") + countName + "'";
    String met = "one is '" + countName + "'";
    String turn = "which one is '" + countName + "'";
    requireFree(statementNames, "rule or objective", beyondAll);
    requireFree(statementNames, "rule or objective", met);
    requireFree(decisionNames, "decision", turn);
    List<Expr> all = List.copyOf(exprs);
    Range range = Extreme.range(countName, all, sign, decisionOfLiteral.size(), this::rangeOf);
    Count count = count(countName, (long) range.lowest(), (long) range.highest());
    Optional<Choice<Integer>> which =
        reached ? Optional.of(choice(turn, Extreme.turns(all.size()))) : Optional.empty();
    Extreme extreme = new Extreme(count, which, all, sign);
    extremes.add(extreme);
    require(beyondAll, extreme.beyondAll());
    which.ifPresent(choice -> require(met, extreme.met(choice)));
    return count;
  }

  private <K, D extends Decision> Family<K, D> family(
      String familyName, Collection<K> keys, Function<String, D> maker) {
    return Family.of(familyName, keys, name -> requireFree(decisionNames, "decision", name), maker);
  }

  /**
   * Fixes a choice: every plan takes this option, and rules and objectives speak of the other
   * decisions alone. A later call replaces an earlier one. Whether the rules can still be kept
   * shows when the model is lowered, solved or a plan of it evaluated: a rule that no plan keeps
   * any more is named there.
   *
   * @throws IllegalArgumentException if it is of another model, or has no such option
   */
  public <T> void fix(Choice<T> choice, T option) {
    fixTo(choice, Values.pattern(choice, option));
  }

  /** Fixes a bit; as for a choice. */
  public void fix(Bit bit, boolean value) {
    fixTo(bit, value);
  }

  /** Fixes a spin to 1 or -1; as for a choice. */
  public void fix(Spin spin, int value) {
    fixTo(spin, Values.pattern(spin, value));
  }

  /** Fixes a count; as for a choice. */
  public void fix(Count count, long value) {
    fixTo(count, Values.pattern(count, value));
  }

  /** Fixes an order: an item for each place; as for a choice. */
  public <T> void fix(Order<T> order, List<? extends T> items) {
    fixTo(order, Values.pattern(order, items));
  }

  /** Fixes a subset: the items that are taken; as for a choice. */
  public <T> void fix(Subset<T> subset, Collection<? extends T> taken) {
    fixTo(subset, Values.pattern(subset, taken));
  }

  private void fixTo(Decision decision, boolean... pattern) {
    Model owner = Slot.of(decision).owner();
    if (owner != this) {
      throw new IllegalArgumentException(
          "decision '"
              + decision.name()
              + "' belongs to model '"
              + owner.name()
              + "'; model '"
              + name
              + "' fixes its own");
    }
    fixed.put(decision, pattern);
  }

  /**
   * Requires a condition: plans that break it are infeasible.
   *
   * @return the rule, with whole coefficients
   * @throws IllegalArgumentException naming the rule, if no plan can keep it, its name is taken,
   *     its decimals do not fit into exact whole numbers, or it speaks of another model
   */
  public Rule require(String ruleName, Condition condition) {
    return add(rule(ruleName, condition, Optional.empty()));
  }

  private static void requirePossible(String rule, Condition.Part condition, Rule.Part part) {
    if (part.terms().terms() == 0 && !part.alwaysKept()) {
      throw new IllegalArgumentException(
          "rule '"
              + rule
              + "' can be kept by no plan: "
              + condition
              + " speaks of no decision and never holds");
    }
    if (part.terms().terms() > 0 && !part.divisible()) {
      throw new IllegalArgumentException(
          "rule '"
              + rule
              + "' can be kept by no plan: "
              + condition
              + ", but no multiple of the coefficients' common factor lies between the limits");
    }
    Range range = part.range();
    if (range.lowest() > part.highest() || range.highest() < part.lowest()) {
      throw new IllegalArgumentException(
          "rule '"
              + rule
              + "' can be kept by no plan: "
              + condition
              + ", but the expression lies between "
              + Text.number(inOwnUnits(condition, part, range.lowest()))
              + " and "
              + Text.number(inOwnUnits(condition, part, range.highest())));
    }
  }

  /**
   * Prefers a condition: each unit by which a plan misses it costs {@code costPerUnit}, which adds
   * to a minimised value and takes from a maximised one.
   *
   * @return the rule, with whole coefficients
   * @throws IllegalArgumentException as for {@link #require}, or if the cost is negative
   */
  public Rule prefer(String ruleName, Condition condition, double costPerUnit) {
    return prefer(ruleName, condition, costPerUnit, false);
  }

  /**
   * Prefers a condition at a cost that grows with the square of the amount by which a plan misses
   * it: missed by 3 units, it costs nine times {@code costOfFirstUnit}. Of a condition of several
   * parts each is squared by itself.
   *
   * @return the rule, with whole coefficients
   * @throws IllegalArgumentException as for {@link #prefer}
   */
  public Rule preferSquared(String ruleName, Condition condition, double costOfFirstUnit) {
    return prefer(ruleName, condition, costOfFirstUnit, true);
  }

  private Rule prefer(String ruleName, Condition condition, double costPerUnit, boolean squared) {
    Check.finite("the cost of rule '" + ruleName + "'", costPerUnit);
    if (costPerUnit < 0) {
      throw new IllegalArgumentException(
          "the cost of rule '" + ruleName + "' is " + costPerUnit + ", it must be 0 or more");
    }
    return add(rule(ruleName, condition, Optional.of(new Rule.Price(costPerUnit, squared))));
  }

  private Rule rule(String ruleName, Condition condition, Optional<Rule.Price> price) {
    Check.name("a rule", ruleName);
    List<Rule.Part> parts = new ArrayList<>();
    for (Condition.Part part : condition.parts()) {
      requireOwner(part.expr(), this);
      part.guards().forEach(guard -> requireOwner(guard, this));
      for (ScaledCondition scaled : withoutGuards(ruleName, part)) {
        Range range = rangeOf(scaled.terms());
        Rule.Part made = new Rule.Part(scaled, price.orElse(Rule.Price.NONE), range);
        if (price.isEmpty() && part.guards().isEmpty()) {
          requirePossible(ruleName, part, made);
        }
        parts.add(made);
      }
    }
    return new Rule(ruleName, price, parts);
  }

  private Range rangeOf(Polynomial terms) {
    return Ranges.of(
        terms, literal -> Slot.of(decisionOf(literal)).groups() > 0, decisionOfLiteral::get);
  }

  private List<ScaledCondition> withoutGuards(String ruleName, Condition.Part part) {
    Condition.Part plain = part.guards().isEmpty() ? part : part.withoutSteps();
    ScaledCondition scaled = ScaledCondition.of(ruleName, plain, decisionOfLiteral.size());
    return Relaxed.of(ruleName, scaled, part.guards(), this::rangeOf);
  }

  private Rule add(Rule rule) {
    claim(statementNames, "rule or objective", rule.name());
    rules.add(rule);
    return rule;
  }

  /** Undoes scaling and moves the constant back, for messages in the condition's own numbers. */
  private static double inOwnUnits(Condition.Part condition, Rule.Part part, double terms) {
    double own = Double.isFinite(condition.lowest()) ? condition.lowest() : condition.highest();
    double scaled = Double.isFinite(part.lowest()) ? part.lowest() : part.highest();
    return own + (terms - scaled) * part.unit();
  }

  /**
   * Adds a part to the objective, to be minimised.
   *
   * @throws IllegalArgumentException if the name is taken, the expression speaks of another model,
   *     or the model maximises already
   */
  public Objective minimize(String objectiveName, Expr expr) {
    return objective(objectiveName, expr, Sense.MINIMIZE);
  }

  /**
   * Adds a part to the objective, to be maximised.
   *
   * @throws IllegalArgumentException if the name is taken, the expression speaks of another model,
   *     or the model minimises already
   */
  public Objective maximize(String objectiveName, Expr expr) {
    return objective(objectiveName, expr, Sense.MAXIMIZE);
  }

  /**
   * Puts the objectives in strict order, as they are stated: a later one decides among plans that
   * are equally good by all earlier ones, and never outweighs them; the costs of preferred rules
   * count with the last. Without this their values add up.
   *
   * <p>A plan's value is then one number that orders plans so; {@link Plan#value(Objective)} tells
   * each objective's own. The numbers are exact: where that takes coefficients beyond 2^51, {@link
   * #snapshot()} refuses, and with it whatever lowers or describes the model.
   */
  public void strictOrder() {
    strictOrder = true;
  }

  private Objective objective(String objectiveName, Expr expr, Sense wanted) {
    Check.name("an objective", objectiveName);
    requireOwner(expr, this);
    if (sense != null && sense != wanted) {
      throw new IllegalArgumentException(
          "objective '"
              + objectiveName
              + "' would "
              + wanted.name().toLowerCase(Locale.ROOT)
              + ", but '"
              + objectives.get(0).name()
              + "' does the opposite; negate one of them with times(-1)");
    }
    Objective objective = new Objective(objectiveName, multipliedOut(objectiveName, expr));
    claim(statementNames, "rule or objective", objectiveName);
    objectives.add(objective);
    sense = wanted;
    return objective;
  }

  private Polynomial multipliedOut(String objectiveName, Expr expr) {
    Polynomial.Builder terms = Polynomial.builder(decisionOfLiteral.size());
    double[] magnitude = {0};
    Expansion.walk(
        expr,
        Arithmetic.DOUBLES,
        (coefficient, product) -> {
          magnitude[0] += Math.abs(coefficient);
          if (!Double.isFinite(magnitude[0])) {
            Check.finite(
                "the sum of the coefficients of objective '" + objectiveName + "', multiplied out,",
                magnitude[0]);
          }
          terms.add(coefficient, product);
        });
    return terms.build();
  }

  /** Begins a plan by hand, over the model as it stands now. */
  @CheckReturnValue
  public Plan.Draft plan() {
    return snapshot().plan();
  }

  /**
   * The model's content as it stands now; later changes do not reach it.
   *
   * @throws IllegalArgumentException if the objectives are in strict order, and exact numbers do
   *     not suffice for that
   */
  @CheckReturnValue
  public Statement snapshot() {
    Sense known = sense == null ? Sense.MINIMIZE : sense;
    return new Statement(this, decisions, rules, objectives, known, strictOrder, extremes, fixed);
  }

  /** The model in words, for proof-reading: every decision, rule and objective on a line. */
  @CheckReturnValue
  public String describe() {
    return Description.of(snapshot());
  }

  Decision decisionOf(int literal) {
    return decisionOfLiteral.get(literal);
  }

  static void requireOwner(Expr expr, Model model) {
    Model other = expr.owner();
    if (other != null && other != model) {
      throw new IllegalArgumentException(
          "the expression speaks of decisions of model '"
              + other.name()
              + "'; model '"
              + model.name()
              + "' takes its own");
    }
  }

  private static void claim(Set<String> taken, String what, String name) {
    requireFree(taken, what, name);
    taken.add(name);
  }

  private static void requireFree(Set<String> taken, String what, String name) {
    Check.name("a " + what, name);
    if (taken.contains(name)) {
      throw new IllegalArgumentException(
          "the model has a " + what + " named '" + name + "' already; choose another name");
    }
  }

  @Override
  public String toString() {
    return "Model("
        + name
        + ": "
        + decisions.size()
        + " decisions, "
        + rules.size()
        + " rules, "
        + objectives.size()
        + " objectives)";
  }
}
