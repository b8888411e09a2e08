package dev.couplet.solve;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.couplet.model.Choice;
import dev.couplet.model.Count;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.sampling.Effort;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class FixedDecisionsTest {
  /** Small and large enough for the stages that look at plans and for those that branch. */
  @Test
  void fixedDecisionsKeepTheirValuesInEveryStage() {
    for (int size : new int[] {3, 16}) {
      Model model = Model.named("rooms");
      List<Integer> keys = IntStream.range(0, size).boxed().toList();
      Family<Integer, Choice<Integer>> room = model.choices("room", keys, List.of(0, 1, 2));
      Count extra = model.count("extra", 0, 9);
      for (int k = 1; k < size; k++) {
        for (int option = 0; option < 3; option++) {
          model.require(
              k + " apart " + option,
              room.of(k).is(option).plus(room.of(k - 1).is(option)).atMost(1));
        }
      }
      model.minimize(
          "sum", extra.plus(Expr.sum(keys, k -> room.of(k).is(1).plus(room.of(k).is(2).times(2)))));
      model.fix(room.of(1), 2);
      model.fix(extra, 4);
      Answer answer = Solver.standard().solve(model, Effort.draws(32).seed(3));
      Plan plan = answer.plan();
      assertEquals(2, plan.value(room.of(1)));
      assertEquals(4, plan.value(extra));
      assertEquals(Proof.OPTIMAL, answer.proof());
      // 0 2 0 1 0 1 ...: rooms 0 and 1 in turn but for the fixed one.
      int ones = IntStream.range(2, size).filter(k -> k % 2 == 1).map(k -> 1).sum();
      assertEquals(4 + 2 + ones, plan.value());
    }
  }
}
