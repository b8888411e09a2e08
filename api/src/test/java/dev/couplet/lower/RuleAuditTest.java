package dev.couplet.lower;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTimeout;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.Findings.Finding;
import dev.couplet.audit.LoweringAudit;
import dev.couplet.audit.LoweringAudit.Certificate;
import dev.couplet.audit.RandomModels;
import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.form.Polynomial;
import dev.couplet.form.Qubo;
import dev.couplet.lower.Ledger.Kind;
import dev.couplet.lower.Ledger.Source;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Order;
import dev.couplet.model.Plan;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** The audit rule by rule: of large models, and of forms with something wrong in them. */
class RuleAuditTest {
  private static List<Integer> upTo(int n) {
    return IntStream.range(0, n).boxed().toList();
  }

  private static Lowered with(Lowered faithful, List<Source> sources) {
    Qubo.Builder form = Qubo.builder(faithful.qubo().size()).allowRounding();
    List<String> meanings = new ArrayList<>();
    for (int bit = 0; bit < faithful.qubo().size(); bit++) {
      meanings.add(faithful.ledger().meaning(bit));
    }
    for (Source source : sources) {
      form = form.add(source.terms(), source.factor());
    }
    Coding coding = new Coding(faithful.statement(), Lowering.standard());
    return new Lowered(
        faithful.statement(),
        form.build(),
        coding,
        new BitTable(coding),
        new Ledger(sources, meanings),
        faithful.weights(),
        faithful.approximate(),
        faithful.structure());
  }

  private static List<Source> changed(Lowered faithful, int source, double by, int... product) {
    List<Source> sources = new ArrayList<>(faithful.ledger().sources());
    Source one = sources.get(source);
    Polynomial terms =
        Polynomial.builder(one.terms().size()).add(one.terms(), 1).add(by, product).build();
    sources.set(source, new Source(one.name(), one.kind(), terms, one.factor()));
    return sources;
  }

  private static List<String> checks(Certificate certificate) {
    return certificate.findings().all().stream().map(Finding::check).distinct().toList();
  }

  /** Of forms changed in one coefficient of a part, whatever is certified passes in full. */
  @ParameterizedTest
  @EnumSource(Regime.class)
  void oneCoefficientOff(Regime regime) {
    int refused = 0;
    int wrong = 0;
    for (long seed = 0; seed < 60; seed++) {
      SplittableRandom random = new SplittableRandom(seed);
      Lowered faithful = Lowering.standard().lower(RandomModels.of(regime, seed));
      int source = random.nextInt(faithful.ledger().sources().size());
      int n = faithful.qubo().size();
      int[] product = IntStream.range(0, random.nextInt(3)).map(k -> random.nextInt(n)).toArray();
      double by = random.nextBoolean() ? 1 : -1;
      Lowered off = with(faithful, changed(faithful, source, by, product));
      Certificate certificate = LoweringAudit.byRule(off);
      LoweringAudit.Report report = LoweringAudit.exhaustive(off);
      boolean sound =
          report.findings().all().stream().allMatch(one -> one.check().equals("completion"));
      refused += certificate.passed() ? 0 : 1;
      wrong += sound ? 0 : 1;
      assertTrue(sound || !certificate.passed(), regime + " " + seed + ": " + report);
    }
    assertTrue(wrong >= 20 && refused >= wrong, refused + " refused, " + wrong + " wrong");
  }

  @Test
  void aFormThatIsNotItsLedgerIsFound() {
    Model model = Model.named("off");
    List<Bit> x = List.copyOf(model.bits("x", upTo(3)).decisions());
    model.require("one", sum(x).exactly(1));
    Lowered faithful = Lowering.standard().lower(model);
    Coding coding = new Coding(faithful.statement(), Lowering.standard());
    Lowered off =
        new Lowered(
            faithful.statement(),
            Qubo.builder(3).add(faithful.qubo(), 1).addPair(0, 2, 1).build(),
            coding,
            new BitTable(coding),
            faithful.ledger(),
            faithful.weights(),
            faithful.approximate(),
            faithful.structure());
    AssertionError error =
        assertThrows(AssertionError.class, () -> LoweringAudit.byRule(off).orThrow());
    String message = error.getMessage();
    assertTrue(message.contains("[ledger] the pair of x 0 and x 2: the form has 3"), message);
  }

  @Test
  void aWeightTooLightNamesItsRuleAndTheMend() {
    Model model = Model.named("load");
    List<Bit> x = List.copyOf(model.bits("x", upTo(40)).decisions());
    model.require("load", sum(x, bit -> bit.times(1 + x.indexOf(bit) % 7)).atMost(70));
    model.maximize("gain", sum(x));
    Certificate light =
        LoweringAudit.byRule(Lowering.standard().with(Weights.fixed(40)).lower(model));
    assertEquals(List.of("weight"), checks(light));
    String message = light.findings().toString();
    assertTrue(message.contains("'load' weighs 40, proved to suffice above 40;"), message);
    Certificate enough = LoweringAudit.byRule(Lowering.standard().lower(model));
    enough.orThrow();
    assertEquals(40, enough.width());
    String how = enough.proofs().get(0).how();
    assertTrue(how.startsWith("a square of whole numbers in 40 bits, slack 7 bits"), how);
  }

  /** Weights over a known plan are enough only together with the plan. */
  @Test
  void aKnownPlanMakesLighterWeightsEnough() {
    Model model = Model.named("known");
    Choice<Integer> choice = model.choice("c", upTo(30));
    Bit bit = model.bit("b");
    model.require("rule", choice.is(3).implies(bit));
    model.minimize("cost", sum(upTo(30), k -> choice.is(k).times(k)).plus(bit.times(-1)));
    Plan.Draft draft = model.plan();
    Plan known = draft.set(choice, 0).set(bit, true).evaluate();
    Lowered lowered = Lowering.standard().with(Weights.incumbentBound(known)).lower(model);
    assertFalse(LoweringAudit.byRule(lowered).passed());
    LoweringAudit.byRule(lowered, known).orThrow();
    Plan broken = model.plan().set(choice, 3).set(bit, false).evaluate();
    assertThrows(IllegalArgumentException.class, () -> LoweringAudit.byRule(lowered, broken));
  }

  @Test
  void whatCannotBeProvedIsNamed() {
    Model model = Model.named("open");
    Family<Integer, Choice<Integer>> c = model.choices("c", upTo(12), upTo(4));
    model.require("twice", sum(upTo(12), k -> c.of(k).is(1)).atMost(5));
    Lowered walls = Lowering.standard().with(ChoiceEncoding.domainWall()).lower(model);
    Certificate certificate = LoweringAudit.byRule(walls);
    assertEquals(List.of("rule"), checks(certificate));
    String message = certificate.findings().toString();
    assertTrue(message.contains("not certified: 'twice': it has a part of 36 bits"), message);
    assertEquals(12, certificate.proofs().size(), "the codes are proved");
    LoweringAudit.byRule(Lowering.standard().lower(model)).orThrow();
  }

  /** Every kind of rule over more bits than can be looked at one by one. */
  @Test
  void everyFormOfAnyLength() {
    Model model = Model.named("forms");
    List<Bit> x = List.copyOf(model.bits("x", upTo(60)).decisions());
    Order<Integer> order = model.order("tour", upTo(9));
    model.require("at most one", sum(x).atMost(1));
    model.require("all but one", sum(x.subList(0, 30)).atLeast(29));
    model.require("one of many", sum(x.subList(10, 50)).atLeast(1));
    model.require("exactly", sum(x, bit -> bit.times(3)).exactly(9));
    model.require("between", sum(x.subList(5, 50)).between(2, 13));
    model.require("weighted", sum(x, bit -> bit.times(x.indexOf(bit) - 20)).atMost(100));
    model.prefer("many", sum(x).atLeast(60), 2.5);
    model.minimize("way", order.cycleCost((a, b) -> (a * 7 + b * 3) % 10));
    model.minimize("triples", x.get(1).times(x.get(2)).times(x.get(3)).times(4));
    Certificate certificate = LoweringAudit.byRule(Lowering.standard().lower(model));
    certificate.orThrow();
    assertEquals(9, certificate.proofs().size(), certificate.toString());
  }

  /** 25,000 choices of four options: each with costs, neighbours apart, and one long rule. */
  @Test
  void aHundredThousandBits() {
    Model model = Model.named("large");
    int n = 25_000;
    Family<Integer, Choice<Integer>> c = model.choices("c", upTo(n), upTo(4));
    List<Expr> costs = new ArrayList<>();
    for (int k = 0; k < n; k++) {
      for (int option = 0; option < 4; option++) {
        costs.add(c.of(k).is(option).times((k * 31 + option * 17) % 9));
      }
      if (k % 10 == 0) {
        Choice<Integer> next = c.of((k + 1) % n);
        model.require("apart " + k, c.of(k).is(1).plus(next.is(1)).atMost(1));
      }
    }
    model.require("some", sum(upTo(1000), k -> c.of(k).is(2)).atMost(100));
    model.minimize("cost", sum(costs));
    Lowered lowered = Lowering.standard().lower(model);
    assertTrue(lowered.qubo().size() >= 100_000);
    assertTimeout(Duration.ofSeconds(60), () -> LoweringAudit.byRule(lowered).orThrow());
    List<Source> sources = changed(lowered, n + 1 + 77, 1, 5);
    assertEquals(Kind.PENALTY, sources.get(n + 1 + 77).kind());
    assertEquals(List.of("rule"), checks(LoweringAudit.byRule(with(lowered, sources))));
  }
}
