package dev.couplet.examples.rounds;

import static dev.couplet.model.Expr.sum;

import dev.couplet.lower.Lowering;
import dev.couplet.lower.Weights;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Van and order of visits in one: each village takes one stop of one van, a stop takes one village
 * at most, and the ways of all vans are short in total.
 *
 * <p>The way is counted in savings (Clarke and Wright, "Scheduling of vehicles from a central depot
 * to a number of delivery points", 1964): out and back to each village by itself, less what is
 * saved where two of them follow each other. A stop left free between two others so counts as a
 * call at the library, which is no shorter than going on, but for rounding to metres.
 */
final class JointModel {
  private static final long MOST_LITERALS = 2000;

  private final RoundsData data;
  private final Model model = Model.named("joint rounds");
  private final Map<Van, List<Stop>> stops;
  private final Family<Village, Choice<Stop>> stopOf;

  private JointModel(RoundsData data) {
    this.data = data;
    this.stops = stops(data);
    this.stopOf =
        model.choices(
            "stop for", data.villages(), stops.values().stream().flatMap(List::stream).toList());
  }

  /** Whether the data makes a form that a few seconds are enough to draw from. */
  static boolean fits(RoundsData data) {
    long all = stops(data).values().stream().mapToLong(List::size).sum();
    return all * data.villages().size() <= MOST_LITERALS;
  }

  static JointModel of(RoundsData data) {
    JointModel joint = new JointModel(data);
    joint.state();
    return joint;
  }

  /** As many stops for each van as it can carry villages, were they the smallest. */
  private static Map<Van, List<Stop>> stops(RoundsData data) {
    List<Village> smallest =
        data.villages().stream().sorted(Comparator.comparingInt(Village::crates)).toList();
    Map<Van, List<Stop>> stops = new LinkedHashMap<>();
    for (Van van : data.vans()) {
      List<Stop> own = new ArrayList<>();
      long crates = 0;
      for (Village village : smallest) {
        crates += village.crates();
        if (crates <= van.capacity()) {
          own.add(new Stop(van, own.size() + 1));
        }
      }
      stops.put(van, own);
    }
    return stops;
  }

  private void state() {
    for (Van van : data.vans()) {
      for (Stop stop : stops(van)) {
        model.require(
            "one village at " + stop, sum(data.villages(), v -> stopOf.of(v).is(stop)).atMost(1));
      }
      if (!stops(van).isEmpty()) {
        model.require(
            load(van),
            sum(data.villages(), v -> by(van, v).times(v.crates())).atMost(van.capacity()));
        pairs(van);
      }
    }
    model.minimize("way", way());
    model.minimize("unmet wishes", sum(data.wishes(), this::unmet));
  }

  private static String load(Van van) {
    return "load of " + van;
  }

  private List<Stop> stops(Van van) {
    return stops.getOrDefault(van, List.of());
  }

  /** 1 where a van serves a village, else 0. */
  private Expr by(Van van, Village village) {
    return sum(stops(van), stop -> stopOf.of(village).is(stop));
  }

  private void pairs(Van van) {
    for (Pair pair : data.together()) {
      model.require(
          pair.one() + " with " + pair.other() + ", " + van,
          by(van, pair.one()).exactly(by(van, pair.other())));
    }
    for (Pair pair : data.apart()) {
      model.require(
          pair.one() + " apart from " + pair.other() + ", " + van,
          by(van, pair.one()).plus(by(van, pair.other())).atMost(1));
    }
  }

  private Expr way() {
    List<Expr> parts = new ArrayList<>();
    for (Van van : data.vans()) {
      for (Village village : data.villages()) {
        parts.add(by(van, village).times(data.library().outAndBack(village)));
      }
      List<Stop> own = stops(van);
      for (int k = 0; k + 1 < own.size(); k++) {
        addSavings(own.get(k), own.get(k + 1), parts);
      }
    }
    return sum(parts);
  }

  private void addSavings(Stop here, Stop next, List<Expr> parts) {
    for (Village one : data.villages()) {
      for (Village other : data.villages()) {
        if (!one.equals(other)) {
          Expr follow = stopOf.of(one).is(here).times(stopOf.of(other).is(next));
          parts.add(follow.times(-saving(one, other)));
        }
      }
    }
  }

  /** What is saved where one village follows another, instead of a way home between. */
  private int saving(Village one, Village other) {
    Library library = data.library();
    return library.distanceTo(one) + library.distanceTo(other) - one.distanceTo(other);
  }

  private Expr unmet(Wish wish) {
    List<Van> others = data.vans().stream().filter(van -> !van.equals(wish.van())).toList();
    return sum(others, van -> by(van, wish.village())).times(wish.metres());
  }

  Model model() {
    return model;
  }

  /** What a single step can save at the most, or a wish cost: what is at stake in one decision. */
  double stake() {
    int most = data.wishes().stream().mapToInt(Wish::metres).max().orElse(1);
    for (Village one : data.villages()) {
      for (Village other : data.villages()) {
        most = Math.max(most, one.equals(other) ? 1 : saving(one, other));
      }
    }
    return most;
  }

  /**
   * A lowering with light weights, so that draws move freely: a rule broken costs as much as is at
   * stake in one decision, a crate too many less, since loads count by squares. They are not proved
   * to suffice. Nor need they be: plans are checked against the model, and a bound of the form
   * holds for every plan that breaks no rule, whatever the weights.
   */
  Lowering lowering() {
    double most = data.villages().stream().mapToInt(Village::crates).max().orElse(1);
    double rule = stake();
    double crate = Math.ceil(rule / Math.max(1, most * most));
    List<String> loads = data.vans().stream().map(JointModel::load).toList();
    return Lowering.standard()
        .with(
            facts ->
                new Weights.Chosen(
                    loads.contains(facts.rule()) ? crate : rule,
                    "what is at stake in one decision; not proved to suffice"));
  }

  /** The plan in which every van visits these villages one after the other, from stop 1 on. */
  Plan plan(List<Round> rounds) {
    Plan.Draft draft = model.plan();
    for (Round round : rounds) {
      for (int k = 0; k < round.villages().size(); k++) {
        draft.set(stopOf.of(round.villages().get(k)), stops(round.van()).get(k));
      }
    }
    return draft.evaluate();
  }

  /** The rounds of a plan that leaves no village open, in the order of the visits. */
  List<Round> rounds(Plan plan) {
    List<Round> rounds = new ArrayList<>();
    for (Van van : data.vans()) {
      List<Village> served =
          data.villages().stream()
              .filter(village -> plan.value(stopOf.of(village)).van().equals(van))
              .sorted(Comparator.comparingInt(v -> plan.value(stopOf.of(v)).number()))
              .toList();
      rounds.add(new Round(van, served));
    }
    return rounds;
  }
}
