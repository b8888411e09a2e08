package dev.couplet.lower;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Condition;
import dev.couplet.model.Literal;
import dev.couplet.model.Model;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Rules in steps whose range begins between two values that keep them. */
class StepsTest {
  private final Model model = Model.named("steps");

  /** Two options hold and the bit may: 2 or 3, of which 1 and 3 are odd. */
  private Condition odd(Bit bit) {
    Choice<Integer> one = model.choice("one", List.of(0, 1, 2));
    Choice<Integer> other = model.choice("other", List.of(0, 1));
    return Literal.oddOf(List.of(one.is(0), one.is(1), one.is(2), other.is(0), other.is(1), bit))
        .isTrue();
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 0.5, 3})
  void preferredOnes(double cost) {
    Bit bit = model.bit("bit");
    model.prefer("odd", odd(bit), cost);
    model.minimize("bit", bit);
    LoweringAudit.Report report = LoweringAudit.exhaustive(Lowering.standard().lower(model));
    report.orThrow();
    assertEquals(Math.min(cost, 1), report.optimum().orElseThrow());
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 0.5, 3})
  void squaredOnes(double cost) {
    Bit bit = model.bit("bit");
    model.preferSquared("odd", odd(bit), cost);
    model.minimize("bit", bit);
    LoweringAudit.Report report = LoweringAudit.exhaustive(Lowering.standard().lower(model));
    report.orThrow();
    assertEquals(Math.min(cost, 1), report.optimum().orElseThrow());
  }

  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void requiredOnes(boolean plain) {
    Bit bit = model.bit("bit");
    model.require("odd", odd(bit));
    model.minimize("bit", plain ? bit : bit.times(2));
    LoweringAudit.Report report = LoweringAudit.exhaustive(Lowering.standard().lower(model));
    report.orThrow();
    assertEquals(plain ? 1 : 2, report.optimum().orElseThrow());
  }
}
