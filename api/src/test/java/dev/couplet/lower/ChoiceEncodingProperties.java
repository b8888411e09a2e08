package dev.couplet.lower;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.audit.RandomModels;
import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.form.Polynomial;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.lower.Lowered.Weight;
import dev.couplet.model.Choice;
import dev.couplet.model.Literal;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

/** Codes of choices against the definition of a code, and whole lowerings against the audit. */
class ChoiceEncodingProperties {
  private static final List<ChoiceEncoding> ALL =
      List.of(ChoiceEncoding.oneHot(), ChoiceEncoding.domainWall(), ChoiceEncoding.binary());

  @Property(tries = 150)
  void everyEncodingIsFaithful(@ForAll long seed) {
    for (Regime regime : List.of(Regime.CHOICES, Regime.MIXED)) {
      Model model = RandomModels.of(regime, seed);
      for (ChoiceEncoding encoding : ALL) {
        Lowered lowered = Lowering.standard().with(encoding).lower(model);
        LoweringAudit.exhaustive(lowered).orThrow();
      }
    }
  }

  /**
   * All different, implications and exclusions over options: penalties over literals, which broken
   * walls can take below 0. By any way to choose weights.
   */
  @Property(tries = 60)
  void rulesAmongOptionsAreFaithfulInEveryCode(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Model model = Model.named("options");
    List<Choice<Integer>> choices = new ArrayList<>();
    int room = 3 + random.nextInt(8);
    while (room > 1) {
      int options = 2 + random.nextInt(Math.min(4, room) - 1);
      room -= options;
      List<Integer> values = IntStream.range(0, options).boxed().toList();
      choices.add(model.choice("c" + choices.size(), values));
    }
    Plan.Draft draft = model.plan();
    for (Choice<Integer> choice : choices) {
      int option = random.nextInt(choice.options().size());
      draft.set(choice, option);
    }
    Plan kept = draft.evaluate();
    for (int rule = 0; rule < 3; rule++) {
      addRule(model, "rule " + rule, choices, kept, random);
    }
    for (Choice<Integer> choice : choices) {
      for (int option : choice.options()) {
        String name = "gain of " + choice + " " + option;
        model.minimize(name, choice.is(option).times(random.nextInt(-5, 6)));
      }
    }
    for (ChoiceEncoding encoding : ALL) {
      Lowering by = Lowering.standard().with(encoding);
      LoweringAudit.exhaustive(by.lower(model)).orThrow();
      Plan known = model.snapshot().plan(kept.literals());
      LoweringAudit.exhaustive(by.with(Weights.incumbentBound(known)).lower(model)).orThrow();
    }
  }

  private static void addRule(
      Model model, String name, List<Choice<Integer>> choices, Plan kept, SplittableRandom random) {
    List<Literal> some = new ArrayList<>();
    for (Choice<Integer> choice : choices) {
      some.add(choice.is(random.nextInt(choice.options().size())));
      if (random.nextInt(3) == 0) {
        some.add(choice.is(random.nextInt(choice.options().size())));
      }
    }
    List<Literal> literals = some.stream().distinct().toList();
    long held = literals.stream().filter(kept::holds).count();
    Literal first = literals.get(0);
    Literal last = literals.get(literals.size() - 1);
    switch (random.nextInt(4)) {
      case 0 -> model.require(name, sum(literals).atMost(Math.max(1, held)));
      case 1 -> model.require(name, sum(literals).atLeast(Math.min(held, literals.size() - 1)));
      case 2 -> {
        if (!kept.holds(first) || kept.holds(last)) {
          model.require(name, first.implies(last));
        }
      }
      default -> model.require(name, sum(literals).exactly(held));
    }
  }

  /** By hand: two options of walls exclude each other by the product of their literals. */
  @Example
  void exclusionOfTwoOptionsTakesNoAuxiliaryBit() {
    Model model = Model.named("apart");
    Choice<Integer> a = model.choice("a", List.of(0, 1, 2));
    Choice<Integer> b = model.choice("b", List.of(0, 1, 2));
    model.require("apart", a.is(1).plus(b.is(1)).atMost(1));
    Lowering walls = Lowering.standard().with(ChoiceEncoding.domainWall());
    Lowered lowered = walls.lower(model);
    assertEquals(0, lowered.auxiliaryBits());
    // (a0 - a1) (b0 - b1) with weight 1, and for both codes a wall too many, 1 + 1 * 2.
    assertEquals(List.of(3.0, 3.0, 1.0), lowered.weights().stream().map(Weight::value).toList());
    Polynomial.Builder expected = Polynomial.builder(4).add(1, 0, 2).add(-1, 0, 3);
    expected.add(-1, 1, 2).add(1, 1, 3).add(3, 1).add(-3, 0, 1).add(3, 3).add(-3, 2, 3);
    assertEquals(expected.build(), lowered.qubo().toPolynomial());
    assertTrue(lowered.weights().get(0).reason().endsWith("; of that 2 by rules"));
    // By 1 each pattern with one wall too many may win: a code of weight 1 or less is too light.
    LoweringAudit.exhaustive(lowered).orThrow();
    Lowered light = walls.weight("one option of 'a'", 1).lower(model);
    assertFalse(LoweringAudit.exhaustive(light).passed());
    assertTrue(
        LoweringAudit.exhaustive(walls.weight("one option of 'a'", 1.5).lower(model)).passed());
  }

  /** Every pattern stands for one option at the penalty 0, or for none at 1 or more. */
  @Example
  void codesAreWhatTheySay() {
    for (ChoiceEncoding encoding : ALL) {
      for (int options = 1; options <= 12; options++) {
        ChoiceEncoding.Code code = encoding.code(options);
        boolean[] stoodFor = new boolean[options];
        for (int pattern = 0; pattern < 1 << code.bits(); pattern++) {
          State state = State.ofWords(code.bits(), words(code.bits(), pattern));
          int option = code.stoodFor(state);
          double penalty = code.penalty().value(state);
          assertTrue(option < 0 ? penalty >= 1 : penalty == 0, encoding.name() + " " + state);
          if (option >= 0) {
            stoodFor[option] = true;
          }
        }
        for (boolean one : stoodFor) {
          assertTrue(one, encoding.name() + " of " + options);
        }
      }
    }
  }

  private static long[] words(int bits, long pattern) {
    return bits == 0 ? new long[0] : new long[] {pattern};
  }

  @Example
  void bitsTheyTake() {
    for (int options = 1; options <= 40; options++) {
      int log = 32 - Integer.numberOfLeadingZeros(options - 1);
      assertEquals(options, ChoiceEncoding.oneHot().code(options).bits());
      assertEquals(options - 1, ChoiceEncoding.domainWall().code(options).bits());
      assertEquals(log, ChoiceEncoding.binary().code(options).bits(), "ceil(log2 k)");
    }
  }

  /**
   * K - 1 spins, K ground states; with couplings of strength kappa between neighbouring walls the
   * next level lies 4 kappa above: source Chancellor (2019). A wall too many is two flips of sign
   * more, which is 1 in our penalty, so that kappa is a quarter of the weight.
   */
  @Example
  void domainWallsHaveAsManyGroundStatesAsOptions() {
    for (int options = 2; options <= 10; options++) {
      Model model = Model.named("wall");
      model.choice("c", IntStream.range(0, options).boxed().toList());
      Qubo form =
          Lowering.standard()
              .with(ChoiceEncoding.domainWall())
              .with(Weights.fixed(4))
              .lower(model)
              .qubo();
      assertEquals(options - 1, form.size());
      int ground = 0;
      double next = Double.POSITIVE_INFINITY;
      for (long pattern = 0; pattern < 1L << form.size(); pattern++) {
        double energy = form.value(State.ofWords(form.size(), pattern));
        ground += energy == 0 ? 1 : 0;
        next = energy > 0 ? Math.min(next, energy) : next;
      }
      assertEquals(options, ground);
      assertEquals(options == 2 ? Double.POSITIVE_INFINITY : 4, next, "4 kappa with kappa = 1");
    }
  }
}
