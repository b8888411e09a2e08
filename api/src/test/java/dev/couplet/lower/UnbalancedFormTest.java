package dev.couplet.lower;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.Findings.Finding;
import dev.couplet.audit.LoweringAudit;
import dev.couplet.form.State;
import dev.couplet.model.Bit;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class UnbalancedFormTest {
  private final Model model = Model.named("knapsack");
  private final List<Bit> x =
      List.copyOf(model.bits("x", IntStream.range(0, 6).boxed().toList()).decisions());

  private Expr weighted(int... factors) {
    return sum(IntStream.range(0, 6).mapToObj(k -> x.get(k).times(factors[k])).toList());
  }

  /** The published expression, {@code -l1 h + l2 h^2}, worked out at every pattern. */
  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void theEnergyIsTheParabolaOfWhatIsLeft(boolean atMost) {
    Expr load = weighted(3, 5, 2, 7, 4, 1);
    model.maximize("worth", weighted(4, 5, 3, 8, 5, 1));
    model.require("load", atMost ? load.atMost(11) : load.atLeast(11));
    Lowered lowered = Lowering.standard().approximate("load", 3, 0.5).lower(model);
    assertEquals(0, lowered.auxiliaryBits());
    assertEquals(List.of("load"), lowered.approximate());
    int[] loads = {3, 5, 2, 7, 4, 1};
    int[] worths = {4, 5, 3, 8, 5, 1};
    for (long pattern = 0; pattern < 64; pattern++) {
      int carried = 0;
      int worth = 0;
      for (int k = 0; k < 6; k++) {
        carried += (pattern >>> k & 1) != 0 ? loads[k] : 0;
        worth += (pattern >>> k & 1) != 0 ? worths[k] : 0;
      }
      double h = atMost ? 11 - carried : carried - 11;
      assertEquals(
          -worth + 0.5 * h * h - 3 * h, lowered.qubo().value(State.ofWords(6, pattern)), 1e-9);
    }
  }

  @Test
  void whatIsApproximateIsSaidEverywhere() {
    model.maximize("worth", weighted(4, 5, 3, 8, 5, 1));
    model.require("load", weighted(3, 5, 2, 7, 4, 1).atMost(11));
    model.require("few", sum(x).exactly(3));
    Lowered lowered = Lowering.standard().approximate("load", 1, 0.5).lower(model);
    Lowered.Weight weight = lowered.weights().get(0);
    assertTrue(weight.form().startsWith("approximate"), weight.form());
    assertTrue(weight.reason().contains("nothing is proved"), weight.reason());
    LoweringAudit.Report report = LoweringAudit.exhaustive(lowered);
    Finding finding = report.findings().all().get(0);
    assertEquals("approximate", finding.check());
    assertTrue(report.findings().toString().contains("[load]"), report.findings().toString());
    assertTrue(Lowering.standard().lower(model).approximate().isEmpty());
  }

  /** Forms without a slack are exact, and stay. */
  @Test
  void exactFormsWithoutASlackAreKept() {
    model.minimize("count", sum(x));
    model.require("pair", x.get(0).plus(x.get(1)).atMost(1));
    model.require("some", sum(x).atLeast(1));
    model.require("equal", sum(x).exactly(2));
    Lowering settings =
        Lowering.standard()
            .approximate("pair", 1, 1)
            .approximate("some", 1, 1)
            .approximate("equal", 1, 1);
    Lowered lowered = settings.lower(model);
    assertEquals(List.of(), lowered.approximate());
    assertEquals(Lowering.standard().lower(model).qubo(), lowered.qubo());
  }

  @Test
  void badSettingsAreRefused() {
    model.require("load", weighted(3, 5, 2, 7, 4, 1).atMost(11));
    model.prefer("wish", weighted(3, 5, 2, 7, 4, 1).atMost(8), 1);
    Lowering standard = Lowering.standard();
    refused(() -> standard.approximate("load", 0, 1), "'load'", "positive");
    refused(() -> standard.approximate("load", 1, Double.NaN), "'load'", "positive");
    refused(() -> standard.approximate("lode", 1, 1).lower(model), "'lode'", "no rule");
    refused(() -> standard.approximate("wish", 1, 1).lower(model), "'wish'", "preferred");
    refused(() -> standard.approximate("load", 1, 1).weight("load", 2).lower(model), "one of them");
  }

  private static void refused(Runnable call, String... words) {
    String message = assertThrows(IllegalArgumentException.class, call::run).getMessage();
    for (String word : words) {
      assertTrue(message.contains(word), message);
    }
  }
}
