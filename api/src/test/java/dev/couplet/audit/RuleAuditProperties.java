package dev.couplet.audit;

import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit.Certificate;
import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.lower.ChoiceEncoding;
import dev.couplet.lower.Ledger.Kind;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowering;
import dev.couplet.lower.Weights;
import dev.couplet.model.Model;
import java.util.List;
import java.util.SplittableRandom;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

/** Audits rule by rule against exhaustive ones. */
class RuleAuditProperties {
  private static final List<ChoiceEncoding> ALL =
      List.of(ChoiceEncoding.oneHot(), ChoiceEncoding.domainWall(), ChoiceEncoding.binary());

  /** With light weights too: whatever is certified passes the exhaustive audit. */
  @Property(tries = 150)
  void whatIsCertifiedIsSo(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    for (Regime regime : Regime.values()) {
      Model model = RandomModels.of(regime, seed);
      Lowering settings = Lowering.standard().with(ALL.get(random.nextInt(3)));
      if (random.nextBoolean()) {
        settings = settings.with(Weights.fixed(1 + random.nextInt(40)));
      }
      Lowered lowered = settings.lower(model);
      if (LoweringAudit.byRule(lowered).passed()) {
        LoweringAudit.exhaustive(lowered).orThrow();
      }
    }
  }

  /**
   * The standard lowering of small models is certified in every regime and encoding, but for few
   * where auxiliary bits are shared by rules and built on by other auxiliary bits.
   */
  @Example
  void standardLoweringsAreCertified() {
    int open = 0;
    for (Regime regime : Regime.values()) {
      for (ChoiceEncoding encoding : ALL) {
        for (long seed = 0; seed < 60; seed++) {
          Model model = RandomModels.of(regime, seed);
          Lowered lowered = Lowering.standard().with(encoding).lower(model);
          Certificate certificate = LoweringAudit.byRule(lowered);
          boolean shared =
              lowered.ledger().sources().stream().anyMatch(one -> one.kind() == Kind.PRODUCT);
          open += certificate.passed() ? 0 : 1;
          assertTrue(
              certificate.passed() || shared,
              lowered + ", " + encoding.name() + ": " + certificate);
        }
      }
    }
    assertTrue(open <= 12, open + " of 1260");
  }
}
