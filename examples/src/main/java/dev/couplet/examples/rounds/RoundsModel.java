package dev.couplet.examples.rounds;

import static dev.couplet.model.Expr.sum;

import dev.couplet.model.Choice;
import dev.couplet.model.Condition;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The problem as it is stated to the library: one van for each village, loads within capacities,
 * some villages together, some apart, wishes, and short distances within each round.
 */
final class RoundsModel {
  private final RoundsData data;
  private final Model model = Model.named("library rounds");
  private final Family<Village, Choice<Van>> vanOf;
  private final Map<String, RuleKind> kinds = new LinkedHashMap<>();

  private RoundsModel(RoundsData data) {
    this.data = data;
    this.vanOf = model.choices("van for", data.villages(), data.vans());
  }

  static RoundsModel of(RoundsData data) {
    RoundsModel rounds = new RoundsModel(data);
    rounds.state();
    return rounds;
  }

  private void state() {
    for (Van van : data.vans()) {
      require(
          RuleKind.LOAD,
          "load of " + van,
          sum(data.villages(), v -> vanOf.of(v).is(van).times(v.crates())).atMost(van.capacity()));
    }
    for (Pair pair : data.together()) {
      for (Van van : data.vans()) {
        require(
            RuleKind.TOGETHER,
            pair.one() + " with " + pair.other() + ", " + van,
            vanOf.of(pair.one()).is(van).equalTo(vanOf.of(pair.other()).is(van)));
      }
    }
    for (Pair pair : data.apart()) {
      for (Van van : data.vans()) {
        require(
            RuleKind.APART,
            pair.one() + " apart from " + pair.other() + ", " + van,
            vanOf.of(pair.one()).is(van).implies(vanOf.of(pair.other()).is(van).not()));
      }
    }
    for (Wish wish : data.wishes()) {
      kinds.put(wish.toString(), RuleKind.WISH);
      model.prefer(
          wish.toString(), vanOf.of(wish.village()).is(wish.van()).isTrue(), wish.metres());
    }
    model.minimize("distance", distance());
  }

  private void require(RuleKind kind, String name, Condition condition) {
    kinds.put(name, kind);
    model.require(name, condition);
  }

  /** The distances between every two villages of the same van. */
  private Expr distance() {
    List<Expr> parts = new ArrayList<>();
    List<Village> villages = data.villages();
    for (int a = 0; a < villages.size(); a++) {
      for (int b = a + 1; b < villages.size(); b++) {
        Village one = villages.get(a);
        Village other = villages.get(b);
        int metres = one.distanceTo(other);
        parts.add(
            sum(data.vans(), van -> vanOf.of(one).is(van).times(vanOf.of(other).is(van)))
                .times(metres));
      }
    }
    return sum(parts);
  }

  /** The statement for the library. */
  Model model() {
    return model;
  }

  RoundsData data() {
    return data;
  }

  /** The decision which van serves a village. */
  Choice<Van> vanOf(Village village) {
    return vanOf.of(village);
  }

  /** What kind of rule bears a name; none if it is no rule of the model. */
  Optional<RuleKind> kindOf(String rule) {
    return Optional.ofNullable(kinds.get(rule));
  }

  /** The rounds of a plan, one for each van; villages that it leaves open are in none. */
  List<Round> rounds(Plan plan) {
    List<Round> rounds = new ArrayList<>();
    for (Van van : data.vans()) {
      List<Village> served = new ArrayList<>();
      for (Village village : data.villages()) {
        if (plan.find(vanOf.of(village)).equals(Optional.of(van))) {
          served.add(village);
        }
      }
      rounds.add(new Round(van, served));
    }
    return rounds;
  }
}
