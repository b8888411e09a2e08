package dev.couplet.lower;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.audit.RandomModels;
import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.model.Model;
import java.util.List;
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
