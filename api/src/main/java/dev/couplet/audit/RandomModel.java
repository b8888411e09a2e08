package dev.couplet.audit;

import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Condition;
import dev.couplet.model.Expr;
import dev.couplet.model.Literal;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;

/**
 * One random model being drawn. A plan is drawn first, and the limits of required rules are put so
 * that it keeps them.
 */
final class RandomModel {
  private final Regime regime;
  private final SplittableRandom random;
  private final Model model;
  private final List<Literal> literals = new ArrayList<>();
  private final List<Choice<Integer>> choices = new ArrayList<>();
  private final Plan planted;

  RandomModel(Regime regime, long seed) {
    this.regime = regime;
    this.random = new SplittableRandom(seed ^ ((long) regime.name().hashCode() << 32));
    this.model = Model.named(regime + " " + seed);
    this.planted = decide();
    addObjective();
    int rules = regime == Regime.DENSE ? 2 : random.nextInt(4);
    for (int r = 0; r < rules; r++) {
      addRule(r);
    }
  }

  Model model() {
    return model;
  }

  private Plan decide() {
    List<Bit> bits = new ArrayList<>();
    int wanted = 1 + random.nextInt(regime == Regime.DENSE ? 8 : RandomModels.MOST_LITERALS);
    while (literals.size() < wanted) {
      int room = wanted - literals.size();
      if (room < 2 || !choosing()) {
        Bit bit = model.bit("bit " + literals.size());
        bits.add(bit);
        literals.add(bit);
      } else {
        int options = 1 + random.nextInt(Math.min(room, 5));
        List<Integer> values = IntStream.range(0, options).boxed().toList();
        Choice<Integer> choice = model.choice("choice " + choices.size(), values);
        choices.add(choice);
        values.forEach(value -> literals.add(choice.is(value)));
      }
    }
    Plan.Draft draft = model.plan();
    bits.forEach(bit -> draft.set(bit, random.nextBoolean()));
    choices.forEach(choice -> draft.set(choice, random.nextInt(choice.options().size())));
    return draft.evaluate();
  }

  private boolean choosing() {
    boolean mixed = regime == Regime.MIXED || regime == Regime.LOGIC;
    return regime == Regime.CHOICES || (mixed && random.nextBoolean());
  }

  private void addObjective() {
    List<Expr> terms = new ArrayList<>();
    if (regime == Regime.LOGIC) {
      int count = 1 + random.nextInt(6);
      for (int t = 0; t < count; t++) {
        terms.add(logic().expr().times(coefficient(9)));
      }
    } else if (regime == Regime.DENSE) {
      for (int i = 0; i < literals.size(); i++) {
        for (int j = 0; j <= i; j++) {
          terms.add(literals.get(i).times(literals.get(j)).times(coefficient(9)));
        }
      }
    } else {
      int count = random.nextInt(2 * literals.size() + 1);
      for (int t = 0; t < count; t++) {
        terms.add(product().times(coefficient(regime == Regime.HUGE_RANGE ? 1 << 16 : 9)));
      }
    }
    if (random.nextBoolean()) {
      model.maximize("objective", Expr.sum(terms));
    } else {
      model.minimize("objective", Expr.sum(terms));
    }
  }

  /** A product of few literals, some of them negated. */
  private Expr product() {
    int degree = 1 + random.nextInt(regime == Regime.MIXED || regime == Regime.TIED ? 4 : 2);
    Expr product = literal();
    for (int k = 1; k < degree; k++) {
      product = product.times(literal());
    }
    return product;
  }

  private Literal literal() {
    Literal literal = literals.get(random.nextInt(literals.size()));
    return random.nextInt(4) == 0 ? literal.not() : literal;
  }

  /** A coefficient of the regime, never 0. */
  private double coefficient(int most) {
    double sign = random.nextBoolean() ? 1 : -1;
    return switch (regime) {
      case TIED -> sign;
      case HUGE_RANGE -> {
        int octaves = 31 - Integer.numberOfLeadingZeros(most);
        yield sign * (1 + random.nextInt(1 << random.nextInt(octaves + 1)));
      }
      case DECIMAL -> sign * (1 + random.nextInt(100 * most)) / 100.0;
      default -> sign * (1 + random.nextInt(most));
    };
  }

  private RandomLogic logic() {
    return new RandomLogic(random, literals, choices, planted);
  }

  private void addLogic(int number) {
    Condition condition = logic().condition();
    switch (random.nextInt(5)) {
      case 0 -> model.preferSquared("wish " + number, condition, Math.abs(coefficient(4)));
      case 1 -> model.prefer("wish " + number, condition, Math.abs(coefficient(4)));
      default -> model.require("rule " + number, condition);
    }
  }

  private void addRule(int number) {
    if (regime == Regime.LOGIC) {
      addLogic(number);
      return;
    }
    Expr sum = sum();
    double value = hundredths(planted.number(sum));
    double off = random.nextInt(3) == 0 ? 0 : Math.abs(coefficient(4));
    Condition condition =
        switch (random.nextInt(4)) {
          case 0 -> sum.atLeast(hundredths(value - off));
          case 1 -> sum.exactly(value);
          case 2 -> sum.between(hundredths(value - off), hundredths(value + off));
          default -> sum.atMost(hundredths(value + off));
        };
    if ((regime == Regime.MIXED || regime == Regime.DECIMAL) && random.nextInt(3) == 0) {
      model.prefer("wish " + number, condition, Math.abs(coefficient(4)));
    } else {
      model.require("rule " + number, condition);
    }
  }

  private static double hundredths(double number) {
    return Math.rint(number * 100) / 100;
  }

  private Expr sum() {
    List<Expr> terms = new ArrayList<>();
    boolean all = regime == Regime.DENSE;
    int count = all ? literals.size() : 1 + random.nextInt(regime == Regime.SPARSE ? 3 : 6);
    for (int t = 0; t < count; t++) {
      Expr literal = all ? literals.get(t) : literal();
      terms.add(literal.times(coefficient(regime == Regime.HUGE_RANGE ? 1 << 8 : 5)));
    }
    if (regime == Regime.MIXED && random.nextInt(3) == 0) {
      terms.add(literal().times(literal()).times(coefficient(2)));
    }
    return Expr.sum(terms);
  }
}
